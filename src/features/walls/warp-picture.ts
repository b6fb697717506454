import type { ElevationPlan } from '../../../shared/walls/elevation-plan.ts';
import { stretch } from '../../../shared/walls/lens.ts';

/** A picture's pixels by rows from the top, four bytes each. */
export interface Pixels {
  data: Uint8ClampedArray;
  width: number;
  height: number;
}

/**
 * The photo straightened into a picture of `width` × `height` that shows the plan's rectangle of wall; what the photo does not show
 * stays clear. Nearest pixel, which is what a preview needs; lens and all, as the server does it.
 * `preview` may be a smaller copy of the photo of `photoWidthPx`.
 */
export function warpedPicture(preview: Pixels, photoWidthPx: number, plan: Pick<ElevationPlan, 'leftMm' | 'bottomMm' | 'widthMm' | 'heightMm' | 'wallToPhoto' | 'lens'>, width: number, height: number): Pixels {
  const out = new Uint32Array(width * height);
  const source = new Uint32Array(preview.data.buffer, preview.data.byteOffset, preview.width * preview.height);
  const [h0, h1, h2, h3, h4, h5, h6, h7, h8] = plan.wallToPhoto;
  const scale = preview.width / photoWidthPx;
  const { lens } = plan;
  for (let j = 0; j < height; j++) {
    const y = plan.bottomMm + plan.heightMm * (1 - (j + 0.5) / height);
    for (let i = 0; i < width; i++) {
      const x = plan.leftMm + (plan.widthMm * (i + 0.5)) / width;
      const w = h6 * x + h7 * y + h8;
      let u = (h0 * x + h1 * y + h2) / w;
      let v = (h3 * x + h4 * y + h5) / w;
      if (lens) {
        const [dx, dy] = [u - lens.centre.x, v - lens.centre.y];
        const by = stretch(lens.lambda, (dx * dx + dy * dy) / (lens.radiusPx * lens.radiusPx));
        u = lens.centre.x + dx * by;
        v = lens.centre.y + dy * by;
      }
      const column = Math.floor(u * scale);
      const row = Math.floor(v * scale);
      if (column >= 0 && row >= 0 && column < preview.width && row < preview.height) out[j * width + i] = source[row * preview.width + column]!;
    }
  }
  return { data: new Uint8ClampedArray(out.buffer), width, height };
}
