import { boxOf, type Box, type Polygon } from '../../geometry/polygon.ts';
import { distanceBetween } from '../../geometry/polygon-distance.ts';
import { overlapArea } from '../../geometry/polygon-overlap.ts';
import { formatLength } from '../../units/length.ts';
import type { Obstruction } from '../../walls/wall.ts';
import type { Found } from '../finding.ts';
import { nameOf } from '../placed-frame.ts';
import type { FrameRule } from '../rule.ts';

const nothingMm2 = 1;
const rings = new WeakMap<Obstruction, Polygon>();

function ringOf(obstruction: Obstruction): Polygon {
  let ring = rings.get(obstruction);
  if (!ring) rings.set(obstruction, (ring = obstruction.outlineMm.map(([x, y]) => ({ x, y }))));
  return ring;
}

const boxes = new WeakMap<Obstruction, Box>();

function boxOfObstruction(obstruction: Obstruction): Box {
  let box = boxes.get(obstruction);
  if (!box) boxes.set(obstruction, (box = boxOf(ringOf(obstruction))));
  return box;
}

/** Whether two boxes alone show that there is room enough between what lies in them. */
const clearly = (a: Box, b: Box, mm: number): boolean => Math.max(a.left - b.right, b.left - a.right, a.bottom - b.top, b.bottom - a.top) > mm;

export const overObstruction: FrameRule = {
  id: 'over an obstruction',
  of: 'frame',
  title: 'Frame over or too near an obstruction',
  source: 'The wall as measured; clearances as the shop set them',
  check(placed, { wall, limits }) {
    return wall.obstructions.flatMap((obstruction): Found[] => {
      const ring = ringOf(obstruction);
      if (clearly(placed.box, boxOfObstruction(obstruction), obstruction.clearanceMm)) return [];
      const what = obstruction.name || obstruction.kind;
      const about = `${placed.frame.id}+${obstruction.id}`;
      const frameIds = [placed.frame.id];
      const shared = overlapArea(ring, placed.outline);
      if (shared > nothingMm2) {
        return [{ about, weight: 'stop', words: `${nameOf(placed)} covers the ${what}.`, frameIds,
          figures: [{ label: 'Covered', value: shared, unit: 'mm²' as const, inputs: [], formula: 'area that frame and obstruction share', source: 'Plane geometry' }] }];
      }
      const gap = distanceBetween(ring, placed.outline);
      if (gap >= obstruction.clearanceMm - 0.01) return [];
      return [{ about, weight: 'caution',
        words: `${nameOf(placed)} is ${formatLength(gap, limits.units)} from the ${what}, which wants ${formatLength(obstruction.clearanceMm, limits.units)}.`, frameIds,
        figures: [{ label: 'Distance', value: gap, unit: 'mm' as const, inputs: [{ label: 'Clearance', value: obstruction.clearanceMm, unit: 'mm' as const }], formula: 'shortest way between the two outlines', source: 'Plane geometry' }] }];
    });
  },
};
