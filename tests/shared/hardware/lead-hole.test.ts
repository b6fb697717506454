import { describe, expect, it } from 'vitest';
import { leadHole } from '../../../shared/hardware/lead-hole.ts';
import { standardWoodScrew } from '../../../shared/hardware/screws.ts';

describe('the lead hole of a #10 screw (root 0.152 in, NDS-2018 table L3)', () => {
  const screw = standardWoodScrew('#10', 63.5);

  it('is 90 % of the root in dense hardwood, 70 % in lighter wood (NDS-2018 12.1.5.2, from memory)', () => {
    expect(leadHole(screw, 0.73)).toBeCloseTo(0.9 * 0.152 * 25.4, 6);
    expect(leadHole(screw, 0.55)).toBeCloseTo(0.7 * 0.152 * 25.4, 6);
    expect(leadHole(screw, 0.42)).toBeCloseTo(0.7 * 0.152 * 25.4, 6);
  });
});
