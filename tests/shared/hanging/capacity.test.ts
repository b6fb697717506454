import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkHanger, type CapacityFlag, type HangerFixing } from '../../../shared/hanging/capacity.ts';
import { hang, type HangerLoad, type HungBody } from '../../../shared/hanging/statics.ts';
import type { AnchorBody } from '../../../shared/hardware/anchors.ts';
import type { BracketBody } from '../../../shared/hardware/brackets.ts';
import { standardLagScrew, standardWoodScrew } from '../../../shared/hardware/screws.ts';
import { MM_PER_INCH, NEWTON_PER_POUND_FORCE } from '../../../shared/units/constants.ts';

const inch = (x: number) => x * MM_PER_INCH;
const bracket: BracketBody = { name: 'angle', steelMm: inch(0.125), holeMm: 5.5, wallScrews: 1, frameScrews: 2, frameScrewId: null, ratingN: 600, offsetMm: 15 };
const intoStud: HangerFixing['wall'] = { kind: 'wood', screw: standardWoodScrew('#10', inch(2.5)), gravity: 0.42, coveringMm: inch(0.5), woodMm: inch(3.5) };
const intoFrame: HangerFixing['frame'] = { screw: standardWoodScrew('#8', 32), gravity: 0.6, woodMm: 120, grainRad: null };
const fixing: HangerFixing = { bracket, wall: intoStud, frame: intoFrame, loadDuration: 0.9 };
const anchor: AnchorBody = { name: 'toggle', kind: 'hollow wall', ratedAs: 'allowable', shearN: 400, tensionN: 200 };

function pull(down: number, out: number, sideways = 0): HangerLoad {
  const shearN = Math.hypot(down, sideways);
  return { id: 'h', shear: { x: sideways, y: -down }, shearN, tensionN: out, resultantN: Math.hypot(shearN, out), angleRad: Math.atan2(out, shearN) };
}
const flagIds = (flags: CapacityFlag[]) => flags.map((f) => `${f.part}: ${f.id}`);
const link = (load: HangerLoad, f: HangerFixing, part: string) => {
  const found = checkHanger(load, f).links.find((l) => l.part === part);
  if (!found) throw new Error(`no link ${part}`);
  return found;
};

describe('a screw through a bracket and half an inch of board into a stud', () => {
  it('carries straight down what TR12 gives across the gap, for a load that stays', () => {
    // 55.4 lb for a #10 through .125 in of steel and 1/2 in of board into G .42 (worked out from AWC TR12 table 1-1), × C_D 0.9.
    const down = link(pull(100, 0), fixing, 'wall');
    expect(down.capacityN / NEWTON_PER_POUND_FORCE).toBeCloseTo(55.4 * 0.9, 1);
    expect(down).toMatchObject({ mode: 'IIIs', utilisation: expect.closeTo(100 / down.capacityN, 12) });
  });

  it('carries straight out its thread in the stud', () => {
    // 95.5 lb/in (NDS eq. 12.2-2), 5/3 in of thread, × 0.9.
    expect(link(pull(0, 100), fixing, 'wall').capacityN / NEWTON_PER_POUND_FORCE).toBeCloseTo(95.52 * (2.5 * 2 / 3) * 0.9, 0);
  });

  it('carries in between what NDS eq. 12.4-1 makes of both, but sideways never more than without a pull', () => {
    const z = link(pull(100, 0), fixing, 'wall').capacityN;
    const w = link(pull(0, 100), fixing, 'wall').capacityN;
    // 60° off the wall: cos² is a quarter, sin² three.
    expect(link(pull(50, 50 * Math.sqrt(3)), fixing, 'wall').capacityN).toBeCloseTo((w * z) / (w / 4 + (z * 3) / 4), 9);
    // 30°: the equation alone would allow more than Z' along the wall.
    expect(((w * z) / ((w * 3) / 4 + z / 4)) * Math.cos(Math.PI / 6)).toBeGreaterThan(z);
    expect(link(pull(50 * Math.sqrt(3), 50), fixing, 'wall').capacityN * Math.cos(Math.PI / 6)).toBeCloseTo(z, 9);
  });

  it('tells that the board halves it and that it may reach a cable', () => {
    expect(flagIds(checkHanger(pull(50, 20), fixing).flags)).toEqual(['wall: covering halves lateral', 'wall: may reach a cable']);
    // Bare stud, and no deeper than 1 1/4 in: neither.
    const short = { ...fixing, wall: { ...intoStud, coveringMm: 0, screw: standardWoodScrew('#10', inch(1.25 + 0.125)) } };
    expect(checkHanger(pull(50, 20), short).flags).toEqual([]);
    const deeper = { ...fixing, wall: { ...intoStud, coveringMm: 0, screw: standardWoodScrew('#10', inch(1.25 + 0.126)) } };
    expect(flagIds(checkHanger(pull(50, 20), deeper).flags)).toEqual(['wall: may reach a cable']);
  });

  it('shows every step, the way it yields by name, and a source for each', () => {
    const figures = link(pull(50, 20), fixing, 'wall').figures;
    expect(figures.map((f) => f.label.split(',')[0]?.split(' (')[0])).toEqual([
      'Penetration', 'Withdrawal', 'Withdrawal of one screw', 'Bearing of the wood', 'Lateral of one screw', 'Lateral of one screw', 'One screw in this direction', 'Used',
    ]);
    expect(figures[4]?.label).toContain('mode IIIs: the screw bends in the wood');
    expect(figures.every((f) => f.source.length > 5 && f.inputs.length > 0)).toBe(true);
  });

  it('too short for six diameters holds nothing that pulls it down', () => {
    const check = checkHanger(pull(50, 20), { ...fixing, wall: { ...intoStud, screw: standardWoodScrew('#10', inch(1.7)) } });
    expect(check).toMatchObject({ verdict: 'stop', worst: 'wall', utilisation: Infinity });
    expect(flagIds(check.flags)).toContain('wall: screw too short');
  });

  it('holds nothing when its head slips through the hole', () => {
    const check = checkHanger(pull(50, 20), { ...fixing, bracket: { ...bracket, holeMm: 10 } });
    expect(check.utilisation).toBe(Infinity);
    expect(flagIds(check.flags)).toContain('wall: head slips through');
  });

  it('shares alike with the others of its bracket', () => {
    const two = { ...fixing, bracket: { ...bracket, wallScrews: 2 } };
    expect(link(pull(50, 20), two, 'wall').capacityN).toBeCloseTo(2 * link(pull(50, 20), fixing, 'wall').capacityN, 9);
  });

  it('as a lag feels the grain: less across the stud than along it', () => {
    const lag = { ...fixing, bracket: { ...bracket, holeMm: 8 }, wall: { ...intoStud, screw: standardLagScrew('1/4', inch(3)) } };
    expect(link(pull(0.001, 0, 100), lag, 'wall').capacityN).toBeLessThan(0.85 * link(pull(100, 0), lag, 'wall').capacityN);
    expect(link(pull(0.001, 0, 100), fixing, 'wall').capacityN).toBeCloseTo(link(pull(100, 0), fixing, 'wall').capacityN, 9);
  });
});

describe('an anchor', () => {
  const by = (change: Partial<AnchorBody>, screws = 1): HangerFixing => ({ ...fixing, bracket: { ...bracket, wallScrews: screws }, wall: { kind: 'anchor', anchor: { ...anchor, ...change } } });
  it('is used by the sum of its shares along and out of the wall', () => {
    // V/Va + T/Ta: 100/400 + 50/200.
    expect(link(pull(100, 50), by({}), 'wall').utilisation).toBeCloseTo(0.5, 12);
    expect(link(pull(100, 50), by({}, 2), 'wall').utilisation).toBeCloseTo(0.25, 12);
    expect(link(pull(100, 50), by({}), 'wall').capacityN).toBeCloseTo(2 * Math.hypot(100, 50), 9);
  });
  it('rated by its ultimate load counts a quarter', () => {
    expect(link(pull(100, 50), by({ ratedAs: 'ultimate' }), 'wall').utilisation).toBeCloseTo(2, 12);
  });
  it('without a rating carries nothing, and says so', () => {
    const check = checkHanger(pull(100, 50), by({ tensionN: null }));
    expect(check).toMatchObject({ utilisation: Infinity, verdict: 'stop', worst: 'wall' });
    expect(check.links[0]?.capacityN).toBe(0);
    expect(check.flags[0]).toMatchObject({ id: 'no rating', words: expect.stringContaining('tension') });
  });
});

describe('the weakest link', () => {
  it('decides: here the bracket, by its rating', () => {
    const check = checkHanger(pull(60, 20), { ...fixing, bracket: { ...bracket, ratingN: 65 } });
    expect(check).toMatchObject({ worst: 'bracket', utilisation: expect.closeTo(Math.hypot(60, 20) / 65, 12), verdict: 'caution' });
  });
  it('is a bracket without a rating, and says so', () => {
    const check = checkHanger(pull(60, 20), { ...fixing, bracket: { ...bracket, ratingN: null } });
    expect(check).toMatchObject({ worst: 'bracket', utilisation: Infinity });
    expect(flagIds(check.flags)).toContain('bracket: no rating');
  });
  it('is the frame, where the groove leaves its screw no depth', () => {
    const check = checkHanger(pull(60, 20), { ...fixing, frame: { screw: standardWoodScrew('#8', 32), gravity: 0.6, woodMm: 12, grainRad: 0 } });
    expect(check.worst).toBe('frame');
    expect(flagIds(check.flags)).toEqual(expect.arrayContaining(['frame: screw too short', 'frame: comes through']));
  });
  it('is whatever was not chosen', () => {
    const check = checkHanger(pull(60, 20), { bracket: null, wall: { kind: 'none' }, frame: null, loadDuration: 0.9 });
    expect(check).toMatchObject({ utilisation: Infinity, verdict: 'stop' });
    expect(flagIds(check.flags)).toEqual(['wall: not chosen', 'bracket: not chosen', 'frame: not chosen']);
  });
});

describe('more load', () => {
  const body = (massKg: number): HungBody => ({ massKg, centre: { x: 20, y: 0, z: 80 }, bearingYMm: -150, hangers: [{ id: 'a', x: -70, y: 110 }, { id: 'b', x: 60, y: 90 }] });
  const fixings = fc.constantFrom<HangerFixing>(
    fixing,
    { ...fixing, bracket: { ...bracket, holeMm: 8 }, wall: { ...intoStud, screw: standardLagScrew('5/16', inch(3)) } },
    { ...fixing, wall: { kind: 'anchor', anchor } },
  );
  it('on the same frame never uses a hanger less', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.1, max: 50, noNaN: true }), fc.double({ min: 1, max: 5, noNaN: true }), fixings, (mass, times, f) => {
        const light = hang(body(mass)).hangers.map((h) => checkHanger(h, f).utilisation);
        const heavy = hang(body(mass * times)).hangers.map((h) => checkHanger(h, f).utilisation);
        heavy.forEach((u, i) => expect(u).toBeGreaterThanOrEqual((light[i] ?? NaN) * (1 - 1e-9)));
      }),
    );
  });
  it('down the wall or out of it never uses a hanger less', () => {
    const newtons = fc.double({ min: 0, max: 400, noNaN: true });
    fc.assert(
      fc.property(newtons, newtons, newtons, newtons, fixings, (down, out, moreDown, moreOut, f) => {
        const before = checkHanger(pull(down, out), f).utilisation;
        expect(checkHanger(pull(down + moreDown, out + moreOut), f).utilisation).toBeGreaterThanOrEqual(before - 1e-9);
      }),
    );
  });
});
