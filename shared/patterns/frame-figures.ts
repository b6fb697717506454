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

/** The same bevel as saws with a scale from the fence read it: 90° less the bevel. */
export function bevelFromEdgeFigure(frame: FrameGeometry, corner: number): Figure {
  const { bevelRad } = frame.corners[corner]!;
  return {
    label: `Bevel at corner ${corner + 1}, from the board’s length`, value: Math.PI / 2 - bevelRad, unit: 'rad',
    inputs: [{ label: 'Bevel from square, β', value: bevelRad, unit: 'rad' }], formula: '90° − β', source: `${geometry}: the same cut, read from the other side of a right angle`,
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

/** What the groove asks of router and panel; none without a groove. */
export function grooveFigures(frame: FrameGeometry): Figure[] {
  const { groove } = frame;
  if (!groove) return [];
  const width: FigureInput = { label: 'Width of the groove', value: groove.widthMm, unit: 'mm' };
  const { count, eachMm, capMm } = groove.passes;
  return [
    {
      label: 'Groove’s share of the thickness', value: groove.shareOfThickness * 100, unit: '%', inputs: [width, { label: 'Thickness', value: frame.thicknessMm, unit: 'mm' }],
      formula: 'w ÷ t', source: 'Common practice: up to 40 % without a word, never over 50 %',
    },
    {
      label: 'Router passes', value: count, unit: '', inputs: [width, { label: 'Widest pass', value: capMm, unit: 'mm' }, { label: 'Each pass', value: eachMm, unit: 'mm' }],
      formula: 'width ÷ widest pass, rounded up; all passes alike', source: 'Common practice: 1/8 in of engagement at a pass in hardwood',
    },
    { label: 'Panel rests on the shoulder by', value: groove.restMm, unit: 'mm', inputs: [width], formula: 'w − clearance, on each side, when it lies in the middle', source: geometry },
    {
      label: 'Depth to spare behind the panels', value: groove.spareDepthMm, unit: 'mm', inputs: [{ label: 'Depth of the groove', value: groove.depthMm, unit: 'mm' }],
      formula: 'g − mirror − backer', source: geometry,
    },
  ];
}
