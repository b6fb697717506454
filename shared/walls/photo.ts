import { z } from 'zod';
import { id, instant } from '../api/endpoint.ts';
import { FitReport } from './fit-report.ts';
import { KnownLength, StraightEdge, TrueLine } from './knowledge.ts';
import { Mark } from './mark.ts';

/** What was known of a photo beside its marks when it was last straightened. */
export const KnownBeside = z.object({ straightEdges: z.array(StraightEdge), lines: z.array(TrueLine), lengths: z.array(KnownLength) });
export type KnownBeside = z.infer<typeof KnownBeside>;

export const Photo = z.object({
  id,
  widthPx: z.number().int(),
  heightPx: z.number().int(),
  /** Addresses of the upright preview and, once made, of the straightened elevation. */
  previewUrl: z.string(),
  marks: z.array(Mark).nullable(),
  known: KnownBeside.nullish(),
  elevation: z
    .object({
      url: z.string(),
      /** Wall rectangle that the picture shows, mm, and its scale. */
      leftMm: z.number(), bottomMm: z.number(), widthMm: z.number(), heightMm: z.number(), pxPerMm: z.number(),
    })
    .nullable(),
  /** How far the elevation may be out; null until straightened, or where it was straightened before that was told. */
  fit: FitReport.nullish(),
  /** Strength of the finest detail, for `pictureTroubles`; null where it could not be measured. */
  sharpness: z.number().nullish(),
  /** Focal length as if on 35 mm film, mm, as the camera wrote it. */
  focal35Mm: z.number().nullish(),
  createdAt: instant,
});
export type Photo = z.infer<typeof Photo>;

/** A photo in the list of a wall's photos. */
export const ListedPhoto = Photo.extend({ inForce: z.boolean() });
export type ListedPhoto = z.infer<typeof ListedPhoto>;

/** How far a straightening has come. */
export const Progress = z.object({ state: z.enum(['idle', 'waiting', 'fitting', 'reading', 'drawing', 'writing']), share: z.number().min(0).max(1) });
export type Progress = z.infer<typeof Progress>;
