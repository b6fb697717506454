import { distance, nearestOn, segmentsCross, type Point, type Segment } from './point.ts';
import { contains, sidesOf, type Polygon } from './polygon.ts';

/** The shortest way between two polygons: its length in mm and its two ends. */
export interface Gap {
  mm: number;
  from: Point;
  to: Point;
}

/** The shortest way from the rim of `a` to the rim of `b`, for any two simple rings; 0 long where they touch, cross or one holds the other. */
export function gapBetween(a: Polygon, b: Polygon): Gap {
  const inside = a.find((p) => contains(b, p)) ?? b.find((p) => contains(a, p));
  if (inside) return { mm: 0, from: inside, to: inside };
  const sidesA = sidesOf(a);
  const sidesB = sidesOf(b);
  // Two segments that do not cross are nearest at an end of one of them.
  let least = Infinity;
  let best: { side: Segment; end: Point; endOf: 'a' | 'b' } | null = null;
  for (const sideA of sidesA) {
    for (const sideB of sidesB) {
      if (segmentsCross(sideA, sideB)) return { mm: 0, from: sideA.from, to: sideA.from };
      const fromA = squaredToSegment(sideB, sideA.from);
      if (fromA < least) {
        least = fromA;
        best = { side: sideB, end: sideA.from, endOf: 'a' };
      }
      const fromB = squaredToSegment(sideA, sideB.from);
      if (fromB < least) {
        least = fromB;
        best = { side: sideA, end: sideB.from, endOf: 'b' };
      }
    }
  }
  if (!best) return { mm: Infinity, from: { x: 0, y: 0 }, to: { x: 0, y: 0 } };
  const on = nearestOn(best.side, best.end);
  const mm = distance(best.end, on);
  return best.endOf === 'a' ? { mm, from: best.end, to: on } : { mm, from: on, to: best.end };
}

/** Square of the distance from a point to a segment: `nearestOn` without its point, for the many that are only compared. */
function squaredToSegment({ from, to }: Segment, point: Point): number {
  const dx = to.x - from.x;
  const dy = to.y - from.y;
  const squared = dx * dx + dy * dy;
  const share = squared === 0 ? 0 : Math.min(1, Math.max(0, ((point.x - from.x) * dx + (point.y - from.y) * dy) / squared));
  const x = from.x + share * dx - point.x;
  const y = from.y + share * dy - point.y;
  return x * x + y * y;
}

export const distanceBetween = (a: Polygon, b: Polygon): number => gapBetween(a, b).mm;

/** Distance from a point to the rim of a polygon, mm. */
export function distanceToRim(polygon: Polygon, point: Point): number {
  return Math.min(...sidesOf(polygon).map((side) => distance(point, nearestOn(side, point))));
}

/**
 * How deep two convex polygons are in one another, mm: the least way one must be moved to be clear of the other (separating axes);
 * 0 where they are apart or touch.
 */
export function overlapDepth(a: Polygon, b: Polygon): number {
  let least = Infinity;
  for (const ring of [a, b]) {
    for (const { from, to } of sidesOf(ring)) {
      const length = distance(from, to);
      if (length === 0) continue;
      const axis = { x: (to.y - from.y) / length, y: (from.x - to.x) / length };
      const spanA = spanAlong(a, axis);
      const spanB = spanAlong(b, axis);
      least = Math.min(least, spanA.high - spanB.low, spanB.high - spanA.low);
      // One axis that parts them settles it.
      if (least <= 0) return 0;
    }
  }
  return least === Infinity ? 0 : least;
}

/** Lowest and highest reach of a polygon along a unit vector. */
export function spanAlong(polygon: Polygon, axis: Point): { low: number; high: number } {
  let low = Infinity;
  let high = -Infinity;
  for (const p of polygon) {
    const reach = p.x * axis.x + p.y * axis.y;
    if (reach < low) low = reach;
    if (reach > high) high = reach;
  }
  return { low, high };
}
