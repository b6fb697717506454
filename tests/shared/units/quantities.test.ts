import { describe, expect, it } from 'vitest';
import { formatAngle, parseAngle, radians } from '../../../shared/units/angle.ts';
import { boardFeet, netBoardFeet, surfaceMeasure } from '../../../shared/units/board-feet.ts';
import { CUBIC_METRE_PER_BOARD_FOOT, KG_PER_M3_PER_PCF, NEWTON_PER_POUND_FORCE, PASCAL_PER_PSF } from '../../../shared/units/constants.ts';
import { formatFigure } from '../../../shared/units/figure.ts';
import { formatLoad, formatMass, parseLoad, parseMass } from '../../../shared/units/mass.ts';
import { formatStress, parseStress } from '../../../shared/units/stress.ts';

const inch = 25.4;
const foot = 304.8;

describe('conversion factors', () => {
  // NIST SP 811 (2008), appendix B.8, from memory: lbf 4.448222 N, lbf/ft² 47.88026 Pa, lb/ft³ 16.01846 kg/m³, board foot 2.359737e-3 m³.
  it.each([
    ['pound-force', NEWTON_PER_POUND_FORCE, 4.448222], ['pound-force per square foot', PASCAL_PER_PSF, 47.88026],
    ['pound per cubic foot', KG_PER_M3_PER_PCF, 16.01846], ['board foot', CUBIC_METRE_PER_BOARD_FOOT * 1000, 2.359737],
  ])('the %s agrees with the NIST table', (_, ours, table) => expect(ours / table).toBeCloseTo(1, 6));
});

describe('board feet as the NHLA rules tally them', () => {
  // NHLA, Rules for the Measurement and Inspection of Hardwood and Cypress: worked surface measures.
  it.each([
    ['6 1/4 in × 8 ft', 6.25, 8, 4], ['6 1/2 in × 8 ft', 6.5, 8, 4], ['8 in × 12 ft', 8, 12, 8], ['10 in × 13 ft', 10, 13, 11],
  ])('%s has its published surface measure', (_, width, feet, expected) => expect(surfaceMeasure(width * inch, feet * foot)).toBe(expected));

  it('2 in × 6 1/4 in × 8 ft is 8 board feet (NHLA example), 1 × 6 × 96 in is 4 (a mill’s example)', () => {
    expect(boardFeet(6.25 * inch, 8 * foot, 2 * inch)).toBeCloseTo(8, 9);
    expect(boardFeet(6 * inch, 2438.4, inch)).toBeCloseTo(4, 9);
  });

  it('drops fractions of a foot and counts thin stock as 1 in', () => {
    expect(surfaceMeasure(5 * inch, 8.5 * foot)).toBe(surfaceMeasure(5 * inch, 8 * foot));
    expect(boardFeet(6 * inch, 8 * foot, 0.5 * inch)).toBeCloseTo(4, 9);
  });

  it('a cubic foot holds twelve', () => expect(netBoardFeet(foot ** 3)).toBeCloseTo(12, 9));
});

describe('masses, loads and angles', () => {
  it('are read in either system', () => {
    expect(parseMass('5.5 lb', 'mm')).toEqual({ kg: 5.5 * 0.45359237 });
    expect(parseMass('5,5', 'mm')).toEqual({ kg: 5.5 });
    expect(parseMass('10', 'in')).toEqual({ kg: 10 * 0.45359237 });
    expect(parseLoad('1 kN', 'in')).toEqual({ newton: 1000 });
    expect(parseLoad('50 lb', 'mm')).toEqual({ newton: 50 * NEWTON_PER_POUND_FORCE });
    expect(parseAngle('22,5°')).toEqual({ rad: Math.PI / 8 });
  });

  it('strengths are read and shown in psi and N/mm²', () => {
    // NIST SP 811 (2008), appendix B.8, from memory: 1 psi = 6.894757e-3 N/mm².
    expect(parseStress('1 psi', 'mm')).toEqual({ mpa: expect.closeTo(6.894757e-3, 8) });
    expect(parseStress('80,000', 'in')).toEqual({ mpa: expect.closeTo(551.5806, 3) });
    expect(parseStress('80 ksi', 'mm')).toEqual(parseStress('80000 psi', 'mm'));
    expect(parseStress('550 N/mm²', 'in')).toEqual({ mpa: 550 });
    for (const bad of ['', 'hard', '80 kg', '1.2.3']) expect(parseStress(bad, 'in')).toHaveProperty('error');
    expect([formatStress(551.5806, 'in'), formatStress(551.5806, 'mm')]).toEqual(['80,000 psi', '552 N/mm²']);
  });

  it('are refused in words', () => {
    for (const bad of ['', 'heavy', '5 stone', '1,234 kg', '1.2.3']) expect(parseMass(bad, 'in')).toHaveProperty('error');
    expect(parseLoad('5 kg', 'mm')).toHaveProperty('error');
    expect(parseAngle('thirty')).toHaveProperty('error');
  });

  it('are shown short', () => {
    expect([formatMass(2.5, 'in'), formatMass(2.5, 'mm'), formatLoad(220, 'mm'), formatLoad(220, 'in')]).toEqual(['5.5 lb', '2.5 kg', '220 N', '49.5 lbf']);
    expect([formatAngle(radians(30)), formatAngle(Math.PI / 7), formatAngle(radians(-22.5))]).toEqual(['30°', '25.7°', '−22.5°']);
  });

  it('figures follow the shop’s units, and small ones do not vanish', () => {
    expect(formatFigure({ value: 719.5, unit: 'Pa' }, 'in')).toBe('15 lbf/ft²');
    expect(formatFigure({ value: 0.13, unit: 'mm' }, 'in')).toBe('0.005"');
    expect(formatFigure({ value: 25.4 / 16, unit: 'mm' }, 'in')).toBe('1/16"');
    expect(formatFigure({ value: 705.6, unit: 'kg/m³' }, 'in')).toBe('44 lb/ft³');
    expect(formatFigure({ value: 0.00365, unit: '' }, 'mm')).toBe('0.00365');
    expect(formatFigure({ value: 6.894757, unit: 'N/mm²' }, 'in')).toBe('1000 psi');
    expect(formatFigure({ value: 112.98483, unit: 'N·mm' }, 'in')).toBe('1 lbf·in');
  });
});
