/** A point or a vector in a plane, mm; x to the right, y up. */
export interface Point {
  x: number;
  y: number;
}

export interface Segment {
  from: Point;
  to: Point;
}

/** Where a thing stands on a wall: flipped first (left for right), then turned counter-clockwise, then moved. */
export interface Placement {
  xMm: number;
  yMm: number;
  turnRad: number;
  flipped: boolean;
}

export const distance = (a: Point, b: Point): number => Math.hypot(b.x - a.x, b.y - a.y);
export const middle = (a: Point, b: Point): Point => ({ x: (a.x + b.x) / 2, y: (a.y + b.y) / 2 });
/** The z part of (b − a) × (c − a): above 0 where c lies to the left of the way from a to b. */
export const turnOf = (a: Point, b: Point, c: Point): number => (b.x - a.x) * (c.y - a.y) - (b.y - a.y) * (c.x - a.x);

export function translated(point: Point, dx: number, dy: number): Point {
  return { x: point.x + dx, y: point.y + dy };
}

/** Counter-clockwise about the origin. */
export function turned(point: Point, rad: number): Point {
  const cos = Math.cos(rad);
  const sin = Math.sin(rad);
  return { x: point.x * cos - point.y * sin, y: point.x * sin + point.y * cos };
}

/** Left for right about the upright through the origin. */
export const flipped = (point: Point): Point => ({ x: point.x === 0 ? 0 : -point.x, y: point.y });

/** A point of the thing's own plane, where the placement puts it. */
export function placed(point: Point, at: Placement): Point {
  const own = at.flipped ? flipped(point) : point;
  return translated(turned(own, at.turnRad), at.xMm, at.yMm);
}

/** The point of the thing's own plane that a placement puts at `point`. */
export function unplaced(point: Point, at: Placement): Point {
  const own = turned(translated(point, -at.xMm, -at.yMm), -at.turnRad);
  return at.flipped ? flipped(own) : own;
}

/** The point of a segment nearest to `point`. */
export function nearestOn(segment: Segment, point: Point): Point {
  const { from, to } = segment;
  const dx = to.x - from.x;
  const dy = to.y - from.y;
  const squared = dx * dx + dy * dy;
  if (squared === 0) return from;
  const share = Math.min(1, Math.max(0, ((point.x - from.x) * dx + (point.y - from.y) * dy) / squared));
  return { x: from.x + share * dx, y: from.y + share * dy };
}

/** Whether two segments cross inside both, not merely touch. */
export function segmentsCross(a: Segment, b: Segment): boolean {
  const sides = [turnOf(a.from, a.to, b.from), turnOf(a.from, a.to, b.to), turnOf(b.from, b.to, a.from), turnOf(b.from, b.to, a.to)] as const;
  return sides[0] * sides[1] < 0 && sides[2] * sides[3] < 0;
}
