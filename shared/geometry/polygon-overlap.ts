import polygonClipping from 'polygon-clipping';
import type { Point } from './point.ts';
import { turnOf } from './point.ts';
import { area, counterClockwise, isConvex, sidesOf, type Polygon } from './polygon.ts';

/**
 * What of `subject` lies left of the line from `a` to `b` (Sutherland and Hodgman 1974, one half-plane).
 * A concave subject may come out with sides that run there and back; its area is right all the same.
 */
export function leftOf(subject: Polygon, a: Point, b: Point): Point[] {
  const kept: Point[] = [];
  for (const { from, to } of sidesOf(subject)) {
    const start = turnOf(a, b, from);
    const end = turnOf(a, b, to);
    if (start >= 0) kept.push(from);
    if ((start > 0 && end < 0) || (start < 0 && end > 0)) {
      const share = start / (start - end);
      kept.push({ x: from.x + share * (to.x - from.x), y: from.y + share * (to.y - from.y) });
    }
  }
  return kept;
}

/** What two polygons share, when `clip` is convex; fewer than three corners when nothing. */
export function clippedTo(subject: Polygon, clip: Polygon): Point[] {
  let rest = [...subject];
  for (const { from, to } of sidesOf(counterClockwise(clip))) rest = leftOf(rest, from, to);
  return rest;
}

/**
 * Shared area of two polygons, mm²; 0 where they only touch. Where one of them is convex (a frame always is) half-planes do it,
 * which bears sides that lie on one another, as abutting frames have; two concave ones go to a sweep-line library.
 */
export function overlapArea(a: Polygon, b: Polygon): number {
  if (isConvex(b)) return area(clippedTo(a, b));
  if (isConvex(a)) return area(clippedTo(b, a));
  const ring = (polygon: Polygon): [number, number][] => polygon.map(({ x, y }) => [x, y]);
  const pieces = polygonClipping.intersection([ring(a)], [ring(b)]);
  return pieces.reduce((sum, rings) => {
    const areas = rings.map((r) => area(r.map(([x, y]) => ({ x, y }))));
    return sum + areas.reduce((rest, one, i) => (i === 0 ? one : rest - one), 0);
  }, 0);
}
