import type { Obstruction } from '../../walls/wall.ts';
import { hangerKey, nameOf } from '../placed-frame.ts';
import type { FrameRule } from '../rule.ts';
import { boundsOf } from '../../walls/studs.ts';

/** Cables are expected within this of the ceiling and of corners, mm: BS 7671:2018, regulation 522.6.202. */
const edgeMm = 150;
const fed: readonly Obstruction['kind'][] = ['switch', 'outlet', 'thermostat'];
/** From the screw's centre: half its thickness. */
const screwMm = 2.5;

export const cableRun: FrameRule = {
  id: 'cable run',
  of: 'frame',
  title: 'A cable may run here',
  source: 'BS 7671:2018, regulation 522.6.202 (zones where cables are expected), read in quotation; elsewhere the same caution. Local code rules',
  check(placed, { wall }) {
    return placed.hangers.flatMap(({ id, x, y }) => {
      const near = wall.obstructions.filter((o) => fed.includes(o.kind)).find((o) => {
        const b = boundsOf(o.outlineMm);
        const upright = x > b.leftMm - screwMm && x < b.leftMm + b.widthMm + screwMm;
        const level = y > b.bottomMm - screwMm && y < b.bottomMm + b.heightMm + screwMm;
        return upright || level;
      });
      const where = near ? `in line with the ${near.name || near.kind}`
        : y > wall.heightMm - edgeMm ? 'within 150 mm of the ceiling'
        : x < edgeMm || x > wall.widthMm - edgeMm ? 'within 150 mm of a corner' : null;
      if (!where) return [];
      return [{
        about: hangerKey(placed.frame, { id }),
        weight: 'caution' as const,
        words: `A screw of ${nameOf(placed)} goes in ${where}, where a cable is likely. Search for cables and pipes and switch the circuit off before you drill.`,
        frameIds: [placed.frame.id],
        hangerIds: [hangerKey(placed.frame, { id })],
      }];
    });
  },
};
