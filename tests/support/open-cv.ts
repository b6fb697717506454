import { createRequire } from 'node:module';
import type openCvModule from '@techstark/opencv-js';
import type { Homography, Point } from '../../shared/walls/homography.ts';

// The module has a `then` of its own and must never be awaited, which an import of it would do.
export const cv = createRequire(import.meta.url)('@techstark/opencv-js') as typeof openCvModule;

/** OpenCV's program takes a moment to start. */
export async function openCvReady(): Promise<void> {
  await new Promise<void>((ready) => {
    if (typeof cv.Mat === 'function') ready();
    else cv.onRuntimeInitialized = () => ready();
  });
}

/** OpenCV's findHomography (all points, refined by its own Levenberg–Marquardt on the distances among `to`). */
export function byOpenCv(from: readonly Point[], to: readonly Point[]): Homography {
  const flat = (points: readonly Point[]) => points.flatMap((p) => [p.x, p.y]);
  const a = cv.matFromArray(from.length, 1, cv.CV_64FC2, flat(from));
  const b = cv.matFromArray(to.length, 1, cv.CV_64FC2, flat(to));
  const m = cv.findHomography(a, b);
  const out = Array.from(m.data64F) as unknown as Homography;
  for (const mat of [a, b, m]) mat.delete();
  return out;
}
