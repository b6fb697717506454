import { useState } from 'react';
import { indoorRange, movementFigure, movementOf, type Sawn } from '../../../shared/patterns/movement.ts';
import type { PatternDesign } from '../../../shared/patterns/pattern.ts';
import { formatFigure } from '../../../shared/units/figure.ts';
import { FigureText } from '../../components/figure-text.tsx';
import { NumberField } from '../../components/number-field.tsx';
import { SelectField } from '../../components/select-field.tsx';
import { WeightMark } from '../../components/weight-mark.tsx';
import { useUnits } from '../../lib/units.ts';

const known = (percent: number | null, otherwise: number): number => (percent !== null && percent >= 0 && percent <= 30 ? percent : otherwise);

/** How the boards swell and shrink over the moisture that a room goes through, and whether the panel stays free. */
export function MovementFacts({ design }: { design: PatternDesign }) {
  const units = useUnits();
  const [low, setLow] = useState<number | null>(indoorRange.lowPercent);
  const [high, setHigh] = useState<number | null>(indoorRange.highPercent);
  const [sawn, setSawn] = useState<Sawn>('flat');
  const range = { lowPercent: known(low, indoorRange.lowPercent), highPercent: known(high, indoorRange.highPercent) };
  const moved = movementOf(design, range, sawn);
  const across = sawn === 'flat' ? (['radial', 'tangential'] as const) : (['tangential', 'radial'] as const);
  const small = (mm: number) => formatFigure({ value: mm, unit: 'mm' }, units);
  return (
    <section aria-label="Wood movement" className="mt-4">
      <h3 className="font-semibold">Wood movement</h3>
      <div className="mt-1 grid grid-cols-3 gap-3">
        <NumberField label="Driest, %" value={low} onChange={setLow} />
        <NumberField label="Wettest, %" value={high} onChange={setHigh} />
        <SelectField label="Sawn" value={sawn} options={[{ value: 'flat', words: 'Flat' }, { value: 'quarter', words: 'Quarter' }]} onChange={(event) => setSawn(event.target.value as Sawn)} />
      </div>
      <p className="mt-1 text-sm text-ink-700">Moisture of the wood in its room; built at {design.moisturePercent} %.</p>
      {[moved.driest, moved.wettest].map(({ moisturePercent }, i) => (
        <div key={i}>
          <FigureText figure={movementFigure(`Thickness, at ${moisturePercent} %`, design.thicknessMm, design.species, across[0], design.moisturePercent, moisturePercent)} />
          <FigureText figure={movementFigure(`Depth, at ${moisturePercent} %`, design.depthMm, design.species, across[1], design.moisturePercent, moisturePercent)} />
        </div>
      ))}
      {moved.driest.panel && moved.wettest.panel ? (
        <p className="mt-2 text-sm">
          {moved.panelStaysFree ? <span className="font-semibold text-sage-600">The panel stays free.</span> : <WeightMark weight="stop" />}{' '}
          {moved.panelStaysFree ? null : 'The panel does not stay free. '}
          Play on each side: {small(moved.wettest.panel.playMm)} when wettest. It rests by {small(Math.min(moved.driest.panel.restMm, moved.wettest.panel.restMm))} at the least, with {small(Math.min(moved.driest.panel.spareDepthMm, moved.wettest.panel.spareDepthMm))} of
          depth to spare.
        </p>
      ) : null}
    </section>
  );
}
