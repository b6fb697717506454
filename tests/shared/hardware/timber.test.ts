import { describe, expect, it } from 'vitest';
import { connectionGravity, densityFigure, densityOf, specificGravityAt, speciesIds, timberOf, timbers } from '../../../shared/hardware/timber.ts';

describe('the timber table', () => {
  // Wood Handbook (GTR-190), table 5-3, specific gravity at 12 %; density by its definition: 1000 × SG × 1.12.
  it.each([
    ['white oak', 761.6], ['red oak', 705.6], ['hard maple', 705.6], ['beech', 716.8], ['yellow birch', 694.4], ['white ash', 672], ['walnut', 616],
    ['cherry', 560], ['yellow-poplar', 470.4],
  ])('%s weighs %f kg/m³ at 12 %%', (species, expected) => expect(densityOf(species, 12)).toBeCloseTo(expected, 6));

  it('the gravity relation, run back to green, lands within 5 % of the handbook’s own green column', () => {
    for (const species of speciesIds) {
      const ratio = specificGravityAt(species, 30) / timberOf(species).specificGravityGreen;
      expect(Math.abs(ratio - 1), species).toBeLessThan(0.05);
    }
  });

  // By hand from the relation: G_b 0.60 gives 0.60 / (1 − 0.265 × 0.6 × 0.60) = 0.663 at 12 % and 0.679 at 8 %.
  it('goes between moistures as the relation does by hand', () => {
    const basic = specificGravityAt('white oak', 30);
    expect(specificGravityAt('white oak', 12)).toBeCloseTo(basic / (1 - 0.265 * 0.6 * basic), 12);
    expect(specificGravityAt('white oak', 8) / specificGravityAt('white oak', 12)).toBeCloseTo(0.679 / 0.663, 2);
    // Dry wood is denser in itself, but carries less water: lighter at 8 % than at 12 %.
    for (const species of speciesIds) expect(densityOf(species, 8)).toBeLessThan(densityOf(species, 12));
  });

  // Table 13-5 follows from table 4-3 by C = S / (3000 − 20 S); the oaks are averages of their commercial groups and do not.
  it.each(speciesIds.filter((species) => !species.endsWith('oak')))('%s: both coefficients agree with its shrinkage', (species) => {
    const { shrinkageRadial, shrinkageTangential, changeRadial, changeTangential } = timbers[species];
    expect(shrinkageRadial / (3000 - 20 * shrinkageRadial)).toBeCloseTo(changeRadial, 4);
    expect(shrinkageTangential / (3000 - 20 * shrinkageTangential)).toBeCloseTo(changeTangential, 4);
  });

  it('gives screws the NDS gravity where it has one, else the oven-dry value, always with its source', () => {
    expect(connectionGravity('white oak')).toMatchObject({ value: 0.73, source: expect.stringContaining('NDS') });
    expect(connectionGravity('yellow-poplar').value).toBe(0.43);
    const walnut = connectionGravity('walnut');
    expect(walnut.value).toBeGreaterThan(0.55);
    expect(walnut.value).toBeLessThan(0.6);
    expect(walnut.source).toContain('from memory');
  });

  it('names what it refuses', () => {
    expect(() => densityOf('cork', 12)).toThrow('species: “cork”');
    expect(() => densityOf('toString', 12)).toThrow('species');
    expect(() => densityOf('walnut', -1)).toThrow('moisture content');
    expect(() => densityOf('walnut', Number.NaN)).toThrow('moisture content');
  });

  it('explains a density by figures that give it again', () => {
    const figure = densityFigure('cherry', 8);
    expect(1000 * figure.inputs[2]!.value * (1 + figure.inputs[1]!.value / 100)).toBeCloseTo(figure.value, 9);
    expect(figure.source).toContain('from memory');
  });
});
