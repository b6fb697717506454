import { useState } from 'react';
import type { Point } from '../../../shared/geometry/point.ts';
import { isRoll } from '../../../shared/templates/papers.ts';
import type { SheetPlan } from '../../../shared/templates/sheets.ts';
import type { TemplateInput } from '../../../shared/templates/template-input.ts';
import { Button } from '../../components/button.tsx';
import { LengthField } from '../../components/length-field.tsx';
import { Notice } from '../../components/notice.tsx';
import { SelectField } from '../../components/select-field.tsx';
import { frontName, SheetPreview } from './sheet-preview.tsx';
import { SheetsOverWall } from './sheets-over-wall.tsx';

interface Props {
  input: TemplateInput;
  plan: SheetPlan;
  /** The plan that needs fewest, to hold a pulled grid against. */
  fewest: SheetPlan;
  notes: string[];
  pulled: boolean;
  busy: boolean;
  onPull: (origin: Point | null) => void;
}

/** The sheets over the wall with their count, and one of them as it will be printed. */
export function PlanPanel({ input, plan, fewest, notes, pulled, busy, onPull }: Props) {
  const [chosen, setChosen] = useState(frontName);
  const name = plan.sheets.some((s) => s.name === chosen) ? chosen : frontName;
  const mayPull = input.kind === 'full' || input.kind === 'screws';
  const worse = plan.sheets.length - fewest.sheets.length;
  return (
    <div className="grid gap-3" aria-busy={busy}>
      <p role="status" className="text-lg font-bold text-ink-900 tabular-nums">
        {countWords(plan)}
        {pulled ? <span className="font-normal text-ink-700"> {worse > 0 ? `${worse} more than the fewest` : 'as few as can be'}</span> : null}
      </p>
      {notes.map((words) => (
        <Notice key={words} kind="caution">
          {words}
        </Notice>
      ))}
      <div className="grid gap-4 md:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]">
        <div className="grid content-start gap-3">
          <SheetsOverWall input={input} plan={plan} chosen={name} onChoose={setChosen} onPull={mayPull ? onPull : null} />
          {mayPull ? (
            <div className="flex flex-wrap items-end gap-3">
              <LengthField label="Grid from the left edge" className="w-36 grow" value={plan.origin.x} onChange={(x) => x !== null && !Number.isNaN(x) && onPull({ x, y: plan.origin.y })} />
              <LengthField label="Grid above the floor" className="w-36 grow" value={plan.origin.y} onChange={(y) => y !== null && !Number.isNaN(y) && onPull({ x: plan.origin.x, y })} />
              <Button onClick={() => onPull(null)} disabled={!pulled}>
                Back to fewest
              </Button>
            </div>
          ) : null}
          {mayPull ? <p className="text-sm text-ink-500">Pull the sheets about to spare a join where it is in the way; a click looks at a sheet.</p> : null}
        </div>
        <div className="grid content-start gap-3">
          <SelectField
            label="Look at"
            value={name}
            onChange={(event) => setChosen(event.target.value)}
            options={[{ value: frontName, words: frontName }, ...plan.sheets.map((s) => ({ value: s.name, words: `Sheet ${s.name}` }))]}
          />
          <SheetPreview input={input} plan={plan} name={name} />
        </div>
      </div>
    </div>
  );
}

/** `31 sheets of Letter; 17 blank ones left out`. */
export function countWords({ sheets, blank, format }: SheetPlan): string {
  const noun = isRoll(format.paper) ? 'piece' : 'sheet';
  const left = blank === 0 ? '' : `; ${blank} blank ${blank === 1 ? 'one' : 'ones'} left out`;
  return `${sheets.length} ${noun}${sheets.length === 1 ? '' : 's'} of ${format.name}${left}`;
}
