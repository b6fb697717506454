import { z } from 'zod';
import { revisionStates } from '../layouts/layout.ts';
import { papers } from './papers.ts';

const mm = z.number().finite().min(-100_000).max(100_000);
const sizeMm = z.number().finite().positive().max(100_000);
const point = z.object({ x: mm, y: mm });
const words = z.string().max(400);

/** One axis of the printer's correction: stated length of a bar over the length measured on paper. */
export const correctionFactor = z.number().finite().min(0.9, 'A printer this far out needs mending, not correcting.').max(1.1, 'A printer this far out needs mending, not correcting.');

/** All that the template needs, whole in itself, in wall coordinates (origin lower left, mm, y up). */
export const TemplateInput = z.object({
  title: z.object({
    shop: words, job: words, wall: words, layout: words,
    letter: z.string().max(12),
    state: z.enum(revisionStates),
    sha256: z.string().max(128).nullable(),
  }),
  wall: z.object({
    widthMm: sizeMm,
    heightMm: sizeMm,
    studs: z.array(z.object({ xMm: mm, widthMm: sizeMm, confirmed: z.boolean() })).max(400),
  }),
  frames: z.array(z.object({
    id: z.string(),
    label: z.string().max(40),
    /** Outer faces, counter-clockwise. */
    outlineMm: z.array(point).min(3).max(60),
    hangers: z.array(z.object({
      id: z.string(),
      /** Short and unlike any other on the wall, such as `7a`. */
      label: z.string().max(40),
      x: mm,
      y: mm,
      /** Pilot hole, mm; null when it is not known. */
      drillMm: z.number().finite().positive().max(100).nullable(),
      hardware: words,
    })).max(40),
  })).max(2000),
  units: z.enum(['in', 'mm']),
  paper: z.enum(papers),
  /** What the printer leaves blank round the sheet, mm. */
  marginMm: z.number().finite().min(0).max(40).default(12.7),
  /** By how much neighbouring sheets overlap at the least, mm. */
  overlapMm: z.number().finite().min(5).max(60).default(12),
  correction: z.object({ x: correctionFactor, y: correctionFactor }).default({ x: 1, y: 1 }),
  /** When it was drawn, in words for a reader. */
  drawnAt: words,
});
export type TemplateInput = z.output<typeof TemplateInput>;
export type TemplateFrame = TemplateInput['frames'][number];
export type TemplateHanger = TemplateFrame['hangers'][number];
