import { MM_PER_FOOT, MM_PER_INCH, type LengthUnits } from './constants.ts';
import { plainSigns, settleComma, tidyNumber } from './number-text.ts';

export type ParsedLength = { mm: number } | { error: string };

const mmPer: Record<string, number> = {
  mm: 1, millimetre: 1, millimetres: 1, millimeter: 1, millimeters: 1,
  cm: 10, centimetre: 10, centimetres: 10, centimeter: 10, centimeters: 10,
  m: 1000, metre: 1000, metres: 1000, meter: 1000, meters: 1000,
  '"': MM_PER_INCH, in: MM_PER_INCH, 'in.': MM_PER_INCH, inch: MM_PER_INCH, inches: MM_PER_INCH,
  "'": MM_PER_FOOT, ft: MM_PER_FOOT, 'ft.': MM_PER_FOOT, foot: MM_PER_FOOT, feet: MM_PER_FOOT,
};
const examples = 'Write a length such as 13 7/8", 1\' 1 7/8", 13.875 in, 352 mm or 35.2 cm.';
const longestMm = 1e6;

/** Value of `13`, `13.5`, `13,5`, `7/8`, `13 7/8` or `13-7/8`; words when it is none of these. */
function readAmount(text: string): { value: number; fraction: boolean } | { error: string } {
  const mixed = /^(?:(\d+)(?: ?- ?| ))?(\d+) ?\/ ?(\d+)$/.exec(text);
  if (mixed) {
    const whole = Number(mixed[1] ?? 0);
    const over = Number(mixed[2]);
    const under = Number(mixed[3]);
    if (under === 0) return { error: 'A fraction cannot have 0 below its line.' };
    if (mixed[1] !== undefined && over >= under) return { error: `${mixed[2]}/${mixed[3]} is not less than one: is the fraction right?` };
    return { value: whole + over / under, fraction: true };
  }
  if (!/^[\d.,]+$/.test(text)) return { error: examples };
  const plain = settleComma(text);
  if (plain === null) return { error: `${text} can be read two ways: write the decimal with a point, and no sign between thousands.` };
  if (!/^(\d+\.?\d*|\.\d+)$/.test(plain)) return { error: examples };
  return { value: Number(plain), fraction: false };
}

/**
 * Reads a length as typed, in mm. A number without a unit is taken in `fallbackUnits`, but a bare fraction (`13 7/8`) is always
 * inches, for nobody reads millimetres in eighths. Accepts inch fractions, feet and inches, mm, cm, m, a decimal comma where it
 * cannot be mistaken for thousands, and typographic fractions, primes and minus signs. A leading minus turns the whole length.
 */
export function parseLength(text: string, fallbackUnits: LengthUnits): ParsedLength {
  const plain = plainSigns(text);
  if (plain === '') return { error: 'Please give a length.' };
  if (plain.length > 60) return { error: examples };
  const sign = plain.startsWith('-') ? -1 : 1;
  const body = plain.replace(/^[-+] ?/, '');

  const feet = /^(.+?) ?('|ft\.?|foot|feet) ?-? ?(\d.*|\.\d.*)$/.exec(body);
  if (feet) return inRange(sign, readFeetAndInches(feet[1] ?? '', feet[3] ?? ''));

  const single = /^(.*?) ?(["']|[a-z]+\.?)?$/.exec(body);
  const amount = readAmount(single?.[1] ?? '');
  if ('error' in amount) return amount;
  const unit = single?.[2] ?? (amount.fraction ? 'in' : fallbackUnits);
  const factor = mmPer[unit];
  if (factor === undefined) return { error: `“${unit}” is not a unit of length known here: use in, ft, mm, cm or m.` };
  return inRange(sign, { mm: amount.value * factor });
}

function readFeetAndInches(feetText: string, inchText: string): ParsedLength {
  if (!/^\d+$/.test(feetText)) return { error: 'Give whole feet when inches follow.' };
  const inches = readAmount(inchText.replace(/ ?("|in\.?|inch|inches)$/, ''));
  if ('error' in inches) return inches;
  return { mm: Number(feetText) * MM_PER_FOOT + inches.value * MM_PER_INCH };
}

function inRange(sign: number, length: ParsedLength): ParsedLength {
  if ('error' in length) return length;
  if (!Number.isFinite(length.mm) || length.mm > longestMm) return { error: 'That is longer than a kilometre: is the unit right?' };
  return { mm: length.mm === 0 ? 0 : sign * length.mm };
}

/**
 * A length for reading: inches with a reduced fraction to the nearest 1/32 (`13 7/8"`), or mm to the nearest 0.1 (`352.4 mm`).
 * `bare` leaves the unit off, for columns whose head tells it.
 */
export function formatLength(mm: number, units: LengthUnits, style: 'with unit' | 'bare' = 'with unit'): string {
  if (!Number.isFinite(mm)) return '–';
  const text = units === 'mm' ? tidyNumber(mm, 1) : inchText(mm);
  if (style === 'bare') return text;
  return units === 'mm' ? `${text} mm` : `${text}"`;
}

const inchParts = 32;

function inchText(mm: number): string {
  const parts = Math.round((Math.abs(mm) / MM_PER_INCH) * inchParts);
  const whole = Math.floor(parts / inchParts);
  let over = parts % inchParts;
  let under = inchParts;
  while (over > 0 && over % 2 === 0) {
    over /= 2;
    under /= 2;
  }
  const fraction = over === 0 ? '' : `${over}/${under}`;
  const text = whole === 0 && fraction !== '' ? fraction : [String(whole), fraction].filter(Boolean).join(' ');
  return mm < 0 && parts > 0 ? `−${text}` : text;
}
