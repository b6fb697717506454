import { distance, flipped, placed, segmentsCross, translated, turned, turnOf, type Placement, type Point, type Segment } from './point.ts';

export type { Placement, Point, Segment } from './point.ts';

/** A closed ring of corners; the last side runs back to the first. */
export type Polygon = readonly Point[];

export interface Box {
  left: number;
  bottom: number;
  right: number;
  top: number;
}

/** The corner at `index`, counted round and round in either direction. */
export function cornerAt(polygon: Polygon, index: number): Point {
  const n = polygon.length;
  return polygon[((index % n) + n) % n]!;
}

/** Sides in order: side i runs from corner i to corner i + 1. */
export function sidesOf(polygon: Polygon): Segment[] {
  return polygon.map((from, i) => ({ from, to: cornerAt(polygon, i + 1) }));
}

/** Area by the shoelace formula, mm²: above 0 counter-clockwise, below 0 clockwise. */
export function signedArea(polygon: Polygon): number {
  // Taken about the first corner, so that polygons far from the origin lose no digits.
  const origin = polygon[0];
  if (!origin) return 0;
  return sidesOf(polygon).reduce((sum, { from, to }) => sum + turnOf(origin, from, to), 0) / 2;
}

export const area = (polygon: Polygon): number => Math.abs(signedArea(polygon));

export function perimeter(polygon: Polygon): number {
  return sidesOf(polygon).reduce((sum, { from, to }) => sum + distance(from, to), 0);
}

/** Centre of area. A ring without area has none: the mean of its corners is given instead. */
export function centroid(polygon: Polygon): Point {
  const origin = polygon[0];
  if (!origin) return { x: 0, y: 0 };
  const whole = signedArea(polygon);
  if (whole === 0) {
    const n = polygon.length;
    return { x: polygon.reduce((s, p) => s + p.x, 0) / n, y: polygon.reduce((s, p) => s + p.y, 0) / n };
  }
  let x = 0;
  let y = 0;
  for (const { from, to } of sidesOf(polygon)) {
    const twice = turnOf(origin, from, to);
    x += twice * (from.x + to.x - 2 * origin.x);
    y += twice * (from.y + to.y - 2 * origin.y);
  }
  return { x: origin.x + x / (6 * whole), y: origin.y + y / (6 * whole) };
}

export function counterClockwise(polygon: Polygon): Point[] {
  return signedArea(polygon) < 0 ? reversed(polygon) : [...polygon];
}

/** The same ring run the other way; the first corner stays first. */
export function reversed(polygon: Polygon): Point[] {
  return polygon.map((_, i) => cornerAt(polygon, -i));
}

/** How far the way bends to the left at each corner, radians in (−π, π]; 2π in sum for a simple counter-clockwise ring. */
export function exteriorAngles(polygon: Polygon): number[] {
  return polygon.map((corner, i) => {
    const before = cornerAt(polygon, i - 1);
    const after = cornerAt(polygon, i + 1);
    const along = (corner.x - before.x) * (after.x - corner.x) + (corner.y - before.y) * (after.y - corner.y);
    return Math.atan2(turnOf(before, corner, after), along);
  });
}

/** Bends one way at every corner, and goes round once. Straight corners (within `straightRad`) do not count against it. */
export function isConvex(polygon: Polygon, straightRad = 1e-9): boolean {
  if (polygon.length < 3) return false;
  const angles = exteriorAngles(counterClockwise(polygon));
  const whole = angles.reduce((sum, angle) => sum + angle, 0);
  return angles.every((angle) => angle > -straightRad) && Math.abs(whole - 2 * Math.PI) < 1e-6;
}

/** Whether any two sides that are not neighbours cross. */
export function crossesItself(polygon: Polygon): boolean {
  const sides = sidesOf(polygon);
  return sides.some((a, i) => sides.some((b, j) => j > i + 1 && !(i === 0 && j === sides.length - 1) && segmentsCross(a, b)));
}

/** Whether a point lies inside or on the rim, by crossing count; any simple ring. */
export function contains(polygon: Polygon, point: Point): boolean {
  let inside = false;
  for (const { from, to } of sidesOf(polygon)) {
    const side = turnOf(from, to, point);
    const between = (point.x - from.x) * (point.x - to.x) + (point.y - from.y) * (point.y - to.y) <= 0;
    if (side === 0 && between) return true;
    if (from.y > point.y !== to.y > point.y && side > 0 === to.y > from.y) inside = !inside;
  }
  return inside;
}

export function boxOf(points: Polygon): Box {
  const box = { left: Infinity, bottom: Infinity, right: -Infinity, top: -Infinity };
  for (const { x, y } of points) {
    box.left = Math.min(box.left, x);
    box.bottom = Math.min(box.bottom, y);
    box.right = Math.max(box.right, x);
    box.top = Math.max(box.top, y);
  }
  return box;
}

/** The counter-clockwise ring round a box. */
export function boxRing({ left, bottom, right, top }: Box): Point[] {
  return [{ x: left, y: bottom }, { x: right, y: bottom }, { x: right, y: top }, { x: left, y: top }];
}

export const moved = (polygon: Polygon, dx: number, dy: number): Point[] => polygon.map((p) => translated(p, dx, dy));
export const turnedAll = (polygon: Polygon, rad: number): Point[] => polygon.map((p) => turned(p, rad));
/** Left for right; run the other way too, so that a counter-clockwise ring stays one. */
export const flippedAll = (polygon: Polygon): Point[] => reversed(polygon).map(flipped);

/** The ring where a placement puts it, counter-clockwise again when flipped (side k is then side n − 1 − k of the unflipped ring). */
export function placedAll(polygon: Polygon, at: Placement): Point[] {
  return (at.flipped ? reversed(polygon) : polygon).map((p) => placed(p, at));
}
