import type { Homography, Point } from './homography.ts';
import { cornerPercent, lensOf, stretch, type LensTerm } from './lens.ts';

/**
 * How numbers are scaled while a photo is fitted: the picture about its centre by half its diagonal, the wall about
 * `middle` by `scaleMm`. A camera is then nine numbers of the order of one: the first eight entries of the map from wall
 * to picture by rows (the ninth is 1), and the lens's term.
 */
export interface CameraFrame {
  centre: Point;
  radiusPx: number;
  middle: Point;
  scaleMm: number;
}

/** Index of the lens's term among the parameters, and how many parameters a camera has. */
export const lensAt = 8;
export const cameraSize = 9;

export function frameOf(photo: { widthPx: number; heightPx: number }, middle: Point, scaleMm: number): CameraFrame {
  const { centre, radiusPx } = lensOf(photo, 0);
  return { centre, radiusPx, middle, scaleMm };
}

/** The photo's point (px) of a wall point (mm); not a number behind the camera. */
export function project(f: CameraFrame, c: readonly number[], wall: Point): Point {
  const x = (wall.x - f.middle.x) / f.scaleMm;
  const y = (wall.y - f.middle.y) / f.scaleMm;
  const w = c[6]! * x + c[7]! * y + 1;
  if (!(w > 0)) return { x: NaN, y: NaN };
  const u = (c[0]! * x + c[1]! * y + c[2]!) / w;
  const v = (c[3]! * x + c[4]! * y + c[5]!) / w;
  const by = stretch(c[lensAt]!, u * u + v * v) * f.radiusPx;
  return { x: f.centre.x + u * by, y: f.centre.y + v * by };
}

/** The photo's point without distortion, in the frame's own units. */
export function straight(f: CameraFrame, lambda: number, px: Point): Point {
  const x = (px.x - f.centre.x) / f.radiusPx;
  const y = (px.y - f.centre.y) / f.radiusPx;
  const by = 1 / (1 + lambda * (x * x + y * y));
  return { x: x * by, y: y * by };
}

/** The wall point (mm) that a photo's point (px) shows. */
export function unproject(f: CameraFrame, c: readonly number[], px: Point): Point {
  const { x: u, y: v } = straight(f, c[lensAt]!, px);
  // (c0 − u·c6)·x + (c1 − u·c7)·y = u − c2, and the same for v.
  const [a, b, d, e] = [c[0]! - u * c[6]!, c[1]! - u * c[7]!, c[3]! - v * c[6]!, c[4]! - v * c[7]!];
  const det = a * e - b * d;
  const [p, q] = [u - c[2]!, v - c[5]!];
  return { x: f.middle.x + (f.scaleMm * (p * e - b * q)) / det, y: f.middle.y + (f.scaleMm * (a * q - d * p)) / det };
}

/** Derivative of `project` by the wall point, px per mm: [∂x/∂X, ∂x/∂Y, ∂y/∂X, ∂y/∂Y], by central differences over 2 mm. */
export function slopeOnWall(f: CameraFrame, c: readonly number[], wall: Point): [number, number, number, number] {
  const r = project(f, c, { x: wall.x + 1, y: wall.y });
  const l = project(f, c, { x: wall.x - 1, y: wall.y });
  const t = project(f, c, { x: wall.x, y: wall.y + 1 });
  const b = project(f, c, { x: wall.x, y: wall.y - 1 });
  return [(r.x - l.x) / 2, (t.x - b.x) / 2, (r.y - l.y) / 2, (t.y - b.y) / 2];
}

/** Photo px per mm of the wall about a point: the square root of the area factor. */
export function pxPerMmAt(f: CameraFrame, c: readonly number[], wall: Point): number {
  const [a, b, d, e] = slopeOnWall(f, c, wall);
  return Math.sqrt(Math.abs(a * e - b * d));
}

/** The camera as a map from the wall (mm) to the photo as a perfect lens would show it (px), and its lens. */
export function asMap(f: CameraFrame, c: readonly number[]): { wallToPhoto: Homography; lens: LensTerm } {
  const [h0, h1, h2, h3, h4, h5, h6, h7] = c as [number, number, number, number, number, number, number, number];
  const s = 1 / f.scaleMm;
  const row = (a: number, b: number, k: number): [number, number, number] => [a * s, b * s, k - (a * f.middle.x + b * f.middle.y) * s];
  const [x, y, w] = [row(h0, h1, h2), row(h3, h4, h5), row(h6, h7, 1)];
  const onto = (part: [number, number, number], centre: number) => part.map((v, i) => v * f.radiusPx + centre * w[i]!) as [number, number, number];
  return {
    wallToPhoto: [...onto(x, f.centre.x), ...onto(y, f.centre.y), ...w],
    lens: { lambda: c[lensAt]!, centre: f.centre, radiusPx: f.radiusPx },
  };
}

/** Camera parameters of a map from the wall (mm) to the photo (px), without a lens term. */
export function asParameters(f: CameraFrame, h: Homography): number[] {
  const [m, s] = [f.middle, f.scaleMm];
  const row = (a: number, b: number, k: number): [number, number, number] => [a * s, b * s, a * m.x + b * m.y + k];
  const [x, y, w] = [row(h[0], h[1], h[2]), row(h[3], h[4], h[5]), row(h[6], h[7], h[8])];
  const scaled = (part: [number, number, number], centre: number) => part.map((v, i) => (v - centre * w[i]!) / f.radiusPx / w[2]);
  return [...scaled(x, f.centre.x), ...scaled(y, f.centre.y), w[0] / w[2], w[1] / w[2], 0];
}

/** A lens in words: which way it bends, and by how much at the corners. */
export function lensWords(lambda: number): string {
  const percent = Math.abs(cornerPercent(lambda));
  if (percent < 0.05) return 'The lens bends straight lines by less than 0.05 % at the corners.';
  return `The lens bends straight lines ${lambda < 0 ? 'outwards like a barrel' : 'inwards like a pincushion'}: the corners are out by ${percent.toFixed(percent < 1 ? 2 : 1)} %; that is taken out.`;
}
