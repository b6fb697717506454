import { z } from 'zod';
import { Anchor } from './anchors.ts';
import { Bracket } from './brackets.ts';
import { Screw } from './screws.ts';

/** What the shop keeps to hang frames with. */
export const HardwareBook = z.object({ screws: z.array(Screw), brackets: z.array(Bracket), anchors: z.array(Anchor) });
export type HardwareBook = z.infer<typeof HardwareBook>;
