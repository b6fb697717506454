import { describe, expect, it } from 'vitest';
import { boundsOf, laidBySpacing, rectangleOutline, studsBySpacing, unconfirmedCount } from '../../../shared/walls/studs.ts';

describe('studs by their spacing', () => {
  it('fill a 10 ft wall at 16 in on centre from a first at 16 in: 16, 32 … 112 in, by the marks of a tape measure', () => {
    const inches = studsBySpacing(16 * 25.4, 16 * 25.4, 120 * 25.4).map((x) => x / 25.4);
    expect(inches.map((x) => Math.round(x * 1e6) / 1e6)).toEqual([16, 32, 48, 64, 80, 96, 112]);
  });

  it('include one that falls exactly on the wall’s right end, and none past it', () => {
    expect(studsBySpacing(0, 600, 2400)).toEqual([0, 600, 1200, 1800, 2400]);
    expect(studsBySpacing(2500, 600, 2400)).toEqual([]);
  });

  it('give way to studs that were found, and take the place of those only promised before', () => {
    const found = { id: 'found', xMm: 818, widthMm: 38.1, foundBy: 'probe' as const, uncertaintyMm: 3 };
    const promised = { id: 'old', xMm: 300, widthMm: 38.1, foundBy: 'spacing' as const, uncertaintyMm: 12.7 };
    const laid = laidBySpacing([found, promised], [406.4, 812.8, 1219.2], 38.1, () => 'new');
    expect(laid.map((s) => [s.id, s.xMm])).toEqual([['new', 406.4], ['found', 818], ['new', 1219.2]]);
  });

  it('are refused at no spacing', () => {
    expect(() => studsBySpacing(0, 0, 2400)).toThrow(/0 mm/);
  });

  it('count as unconfirmed until probed, met by a magnet or seen', () => {
    expect(unconfirmedCount([{ foundBy: 'spacing' }, { foundBy: 'finder' }, { foundBy: 'probe' }, { foundBy: 'magnet' }, { foundBy: 'seen' }])).toBe(2);
  });
});

describe('a rectangle in the way', () => {
  it('is kept as an outline and read back as left, foot, width and height', () => {
    const r = { leftMm: 400, bottomMm: 0, widthMm: 813, heightMm: 2032 };
    expect(boundsOf(rectangleOutline(r))).toEqual(r);
  });
});
