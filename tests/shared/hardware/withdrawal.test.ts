import { describe, expect, it } from 'vitest';
import { screwCapacity, combinedLoad } from '../../../shared/hardware/dowel.ts';
import { standardLagScrew, standardWoodScrew, type WoodScrewSize } from '../../../shared/hardware/screws.ts';
import { steelTension, withdrawalPerMm } from '../../../shared/hardware/withdrawal.ts';
import { MM_PER_INCH, NEWTON_PER_POUND_FORCE } from '../../../shared/units/constants.ts';

const perInch = (newtonPerMm: number) => (newtonPerMm * MM_PER_INCH) / NEWTON_PER_POUND_FORCE;
const pounds = (newton: number) => newton / NEWTON_PER_POUND_FORCE;

describe('withdrawal of lag screws', () => {
  // NDS-2018 table 12.2A as printed: whole pounds per inch of thread in side grain, by G and diameter.
  const printed: [gravity: number, quarter: number, fiveSixteenths: number, threeEighths: number, half: number][] = [
    [0.73, 397, 469, 538, 668],
    [0.67, 349, 413, 473, 587],
    [0.58, 281, 332, 381, 473],
    [0.55, 260, 307, 352, 437],
    [0.51, 232, 274, 314, 390],
    [0.5, 225, 266, 305, 378],
    [0.42, 173, 205, 235, 291],
    [0.4, 161, 190, 218, 271],
    [0.36, 137, 163, 186, 231],
    [0.35, 132, 156, 179, 222],
    [0.31, 110, 130, 149, 185],
  ];
  it.each(printed)('is as table 12.2A prints it in wood of G %d', (gravity, ...row) => {
    [1 / 4, 5 / 16, 3 / 8, 1 / 2].forEach((d, i) => {
      // The table rounds to whole pounds (and cuts 137.5 down to 137).
      expect(Math.abs(perInch(withdrawalPerMm('lag screw', gravity, d * MM_PER_INCH)) - (row[i] ?? NaN))).toBeLessThanOrEqual(0.55);
    });
  });

  it('is 955 lb for a 1/2 × 4 in lag through 1 1/2 in into southern pine', () => {
    // AWC, Structural Wood Design Solved Example Problems, E2.3: thread 2 3/16 in without the tip, W·p = 4247.94 N at C_D = 1.
    const value = screwCapacity({
      screw: standardLagScrew('1/2', 4 * MM_PER_INCH), plateMm: 1.5 * MM_PER_INCH, gapMm: 0, gravity: 0.55, woodMm: null, angleToGrainRad: 0, loadDuration: 1,
    });
    expect(value.threadMm).toBeCloseTo(2.1875 * MM_PER_INCH, 9);
    expect(value.withdrawalPerMm * value.threadMm).toBeCloseTo(4247.94, 1);
  });
});

describe('withdrawal of wood screws', () => {
  it('is 109 lb per inch for a #10 in wood of G 0.45', () => {
    // Published worked example (handbook page on allowable withdrawal of wood screws: 2850 × 0.45² × 0.190).
    expect(Math.floor(perInch(withdrawalPerMm('wood screw', 0.45, 0.19 * MM_PER_INCH)))).toBe(109);
  });

  it('is a 5.5th of what tears the screw out in the end', () => {
    // Wood Handbook (FPL GTR-190) ch. 8: ultimate 108.25 G² D L (N, mm); 15,700 ÷ 2,850 = 5.51. Constants from memory.
    for (const [g, d] of [[0.42, 4.826], [0.67, 4.166], [0.36, 3.505]] as const) {
      expect((108.25 * g ** 2 * d) / withdrawalPerMm('wood screw', g, d)).toBeCloseTo(15_700 / 2_850, 2);
    }
  });

  it('grows with screw size and with the wood as 2850 G²D says', () => {
    // Values of NDS-2018 eq. 12.2-2 worked out by hand from the equation (table 12.2B prints them in whole pounds).
    const worked: Record<string, [number, number, number, number]> = {
      // G        .42    .50    .67    .73
      '#6': [69.4, 98.3, 176.6, 209.6],
      '#8': [82.4, 116.9, 209.8, 249.1],
      '#10': [95.5, 135.4, 243.1, 288.6],
      '#12': [108.6, 153.9, 276.3, 328.1],
      '#14': [121.7, 172.4, 309.6, 367.5],
    };
    for (const [size, row] of Object.entries(worked)) {
      const screw = standardWoodScrew(size as WoodScrewSize, 50);
      [0.42, 0.5, 0.67, 0.73].forEach((g, i) => expect(perInch(withdrawalPerMm('wood screw', g, screw.diameterMm))).toBeCloseTo(row[i] ?? NaN, 0));
    }
  });

  it('is never more than the steel itself holds', () => {
    const screw = { ...standardWoodScrew('#6', 200), bendingYieldMPa: 100 };
    const value = screwCapacity({ screw, plateMm: 3, gapMm: 0, gravity: 0.73, woodMm: null, angleToGrainRad: 0, loadDuration: 0.9 });
    expect(value.withdrawalN).toBe(steelTension(screw));
  });

  it('counts only the thread that is in the wood', () => {
    const at = (lengthMm: number, woodMm: number | null) =>
      screwCapacity({ screw: standardWoodScrew('#10', lengthMm), plateMm: 3, gapMm: 12.7, gravity: 0.42, woodMm, angleToGrainRad: 0, loadDuration: 0.9 });
    // 75 mm: 50 mm of thread, 59.3 mm in the wood, so all the thread holds.
    expect(at(75, null).threadMm).toBeCloseTo(50, 9);
    // 30 mm: 20 mm of thread but only 14.3 mm reach the wood.
    expect(at(30, null).threadMm).toBeCloseTo(14.3, 9);
    // Coming out behind 40 mm of wood, 19.3 mm of point hold nothing.
    expect(at(75, 40)).toMatchObject({ comesThrough: true, penetrationMm: 40 });
    expect(at(75, 40).threadMm).toBeCloseTo(50 - 19.3, 9);
    expect(at(10, null)).toMatchObject({ penetrationMm: 0, threadMm: 0, withdrawalN: 0, lateralN: 0 });
  });
});

describe('lateral and withdrawal together (NDS-2018 eq. 12.4-1)', () => {
  it.each([
    // W'p 128.953 lb, Z' 49.41 lb; worked out by hand from the equation.
    [0, 49.41], [15, 51.54], [30, 58.42], [45, 71.44], [60, 91.95], [75, 116.4], [90, 128.95],
  ])('at %d° allows %d lb', (angle, allowed) => {
    const value = combinedLoad(128.953 * NEWTON_PER_POUND_FORCE, 49.41 * NEWTON_PER_POUND_FORCE, (angle * Math.PI) / 180);
    expect(pounds(value)).toBeCloseTo(allowed, 2);
  });

  it('allows nothing sideways on a screw too short for it, but still a straight pull', () => {
    expect(combinedLoad(500, 0, Math.PI / 4)).toBe(0);
    expect(combinedLoad(500, 0, 0)).toBe(0);
    expect(combinedLoad(500, 0, Math.PI / 2)).toBe(500);
  });
});
