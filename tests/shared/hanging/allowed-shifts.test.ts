import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { allowedShifts, convexPieces, type WallOutline } from '../../../shared/hanging/allowed-shifts.ts';

const box = (left: number, bottom: number, width: number, height: number): WallOutline => [[left, bottom], [left + width, bottom], [left + width, bottom + height], [left, bottom + height]];
const area = (p: WallOutline) => Math.abs(p.reduce((s, [x, y], i) => {
  const [u, v] = p[(i + 1) % p.length] ?? [NaN, NaN];
  return s + x * v - u * y;
}, 0)) / 2;

/** Distance between two simple polygons, 0 where they overlap: every corner against every side, and corners inside. */
function distance(p: WallOutline, q: WallOutline): number {
  const sides = (o: WallOutline) => o.map((a, i) => [a, o[(i + 1) % o.length] ?? a] as const);
  const toSide = (x: number, y: number, [[ax, ay], [bx, by]]: readonly [readonly [number, number], readonly [number, number]]) => {
    const t = Math.max(0, Math.min(1, ((x - ax) * (bx - ax) + (y - ay) * (by - ay)) / ((bx - ax) ** 2 + (by - ay) ** 2)));
    return Math.hypot(x - ax - t * (bx - ax), y - ay - t * (by - ay));
  };
  const inside = (x: number, y: number, o: WallOutline) => sides(o).filter(([[ax, ay], [bx, by]]) => ay > y !== by > y && x < ax + ((bx - ax) * (y - ay)) / (by - ay)).length % 2 === 1;
  const cross = sides(p).some(([a, b]) => sides(q).some(([c, d]) => {
    const side = (u: readonly [number, number], v: readonly [number, number], w: readonly [number, number]) => (v[0] - u[0]) * (w[1] - u[1]) - (v[1] - u[1]) * (w[0] - u[0]);
    return side(a, b, c) * side(a, b, d) < 0 && side(c, d, a) * side(c, d, b) < 0;
  }));
  if (cross || p.some(([x, y]) => inside(x, y, q)) || q.some(([x, y]) => inside(x, y, p))) return 0;
  return Math.min(...p.flatMap(([x, y]) => sides(q).map((s) => toSide(x, y, s))), ...q.flatMap(([x, y]) => sides(p).map((s) => toSide(x, y, s))));
}

describe('shifts that keep a layout on the wall and clear', () => {
  it('end where its outermost frames reach the ends of the wall', () => {
    expect(allowedShifts([box(200, 0, 300, 300), box(900, 500, 100, 100)], 2000, [])).toEqual([[-200, 1000]]);
    expect(allowedShifts([box(0, 0, 2100, 300)], 2000, [])).toEqual([]);
    expect(allowedShifts([box(0, 0, 2000, 300)], 2000, [])).toEqual([[expect.closeTo(0, 9), expect.closeTo(0, 9)]]);
  });

  it('leave out those that bring a frame nearer to an obstruction than its clearance', () => {
    const outlet = { outlineMm: box(1000, 100, 70, 115), clearanceMm: 50 };
    // 300 mm wide frame from 200: free until its right side is 50 short of the outlet, and again once its left is 50 past it.
    expect(allowedShifts([box(200, 0, 300, 300)], 2000, [outlet])).toEqual([[-200, expect.closeTo(450, 5)], [expect.closeTo(920, 5), 1500]]);
    // A frame well above it does not mind.
    expect(allowedShifts([box(200, 400, 300, 300)], 2000, [outlet])).toEqual([[-200, 1500]]);
    // At a height where only corners come near: 40 up and 30 across is 50.
    expect(allowedShifts([box(200, 255, 300, 300)], 2000, [outlet])).toEqual([[-200, expect.closeTo(470, 5)], [expect.closeTo(900, 5), 1500]]);
  });

  it('let frames touch an obstruction without clearance, and nest into its hollow', () => {
    expect(allowedShifts([box(0, 0, 100, 100)], 400, [{ outlineMm: box(200, 0, 100, 100), clearanceMm: 0 }])).toEqual([[expect.closeTo(0, 9), expect.closeTo(100, 5)], [expect.closeTo(300, 5), 300]]);
    // A U of trim, open at the top, 120 wide inside: the frame hangs into it.
    const u: WallOutline = [[200, 0], [400, 0], [400, 300], [360, 300], [360, 40], [240, 40], [240, 300], [200, 300]];
    expect(allowedShifts([box(0, 100, 100, 100)], 1000, [{ outlineMm: u, clearanceMm: 0 }])).toEqual([
      [expect.closeTo(0, 9), expect.closeTo(100, 5)], [expect.closeTo(240, 5), expect.closeTo(260, 5)], [expect.closeTo(400, 5), 900],
    ]);
  });

  it('agree with distances measured shift by shift, for hexagons and any obstruction', () => {
    const hexagon = fc.tuple(fc.integer({ min: 0, max: 800 }), fc.integer({ min: 100, max: 500 }), fc.integer({ min: 40, max: 150 }), fc.double({ min: 0, max: 6, noNaN: true })).map(([cx, cy, r, turn]): WallOutline =>
      Array.from({ length: 6 }, (_, k) => [cx + r * Math.cos(turn + (k * Math.PI) / 3), cy + r * Math.sin(turn + (k * Math.PI) / 3)] as const));
    // Star-shaped about its middle, so simple, and often hollow.
    const blob = fc.tuple(fc.integer({ min: 0, max: 1000 }), fc.integer({ min: 0, max: 600 }), fc.array(fc.integer({ min: 20, max: 160 }), { minLength: 3, maxLength: 9 })).map(([cx, cy, radii]): WallOutline =>
      radii.map((r, k) => [cx + r * Math.cos((k * 2 * Math.PI) / radii.length), cy + r * Math.sin((k * 2 * Math.PI) / radii.length)] as const));
    fc.assert(
      fc.property(fc.array(hexagon, { minLength: 1, maxLength: 2 }), blob, fc.integer({ min: 0, max: 60 }), (frames, outlineMm, clearanceMm) => {
        const allowed = allowedShifts(frames, 1000, [{ outlineMm, clearanceMm }]);
        for (let shift = -900; shift <= 1100; shift += 23.7) {
          const moved = frames.map((f) => f.map(([x, y]) => [x + shift, y] as const));
          const ends = Math.min(...moved.flat().map(([x]) => x), ...moved.flat().map(([x]) => 1000 - x));
          const gap = Math.min(...moved.map((f) => distance(f, outlineMm)));
          const room = clearanceMm === 0 ? (gap > 0 ? 1 : -1) : gap - clearanceMm;
          if (Math.abs(ends) < 1e-4 || Math.abs(room) < 1e-4) continue;
          expect(allowed.some(([from, to]) => shift >= from && shift <= to)).toBe(ends > 0 && room > 0);
        }
      }),
      { numRuns: 150, endOnFailure: true },
    );
  });

  it('cut hollow outlines into convex pieces of the same area', () => {
    const l: WallOutline = [[0, 0], [300, 0], [300, 100], [100, 100], [100, 300], [0, 300]];
    for (const outline of [l, [...l].reverse()]) {
      const pieces = convexPieces(outline);
      expect(pieces.length).toBeGreaterThan(1);
      expect(pieces.reduce((s, p) => s + area(p), 0)).toBeCloseTo(50_000, 6);
    }
    expect(convexPieces(box(0, 0, 10, 10))).toHaveLength(1);
  });
});
