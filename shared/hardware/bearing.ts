import { MM_PER_INCH, NEWTON_PER_POUND_FORCE } from '../units/constants.ts';

/** One pound-force per square inch in N/mm². */
export const MPA_PER_PSI = NEWTON_PER_POUND_FORCE / MM_PER_INCH ** 2;

/** Nominal diameter from which bearing depends on the grain, mm (1/4 in, NDS-2018 table 12.3.3). */
const thickMm = MM_PER_INCH / 4;

/** Whether a dowel of this nominal diameter feels the direction of the grain. */
export const feelsGrain = (diameterMm: number): boolean => diameterMm >= thickMm - 1e-9;

/**
 * Dowel bearing strength of wood, N/mm², for a dowel of nominal diameter (mm) pressed at an angle (rad) to the grain.
 * Under 1/4 in: 16,600 G^1.84 psi in any direction. From 1/4 in: 11,200 G along, 6,100 G^1.45/√D across, between them by
 * Hankinson's formula. Source: NDS-2018 table 12.3.3 and 12.3.4.
 */
export function woodBearing(gravity: number, diameterMm: number, angleToGrainRad: number): number {
  if (!feelsGrain(diameterMm)) return 16_600 * gravity ** 1.84 * MPA_PER_PSI;
  const along = 11_200 * gravity;
  const across = (6_100 * gravity ** 1.45) / Math.sqrt(diameterMm / MM_PER_INCH);
  const sin2 = Math.sin(angleToGrainRad) ** 2;
  return ((along * across) / (along * sin2 + across * (1 - sin2))) * MPA_PER_PSI;
}

/**
 * Dowel bearing strength of a steel plate, N/mm²: 61,850 psi for sheet (ASTM A653 grade 33), 87,000 psi from 1/4 in on
 * (ASTM A36). Source: notes to NDS-2018 tables 12K and 12M. A bracket of unknown steel is taken as sheet of grade 33.
 */
export function steelBearing(thicknessMm: number): number {
  return (thicknessMm >= thickMm - 1e-9 ? 87_000 : 61_850) * MPA_PER_PSI;
}
