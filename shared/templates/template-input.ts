import { z } from 'zod';
import { revisionStates } from '../layouts/layout.ts';
import { correctionFactor, templateOptions } from './template-options.ts';

const mm = z.number().finite().min(-100_000).max(100_000);
const sizeMm = z.number().finite().positive().max(100_000);
const point = z.object({ x: mm, y: mm });
const words = z.string().max(400);

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
    studs: z.array(z.object({ xMm: mm, widthMm: sizeMm, confirmed: z.boolean(), uncertaintyMm: z.number().finite().min(0).max(1000).nullable().default(null) })).max(400),
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
  ...templateOptions.shape,
  correction: z.object({ x: correctionFactor, y: correctionFactor }).default({ x: 1, y: 1 }),
  /** What the ledger still says of the layout, the heaviest first. */
  findings: z.array(z.object({ weight: z.enum(['stop', 'caution', 'note']), words: z.string().max(1000) })).max(400).default([]),
  /** Whose correction it is; empty where none was chosen. */
  printer: words.default(''),
  /** When it was drawn, in words for a reader. */
  drawnAt: words,
});
export type TemplateInput = z.output<typeof TemplateInput>;
export type TemplateFrame = TemplateInput['frames'][number];
export type TemplateHanger = TemplateFrame['hangers'][number];
