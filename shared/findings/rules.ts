import type { Rule } from './rule.ts';
import { cableRun } from './rules/cable-run.ts';
import { changedSinceSigned } from './rules/changed-since-signed.ts';
import { glassOverhead } from './rules/glass-overhead.ts';
import { bevelBeyondSaw, grooveTooShallow, grooveTooWide, lipTooSmall, noInnerFace } from './rules/joinery.ts';
import { nearlyTouching } from './rules/nearly-touching.ts';
import { nearStudEdge, notInStud, studUnconfirmed } from './rules/not-in-stud.ts';
import { offTheWall } from './rules/off-the-wall.ts';
import { outOfLevel } from './rules/out-of-level.ts';
import { overObstruction } from './rules/over-obstruction.ts';
import { overlapping } from './rules/overlapping.ts';
import { protruding } from './rules/protruding.ts';
import { coveringDecides, mayReachCable, utilisation } from './rules/utilisation.ts';

/** Every rule, in the order in which equal weights are read. */
export const rules: readonly Rule[] = [
  overlapping, offTheWall, overObstruction, utilisation, outOfLevel, noInnerFace, grooveTooShallow, grooveTooWide, lipTooSmall,
  notInStud, nearStudEdge, studUnconfirmed, coveringDecides, mayReachCable, cableRun, protruding, glassOverhead, nearlyTouching,
  bevelBeyondSaw, changedSinceSigned,
];
