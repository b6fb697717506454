import { z } from 'zod';
import { Obstruction, Stud, WallShape, type Wall } from '../../../shared/walls/wall.ts';
import { boundsOf, inOrder, rectangleOutline } from '../../../shared/walls/studs.ts';

/** A length while it is typed, mm: null is empty, NaN is what cannot be read. */
export type Typed = number | null;

export interface StudDraft extends Omit<Stud, 'xMm' | 'widthMm' | 'uncertaintyMm'> {
  xMm: Typed;
  widthMm: Typed;
  uncertaintyMm: Typed;
}

export interface ObstructionDraft extends Omit<Obstruction, 'outlineMm' | 'clearanceMm'> {
  leftMm: Typed;
  bottomMm: Typed;
  widthMm: Typed;
  heightMm: Typed;
  clearanceMm: Typed;
  /** The outline of one that is no upright rectangle: kept as it is. */
  outlineMm: Obstruction['outlineMm'] | null;
}

export interface WallDraft {
  name: string;
  widthMm: Typed;
  heightMm: Typed;
  construction: WallShape['construction'];
  coveringMm: Typed;
  studSpecies: WallShape['studSpecies'];
  studs: StudDraft[];
  obstructions: ObstructionDraft[];
}

/** Words by dotted path, such as `studs.2.xMm`. */
export type DraftErrors = Record<string, string>;

export function draftOf(wall: Wall): WallDraft {
  const { name, widthMm, heightMm, construction, coveringMm, studSpecies, studs, obstructions } = wall;
  return { name, widthMm, heightMm, construction, coveringMm, studSpecies, studs: inOrder(studs), obstructions: obstructions.map(obstructionDraft) };
}

function obstructionDraft({ outlineMm, ...rest }: Obstruction): ObstructionDraft {
  const bounds = boundsOf(outlineMm);
  const upright = JSON.stringify(rectangleOutline(bounds)) === JSON.stringify(outlineMm);
  return { ...rest, ...bounds, outlineMm: upright ? null : outlineMm };
}

/** Whether anything differs from the wall as it was told. */
export function isChanged(draft: WallDraft, wall: Wall): boolean {
  const told = draftOf(wall);
  return JSON.stringify(draft, keepNaN) !== JSON.stringify(told, keepNaN);
}

const keepNaN = (_key: string, value: unknown) => (typeof value === 'number' && Number.isNaN(value) ? 'unread' : value);

const side = z.number({ error: 'Please give a length.' }).positive('This must be more than zero.');
const place = z.number({ error: 'Please give a length.' });
const Rectangle = z.object({ leftMm: place, bottomMm: place, widthMm: side, heightMm: side });
const Body = WallShape.extend({ studs: z.array(Stud).max(200), obstructions: z.array(Obstruction).max(200) });
export type WallBody = z.infer<typeof Body>;

/** The draft as it is sent, or what is wrong with which field. */
export function bodyOf(draft: WallDraft): { body: WallBody } | { errors: DraftErrors } {
  const errors: DraftErrors = {};
  const note = (issues: readonly { path: readonly PropertyKey[]; message: string }[], before = '') => {
    for (const { path, message } of issues) errors[before + path.map(String).join('.')] ??= message;
  };
  const obstructions = draft.obstructions.flatMap(({ leftMm, bottomMm, widthMm, heightMm, outlineMm, ...rest }, i) => {
    const read = Rectangle.safeParse({ leftMm, bottomMm, widthMm, heightMm });
    if (!read.success) note(read.error.issues, `obstructions.${i}.`);
    return [{ ...rest, outlineMm: outlineMm ?? (read.success ? rectangleOutline(read.data) : rectangleOutline({ leftMm: 0, bottomMm: 0, widthMm: 1, heightMm: 1 })) }];
  });
  const read = Body.safeParse({ ...draft, obstructions });
  if (!read.success) note(read.error.issues);
  if (read.success) {
    read.data.studs.forEach((stud, i) => {
      if (stud.xMm < -stud.widthMm || stud.xMm > read.data.widthMm + stud.widthMm) errors[`studs.${i}.xMm`] = 'This stands off the wall.';
    });
  }
  return read.success && Object.keys(errors).length === 0 ? { body: { ...read.data, studs: inOrder(read.data.studs) } } : { errors };
}

/** What of the draft can be drawn now: what cannot be read is left out or stands as it was told. */
export function drawable(draft: WallDraft, wall: Wall): Wall {
  const known = (value: Typed, otherwise: number) => (value !== null && Number.isFinite(value) && value > 0 ? value : otherwise);
  return {
    ...wall,
    widthMm: known(draft.widthMm, wall.widthMm),
    heightMm: known(draft.heightMm, wall.heightMm),
    studs: draft.studs.flatMap((s) => { const read = Stud.safeParse(s); return read.success ? [read.data] : []; }),
    obstructions: draft.obstructions.flatMap((o) => {
      const read = Rectangle.safeParse(o);
      const outlineMm = o.outlineMm ?? (read.success ? rectangleOutline(read.data) : null);
      return outlineMm ? [{ id: o.id, kind: o.kind, name: o.name, outlineMm, clearanceMm: o.clearanceMm ?? 0 }] : [];
    }),
  };
}
