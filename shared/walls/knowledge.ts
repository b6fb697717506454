import { z } from 'zod';
import { Mark, Point } from './mark.ts';

/** Points of the photo (px) along something known to be straight: a door's edge, a skirting, a stretched string. */
export const StraightEdge = z.array(Point).min(3, 'Mark at least three points along a straight edge.').max(60);

/** Two points of the photo (px) on a line of the wall known to be plumb or level. */
export const TrueLine = z.object({ direction: z.enum(['plumb', 'level']), px: z.tuple([Point, Point]) });

/** Two points of the photo (px) on the wall, and the length between them as measured, mm. */
export const KnownLength = z.object({ px: z.tuple([Point, Point]), mm: z.number({ error: 'Please give a length.' }).finite().min(10, 'A length of less than 10 mm tells nothing.').max(30_000) });

export type StraightEdge = z.infer<typeof StraightEdge>;
export type TrueLine = z.infer<typeof TrueLine>;
export type KnownLength = z.infer<typeof KnownLength>;

/**
 * What is known of a photo. Four or more marks are enough by themselves. Fewer (at least one, which fixes where on the
 * wall the picture lies) do with two or more plumb and two or more level lines, a rectangle's four sides for instance,
 * and one or two lengths.
 */
export const Knowledge = z
  .object({
    marks: z.array(Mark).min(1, 'Mark at least one point whose place on the wall is known.').max(40, 'At most 40 marks are taken.'),
    straightEdges: z.array(StraightEdge).max(20).default([]),
    lines: z.array(TrueLine).max(40).default([]),
    lengths: z.array(KnownLength).max(20).default([]),
    /** Focal length as if on 35 mm film, mm, where someone knows it; else it is read from the photo. */
    focal35Mm: z.number().finite().min(5).max(300).optional(),
  })
  .superRefine((k, ctx) => {
    if (k.marks.length >= 4) return;
    const count = (direction: TrueLine['direction']) => k.lines.filter((l) => l.direction === direction).length;
    if (k.lines.length === 0 && k.lengths.length === 0) ctx.addIssue({ code: 'custom', path: ['marks'], message: 'Mark four points, or draw plumb and level lines and give a length.' });
    else if (count('plumb') < 2 || count('level') < 2) ctx.addIssue({ code: 'custom', path: ['lines'], message: 'Draw at least two plumb and two level lines, or mark four points.' });
    else if (k.lengths.length === 0 && k.marks.length < 2) ctx.addIssue({ code: 'custom', path: ['lengths'], message: 'Give at least one length, better one across and one up.' });
  });
export type Knowledge = z.infer<typeof Knowledge>;

/** How surely things are known: a mark's place on the photo (px) and on the wall (mm), one standard deviation each. */
export interface Sureness {
  px: number;
  mm: number;
}

/**
 * Common practice: under a magnified view a mark is set to about half a preview's pixel, 1/4000 of the photo's longer
 * side; a tape is read to a millimetre.
 */
export function usualSureness(photo: { widthPx: number; heightPx: number }): Sureness {
  return { px: Math.max(0.5, Math.max(photo.widthPx, photo.heightPx) / 4000), mm: 1 };
}
