import { describe, expect, it } from 'vitest';
import { advisedEdgeDiameters, meetStud, zoneHalf } from '../../../shared/hanging/stud-zones.ts';
import { standardWoodScrew } from '../../../shared/hardware/screws.ts';
import { MM_PER_INCH } from '../../../shared/units/constants.ts';

const stud = (xMm: number, uncertaintyMm = 0, id = `at ${xMm}`) => ({ id, xMm, widthMm: 1.5 * MM_PER_INCH, uncertaintyMm });
const number10 = standardWoodScrew('#10', 60).diameterMm;

describe('where a screw counts as in a stud', () => {
  it('is within 2.5 diameters of the edges as the NDS commentary advises: ±.340, ±.275, ±.210 in for #8, #10, #12', () => {
    // 1 1/2 in stud, 0.75 in − 2.5 D (NDS commentary table C12.1.5.7, from memory).
    const half = (size: '#8' | '#10' | '#12') => zoneHalf(stud(0), standardWoodScrew(size, 60).diameterMm, advisedEdgeDiameters) / MM_PER_INCH;
    expect([half('#8'), half('#10'), half('#12')]).toEqual([0.34, 0.275, 0.21].map((v) => expect.closeTo(v, 9)));
  });

  it('ends 1.5 diameters from the edge; between there and 2.5 it is a caution', () => {
    // 0.75 − 1.5 × 0.190 = 0.465 in.
    expect(meetStud(0.27 * MM_PER_INCH, number10, [stud(0)])).toMatchObject({ inStud: true, nearEdge: false });
    expect(meetStud(0.28 * MM_PER_INCH, number10, [stud(0)])).toMatchObject({ inStud: true, nearEdge: true });
    expect(meetStud(-0.465 * MM_PER_INCH, number10, [stud(0)])).toMatchObject({ inStud: true, nearEdge: true, marginMm: expect.closeTo(0, 9) });
    expect(meetStud(0.47 * MM_PER_INCH, number10, [stud(0)])).toMatchObject({ inStud: false, nearEdge: false, marginMm: expect.closeTo(-0.005 * MM_PER_INCH, 9) });
  });

  it('shrinks by what is not known of the stud', () => {
    const quarter = MM_PER_INCH / 4;
    expect(zoneHalf(stud(0), number10) - zoneHalf(stud(0, quarter), number10)).toBeCloseTo(quarter, 12);
    // So badly known that no place is sure.
    expect(meetStud(0, number10, [stud(0, 13)])).toMatchObject({ inStud: false });
  });

  it('is that of the stud with the most room', () => {
    expect(meetStud(400, number10, [stud(0), stud(390), stud(406.4), stud(812.8)])?.studId).toBe('at 406.4');
    expect(meetStud(398, number10, [stud(390), stud(406.4, 6)])?.studId).toBe('at 390');
    expect(meetStud(400, number10, [])).toBeNull();
  });
});
