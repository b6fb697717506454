import type { Point } from '../../shared/walls/homography.ts';
import type { Pixels } from '../../server/workers/warp.ts';

/** Discs on a pale wall, dark, of this radius, mm. */
export const discMm = 30;

/**
 * A photo of a wall with dark discs at `discs` (mm), painted by looking up, from the middle of each pixel about a disc, the
 * wall point that it shows: `see` is turned about by Newton's method. Edges are softened over a pixel's width.
 */
export function paintedWall({ widthPx: width, heightPx: height }: { widthPx: number; heightPx: number }, see: (wall: Point) => Point, discs: readonly Point[]): Pixels {
  const data = new Uint8Array(width * height * 3).fill(214);
  for (const d of discs) {
    const rim = Array.from({ length: 12 }, (_, k) => see({ x: d.x + 1.3 * discMm * Math.cos((k * Math.PI) / 6), y: d.y + 1.3 * discMm * Math.sin((k * Math.PI) / 6) }));
    const [xs, ys] = [rim.map((p) => p.x), rim.map((p) => p.y)];
    for (let j = Math.max(0, Math.floor(Math.min(...ys))); j < Math.min(height, Math.max(...ys)); j++) {
      for (let i = Math.max(0, Math.floor(Math.min(...xs))); i < Math.min(width, Math.max(...xs)); i++) {
        const { wall, pxPerMm } = wallAt(see, { x: i + 0.5, y: j + 0.5 }, d);
        const out = (Math.hypot(wall.x - d.x, wall.y - d.y) - discMm) * pxPerMm;
        if (out < 0.5) data.fill(Math.round(214 - 180 * Math.min(1, 0.5 - out)), (j * width + i) * 3, (j * width + i) * 3 + 3);
      }
    }
  }
  return { data, width, height };
}

function wallAt(see: (wall: Point) => Point, px: Point, near: Point): { wall: Point; pxPerMm: number } {
  let wall = near;
  let pxPerMm = 1;
  for (let round = 0; round < 30; round++) {
    const o = see(wall);
    const [r, t] = [see({ x: wall.x + 1, y: wall.y }), see({ x: wall.x, y: wall.y + 1 })];
    const [a, b, c, d] = [r.x - o.x, t.x - o.x, r.y - o.y, t.y - o.y];
    const det = a * d - b * c;
    pxPerMm = Math.sqrt(Math.abs(det));
    const [ex, ey] = [px.x - o.x, px.y - o.y];
    if (Math.hypot(ex, ey) < 1e-3) break;
    wall = { x: wall.x + (d * ex - b * ey) / det, y: wall.y + (a * ey - c * ex) / det };
  }
  return { wall, pxPerMm };
}

/** The middle of what is dark within `reach` of a place in a grey picture, px, taken anew about itself. */
export function darkMiddle(grey: Uint8Array, width: number, height: number, near: Point, reach: number): Point {
  let at = near;
  for (let round = 0; round < 4; round++) {
    let [sx, sy, sw] = [0, 0, 0];
    for (let j = Math.max(0, Math.floor(at.y - reach)); j <= Math.min(height - 1, at.y + reach); j++) {
      for (let i = Math.max(0, Math.floor(at.x - reach)); i <= Math.min(width - 1, at.x + reach); i++) {
        const weight = Math.max(0, 190 - grey[j * width + i]!);
        sx += weight * (i + 0.5);
        sy += weight * (j + 0.5);
        sw += weight;
      }
    }
    if (sw === 0) return { x: NaN, y: NaN };
    at = { x: sx / sw, y: sy / sw };
  }
  return at;
}
