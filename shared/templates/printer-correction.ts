import { z } from 'zod';
import { formatLength } from '../units/length.ts';
import { mostCorrection } from './template-options.ts';

const length = (what: string) => z.number({ error: `${what} is not a length.` }).positive(`${what} must be more than nought.`).max(20_000, `${what} is longer than any bar.`);
const bar = z.object({ statedMm: length('The bar’s stated length'), measuredMm: length('The measured length') });

/** Both bars of one print as they were measured. */
export const MeasuredBars = z.object({
  across: bar,
  up: bar,
  /** The rule's smallest division, mm. */
  divisionMm: z.number().min(0.1, 'No rule is divided finer than 0.1 mm.').max(5, 'This rule is too coarse to prove a print by.').default(0.5),
  /** The correction that the measured print itself bears: on a print without one, 1. */
  printedWith: z.object({ x: z.number().min(1 - mostCorrection).max(1 + mostCorrection), y: z.number().min(1 - mostCorrection).max(1 + mostCorrection) }).default({ x: 1, y: 1 }),
  units: z.enum(['in', 'mm']).default('mm'),
});
export type MeasuredBars = z.output<typeof MeasuredBars>;

/** What becomes of one axis. */
export const axisVerdict = z.object({ applied: z.boolean(), factor: z.number(), words: z.string() });
export type AxisVerdict = z.output<typeof axisVerdict>;

/**
 * How far a rule may mislead: at each end of the bar half a division, the two taken together as independent (root of the sum of squares;
 * JCGM 100:2008, 5.1.2, with half a division as the standard deviation of one reading, which is on the safe side).
 */
export function rulerDoubt(divisionMm: number): number {
  return Math.SQRT2 * (divisionMm / 2);
}

/**
 * The correction of one axis from a bar as measured, or words why there is none. `printed` is the factor the measured print already bore.
 * `refused`: past 3 % a print setting is wrong, and correcting it would hide that.
 */
export function correctionFrom({ statedMm, measuredMm }: { statedMm: number; measuredMm: number }, axis: 'across' | 'up', printed: number, divisionMm: number, units: 'in' | 'mm'): { kind: 'kept' | 'corrected'; verdict: AxisVerdict } | { kind: 'refused'; words: string } {
  const off = measuredMm - statedMm;
  const share = off / statedMm;
  const factor = (printed * statedMm) / measuredMm;
  const percent = (part: number) => `${(Math.abs(part) * 100).toFixed(Math.abs(part) < 0.01 ? 2 : 1)} %`;
  if (Math.abs(share) > mostCorrection || Math.abs(factor - 1) > mostCorrection) return { kind: 'refused', words: `The bar ${axis} came out ${percent(share)} too ${off < 0 ? 'short' : 'long'}. ${settingWords(measuredMm / statedMm)}` };
  const doubt = rulerDoubt(divisionMm);
  if (Math.abs(off) <= doubt) {
    const words = `The bar ${axis} is off by ${formatLength(Math.abs(off), 'mm')}, which is no more than your rule can tell (${formatLength(doubt, 'mm')}): correcting by it could make a true print worse, so it is left as it is.`;
    return { kind: 'kept', verdict: { applied: false, factor: printed, words } };
  }
  return { kind: 'corrected', verdict: { applied: true, factor, words: `The bar ${axis} is ${formatLength(Math.abs(off), units === 'in' ? 'mm' : units)} (${percent(share)}) too ${off < 0 ? 'short' : 'long'}: the next print is drawn ${factor > 1 ? 'larger' : 'smaller'} by ${percent(factor - 1)} ${axis}.` } };
}

/** Which setting does that, told from by how much. */
function settingWords(ratio: number): string {
  if (Math.abs(ratio - 25.4) < 2 || Math.abs(ratio - 1 / 25.4) < 0.005) return 'That looks like inches taken for millimetres: write the unit with the figure.';
  if (Math.abs(ratio - 210 / 215.9) < 0.004 || Math.abs(ratio - 279.4 / 297) < 0.004) return 'That is Letter and A4 taken for one another: choose the paper that lies in the tray, untick “Fit to page”, and print at actual size (100 %).';
  if (ratio < 1) return 'Untick “Fit to page” (in some windows “Shrink oversized pages” or “Scale to fit”), choose “Actual size” or 100 %, and print again.';
  return 'Untick “Borderless” and “Enlarge to fill the page”, choose “Actual size” or 100 %, and print again.';
}
