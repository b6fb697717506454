import { MM_PER_FOOT, MM_PER_INCH } from './constants.ts';

/** Volume in board feet of any size of wood, measured as it is: 144 in³ each. */
export function netBoardFeet(volumeMm3: number): number {
  return volumeMm3 / (MM_PER_FOOT * MM_PER_FOOT * MM_PER_INCH);
}

/**
 * Surface measure of a board, whole ft²: width in inches and fractions × length in whole feet (fractions dropped) ÷ 12, rounded
 * to the nearest whole. Source: NHLA, Rules for the Measurement and Inspection of Hardwood and Cypress.
 * An exact half is rounded up here; the rules let a tally take halves up and down by turns.
 */
export function surfaceMeasure(widthMm: number, lengthMm: number): number {
  // Sizes converted from mm carry rounding of the last bit: 2438.4 mm must count as 8 ft.
  const feet = Math.floor(lengthMm / MM_PER_FOOT + 1e-9);
  return Math.round((widthMm / MM_PER_INCH) * feet / 12 + 1e-9);
}

/** Board feet of one board as a yard tallies it: surface measure × rough thickness in inches, stock under 1 in counted as 1 in (NHLA). */
export function boardFeet(widthMm: number, lengthMm: number, roughThicknessMm: number): number {
  return surfaceMeasure(widthMm, lengthMm) * Math.max(1, roughThicknessMm / MM_PER_INCH);
}
