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
  const sidesA = sidesOf(a);
  const sidesB = sidesOf(b);
  const inside = a.find((p) => contains(b, p)) ?? b.find((p) => contains(a, p));
  if (inside) return { mm: 0, from: inside, to: inside };
  let best: Gap = { mm: Infinity, from: { x: 0, y: 0 }, to: { x: 0, y: 0 } };
  for (const sideA of sidesA) {
    for (const sideB of sidesB) {
      if (segmentsCross(sideA, sideB)) return { mm: 0, from: sideA.from, to: sideA.from };
      for (const gap of endToSide(sideA, sideB)) if (gap.mm < best.mm) best = gap;
    }
  }
  return best;
}

/** Two segments that do not cross are nearest at an end of one of them. */
function endToSide(a: Segment, b: Segment): Gap[] {
  const onB = nearestOn(b, a.from);
  const onA = nearestOn(a, b.from);
  return [
    { mm: distance(a.from, onB), from: a.from, to: onB },
    { mm: distance(onA, b.from), from: onA, to: b.from },
  ];
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
  for (const { from, to } of [...sidesOf(a), ...sidesOf(b)]) {
    const length = distance(from, to);
    if (length === 0) continue;
    const axis = { x: (to.y - from.y) / length, y: (from.x - to.x) / length };
    const spanA = spanAlong(a, axis);
    const spanB = spanAlong(b, axis);
    least = Math.min(least, spanA.high - spanB.low, spanB.high - spanA.low);
  }
  return Math.max(0, least);
}

/** Lowest and highest reach of a polygon along a unit vector. */
export function spanAlong(polygon: Polygon, axis: Point): { low: number; high: number } {
  const reach = polygon.map((p) => p.x * axis.x + p.y * axis.y);
  return { low: Math.min(...reach), high: Math.max(...reach) };
}
