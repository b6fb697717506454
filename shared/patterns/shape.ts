import { z } from 'zod';

const sideMm = z.number({ error: 'Please give a length.' }).finite().min(20, 'A side is at least 20 mm long.').max(3000, 'A side is at most 3 m long.');
const angleRad = z.number({ error: 'Please give an angle.' }).finite().gt(0, 'The angle must be more than 0°.').lt(Math.PI, 'The angle must be less than 180°.');
const sides = z.number({ error: 'Please give the number of sides.' }).int('Whole sides only.').min(3, 'A frame has at least 3 sides.').max(12, 'A frame has at most 12 sides.');
const coordinate = z.number({ error: 'Please give a number.' }).finite().min(-3000, 'A corner lies within 3 m.').max(3000, 'A corner lies within 3 m.');

/**
 * The outline of a frame: its outer faces, as a convex polygon.
 * - stretched hexagon: level top and bottom of `stretchMm`, the four others of `sideMm`, all corners 120°
 * - half hexagon: on its long side of twice `sideMm`
 * - rhombus: lying on a side; `angleRad` is the inner angle at the lower left
 * - kite: standing on its point, `lowerMm` the two sides that meet there
 * - trapezoid: both slanting sides alike
 * - triangle: `aMm` below, then b and c counter-clockwise
 * - free: corners in order, either way round
 */
export const Shape = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('regular'), sides, sideMm }),
  z.object({ kind: z.literal('stretched hexagon'), sideMm, stretchMm: sideMm }),
  z.object({ kind: z.literal('half hexagon'), sideMm }),
  z.object({ kind: z.literal('rhombus'), sideMm, angleRad }),
  z.object({ kind: z.literal('kite'), upperMm: sideMm, lowerMm: sideMm, widthMm: sideMm }),
  z.object({ kind: z.literal('trapezoid'), baseMm: sideMm, topMm: sideMm, heightMm: sideMm }),
  z.object({ kind: z.literal('rectangle'), widthMm: sideMm, heightMm: sideMm }),
  z.object({ kind: z.literal('triangle'), aMm: sideMm, bMm: sideMm, cMm: sideMm }),
  z.object({ kind: z.literal('free'), verticesMm: z.array(z.tuple([coordinate, coordinate])).min(3, 'A frame has at least 3 sides.').max(12, 'A frame has at most 12 sides.') }),
], { error: 'This kind of shape is not known here.' });
export type Shape = z.infer<typeof Shape>;
