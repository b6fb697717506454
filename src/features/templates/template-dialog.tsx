import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Point } from '../../../shared/geometry/point.ts';
import { frontFormat } from '../../../shared/templates/front-pages.ts';
import { barLengths } from '../../../shared/templates/sheet-title.ts';
import { planTemplate } from '../../../shared/templates/template.ts';
import { Dialog } from '../../components/dialog.tsx';
import { ErrorState } from '../../components/error-state.tsx';
import { Loading } from '../../components/loading.tsx';
import { isCallError } from '../../lib/call-error.ts';
import { useUnits } from '../../lib/units.ts';
import { usualChoices, wishOf, type Choices } from './choices.ts';
import { MakePanel } from './make-panel.tsx';
import { OptionFields } from './option-fields.tsx';
import { PlanPanel } from './plan-panel.tsx';
import { PrinterPanel } from './printer-panel.tsx';
import { templatePlanQuery } from './templates.queries.ts';

interface Props {
  layout: { id: string; name: string; letter: string; frames: readonly { id: string; label: string }[] };
  /** Saves what is unsaved first, so that the paper shows what the wall shows; throws where it could not be saved. */
  ready: () => Promise<unknown>;
  onClose: () => void;
}

/** The hanging template, 1:1: chosen, looked at and made here. */
export function TemplateDialog({ layout, ready, onClose }: Props) {
  const units = useUnits();
  const [choices, setChoices] = useState<Choices>(() => usualChoices(units));
  const [origin, setOrigin] = useState<Point | null>(null);
  const wish = wishOf(choices);
  const asked = useQuery({ ...templatePlanQuery(layout.id, wish ?? {}, ready), enabled: wish !== null });
  const told = asked.data;
  // A grid pulled by hand is laid here, by the same rules: the count follows the hand.
  const input = told && origin ? { ...told.input, origin, orientation: told.plan.format.orientation } : told?.input;
  const plan = input && origin ? planTemplate(input) : told?.plan;
  // The front page is the cheapest to prove, but where sheets go to a larger printer it comes from another.
  const front = input && frontFormat(input);
  const barPage = front && front.paper === plan?.format.paper ? front : plan?.format;
  const errors = Object.fromEntries(isCallError(asked.error) ? (asked.error.problem.fields ?? []).map(({ path, words }) => [path, words]) : []);
  const toMake = wish && origin && plan ? { ...wish, originX: plan.origin.x, originY: plan.origin.y, orientation: plan.format.orientation } : wish;

  return (
    <Dialog open onOpenChange={onClose} wide="all" title="Hanging template" about="Everything the wall needs at full size: outlines, screw centres, datums and studs.">
      <div className="grid gap-6 lg:grid-cols-[22rem_minmax(0,1fr)] xl:grid-cols-[30rem_minmax(0,1fr)]">
        <div className="grid content-start gap-4">
          <OptionFields
            choices={choices}
            frames={layout.frames}
            errors={errors}
            onChange={(change) => {
              setChoices((before) => ({ ...before, ...change }));
              setOrigin(null);
            }}
          />
          <PrinterPanel printerId={choices.printerId} onChoose={(printerId) => setChoices((before) => ({ ...before, printerId }))} bars={input && plan && barPage ? { page: barPage === plan.format ? 'a sheet' : 'the front page', ...barLengths(barPage, input) } : null} />
        </div>
        <div className="grid min-w-0 content-start gap-4">
          {asked.error ? <ErrorState error={asked.error} onRetry={() => void asked.refetch()} /> : null}
          {input && plan ? (
            <PlanPanel input={input} plan={plan} fewest={told!.plan} notes={told!.notes} pulled={origin !== null} busy={asked.isFetching} onPull={setOrigin} />
          ) : asked.isPending && wish ? (
            <Loading what="the sheets" />
          ) : null}
          <p className="text-sm text-ink-700">
            Print at actual size (100 %), not fitted to the page. Measure the printed bars before you tape anything, and look for cables and pipes before you drill.
          </p>
          <MakePanel layout={layout} wish={asked.error ? null : toMake} ready={ready} onClose={onClose} />
        </div>
      </div>
    </Dialog>
  );
}
