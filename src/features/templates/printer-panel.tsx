import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { formatLength } from '../../../shared/units/length.ts';
import { Button } from '../../components/button.tsx';
import { ErrorState } from '../../components/error-state.tsx';
import { LengthField } from '../../components/length-field.tsx';
import { Notice } from '../../components/notice.tsx';
import { SelectField } from '../../components/select-field.tsx';
import { TextField } from '../../components/text-field.tsx';
import { useUnits } from '../../lib/units.ts';
import { printersQuery, useAddPrinter, useMeasurePrinter } from './templates.queries.ts';

interface Props {
  printerId: string;
  onChoose: (printerId: string) => void;
  /** Which page is to be measured, and what its two bars say, mm. */
  bars: { page: 'a sheet' | 'the front page'; across: number; up: number } | null;
}

const rules = [
  { value: '0.5', words: '0.5 mm' }, { value: '1', words: '1 mm' }, { value: '0.396875', words: '1/64 in' }, { value: '0.79375', words: '1/32 in' }, { value: '1.5875', words: '1/16 in' },
];

/** Which printer the sheets are for; its bars as measured correct the next print. */
export function PrinterPanel({ printerId, onChoose, bars }: Props) {
  const units = useUnits();
  const printers = useQuery(printersQuery);
  const add = useAddPrinter();
  const measure = useMeasurePrinter();
  const [name, setName] = useState('');
  const [across, setAcross] = useState<number | null>(null);
  const [up, setUp] = useState<number | null>(null);
  const [division, setDivision] = useState(units === 'in' ? '0.396875' : '0.5');
  const printer = printers.data?.find((p) => p.id === printerId);
  const read = across !== null && up !== null && !Number.isNaN(across) && !Number.isNaN(up);

  return (
    <section aria-label="Printer" className="grid gap-3 border-t border-plaster-200 pt-4">
      <h3 className="font-bold text-ink-900">Prove the scale</h3>
      <SelectField
        label="Printer"
        value={printerId}
        onChange={(event) => {
          onChoose(event.target.value);
          measure.reset();
        }}
        options={[{ value: '', words: 'None: uncorrected' }, ...(printers.data ?? []).map((p) => ({ value: p.id, words: p.name }))]}
        hint={printer ? correctionWords(printer) : undefined}
      />
      {printer && bars ? (
        <form
          className="grid gap-3"
          onSubmit={(event) => {
            event.preventDefault();
            if (!read) return;
            measure.mutate({
              printerId, units, divisionMm: Number(division), printedWith: { x: printer.correctionX, y: printer.correctionY },
              across: { statedMm: bars.across, measuredMm: across }, up: { statedMm: bars.up, measuredMm: up },
            });
          }}
        >
          <p className="text-sm text-ink-700">Print {bars.page} for this printer with these choices, lay a steel rule on both its bars, and write what you read. Each bar says how long it should be: check that it is the one asked for.</p>
          <div className="grid grid-cols-2 gap-3">
            <LengthField label={`Bar across, ${formatLength(bars.across, units)}`} value={across} onChange={setAcross} />
            <LengthField label={`Bar up, ${formatLength(bars.up, units)}`} value={up} onChange={setUp} />
          </div>
          <div className="flex flex-wrap items-end gap-3">
            <SelectField label="Rule divided in" className="grow" value={division} onChange={(event) => setDivision(event.target.value)} options={rules} />
            <Button type="submit" busy={measure.isPending} disabled={!read}>
              Correct this printer
            </Button>
          </div>
          {measure.error ? <ErrorState error={measure.error} /> : null}
          {measure.data && measure.data.printer.id === printerId ? (
            <Notice kind="good" live>
              <p>{measure.data.across.words}</p>
              <p className="mt-1">{measure.data.up.words}</p>
            </Notice>
          ) : null}
        </form>
      ) : null}
      <form
        className="flex flex-wrap items-end gap-3"
        onSubmit={(event) => {
          event.preventDefault();
          add.mutate(name, {
            onSuccess: (made) => {
              setName('');
              onChoose(made.id);
            },
          });
        }}
      >
        <TextField label="Another printer’s name" className="grow" value={name} onChange={(event) => setName(event.target.value)} maxLength={80} />
        <Button type="submit" busy={add.isPending} disabled={name.trim() === ''}>
          Add
        </Button>
      </form>
      {add.error ? <ErrorState error={add.error} /> : null}
    </section>
  );
}

function correctionWords({ correctionX, correctionY, measuredAt }: { correctionX: number; correctionY: number; measuredAt: string | null }): string {
  if (measuredAt === null) return 'Its bars have not been measured yet.';
  return correctionX === 1 && correctionY === 1 ? 'Measured: it prints true.' : `Drawn × ${correctionX.toFixed(4)} across and × ${correctionY.toFixed(4)} up for it.`;
}
