import { describe, expect, it } from 'vitest';
import { distanceBetween, overlapDepth } from '../../../shared/geometry/polygon-distance.ts';
import { boxOf, placedAll, type Polygon } from '../../../shared/geometry/polygon.ts';
import { nextPlace } from '../../../shared/layouts/next-place.ts';
import { outlineOf } from '../../../shared/patterns/outline.ts';
import type { Shape } from '../../../shared/patterns/pattern.ts';

const wall = { widthMm: 3000, heightMm: 2400 };

function placeOneAfterAnother(shapes: Shape[], on = wall): Polygon[] {
  const placed: { frameId: string; outline: Polygon }[] = [];
  shapes.forEach((shape, i) => {
    const outline = outlineOf(shape);
    const at = nextPlace({ outline, neighbours: placed, besideId: i > 0 ? `f${i - 1}` : null, wall: on, revealMm: 4 });
    placed.push({ frameId: `f${i}`, outline: placedAll(outline, at) });
  });
  return placed.map((p) => p.outline);
}

const hexagon: Shape = { kind: 'regular', sides: 6, sideMm: 200 };

describe('a frame placed without a hand', () => {
  it('goes to the middle of an empty wall', () => {
    expect(nextPlace({ outline: outlineOf(hexagon), neighbours: [], besideId: null, wall, revealMm: 4 })).toEqual({ xMm: 1500, yMm: 1200, turnRad: 0, flipped: false });
  });

  it.each<[string, Shape[]]>([
    ['seven hexagons', Array<Shape>(7).fill(hexagon)],
    ['squares and triangles by turns', [0, 1, 2, 3, 4, 5].map((i): Shape => ({ kind: 'regular', sides: i % 2 ? 3 : 4, sideMm: 250 }))],
    ['half hexagons and a kite', [{ kind: 'half hexagon', sideMm: 200 }, { kind: 'half hexagon', sideMm: 200 }, { kind: 'kite', upperMm: 200, lowerMm: 350, widthMm: 260 }]],
  ])('goes beside the last one at the reveal, on the wall and clear of all: %s', (_, shapes) => {
    const outlines = placeOneAfterAnother(shapes);
    outlines.forEach((outline, i) => {
      const { left, right, bottom, top } = boxOf(outline);
      expect(left >= 0 && bottom >= 0 && right <= wall.widthMm && top <= wall.heightMm).toBe(true);
      outlines.slice(0, i).forEach((other) => expect(overlapDepth(outline, other)).toBeLessThan(1e-6));
      if (i > 0) expect(distanceBetween(outline, outlines[i - 1]!)).toBeCloseTo(4, 6);
    });
  });

  it('keeps off what stands in the way as long as there is room elsewhere', () => {
    const outline = outlineOf(hexagon);
    const door = [{ x: 0, y: 0 }, { x: 3000, y: 0 }, { x: 3000, y: 1000 }, { x: 0, y: 1000 }];
    const placed: { frameId: string; outline: Polygon }[] = [];
    for (let i = 0; i < 6; i++) {
      const at = nextPlace({ outline, neighbours: placed, besideId: null, wall, keepClear: [door], revealMm: 4 });
      placed.push({ frameId: `f${i}`, outline: placedAll(outline, at) });
    }
    for (const p of placed) expect(boxOf(p.outline).bottom).toBeGreaterThan(1000);
  });

  it('still finds a clear place elsewhere when the last one stands in a corner it cannot leave', () => {
    const narrow = { widthMm: 420, heightMm: 2400 };
    const outlines = placeOneAfterAnother([hexagon, hexagon, hexagon], narrow);
    for (let i = 0; i < 3; i++) for (let j = 0; j < i; j++) expect(overlapDepth(outlines[i]!, outlines[j]!)).toBeLessThan(1e-6);
  });
});
