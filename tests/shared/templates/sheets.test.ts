import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Point } from '../../../shared/geometry/point.ts';
import { planSheets, sheetName, type SheetWish } from '../../../shared/templates/sheets.ts';

const wall = { widthMm: 4000, heightMm: 2600 };
const wish: SheetWish = { paper: 'a4', marginMm: 12.7, overlapMm: 12, correction: { x: 1, y: 1 }, units: 'mm', join: 'overlap', rollWidthMm: null, longPages: 'split', orientation: 'fewest', origin: null };

function square(x: number, y: number, side: number): Point[] {
  return [{ x, y }, { x: x + side, y }, { x: x + side, y: y + side }, { x, y: y + side }];
}

/** Points every few millimetres along an outline. */
function along(outline: Point[]): Point[] {
  return outline.flatMap((a, i) => {
    const b = outline[(i + 1) % outline.length]!;
    return Array.from({ length: 60 }, (_, k) => ({ x: a.x + ((b.x - a.x) * k) / 60, y: a.y + ((b.y - a.y) * k) / 60 }));
  });
}

const anOutline = fc
  .record({ x: fc.double({ min: 300, max: 1800, noNaN: true }), y: fc.double({ min: 300, max: 1500, noNaN: true }), r: fc.double({ min: 60, max: 260, noNaN: true }), n: fc.integer({ min: 3, max: 8 }), turn: fc.double({ min: 0, max: 6, noNaN: true }) })
  .map(({ x, y, r, n, turn }) => Array.from({ length: n }, (_, i): Point => ({ x: x + r * Math.cos(turn + (2 * Math.PI * i) / n), y: y + r * Math.sin(turn + (2 * Math.PI * i) / n) })));

describe('the grid of sheets', { timeout: 60_000 }, () => {
  it('shows every line on some sheet, and no sheet is blank', () => {
    fc.assert(
      fc.property(fc.array(anOutline, { minLength: 1, maxLength: 4 }), fc.constantFrom('mm' as const, 'in' as const), (outlines, units) => {
        const { sheets } = planSheets({ outlines, screws: [] }, wall, { ...wish, units });
        const points = outlines.flatMap(along);
        const on = (p: Point, w: (typeof sheets)[number]['window'], slack: number) =>
          p.x >= w.x - slack && p.x <= w.x + w.width + slack && p.y >= w.y - slack && p.y <= w.y + w.height + slack;
        for (const p of points) expect(sheets.some((s) => on(p, s.window, 1e-6))).toBe(true);
        for (const s of sheets) expect(points.some((p) => on(p, s.window, 5))).toBe(true);
      }),
      { numRuns: 10 },
    );
  });

  it('takes one sheet for what fits on one, and two for what is a little too long for one', () => {
    // A4 upright less 12.7 mm all round, 25 mm of title and 9 mm of bar leaves 175.6 by 246.6; lying it leaves 262.6 by 159.6.
    expect(planSheets({ outlines: [square(500, 900, 150)], screws: [] }, wall, wish).sheets).toHaveLength(1);
    const long = [{ x: 500, y: 900 }, { x: 765, y: 900 }, { x: 765, y: 1040 }, { x: 500, y: 1040 }];
    expect(planSheets({ outlines: [long], screws: [] }, wall, wish).sheets).toHaveLength(2);
  });

  it('leaves out the sheet in the middle of a frame with nothing to draw on it', () => {
    const { sheets } = planSheets({ outlines: [square(400, 400, 600)], screws: [] }, wall, wish);
    const names = new Set(sheets.map((s) => s.name));
    const rows = Math.max(...sheets.map((s) => s.row)) + 1;
    const columns = Math.max(...sheets.map((s) => s.column)) + 1;
    expect(names.size).toBe(sheets.length);
    expect(sheets.length).toBeLessThan(rows * columns);
  });

  it('cuts where a tape has a mark, and neighbours share at least the overlap asked for', () => {
    for (const [units, mark] of [['mm', 1], ['in', 25.4 / 8]] as const) {
      const { sheets, overlap } = planSheets({ outlines: [square(411.3, 703.9, 500)], screws: [] }, wall, { ...wish, units });
      for (const { window } of sheets) for (const at of [window.x, window.y]) expect(Math.abs(at / mark - Math.round(at / mark))).toBeLessThan(1e-6);
      expect(Math.min(overlap.x, overlap.y)).toBeGreaterThanOrEqual(12);
    }
  });

  it('keeps to the wall where that costs no sheet', () => {
    const { sheets } = planSheets({ outlines: [square(8, 8, 140)], screws: [] }, wall, wish);
    expect(sheets.every((s) => s.window.x >= 0 && s.window.y >= 0)).toBe(true);
  });

  it('letters rows from the bottom and numbers columns from the left', () => {
    const { sheets } = planSheets({ outlines: [square(400, 400, 600)], screws: [] }, wall, wish);
    const a1 = sheets.find((s) => s.name === 'A1');
    if (a1) expect(Math.min(...sheets.map((s) => s.window.y))).toBe(a1.window.y);
    for (const s of sheets) {
      const right = sheets.find((t) => t.name === s.right);
      if (right) expect(right.window.x).toBeGreaterThan(s.window.x);
      const above = sheets.find((t) => t.name === s.above);
      if (above) expect(above.window.y).toBeGreaterThan(s.window.y);
    }
    expect([sheetName(0, 0), sheetName(2, 10), sheetName(25, 0), sheetName(26, 1)]).toEqual(['A1', 'C11', 'Z1', 'AA2']);
  });
});
