import { describe, expect, it } from 'vitest';
import { allowedShifts } from '../../../shared/hanging/allowed-shifts.ts';
import { pastFace } from '../../../shared/walls/wall-face.ts';

/** 3 × 2.4 m; the ceiling falls from 2400 mm at x = 1500 to 1200 mm at the right end: y = 2400 − 0.8 (x − 1500). */
const wall = { widthMm: 3000, heightMm: 2400, outlineMm: [[0, 0], [3000, 0], [3000, 1200], [1500, 2400], [0, 2400]] as [number, number][] };
const square = (left: number, bottom: number, side: number) => [[left, bottom], [left + side, bottom], [left + side, bottom + side], [left, bottom + side]] as const;
const shifts = (outline: readonly (readonly [number, number])[], on = wall as Parameters<typeof pastFace>[0]) =>
  allowedShifts([outline], on.widthMm, pastFace(on).map((outlineMm) => ({ outlineMm, clearanceMm: 0 })));

describe('under a sloped ceiling', () => {
  it('a frame may be shifted until its upper corner meets the slope, and no further', () => {
    // Corner at (700, 2100); the slope is at 2100 where x = 1875 (plane geometry).
    const [range, ...more] = shifts(square(300, 1700, 400));
    expect(more).toEqual([]);
    expect(range![0]).toBeCloseTo(-300, 5);
    expect(range![1]).toBeCloseTo(1175, 5);
  });

  it('a low frame is held by the wall’s ends alone, as on a plain wall', () => {
    for (const on of [wall, { ...wall, outlineMm: null }]) {
      const [range] = shifts(square(300, 400, 400), on);
      expect(range![0]).toBeCloseTo(-300, 5);
      expect(range![1]).toBeCloseTo(2300, 5);
    }
  });

  it('an outline that lies free inside the measured rectangle holds a frame on every side', () => {
    const free = { ...wall, outlineMm: [[500, 200], [2500, 200], [2500, 2000], [500, 2000]] as [number, number][] };
    const [range] = shifts(square(1000, 500, 400), free);
    expect(range![0]).toBeCloseTo(-500, 5);
    expect(range![1]).toBeCloseTo(1100, 5);
  });
});
