import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatLength, parseLength } from '../../../shared/units/length.ts';

const mm = (text: string, units: 'in' | 'mm' = 'in') => {
  const read = parseLength(text, units);
  if ('error' in read) throw new Error(`${text}: ${read.error}`);
  return read.mm;
};
const words = (text: string, units: 'in' | 'mm' = 'in') => {
  const read = parseLength(text, units);
  return 'error' in read ? read.error : `read as ${read.mm}`;
};

describe('a length as a shop types it', () => {
  // An inch is 25.4 mm exactly (international yard and pound agreement, 1959); 13 7/8 in = 13.875 × 25.4 = 352.425 mm.
  it.each([
    ['13 7/8', 352.425], ['13-7/8"', 352.425], ['13 7/8 in', 352.425], ['13.875in', 352.425], ['13⅞', 352.425], ['13 ⅞″', 352.425],
    ['13 7⁄8”', 352.425], ['1\' 1 7/8"', 352.425], ['1′1⅞″', 352.425], ['1 ft 1 7/8 in', 352.425], ["1'-1 7/8\"", 352.425], ["1' 1 7/8", 352.425],
    ['7/8', 22.225], ['½"', 12.7], ['.5', 12.7], ['3\'', 914.4], ['3 feet', 914.4], ['6 ft 0', 1828.8], ['2.5 ft', 762], ['0', 0],
    ['−1/2', -12.7], ['–1 1/2"', -38.1], ['- ½', -12.7], ['-0', 0],
    ['352mm', 352], ['352.4 mm', 352.4], ['35.2 cm', 352], ['35,2 cm', 352], ['1.2 m', 1200], ['1,2 m', 1200], ['0,125 in', 3.175],
    ['1,234.5 mm', 1234.5], ['1.234,5 mm', 1234.5], ['1 1/2 m', 1500],
  ])('reads %s', (text, expected) => expect(mm(text)).toBeCloseTo(expected, 9));

  it('takes a bare number in the shop’s own units, and a bare fraction always as inches', () => {
    expect(mm('352', 'mm')).toBe(352);
    expect(mm('10', 'in')).toBe(254);
    expect(mm('13 7/8', 'mm')).toBeCloseTo(352.425, 9);
  });

  it.each([
    ['', 'give a length'], ['abc', 'Write a length'], ['13 9/8', 'not less than one'], ['7/0', 'cannot have 0'], ['1,234 mm', 'two ways'],
    ['12 furlongs', 'furlongs'], ['1.5\' 3"', 'whole feet'], ['1 2 3', 'Write a length'], ['1e5', 'Write a length'], ['--3', 'Write a length'],
    ['99999 m', 'kilometre'], ['NaN', 'Write a length'], ['Infinity', 'Write a length'], ['1..5', 'Write a length'],
  ])('refuses %j in words', (text, part) => expect(words(text)).toContain(part));
});

describe('a length as it is shown', () => {
  it.each([
    [352.425, '13 7/8"'], [22.225, '7/8"'], [25.4, '1"'], [0, '0"'], [-12.7, '−1/2"'], [25.39, '1"'], [0.79375, '1/32"'], [0.1, '0"'], [-0.1, '0"'],
    [304.8, '12"'], [13.49375, '17/32"'],
  ])('%f mm in inches is %s', (value, text) => expect(formatLength(value, 'in')).toBe(text));

  it('shows mm to a tenth, and a dash for what is no number', () => {
    expect([352.425, 352, 0.04, -3.25].map((v) => formatLength(v, 'mm'))).toEqual(['352.4 mm', '352 mm', '0 mm', '−3.3 mm']);
    expect(formatLength(Number.NaN, 'in')).toBe('–');
    expect(formatLength(352.425, 'in', 'bare')).toBe('13 7/8');
  });

  it('comes back the same to 1/32 in when typed again', () => {
    fc.assert(
      fc.property(fc.integer({ min: -32 * 400, max: 32 * 400 }), (parts) => {
        const length = (parts / 32) * 25.4;
        const text = formatLength(length, 'in');
        expect(mm(text, 'mm')).toBeCloseTo(length, 8);
        expect(formatLength(mm(text), 'in')).toBe(text);
      }),
    );
  });

  it('is never further than 1/64 in from the length it shows', () => {
    fc.assert(
      fc.property(fc.double({ min: -20_000, max: 20_000, noNaN: true }), (length) => {
        expect(Math.abs(mm(formatLength(length, 'in'), 'mm') - length)).toBeLessThanOrEqual(25.4 / 64 + 1e-9);
        expect(Math.abs(mm(formatLength(length, 'mm')) - length)).toBeLessThanOrEqual(0.05 + 1e-9);
      }),
    );
  });
});
