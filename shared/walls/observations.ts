import type { Point } from './homography.ts';
import type { Knowledge, KnownLength, StraightEdge, Sureness, TrueLine } from './knowledge.ts';
import type { Mark } from './marks.ts';
import { cameraSize, lensAt, project, pxPerMmAt, straight, unproject, type CameraFrame } from './wall-camera.ts';

/** One thing known: how far a camera is from agreeing with it, in standard deviations. */
export interface Observation {
  what: 'mark' | 'edge' | 'line' | 'length' | 'pinhole';
  /** Place in the list it came from. */
  index: number;
  /** Degrees of freedom it brings. */
  brings: number;
  misses(camera: readonly number[]): number[];
}

/** Index of the logarithm of the focal length (in half diagonals) where it takes part. */
export const focalAt = cameraSize;

/** All that is known but the pinhole's own rule, weighed by `sure` at the camera `near` the truth. */
export function observationsOf(k: Knowledge, f: CameraFrame, near: readonly number[], sure: Sureness): Observation[] {
  return [
    ...k.marks.map((m, i) => markSeen(m, i, f, near, sure)),
    ...k.straightEdges.map((e, i) => edgeSeen(e, i, f, sure)),
    ...k.lines.map((l, i) => lineSeen(l, i, f, sure)),
    ...k.lengths.map((l, i) => lengthSeen(l, i, f, near, sure)),
  ];
}

/** A mark is out by what the hand and the tape are out together. */
function markSeen(m: Mark, index: number, f: CameraFrame, near: readonly number[], sure: Sureness): Observation {
  const weight = 1 / spreadPx(pxPerMmAt(f, near, m.mm), sure);
  return {
    what: 'mark', index, brings: 2,
    misses(c) {
      const p = project(f, c, m.mm);
      return [(p.x - m.px.x) * weight, (p.y - m.px.y) * weight];
    },
  };
}

/** Standard deviation of a mark, px, where the photo shows the wall at `pxPerMm`. */
export function spreadPx(pxPerMm: number, sure: Sureness): number {
  return Math.hypot(sure.px, Number.isFinite(pxPerMm) ? sure.mm * pxPerMm : 0);
}

/** Points of a straight edge, without the lens, must lie on their own best line (total least squares). */
function edgeSeen(points: StraightEdge, index: number, f: CameraFrame, sure: Sureness): Observation {
  return {
    what: 'edge', index, brings: points.length - 2,
    misses(c) {
      const lambda = c[lensAt]!;
      const flat = points.map((p) => straight(f, lambda, p));
      const mid = { x: mean(flat.map((p) => p.x)), y: mean(flat.map((p) => p.y)) };
      const [xx, xy, yy] = [sum(flat.map((p) => (p.x - mid.x) ** 2)), sum(flat.map((p) => (p.x - mid.x) * (p.y - mid.y))), sum(flat.map((p) => (p.y - mid.y) ** 2))];
      const angle = Math.atan2(2 * xy, xx - yy) / 2;
      return flat.map((p, i) => {
        const off = -(p.x - mid.x) * Math.sin(angle) + (p.y - mid.y) * Math.cos(angle);
        // Back to pixels of the photo, lest a lens that shrinks everything seem to straighten it.
        const at = points[i]!;
        const rr = ((at.x - f.centre.x) ** 2 + (at.y - f.centre.y) ** 2) / f.radiusPx ** 2;
        return (off * (1 + lambda * rr) * f.radiusPx) / sure.px;
      });
    },
  };
}

/** Both ends of a plumb line have one x on the wall, of a level line one y. */
function lineSeen({ direction, px: [a, b] }: TrueLine, index: number, f: CameraFrame, sure: Sureness): Observation {
  const axis = direction === 'plumb' ? 'x' : 'y';
  return {
    what: 'line', index, brings: 1,
    misses(c) {
      const [p, q] = [unproject(f, c, a), unproject(f, c, b)];
      const scale = pxPerMmAt(f, c, { x: (p.x + q.x) / 2, y: (p.y + q.y) / 2 });
      return [((p[axis] - q[axis]) * scale) / (Math.SQRT2 * sure.px)];
    },
  };
}

function lengthSeen({ px: [a, b], mm }: KnownLength, index: number, f: CameraFrame, near: readonly number[], sure: Sureness): Observation {
  const readMm = (p: Point) => sure.px / pxPerMmAt(f, near, unproject(f, near, p));
  const spread = Math.hypot(sure.mm, readMm(a), readMm(b));
  const weight = 1 / (Number.isFinite(spread) ? spread : 10 * sure.mm);
  return {
    what: 'length', index, brings: 1,
    misses(c) {
      const [p, q] = [unproject(f, c, a), unproject(f, c, b)];
      return [(Math.hypot(p.x - q.x, p.y - q.y) - mm) * weight];
    },
  };
}

/**
 * A camera with square pixels and its axis in the middle of the picture sees the wall's two axes as square and alike:
 * with ω = diag(1/φ², 1/φ², 1), h₁ᵀωh₂ = 0 and h₁ᵀωh₁ = h₂ᵀωh₂ (Zhang, "A flexible new technique for camera calibration",
 * 2000). Held to 0.2 %. φ is a parameter of its own, near the focal length told by the photo (to 8 %, for cropped and
 * stabilised pictures), else near that of a phone's main camera (to a factor of 1.6).
 */
export function pinholeSeen(told: number | null): Observation {
  const near = Math.log(told ?? usualFocal);
  const spread = told === null ? 0.47 : 0.08;
  return {
    what: 'pinhole', index: 0, brings: 3,
    misses(c) {
      const ff = Math.exp(2 * c[focalAt]!);
      const [h1, h2] = [[c[0]!, c[3]!, c[6]!], [c[1]!, c[4]!, c[7]!]] as const;
      const dot = (p: readonly number[], q: readonly number[]) => (p[0]! * q[0]! + p[1]! * q[1]!) / ff + p[2]! * q[2]!;
      const [a, b] = [Math.sqrt(dot(h1, h1)), Math.sqrt(dot(h2, h2))];
      return [dot(h1, h2) / (a * b) / 0.002, Math.log(a / b) / 0.002, (c[focalAt]! - near) / spread];
    },
  };
}

/** A 27 mm lens on 35 mm film, in half diagonals (21.63 mm): what a phone's main camera has, by common practice. */
export const usualFocal = 27 / 21.63;

/** Focal length in half diagonals of the picture. The 35 mm figure is by the diagonal, 43.27 mm, as camera makers count it (CIPA). */
export function focalOf(focal35Mm: number): number {
  return focal35Mm / (Math.hypot(36, 24) / 2);
}

const sum = (v: readonly number[]) => v.reduce((s, x) => s + x, 0);
const mean = (v: readonly number[]) => sum(v) / v.length;
