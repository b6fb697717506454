import type { Figure, FigureInput } from '../units/figure.ts';
import type { FrameGeometry } from './frame.ts';

const geometry = 'Plane geometry';

/** Bevel of a corner, read from square, with its inputs and formula. */
export function bevelFigure(frame: FrameGeometry, corner: number): Figure {
  const { exteriorRad, interiorRad, bevelRad } = frame.corners[corner]!;
  return {
    label: `Bevel at corner ${corner + 1}, from square`,
    value: bevelRad,
    unit: 'rad',
    inputs: [
      { label: 'Inner angle', value: interiorRad, unit: 'rad' },
      { label: 'Outer angle', value: exteriorRad, unit: 'rad' },
      { label: 'The same bevel, from the board’s length', value: Math.PI / 2 - bevelRad, unit: 'rad' },
    ],
    formula: 'β = (180° − inner angle) ÷ 2',
    source: `${geometry}: both members share the outer angle alike`,
  };
}

/** Length of a member over its outer face. */
export function longPointFigure(frame: FrameGeometry, member: number): Figure {
  const { longPointMm } = frame.members[member]!;
  return { label: `Long point of member ${member + 1}`, value: longPointMm, unit: 'mm', inputs: [], formula: 'the side of the outline', source: geometry };
}

/** Length of a member over its inner face. */
export function shortPointFigure(frame: FrameGeometry, member: number): Figure {
  const { longPointMm, shortPointMm, start, end } = frame.members[member]!;
  const inputs: FigureInput[] = [
    { label: 'Long point', value: longPointMm, unit: 'mm' },
    { label: 'Thickness', value: frame.thicknessMm, unit: 'mm' },
    { label: 'Bevel at the start', value: start.bevelRad, unit: 'rad' },
    { label: 'Bevel at the end', value: end.bevelRad, unit: 'rad' },
  ];
  return { label: `Short point of member ${member + 1}`, value: shortPointMm, unit: 'mm', inputs, formula: 'short = long − t (tan β₁ + tan β₂)', source: geometry };
}

/** Lip left beside the groove; null without one. */
export function lipFigure(frame: FrameGeometry): Figure | null {
  if (!frame.groove) return null;
  return {
    label: 'Lip left beside the groove',
    value: frame.groove.lipMm,
    unit: 'mm',
    inputs: [
      { label: 'Thickness', value: frame.thicknessMm, unit: 'mm' },
      { label: 'Width of the groove', value: frame.groove.widthMm, unit: 'mm' },
    ],
    formula: 'lip = t − w',
    source: geometry,
  };
}
