import { describe, expect, it } from 'vitest';
import { homographyFrom } from '../../../shared/walls/homography.ts';
import { distorted, lensOf } from '../../../shared/walls/lens.ts';
import { warpedPicture } from '../../../src/features/walls/warp-picture.ts';

const white = [255, 255, 255, 255];
const black = [0, 0, 0, 255];

/** A photo, 200 × 150, black but for the pixel blocks about the given points. */
function photoWith(points: { x: number; y: number }[]) {
  const data = new Uint8ClampedArray(200 * 150 * 4);
  for (let k = 0; k < 200 * 150; k++) {
    const lit = points.some((p) => Math.abs((k % 200) + 0.5 - p.x) <= 2 && Math.abs(Math.floor(k / 200) + 0.5 - p.y) <= 2);
    data.set(lit ? white : black, k * 4);
  }
  return { data, width: 200, height: 150 };
}

// Corners of a wall of 3 × 2 m as an oblique photo of 400 × 300 shows them; the preview is half as large.
const photo = { widthPx: 400, heightPx: 300 };
const corners = [{ x: 40, y: 260 }, { x: 340, y: 240 }, { x: 350, y: 60 }, { x: 60, y: 20 }];
const wall = [{ x: 0, y: 0 }, { x: 3000, y: 0 }, { x: 3000, y: 2000 }, { x: 0, y: 2000 }];
const wallToPhoto = homographyFrom(wall.map((from, i) => ({ from, to: corners[i]! })));
const plan = { leftMm: 0, bottomMm: 0, widthMm: 3000, heightMm: 2000, wallToPhoto, lens: null };
const pixel = (p: { data: Uint8ClampedArray; width: number }, x: number, y: number) => [...p.data.slice((y * p.width + x) * 4, (y * p.width + x) * 4 + 4)];

describe('the warp shown before the server answers', () => {
  it('brings what the photo shows at the wall’s corners into the picture’s corners', () => {
    const shown = warpedPicture(photoWith(corners.map(({ x, y }) => ({ x: x / 2, y: y / 2 }))), photo.widthPx, plan, 300, 200);
    for (const [x, y] of [[1, 198], [298, 198], [298, 1], [1, 1]] as const) expect(pixel(shown, x, y)).toEqual(white);
    expect(pixel(shown, 150, 100)).toEqual(black);
  });

  it('takes the lens out with it', () => {
    const lens = lensOf(photo, -0.2);
    const shown = warpedPicture(photoWith(corners.map((p) => distorted(lens, p)).map(({ x, y }) => ({ x: x / 2, y: y / 2 }))), photo.widthPx, { ...plan, lens }, 300, 200);
    for (const [x, y] of [[1, 198], [298, 198], [298, 1], [1, 1]] as const) expect(pixel(shown, x, y)).toEqual(white);
  });

  it('leaves clear what the photo does not show', () => {
    const shown = warpedPicture(photoWith([]), photo.widthPx, { ...plan, leftMm: -3000, widthMm: 6000 }, 300, 200);
    expect(pixel(shown, 1, 100)).toEqual([0, 0, 0, 0]);
    expect(pixel(shown, 200, 100)).toEqual(black);
  });
});
