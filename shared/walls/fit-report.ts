import { z } from 'zod';
import { Point } from './mark.ts';

/** What a straightening says of itself: how well the marks agree, the lens, and how far the picture may be out. */
export const FitReport = z.object({
  /** Each mark's distance from where the fit puts it. */
  residuals: z.array(z.object({ px: z.number(), mm: z.number() })),
  /** One radial term about the picture's centre, by the division model, told as a corner's displacement in hundredths of its distance. */
  lens: z.discriminatedUnion('state', [
    z.object({ state: z.literal('fitted'), lambda: z.number(), cornerPercent: z.number(), spreadPercent: z.number() }),
    z.object({ state: z.literal('left out'), why: z.enum(['too little to tell it by', 'too unsure']) }),
  ]),
  /** What the picture is out by at most, nineteen times in twenty, mm. */
  expectedErrorMm: z.object({
    worst: z.number(), worstAt: Point, middle: z.number(),
    grid: z.object({
      leftMm: z.number(), bottomMm: z.number(), stepXMm: z.number(), stepYMm: z.number(), columns: z.number().int(), rows: z.number().int(),
      values: z.array(z.number().nullable()),
    }),
  }),
  /** What to measure next; `mm` is null for a straight edge to be marked. */
  next: z.object({ mm: Point.nullable(), worstMm: z.number(), worstThenMm: z.number(), where: z.string() }).nullable(),
  contradiction: z.object({ which: z.object({ what: z.enum(['mark', 'length']), index: z.number().int(), offMm: z.number() }).nullable() }).nullable(),
  /** The finest the photo shows the wall, px per mm, and how surely a mark is set, px. */
  photoPxPerMm: z.number(),
  surePx: z.number(),
});
export type FitReport = z.infer<typeof FitReport>;
