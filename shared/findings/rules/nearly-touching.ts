import { gapBetween, overlapDepth } from '../../geometry/polygon-distance.ts';
import { formatLength } from '../../units/length.ts';
import { nameOf } from '../placed-frame.ts';
import type { PairRule } from '../rule.ts';

/** A gap below this reads as a mistake unless it was chosen, mm (common practice). */
export const slimGapMm = 3;
/** A gap this close to the chosen reveal is the chosen reveal, mm. */
const sameMm = 0.05;

export const nearlyTouching: PairRule = {
  id: 'nearly touching',
  of: 'pair',
  title: 'Frames nearly touch',
  source: 'Common practice: a gap under 3 mm that is not the chosen reveal looks like an error and leaves no play',
  check(a, b, sheet, { limits }) {
    const { mm } = gapBetween(a.outline, b.outline);
    if (mm >= slimGapMm - 1e-6 || Math.abs(mm - sheet.revealMm) <= sameMm || overlapDepth(a.outline, b.outline) > 0.01) return [];
    return [{
      about: `${a.frame.id}+${b.frame.id}`,
      weight: 'caution',
      words: `${nameOf(a)} and ${nameOf(b)} are ${formatLength(mm, limits.units)} apart; the reveal of this layout is ${formatLength(sheet.revealMm, limits.units)}.`,
      frameIds: [a.frame.id, b.frame.id],
      figures: [{ label: 'Gap', value: mm, unit: 'mm', inputs: [{ label: 'Reveal', value: sheet.revealMm, unit: 'mm' }], formula: 'shortest way between the two outlines', source: 'Plane geometry' }],
    }];
  },
};
