import { nameOf } from '../placed-frame.ts';
import type { FrameRule } from '../rule.ts';

export const glassOverhead: FrameRule = {
  id: 'glass overhead',
  of: 'frame',
  title: 'Glass over a bed, a seat or a passage',
  source: 'Common practice; local codes on safety glazing come first',
  check(placed, { wall }) {
    if (!placed.pattern.design.groove?.mirrorMm) return [];
    const zone = wall.zones.find((z) => placed.box.left < z.toMm && placed.box.right > z.fromMm);
    if (!zone) return [];
    return [{
      about: placed.frame.id,
      weight: 'caution',
      words: `${nameOf(placed)} holds a mirror above a ${zone.kind}. Back the mirror with safety film or use safety glass, and hold it so that it cannot fall forward.`,
      frameIds: [placed.frame.id],
    }];
  },
};
