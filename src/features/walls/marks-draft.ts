import type { Point } from '../../../shared/walls/homography.ts';
import type { Photo } from '../../../shared/walls/wall.ts';
import type { Typed } from './wall-draft.ts';

/** A mark while it is set: its place on the photo (px), and on the wall as far as typed (mm). */
export interface MarkDraft {
  px: Point;
  xMm: Typed;
  yMm: Typed;
}

export interface TapeRectangle {
  leftMm: Typed;
  bottomMm: Typed;
  widthMm: Typed;
  heightMm: Typed;
}

/** Going round from the lower left, as seen from in front. */
export const cornerNames = ['lower left', 'lower right', 'upper right', 'upper left'] as const;

/** Marks as last straightened by, or four well apart with nothing typed. */
export function marksOf(photo: Photo): MarkDraft[] {
  if (photo.marks) return photo.marks.map(({ px, mm }) => ({ px, xMm: mm.x, yMm: mm.y }));
  const [l, r, t, b] = [0.25 * photo.widthPx, 0.75 * photo.widthPx, 0.25 * photo.heightPx, 0.75 * photo.heightPx];
  return [{ x: l, y: b }, { x: r, y: b }, { x: r, y: t }, { x: l, y: t }].map((px) => ({ px, xMm: null, yMm: null }));
}

/** The rectangle whose corners the first four marks are, where they are. */
export function rectangleOf(marks: readonly MarkDraft[]): TapeRectangle {
  const [a, b, c, d] = marks;
  const square = a && b && c && d && a.xMm !== null && a.yMm !== null && b.xMm !== null && d.yMm !== null &&
    a.xMm === d.xMm && b.xMm === c.xMm && a.yMm === b.yMm && c.yMm === d.yMm;
  if (!square) return { leftMm: null, bottomMm: null, widthMm: null, heightMm: null };
  return { leftMm: a.xMm, bottomMm: a.yMm, widthMm: b.xMm! - a.xMm!, heightMm: d.yMm! - a.yMm! };
}

/** The marks with the rectangle's corners for places; what the rectangle does not yet tell stays empty. */
export function withRectangle(marks: readonly MarkDraft[], r: TapeRectangle): MarkDraft[] {
  const add = (a: Typed, b: Typed): Typed => (a === null || b === null ? null : a + b);
  const right = add(r.leftMm, r.widthMm);
  const top = add(r.bottomMm, r.heightMm);
  const places: [Typed, Typed][] = [[r.leftMm, r.bottomMm], [right, r.bottomMm], [right, top], [r.leftMm, top]];
  return marks.map((m, i) => ({ ...m, xMm: places[i]?.[0] ?? m.xMm, yMm: places[i]?.[1] ?? m.yMm }));
}

/** The wall places dealt out anew: mark i takes the one typed for mark `order[i]`. */
export function inThisOrder(marks: readonly MarkDraft[], order: readonly number[]): MarkDraft[] {
  return marks.map((m, i) => {
    const from = marks[order[i] ?? i] ?? m;
    return { ...m, xMm: from.xMm, yMm: from.yMm };
  });
}

/** Held within the photo and to a tenth of a pixel. */
export function onPhoto(px: Point, photo: { widthPx: number; heightPx: number }): Point {
  const hold = (v: number, most: number) => Math.round(Math.min(Math.max(v, 0), most) * 10) / 10;
  return { x: hold(px.x, photo.widthPx), y: hold(px.y, photo.heightPx) };
}
