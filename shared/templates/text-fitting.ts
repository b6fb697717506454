import type { Weight } from './drawing.ts';

/**
 * Width of a text, mm, estimated from classes of letters (read off Nunito Sans, within some 8 %). It serves to wrap lines and keep
 * labels apart; a pen that knows the true widths fits what must fit.
 */
export function estimateWidth(words: string, sizeMm: number, weight: Weight = 'regular'): number {
  let em = 0;
  for (const letter of words) em += widthOf(letter);
  return em * sizeMm * (weight === 'bold' ? 1.06 : 1);
}

function widthOf(letter: string): number {
  if (' .,:;\'|!iljI·'.includes(letter)) return 0.26;
  if ('()[]/"-–tfr'.includes(letter)) return 0.36;
  if ('mwMW@%—'.includes(letter)) return 0.86;
  if (letter >= '0' && letter <= '9') return 0.57;
  if (letter >= 'a' && letter <= 'z') return 0.54;
  if (letter >= 'A' && letter <= 'Z') return 0.68;
  return letter.codePointAt(0)! > 0x2e80 ? 1 : 0.62;
}

/** Breaks words into lines no wider than `widthMm` by estimate; a single word that is too wide stands alone. */
export function wrap(words: string, sizeMm: number, widthMm: number, weight: Weight = 'regular'): string[] {
  const lines: string[] = [];
  let current = '';
  for (const word of words.split(/\s+/).filter(Boolean)) {
    const longer = current === '' ? word : `${current} ${word}`;
    if (current !== '' && estimateWidth(longer, sizeMm, weight) > widthMm) {
      lines.push(current);
      current = word;
    } else current = longer;
  }
  if (current !== '') lines.push(current);
  return lines;
}

/** Shortens a text to an estimated width, with an ellipsis. */
export function shorten(words: string, sizeMm: number, widthMm: number, weight: Weight = 'regular'): string {
  if (estimateWidth(words, sizeMm, weight) <= widthMm) return words;
  let kept = [...words];
  while (kept.length > 1 && estimateWidth(`${kept.join('')}…`, sizeMm, weight) > widthMm) kept = kept.slice(0, -1);
  return `${kept.join('').trimEnd()}…`;
}
