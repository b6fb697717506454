import { describe, expect, it } from 'vitest';
import { correctionFrom, MeasuredBars, rulerDoubt } from '../../../shared/templates/printer-correction.ts';

const judge = (measuredMm: number, { printed = 1, division = 0.5, statedMm = 150 } = {}) => correctionFrom({ statedMm, measuredMm }, 'across', printed, division, 'mm');

describe('proving a printer by its bars', () => {
  it('draws the next print as much larger as the last came out too small', () => {
    // 150 mm that measures 148.5 mm is 1 % short: 150 / 148.5 = 1.0101.
    const { kind, verdict } = judge(148.5) as { kind: string; verdict: { factor: number; words: string } };
    expect(kind).toBe('corrected');
    expect(verdict.factor).toBeCloseTo(1.010101, 6);
    expect(verdict.words).toContain('1.5 mm (1.0 %) too short');
  });

  it('builds on the correction that the measured print already bore', () => {
    // Drawn 1 % larger and still 1 % short: 1.01 × 150 / 148.5 = 1.020202.
    expect(judge(148.5, { printed: 1.01 })).toMatchObject({ kind: 'corrected', verdict: { factor: expect.closeTo(1.020202, 6) } });
  });

  it('leaves alone what is within the rule’s own doubt, and says why', () => {
    // Half a division at either end, as root of the sum of squares (JCGM 100:2008): 0.25 √2 = 0.354 mm for a rule in half millimetres.
    expect(rulerDoubt(0.5)).toBeCloseTo(0.354, 3);
    expect(judge(150.3, { printed: 1.004 })).toMatchObject({ kind: 'kept', verdict: { applied: false, factor: 1.004, words: expect.stringContaining('no more than your rule can tell') } });
    expect(judge(150.4)).toMatchObject({ kind: 'corrected' });
    expect(judge(150.4, { division: 1 })).toMatchObject({ kind: 'kept' });
  });

  it('refuses past 3 % and names the box to untick', () => {
    expect(judge(143)).toMatchObject({ kind: 'refused', words: expect.stringContaining('Untick “Fit to page”') });
    expect(judge(154.6)).toMatchObject({ kind: 'refused', words: expect.stringContaining('Untick “Borderless”') });
    // Letter is 279.4 mm high and A4 297 mm: one fitted to the other comes out at 0.941.
    expect(judge((150 * 279.4) / 297)).toMatchObject({ kind: 'refused', words: expect.stringContaining('Letter and A4') });
    expect(judge(148.5, { printed: 1.025 })).toMatchObject({ kind: 'refused' });
    expect(judge(150 / 25.4)).toMatchObject({ kind: 'refused', words: expect.stringContaining('inches') });
  });

  it('takes no bar of nought, nor one that is not a number', () => {
    for (const measuredMm of [0, -1, Number.NaN, Number.POSITIVE_INFINITY]) expect(MeasuredBars.safeParse({ across: { statedMm: 150, measuredMm }, up: { statedMm: 150, measuredMm: 150 } }).success).toBe(false);
  });
});
