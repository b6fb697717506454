import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { distance, placed, unplaced, type Point } from '../../../shared/geometry/point.ts';
import {
  area, boxOf, boxRing, centroid, contains, counterClockwise, crossesItself, exteriorAngles, isConvex, moved, perimeter, placedAll, reversed, sidesOf, signedArea, turnedAll,
} from '../../../shared/geometry/polygon.ts';
import { distanceBetween, distanceToRim, gapBetween, overlapDepth } from '../../../shared/geometry/polygon-distance.ts';
import { grown, inset } from '../../../shared/geometry/polygon-inset.ts';
import { overlapArea } from '../../../shared/geometry/polygon-overlap.ts';
import { jtsArea, jtsBufferArea, jtsCentroid, jtsDistance, jtsOverlap } from './jts-reference.ts';

const square: Point[] = boxRing({ left: 0, bottom: 0, right: 10, top: 10 });
const ell: Point[] = [[0, 0], [30, 0], [30, 10], [10, 10], [10, 30], [0, 30]].map(([x, y]) => ({ x: x!, y: y! }));
const bowTie: Point[] = [square[0]!, square[2]!, square[1]!, square[3]!];

/** Convex polygons: corners on an ellipse, at angles kept apart, somewhere on a wall. */
const convex = fc
  .record({
    steps: fc.array(fc.double({ min: 0.3, max: 1, noNaN: true }), { minLength: 3, maxLength: 12 }),
    a: fc.double({ min: 60, max: 400, noNaN: true }),
    b: fc.double({ min: 60, max: 400, noNaN: true }),
    x: fc.double({ min: -300, max: 300, noNaN: true }),
    y: fc.double({ min: -300, max: 300, noNaN: true }),
    turn: fc.double({ min: 0, max: 6.28, noNaN: true }),
  })
  .map(({ steps, a, b, x, y, turn }) => {
    const whole = steps.reduce((sum, step) => sum + step, 0);
    let angle = 0;
    const ring = steps.map((step) => {
      angle += (step / whole) * 2 * Math.PI;
      return { x: a * Math.cos(angle), y: b * Math.sin(angle) };
    });
    return moved(turnedAll(ring, turn), x, y);
  });
const place = fc.record({
  xMm: fc.double({ min: -5000, max: 5000, noNaN: true }), yMm: fc.double({ min: -5000, max: 5000, noNaN: true }),
  turnRad: fc.double({ min: -10, max: 10, noNaN: true }), flipped: fc.boolean(),
});

describe('one polygon', () => {
  it('has its area, way round, length and centre', () => {
    expect([area(square), signedArea(reversed(square)), perimeter(square)]).toEqual([100, -100, 40]);
    expect(centroid(square)).toEqual({ x: 5, y: 5 });
    // An L of 30 × 10 and 10 × 20, by its two rectangles: x = y = (300 × 15 + 200 × 5) / 500.
    expect(centroid(ell)).toEqual({ x: 11, y: 11 });
    expect(centroid([{ x: 1, y: 1 }, { x: 3, y: 1 }])).toEqual({ x: 2, y: 1 });
    expect(signedArea(counterClockwise(reversed(ell)))).toBe(500);
    expect(boxOf(ell)).toEqual({ left: 0, bottom: 0, right: 30, top: 30 });
  });

  it('is known as convex, concave or crossing', () => {
    expect([isConvex(square), isConvex(reversed(square)), isConvex(ell), isConvex(bowTie), isConvex(square.slice(0, 2))]).toEqual([true, true, false, false, false]);
    expect([crossesItself(square), crossesItself(bowTie), crossesItself(ell)]).toEqual([false, true, false]);
    // A five-pointed star bends one way at every corner but goes round twice.
    const star = Array.from({ length: 5 }, (_, k) => ({ x: Math.cos((k * 4 * Math.PI) / 5), y: Math.sin((k * 4 * Math.PI) / 5) }));
    expect([isConvex(star), crossesItself(star)]).toEqual([false, true]);
  });

  it('holds points inside and on its rim', () => {
    const at = (x: number, y: number) => contains(ell, { x, y });
    expect([at(5, 5), at(20, 20), at(10, 20), at(0, 0), at(30, 5), at(31, 5), at(-1, 0), at(15, 10)]).toEqual([true, false, true, true, true, false, false, true]);
  });

  it('agrees with JTS in area and centre', () => {
    fc.assert(
      fc.property(convex, (ring) => {
        expect(area(ring)).toBeCloseTo(jtsArea(ring), 5);
        const [ours, theirs] = [centroid(ring), jtsCentroid(ring)];
        expect(distance(ours, theirs)).toBeLessThan(1e-7);
      }),
    );
  });

  it('keeps area, angles and centre wherever it is put, and comes back', () => {
    fc.assert(
      fc.property(convex, place, (ring, at) => {
        const there = placedAll(ring, at);
        expect(signedArea(there)).toBeCloseTo(signedArea(ring), 4);
        expect(distance(centroid(there), placed(centroid(ring), at))).toBeLessThan(1e-6);
        expect(exteriorAngles(there).reduce((sum, bend) => sum + bend, 0)).toBeCloseTo(2 * Math.PI, 9);
        const corner = ring[0]!;
        expect(distance(unplaced(placed(corner, at), at), corner)).toBeLessThan(1e-8);
      }),
    );
  });
});

describe('a polygon drawn in or out', () => {
  it('a square loses twice the inset each way, and at last everything', () => {
    expect(area(inset(square, 2))).toBeCloseTo(36, 9);
    expect(inset(square, 5)).toEqual([]);
    expect(inset(square, 7)).toEqual([]);
    expect(area(inset(square, -1))).toBeCloseTo(144, 9);
  });

  it('a short side that its neighbours swallow is dropped', () => {
    const roof = [[0, 0], [100, 0], [55, 60], [45, 60]].map(([x, y]) => ({ x: x!, y: y! }));
    expect(inset(roof, 10)).toHaveLength(3);
    expect(area(inset(roof, 10))).toBeCloseTo(jtsBufferArea(roof, -10), 6);
  });

  it('agrees with JTS’s mitred buffer, and drawing out again gives the outline back', () => {
    fc.assert(
      fc.property(convex, fc.double({ min: 0.5, max: 25, noNaN: true }), (ring, mm) => {
        const inner = inset(ring, mm);
        expect(area(inner)).toBeCloseTo(jtsBufferArea(ring, -mm), 3);
        if (inner.length === ring.length) expect(area(grown(inner, mm))).toBeCloseTo(area(ring), 4);
      }),
    );
  });
});

describe('two polygons', () => {
  const at = (x: number, y: number) => moved(square, x, y);

  it('overlap, touch or stand apart', () => {
    expect([overlapArea(square, at(5, 5)), overlapArea(square, at(10, 0)), overlapArea(square, at(20, 0)), overlapArea(square, square)]).toEqual([25, 0, 0, 100]);
    expect([distanceBetween(square, at(13, 0)), distanceBetween(square, at(13, 14)), distanceBetween(square, at(10, 0)), distanceBetween(square, at(2, 2))]).toEqual([3, 5, 0, 0]);
    expect([overlapDepth(square, at(7, 1)), overlapDepth(square, at(10, 0)), overlapDepth(square, at(12, 0))]).toEqual([3, 0, 0]);
    expect(gapBetween(square, at(13, 0))).toMatchObject({ mm: 3, from: { x: 10 }, to: { x: 13 } });
    expect(distanceToRim(square, { x: 4, y: 5 })).toBe(4);
  });

  it('a frame over a notched opening shares only what it covers, and so do two notched ones', () => {
    expect(overlapArea(at(5, 5), ell)).toBeCloseTo(75, 9);
    expect(overlapArea(ell, at(5, 5))).toBeCloseTo(75, 9);
    const other = moved(ell, 5, 5);
    expect(overlapArea(ell, other)).toBeCloseTo(jtsOverlap(ell, other), 9);
    expect(distanceBetween(at(14, 14), ell)).toBe(4);
  });

  it('agree with JTS in shared area and distance', () => {
    fc.assert(
      fc.property(convex, convex, (a, b) => {
        expect(overlapArea(a, b)).toBeCloseTo(jtsOverlap(a, b), 4);
        expect(overlapArea(b, a)).toBeCloseTo(overlapArea(a, b), 5);
        expect(distanceBetween(a, b)).toBeCloseTo(jtsDistance(a, b), 6);
      }),
      { numRuns: 300 },
    );
  });

  it('overlap in depth just when they overlap in area, and are clear once moved that far the right way', () => {
    fc.assert(
      fc.property(convex, convex, (a, b) => {
        const depth = overlapDepth(a, b);
        if (depth > 0.01) expect(jtsOverlap(a, b)).toBeGreaterThan(0);
        if (jtsOverlap(a, b) > 1) expect(depth).toBeGreaterThan(0);
        if (depth === 0) return;
        const ways = [...outwardWays(a), ...outwardWays(b).map((way) => ({ x: -way.x, y: -way.y }))];
        const left = ways.map((way) => overlapArea(a, moved(b, way.x * depth, way.y * depth)));
        expect(Math.min(...left)).toBeLessThan(1e-6);
      }),
    );
  });
});

/** Unit vectors square to a ring's sides, outwards. */
function outwardWays(ring: Point[]): Point[] {
  return sidesOf(ring).map(({ from, to }) => {
    const length = distance(from, to);
    return { x: (to.y - from.y) / length, y: (from.x - to.x) / length };
  });
}
