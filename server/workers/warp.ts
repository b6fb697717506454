/** Interleaved 8-bit RGB. */
export interface Pixels {
  data: Uint8Array;
  width: number;
  height: number;
}

/** A lens's radial term (division model): centre and radius of the picture, px, each way. */
export interface WarpLens {
  lambda: number;
  centreX: number;
  centreY: number;
  radiusX: number;
  radiusY: number;
}

export interface WarpOptions {
  /** Where given, `toPhoto` leads to the photo of a perfect lens, and this from there to the photo itself. */
  lens?: WarpLens | null;
  /** Told now and then how much is done, 0 to 1. */
  onShare?: (share: number) => void;
}

/**
 * Draws a picture by looking up, for the centre of each of its pixels, the place in `photo` that `toPhoto` (3 × 3 by
 * rows, continuous pixels with the outer corner of the first at 0, 0) names, blended from the four pixels about it.
 * Places off the photo, or behind its camera, take the colour `bare`.
 */
export function warp(photo: Pixels, toPhoto: readonly number[], size: { width: number; height: number }, bare: readonly [number, number, number], { lens = null, onShare }: WarpOptions = {}): Pixels {
  const [a = 0, b = 0, c = 0, d = 0, e = 0, f = 0, g = 0, h = 0, k = 0] = toPhoto;
  const { data: from, width: fromWidth, height: fromHeight } = photo;
  const out = new Uint8Array(size.width * size.height * 3);
  const lastX = fromWidth - 1;
  const lastY = fromHeight - 1;
  const { lambda, centreX, centreY, radiusX, radiusY } = lens ?? { lambda: 0, centreX: 0, centreY: 0, radiusX: 1, radiusY: 1 };
  const bends = lambda !== 0;
  let o = 0;
  for (let j = 0; j < size.height; j++) {
    const y = j + 0.5;
    if (onShare && j % 64 === 0) onShare(j / size.height);
    for (let i = 0; i < size.width; i++, o += 3) {
      const x = i + 0.5;
      const w = g * x + h * y + k;
      let u = (a * x + b * y + c) / w;
      let v = (d * x + e * y + f) / w;
      if (bends) {
        const du = u - centreX;
        const dv = v - centreY;
        const rr = (du * du) / (radiusX * radiusX) + (dv * dv) / (radiusY * radiusY);
        // The division model the other way about, by its quadratic; not a number past a pincushion's rim.
        const by = 2 / (1 + Math.sqrt(1 - 4 * lambda * rr));
        u = centreX + du * by;
        v = centreY + dv * by;
      }
      if (!(w > 0 && u >= 0 && v >= 0 && u <= fromWidth && v <= fromHeight)) {
        out[o] = bare[0];
        out[o + 1] = bare[1];
        out[o + 2] = bare[2];
        continue;
      }
      // From here on in terms of pixel centres; the outermost half pixel repeats the edge.
      const px = Math.min(Math.max(u - 0.5, 0), lastX);
      const py = Math.min(Math.max(v - 0.5, 0), lastY);
      const x0 = px | 0;
      const y0 = py | 0;
      const fx = px - x0;
      const fy = py - y0;
      const p = (y0 * fromWidth + x0) * 3;
      const right = x0 < lastX ? 3 : 0;
      const below = y0 < lastY ? fromWidth * 3 : 0;
      const w11 = fx * fy;
      const w10 = fx - w11;
      const w01 = fy - w11;
      const w00 = 1 - fx - w01;
      for (let n = 0; n < 3; n++) {
        const q = p + n;
        out[o + n] = from[q]! * w00 + from[q + right]! * w10 + from[q + below]! * w01 + from[q + below + right]! * w11 + 0.5;
      }
    }
  }
  return { data: out, ...size };
}
