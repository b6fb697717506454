import { z } from 'zod';
import { id, instant } from '../api/endpoint.ts';
import { PatternDesign } from '../patterns/pattern.ts';

const coordinateMm = z.number().finite().min(-100_000).max(100_000);

/** One frame on the wall: where the centroid of its outline is, and how it is turned. */
export const Frame = z.object({
  id,
  patternId: id,
  xMm: coordinateMm,
  yMm: coordinateMm,
  /** Counter-clockwise turn, radians. */
  turnRad: z.number().finite().min(-1000).max(1000),
  flipped: z.boolean(),
  locked: z.boolean(),
  /** Short name on papers, such as "7"; given when the frame is placed. */
  label: z.string().max(12),
  /** What the frame is to carry, kg; null takes the default rule. */
  contentsKg: z.number().finite().min(0).max(500).nullable(),
  /** Frames that bear the same name are screwed to one another and hang as one body. */
  hungGroup: z.string().max(40).nullable(),
  /** How far hangers stand from where their pattern puts them, mm along their member, by the hanger's id; left out where all stand there. */
  hangerSlides: z.record(z.string().min(1).max(40), z.number().finite().min(-3000).max(3000)).optional(),
});
export type Frame = z.infer<typeof Frame>;

/** What belongs to the layout and not to one frame. */
export const LayoutSheet = z.object({
  name: z.string().trim().min(1, 'Please name the layout.').max(80),
  /** Gap between neighbouring frames, mm. */
  revealMm: z.number().finite().min(0).max(200),
});
export type LayoutSheet = z.infer<typeof LayoutSheet>;

/** A change as data, with before and after: undo, saving, merging and comparing all use it. */
export const Edit = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('frame'), frameId: id, before: Frame.nullable(), after: Frame.nullable() }),
  z.object({ kind: z.literal('sheet'), before: LayoutSheet, after: LayoutSheet }),
]);
export type Edit = z.infer<typeof Edit>;

export const revisionStates = ['draft', 'with client', 'signed', 'changes asked', 'superseded'] as const;

export const Revision = z.object({
  id,
  letter: z.string(),
  state: z.enum(revisionStates),
  sha256: z.string(),
  sentAt: instant,
  signedAt: instant.nullable(),
  signedName: z.string().nullable(),
  askedFor: z.string().nullable(),
});
export type Revision = z.infer<typeof Revision>;

export const Layout = LayoutSheet.extend({
  id,
  jobId: id,
  wallId: id,
  version: z.number().int(),
  frames: z.array(Frame),
  /** Letter and state of what is on the bench now. */
  letter: z.string(),
  state: z.enum(revisionStates),
  /** True when the bench differs from the last signed revision. */
  changedSinceSigned: z.boolean(),
  revisions: z.array(Revision),
  updatedAt: instant,
  updatedBy: z.string(),
});
export type Layout = z.infer<typeof Layout>;

export const LayoutPattern = z.object({ id, name: z.string(), design: PatternDesign });
export type LayoutPattern = z.infer<typeof LayoutPattern>;
