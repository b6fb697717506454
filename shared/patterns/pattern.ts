import { z } from 'zod';
import { id } from '../api/endpoint.ts';

const sideMm = z.number({ error: 'Please give a length.' }).finite().min(20, 'A side is at least 20 mm long.').max(3000, 'A side is at most 3 m long.');
const angleRad = z.number().finite().gt(0).lt(Math.PI);

/** The outline of a frame: its outer faces, as a convex polygon. */
export const Shape = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('regular'), sides: z.number().int('Whole sides only.').min(3, 'A frame has at least 3 sides.').max(12, 'A frame has at most 12 sides.'), sideMm }),
  z.object({ kind: z.literal('stretched hexagon'), sideMm, stretchMm: sideMm }),
  z.object({ kind: z.literal('half hexagon'), sideMm }),
  z.object({ kind: z.literal('rhombus'), sideMm, angleRad }),
  z.object({ kind: z.literal('kite'), upperMm: sideMm, lowerMm: sideMm, widthMm: sideMm }),
  z.object({ kind: z.literal('trapezoid'), baseMm: sideMm, topMm: sideMm, heightMm: sideMm }),
  z.object({ kind: z.literal('rectangle'), widthMm: sideMm, heightMm: sideMm }),
  z.object({ kind: z.literal('triangle'), aMm: sideMm, bMm: sideMm, cMm: sideMm }),
  z.object({ kind: z.literal('free'), verticesMm: z.array(z.tuple([z.number().finite(), z.number().finite()])).min(3, 'A frame has at least 3 sides.').max(12, 'A frame has at most 12 sides.') }),
]);
export type Shape = z.infer<typeof Shape>;

export const speciesIds = ['white ash', 'beech', 'yellow birch', 'cherry', 'hard maple', 'red maple', 'red oak', 'white oak', 'walnut', 'yellow-poplar'] as const;
export const Species = z.enum(speciesIds, { error: 'This species is not in the timber table.' });
export type Species = z.infer<typeof Species>;

/** One hanger of a frame: where its wall screw meets the wall, told along a member. */
export const Hanger = z.object({
  id: z.string().min(1).max(40),
  /** Member by number, 0 first, counter-clockwise from the pattern's lowest side. */
  member: z.number().int().min(0).max(11),
  /** Along the member from the middle of its outer side, mm, counter-clockwise positive. */
  alongMm: z.number().finite().min(-3000).max(3000),
  /** In from the outer face, square to it, mm. */
  insetMm: z.number().finite().min(0).max(500),
  /** How far it may slide along the member either way, mm: [lowest, highest] offset. */
  allowanceMm: z.tuple([z.number().finite().max(0), z.number().finite().min(0)]),
  bracketId: id.nullable(),
  wallScrewId: id.nullable(),
});
export type Hanger = z.infer<typeof Hanger>;

export const Groove = z.object({
  /** From the inner face outwards, mm. */
  widthMm: z.number().finite().positive().max(100),
  /** From the back edge, mm. */
  depthMm: z.number().finite().positive().max(100),
  /** Play left all round the panel, mm. */
  clearanceMm: z.number().finite().min(0).max(10),
  mirrorMm: z.number().finite().min(0).max(20),
  backerMm: z.number().finite().min(0).max(30),
});
export type Groove = z.infer<typeof Groove>;

/** A frame design, as the pattern book keeps it and a signed revision freezes it. */
export const PatternDesign = z.object({
  shape: Shape,
  thicknessMm: z.number().finite().min(3, 'Members are at least 3 mm thick.').max(100, 'Members are at most 100 mm thick.'),
  /** Off the wall, mm. */
  depthMm: z.number().finite().min(10, 'A frame is at least 10 mm deep.').max(600, 'A frame is at most 600 mm deep.'),
  species: Species,
  moisturePercent: z.number().min(4).max(25).default(8),
  groove: Groove.nullable().default(null),
  hangers: z.array(Hanger).max(12),
  /** What a frame of this pattern is to carry, kg; null takes the default rule. */
  contentsKg: z.number().finite().min(0).max(500).nullable().default(null),
});
export type PatternDesign = z.infer<typeof PatternDesign>;

export const Pattern = z.object({ id, name: z.string(), design: PatternDesign, version: z.number().int(), archived: z.boolean() });
export type Pattern = z.infer<typeof Pattern>;
