import { STANDARD_GRAVITY } from '../units/constants.ts';
import type { Figure } from '../units/figure.ts';
import type { AssessedBody, HungHanger } from './hung-body.ts';

/** What all frames of a layout weigh together, and where they balance. */
export interface WholeLoad {
  framesKg: number;
  contentsKg: number;
  kg: number;
  weightN: number;
  /** Centre of mass on the wall, mm; null where nothing hangs. */
  balance: { x: number; y: number } | null;
  /** The hanger that is used most, and the body it holds; null where there is none. */
  worst: { hanger: HungHanger; body: AssessedBody } | null;
}

/** Sums over all bodies of a layout: masses add, and the balance point is their mean weighted by mass. */
export function wholeLoad(bodies: readonly AssessedBody[]): WholeLoad {
  let framesKg = 0;
  let contentsKg = 0;
  let momentX = 0;
  let momentY = 0;
  let worst: WholeLoad['worst'] = null;
  for (const body of bodies) {
    for (const { mass, contents } of body.frames) {
      framesKg += mass.kg;
      contentsKg += contents.kg;
    }
    momentX += body.body.massKg * body.body.centre.x;
    momentY += body.body.massKg * body.body.centre.y;
    for (const hanger of body.hangers) if (!worst || hanger.check.utilisation > worst.hanger.check.utilisation) worst = { hanger, body };
  }
  const kg = framesKg + contentsKg;
  return { framesKg, contentsKg, kg, weightN: kg * STANDARD_GRAVITY, balance: kg > 0 ? { x: momentX / kg, y: momentY / kg } : null, worst };
}

/** The sums as figures that can be opened. */
export function wholeFigures(load: WholeLoad): Figure[] {
  const { framesKg, contentsKg, kg, weightN, balance } = load;
  const mean = 'Statics: centre of mass of several bodies';
  return [
    { label: 'Mass of all frames with contents', value: kg, unit: 'kg', formula: 'frames + contents', source: 'Sum of what is listed below', inputs: [{ label: 'Frames', value: framesKg, unit: 'kg' }, { label: 'Contents', value: contentsKg, unit: 'kg' }] },
    { label: 'Weight on the wall', value: weightN, unit: 'N', formula: 'W = m g', source: 'Standard gravity, 3rd CGPM (1901)', inputs: [{ label: 'm', value: kg, unit: 'kg' }, { label: 'g, m/s²', value: STANDARD_GRAVITY, unit: '' }] },
    ...(balance
      ? [
          { label: 'Balances at, from the left edge', value: balance.x, unit: 'mm' as const, formula: 'Σ m x / Σ m', source: mean, inputs: [{ label: 'Σ m', value: kg, unit: 'kg' as const }] },
          { label: 'Balances at, above the floor', value: balance.y, unit: 'mm' as const, formula: 'Σ m y / Σ m', source: mean, inputs: [{ label: 'Σ m', value: kg, unit: 'kg' as const }] },
        ]
      : []),
  ];
}

/** Mass of one body with contents as a figure: its frames and what they carry. */
export function bodyMassFigure({ frames, body }: AssessedBody, nameOfFrame: (index: number) => string): Figure {
  return {
    label: 'Mass with contents', value: body.massKg, unit: 'kg', formula: 'frames + contents', source: 'Sum of the figures below',
    inputs: frames.flatMap(({ mass, contents }, i) => {
      const name = frames.length > 1 ? `, ${nameOfFrame(i)}` : '';
      return [{ label: `Frame${name}`, value: mass.kg, unit: 'kg' as const }, { label: `Contents${name}`, value: contents.kg, unit: 'kg' as const }];
    }),
  };
}
