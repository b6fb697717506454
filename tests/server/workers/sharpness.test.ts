import path from 'node:path';
import sharp from 'sharp';
import { beforeAll, describe, expect, it } from 'vitest';
import { sharpnessOf } from '../../../server/workers/sharpness.ts';
import { blurredBelow } from '../../../shared/walls/picture-fitness.ts';
import { cv, openCvReady } from '../../support/open-cv.ts';

const scenes = ['calibration-wall', 'cafe-counter', 'reading-room', 'stairwell-hall'].map((n) => path.resolve(`server/database/seed/scenes/${n}.jpg`));

/** The grey preview of a photo as the server makes it, after a Gaussian blur of its long side's share `blur`. */
async function grey(file: string, blur = 0) {
  const preview = sharp(file).autoOrient().resize(2048, 2048, { fit: 'inside' });
  const { data, info } = await (blur > 0 ? preview.blur(blur) : preview).greyscale().raw().toBuffer({ resolveWithObject: true });
  return [data, info.width, info.height] as const;
}

describe('a photo’s sharpness', () => {
  beforeAll(openCvReady);

  it('is the variance of OpenCV’s Laplacian, where there is one square to look at', () => {
    const side = 66;
    const data = Uint8Array.from({ length: side * side }, (_, i) => Math.round(128 + 50 * Math.sin(i / 3.1) + 40 * Math.cos((i % side) / 2)));
    const from = cv.matFromArray(side, side, cv.CV_8UC1, Array.from(data));
    const to = new cv.Mat();
    cv.Laplacian(from, to, cv.CV_64F, 1);
    const inside = Array.from({ length: 64 * 64 }, (_, i) => to.doubleAt(1 + Math.floor(i / 64), 1 + (i % 64)));
    const mean = inside.reduce((s, v) => s + v, 0) / inside.length;
    const variance = inside.reduce((s, v) => s + (v - mean) ** 2, 0) / inside.length;
    for (const mat of [from, to]) mat.delete();
    expect(sharpnessOf(data, side, side)).toBeCloseTo(variance, 6);
  });

  it('tells our sharp photos from the same ones shaken', async () => {
    for (const file of scenes) {
      expect(sharpnessOf(...(await grey(file)))).toBeGreaterThan(blurredBelow);
      expect(sharpnessOf(...(await grey(file, 4)))).toBeLessThan(blurredBelow);
    }
  }, 60_000);

  it('is nought of a bare wall', () => {
    expect(sharpnessOf(new Uint8Array(300 * 300).fill(200), 300, 300)).toBe(0);
  });
});
