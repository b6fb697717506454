import { timberOf, type Timber } from '../hardware/timber.ts';
import type { Figure } from '../units/figure.ts';
import type { Groove, PatternDesign } from './pattern.ts';

/** How the boards were sawn: of flat-sawn stock the width moves by the tangential value and the thickness by the radial one. */
export type Sawn = 'flat' | 'quarter';
type Direction = 'radial' | 'tangential';

const handbook = 'USDA Forest Products Laboratory, Wood Handbook (GTR-190), chapter 13';

/**
 * Change of a size across the grain between two moisture contents, mm. Within 6 to 14 %: ΔD = D C (M_F − M_I), eq. 13-2. Where either lies
 * outside: ΔD = D (M_F − M_I) / (30 × 100/S − 30 + M_I), eq. 13-3; wood does not swell beyond 30 %. Source: Wood Handbook (GTR-190), chapter 13.
 */
export function dimensionalChange(sizeMm: number, timber: Timber, direction: Direction, fromPercent: number, toPercent: number): number {
  const { from, to } = { from: Math.min(fromPercent, 30), to: Math.min(toPercent, 30) };
  if (insideCoefficients(from) && insideCoefficients(to)) return sizeMm * coefficientOf(timber, direction) * (to - from);
  return (sizeMm * (to - from)) / ((30 * 100) / shrinkageOf(timber, direction) - 30 + from);
}

const insideCoefficients = (moisture: number): boolean => moisture >= 6 && moisture <= 14;
const coefficientOf = (timber: Timber, direction: Direction): number => (direction === 'radial' ? timber.changeRadial : timber.changeTangential);
const shrinkageOf = (timber: Timber, direction: Direction): number => (direction === 'radial' ? timber.shrinkageRadial : timber.shrinkageTangential);

/** Lengths across the grain at one moisture content, beside those at which the frame was built. */
export interface MovedSizes {
  moisturePercent: number;
  thicknessChangeMm: number;
  depthChangeMm: number;
  panel: MovedPanel | null;
}

/**
 * The panel in its groove. The outer faces are taken as held, so that all of the members' swelling goes inwards: the hardest case. Mirror and
 * plywood are taken as still, being far steadier than wood across the grain.
 */
export interface MovedPanel {
  /** Play left on each side between panel and lip; not above zero: the panel is gripped. */
  playMm: number;
  /** How far it still rests on the shoulder on its worse side, when it has slipped all its play to the other. */
  restMm: number;
  /** Depth of groove left behind mirror and backer. */
  spareDepthMm: number;
}

export interface Movement {
  builtAtPercent: number;
  driest: MovedSizes;
  wettest: MovedSizes;
  /** True when over the whole range the panel neither binds nor drops out; null without a groove. */
  panelStaysFree: boolean | null;
}

export interface MoistureRange {
  lowPercent: number;
  highPercent: number;
}

/** Rooms heated in winter and damp in summer: 6 to 12 %, common practice. */
export const indoorRange: MoistureRange = { lowPercent: 6, highPercent: 12 };

type MovingForm = Pick<PatternDesign, 'thicknessMm' | 'depthMm' | 'species' | 'moisturePercent' | 'groove'>;

/** Change of thickness, depth and panel fit of a frame built at its own moisture content, over a range. Source: Wood Handbook, chapter 13. */
export function movementOf(design: MovingForm, range: MoistureRange = indoorRange, sawn: Sawn = 'flat'): Movement {
  const timber = timberOf(design.species);
  const across: { thickness: Direction; depth: Direction } = sawn === 'flat' ? { thickness: 'radial', depth: 'tangential' } : { thickness: 'tangential', depth: 'radial' };
  const at = (moisturePercent: number): MovedSizes => {
    const change = (sizeMm: number, direction: Direction) => dimensionalChange(sizeMm, timber, direction, design.moisturePercent, moisturePercent);
    const { groove, thicknessMm, depthMm } = design;
    return {
      moisturePercent,
      thicknessChangeMm: change(thicknessMm, across.thickness),
      depthChangeMm: change(depthMm, across.depth),
      panel: groove && panelAt(groove, change(thicknessMm - groove.widthMm, across.thickness), change(thicknessMm, across.thickness), change(groove.depthMm, across.depth)),
    };
  };
  const driest = at(Math.min(range.lowPercent, design.moisturePercent));
  const wettest = at(Math.max(range.highPercent, design.moisturePercent));
  const ends = [driest.panel, wettest.panel];
  return { builtAtPercent: design.moisturePercent, driest, wettest, panelStaysFree: design.groove && ends.every((panel) => panel !== null && panel.playMm > 0 && panel.restMm > 0 && panel.spareDepthMm >= 0) };
}

function panelAt(groove: Groove, lipChange: number, thicknessChange: number, grooveDepthChange: number): MovedPanel {
  const playMm = groove.clearanceMm - lipChange;
  return {
    playMm,
    restMm: groove.widthMm - groove.clearanceMm + thicknessChange - Math.max(0, playMm),
    spareDepthMm: groove.depthMm + grooveDepthChange - groove.mirrorMm - groove.backerMm,
  };
}

/** One size's change with its inputs, formula and source. */
export function movementFigure(label: string, sizeMm: number, species: string, direction: Direction, fromPercent: number, toPercent: number): Figure {
  const timber = timberOf(species);
  const inside = insideCoefficients(fromPercent) && insideCoefficients(toPercent);
  return {
    label,
    value: dimensionalChange(sizeMm, timber, direction, fromPercent, toPercent),
    unit: 'mm',
    inputs: [
      { label: 'Size', value: sizeMm, unit: 'mm' },
      { label: 'From moisture content', value: fromPercent, unit: '%' },
      { label: 'To moisture content', value: toPercent, unit: '%' },
      inside
        ? { label: `Change coefficient, ${direction}`, value: coefficientOf(timber, direction), unit: '', note: timber.sources.change }
        : { label: `Shrinkage green to dry, ${direction}`, value: shrinkageOf(timber, direction), unit: '%', note: timber.sources.shrinkage },
    ],
    formula: inside ? 'ΔD = D × C × (M₂ − M₁)' : 'ΔD = D × (M₂ − M₁) ÷ (30 × 100/S − 30 + M₁)',
    source: `${handbook}, ${inside ? 'equation 13-2' : 'equation 13-3'}`,
  };
}
