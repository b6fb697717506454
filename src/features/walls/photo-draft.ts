import { elevationPlanOf, type ElevationPlan } from '../../../shared/walls/elevation-plan.ts';
import { fitPhoto, type Fit } from '../../../shared/walls/fit.ts';
import type { Point } from '../../../shared/walls/homography.ts';
import { Knowledge, type TrueLine } from '../../../shared/walls/knowledge.ts';
import { marksTrouble, type Mark, type MarksTrouble } from '../../../shared/walls/marks.ts';
import type { Photo, Wall } from '../../../shared/walls/wall.ts';
import { marksOf, type MarkDraft } from './marks-draft.ts';
import type { Typed } from './wall-draft.ts';

/** A known length while it is set: its ends on the photo (px), and the length as far as typed (mm). */
export interface LengthDraft {
  px: [Point, Point];
  mm: Typed;
}

/** All that is known of a photo while it is set. */
export interface PhotoDraft {
  marks: MarkDraft[];
  straightEdges: Point[][];
  lines: TrueLine[];
  lengths: LengthDraft[];
}

/** As last straightened by, or four marks with nothing typed. */
export function photoDraftOf(photo: Photo): PhotoDraft {
  const { straightEdges = [], lines = [], lengths = [] } = photo.known ?? {};
  return { marks: marksOf(photo), straightEdges, lines, lengths };
}

/** What a photo can be straightened by: points of known position, a rectangle, or plumb and level lines. */
export const ways = ['points', 'rectangle', 'lines'] as const;
export type Way = (typeof ways)[number];

/** The way that a draft takes: four marks are enough by themselves. */
export function wayOf(draft: PhotoDraft): Way {
  if (draft.marks.length >= 4) return 'points';
  return draft.lengths.length > 1 ? 'lines' : 'rectangle';
}

/** A draft begun anew in another way; straight edges, which serve all of them, stay. */
export function begunBy(way: Way, photo: Photo, before: PhotoDraft): PhotoDraft {
  const [l, r, t, b] = [0.25 * photo.widthPx, 0.75 * photo.widthPx, 0.25 * photo.heightPx, 0.75 * photo.heightPx];
  const { straightEdges } = before;
  if (way === 'points') return { marks: marksOf({ ...photo, marks: photo.marks && photo.marks.length >= 4 ? photo.marks : null }), straightEdges, lines: [], lengths: [] };
  const line = (direction: TrueLine['direction'], ...px: [Point, Point]): TrueLine => ({ direction, px });
  const lines = [line('plumb', { x: l, y: b }, { x: l, y: t }), line('plumb', { x: r, y: b }, { x: r, y: t }), line('level', { x: l, y: b }, { x: r, y: b }), line('level', { x: l, y: t }, { x: r, y: t })];
  const across: LengthDraft = { px: [{ x: l, y: b }, { x: r, y: b }], mm: null };
  const up: LengthDraft = { px: [{ x: r, y: b }, { x: r, y: t }], mm: null };
  const first = before.marks[0];
  return { marks: [{ px: { x: l, y: b }, xMm: first?.xMm ?? null, yMm: first?.yMm ?? null }], straightEdges, lines, lengths: way === 'rectangle' ? [across] : [across, up] };
}

type Trouble = Pick<MarksTrouble, 'words' | 'order' | 'which'>;

export type Judged =
  | { state: 'unfinished'; words: string }
  | { state: 'trouble'; trouble: Trouble }
  | { state: 'fit'; known: Knowledge; fit: Fit; plan: ElevationPlan };

const isTyped = (mm: Typed): mm is number => mm !== null && Number.isFinite(mm);
const trouble = (words: string, which: number[] = []): Judged => ({ state: 'trouble', trouble: { words, which } });

/** Whether what is known can be used as it stands, by the same rules as the server's, and the camera it gives. */
export function judge(draft: PhotoDraft, photo: Photo, wall: Pick<Wall, 'widthMm' | 'heightMm'>): Judged {
  const marks = draft.marks.flatMap(({ px, xMm, yMm }): Mark[] => (isTyped(xMm) && isTyped(yMm) ? [{ px, mm: { x: xMm, y: yMm } }] : []));
  if (marks.length < draft.marks.length) {
    return { state: 'unfinished', words: draft.marks.length === 1 ? 'Give the mark’s position on the wall.' : draft.marks.length === 4 ? 'Give all four positions first.' : 'Give the positions of all marks first.' };
  }
  const lengths = draft.lengths.flatMap(({ px, mm }) => (isTyped(mm) ? [{ px, mm }] : []));
  if (lengths.length < draft.lengths.length) return { state: 'unfinished', words: draft.lengths.length === 1 ? 'Give the length.' : 'Give all lengths first.' };
  const read = Knowledge.safeParse({ marks, straightEdges: draft.straightEdges, lines: draft.lines, lengths, focal35Mm: photo.focal35Mm ?? undefined });
  if (!read.success) return trouble(read.error.issues[0]?.message ?? 'What is known of the photo does not hold together.');
  const known = read.data;
  const wrong = marks.length >= 4 ? marksTrouble(marks, photo) : null;
  if (wrong) return { state: 'trouble', trouble: wrong };
  const fit = fitPhoto(known, photo);
  const first = marks[0];
  if (!fit || !first) return trouble('These lines and lengths do not tell how the wall stands. Draw the plumb lines far apart and the level lines far apart, and give a length across and one up.');
  const plan = elevationPlanOf(fit, first.mm, photo, wall);
  if (!plan) return trouble('By these positions the photo shows nothing of the wall. Check them, and the wall’s width and height.');
  return { state: 'fit', known, fit, plan };
}

/** The camera by which a photo was straightened, worked out anew; null where it was not. */
export function fitOf(photo: Photo): Fit | null {
  if (!photo.elevation || !photo.marks) return null;
  const read = Knowledge.safeParse({ marks: photo.marks, ...(photo.known ?? {}), focal35Mm: photo.focal35Mm ?? undefined });
  return read.success ? fitPhoto(read.data, photo) : null;
}
