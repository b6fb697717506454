import { ultimateDivisor, type AnchorBody } from '../hardware/anchors.ts';
import type { BracketBody } from '../hardware/brackets.ts';
import type { ScrewCapacity } from '../hardware/dowel.ts';
import type { ScrewBody } from '../hardware/screws.ts';
import { yieldModes, yieldModeWords } from '../hardware/yield-limit.ts';
import type { Figure, FigureInput, FigureUnit } from '../units/figure.ts';
import type { HangerLoad } from './statics.ts';

/** What a screw's figures tell of besides its capacity. */
export interface ScrewSetting {
  screw: ScrewBody;
  bracket: BracketBody;
  coveringMm: number;
  gravity: number;
  loadDuration: number;
}

const nds = (where: string) => `AWC NDS-2018, ${where}`;
const input = (label: string, value: number, unit: FigureUnit = ''): FigureInput => ({ label, value, unit });

/** Steps from the screw's size to its use, for one screw of `screws` that share the load alike. */
export function screwFigures(load: HangerLoad, screws: number, value: ScrewCapacity, of: ScrewSetting, one: number, utilisation: number): Figure[] {
  const { screw, bracket, coveringMm, gravity, loadDuration } = of;
  const lag = screw.kind === 'lag screw';
  return [
    {
      label: 'Penetration, p', value: value.penetrationMm, unit: 'mm', formula: 'length − bracket − covering, no more than the wood is deep',
      source: nds(lag ? '12.1.4.6: at least 4D' : '12.1.5.6: at least 6D'),
      inputs: [input('length', screw.lengthMm, 'mm'), input('bracket', bracket.steelMm, 'mm'), input('covering', coveringMm, 'mm'), input('least', value.leastPenetrationMm, 'mm')],
    },
    {
      label: 'Withdrawal, W', value: value.withdrawalPerMm, unit: 'N/mm', formula: lag ? '1800 G^1.5 D^0.75 lb/in' : '2850 G² D lb/in',
      source: nds(lag ? 'eq. 12.2-1' : 'eq. 12.2-2'), inputs: [input('G', gravity), input('D', screw.diameterMm, 'mm')],
    },
    {
      label: 'Withdrawal of one screw, W′p', value: value.withdrawalN, unit: 'N', formula: 'W × thread in the wood × C_D, or the steel’s own tension if less',
      source: `${nds('12.2 and table 2.3.2')}; steel: half its yield on the root (AISC 360 J3.6, from memory)`,
      inputs: [input('W', value.withdrawalPerMm, 'N/mm'), input('thread', value.threadMm, 'mm'), input('C_D', loadDuration), input('steel', value.steelTensionN, 'N')],
    },
    ...lateralFigures(value, of),
    {
      label: 'One screw in this direction, Z′α', value: one, unit: 'N', source: `${nds('eq. 12.4-1')}; the two limits are ours`,
      formula: 'W′p Z′ / (W′p cos²α + Z′ sin²α), at most Z′/cos α and W′p/sin α',
      inputs: [input('W′p', value.withdrawalN, 'N'), input('Z′', value.lateralN, 'N'), input('α', load.angleRad, 'rad')],
    },
    used(load, utilisation, one * screws, `R / (screws × Z′α)`, nds('12.4'), [input('screws', screws), input('Z′α', one, 'N')]),
  ];
}

function lateralFigures(value: ScrewCapacity, { screw, bracket, coveringMm, gravity, loadDuration }: ScrewSetting): Figure[] {
  if (value.modes === null || value.mode === null) return [];
  return [
    {
      label: 'Bearing of the wood, F', value: value.woodBearingMPa, unit: 'N/mm²', source: nds('table 12.3.3'),
      formula: screw.diameterMm < 6.35 - 1e-9 ? '16,600 G^1.84 psi' : '11,200 G psi along, 6,100 G^1.45/√D psi across the grain, Hankinson between',
      inputs: [input('G', gravity), input('D', screw.diameterMm, 'mm')],
    },
    {
      label: `Lateral of one screw, Z (mode ${value.mode}: ${yieldModeWords[value.mode]})`, value: value.lateralReferenceN, unit: 'N',
      formula: `least of six ways to yield: ${yieldModes.map((m) => `${m} ${value.modes?.[m].toFixed(0)} N`).join(', ')}`,
      source: `AWC Technical Report 12, table 1-1, with the covering as gap; ${nds('table 12.3.1B')} for the reduction`,
      inputs: [
        input('root diameter', screw.rootDiameterMm, 'mm'), input('bending yield', screw.bendingYieldMPa, 'N/mm²'), input('steel', bracket.steelMm, 'mm'),
        input('bearing of the steel', value.plateBearingMPa, 'N/mm²'), input('bearing length in the wood', value.bearingMm, 'mm'),
        input('gap', coveringMm, 'mm'), input('reduction, Rd', value.reduction ?? 1), input('Z without the gap', value.lateralWithoutGapN, 'N'),
      ],
    },
    {
      label: 'Lateral of one screw, Z′', value: value.lateralN, unit: 'N', formula: 'Z × C_D', source: nds('table 2.3.2 (from memory)'),
      inputs: [input('Z', value.lateralReferenceN, 'N'), input('C_D', loadDuration)],
    },
  ];
}

/** Steps for anchors that are rated by their packet. */
export function anchorFigures(load: HangerLoad, anchor: AnchorBody, allowed: { shearN: number; tensionN: number }, count: number, utilisation: number): Figure[] {
  const ultimate = anchor.ratedAs === 'ultimate';
  const source = ultimate ? `The packet’s ultimate load, divided by ${ultimateDivisor} (common practice)` : 'The packet’s allowable load';
  const one = (label: string, value: number, rated: number | null): Figure => ({
    label, value, unit: 'N', source, formula: ultimate ? `rating / ${ultimateDivisor}` : 'rating', inputs: [input('rating', rated ?? 0, 'N')],
  });
  const reach = utilisation > 0 ? load.resultantN / utilisation : 0;
  return [
    one('Allowed along the wall, Va', allowed.shearN, anchor.shearN),
    one('Allowed out of the wall, Ta', allowed.tensionN, anchor.tensionN),
    used(load, utilisation, reach, 'V/(n Va) + T/(n Ta)', 'Straight-line interaction (common practice)', [
      input('V', load.shearN, 'N'), input('T', load.tensionN, 'N'), input('anchors, n', count),
    ]),
  ];
}

/** The bracket's rating against the load. */
export function bracketFigures(load: HangerLoad, bracket: BracketBody, utilisation: number): Figure[] {
  return [used(load, utilisation, bracket.ratingN ?? 0, 'R / rating', 'The maker’s rating, as entered', [input('rating', bracket.ratingN ?? 0, 'N')])];
}

function used(load: HangerLoad, utilisation: number, capacityN: number, formula: string, source: string, inputs: FigureInput[]): Figure {
  return { label: 'Used', value: utilisation * 100, unit: '%', formula, source, inputs: [input('R', load.resultantN, 'N'), ...inputs, input('carries', capacityN, 'N')] };
}
