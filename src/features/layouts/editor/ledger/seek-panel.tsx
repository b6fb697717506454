import { X } from 'lucide-react';
import { useEffect, useId, useMemo, useRef, useState } from 'react';
import { placeFrame } from '../../../../../shared/findings/placed-frame.ts';
import { seekEdits, seekOnWall, type SeekChoice } from '../../../../../shared/findings/seek-on-wall.ts';
import type { SeekScore } from '../../../../../shared/hanging/seek-studs.ts';
import { byLabel } from '../../../../../shared/layouts/naming.ts';
import { unconfirmedCount } from '../../../../../shared/walls/studs.ts';
import { formatFigure } from '../../../../../shared/units/figure.ts';
import { formatLength } from '../../../../../shared/units/length.ts';
import { Button } from '../../../../components/button.tsx';
import { useUnits } from '../../../../lib/units.ts';
import { useEditorStore } from '../state/editor-store.ts';
import { hangerLetter } from './load-words.ts';
import type { Checks } from './use-checks.ts';

/** Seeks studs for the whole layout: today's score beside the best shifts, each previewed on the wall, put in place as one step. */
export function SeekPanel({ checks }: { checks: Checks | null }) {
  const store = useEditorStore();
  const units = useUnits();
  const title = useId();
  const heading = useRef<HTMLHeadingElement>(null);
  const found = useMemo(() => (checks ? seekOnWall(checks.frames, checks.around) : null), [checks]);
  const choices = useMemo(() => choicesOf(found, units), [found, units]);
  const [picked, setPicked] = useState<string | null>(null);
  const choice = choices.find((c) => c.key === picked) ?? choices.find((c) => c.best) ?? choices[0] ?? null;

  useEffect(() => {
    heading.current?.focus();
    // Where the ledger stands below the wall the panel would open out of sight.
    heading.current?.closest('section')?.scrollIntoView({ block: 'nearest' });
  }, []);
  useEffect(() => {
    if (!checks || !choice) return;
    const edits = seekEdits(checks.frames, choice.of);
    const after = new Map(edits.flatMap((edit) => (edit.kind === 'frame' && edit.after ? [[edit.frameId, edit.after] as const] : [])));
    const held = new Set(choice.of.places.filter((p) => p.studId !== null).map((p) => p.id));
    store.setState({
      ghosts: checks.frames.map(({ frame, pattern }) => {
        const { outline, hangers } = placeFrame(after.get(frame.id) ?? frame, pattern);
        return { outline, hangers: hangers.map((h) => ({ at: { x: h.x, y: h.y }, held: held.has(`${frame.id}/${h.id}`) })) };
      }),
    });
    return () => store.setState({ ghosts: [] });
  }, [store, checks, choice]);

  const close = () => {
    store.setState({ seeking: false });
    document.getElementById('seek-studs')?.focus();
  };
  const put = () => {
    if (!checks || !choice) return;
    const edits = seekEdits(checks.frames, choice.of);
    const slid = choice.of.places.filter((p) => Math.abs(p.slideMm) > 0.05).length;
    store.act(`Studs sought: ${choice.words.charAt(0).toLowerCase()}${choice.words.slice(1)}${slid > 0 ? `, ${slid === 1 ? '1 hanger' : `${slid} hangers`} slid` : ''}`, edits);
    close();
  };
  const unsure = checks ? unconfirmedCount(checks.around.wall.studs) : 0;

  return (
    <section
      aria-labelledby={title}
      className="border border-chalk-600 bg-white p-3"
      onKeyDown={(event) => {
        if (event.key === 'Escape') close();
      }}
    >
      <div className="flex items-start justify-between gap-2">
        <h2 id={title} ref={heading} tabIndex={-1} className="text-base font-bold text-ink-900 outline-none">
          Seek studs
        </h2>
        <button type="button" aria-label="Close seek studs" onClick={close} className="-mt-1 -mr-1 inline-flex size-8 items-center justify-center text-ink-700 hover:text-chalk-700">
          <X aria-hidden="true" className="size-5" />
        </button>
      </div>
      <p className="text-sm text-ink-700">Moves the whole layout along the wall, and each hanger within its allowance, so that the most hangers meet studs.</p>
      {!found ? (
        <p className="mt-2 font-semibold">{checks ? 'This wall has no studs marked, or no frame here has a hanger.' : 'The checks cannot run just now.'}</p>
      ) : (
        <>
          <p className="mt-2 text-sm">
            <span className="font-semibold">Today:</span> {scoreWords(found.today, units)}
          </p>
          {found.held ? <p className="mt-1 text-sm font-semibold text-ochre-600">{found.held}</p> : null}
          {found.best[0] ? (
            <p className="mt-1 text-sm">
              <span className="font-semibold">At best:</span> {scoreWords(found.best[0].score, units)}
            </p>
          ) : null}
          <fieldset className="mt-2">
            <legend className="text-sm font-semibold">{found.best.length > 1 ? 'These do equally well, the shortest way first' : 'Where to'}</legend>
            {choices.map((c) => (
              <label key={c.key} className={`mt-1 flex cursor-pointer gap-2 border px-2 py-1.5 text-sm ${c === choice ? 'border-chalk-600 bg-chalk-100' : 'border-plaster-200'}`}>
                <input type="radio" name={title} checked={c === choice} onChange={() => setPicked(c.key)} className="mt-0.5 size-5 shrink-0 accent-chalk-600" />
                <span>
                  <span className="block font-semibold">{c.words}</span>
                  {c.best ? null : <span className="block text-ink-700">{scoreWords(c.of.score, units)}</span>}
                  {c.range ? <span className="block text-ink-700">{c.range}</span> : null}
                </span>
              </label>
            ))}
          </fieldset>
          {checks && choice ? <Places checks={checks} choice={choice.of} /> : null}
          {unsure > 0 ? <p className="mt-2 text-sm text-ink-700">{unsure === 1 ? '1 stud is' : `${unsure} studs are`} not confirmed yet: probe before you trust a margin.</p> : null}
          <div className="mt-3 flex flex-wrap gap-2">
            <Button small disabled={!checks || !choice || seekEdits(checks.frames, choice.of).length === 0} onClick={put}>
              Put it so
            </Button>
            <Button small weight="quiet" onClick={close}>
              Leave it
            </Button>
          </div>
        </>
      )}
    </section>
  );
}

/** How each hanger would stand, hanger by hanger. */
function Places({ checks, choice }: { checks: Checks; choice: SeekChoice }) {
  const places = new Map(choice.places.map((p) => [p.id, p]));
  const hangers = checks.bodies.flatMap((b) => b.hangers).sort((a, b) => byLabel(a.frame.frame, b.frame.frame));
  return (
    <details className="mt-2 border-b border-plaster-200">
      <summary className="min-h-8 cursor-pointer py-1 text-sm font-semibold hover:text-chalk-700">Hanger by hanger</summary>
      <ul className="mb-2 max-h-60 overflow-y-auto text-sm text-ink-700" tabIndex={0} aria-label="Hangers and how they would stand">
        {hangers.map((hanger) => {
          const place = places.get(hanger.key);
          return place ? (
            <li key={hanger.key} className="flex gap-2 py-0.5">
              <span className="w-9 shrink-0 font-semibold text-ink-900">{hangerLetter(hanger)}</span>
              {place.words}
            </li>
          ) : null;
        })}
      </ul>
    </details>
  );
}

interface Listed {
  key: string;
  words: string;
  range: string | null;
  best: boolean;
  of: SeekChoice;
}

function choicesOf(found: ReturnType<typeof seekOnWall>, units: 'in' | 'mm'): Listed[] {
  if (!found) return [];
  const listed = found.best.map((of): Listed => {
    const wide = of.range.toMm - of.range.fromMm;
    return { key: of.shiftMm.toFixed(4), words: shiftWords(of.shiftMm, units), best: true, of, range: wide > 0.8 ? `Or up to ${formatLength(wide, units)} farther.` : null };
  });
  const still = found.slidOnly;
  return still && !listed.some((c) => c.of.shiftMm === 0) ? [...listed, { key: 'still', words: shiftWords(0, units), best: false, of: still, range: null }] : listed;
}

function shiftWords(mm: number, units: 'in' | 'mm'): string {
  return Math.abs(mm) < 0.05 ? 'Frames where they are' : `Shift ${formatLength(Math.abs(mm), units)} to the ${mm > 0 ? 'right' : 'left'}`;
}

function scoreWords({ framesHeld, frames, hangersInStuds, hangers, leastMarginMm }: SeekScore, units: 'in' | 'mm'): string {
  const margin = leastMarginMm === null ? '' : `, the closest with ${formatFigure({ value: leastMarginMm, unit: 'mm' }, units)} to spare`;
  return `${framesHeld} of ${frames} frames held by studs alone; ${hangersInStuds} of ${hangers} hangers in studs${margin}.`;
}
