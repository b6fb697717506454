import { distance, nearestOn, type Point } from '../geometry/point.ts';
import { sidesOf, type Polygon } from '../geometry/polygon.ts';

/** A point that a measure is taken from or to. */
export interface MeasuredPoint {
  at: Point;
  /** What of the drawing it lies on. */
  on: 'corner' | 'edge' | 'free';
  /** Direction of the edge it lies on, radians, for edges only. */
  alongRad: number | null;
}

/** A measure between two points, mm; `square` tells that it is taken square between two parallel edges. */
export interface Measured {
  from: Point;
  to: Point;
  mm: number;
  acrossMm: number;
  upMm: number;
  square: boolean;
}

const parallelRad = 1e-6;

/** The corner within reach that is nearest, else the nearest point of an edge within reach, else the place itself. */
export function pickPoint(outlines: readonly Polygon[], at: Point, reachMm: number): MeasuredPoint {
  let corner: { at: Point; far: number } | null = null;
  let edge: { at: Point; far: number; alongRad: number } | null = null;
  for (const outline of outlines) {
    for (const side of sidesOf(outline)) {
      const toCorner = distance(side.from, at);
      if (toCorner <= reachMm && toCorner < (corner?.far ?? Infinity)) corner = { at: side.from, far: toCorner };
      const near = nearestOn(side, at);
      const toEdge = distance(near, at);
      if (toEdge <= reachMm && toEdge < (edge?.far ?? Infinity)) edge = { at: near, far: toEdge, alongRad: Math.atan2(side.to.y - side.from.y, side.to.x - side.from.x) };
    }
  }
  if (corner) return { at: corner.at, on: 'corner', alongRad: null };
  if (edge) return { at: edge.at, on: 'edge', alongRad: edge.alongRad };
  return { at, on: 'free', alongRad: null };
}

/** The measure from one picked point to another. Between parallel edges, or from an edge to a point, it is taken square to the edge. */
export function measured(a: MeasuredPoint, b: MeasuredPoint): Measured {
  const along = a.alongRad ?? b.alongRad;
  const parallel = a.alongRad !== null && b.alongRad !== null && Math.abs(Math.sin(a.alongRad - b.alongRad)) < parallelRad;
  const square = along !== null && (parallel || (a.on === 'edge') !== (b.on === 'edge'));
  let from = a.at;
  let to = b.at;
  if (square) {
    // The end on an edge slides along it to the foot of the other end.
    const foot = (p: Point, on: Point): Point => {
      const s = (p.x - on.x) * Math.cos(along) + (p.y - on.y) * Math.sin(along);
      return { x: on.x + s * Math.cos(along), y: on.y + s * Math.sin(along) };
    };
    if (b.alongRad !== null) to = foot(from, to);
    else from = foot(to, from);
  }
  return { from, to, mm: distance(from, to), acrossMm: Math.abs(to.x - from.x), upMm: Math.abs(to.y - from.y), square };
}
