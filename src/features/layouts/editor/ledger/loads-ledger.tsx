import { useMemo, useState } from 'react';
import type { AssessedBody, HungHanger } from '../../../../../shared/findings/hung-body.ts';
import { bodyMassFigure, wholeFigures, wholeLoad } from '../../../../../shared/findings/loads.ts';
import { loadFigures } from '../../../../../shared/hanging/statics-figures.ts';
import { byLabel } from '../../../../../shared/layouts/naming.ts';
import { massFigure } from '../../../../../shared/patterns/mass.ts';
import { formatLoad, formatMass } from '../../../../../shared/units/mass.ts';
import { FigureText } from '../../../../components/figure-text.tsx';
import { WeightMark } from '../../../../components/weight-mark.tsx';
import { useUnits } from '../../../../lib/units.ts';
import { useEditorStore } from '../state/editor-store.ts';
import { bodyName, hangerLetter, holderWords, linkWords, usedWords } from './load-words.ts';
import type { Checks } from './use-checks.ts';

/** What everything weighs and how far each hanger is used: the whole, each body, each hanger, down to formula and source. */
export function LoadsLedger({ checks }: { checks: Checks | null }) {
  const units = useUnits();
  const bodies = useMemo(() => [...(checks?.bodies ?? [])].sort((a, b) => byLabel(labelOf(a), labelOf(b))), [checks]);
  const whole = useMemo(() => wholeLoad(bodies), [bodies]);
  return (
    <section aria-label="Loads">
      <div className="flex items-baseline justify-between gap-3 border-b border-plaster-200 pb-1">
        <h2 className="text-base font-bold text-ink-900">Loads</h2>
        <p className="text-sm text-ink-700 tabular-nums">{bodies.length > 0 ? `${formatMass(whole.kg, units)} in all` : checks ? 'Nothing hangs yet.' : 'The checks cannot run just now.'}</p>
      </div>
      {checks && bodies.length > 0 ? (
        <>
          <div className="mt-1 text-sm">
            {wholeFigures(whole).map((figure) => (
              <FigureText key={figure.label} figure={figure} />
            ))}
            {whole.worst ? (
              <p className="py-1 text-ink-700">
                Most used: hanger {hangerLetter(whole.worst.hanger)} of {bodyName(whole.worst.body)}, {usedWords(whole.worst.hanger.check.utilisation)}.
              </p>
            ) : null}
          </div>
          <ul className="mt-2 grid gap-1">
            {bodies.map((body) => (
              <BodyRow key={body.id} body={body} checks={checks} />
            ))}
          </ul>
        </>
      ) : null}
    </section>
  );
}

const labelOf = ({ frames }: AssessedBody) => frames[0]?.frame ?? { label: '' };

function BodyRow({ body, checks }: { body: AssessedBody; checks: Checks }) {
  const units = useUnits();
  const store = useEditorStore();
  const [open, setOpen] = useState(false);
  const used = body.hangers.length > 0 ? Math.max(...body.hangers.map((h) => h.check.utilisation)) : Infinity;
  return (
    <li className="rounded-sm border border-plaster-200 bg-white">
      <details open={open} onToggle={(event) => setOpen(event.currentTarget.open)}>
        <summary className="flex cursor-pointer items-baseline gap-2 px-2 py-1.5 text-sm hover:text-chalk-700">
          <span className="grow font-semibold first-letter:uppercase">{bodyName(body)}</span>
          <span className="whitespace-nowrap text-ink-700 tabular-nums">{formatMass(body.body.massKg, units)}</span>
          <Used utilisation={used} none={body.hangers.length === 0} />
        </summary>
        {open ? (
          <div className="border-t border-plaster-200 px-2 pb-2 text-sm">
            <FigureText figure={bodyMassFigure(body, (i) => `frame ${body.frames[i]!.frame.label}`)} />
            {body.frames.map(({ frame, pattern, contents }) => (
              <div key={frame.id}>
                <FigureText figure={named(massFigure(pattern.design), body, frame.label)} />
                <FigureText figure={named(contents.figure, body, frame.label)} />
              </div>
            ))}
            {body.hangers.map((hanger) => (
              <HangerRows key={hanger.key} hanger={hanger} body={body} checks={checks} />
            ))}
            <button type="button" onClick={() => store.dispatch({ kind: 'select', ids: body.frames.map((f) => f.frame.id) })} className="mt-2 min-h-6 font-semibold text-chalk-700 underline underline-offset-4">
              Choose {body.frames.length === 1 ? 'this frame' : 'these frames'} on the wall
            </button>
          </div>
        ) : null}
      </details>
    </li>
  );
}

const named = <F extends { label: string }>(figure: F, body: AssessedBody, label: string): F => (body.frames.length > 1 ? { ...figure, label: `${figure.label}, frame ${label}` } : figure);

function HangerRows({ hanger, body, checks }: { hanger: HungHanger; body: AssessedBody; checks: Checks }) {
  const units = useUnits();
  const load = body.hanging.hangers.find((h) => h.id === hanger.key);
  const { links, flags, utilisation } = hanger.check;
  return (
    <section aria-label={`Hanger ${hangerLetter(hanger)} of ${bodyName(body)}`} className="mt-3 border-l-4 border-brass-600 pl-2">
      <h3 className="flex items-baseline justify-between gap-2 font-semibold text-ink-900">
        Hanger {hangerLetter(hanger)}
        <Used utilisation={utilisation} none={false} />
      </h3>
      <p className="text-ink-700">{holderWords(hanger, checks.around, units)}</p>
      {load ? (
        <p className="text-ink-700 tabular-nums">
          V {formatLoad(load.shearN, units)}, T {formatLoad(load.tensionN, units)}, R {formatLoad(load.resultantN, units)}
        </p>
      ) : null}
      {loadFigures(body.body, body.hanging, hanger.key).map((figure) => (
        <FigureText key={figure.label} figure={figure} />
      ))}
      {links.map((link) => (
        <div key={link.part} className="mt-1">
          <p className="flex justify-between gap-2 text-ink-900">
            <span className="font-semibold">{linkWords[link.part]}</span>
            <span className="tabular-nums">{usedWords(link.utilisation)}</span>
          </p>
          {flags
            .filter((flag) => flag.part === link.part)
            .map((flag) => (
              <p key={flag.id} className="text-ink-700">
                {flag.words}
              </p>
            ))}
          {link.figures.map((figure) => (
            <FigureText key={figure.label} figure={figure} />
          ))}
        </div>
      ))}
    </section>
  );
}

function Used({ utilisation, none }: { utilisation: number; none: boolean }) {
  const weight = utilisation > 1 ? 'stop' : utilisation > 0.8 ? 'caution' : null;
  return (
    <span className="inline-flex items-center gap-1 font-semibold whitespace-nowrap tabular-nums">
      {weight ? <WeightMark weight={weight} wordHidden /> : null}
      {none ? 'no hanger' : usedWords(utilisation)}
    </span>
  );
}
