import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { elevationPlanOf, elevationToPhoto } from '../../../shared/walls/elevation-plan.ts';
import { applyHomography } from '../../../shared/walls/homography.ts';
import { distorted, lensMagnification, lensOf, undistorted } from '../../../shared/walls/lens.ts';
import { lensWords } from '../../../shared/walls/wall-camera.ts';

const photo = { widthPx: 4000, heightPx: 3000 };
const lambda = fc.double({ min: -0.5, max: 0.25, noNaN: true });
const onPhoto = fc.record({ x: fc.double({ min: 0, max: 4000, noNaN: true }), y: fc.double({ min: 0, max: 3000, noNaN: true }) });

describe('the lens', () => {
  it('undoes what it does, everywhere on the photo', () => {
    fc.assert(
      fc.property(lambda, onPhoto, (l, p) => {
        const lens = lensOf(photo, l);
        const back = distorted(lens, undistorted(lens, p));
        expect(Math.hypot(back.x - p.x, back.y - p.y)).toBeLessThan(1e-6);
      }),
    );
  });

  it('moves a corner by its term: at −0.1 a perfect lens would show it 1/(1 − 0.1) as far out', () => {
    const p = undistorted(lensOf(photo, -0.1), { x: 4000, y: 3000 });
    expect(p.x - 2000).toBeCloseTo(2000 / 0.9, 9);
    expect(p.y - 1500).toBeCloseTo(1500 / 0.9, 9);
  });

  it('magnifies small areas as the areas of small squares say', () => {
    fc.assert(
      fc.property(lambda, onPhoto, (l, p) => {
        const lens = lensOf(photo, l);
        const u = undistorted(lens, p);
        const step = 0.01;
        const [r, t] = [distorted(lens, { x: u.x + step, y: u.y }), distorted(lens, { x: u.x, y: u.y + step })];
        const o = distorted(lens, u);
        const area = ((r.x - o.x) * (t.y - o.y) - (r.y - o.y) * (t.x - o.x)) / step ** 2;
        expect(lensMagnification(lens, u) / Math.sqrt(Math.abs(area))).toBeCloseTo(1, 3);
      }),
    );
  });
});

describe('an elevation by a bent lens', () => {
  it('reaches all of the wall that the photo shows, and leads each of its pixels to the photo’s', () => {
    // Straight on at a pixel a millimetre, the wall's lower left corner at the photo's own.
    const wallToPhoto = [1, 0, 0, 0, -1, 3000, 0, 0, 1] as const;
    const lens = lensOf(photo, -0.1);
    const plan = elevationPlanOf({ wallToPhoto, lens }, { x: 2000, y: 1500 }, photo, { widthMm: 9000, heightMm: 9000 })!;
    // The photo's right edge without the lens: at the middle of its height 2000 px lie at 2000 / (1 − 0.1·0.8²); its corner farther.
    expect(plan.leftMm + plan.widthMm).toBeGreaterThanOrEqual(2000 + 2000 / (1 - 0.1 * 0.64));
    expect(plan.leftMm + plan.widthMm).toBeCloseTo(2000 + 2000 / 0.9, -1);
    const middle = applyHomography(elevationToPhoto(plan), { x: (2000 - plan.leftMm) * plan.pxPerMm, y: (plan.bottomMm + plan.heightMm - 1500) * plan.pxPerMm });
    expect(middle.x).toBeCloseTo(2000, 6);
    expect(middle.y).toBeCloseTo(1500, 6);
  });
});

describe('the lens in words', () => {
  it('is told by which way it bends and by how much at the corners', () => {
    expect(lensWords(-0.0844)).toMatch(/like a barrel: the corners are out by 8\.4 %/);
    expect(lensWords(0.03)).toMatch(/like a pincushion/);
    expect(lensWords(0.0001)).toMatch(/less than 0\.05 %/);
  });
});
