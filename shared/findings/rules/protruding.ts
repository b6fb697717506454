import { MM_PER_INCH } from '../../units/constants.ts';
import { formatLength } from '../../units/length.ts';
import { nameOf } from '../placed-frame.ts';
import type { FrameRule } from '../rule.ts';

/** 2010 ADA Standards, section 307.2: between 27 and 80 in above the floor nothing may stand more than 4 in out into a path. */
const lowMm = 27 * MM_PER_INCH;
const highMm = 80 * MM_PER_INCH;
const mostMm = 4 * MM_PER_INCH;

export const protruding: FrameRule = {
  id: 'protruding',
  of: 'frame',
  title: 'Stands out where people walk',
  source: '2010 ADA Standards for Accessible Design, section 307.2; it binds public and common areas, not the inside of a private home. Local codes come first',
  check(placed, { wall, limits }) {
    const { box, pattern: { design } } = placed;
    const walked = wall.zones.some((z) => z.kind === 'passage' && box.left < z.toMm && box.right > z.fromMm);
    if (!walked || design.depthMm <= mostMm || box.bottom <= lowMm || box.bottom > highMm) return [];
    return [{
      about: placed.frame.id,
      weight: 'caution',
      words: `${nameOf(placed)} stands ${formatLength(design.depthMm, limits.units)} out where people walk, with its lower edge ${formatLength(box.bottom, limits.units)} above the floor. A cane would not find it.`,
      frameIds: [placed.frame.id],
      figures: [{
        label: 'Depth off the wall', value: design.depthMm, unit: 'mm',
        inputs: [{ label: 'Most allowed', value: mostMm, unit: 'mm' }, { label: 'Lower edge above floor', value: box.bottom, unit: 'mm' }, { label: 'From', value: lowMm, unit: 'mm' }, { label: 'To', value: highMm, unit: 'mm' }],
        formula: 'caution where the lower edge lies above 27 in and not above 80 in, and the depth is more than 4 in', source: '2010 ADA Standards, section 307.2',
      }],
    }];
  },
};
