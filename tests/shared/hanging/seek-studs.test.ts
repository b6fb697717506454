import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { seekStuds, type SeekInput } from '../../../shared/hanging/seek-studs.ts';
import { betterOf, hairMm, scan, tellShift } from './scan-shifts.ts';

const hanger = (id: string, xMm: number, slide: [number, number] = [0, 0], frameId = 'f') => ({ id, frameId, xMm, slide, edgeMm: 0 });
const zone = (xMm: number, halfMm = 10) => ({ studId: `at ${xMm}`, xMm, halfMm });

/** Layouts whose every size is a multiple of the step, or any number of millionths of a millimetre when it is 0. */
function layouts(stepMm: number): fc.Arbitrary<SeekInput> {
  const length = (min: number, max: number) =>
    stepMm === 0 ? fc.double({ min, max, noNaN: true }).map((v) => Math.round(v * 1e6) / 1e6) : fc.integer({ min: Math.ceil(min / stepMm), max: Math.floor(max / stepMm) }).map((n) => n * stepMm);
  const one = fc.record({
    frame: fc.nat(5), xMm: length(0, 1500), down: length(0, 60), up: length(0, 60), edgeMm: length(0, 8),
  });
  const regular = fc.tuple(length(0, 300), fc.constantFrom(38, 300, 406.4, 12), fc.integer({ min: 1, max: 5 }), length(2, 19)).map(([first, apart, n, halfMm]) =>
    Array.from({ length: n }, (_, k) => ({ studId: `s${k}`, xMm: first + k * apart, halfMm })));
  const loose = fc.array(fc.record({ xMm: length(-100, 1700), halfMm: length(0, 25) }), { maxLength: 6 }).map((zs) => zs.map((z, k) => ({ studId: `s${k}`, ...z })));
  const range = fc.tuple(length(-90, 90), length(0, 60)).map(([from, long]): [number, number] => [from, from + long]);
  return fc
    .record({
      hangers: fc.array(one, { minLength: 1, maxLength: 10 }),
      zones: fc.oneof(regular, loose),
      allowed: fc.array(range, { minLength: 1, maxLength: 3 }),
      needed: fc.dictionary(fc.constantFrom('0', '1', '2', '3', '4', '5'), fc.integer({ min: 1, max: 3 })),
    })
    .map(({ hangers, zones, allowed, needed }): SeekInput => ({
      hangers: hangers.map((h, i) => ({ id: `h${i}`, frameId: `${h.frame}`, xMm: h.xMm, slide: [-h.down, h.up], edgeMm: h.edgeMm })),
      zones, allowed, neededByFrame: needed,
    }));
}

describe('seeking studs', () => {
  it('is as good as trying every tenth of a millimetre, on 1,000 layouts', () => {
    // Sizes are multiples of 0.2 mm, so that the best shift is a whole tenth and the scan cannot miss it.
    fc.assert(
      fc.property(layouts(0.2), (input) => {
        const sought = seekStuds(input);
        const scanned = scan(input);
        if (sought.shiftMm === null || scanned === null) throw new Error('Both must find a shift.');
        expect(betterOf(tellShift(input, sought.shiftMm), scanned)).toBe(0);
        expect(sought.score?.hangersInStuds).toBe(scanned.hangersInStuds);
        expect(sought.score?.framesHeld).toBe(scanned.framesHeld);
      }),
      { numRuns: 1000, endOnFailure: true },
    );
  }, 300_000);

  it('is never worse than that where sizes are any numbers', () => {
    fc.assert(
      fc.property(layouts(0), (input) => {
        const sought = seekStuds(input);
        const scanned = scan(input);
        if (sought.shiftMm === null) throw new Error('A shift is allowed.');
        const told = tellShift(input, sought.shiftMm);
        if (scanned) expect(betterOf(told, scanned)).toBeGreaterThanOrEqual(0);
        expect(input.allowed.some(([from, to]) => (sought.shiftMm ?? NaN) >= from - hairMm && (sought.shiftMm ?? NaN) <= to + hairMm)).toBe(true);
        // What it says of the shift is so.
        expect(sought.score).toMatchObject({ framesHeld: told.framesHeld, hangersInStuds: told.hangersInStuds });
        if (told.hangersInStuds > 0) expect(Math.abs((sought.score?.leastMarginMm ?? NaN) - told.leastMarginMm)).toBeLessThan(10 * hairMm);
      }),
      { numRuns: 300, endOnFailure: true },
    );
  }, 300_000);

  it('puts every hanger where it says, within its allowance and in the stud it names', () => {
    fc.assert(
      fc.property(layouts(0), (input) => {
        const { places, shiftMm } = seekStuds(input);
        places.forEach((p, i) => {
          const h = input.hangers[i];
          if (!h || shiftMm === null) throw new Error('One place for each hanger.');
          expect(p.slideMm).toBeGreaterThanOrEqual(h.slide[0] - hairMm);
          expect(p.slideMm).toBeLessThanOrEqual(h.slide[1] + hairMm);
          expect(p.xMm).toBeCloseTo(h.xMm + shiftMm + p.slideMm, 5);
          if (p.studId === null) return expect(p.slideMm).toBe(0);
          const stud = input.zones.find((z) => z.studId === p.studId);
          expect(Math.abs(p.xMm - (stud?.xMm ?? NaN))).toBeLessThanOrEqual((stud?.halfMm ?? NaN) - h.edgeMm + 5 * hairMm);
          expect(p.marginMm).toBeCloseTo((stud?.halfMm ?? NaN) - h.edgeMm - Math.abs(p.xMm - (stud?.xMm ?? NaN)), 4);
        });
      }),
      { numRuns: 200 },
    );
  });

  it('finds the same for a layout moved along with its wall', () => {
    fc.assert(
      fc.property(layouts(0.2), fc.integer({ min: -3000, max: 3000 }), (input, by) => {
        const moved = seekStuds({ ...input, hangers: input.hangers.map((h) => ({ ...h, xMm: h.xMm + by })), zones: input.zones.map((z) => ({ ...z, xMm: z.xMm + by })) });
        expect(moved.shiftMm).toBeCloseTo(seekStuds(input).shiftMm ?? NaN, 5);
      }),
      { numRuns: 100 },
    );
  });

  it('ties are as good in all but the length of the way', () => {
    fc.assert(
      fc.property(layouts(0), (input) => {
        const { ties, shiftMm } = seekStuds(input);
        const best = { ...tellShift(input, shiftMm ?? NaN), shiftMm: 0 };
        for (const { fromMm, toMm } of ties) {
          for (const x of [fromMm, (fromMm + toMm) / 2, toMm]) expect(betterOf({ ...tellShift(input, x), shiftMm: 0, leastMarginMm: best.leastMarginMm }, best)).toBe(0);
          for (const x of [fromMm, toMm]) if (best.hangersInStuds > 0) expect(Math.abs(tellShift(input, x).leastMarginMm - best.leastMarginMm)).toBeLessThan(10 * hairMm);
        }
      }),
      { numRuns: 200 },
    );
  });
});

describe('what wins', () => {
  it('frames that are wholly held come before hangers that meet', () => {
    // To the left one frame gets both its hangers; to the right three frames get one each.
    const input: SeekInput = {
      hangers: [hanger('a1', 0, [0, 0], 'a'), hanger('a2', 100, [0, 0], 'a'), hanger('b1', 500, [0, 0], 'b'), hanger('b2', 600, [0, 0], 'b'), hanger('c1', 900, [0, 0], 'c'), hanger('c2', 1000, [0, 0], 'c'), hanger('d1', 1300, [0, 0], 'd'), hanger('d2', 1400, [0, 0], 'd')],
      zones: [zone(-50), zone(50), zone(550), zone(950), zone(1350)],
      allowed: [[-60, 60]],
    };
    // +50 brings a1, b1, c1, d1 into studs but holds no frame; −50 brings a1, a2, b2, c2, d2 and holds a.
    expect(seekStuds(input)).toMatchObject({ shiftMm: -50, score: { framesHeld: 1, hangersInStuds: 5 }, today: { framesHeld: 0, hangersInStuds: 0 } });
  });

  it('then the largest least margin, and then the shorter way', () => {
    const two: SeekInput = { hangers: [hanger('a', 4), hanger('b', 402)], zones: [zone(0), zone(400)], allowed: [[-50, 50]] };
    // Both can come within 1 mm of their studs' centres.
    expect(seekStuds(two)).toMatchObject({ shiftMm: -3, score: { leastMarginMm: 9 }, today: { leastMarginMm: 6 } });
    const between: SeekInput = { hangers: [hanger('a', 210)], zones: [zone(0), zone(400)], allowed: [[-300, 300]] };
    expect(seekStuds(between)).toMatchObject({ shiftMm: 190, ties: [{ fromMm: -210, toMm: -210 }, { fromMm: 190, toMm: 190 }] });
  });

  it('with room to slide the layout can stay', () => {
    const slides: SeekInput = { hangers: [hanger('a', 12, [-20, 20]), hanger('b', 390, [-20, 20])], zones: [zone(0), zone(400)], allowed: [[-50, 50]] };
    const { shiftMm, places, ties, today, slidOnly } = seekStuds(slides);
    expect(shiftMm).toBe(0);
    expect(places.map((p) => [p.xMm, p.slideMm, p.words])).toEqual([
      [0, -12, 'In the stud when slid 12 mm to the left, on its centre.'],
      [400, 10, 'In the stud when slid 10 mm to the right, on its centre.'],
    ]);
    expect(ties).toEqual([{ fromMm: -10, toMm: 8 }]);
    expect([today.hangersInStuds, slidOnly.hangersInStuds]).toEqual([1, 2]);
  });

  it('a frame may need fewer hangers in studs than it has', () => {
    const input: SeekInput = { hangers: [hanger('a', 0), hanger('b', 150), hanger('c', 390)], zones: [zone(0), zone(400)], allowed: [[-20, 20]], neededByFrame: { f: 2 } };
    expect(seekStuds(input).score).toMatchObject({ framesHeld: 1, hangersInStuds: 2 });
    expect(seekStuds({ ...input, neededByFrame: {} }).score).toMatchObject({ framesHeld: 0, hangersInStuds: 2 });
  });

  it('two hangers whose places only touch are both in', () => {
    // 0.3 + 10 and 420.3 − 410 differ in the last bit of a computer's number.
    const input: SeekInput = { hangers: [hanger('a', 0.1), hanger('b', 420.3)], zones: [zone(0, 10), zone(400, 10)], allowed: [[-100, 100]] };
    expect(seekStuds(input).score).toMatchObject({ hangersInStuds: 1 });
    const touching = { ...input, hangers: [hanger('a', 0.3), hanger('b', 420.3)] };
    for (const needed of [2, 3]) {
      expect(seekStuds({ ...touching, neededByFrame: { f: needed } })).toMatchObject({ shiftMm: -10.3, score: { hangersInStuds: 2, leastMarginMm: 0 } });
    }
  });
});

describe('when there is little to find', () => {
  const input: SeekInput = { hangers: [hanger('a', 100)], zones: [zone(400)], allowed: [[-20, 20]] };
  it('no stud within reach: the layout stays and each hanger says by how much it misses', () => {
    expect(seekStuds(input)).toMatchObject({ shiftMm: 0, score: { hangersInStuds: 0, leastMarginMm: null }, ties: [{ fromMm: -20, toMm: 20 }] });
    expect(seekStuds(input).places[0]).toMatchObject({ studId: null, slideMm: 0, marginMm: -290, words: 'Misses the nearest stud by 290 mm even when slid as far as it may.' });
  });
  it('no studs on the wall', () => {
    expect(seekStuds({ ...input, zones: [] }).places[0]).toMatchObject({ studId: null, marginMm: null, words: 'No studs are marked on this wall.' });
  });
  it('a stud too badly known for the screw', () => {
    const places = seekStuds({ ...input, zones: [zone(100, 3)], hangers: [{ ...hanger('a', 100), edgeMm: 5 }] }).places;
    expect(places[0]).toMatchObject({ studId: null, words: expect.stringContaining('not known well enough') });
  });
  it('no shift allowed: nothing is proposed, today is still scored', () => {
    expect(seekStuds({ ...input, allowed: [] })).toMatchObject({ shiftMm: null, score: null, places: [], today: { hangers: 1, hangersInStuds: 0 } });
  });
  it('today off the wall: the nearest allowed shift', () => {
    expect(seekStuds({ ...input, allowed: [[5, 20]] }).shiftMm).toBe(5);
  });
});
