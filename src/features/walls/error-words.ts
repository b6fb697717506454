import { MM_PER_INCH } from '../../../shared/units/constants.ts';
import { tidyNumber } from '../../../shared/units/number-text.ts';

/** A small error for reading: in millimetres, which its size is judged by, and in decimals of an inch before that in inch shops. */
export function errorWords(mm: number, units: 'in' | 'mm'): string {
  const metric = `${tidyNumber(mm, mm < 10 ? 1 : 0)} mm`;
  return units === 'mm' ? metric : `${tidyNumber(mm / MM_PER_INCH, 2)} in (${metric})`;
}

/** A place or a length in words about errors: errors by `errorWords`, whatever is longer than a hand's breadth by the shop's own way. */
export function measureWords(units: 'in' | 'mm', long: (mm: number) => string): (mm: number) => string {
  return (mm) => (Math.abs(mm) < 80 ? errorWords(mm, units) : long(mm));
}
