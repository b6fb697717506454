import { createRequire } from 'node:module';
import type openCvModule from '@techstark/opencv-js';
import fc from 'fast-check';
import { beforeAll, describe, expect, it } from 'vitest';
import { applyHomography, homographyFrom, invertHomography, magnification, type Homography, type Point } from '../../../shared/walls/homography.ts';
import { aCamera, seenBy } from '../../support/a-camera.ts';

/** Four marks of a wall photo and their places, mm; the map worked with numpy's linear solver, to nine figures. */
const px = [[412, 318], [2870, 402], [2795, 1961], [455, 2088]].map(([x, y]) => ({ x: x!, y: y! }));
const mm = [[0, 0], [2400, 0], [2400, 1500], [0, 1500]].map(([x, y]) => ({ x: x!, y: y! }));
const byNumpy = [0.833071282, -0.0202384549, -336.789539, -0.02669858, 0.781251304, -237.4381, -4.75546905e-5, -2.74192702e-5, 1];
const carriedByNumpy: [Point, Point][] = [
  [{ x: 1600, y: 1100 }, { x: 1089.634458, y: 648.078059 }],
  [{ x: 1000, y: 700 }, { x: 516.596714, y: 302.961352 }],
  [{ x: 2500, y: 1800 }, { x: 2055.235103, y: 1324.985175 }],
];
const pairs = (from: Point[], to: Point[]) => from.map((f, i) => ({ from: f, to: to[i]! }));

// The module has a `then` of its own and must never be awaited, which an import of it would do.
const cv = createRequire(import.meta.url)('@techstark/opencv-js') as typeof openCvModule;

describe('the map from photo to wall', () => {
  beforeAll(async () => {
    await new Promise<void>((ready) => {
      if (typeof cv.Mat === 'function') ready();
      else cv.onRuntimeInitialized = () => ready();
    });
  });

  it('agrees with a linear solver on four marks, entry by entry and on three carried points', () => {
    const h = homographyFrom(pairs(px, mm));
    byNumpy.forEach((v, i) => expect(h[i]! / v).toBeCloseTo(1, 7));
    for (const [from, to] of carriedByNumpy) {
      const got = applyHomography(h, from);
      expect(got.x).toBeCloseTo(to.x, 5);
      expect(got.y).toBeCloseTo(to.y, 5);
    }
  });

  it('agrees with OpenCV getPerspectiveTransform on four marks and findHomography on nine', () => {
    const camera = aCamera({ at: [2550, 1450, 2780], lookAt: [1540, 1200, 0], rollDegrees: 1.4 });
    const nine = [0, 1, 2].flatMap((i) => [0, 1, 2].map((j) => ({ x: 200 + 1100 * i + 37 * j, y: 150 + 900 * j - 21 * i })));
    const four = [nine[0]!, nine[6]!, nine[8]!, nine[2]!];
    const seen = (points: Point[]) => points.map((p) => seenBy(camera, p));

    const fourCv = openCv('getPerspectiveTransform', seen(four), four);
    const nineCv = openCv('findHomography', seen(nine), nine);
    const fourOurs = homographyFrom(pairs(seen(four), four));
    const nineOurs = homographyFrom(pairs(seen(nine), nine));
    for (const p of [{ x: 900, y: 700 }, { x: 2000, y: 1500 }, { x: 3300, y: 2200 }]) {
      for (const [ours, theirs] of [[fourOurs, fourCv], [nineOurs, nineCv]] as const) {
        const a = applyHomography(ours, p);
        const b = applyHomography(theirs, p);
        // OpenCV is given single-precision pixels: 4000 px to about 0.0002 px.
        expect(Math.hypot(a.x - b.x, a.y - b.y)).toBeLessThan(0.02);
      }
    }
  });

  it('recovers every wall point that a pinhole camera projects, from any four marks of a wide rectangle', () => {
    fc.assert(
      fc.property(fc.double({ min: 500, max: 4000, noNaN: true }), fc.double({ min: 800, max: 2000, noNaN: true }), fc.double({ min: 1500, max: 5000, noNaN: true }), fc.double({ min: -8, max: 8, noNaN: true }), (x, y, z, rollDegrees) => {
        const camera = aCamera({ at: [x, y, z], lookAt: [2000, 1200, 0], rollDegrees });
        const wall = [{ x: 300, y: 400 }, { x: 3600, y: 420 }, { x: 3500, y: 2200 }, { x: 350, y: 2150 }];
        const h = homographyFrom(wall.map((p) => ({ from: seenBy(camera, p), to: p })));
        for (const p of [{ x: 1000, y: 1000 }, { x: 3300, y: 700 }, { x: 2000, y: 2300 }]) {
          const back = applyHomography(h, seenBy(camera, p));
          expect(Math.hypot(back.x - p.x, back.y - p.y)).toBeLessThan(1e-4);
        }
      }),
    );
  });

  it('undoes itself, and doubles lengths where it should', () => {
    const h = homographyFrom(pairs(px, mm));
    const back = invertHomography(h);
    for (const [from, to] of carriedByNumpy) {
      const p = applyHomography(back, to);
      expect(Math.hypot(p.x - from.x, p.y - from.y)).toBeLessThan(1e-4);
    }
    const double: Homography = [2, 0, 5, 0, 2, -3, 0, 0, 1];
    expect(magnification(double, { x: 9, y: 4 })).toBeCloseTo(2, 12);
  });

  it('will not be made from three points', () => {
    expect(() => homographyFrom(pairs(px, mm).slice(0, 3))).toThrow(/four pairs.*3/);
  });
});

function openCv(method: 'getPerspectiveTransform' | 'findHomography', from: Point[], to: Point[]): Homography {
  const flat = (points: Point[]) => points.flatMap((p) => [p.x, p.y]);
  const a = cv.matFromArray(from.length, 1, cv.CV_32FC2, flat(from));
  const b = cv.matFromArray(to.length, 1, cv.CV_32FC2, flat(to));
  const m = method === 'getPerspectiveTransform' ? cv.getPerspectiveTransform(a, b) : cv.findHomography(a, b);
  const out = Array.from(m.data64F) as unknown as Homography;
  for (const mat of [a, b, m]) mat.delete();
  return out;
}
