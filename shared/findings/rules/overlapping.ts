import { overlapDepth } from '../../geometry/polygon-distance.ts';
import { formatLength } from '../../units/length.ts';
import { nameOf } from '../placed-frame.ts';
import type { PairRule } from '../rule.ts';

/** Less than this is rounding, not wood, mm. */
const nothingMm = 0.01;

export const overlapping: PairRule = {
  id: 'overlapping',
  of: 'pair',
  title: 'Frames overlap',
  source: 'Plane geometry: two frames cannot be in one place',
  check(a, b, _sheet, { limits }) {
    const depth = overlapDepth(a.outline, b.outline);
    if (depth <= nothingMm) return [];
    return [{
      about: `${a.frame.id}+${b.frame.id}`,
      weight: 'stop',
      words: `${nameOf(a)} and ${nameOf(b)} are in one another by ${formatLength(depth, limits.units)}. Move one of them.`,
      frameIds: [a.frame.id, b.frame.id],
      figures: [{ label: 'Overlap', value: depth, unit: 'mm', inputs: [], formula: 'least way one must be moved to be clear of the other (separating axes)', source: 'Plane geometry' }],
    }];
  },
};
