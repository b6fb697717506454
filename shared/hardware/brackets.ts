import { z } from 'zod';
import { id } from '../api/endpoint.ts';

/** A steel bracket or hanger plate between frame and wall. */
export const BracketBody = z.object({
  name: z.string().trim().min(1, 'Please name the bracket.').max(80),
  steelMm: z.number({ error: 'Please give the thickness.' }).finite().min(0.5, 'Steel is at least 0.5 mm thick.').max(20),
  /** Hole for the wall screw, mm. */
  holeMm: z.number({ error: 'Please give the diameter.' }).finite().positive().max(60),
  /** How many screws go into the wall, and how many into the frame; they stand above one another. */
  wallScrews: z.number().int('Whole screws only.').min(1, 'At least one screw.').max(12),
  frameScrews: z.number().int('Whole screws only.').min(1, 'At least one screw.').max(12),
  /** The bracket's own screw into the frame. */
  frameScrewId: id.nullable(),
  /** Its maker's working load for one bracket, N; null where none is known: it then counts as nothing. */
  ratingN: z.number().finite().positive().max(1e6).nullable(),
  /** From the wall screw's centre to the middle of the frame screws, mm. */
  offsetMm: z.number().finite().min(0).max(300),
});
export type BracketBody = z.infer<typeof BracketBody>;

export const Bracket = BracketBody.extend({ id });
export type Bracket = z.infer<typeof Bracket>;
