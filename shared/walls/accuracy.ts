import type { Fit } from './fit.ts';
import type { Point } from './homography.ts';
import { cameraSize, project, pxPerMmAt, slopeOnWall, unproject } from './wall-camera.ts';

type Row = number[];

export interface WallRectangle {
  leftMm: number;
  bottomMm: number;
  widthMm: number;
  heightMm: number;
}

/** Expected errors over a rectangle of wall, mm: rows from the foot up, each from the left; null where the photo shows nothing. */
export interface ErrorGrid {
  leftMm: number;
  bottomMm: number;
  stepXMm: number;
  stepYMm: number;
  columns: number;
  rows: number;
  values: (number | null)[];
}

export interface Accuracy {
  grid: ErrorGrid;
  /** The largest value of the grid and where it is; the value that half the grid stays below. */
  worstMm: number;
  worstAt: Point;
  middleMm: number;
}

/**
 * Expected error of the straightened picture at a wall point, mm: nineteen times in twenty the picture is out by less.
 * It is twice the root of the summed variances in x and y (twice the distance root mean square, the navigator's 2 drms:
 * 95.4 % for an error in one direction, 98.2 % for one alike in all), carried from the marks' own sureness through the
 * fit, and scaled by how well the marks agree. Null behind the camera.
 */
export function expectedErrorMm(fit: Fit, wall: Point, covariance: readonly (readonly number[])[] = scaledCovariance(fit)): number | null {
  const moved = movedBy(fit, wall);
  return moved && twiceSpread(moved, covariance);
}

/** The expected error over a rectangle of wall: at its rim and in between. */
export function accuracyOver(fit: Fit, photo: { widthPx: number; heightPx: number }, r: WallRectangle): Accuracy | null {
  const covariance = scaledCovariance(fit);
  const grid = gridOver(r);
  const values = pointsOf(grid).map((p) => (isSeen(fit, photo, p) ? expectedErrorMm(fit, p, covariance) : null));
  return summed({ ...grid, values });
}

/** A length drawn over the straightened picture against its measured length. */
export interface LengthCheck {
  drawnMm: number;
  /** Drawn less typed. */
  differenceMm: number;
  /** What the difference may come to by the fit and by drawing, nineteen times in twenty. */
  expectedMm: number;
  agrees: boolean;
}

/** Compares the line from `a` to `b` on the wall (mm, as read from the straightened picture) with the length typed for it. */
export function checkLength(fit: Fit, a: Point, b: Point, typedMm: number): LengthCheck {
  const drawnMm = Math.hypot(b.x - a.x, b.y - a.y);
  const [ma, mb] = [movedBy(fit, a), movedBy(fit, b)];
  let variance = Infinity;
  if (ma && mb && drawnMm > 0) {
    const n = [(b.x - a.x) / drawnMm, (b.y - a.y) / drawnMm] as const;
    const g = ma[0].map((_, i) => n[0] * (mb[0][i]! - ma[0][i]!) + n[1] * (mb[1][i]! - ma[1][i]!));
    const read = [a, b].reduce((s, p) => s + (fit.sure.px / pxPerMmAt(fit.frame, fit.camera, p)) ** 2, 0);
    variance = times(g, scaledCovariance(fit), g) + read + fit.sure.mm ** 2;
  }
  const differenceMm = drawnMm - typedMm;
  const expectedMm = 2 * Math.sqrt(variance);
  return { drawnMm, differenceMm, expectedMm, agrees: Math.abs(differenceMm) <= expectedMm };
}

/** A check in words; `tell` writes a length in the reader's units. */
export function checkWords(check: LengthCheck, tell: (mm: number) => string): string {
  const off = Math.abs(check.differenceMm);
  const which = check.differenceMm > 0 ? 'longer' : 'shorter';
  if (check.agrees) return `Drawn ${tell(check.drawnMm)}: ${tell(off)} ${which} than measured, within the ${tell(check.expectedMm)} to be expected.`;
  return `Drawn ${tell(check.drawnMm)}: ${tell(off)} ${which} than measured, more than the ${tell(check.expectedMm)} to be expected. Check the measures of the marks, and mark one more point near here.`;
}

/** What a mark at a wall point would be out by, seen from the camera: two rows of slopes, mm per parameter; null behind the camera. */
export function movedBy(fit: Fit, wall: Point): [Row, Row] | null {
  const slopes = slopesAt(fit, wall);
  if (!slopes) return null;
  const [a, b, c, d] = slopeOnWall(fit.frame, fit.camera, wall);
  const det = a * d - b * c;
  const [u, v] = slopes;
  // The wall point that a fixed point of the photo shows moves by −J⁻¹ times what the photo point would.
  const x = u.map((_, i) => -(d * u[i]! - b * v[i]!) / det);
  const y = u.map((_, i) => -(a * v[i]! - c * u[i]!) / det);
  return [...x, ...y].every(Number.isFinite) ? [x, y] : null;
}

/** Derivatives of the photo point (px) of a wall point by each of the camera's nine parameters. */
export function slopesAt(fit: Fit, wall: Point): [Row, Row] | null {
  const columns = Array.from({ length: cameraSize }, (_, i) => {
    const step = 1e-6;
    const at = (by: number) => project(fit.frame, fit.camera.map((v, k) => (k === i ? v + by : v)), wall);
    const [p, q] = [at(step), at(-step)];
    return { x: (p.x - q.x) / (2 * step), y: (p.y - q.y) / (2 * step) };
  });
  const rows: [Row, Row] = [columns.map((c) => c.x), columns.map((c) => c.y)];
  return rows.every((r) => r.every(Number.isFinite)) ? rows : null;
}

/** What was supposed of the marks' sureness counts as much as this many free residuals. */
const supposed = 4;

/**
 * The fit's covariance, scaled by how much worse or better than supposed the marks agree: the mean of what was supposed
 * and what the residuals say, each by its weight (the scaled inverse chi-squared rule for an unknown variance). What the
 * lens may be, where nobody fitted it, is no matter of the residuals and is not scaled below what was supposed.
 */
export function scaledCovariance(fit: Fit): number[][] {
  const by = (supposed + fit.chiSquared) / (supposed + fit.freedom);
  const scale = fit.verdict.state === 'fitted' ? by : Math.max(1, by);
  return fit.covariance.map((row) => row.map((v) => v * scale));
}

export function twiceSpread([x, y]: [Row, Row], covariance: readonly (readonly number[])[]): number {
  return 2 * Math.sqrt(Math.max(0, times(x, covariance, x) + times(y, covariance, y)));
}

/** aᵀ·C·b over the camera's own parameters. */
export function times(a: Row, c: readonly (readonly number[])[], b: Row): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) for (let k = 0; k < b.length; k++) sum += a[i]! * c[i]![k]! * b[k]!;
  return sum;
}

/** A grid over a rectangle with its rim included: about square steps, at most 16 of them. */
export function gridOver(r: WallRectangle): Omit<ErrorGrid, 'values'> {
  const step = Math.max(r.widthMm, r.heightMm) / 16;
  const columns = Math.max(2, Math.round(r.widthMm / step) + 1);
  const rows = Math.max(2, Math.round(r.heightMm / step) + 1);
  return { leftMm: r.leftMm, bottomMm: r.bottomMm, stepXMm: r.widthMm / (columns - 1), stepYMm: r.heightMm / (rows - 1), columns, rows };
}

export function pointsOf(g: Omit<ErrorGrid, 'values'>): Point[] {
  return Array.from({ length: g.columns * g.rows }, (_, i) => ({ x: g.leftMm + (i % g.columns) * g.stepXMm, y: g.bottomMm + Math.floor(i / g.columns) * g.stepYMm }));
}

/** Whether the photo shows a wall point, its rim widened by a part `over` of its size. */
export function isSeen(fit: Fit, photo: { widthPx: number; heightPx: number }, wall: Point, over = 0.05): boolean {
  const p = project(fit.frame, fit.camera, wall);
  return p.x >= -over * photo.widthPx && p.y >= -over * photo.heightPx && p.x <= (1 + over) * photo.widthPx && p.y <= (1 + over) * photo.heightPx;
}

/** How far a mark is from where the fit puts it: on the photo, and on the wall. */
export function residualsOf(fit: Fit, marks: readonly { px: Point; mm: Point }[]): { px: number; mm: number }[] {
  return marks.map((m) => {
    const p = project(fit.frame, fit.camera, m.mm);
    const w = unproject(fit.frame, fit.camera, m.px);
    return { px: Math.hypot(p.x - m.px.x, p.y - m.px.y), mm: Math.hypot(w.x - m.mm.x, w.y - m.mm.y) };
  });
}

function summed(grid: ErrorGrid): Accuracy | null {
  const points = pointsOf(grid);
  const told = grid.values.flatMap((v, i) => (v === null ? [] : [{ v, at: points[i]! }])).sort((a, b) => a.v - b.v);
  const last = told[told.length - 1];
  const middle = told[Math.floor(told.length / 2)];
  if (!last || !middle) return null;
  return { grid, worstMm: last.v, worstAt: last.at, middleMm: middle.v };
}
