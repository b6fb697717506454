/** How finely and how sharply a photo shows the wall. */
export interface PictureFitness {
  /** The photo's pixels per mm of wall. */
  pxPerMm: number;
  /** Strength of the finest detail, as `server/files/sharpness.ts` measures it; null where nobody has. */
  sharpness: number | null;
}

/**
 * Below this the strongest detail of a preview is taken for blurred (variance of the Laplacian: Pech-Pacheco and others,
 * "Diatom autofocusing in brightfield microscopy", 2000; 100 for 8-bit grey is common practice).
 */
export const blurredBelow = 100;

/**
 * What a picture is too poor for, in words; empty where it bears the accuracy wanted. A mark set to `surePx` pixels is out by
 * `surePx / pxPerMm` on the wall. `tell` writes a length in the reader's units.
 */
export function pictureTroubles({ pxPerMm, sharpness }: PictureFitness, surePx: number, wantedMm: number, tell: (mm: number) => string): string[] {
  const troubles: string[] = [];
  const bestMm = surePx / pxPerMm;
  if (bestMm > wantedMm) {
    troubles.push(`The photo shows the wall at only ${tell(1 / pxPerMm)} a pixel, so a mark cannot be set better than to about ${tell(bestMm)}, not to ${tell(wantedMm)}. Send the photo as the camera took it, or take the wall in parts from nearer.`);
  }
  if (sharpness !== null && sharpness < blurredBelow) {
    troubles.push('The photo looks blurred: edges are soft even where it shows the most detail. Hold the phone still or rest it on something, and take it again in better light.');
  }
  return troubles;
}
