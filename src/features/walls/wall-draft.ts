import { z } from 'zod';
import { crossesItself } from '../../../shared/geometry/polygon.ts';
import { boundsOf, inOrder, rectangleOutline } from '../../../shared/walls/studs.ts';
import { Obstruction, Stud, WallOutline, WallShape, Zone, type Wall } from '../../../shared/walls/wall.ts';

/** A length while it is typed, mm: null is empty, NaN is what cannot be read. */
export type Typed = number | null;

export interface StudDraft extends Omit<Stud, 'xMm' | 'widthMm' | 'uncertaintyMm'> {
  xMm: Typed;
  widthMm: Typed;
  uncertaintyMm: Typed;
}

export interface Corner {
  xMm: Typed;
  yMm: Typed;
}

export interface ObstructionDraft extends Omit<Obstruction, 'outlineMm' | 'clearanceMm'> {
  leftMm: Typed;
  bottomMm: Typed;
  widthMm: Typed;
  heightMm: Typed;
  clearanceMm: Typed;
  /** The corners of one that is no upright rectangle; its sides follow from them. */
  corners: Corner[] | null;
}

export interface ZoneDraft extends Omit<Zone, 'fromMm' | 'toMm'> {
  fromMm: Typed;
  toMm: Typed;
}

export interface WallDraft {
  name: string;
  widthMm: Typed;
  heightMm: Typed;
  construction: WallShape['construction'];
  coveringMm: Typed;
  studSpecies: WallShape['studSpecies'];
  /** Corners of a wall that is no upright rectangle. */
  outline: Corner[] | null;
  studs: StudDraft[];
  obstructions: ObstructionDraft[];
  zones: ZoneDraft[];
}

/** Words by dotted path, such as `studs.2.xMm`. */
export type DraftErrors = Record<string, string>;

export const cornersOf = (outline: readonly (readonly [number, number])[]): Corner[] => outline.map(([xMm, yMm]) => ({ xMm, yMm }));

export function draftOf(wall: Wall): WallDraft {
  const { name, widthMm, heightMm, construction, coveringMm, studSpecies, outlineMm, studs, obstructions, zones } = wall;
  return {
    name, widthMm, heightMm, construction, coveringMm, studSpecies,
    outline: outlineMm ? cornersOf(outlineMm) : null, studs: inOrder(studs), obstructions: obstructions.map(obstructionDraft), zones,
  };
}

function obstructionDraft({ outlineMm, ...rest }: Obstruction): ObstructionDraft {
  const bounds = boundsOf(outlineMm);
  const upright = JSON.stringify(rectangleOutline(bounds)) === JSON.stringify(outlineMm);
  return { ...rest, ...bounds, corners: upright ? null : cornersOf(outlineMm) };
}

/** Whether anything differs from the wall as it was told. */
export function isChanged(draft: WallDraft, wall: Wall): boolean {
  return JSON.stringify(draft, keepNaN) !== JSON.stringify(draftOf(wall), keepNaN);
}

const keepNaN = (_key: string, value: unknown) => (typeof value === 'number' && Number.isNaN(value) ? 'unread' : value);

const side = z.number({ error: 'Please give a length.' }).positive('This must be more than zero.');
const place = z.number({ error: 'Please give a length.' });
const Rectangle = z.object({ leftMm: place, bottomMm: place, widthMm: side, heightMm: side });
const Corners = z
  .array(z.object({ xMm: place, yMm: place }).transform(({ xMm, yMm }): [number, number] => [xMm, yMm]))
  .min(3, 'An outline has at least three corners.')
  .refine((ring) => !crossesItself(ring.map(([x, y]) => ({ x, y }))), 'The sides of this outline cross one another. Put the corners in the order in which one goes round.');
const Body = WallShape.extend({ outlineMm: WallOutline.nullable(), studs: z.array(Stud).max(200), obstructions: z.array(Obstruction).max(200), zones: z.array(Zone).max(50) });
export type WallBody = z.infer<typeof Body>;

/** Stands in for what could not be read, so that the rest is still judged. */
const standIn = rectangleOutline({ leftMm: 0, bottomMm: 0, widthMm: 1, heightMm: 1 });

/** The draft as it is sent, or what is wrong with which field. */
export function bodyOf(draft: WallDraft): { body: WallBody } | { errors: DraftErrors } {
  const errors: DraftErrors = {};
  const note = (issues: readonly { path: readonly PropertyKey[]; message: string }[], before = '') => {
    for (const { path, message } of issues) errors[[before, ...path.map(String)].filter((part) => part !== '').join('.')] ??= message;
  };
  const ring = (corners: readonly Corner[], at: string) => {
    const read = Corners.safeParse(corners);
    if (!read.success) note(read.error.issues, at);
    return read.success ? read.data : standIn;
  };
  const obstructions = draft.obstructions.map(({ leftMm, bottomMm, widthMm, heightMm, corners, ...rest }, i) => {
    if (corners) return { ...rest, outlineMm: ring(corners, `obstructions.${i}.corners`) };
    const read = Rectangle.safeParse({ leftMm, bottomMm, widthMm, heightMm });
    if (!read.success) note(read.error.issues, `obstructions.${i}`);
    return { ...rest, outlineMm: read.success ? rectangleOutline(read.data) : standIn };
  });
  const { outline, ...shape } = draft;
  const read = Body.safeParse({ ...shape, outlineMm: outline && ring(outline, 'outline'), obstructions });
  if (!read.success) note(read.error.issues);
  if (read.success) {
    const { widthMm, heightMm, outlineMm, studs, zones } = read.data;
    studs.forEach((stud, i) => {
      if (stud.xMm < -stud.widthMm || stud.xMm > widthMm + stud.widthMm) errors[`studs.${i}.xMm`] = 'This stands off the wall.';
    });
    zones.forEach((zone, i) => {
      if (zone.toMm <= zone.fromMm) errors[`zones.${i}.toMm`] = 'This must lie to the right of where it begins.';
    });
    outlineMm?.forEach(([x, y], i) => {
      if (x < 0 || x > widthMm) errors[`outline.${i}.xMm`] ??= 'This lies past the wall’s width.';
      if (y < 0 || y > heightMm) errors[`outline.${i}.yMm`] ??= 'This lies past the wall’s height.';
    });
  }
  return read.success && Object.keys(errors).length === 0 ? { body: { ...read.data, studs: inOrder(read.data.studs) } } : { errors };
}

/** What of the draft can be drawn now: what cannot be read is left out or stands as it was told. */
export function drawable(draft: WallDraft, wall: Wall): Wall {
  const known = (value: Typed, otherwise: number) => (value !== null && Number.isFinite(value) && value > 0 ? value : otherwise);
  const outline = Corners.safeParse(draft.outline);
  return {
    ...wall,
    widthMm: known(draft.widthMm, wall.widthMm),
    heightMm: known(draft.heightMm, wall.heightMm),
    outlineMm: draft.outline && outline.success ? outline.data : null,
    studs: draft.studs.flatMap((s) => { const read = Stud.safeParse(s); return read.success ? [read.data] : []; }),
    obstructions: draft.obstructions.flatMap((o) => {
      const outlineMm = readOutline(o);
      return outlineMm ? [{ id: o.id, kind: o.kind, name: o.name, outlineMm, clearanceMm: o.clearanceMm !== null && o.clearanceMm >= 0 ? o.clearanceMm : 0 }] : [];
    }),
    zones: draft.zones.flatMap((z) => { const read = Zone.safeParse(z); return read.success && read.data.toMm > read.data.fromMm ? [read.data] : []; }),
  };
}

/** An obstruction's outline as far as it can be read; null where it cannot. */
export function readOutline(o: ObstructionDraft): Obstruction['outlineMm'] | null {
  if (o.corners) return Corners.safeParse(o.corners).data ?? null;
  const read = Rectangle.safeParse(o);
  return read.success ? rectangleOutline(read.data) : null;
}
