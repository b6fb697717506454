import { homographyFrom, type Homography } from './homography.ts';
import { cameraFromLines } from './camera-from-lines.ts';
import { usualSureness, type Knowledge, type Sureness } from './knowledge.ts';
import { covarianceOf, leastSquares } from './least-squares.ts';
import type { LensTerm } from './lens.ts';
import { focalOf, observationsOf, pinholeSeen, usualFocal, type Observation } from './observations.ts';
import { asMap, asParameters, cameraSize, frameOf, lensAt, type CameraFrame } from './wall-camera.ts';

/** What became of the lens: fitted, or left out and why. */
export type LensVerdict = { state: 'fitted'; lambda: number; spread: number } | { state: 'left out'; why: 'too little to tell it by' | 'too unsure' };

export interface Fit {
  /** From the wall (mm) to the photo as a perfect lens would show it (px), and the lens; null where none was fitted. */
  wallToPhoto: Homography;
  lens: LensTerm | null;
  verdict: LensVerdict;
  frame: CameraFrame;
  /** Nine parameters (and the focal length's logarithm, where it took part), and their covariance. */
  camera: number[];
  covariance: number[][];
  observations: Observation[];
  sure: Sureness;
  /** Sum of squared misses in standard deviations, and how many of them are free. */
  chiSquared: number;
  freedom: number;
  /** The same of marks, lines and lengths alone: straight edges tell of the lens, not of measures. */
  measures: { chiSquared: number; freedom: number };
}

/**
 * A lens is worth taking out when its term is told much better than by supposing none (to this part of what is supposed),
 * or when it is four times its own spread. A term past `widest` is none that a lens for walls has.
 */
const sureTerm = 0.4;
const widest = { barrel: -0.8, pincushion: 0.3 };

/**
 * How far off nought the term of a lens nobody fitted is likely to be (from memory): a phone's main camera straightens its
 * pictures to about half a per cent at the corners, its wide one to two; of an unknown camera one per cent is supposed.
 */
export function unfittedLens(focal35Mm: number | undefined): number {
  if (focal35Mm === undefined) return 0.01;
  return focal35Mm < 20 ? 0.02 : 0.005;
}

/**
 * The camera that agrees best with all that is known of a photo. Four or more marks: normalised direct linear transform,
 * then Levenberg–Marquardt on the distances on the photo, each by its own sureness. Fewer: plumb and level lines with
 * lengths. The lens's term is fitted where there is more than enough to tell it by, and given up where it stays unsure.
 * Returns null where what is known leaves the camera open. Judge marks with `marksTrouble` first.
 */
export function fitPhoto(k: Knowledge, photo: { widthPx: number; heightPx: number }, sure: Sureness = usualSureness(photo), lensToo: boolean | 'by itself' = 'by itself'): Fit | null {
  const start = firstCamera(k, photo);
  if (!start) return null;
  const { frame, camera } = start;
  const observations = observationsOf(k, frame, camera, sure);
  const pinhole = k.marks.length < 4;
  if (pinhole) {
    const told = k.focal35Mm === undefined ? null : focalOf(k.focal35Mm);
    observations.push(pinholeSeen(told));
    camera.push(Math.log(told ?? usualFocal));
  }
  const brings = observations.reduce((s, o) => s + o.brings, 0);
  const needs = cameraSize - 1 + (pinhole ? 1 : 0);
  const fromEdges = k.straightEdges.reduce((s, e) => s + e.length - 2, 0);
  if (brings - fromEdges < needs) return null;

  const misses = (c: readonly number[]) => observations.flatMap((o) => o.misses(c));
  const plain = solved(misses, camera, [lensAt], unfittedLens(k.focal35Mm));
  if (!plain) return null;
  const enough = lensToo !== false && (k.marks.length >= 5 || fromEdges > 0);
  let verdict: LensVerdict = { state: 'left out', why: 'too little to tell it by' };
  let best = { ...plain, freedom: brings - needs };
  if (enough && brings - needs >= 1) {
    const bent = solved(misses, plain.camera, [], 0);
    const freedom = brings - needs - 1;
    const lambda = bent?.camera[lensAt] ?? NaN;
    const spread = bent ? Math.sqrt(bent.covariance[lensAt]![lensAt]!) * (freedom > 0 ? Math.max(1, Math.sqrt(bent.sum / freedom)) : 1) : NaN;
    if (bent && lambda > widest.barrel && lambda < widest.pincushion && spread > 0 && (lensToo === true || spread < sureTerm * unfittedLens(k.focal35Mm) || spread < Math.abs(lambda) / 4)) {
      verdict = { state: 'fitted', lambda, spread };
      withOneTermOnly(bent.covariance, lambda);
      best = { ...bent, freedom };
    } else verdict = { state: 'left out', why: 'too unsure' };
  }
  if (!Number.isFinite(best.sum)) return null;
  const { wallToPhoto, lens } = asMap(frame, best.camera);
  const measured = observations.filter((o) => o.what !== 'edge').flatMap((o) => o.misses(best.camera));
  return {
    wallToPhoto, lens: verdict.state === 'fitted' ? lens : null, verdict, frame, camera: best.camera, observations, sure,
    chiSquared: best.sum, freedom: best.freedom, covariance: best.covariance,
    measures: { chiSquared: measured.reduce((s, m) => s + m * m, 0), freedom: brings - fromEdges - needs - (verdict.state === 'fitted' && fromEdges === 0 ? 1 : 0) },
  };
}

function solved(misses: (c: readonly number[]) => number[], from: readonly number[], held: readonly number[], unfitted: number) {
  const { parameters, sum, jacobian } = leastSquares(misses, from, held);
  const free = parameters.map((_, i) => i).filter((i) => !held.includes(i));
  const covariance = covarianceOf(jacobian, free, parameters.length);
  if (!covariance) return null;
  if (held.includes(lensAt)) withUnfittedLens(covariance, jacobian, free, unfitted);
  return { camera: parameters, sum, covariance };
}

/** A single term describes a lens that bends much only to about this part of itself (judged on lenses of two terms). */
const oneTerm = 0.05;

/** Makes the covariance wider along the way in which the fit would follow another term. */
function withOneTermOnly(covariance: number[][], lambda: number): void {
  const own = covariance[lensAt]![lensAt]!;
  const way = covariance.map((row) => row[lensAt]! / own);
  const variance = (oneTerm * lambda) ** 2;
  covariance.forEach((row, i) => row.forEach((_, k) => (row[k]! += way[i]! * way[k]! * variance)));
}

/**
 * A lens left out is still somewhere about nought: its likely size enters the covariance by the amount it would have moved
 * the other parameters (a "consider" parameter: Schmidt 1966; Tapley, Schutz and Born, "Statistical Orbit Determination", ch. 6).
 */
function withUnfittedLens(covariance: number[][], jacobian: readonly (readonly number[])[], free: readonly number[], spread: number): void {
  const pull = free.map((i) => -free.reduce((s, k) => s + covariance[i]![k]! * jacobian.reduce((t, row) => t + row[k]! * row[lensAt]!, 0), 0));
  const variance = spread ** 2;
  free.forEach((i, a) => {
    free.forEach((k, b) => (covariance[i]![k]! += pull[a]! * pull[b]! * variance));
    covariance[i]![lensAt] = covariance[lensAt]![i] = pull[a]! * variance;
  });
  covariance[lensAt]![lensAt] = variance;
}

function firstCamera(k: Knowledge, photo: { widthPx: number; heightPx: number }): { frame: CameraFrame; camera: number[] } | null {
  const first = k.marks[0];
  if (!first) return null;
  if (k.marks.length >= 4) {
    const middle = { x: mean(k.marks.map((m) => m.mm.x)), y: mean(k.marks.map((m) => m.mm.y)) };
    const frame = frameOf(photo, middle, mean(k.marks.map((m) => Math.hypot(m.mm.x - middle.x, m.mm.y - middle.y))) || 1);
    const camera = asParameters(frame, homographyFrom(k.marks.map((m) => ({ from: m.mm, to: m.px }))));
    return camera.every(Number.isFinite) ? { frame, camera } : null;
  }
  const frame = frameOf(photo, first.mm, Math.max(...k.lengths.map((l) => l.mm), ...k.marks.map((m) => Math.hypot(m.mm.x - first.mm.x, m.mm.y - first.mm.y)), 1));
  const camera = cameraFromLines(k, frame, k.focal35Mm === undefined ? null : focalOf(k.focal35Mm));
  return camera && camera.every(Number.isFinite) ? { frame, camera } : null;
}

function mean(values: readonly number[]): number {
  return values.reduce((s, v) => s + v, 0) / values.length;
}
