import { describe, expect, it } from 'vitest';
import { drillText, hangOrder, longestSpan } from '../../../shared/templates/hang-order.ts';
import { aHexagon } from './a-template.ts';

describe('the hang order', () => {
  it('goes from the bottom up, each course from the left', () => {
    const frames = [aHexagon('top', 700, 1600, 100), aHexagon('low right', 900, 1000, 100), aHexagon('low left', 500, 1004, 100), aHexagon('middle', 700, 1300, 100)];
    expect(hangOrder(frames).map((f) => f.label)).toEqual(['low left', 'low right', 'middle', 'top']);
  });

  it('names drills as they are sold', () => {
    // The inch is 25.4 mm exactly: 3/32 in = 2.38125 mm, 1/8 in = 3.175 mm, 7/64 in = 2.778 mm.
    expect(drillText({ drillMm: 2.38125 }, 'in')).toBe('drill 3/32" (2.4 mm)');
    expect(drillText({ drillMm: 3.175 }, 'in')).toBe('drill 1/8" (3.2 mm)');
    expect(drillText({ drillMm: 2.778 }, 'in')).toBe('drill 7/64" (2.8 mm)');
    expect(drillText({ drillMm: 3 }, 'mm')).toBe('drill 3 mm');
    expect(drillText({ drillMm: null }, 'mm')).toBe('drill as screw asks');
  });

  it('proves the whole by the two screws farthest apart', () => {
    const frame = { ...aHexagon('1', 0, 0, 100), hangers: [[0, 0], [300, 400], [10, 20]].map(([x, y], i) => ({ id: `${i}`, label: `1${'abc'[i]}`, x: x!, y: y!, drillMm: null, hardware: '' })) };
    // 3-4-5 triangle.
    expect(longestSpan([frame])).toMatchObject({ from: { label: '1a' }, to: { label: '1b' }, mm: 500 });
    expect(longestSpan([])).toBeNull();
  });
});
