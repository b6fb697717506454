import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { speciesIds, timberOf, type Timber } from '../../../shared/hardware/timber.ts';
import { dimensionalChange, movementFigure, movementOf } from '../../../shared/patterns/movement.ts';
import { aDesign, inch } from './shapes.ts';

const groove = { widthMm: 7, depthMm: 7, clearanceMm: 1, mirrorMm: 3, backerMm: 3 };

describe('wood moves across the grain', () => {
  it('as in the Wood Handbook’s worked example (GTR-190, p. 13-17): 232 mm flat-sawn from 8 to 11 % becomes 233.7 mm', () => {
    // White fir: C_T 0.00245 and the 8 % from memory, the lengths as printed.
    const fir: Timber = { ...timberOf('walnut'), changeTangential: 0.00245, changeRadial: 0.00112 };
    expect(dimensionalChange(232, fir, 'tangential', 8, 11)).toBeCloseTo(1.7, 1);
    expect((232 + dimensionalChange(232, fir, 'tangential', 8, 11)).toFixed(1)).toBe('233.7');
    expect(dimensionalChange(9.15 * inch, fir, 'tangential', 8, 11) / inch).toBeCloseTo(0.067, 3);
  });

  // 140 mm, 4 % of moisture inside 6 to 14 %: table 13-5 coefficients × 560, by hand.
  it.each([
    ['white oak', 2.044, 1.008], ['walnut', 1.534, 1.064], ['hard maple', 1.977, 0.924], ['cherry', 1.389, 0.706], ['beech', 2.414, 1.064],
  ])('%s, 140 mm by 4 %%: %f mm tangential, %f mm radial', (species, tangential, radial) => {
    expect(dimensionalChange(140, timberOf(species), 'tangential', 8, 12)).toBeCloseTo(tangential, 3);
    expect(dimensionalChange(140, timberOf(species), 'radial', 8, 12)).toBeCloseTo(radial, 3);
  });

  it('dried from green (30 %) to nothing it loses its whole shrinkage (table 4-3), by equation 13-3', () => {
    for (const species of speciesIds) {
      const timber = timberOf(species);
      expect(dimensionalChange(100, timber, 'tangential', 30, 0)).toBeCloseTo(-timber.shrinkageTangential, 9);
      expect(dimensionalChange(100, timber, 'radial', 40, 0)).toBeCloseTo(-timber.shrinkageRadial, 9);
    }
  });

  it('wets and dries back to the same size by either equation, within the second order that the handbook neglects', () => {
    fc.assert(
      fc.property(fc.constantFrom(...speciesIds), fc.integer({ min: 4, max: 20 }), fc.integer({ min: 4, max: 20 }), (species, from, to) => {
        const timber = timberOf(species);
        const there = 100 + dimensionalChange(100, timber, 'tangential', from, to);
        const back = there + dimensionalChange(there, timber, 'tangential', to, from);
        expect(Math.abs(back - 100)).toBeLessThan(0.6);
        expect(Math.sign(there - 100)).toBe(Math.sign(to - from));
      }),
    );
  });
});

describe('the panel in a frame that moves', () => {
  it('stays free in walnut built at 8 % and kept between 6 and 12 %', () => {
    const moved = movementOf(aDesign({ moisturePercent: 8, groove, thicknessMm: 19.05 }));
    expect(moved.panelStaysFree).toBe(true);
    // Lip 12.05 mm, radial 0.00190, +4 %: 0.0916 mm of the 1 mm of play.
    expect(moved.wettest.panel!.playMm).toBeCloseTo(1 - 12.05 * 0.0019 * 4, 6);
    expect(moved.wettest.thicknessChangeMm).toBeCloseTo(19.05 * 0.0019 * 4, 9);
    expect(moved.wettest.depthChangeMm).toBeCloseTo(100 * 0.00274 * 4, 9);
    expect(moved.driest.depthChangeMm).toBeCloseTo(-100 * 0.00274 * 2, 9);
  });

  it('quarter-sawn stock changes places with flat-sawn', () => {
    const [flat, quarter] = [movementOf(aDesign({ moisturePercent: 8 }), undefined, 'flat'), movementOf(aDesign({ moisturePercent: 8 }), undefined, 'quarter')];
    expect(quarter.wettest.depthChangeMm / flat.wettest.depthChangeMm).toBeCloseTo(0.0019 / 0.00274, 9);
    expect(flat.panelStaysFree).toBeNull();
  });

  it('binds without clearance, drops out of a groove too narrow, stands proud of one too shallow', () => {
    const free = (over: Partial<typeof groove>) => movementOf(aDesign({ moisturePercent: 8, groove: { ...groove, ...over } })).panelStaysFree;
    expect(free({ clearanceMm: 0.05 })).toBe(false);
    expect(free({ widthMm: 2 })).toBe(false);
    expect(free({ depthMm: 6 })).toBe(false);
  });

  it('a range that leaves out the moisture it was built at reaches to it', () => {
    const moved = movementOf(aDesign({ moisturePercent: 14 }), { lowPercent: 6, highPercent: 10 });
    expect(moved.wettest.thicknessChangeMm).toBe(0);
  });

  it('a figure says which equation and which value was used', () => {
    expect(movementFigure('Depth', 100, 'white oak', 'tangential', 8, 12)).toMatchObject({ formula: expect.stringContaining('C'), source: expect.stringContaining('13-2') });
    const wide = movementFigure('Depth', 100, 'white oak', 'tangential', 8, 18);
    expect(wide.source).toContain('13-3');
    expect(wide.inputs[3]).toMatchObject({ value: 10.5, unit: '%' });
  });
});
