import { z } from 'zod';
import { id } from '../api/endpoint.ts';
import { StudSpecies, usualStudSpecies } from '../hardware/stud-species.ts';
import { Mark, Point } from './mark.ts';
import { Photo } from './photo.ts';

/** A length on a wall in mm: finite, above zero, below what any wall of this trade reaches. */
export const wallLengthMm = z.number({ error: 'Please give a length.' }).finite().positive('This length must be more than zero.').max(30_000, 'A wall longer than 30 m must be taken in parts.');
const positionMm = z.number().finite().min(-30_000).max(60_000);

export const constructions = ['wood studs', 'steel studs', 'plaster on lath', 'masonry', 'solid wood'] as const;
export const Construction = z.enum(constructions);

/** How a stud was found; `spacing` is one that only the on-centre spacing promises. */
export const waysFound = ['finder', 'probe', 'magnet', 'seen', 'spacing'] as const;

export const Stud = z.object({
  id,
  /** Centre line, mm from the wall's left edge. */
  xMm: positionMm,
  /** Face width of the stud, mm (1 1/2 in = 38.1). */
  widthMm: z.number().finite().min(10, 'A stud is at least 10 mm wide.').max(300),
  foundBy: z.enum(waysFound),
  /** How far off the centre may be, mm. */
  uncertaintyMm: z.number().finite().min(0).max(100),
});
export type Stud = z.infer<typeof Stud>;

/** A stud counts as confirmed when it was probed, met by a magnet on its fasteners, or seen. */
export function isConfirmed(stud: Pick<Stud, 'foundBy'>): boolean {
  return stud.foundBy === 'probe' || stud.foundBy === 'magnet' || stud.foundBy === 'seen';
}

export const obstructionKinds = ['opening', 'switch', 'outlet', 'thermostat', 'vent', 'radiator', 'trim', 'furniture', 'pipe', 'cable'] as const;

export const Obstruction = z.object({
  id,
  kind: z.enum(obstructionKinds),
  name: z.string().max(80),
  /** Outline on the wall, mm, at least three corners. */
  outlineMm: z.array(z.tuple([positionMm, positionMm])).min(3).max(40),
  clearanceMm: z.number().finite().min(0).max(1000),
});
export type Obstruction = z.infer<typeof Obstruction>;

/** A stretch of the wall's foot where people walk, sit or lie. */
export const Zone = z.object({ id, kind: z.enum(['passage', 'seat', 'bed']), fromMm: positionMm, toMm: positionMm });
export type Zone = z.infer<typeof Zone>;

/** The wall's outline, mm, at least three corners going round, where it is no upright rectangle: under a sloped ceiling for instance. */
export const WallOutline = z.array(z.tuple([positionMm, positionMm])).min(3, 'An outline has at least three corners.').max(20, 'An outline has at most 20 corners.');
export type WallOutline = z.infer<typeof WallOutline>;

export const WallShape = z.object({
  name: z.string().trim().min(1, 'Please name the wall.').max(80),
  widthMm: wallLengthMm,
  heightMm: wallLengthMm,
  construction: Construction,
  /** What lies between bracket and stud, mm (1/2 in board = 12.7). */
  coveringMm: z.number().finite().min(0).max(100, 'A covering is at most 100 mm thick.'),
  /** Species group of the framing (or of a solid wood wall): how hard its wood holds a screw. */
  studSpecies: StudSpecies.default(usualStudSpecies),
  /** Within width and height; none for a wall that fills them. */
  outlineMm: WallOutline.nullish(),
});
export type WallShape = z.infer<typeof WallShape>;

export { Mark, Point, Photo };

export const Wall = WallShape.extend({
  id,
  jobId: id,
  version: z.number().int(),
  studs: z.array(Stud),
  obstructions: z.array(Obstruction),
  zones: z.array(Zone),
  photo: Photo.nullable(),
});
export type Wall = z.infer<typeof Wall>;
