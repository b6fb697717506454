import { Matrix, SingularValueDecomposition, inverse } from 'ml-matrix';
import type { z } from 'zod';
import type { Point as PointShape } from './mark.ts';

export type Point = z.infer<typeof PointShape>;

/** A projective map of the plane, 3 × 3 by rows, scaled so that the last entry is 1 where it is not nought. */
export type Homography = readonly [number, number, number, number, number, number, number, number, number];

export interface PointPair {
  from: Point;
  to: Point;
}

/**
 * The homography that carries each `from` to its `to`: exact for four pairs, least squares (algebraic) for more.
 * Direct linear transform over normalised points (Hartley, "In defense of the eight-point algorithm", 1997:
 * centroid at the origin, mean distance √2), solved by the singular vector of the smallest singular value.
 * Throws RangeError for fewer than four pairs; whether the pairs are fit to use is the business of `marksTrouble`.
 */
export function homographyFrom(pairs: readonly PointPair[]): Homography {
  if (pairs.length < 4) throw new RangeError(`A homography needs four pairs of points; there are ${pairs.length}.`);
  const from = normalising(pairs.map((p) => p.from));
  const to = normalising(pairs.map((p) => p.to));
  const rows: number[][] = pairs.flatMap((pair) => {
    const { x, y } = from.shift(pair.from);
    const { x: u, y: v } = to.shift(pair.to);
    return [
      [x, y, 1, 0, 0, 0, -u * x, -u * y, -u],
      [0, 0, 0, x, y, 1, -v * x, -v * y, -v],
    ];
  });
  // Eight equations leave the ninth singular vector out of a thin decomposition: a row of noughts keeps it.
  if (rows.length < 9) rows.push(new Array<number>(9).fill(0));
  const svd = new SingularValueDecomposition(new Matrix(rows));
  const smallest = svd.diagonal.indexOf(Math.min(...svd.diagonal));
  const shifted = Matrix.from1DArray(3, 3, svd.rightSingularVectors.getColumn(smallest));
  return scaled(to.back.mmul(shifted).mmul(from.forth));
}

/** Where the map carries a point. Not finite for a point on the map's horizon. */
export function applyHomography(h: Homography, p: Point): Point {
  const w = h[6] * p.x + h[7] * p.y + h[8];
  return { x: (h[0] * p.x + h[1] * p.y + h[2]) / w, y: (h[3] * p.x + h[4] * p.y + h[5]) / w };
}

/** The map the other way. Throws where there is none (the map flattens the plane). */
export function invertHomography(h: Homography): Homography {
  return scaled(inverse(Matrix.from1DArray(3, 3, [...h])));
}

/** The third homogeneous coordinate at a point: its sign says on which side of the horizon the point lies. */
export function depthSign(h: Homography, p: Point): number {
  return h[6] * p.x + h[7] * p.y + h[8];
}

/**
 * How much the map magnifies lengths about a point: the square root of the area factor |det J| (to-units per from-unit).
 * For a homography det J = det H / w³.
 */
export function magnification(h: Homography, p: Point): number {
  const w = depthSign(h, p);
  const det =
    h[0] * (h[4] * h[8] - h[5] * h[7]) - h[1] * (h[3] * h[8] - h[5] * h[6]) + h[2] * (h[3] * h[7] - h[4] * h[6]);
  return Math.sqrt(Math.abs(det / (w * w * w)));
}

function scaled(m: Matrix): Homography {
  const flat = m.to1DArray();
  const largest = Math.max(...flat.map(Math.abs));
  const last = flat[8] ?? 0;
  const by = Math.abs(last) > largest * 1e-12 ? last : largest;
  return flat.map((v) => v / by) as unknown as Homography;
}

/** The similarity that brings points about the origin at a mean distance of √2, and the one that takes them back. */
function normalising(points: readonly Point[]) {
  const cx = mean(points.map((p) => p.x));
  const cy = mean(points.map((p) => p.y));
  const spread = mean(points.map((p) => Math.hypot(p.x - cx, p.y - cy)));
  const s = spread > 0 ? Math.SQRT2 / spread : 1;
  return {
    shift: (p: Point): Point => ({ x: (p.x - cx) * s, y: (p.y - cy) * s }),
    forth: new Matrix([[s, 0, -s * cx], [0, s, -s * cy], [0, 0, 1]]),
    back: new Matrix([[1 / s, 0, cx], [0, 1 / s, cy], [0, 0, 1]]),
  };
}

function mean(values: readonly number[]): number {
  return values.reduce((sum, v) => sum + v, 0) / values.length;
}
