import { KG_PER_POUND, NEWTON_PER_POUND_FORCE, type LengthUnits } from './constants.ts';
import { plainSigns, settleComma, tidyNumber } from './number-text.ts';

export type ParsedMass = { kg: number } | { error: string };
export type ParsedLoad = { newton: number } | { error: string };

const kgPer: Record<string, number> = {
  kg: 1, kilogram: 1, kilograms: 1, g: 0.001, gram: 0.001, grams: 0.001,
  lb: KG_PER_POUND, lbs: KG_PER_POUND, pound: KG_PER_POUND, pounds: KG_PER_POUND, oz: KG_PER_POUND / 16,
};
const newtonPer: Record<string, number> = {
  n: 1, newton: 1, newtons: 1, kn: 1000, lbf: NEWTON_PER_POUND_FORCE, lb: NEWTON_PER_POUND_FORCE, lbs: NEWTON_PER_POUND_FORCE,
};

function readQuantity(text: string, factors: Record<string, number>, fallback: string, example: string): { value: number } | { error: string } {
  const match = /^([+-]?) ?([\d.,]+) ?([a-z]*)\.?$/.exec(plainSigns(text));
  if (!match) return { error: example };
  const number = settleComma(match[2] ?? '');
  if (number === null) return { error: `${match[2]} can be read two ways: write the decimal with a point, and no sign between thousands.` };
  if (!/^(\d+\.?\d*|\.\d+)$/.test(number)) return { error: example };
  const unit = match[3] === '' || match[3] === undefined ? fallback : match[3];
  const factor = factors[unit];
  if (factor === undefined) return { error: `“${unit}” does not fit here. ${example}` };
  const value = Number(number) * factor;
  if (value > 1e9) return { error: 'That is too large: is the unit right?' };
  return { value: match[1] === '-' && value !== 0 ? -value : value };
}

/** Reads a mass as typed, in kg; without a unit it is lb beside inches and kg beside millimetres. */
export function parseMass(text: string, units: LengthUnits): ParsedMass {
  const read = readQuantity(text, kgPer, units === 'in' ? 'lb' : 'kg', 'Write a mass such as 5.5 lb or 2.5 kg.');
  return 'error' in read ? read : { kg: read.value };
}

/** Reads a load as typed, in N; without a unit it is lbf beside inches and N beside millimetres. `lb` is read as pounds-force. */
export function parseLoad(text: string, units: LengthUnits): ParsedLoad {
  const read = readQuantity(text, newtonPer, units === 'in' ? 'lbf' : 'n', 'Write a load such as 50 lbf or 220 N.');
  return 'error' in read ? read : { newton: read.value };
}

/** `5.5 lb` or `2.5 kg`: one decimal in pounds, two in kilograms. */
export function formatMass(kg: number, units: LengthUnits): string {
  return units === 'in' ? `${tidyNumber(kg / KG_PER_POUND, 1)} lb` : `${tidyNumber(kg, 2)} kg`;
}

/** `49.4 lbf` or `220 N`: one decimal in pounds-force, whole newtons from 100 N on, else one decimal. */
export function formatLoad(newton: number, units: LengthUnits): string {
  if (units === 'in') return `${tidyNumber(newton / NEWTON_PER_POUND_FORCE, 1)} lbf`;
  return `${tidyNumber(newton, Math.abs(newton) >= 100 ? 0 : 1)} N`;
}
