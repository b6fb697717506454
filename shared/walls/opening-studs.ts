import { boundsOf } from './studs.ts';
import type { Obstruction, Stud } from './wall.ts';

/**
 * From an opening's finished side to the face of its jack stud, mm: 1 in, for a jamb of 3/4 in and a shim of 1/4 in.
 * Common practice: the rough opening is 2 in wider than the door.
 */
export const jambMm = 25.4;

/**
 * Centres (mm) of the studs that common framing sets beside an opening: at each side a jack stud, which carries the header,
 * and against it the king stud, which runs full height. Those off the wall are left out.
 */
export function openingCentres(opening: Pick<Obstruction, 'outlineMm'>, faceMm: number, wallWidthMm: number): number[] {
  const { leftMm, widthMm } = boundsOf(opening.outlineMm);
  const right = leftMm + widthMm;
  const out = [jambMm + faceMm / 2, jambMm + 1.5 * faceMm];
  return [...out.map((by) => leftMm - by).reverse(), ...out.map((by) => right + by)].filter((x) => x >= 0 && x <= wallWidthMm);
}

/** Those centres at which no stud is known yet. */
export function missingOpeningCentres(opening: Pick<Obstruction, 'outlineMm'>, studs: readonly Pick<Stud, 'xMm'>[], faceMm: number, wallWidthMm: number): number[] {
  return openingCentres(opening, faceMm, wallWidthMm).filter((x) => !studs.some((s) => Math.abs(s.xMm - x) < faceMm / 2));
}
