/** Reading numbers as people type them: the one place that knows about commas, primes and minus signs. */

const vulgar: Record<string, string> = {
  '½': '1/2', '⅓': '1/3', '⅔': '2/3', '¼': '1/4', '¾': '3/4', '⅕': '1/5', '⅖': '2/5', '⅗': '3/5', '⅘': '4/5',
  '⅙': '1/6', '⅚': '5/6', '⅛': '1/8', '⅜': '3/8', '⅝': '5/8', '⅞': '7/8',
};

/**
 * Brings typographic signs to plain ones: spaces, minus and dashes, fraction slashes, primes and quotes, ready-made fractions.
 * Case is folded and outer space dropped.
 */
export function plainSigns(text: string): string {
  return text
    .replace(/[\u00a0\u2000-\u200a\u202f\u3000\t]/g, ' ')
    .replace(/[\u2010-\u2015\u2212]/g, '-')
    .replace(/[\u2044\u2215]/g, '/')
    .replace(/[\u2032\u2018\u2019\u02b9]/g, "'")
    .replace(/[\u2033\u201c\u201d\u02ba]/g, '"')
    .replace(/''/g, '"')
    .replace(/[½⅓⅔¼¾⅕⅖⅗⅘⅙⅚⅛⅜⅝⅞]/g, (sign) => ` ${vulgar[sign]}`)
    .replace(/- +(\d+\/)/g, '-$1')
    .replace(/ +/g, ' ')
    .trim()
    .toLowerCase();
}

/**
 * Settles whether a comma is a decimal sign or parts thousands, and gives the text with a decimal point.
 * `1,234` alone could be either and gives null; `0,125`, `35,2` and `1.234,5` cannot be mistaken.
 */
export function settleComma(number: string): string | null {
  if (!number.includes(',')) return number;
  if (/^\d{1,3}(,\d{3})+\.\d+$/.test(number) || /^\d{1,3}(,\d{3}){2,}$/.test(number)) return number.replaceAll(',', '');
  if (/^\d{1,3}(\.\d{3})+,\d+$/.test(number)) return number.replaceAll('.', '').replace(',', '.');
  if (/^\d*,\d+$/.test(number)) {
    const [whole = '', part = ''] = number.split(',');
    const couldBeThousands = part.length === 3 && /^[1-9]\d{0,2}$/.test(whole);
    return couldBeThousands ? null : `${whole === '' ? '0' : whole}.${part}`;
  }
  return null;
}

/** A value with at most the given digits behind the point, trailing zeros dropped, a true minus sign, and no minus zero. */
export function tidyNumber(value: number, digits: number): string {
  if (!Number.isFinite(value)) return '–';
  const text = Math.abs(value).toFixed(digits);
  const tidy = text.includes('.') ? text.replace(/\.?0+$/, '') : text;
  return value < 0 && Number(tidy) !== 0 ? `−${tidy}` : tidy;
}
