import { distanceToRim } from '../../geometry/polygon-distance.ts';
import { contains } from '../../geometry/polygon.ts';
import { formatLength } from '../../units/length.ts';
import { wallFace } from '../../walls/wall-face.ts';
import type { WallShape } from '../../walls/wall.ts';
import { nameOf, type PlacedFrame } from '../placed-frame.ts';
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
    if (over.length === 0) return pastOutline(placed, wall, limits.units);
    return [{
      about: placed.frame.id,
      weight: 'stop',
      words: `${nameOf(placed)} reaches past the ${over.map(([edge, mm]) => `${edge} by ${formatLength(mm, limits.units)}`).join(' and the ')}.`,
      frameIds: [placed.frame.id],
      figures: over.map(([edge, mm]) => ({ label: `Past the ${edge}`, value: mm, unit: 'mm' as const, inputs: [{ label: 'Wall width', value: wall.widthMm, unit: 'mm' as const }, { label: 'Wall height', value: wall.heightMm, unit: 'mm' as const }], formula: 'outline’s furthest corner less the wall’s edge', source: 'Plane geometry' })),
    }];
  },
};

/** Under a sloped ceiling a frame may stand within width and height and yet past the outline: by a corner of its own, or one of the wall's. */
function pastOutline(placed: PlacedFrame, wall: WallShape, units: 'in' | 'mm'): ReturnType<FrameRule['check']> {
  if (!wall.outlineMm) return [];
  const face = wallFace(wall);
  const past = [
    ...placed.outline.filter((p) => !contains(face, p)).map((p) => distanceToRim(face, p)),
    ...face.filter((p) => contains(placed.outline, p)).map((p) => distanceToRim(placed.outline, p)),
  ];
  const mm = Math.max(0, ...past);
  if (mm <= nothingMm) return [];
  return [{
    about: placed.frame.id,
    weight: 'stop',
    words: `${nameOf(placed)} reaches past the wall’s outline by ${formatLength(mm, units)}.`,
    frameIds: [placed.frame.id],
    figures: [{ label: 'Past the outline', value: mm, unit: 'mm', inputs: [{ label: 'Corners of the outline', value: face.length, unit: '' }], formula: 'farthest corner beyond the outline, by its distance to the nearest side', source: 'Plane geometry' }],
  }];
}
