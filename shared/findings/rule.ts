import type { LayoutPattern, LayoutSheet } from '../layouts/layout.ts';
import type { Found } from './finding.ts';
import type { AssessedBody } from './hung-body.ts';
import type { PlacedFrame } from './placed-frame.ts';
import type { Scene, Surroundings } from './scene.ts';

interface Named {
  id: string;
  title: string;
  /** Published source, or plainly what kind of knowledge it is. */
  source: string;
}

/** Looks at one frame and what does not move. */
export interface FrameRule extends Named {
  of: 'frame';
  check(frame: PlacedFrame, around: Surroundings): Found[];
}
/** Looks at two frames that are near one another. */
export interface PairRule extends Named {
  of: 'pair';
  check(a: PlacedFrame, b: PlacedFrame, sheet: LayoutSheet, around: Surroundings): Found[];
}
/** Looks at a pattern that is in use; the engine adds the frames. */
export interface PatternRule extends Named {
  of: 'pattern';
  check(pattern: LayoutPattern, around: Omit<Surroundings, 'wall'>): Omit<Found, 'frameIds'>[];
}
/** Looks at what hangs as one. */
export interface BodyRule extends Named {
  of: 'body';
  check(body: AssessedBody, around: Surroundings): Found[];
}
export interface LayoutRule extends Named {
  of: 'layout';
  check(scene: Scene): Found[];
}
export type Rule = FrameRule | PairRule | PatternRule | BodyRule | LayoutRule;
