import { formatLength } from '../../units/length.ts';
import { nameOf } from '../placed-frame.ts';
import type { FrameRule } from '../rule.ts';

const nothingMm = 0.01;

export const offTheWall: FrameRule = {
  id: 'off the wall',
  of: 'frame',
  title: 'Frame reaches past the wall',
  source: 'The wall as measured',
  check(placed, { wall, limits }) {
    const { left, right, bottom, top } = placed.box;
    const over = ([['left edge', -left], ['right edge', right - wall.widthMm], ['floor', -bottom], ['ceiling', top - wall.heightMm]] as const).filter(([, mm]) => mm > nothingMm);
    if (over.length === 0) return [];
    return [{
      about: placed.frame.id,
      weight: 'stop',
      words: `${nameOf(placed)} reaches past the ${over.map(([edge, mm]) => `${edge} by ${formatLength(mm, limits.units)}`).join(' and the ')}.`,
      frameIds: [placed.frame.id],
      figures: over.map(([edge, mm]) => ({ label: `Past the ${edge}`, value: mm, unit: 'mm' as const, inputs: [{ label: 'Wall width', value: wall.widthMm, unit: 'mm' as const }, { label: 'Wall height', value: wall.heightMm, unit: 'mm' as const }], formula: 'outline’s furthest corner less the wall’s edge', source: 'Plane geometry' })),
    }];
  },
};
