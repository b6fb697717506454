import { describe, expect, it } from 'vitest';
import { faceTopAt, wallFace } from '../../../shared/walls/wall-face.ts';

const sloped = { widthMm: 4000, heightMm: 2600, outlineMm: [[0, 0], [4000, 0], [4000, 2600], [1600, 2600], [0, 1000]] as [number, number][] };

describe('a wall’s face', () => {
  it('is all of width by height where no outline is told', () => {
    expect(wallFace({ widthMm: 4000, heightMm: 2600 })).toEqual([{ x: 0, y: 0 }, { x: 4000, y: 0 }, { x: 4000, y: 2600 }, { x: 0, y: 2600 }]);
    expect(faceTopAt({ widthMm: 4000, heightMm: 2600 }, 500)).toBe(2600);
  });

  it('reaches as high as the slope under a sloped ceiling', () => {
    expect([0, 400, 1600, 3000, 4000].map((x) => faceTopAt(sloped, x))).toEqual([1000, 1400, 2600, 2600, 2600]);
  });
});
