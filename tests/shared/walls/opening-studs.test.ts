import { describe, expect, it } from 'vitest';
import { missingOpeningCentres, openingCentres } from '../../../shared/walls/opening-studs.ts';
import { rectangleOutline } from '../../../shared/walls/studs.ts';

// A 32 in door (812.8 mm) at 1000 mm from the left. Its rough opening is 34 in wide by common practice: 1 in more at each side;
// jacks of 1 1/2 in stand against it and kings of the same against the jacks.
const door = { outlineMm: rectangleOutline({ leftMm: 1000, bottomMm: 0, widthMm: 812.8, heightMm: 2032 }) };
const inch = 25.4;

describe('studs beside an opening', () => {
  it('are a king and a jack at each side of the rough opening', () => {
    const [king, jack, otherJack, otherKing] = openingCentres(door, 1.5 * inch, 4000);
    expect(jack).toBeCloseTo(1000 - 1.75 * inch, 9);
    expect(king).toBeCloseTo(1000 - 3.25 * inch, 9);
    // Between the inner faces of the jacks: the rough opening.
    expect(otherJack! - jack! - 1.5 * inch).toBeCloseTo(34 * inch, 9);
    expect(otherKing! - otherJack!).toBeCloseTo(1.5 * inch, 9);
  });

  it('are not set where one is known, nor off the wall', () => {
    const known = [{ xMm: 1000 - 3.25 * inch + 5 }];
    expect(missingOpeningCentres(door, known, 1.5 * inch, 1850)).toHaveLength(1);
    expect(missingOpeningCentres(door, known, 1.5 * inch, 4000)).toHaveLength(3);
  });
});
