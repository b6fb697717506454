import { MM_PER_INCH, NEWTON_PER_POUND_FORCE, type LengthUnits } from './constants.ts';
import { plainSigns, settleComma, tidyNumber } from './number-text.ts';

const perPsi = NEWTON_PER_POUND_FORCE / MM_PER_INCH ** 2;
const factors: Record<string, number> = { psi: perPsi, ksi: 1000 * perPsi, mpa: 1, 'n/mm²': 1, 'n/mm2': 1 };

/** `80,000 psi` beside inches, `552 N/mm²` beside millimetres. */
export function formatStress(mpa: number, units: LengthUnits): string {
  if (units === 'mm') return `${tidyNumber(mpa, 0)} N/mm²`;
  return `${tidyNumber(mpa / perPsi, 0).replace(/\B(?=(\d{3})+$)/g, ',')} psi`;
}

/** Reads a strength as typed, in N/mm²; without a unit it is psi beside inches and N/mm² beside millimetres. Here a comma parts thousands. */
export function parseStress(text: string, units: LengthUnits): { mpa: number } | { error: string } {
  const example = 'Write a strength such as 80,000 psi or 550 N/mm².';
  const match = /^([\d.,]+) ?(psi|ksi|mpa|n\/mm²|n\/mm2)?$/.exec(plainSigns(text));
  const digits = match?.[1] ?? '';
  const number = /^\d{1,3}(,\d{3})+$/.test(digits) ? digits.replaceAll(',', '') : settleComma(digits);
  if (!match || number === null || !/^(\d+\.?\d*|\.\d+)$/.test(number)) return { error: example };
  return { mpa: Number(number) * (factors[match[2] ?? ''] ?? (units === 'in' ? perPsi : 1)) };
}
