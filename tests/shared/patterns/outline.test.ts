import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { distance } from '../../../shared/geometry/point.ts';
import { area, centroid, isConvex, signedArea } from '../../../shared/geometry/polygon.ts';
import { frameGeometry } from '../../../shared/patterns/frame.ts';
import { outlineOf, ShapeError } from '../../../shared/patterns/outline.ts';
import { PatternDesign } from '../../../shared/patterns/pattern.ts';
import type { Shape } from '../../../shared/patterns/shape.ts';
import { degrees } from '../../../shared/units/angle.ts';
import { aDesign, anyShape } from './shapes.ts';

// CRC Standard Mathematical Tables, section 5.3: regular polygons of side s, by number of sides: mitre in degrees, area/s², R/s, r/s.
const regular: [n: number, mitre: number, area: number, R: number, r: number][] = [
  [3, 60, 0.433013, 0.57735, 0.288675], [4, 45, 1, 0.707107, 0.5], [5, 36, 1.720477, 0.850651, 0.688191], [6, 30, 2.598076, 1, 0.866025],
  [7, 25.7143, 3.633912, 1.152382, 1.038261], [8, 22.5, 4.828427, 1.306563, 1.207107], [9, 20, 6.181824, 1.461902, 1.373739],
  [10, 18, 7.694209, 1.618034, 1.538842], [11, 16.3636, 9.365640, 1.774733, 1.702844], [12, 15, 11.196152, 1.931852, 1.866025],
];

describe('a regular frame of n sides', () => {
  it.each(regular)('of %i sides has the tabulated bevel %f°, area, circle round and circle within', (n, mitre, areaOverS2, R, r) => {
    const frame = frameGeometry(aDesign({ shape: { kind: 'regular', sides: n, sideMm: 100 }, thicknessMm: 5 }));
    for (const corner of frame.corners) expect(degrees(corner.bevelRad)).toBeCloseTo(mitre, 4);
    expect(frame.outlineAreaMm2 / 1e4).toBeCloseTo(areaOverS2, 6);
    expect(frame.circumradiusMm! / 100).toBeCloseTo(R, 6);
    expect(frame.apothemMm! / 100).toBeCloseTo(r, 6);
    for (const corner of frame.outline) expect(distance({ x: 0, y: 0 }, corner) / 100).toBeCloseTo(R, 6);
    expect(-frame.outline[0]!.y / 100).toBeCloseTo(r, 6);
    expect(frame.outline[1]!.y).toBeCloseTo(frame.outline[0]!.y, 9);
  });
});

describe('the other ready shapes', () => {
  const areaOf = (shape: Shape) => area(outlineOf(shape));

  // Areas by the textbook formula of each figure.
  it.each<[string, Shape, number]>([
    ['half a hexagon', { kind: 'half hexagon', sideMm: 100 }, (2.598076 / 2) * 1e4],
    ['a stretched hexagon: hexagon and a strip √3 s high', { kind: 'stretched hexagon', sideMm: 100, stretchMm: 160 }, 2.598076e4 + 60 * Math.sqrt(3) * 100],
    ['a rhombus: s² sin α', { kind: 'rhombus', sideMm: 100, angleRad: Math.PI / 3 }, 0.866025e4],
    ['a kite: half width × height, of 3-4-5 and 5-12-13 triangles', { kind: 'kite', upperMm: 100, lowerMm: 208, widthMm: 160 }, 0.5 * 160 * (60 + 192)],
    ['a trapezoid: mean width × height', { kind: 'trapezoid', baseMm: 300, topMm: 100, heightMm: 150 }, 30_000],
    ['a rectangle', { kind: 'rectangle', widthMm: 300, heightMm: 200 }, 60_000],
    ['a triangle by Heron: 13-14-15 has 84', { kind: 'triangle', aMm: 140, bMm: 130, cMm: 150 }, 8400],
    ['a free 3-4-5 triangle', { kind: 'free', verticesMm: [[0, 0], [0, 300], [400, 0]] }, 60_000],
  ])('%s has its area', (_, shape, expected) => expect(areaOf(shape) / expected).toBeCloseTo(1, 6));

  it('sides come in the order their fields say', () => {
    const lengths = (shape: Shape) => frameGeometry(aDesign({ shape, thicknessMm: 5 })).members.map((m) => Math.round(m.longPointMm));
    expect(lengths({ kind: 'triangle', aMm: 140, bMm: 130, cMm: 150 })).toEqual([140, 130, 150]);
    expect(lengths({ kind: 'kite', upperMm: 100, lowerMm: 208, widthMm: 160 })).toEqual([208, 100, 100, 208]);
    expect(lengths({ kind: 'half hexagon', sideMm: 100 })).toEqual([200, 100, 100, 100]);
    expect(lengths({ kind: 'stretched hexagon', sideMm: 100, stretchMm: 160 })).toEqual([160, 100, 100, 160, 100, 100]);
    expect(lengths({ kind: 'rectangle', widthMm: 300, heightMm: 200 })).toEqual([300, 200, 300, 200]);
  });

  it('every outline is convex, counter-clockwise, about its own centre, with its lowest side first', () => {
    fc.assert(
      fc.property(anyShape, (shape) => {
        const outline = outlineOf(shape);
        expect(isConvex(outline)).toBe(true);
        expect(signedArea(outline)).toBeGreaterThan(0);
        expect(distance(centroid(outline), { x: 0, y: 0 })).toBeLessThan(1e-9 * 1e4);
        const middles = outline.map((corner, i) => (corner.y + outline[(i + 1) % outline.length]!.y) / 2);
        expect(middles[0]).toBeLessThanOrEqual(Math.min(...middles) + 1e-6);
        expect(outline[1]!.x).toBeGreaterThan(outline[0]!.x);
      }),
    );
  });
});

describe('what cannot be a frame is refused by the name of its field', () => {
  it.each<[string, Shape, string, string]>([
    ['a triangle that does not close', { kind: 'triangle', aMm: 100, bMm: 300, cMm: 150 }, 'bMm', 'does not close'],
    ['a triangle that is a line', { kind: 'triangle', aMm: 300, bMm: 100, cMm: 200 }, 'aMm', 'does not close'],
    ['a kite too wide', { kind: 'kite', upperMm: 100, lowerMm: 200, widthMm: 210 }, 'upperMm', 'does not close'],
    ['a kite whose sides run straight on', { kind: 'kite', upperMm: 100.0001, lowerMm: 100.0001, widthMm: 200 }, 'widthMm', 'straight on'],
    ['a flat rhombus', { kind: 'rhombus', sideMm: 100, angleRad: 0.001 }, 'angleRad', 'no body'],
    ['a concave outline', { kind: 'free', verticesMm: [[0, 0], [300, 0], [80, 80], [0, 300]] }, 'verticesMm.2', 'inwards'],
    ['a crossing outline', { kind: 'free', verticesMm: [[0, 0], [300, 300], [300, 0], [0, 300]] }, 'verticesMm', 'crosses itself'],
    ['a straight corner', { kind: 'free', verticesMm: [[0, 0], [150, 0], [300, 0], [0, 300]] }, 'verticesMm.1', 'straight on'],
    ['corners that coincide', { kind: 'free', verticesMm: [[0, 0], [0, 0], [300, 0], [0, 300]] }, 'verticesMm.0', 'less than 20 mm'],
    ['a corner that is not a number', { kind: 'free', verticesMm: [[0, 0], [Number.NaN, 0], [300, 300]] }, 'verticesMm.1', 'not a number'],
    ['a negative side', { kind: 'regular', sides: 6, sideMm: -5 }, 'sideMm', 'above zero'],
    ['two sides', { kind: 'regular', sides: 2, sideMm: 100 }, 'sides', '3 to 12'],
    ['half a side', { kind: 'regular', sides: 5.5, sideMm: 100 }, 'sides', '3 to 12'],
  ])('%s', (_, shape, path, words) => {
    let error: unknown;
    try {
      outlineOf(shape);
    } catch (thrown) {
      error = thrown;
    }
    expect(error).toBeInstanceOf(ShapeError);
    expect((error as ShapeError).path.join('.')).toBe(path);
    expect((error as ShapeError).message).toContain(words);
  });

  const groove = { widthMm: 7, depthMm: 6.35, clearanceMm: 1, mirrorMm: 3.175, backerMm: 3.175 };
  const hanger = { id: 'a', member: 3, alongMm: 0, insetMm: 6, allowanceMm: [0, 0] as [number, number], bracketId: null, wallScrewId: null, anchorId: null };
  it.each<[string, object, string, string]>([
    ['a negative thickness', { thicknessMm: -19 }, 'thicknessMm', 'at least 3 mm'],
    ['a thickness that is not a number', { thicknessMm: Number.NaN }, 'thicknessMm', 'thickness of the members'],
    ['an endless depth', { depthMm: Infinity }, 'depthMm', 'depth'],
    ['an unknown species', { species: 'cork' }, 'species', 'species'],
    ['no species', { species: undefined }, 'species', 'species'],
    ['members too thick for their sides', { thicknessMm: 90, shape: { kind: 'regular', sides: 3, sideMm: 200 } }, 'thicknessMm', 'no inner face'],
    ['an unknown kind of shape', { shape: { kind: 'heart' } }, 'shape.kind', 'shape'],
    ['a concave shape', { shape: { kind: 'free', verticesMm: [[0, 0], [300, 0], [80, 80], [0, 300]] } }, 'shape.verticesMm.2', 'inwards'],
    ['a groove through the member', { groove: { ...groove, widthMm: 19.05 } }, 'groove.widthMm', 'cuts it through'],
    ['a groove through the frame', { groove: { ...groove, depthMm: 100 } }, 'groove.depthMm', 'cuts it through'],
    ['a panel with nothing to rest on', { groove: { ...groove, clearanceMm: 7 } }, 'groove.clearanceMm', 'rest'],
    ['a hanger on a member that is not there', { hangers: [{ ...hanger, member: 6 }] }, 'hangers.0.member', 'no member 7'],
    ['a hanger beyond its member', { hangers: [{ ...hanger, alongMm: 76 }] }, 'hangers.0.alongMm', 'beyond the end'],
    ['two hangers of one name', { hangers: [hanger, hanger] }, 'hangers.1.id', 'same name'],
  ])('in a pattern: %s', (_, over, path, words) => {
    const read = PatternDesign.safeParse({ ...aDesign(), ...over });
    expect(read.success).toBe(false);
    const issue = read.error!.issues.find((one) => one.path.join('.') === path);
    expect(issue?.message).toContain(words);
  });

  it('a good pattern is taken, with its defaults', () => {
    const read = PatternDesign.parse({ shape: { kind: 'half hexagon', sideMm: 200 }, thicknessMm: 15, depthMm: 90, species: 'cherry', hangers: [hanger] });
    expect(read).toMatchObject({ moisturePercent: 8, groove: null, contentsKg: null });
  });
});
