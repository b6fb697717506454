import fc from 'fast-check';
import type { PatternDesign } from '../../../shared/patterns/pattern.ts';
import type { Shape } from '../../../shared/patterns/shape.ts';

export const inch = 25.4;

/** A hexagon of 150 mm in 19.05 mm walnut at 12 %, 100 mm deep, without groove or hangers; what is given overrides. */
export function aDesign(over: Partial<PatternDesign> = {}): PatternDesign {
  return {
    shape: { kind: 'regular', sides: 6, sideMm: 150 }, thicknessMm: 19.05, depthMm: 100, species: 'walnut', moisturePercent: 12, groove: null, hangers: [], contentsKg: null,
    ...over,
  };
}

const side = fc.double({ min: 120, max: 600, noNaN: true });

/** Any shape that can be a frame, of every kind. */
export const anyShape: fc.Arbitrary<Shape> = fc.oneof(
  fc.record({ kind: fc.constant('regular' as const), sides: fc.integer({ min: 3, max: 12 }), sideMm: side }),
  fc.record({ kind: fc.constant('stretched hexagon' as const), sideMm: side, stretchMm: side }),
  fc.record({ kind: fc.constant('half hexagon' as const), sideMm: side }),
  fc.record({ kind: fc.constant('rhombus' as const), sideMm: side, angleRad: fc.double({ min: 0.6, max: 2.5, noNaN: true }) }),
  fc.record({ upperMm: side, lowerMm: side, share: fc.double({ min: 0.5, max: 1.6, noNaN: true }) })
    .map(({ upperMm, lowerMm, share }) => ({ kind: 'kite' as const, upperMm, lowerMm, widthMm: Math.min(upperMm, lowerMm) * share })),
  fc.record({ kind: fc.constant('trapezoid' as const), baseMm: side, topMm: side, heightMm: side }),
  fc.record({ kind: fc.constant('rectangle' as const), widthMm: side, heightMm: side }),
  fc.record({ aMm: side, bMm: side, share: fc.double({ min: 0.2, max: 0.8, noNaN: true }) })
    .map(({ aMm, bMm, share }) => ({ kind: 'triangle' as const, aMm, bMm, cMm: Math.abs(aMm - bMm) + share * (aMm + bMm - Math.abs(aMm - bMm)) })),
  fc.record({ steps: fc.array(fc.double({ min: 0.5, max: 1, noNaN: true }), { minLength: 3, maxLength: 9 }), a: fc.double({ min: 250, max: 500, noNaN: true }), b: fc.double({ min: 250, max: 500, noNaN: true }), backwards: fc.boolean() })
    .map(({ steps, a, b, backwards }) => {
      const whole = steps.reduce((sum, step) => sum + step, 0);
      let angle = 0;
      const verticesMm = steps.map((step): [number, number] => {
        angle += (step / whole) * 2 * Math.PI;
        return [a * Math.cos(angle) + 900, b * Math.sin(angle) - 400];
      });
      return { kind: 'free' as const, verticesMm: backwards ? verticesMm.reverse() : verticesMm };
    }),
);
