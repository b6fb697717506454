import type { Point } from '../geometry/point.ts';
import { area, centroid, type Polygon } from '../geometry/polygon.ts';
import { densityFigure, densityOf } from '../hardware/timber.ts';
import type { Figure, FigureInput } from '../units/figure.ts';
import { frameGeometry, type FrameGeometry } from './frame.ts';
import { hangerPosition } from './hangers.ts';
import type { PatternDesign } from './pattern.ts';

/** Soda-lime float glass, kg/m³ (EN 572-1, from memory). */
export const glassDensity = 2500;
/** Birch plywood, kg/m³: mean of a makers' handbook, from memory; 4 mm sheets of one supplier's sheet are 660. */
export const backerDensity = 680;
/** A steel bracket with its screws, kg: assumed, until the shop's hardware tells its own. */
export const hardwareKgEach = 0.05;

/** Mass of an empty frame and where it acts. */
export interface FrameMass {
  kg: number;
  membersKg: number;
  mirrorKg: number;
  backerKg: number;
  hardwareKg: number;
  /** In the pattern's own coordinates, mm; z is half the depth off the wall. */
  centre: Point & { z: number };
}

/** What of a design makes its mass. */
export type MassForm = Pick<PatternDesign, 'shape' | 'thicknessMm' | 'depthMm' | 'species' | 'moisturePercent' | 'groove' | 'hangers'>;

/** First moment of a flat part: its area or mass at its centre. */
interface Part {
  share: number;
  at: Point;
}

const flat = (polygon: Polygon, per: number): Part => ({ share: area(polygon) * per, at: centroid(polygon) });

function balance(parts: Part[]): Point {
  const whole = parts.reduce((sum, { share }) => sum + share, 0);
  if (whole === 0) return { x: 0, y: 0 };
  return { x: parts.reduce((sum, { share, at }) => sum + share * at.x, 0) / whole, y: parts.reduce((sum, { share, at }) => sum + share * at.y, 0) / whole };
}

const kgOf = (mm3: number, density: number): number => (mm3 / 1e9) * density;

/**
 * Mass of an empty frame with its parts: (ring × depth − groove) × density at its moisture, mirror, backer, hardware; and its centre, from
 * the polygons, so that it holds for frames that are not symmetric. Wood density: Wood Handbook; glass: EN 572-1.
 * `hardwareEachKg` is for one hanger: bracket and screws.
 */
export function frameMass(design: MassForm, hardwareEachKg = hardwareKgEach): FrameMass {
  const frame = frameGeometry(design);
  const { groove } = frame;
  const density = densityOf(design.species, design.moisturePercent);
  const wood = woodParts(frame).map(({ share, at }) => ({ share: kgOf(share, density), at }));
  const membersKg = wood.reduce((sum, { share }) => sum + share, 0);
  const mirrorKg = groove && design.groove ? kgOf(groove.panelAreaMm2 * design.groove.mirrorMm, glassDensity) : 0;
  const backerKg = groove && design.groove ? kgOf(groove.panelAreaMm2 * design.groove.backerMm, backerDensity) : 0;
  const panel: Part[] = groove ? [{ share: mirrorKg + backerKg, at: centroid(groove.panelOutline) }] : [];
  const hardware: Part[] = design.hangers.map((hanger) => ({ share: hardwareEachKg, at: hangerPosition(design, hanger) }));
  const hardwareKg = hardwareEachKg * design.hangers.length;
  return {
    kg: membersKg + mirrorKg + backerKg + hardwareKg,
    membersKg,
    mirrorKg,
    backerKg,
    hardwareKg,
    centre: { ...balance([...wood, ...panel, ...hardware]), z: design.depthMm / 2 },
  };
}

/** Volumes of wood, mm³: the outline, less the opening, less the groove between its wall and the opening. */
function woodParts({ outline, opening, depthMm, groove }: FrameGeometry): Part[] {
  const ring = [flat(outline, depthMm), flat(opening, -depthMm)];
  return groove ? [...ring, flat(groove.wall, -groove.depthMm), flat(opening, groove.depthMm)] : ring;
}

/** The mass with its inputs, formula and source. */
export function massFigure(design: MassForm, hardwareEachKg = hardwareKgEach): Figure {
  const frame = frameGeometry(design);
  const mass = frameMass(design, hardwareEachKg);
  const density = densityFigure(design.species, design.moisturePercent);
  const inputs: FigureInput[] = [
    { label: 'Face of the ring', value: frame.ringAreaMm2, unit: 'mm²' },
    { label: 'Depth', value: design.depthMm, unit: 'mm' },
    { label: density.label, value: density.value, unit: 'kg/m³', note: density.source },
    { label: 'Members', value: mass.membersKg, unit: 'kg' },
  ];
  if (frame.groove && design.groove) {
    inputs.push({ label: 'Face of the panel', value: frame.groove.panelAreaMm2, unit: 'mm²' });
    if (mass.mirrorKg > 0) inputs.push({ label: 'Mirror', value: mass.mirrorKg, unit: 'kg', note: 'glass of 2500 kg/m³ (EN 572-1, from memory)' });
    if (mass.backerKg > 0) inputs.push({ label: 'Backer', value: mass.backerKg, unit: 'kg', note: 'birch plywood of 680 kg/m³, from memory' });
  }
  if (mass.hardwareKg > 0) inputs.push({ label: 'Brackets and screws', value: mass.hardwareKg, unit: 'kg', note: 'assumed for each hanger' });
  return { label: 'Mass of the frame', value: mass.kg, unit: 'kg', inputs, formula: '(ring × depth − groove) × density + mirror + backer + hardware', source: `${density.source}; glass EN 572-1` };
}
