import { distance, type Point } from './point.ts';
import { area, cornerAt, counterClockwise, sidesOf, type Polygon } from './polygon.ts';
import { leftOf } from './polygon-overlap.ts';

/**
 * A convex polygon drawn in by `mm` on every side; corners stay sharp. A side that the others swallow is dropped, and nothing is left
 * (an empty list) once `mm` reaches the largest circle inside. The inset of a convex polygon is the meeting of its half-planes moved in,
 * which is exact; offsetting libraries work on rounded coordinates and split or bevel corners.
 */
export function inset(polygon: Polygon, mm: number): Point[] {
  if (mm < 0) return grown(polygon, -mm);
  const ring = counterClockwise(polygon);
  let rest: Point[] = ring;
  for (const { from, to } of sidesOf(ring)) {
    const shift = inwards(from, to, mm);
    rest = leftOf(rest, { x: from.x + shift.x, y: from.y + shift.y }, { x: to.x + shift.x, y: to.y + shift.y });
  }
  const clean = withoutRepeats(rest);
  return clean.length >= 3 && area(clean) > 1e-9 ? clean : [];
}

/** A convex polygon drawn out by `mm` on every side with sharp corners, as mitred members stand round an opening. */
export function grown(polygon: Polygon, mm: number): Point[] {
  const ring = counterClockwise(polygon);
  return ring.map((corner, i) => {
    const before = cornerAt(ring, i - 1);
    const after = cornerAt(ring, i + 1);
    const a = inwards(before, corner, 1);
    const b = inwards(corner, after, 1);
    // The corner moves against the sum of both sides' normals, far enough that each side moves by mm.
    const scale = -mm / (1 + a.x * b.x + a.y * b.y);
    return { x: corner.x + (a.x + b.x) * scale, y: corner.y + (a.y + b.y) * scale };
  });
}

/** Vector of length `mm` square to the left of the way from `from` to `to`. */
export function inwards(from: Point, to: Point, mm: number): Point {
  const length = distance(from, to);
  return { x: (-(to.y - from.y) / length) * mm, y: ((to.x - from.x) / length) * mm };
}

function withoutRepeats(ring: Polygon): Point[] {
  return ring.filter((corner, i) => distance(corner, cornerAt(ring, i - 1)) > 1e-7);
}
