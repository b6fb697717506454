import { z } from 'zod';

export const Point = z.object({ x: z.number().finite(), y: z.number().finite() });

/** A point marked on the photo (px, upright picture, origin top left) whose place on the wall is known (mm). */
export const Mark = z.object({ px: Point, mm: Point });
export type Mark = z.infer<typeof Mark>;
