import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { overlapDepth } from '../../../shared/geometry/polygon-distance.ts';
import { placedAll, type Placement, type Point } from '../../../shared/geometry/polygon.ts';
import { edgeField, strongestSnap, strongestTip, type EdgeField, type Neighbour } from '../../../shared/layouts/snap.ts';
import { lineField, strongestLines } from '../../../shared/layouts/snap-lines.ts';

const regular = (sides: number, side: number): Point[] => {
  const radius = side / (2 * Math.sin(Math.PI / sides));
  return Array.from({ length: sides }, (_, i) => {
    const angle = -Math.PI / 2 - Math.PI / sides + (2 * Math.PI * i) / sides;
    return { x: radius * Math.cos(angle), y: radius * Math.sin(angle) };
  });
};
const at = (xMm: number, yMm: number, turnRad = 0): Placement => ({ xMm, yMm, turnRad, flipped: false });

/** The same frames without an index: every edge is looked at, whatever is asked. */
function everyEdge(neighbours: readonly Neighbour[]): EdgeField {
  const { edges } = edgeField(neighbours);
  return { neighbours, edges, near: () => [...edges], frames: () => [...neighbours] };
}

function expectSame(a: Placement | undefined, b: Placement | undefined): void {
  expect(a === undefined).toBe(b === undefined);
  if (!a || !b) return;
  expect(Math.hypot(a.xMm - b.xMm, a.yMm - b.yMm)).toBeLessThan(1e-6);
  expect(Math.abs(a.turnRad - b.turnRad)).toBeLessThan(1e-9);
}

describe('the index of a snap', () => {
  it('gives the same answer as looking at every edge of every frame, on random layouts', () => {
    let taken = 0;
    fc.assert(
      fc.property(
        fc.array(fc.record({ sides: fc.integer({ min: 3, max: 8 }), x: fc.integer({ min: 0, max: 2400 }), y: fc.integer({ min: 0, max: 2400 }), turn: fc.double({ min: -3, max: 3, noNaN: true }) }), { minLength: 4, maxLength: 40 }),
        fc.record({ sides: fc.integer({ min: 3, max: 8 }), near: fc.nat(), way: fc.double({ min: 0, max: 6.3, noNaN: true }), turn: fc.double({ min: -3, max: 3, noNaN: true }), gap: fc.integer({ min: 0, max: 30 }) }),
        fc.constantFrom(0, 0.35),
        (others, own, maxTurnRad) => {
          const neighbours = others.map(({ sides, x, y, turn }, i) => ({ frameId: `f${i}`, outline: placedAll(regular(sides, 120), at(x, y, turn)) }));
          const beside = others[own.near % others.length]!;
          const apart = own.gap + [own, beside].reduce((sum, { sides }) => sum + 60 / Math.tan(Math.PI / sides), 0);
          const placement = at(beside.x + apart * Math.cos(own.way), beside.y + apart * Math.sin(own.way), maxTurnRad === 0 ? beside.turn : own.turn);
          const ask = { outline: regular(own.sides, 120), placement, revealMm: 4, reachMm: 40, maxTurnRad };
          const snap = strongestSnap(edgeField(neighbours), ask);
          const slow = strongestSnap(everyEdge(neighbours), ask);
          if (slow) taken++;
          expectSame(snap?.placement, slow?.placement);
          expectSame(strongestTip(edgeField(neighbours), ask)?.placement, strongestTip(everyEdge(neighbours), ask)?.placement);
        },
      ),
      { numRuns: 300 },
    );
    expect(taken).toBeGreaterThan(60);
  });
});

describe('several frames held as one body', () => {
  const square = regular(4, 200);
  // Two squares side by side, held by the left one; a third stays to the right of them.
  const body = [square.map(({ x, y }) => ({ x: x + 203, y }))];
  const stays = { frameId: 's', outline: placedAll(square, at(1000, 1000)) };

  it('snap by whichever of them is near a neighbour, not only by the one under the hand', () => {
    const snap = strongestSnap(edgeField([stays]), { outline: square, body, placement: at(1000 - 203 - 203 - 12, 1005), revealMm: 3, reachMm: 30, maxTurnRad: 0 })!;
    expect(snap.outline).toBe(1);
    expect(snap.placement.xMm).toBeCloseTo(1000 - 2 * 203, 6);
    expect(snap.placement.yMm).toBeCloseTo(1000, 6);
  });

  it('take no snap that lays any of them over a frame that stays', () => {
    fc.assert(
      fc.property(fc.integer({ min: 300, max: 1400 }), fc.integer({ min: 600, max: 1400 }), (x, y) => {
        const field = edgeField([stays, { frameId: 't', outline: placedAll(square, at(700, 1210)) }]);
        const snap = strongestSnap(field, { outline: square, body, placement: at(x, y), revealMm: 3, reachMm: 60, maxTurnRad: 0 });
        if (!snap) return;
        for (const own of [square, ...body]) for (const n of field.neighbours) expect(overlapDepth(placedAll(own, snap.placement), n.outline)).toBeLessThan(1e-5);
      }),
    );
  });
});

describe('a corner that points at a corner', () => {
  it('meets it with the reveal between: two hexagons tip to tip are 2 R and the reveal apart (R = side)', () => {
    const hexagon = regular(6, 200);
    const field = edgeField([{ frameId: 'h', outline: placedAll(hexagon, at(1000, 1000)) }]);
    const snap = strongestTip(field, { outline: hexagon, placement: at(1415, 1010), revealMm: 6, reachMm: 30, maxTurnRad: 0 })!;
    expect(snap.placement.xMm).toBeCloseTo(1406, 6);
    expect(snap.placement.yMm).toBeCloseTo(1000, 6);
  });
});

describe('the lines of a wall', () => {
  const field = lineField({
    wall: { widthMm: 3000, studs: [{ xMm: 400 }, { xMm: 806.4 }] },
    middles: [{ frameId: 'a', at: { x: 1200, y: 1300 } }],
    datumsMm: [1447.8, 1524],
  });

  it('take a middle to the middle of the wall and to the datum, 57 in being 1,447.8 mm (25.4 mm to the inch, by definition)', () => {
    const lines = strongestLines(field, { middles: [{ x: 1492, y: 1450 }], hangers: [] }, 20);
    expect(lines.map(({ line, byMm }) => [line.kind, Number(byMm.toFixed(6))])).toEqual([['wall centre', 8], ['datum', -2.2]]);
  });

  it('take a hanger to the centre of a stud, and a middle in line with another frame’s', () => {
    const [x, y] = strongestLines(field, { middles: [{ x: 790, y: 1305 }], hangers: [{ x: 750, y: 1400 }, { x: 810, y: 1400 }] }, 20);
    expect(x).toMatchObject({ line: { kind: 'stud', atMm: 806.4 } });
    expect(y).toMatchObject({ line: { kind: 'centre line', frameId: 'a' }, byMm: -5 });
  });

  it('find what trying every line finds', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 0, max: 3000 }), { maxLength: 60 }), fc.integer({ min: 0, max: 3000 }), fc.integer({ min: 1, max: 80 }), (xs, x, reach) => {
        const ruled = lineField({ wall: { widthMm: 1e9, studs: xs.map((xMm) => ({ xMm })) }, middles: [], datumsMm: [] });
        const [found] = strongestLines(ruled, { middles: [], hangers: [{ x, y: 0 }] }, reach);
        const nearest = Math.min(...xs.map((s) => Math.abs(s - x)));
        expect(found ? Math.abs(found.byMm) : null).toBe(nearest <= reach ? nearest : null);
      }),
    );
  });
});
