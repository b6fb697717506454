import type { ScrewBody } from './screws.ts';

/**
 * Lead hole for the thread of a screw, mm. In wood of G above 0.6: 90 % of the root; else 70 %. Source: NDS-2018, 12.1.5.2 (from memory), which
 * lets the hole be left out at G 0.5 and below; a hole of 70 % there is common practice and keeps the screw on its mark.
 */
export function leadHole(screw: Pick<ScrewBody, 'rootDiameterMm'>, gravity: number): number {
  return screw.rootDiameterMm * (gravity > 0.6 ? 0.9 : 0.7);
}
