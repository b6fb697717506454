import { describe, expect, it } from 'vitest';
import { drillText, hangOrder, hardwareBags, longestSpan } from '../../../shared/templates/hang-order.ts';
import { aHexagon } from './a-template.ts';

describe('the hang order', () => {
  it('goes from the bottom up, each course from the left', () => {
    const frames = [aHexagon('top', 700, 1600, 100), aHexagon('low right', 900, 1000, 100), aHexagon('low left', 500, 1004, 100), aHexagon('middle', 700, 1300, 100)];
    expect(hangOrder(frames).map((f) => f.label)).toEqual(['low left', 'low right', 'middle', 'top']);
  });

  it('grows from a chosen frame, each beside one that hangs already', () => {
    // A comb: side 100, centres √3 × 100 apart up, 150 across; 5 in the middle of a ring.
    const up = Math.sqrt(3) * 100;
    const ring = [['n', 0, up], ['ne', 150, up / 2], ['se', 150, -up / 2], ['s', 0, -up], ['sw', -150, -up / 2], ['nw', -150, up / 2]] as const;
    const frames = [aHexagon('middle', 1000, 1000, 99), ...ring.map(([label, x, y]) => aHexagon(label, 1000 + x, 1000 + y, 99)), aHexagon('far', 2500, 1000, 99)];
    const order = hangOrder(frames, 'middle').map((f) => f.label);
    expect(order[0]).toBe('middle');
    expect(order.at(-1)).toBe('far');
    // The upper neighbours rest on those beside them: the topmost comes after both.
    expect(order.indexOf('n')).toBeGreaterThan(order.indexOf('nw'));
    expect(order.indexOf('n')).toBeGreaterThan(order.indexOf('ne'));
  });

  it('packs one bag a frame, and bags that are alike together', () => {
    const frames = ['1', '2', '3'].map((label) => aHexagon(label, 500, 500, 100));
    frames[2]!.hangers[0]!.hardware = 'plate; toggle anchor';
    expect(hardwareBags(frames)).toEqual([
      { frames: ['1', '2'], pieces: [{ name: 'plate and #8 screw', count: 2 }] },
      { frames: ['3'], pieces: [{ name: 'plate', count: 1 }, { name: 'plate and #8 screw', count: 1 }, { name: 'toggle anchor', count: 1 }] },
    ]);
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
