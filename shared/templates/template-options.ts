import { z } from 'zod';
import { papers } from './papers.ts';

export const templateKinds = ['full', 'screws', 'frames', 'story stick'] as const;
export type TemplateKind = (typeof templateKinds)[number];

/** More than this is not a printer out of true but a print setting. */
export const mostCorrection = 0.03;
const tooFar = 'A correction past 3 % means a print setting is wrong: untick “Fit to page” and print at actual size (100 %).';

/** One axis of the printer's correction: stated length of a bar over the length measured on paper. */
export const correctionFactor = z.number({ error: 'A correction is a number close to 1.' }).min(1 - mostCorrection, tooFar).max(1 + mostCorrection, tooFar);

const mm = (least: number, most: number, words: string) => z.number({ error: words }).min(least, words).max(most, words);
const coordinate = mm(-100_000, 100_000, 'The grid can be set up to 100 m from the wall’s corner.');

/** What the reader chooses about the paper and how the wall is laid on it. */
export const templateOptions = z.object({
  kind: z.enum(templateKinds).default('full'),
  paper: z.enum(papers),
  /** Width of a roll whose width is not in the list, mm. */
  rollWidthMm: mm(100, 5000, 'A roll is between 100 mm and 5 m wide.').nullable().default(null),
  /** What the printer leaves blank round the sheet, mm. */
  marginMm: mm(0, 500, 'A margin is between 0 and 500 mm.').default(12.7),
  join: z.enum(['overlap', 'butt']).default('overlap'),
  /** By how much neighbouring sheets overlap at the least, mm. */
  overlapMm: mm(5, 60, 'Sheets overlap by 5 to 60 mm; for none at all choose butt joins.').default(12),
  colours: z.enum(['colour', 'black']).default('colour'),
  orientation: z.enum(['fewest', 'portrait', 'landscape']).default('fewest'),
  origin: z.object({ x: coordinate, y: coordinate }).nullable().default(null),
  /** Pages past 14,400 units: split, or scaled by the PDF's UserUnit. */
  longPages: z.enum(['split', 'user unit']).default('split'),
  /** Frame to hang first; null goes from the bottom up. */
  firstFrameId: z.string().max(60).nullable().default(null),
});
export type TemplateOptions = z.output<typeof templateOptions>;

/** The same in an address: flat, and as text. */
export const templateQuery = z.object({
  ...templateOptions.omit({ origin: true }).shape,
  paper: z.enum(papers, { error: 'This paper is not in the list.' }).default('letter'),
  rollWidthMm: z.coerce.number({ error: 'The width of the roll is not a number.' }).pipe(mm(100, 5000, 'A roll is between 100 mm and 5 m wide.')).optional(),
  marginMm: z.coerce.number({ error: 'The margin is not a number.' }).pipe(mm(0, 500, 'A margin is between 0 and 500 mm.')).default(12.7),
  overlapMm: z.coerce.number({ error: 'The overlap is not a number.' }).pipe(mm(5, 60, 'Sheets overlap by 5 to 60 mm; for none at all choose butt joins.')).default(12),
  firstFrameId: z.string().max(60).optional(),
  originX: z.coerce.number({ error: 'The place of the grid is not a number.' }).pipe(coordinate).optional(),
  originY: z.coerce.number({ error: 'The place of the grid is not a number.' }).pipe(coordinate).optional(),
  /** Stated over measured length of the printed bars; a printer's own is taken where one is named. */
  correctionX: z.coerce.number({ error: 'A correction is a number close to 1.' }).pipe(correctionFactor).default(1),
  correctionY: z.coerce.number({ error: 'A correction is a number close to 1.' }).pipe(correctionFactor).default(1),
  printerId: z.uuid({ error: 'This is not a printer of yours.' }).optional(),
});
export type TemplateQuery = z.output<typeof templateQuery>;

/** The options that an address asks for; a grid is pulled by hand only where both its figures are given. */
export function optionsOf(query: TemplateQuery): TemplateOptions {
  const { originX, originY, rollWidthMm, firstFrameId, correctionX: _x, correctionY: _y, printerId: _p, ...rest } = query;
  return {
    ...rest, rollWidthMm: rollWidthMm ?? null, firstFrameId: firstFrameId ?? null,
    origin: originX !== undefined && originY !== undefined ? { x: originX, y: originY } : null,
  };
}
