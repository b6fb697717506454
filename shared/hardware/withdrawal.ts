import { MM_PER_INCH, NEWTON_PER_POUND_FORCE } from '../units/constants.ts';
import type { ScrewBody } from './screws.ts';

/**
 * Reference withdrawal value from side grain, N per mm of thread in the wood.
 * Wood screws 2850 G² D (eq. 12.2-2), lag screws 1800 G^(3/2) D^(3/4) (eq. 12.2-1), both lb per inch with D the nominal diameter
 * in inches. Source: NDS-2018 12.2.1 and 12.2.2.
 */
export function withdrawalPerMm(kind: ScrewBody['kind'], gravity: number, diameterMm: number): number {
  const d = diameterMm / MM_PER_INCH;
  const pounds = kind === 'wood screw' ? 2850 * gravity ** 2 * d : 1800 * gravity ** 1.5 * d ** 0.75;
  return (pounds * NEWTON_PER_POUND_FORCE) / MM_PER_INCH;
}

/**
 * Allowable tension of the steel at the thread's root, N: half its yield over the root area. NDS-2018 asks for the check but leaves
 * the stress to metal design; the factor of 2.00 on tension is AISC 360's (J3.6, from memory), and the bending yield strength, an
 * average of yield and ultimate (NDS appendix I), stands for the tensile strength on the safe side.
 */
export function steelTension(screw: Pick<ScrewBody, 'rootDiameterMm' | 'bendingYieldMPa'>): number {
  return (((Math.PI / 4) * screw.rootDiameterMm ** 2) * screw.bendingYieldMPa) / 2;
}
