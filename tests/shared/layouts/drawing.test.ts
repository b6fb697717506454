import { describe, expect, it } from 'vitest';
import { area, boxOf } from '../../../shared/geometry/polygon.ts';
import { frameDrawing, hatchStrokes, layoutDrawing, type Primitive } from '../../../shared/layouts/drawing.ts';
import type { Frame } from '../../../shared/layouts/layout.ts';
import type { PatternDesign } from '../../../shared/patterns/pattern.ts';

const square: PatternDesign = {
  shape: { kind: 'rectangle', widthMm: 400, heightMm: 400 }, thicknessMm: 20, depthMm: 100, species: 'walnut', moisturePercent: 8,
  groove: { widthMm: 6, depthMm: 7, clearanceMm: 1, mirrorMm: 3, backerMm: 3 },
  hangers: [{ id: 'a', member: 2, alongMm: 120, insetMm: 10, allowanceMm: [-50, 50], bracketId: null, wallScrewId: null, anchorId: null }], contentsKg: null,
};
const frame: Frame = { id: 'f', patternId: 'p', xMm: 1000, yMm: 1500, turnRad: 0, flipped: false, locked: false, label: '7', contentsKg: null, hungGroup: null };
const of = <K extends Primitive['kind']>(all: Primitive[], kind: K) => all.filter((p): p is Extract<Primitive, { kind: K }> => p.kind === kind);

describe('the drawing of a frame', () => {
  it('is a ring in the tone of its species, as wide as its members, with a joint at every corner and the mirror in the opening', () => {
    const { body } = frameDrawing(square);
    const ring = of(body, 'area').find((a) => a.ink === 'walnut')!;
    expect(area(ring.points) - area(ring.holes[0]!)).toBeCloseTo(400 ** 2 - 360 ** 2, 6);
    const joints = of(body, 'line').filter((l) => l.ink === 'joint');
    expect(joints).toHaveLength(4);
    // A square miter runs at 45°: √2 times the thickness.
    for (const { points } of joints) expect(Math.hypot(points[1]!.x - points[0]!.x, points[1]!.y - points[0]!.y)).toBeCloseTo(20 * Math.SQRT2, 9);
    expect(of(body, 'area').some((a) => a.ink === 'mirror')).toBe(true);
  });

  it('flipped, has its hangers on the other side', () => {
    const x = (flipped: boolean) => of(frameDrawing(square, flipped).hangers, 'dot')[0]!.at.x;
    // The top member runs right to left, so 120 mm along it lies at the left.
    expect(x(false)).toBeCloseTo(-120, 9);
    expect(x(true)).toBeCloseTo(120, 9);
  });
});

describe('the drawing of a layout', () => {
  const wall = {
    widthMm: 3000, heightMm: 2400,
    studs: [
      { id: 's1', xMm: 400, widthMm: 38, foundBy: 'probe' as const, uncertaintyMm: 2 },
      { id: 's2', xMm: 800, widthMm: 38, foundBy: 'finder' as const, uncertaintyMm: 6 },
    ],
    obstructions: [{ id: 'o', kind: 'switch' as const, name: '', clearanceMm: 20, outlineMm: [[100, 1000], [180, 1000], [180, 1120], [100, 1120]] as [number, number][] }],
  };
  const patterns = [{ id: 'p', name: 'Square', design: square }];

  it('has frames at their places, a question mark at the unconfirmed stud alone, and obstructions hatched, not filled', () => {
    const all = layoutDrawing({ wall, picture: null, frames: [frame], patterns });
    expect(boxOf(of(all, 'area').find((a) => a.ink === 'walnut')!.points)).toEqual({ left: 800, right: 1200, bottom: 1300, top: 1700 });
    expect(of(all, 'text').map((t) => [t.words, t.at.x])).toEqual([['?', 800], ['7', 1000]]);
    expect(of(all, 'hatch')).toHaveLength(1);
    expect(of(all, 'area').some((a) => a.ink === 'obstruction')).toBe(false);
  });

  it('leaves out a frame whose pattern is not given', () => {
    expect(of(layoutDrawing({ wall, picture: null, frames: [{ ...frame, patternId: 'gone' }], patterns }), 'text').some((t) => t.words === '7')).toBe(false);
  });
});

describe('hatching', () => {
  it('covers an area with strokes whose length times their distance is the area', () => {
    const l = [{ x: 0, y: 0 }, { x: 400, y: 0 }, { x: 400, y: 100 }, { x: 100, y: 100 }, { x: 100, y: 300 }, { x: 0, y: 300 }];
    const strokes = hatchStrokes(l, 2);
    const total = strokes.reduce((sum, { from, to }) => sum + Math.hypot(to.x - from.x, to.y - from.y), 0);
    // Strokes of u = y − x every 2 mm are 2/√2 mm apart across.
    expect((total * 2) / Math.SQRT2 / area(l)).toBeCloseTo(1, 2);
  });
});
