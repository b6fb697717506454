import { mergeRanges, type Range } from './shift-sweep.ts';

/** A simple polygon on the wall, mm. */
export type WallOutline = readonly (readonly [x: number, y: number])[];

/** Nearer than this counts as touching, which is allowed; mm. */
const touchMm = 1e-6;

/**
 * Shifts of the whole layout along the wall (mm, closed ranges) that keep every outline between the wall's ends and no nearer to an
 * obstruction than its clearance. Exact for any simple polygons: they are cut into convex pieces, and the shifts at which two convex
 * pieces come nearer than c are one open range, whose ends are where a corner of one stands c off a corner or side of the other.
 * Heights are not looked at: the layout stays as high as it is.
 */
export function allowedShifts(
  outlines: readonly WallOutline[],
  wallWidthMm: number,
  obstructions: readonly { outlineMm: WallOutline; clearanceMm: number }[],
): Range[] {
  if (outlines.length === 0) return [];
  const frames = outlines.flatMap(convexPieces).map(piece);
  const left = -Math.min(...frames.map((f) => f.left));
  const right = wallWidthMm - Math.max(...frames.map((f) => f.right));
  if (right < left - touchMm) return [];

  const blocked: Range[] = [];
  for (const { outlineMm, clearanceMm } of obstructions) {
    for (const obstacle of convexPieces(outlineMm).map(piece)) {
      for (const frame of frames) {
        const range = tooNear(frame, obstacle, clearanceMm);
        if (range) blocked.push(range);
      }
    }
  }
  const end = Math.max(left, right);
  const allowed: Range[] = [];
  let from = left;
  for (const [start, stop] of mergeOpen(blocked)) {
    if (stop <= left || start >= end) continue;
    if (start >= from) allowed.push([from, start]);
    from = Math.max(from, stop);
  }
  if (from <= end) allowed.push([from, end]);
  return mergeRanges(allowed);
}

interface Piece {
  points: WallOutline;
  left: number;
  right: number;
  bottom: number;
  top: number;
}

function piece(points: WallOutline): Piece {
  const xs = points.map((p) => p[0]);
  const ys = points.map((p) => p[1]);
  return { points, left: Math.min(...xs), right: Math.max(...xs), bottom: Math.min(...ys), top: Math.max(...ys) };
}

/** Joins open ranges that overlap; ranges that only touch leave the one shift between them free. */
function mergeOpen(ranges: readonly Range[]): Range[] {
  const merged: [number, number][] = [];
  for (const [from, to] of [...ranges].sort((a, b) => a[0] - b[0])) {
    const last = merged[merged.length - 1];
    if (last && from < last[1]) last[1] = Math.max(last[1], to);
    else merged.push([from, to]);
  }
  return merged;
}

/** Open range of shifts of a convex frame that bring it nearer than `clearance` to a convex obstacle; null when none do. */
function tooNear(frame: Piece, obstacle: Piece, clearance: number): Range | null {
  if (frame.bottom - obstacle.top >= clearance - touchMm || obstacle.bottom - frame.top >= clearance - touchMm) return null;
  let from = Infinity;
  let to = -Infinity;
  const take = (x: number): void => {
    from = Math.min(from, x);
    to = Math.max(to, x);
  };
  // The shifts are the points of the level line through the origin that lie within `clearance` of obstacle minus frame; its sides are
  // sides of one less corners of the other.
  const { points: f } = frame;
  const { points: o } = obstacle;
  for (let i = 0; i < f.length; i++) {
    const [fx, fy] = f[i] as readonly [number, number];
    const [gx, gy] = f[(i + 1) % f.length] as readonly [number, number];
    for (let j = 0; j < o.length; j++) {
      const [ox, oy] = o[j] as readonly [number, number];
      const [px, py] = o[(j + 1) % o.length] as readonly [number, number];
      meetLevel(ox - fx, oy - fy, px - fx, py - fy, clearance, take);
      meetLevel(ox - fx, oy - fy, ox - gx, oy - gy, clearance, take);
    }
  }
  return to - from > 2 * touchMm ? [from + touchMm, to - touchMm] : null;
}

/** Takes the ends of where the level line y = 0 runs within `radius` of a side from (ax, ay) to (bx, by). */
function meetLevel(ax: number, ay: number, bx: number, by: number, radius: number, take: (x: number) => void): void {
  if (Math.abs(ay) <= radius) {
    const half = Math.sqrt(radius ** 2 - ay ** 2);
    take(ax - half);
    take(ax + half);
  }
  const length = Math.hypot(bx - ax, by - ay);
  if (length === 0) return;
  const nx = (-(by - ay) / length) * radius;
  const ny = ((bx - ax) / length) * radius;
  for (const side of radius === 0 ? [1] : [1, -1]) {
    const y0 = ay + side * ny;
    const y1 = by + side * ny;
    if (y0 === y1 || (y0 < 0 && y1 < 0) || (y0 > 0 && y1 > 0)) continue;
    take(ax + side * nx + ((bx - ax) * y0) / (y0 - y1));
  }
}

/** A simple polygon as convex pieces: itself, or triangles by clipping ears. One that crosses itself so that no ear is left becomes its box, to be safe. */
export function convexPieces(outline: WallOutline): WallOutline[] {
  const turned = area(outline) < 0 ? [...outline].reverse() : [...outline];
  const corners = turned.filter((p, i) => {
    const next = turned[(i + 1) % turned.length];
    return next === undefined || p[0] !== next[0] || p[1] !== next[1];
  });
  if (corners.every((_, i) => turn(corners, i - 1, i, i + 1) >= 0) && turnsOnce(corners)) return [corners];
  const pieces: WallOutline[] = [];
  const rest = [...corners];
  while (rest.length > 3) {
    const ear = rest.findIndex((_, i) => isEar(rest, i));
    if (ear < 0) return [boxOf(outline)];
    pieces.push([at(rest, ear - 1), at(rest, ear), at(rest, ear + 1)]);
    rest.splice(ear, 1);
  }
  return [...pieces, rest];
}

function boxOf(outline: WallOutline): WallOutline {
  const { left, right, bottom, top } = piece(outline);
  return [[left, bottom], [right, bottom], [right, top], [left, top]];
}

const at = (points: WallOutline, i: number): readonly [number, number] =>
  points[(i + points.length) % points.length] as readonly [number, number];

function area(points: WallOutline): number {
  return points.reduce((sum, p, i) => sum + p[0] * at(points, i + 1)[1] - at(points, i + 1)[0] * p[1], 0) / 2;
}

/** Twice the area of the triangle of three corners; positive for a left turn. */
function turn(points: WallOutline, i: number, j: number, k: number): number {
  const [a, b, c] = [at(points, i), at(points, j), at(points, k)];
  return (b[0] - a[0]) * (c[1] - b[1]) - (b[1] - a[1]) * (c[0] - b[0]);
}

/** Whether a polygon of left turns goes round just once, as a star does not. */
function turnsOnce(points: WallOutline): boolean {
  const total = points.reduce((sum, _, i) => {
    const [a, b, c] = [at(points, i - 1), at(points, i), at(points, i + 1)];
    const before = Math.atan2(b[1] - a[1], b[0] - a[0]);
    const after = Math.atan2(c[1] - b[1], c[0] - b[0]);
    return sum + Math.atan2(Math.sin(after - before), Math.cos(after - before));
  }, 0);
  return Math.abs(total - 2 * Math.PI) < 1e-6;
}

function isEar(points: WallOutline, i: number): boolean {
  const bend = turn(points, i - 1, i, i + 1);
  if (bend < 0) return false;
  const [a, b, c] = [at(points, i - 1), at(points, i), at(points, i + 1)];
  const left = (p: readonly [number, number], q: readonly [number, number], r: readonly [number, number]) =>
    (q[0] - p[0]) * (r[1] - p[1]) - (q[1] - p[1]) * (r[0] - p[0]) >= 0;
  return points.every((p) => p === a || p === b || p === c || !(left(a, b, p) && left(b, c, p) && left(c, a, p)));
}
