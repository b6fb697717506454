import { exteriorAngles } from '../../../shared/geometry/polygon.ts';
import { outlineOf } from '../../../shared/patterns/outline.ts';
import type { PatternDesign } from '../../../shared/patterns/pattern.ts';
import { formatAngle } from '../../../shared/units/angle.ts';

/** The bevels of a design from square, in words: `Bevel 30°`, or from the least to the steepest. */
export function bevelWords({ shape }: Pick<PatternDesign, 'shape'>): string {
  const bevels = exteriorAngles(outlineOf(shape)).map((bend) => bend / 2);
  const least = formatAngle(Math.min(...bevels));
  const most = formatAngle(Math.max(...bevels));
  return least === most ? `Bevel ${most}` : `Bevels ${least} to ${most}`;
}
