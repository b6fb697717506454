import { beforeAll, describe, expect, it } from 'vitest';
import { warp } from '../../../server/workers/warp.ts';
import { applyHomography } from '../../../shared/walls/homography.ts';
import { distorted, lensOf } from '../../../shared/walls/lens.ts';
import { cv, openCvReady } from '../../support/open-cv.ts';

const [width, height] = [220, 160];
const photo = { width, height, data: Uint8Array.from({ length: width * height * 3 }, (_, i) => {
  const p = Math.floor(i / 3);
  const [x, y] = [p % width, Math.floor(p / width)];
  return Math.round(128 + 60 * Math.sin(x / 9 + (i % 3)) + 60 * Math.cos(y / 7));
}) };
const size = { width: 180, height: 140 };
const map = [0.9, 0.12, 24, -0.05, 0.85, 18, 2e-4, 3e-4, 1] as const;

describe('the warp through a lens', () => {
  beforeAll(openCvReady);

  it.each([-0.2, -0.05, 0.05])('agrees with OpenCV remap (linear) at a term of %d, to two grey levels', (lambda) => {
    const lens = lensOf({ widthPx: width, heightPx: height }, lambda);
    const ours = warp(photo, map, size, [0, 0, 0], { lens: { lambda, centreX: lens.centre.x, centreY: lens.centre.y, radiusX: lens.radiusPx, radiusY: lens.radiusPx } });
    const places = Array.from({ length: size.width * size.height }, (_, i) => {
      const p = distorted(lens, applyHomography(map, { x: (i % size.width) + 0.5, y: Math.floor(i / size.width) + 0.5 }));
      // OpenCV counts from pixel centres.
      return { x: p.x - 0.5, y: p.y - 0.5 };
    });
    const from = cv.matFromArray(height, width, cv.CV_8UC3, Array.from(photo.data));
    const xs = cv.matFromArray(size.height, size.width, cv.CV_32FC1, places.map((p) => p.x));
    const ys = cv.matFromArray(size.height, size.width, cv.CV_32FC1, places.map((p) => p.y));
    const to = new cv.Mat();
    cv.remap(from, to, xs, ys, cv.INTER_LINEAR, cv.BORDER_REPLICATE);
    let worst = 0;
    let compared = 0;
    places.forEach((p, i) => {
      if (p.x < 0 || p.y < 0 || p.x > width - 1 || p.y > height - 1) return;
      compared++;
      for (let n = 0; n < 3; n++) worst = Math.max(worst, Math.abs(ours.data[i * 3 + n]! - to.data[i * 3 + n]!));
    });
    for (const mat of [from, xs, ys, to]) mat.delete();
    expect(compared).toBeGreaterThan(15_000);
    // OpenCV rounds places to 1/32 px; over the steepest slope here (about 12 a pixel) that is under one level.
    expect(worst).toBeLessThanOrEqual(2);
  });

  it('leaves bare what a pincushion’s model does not reach, and tells how far it has come', () => {
    const shares: number[] = [];
    const picture = warp(photo, [4, 0, -300, 0, 4, -200, 0, 0, 1], size, [1, 2, 3], { lens: { lambda: 0.3, centreX: 110, centreY: 80, radiusX: 136, radiusY: 136 }, onShare: (s) => shares.push(s) });
    expect([...picture.data.subarray(0, 3)]).toEqual([1, 2, 3]);
    expect(shares[0]).toBe(0);
    expect(shares).toEqual([...shares].sort((a, b) => a - b));
    expect(shares.at(-1)).toBeLessThan(1);
  });
});
