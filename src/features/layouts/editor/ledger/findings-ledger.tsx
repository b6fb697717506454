import { type ReactNode, useMemo, useState } from 'react';
import type { Frame } from '../../../../../shared/layouts/layout.ts';
import { byLabel } from '../../../../../shared/layouts/naming.ts';
import type { Figure } from '../../../../../shared/units/figure.ts';
import { FigureText } from '../../../../components/figure-text.tsx';
import { WeightMark } from '../../../../components/weight-mark.tsx';
import { showFrames } from '../stage/show-frames.ts';
import type { Designs } from '../state/designs.ts';
import { useEditor, useEditorStore } from '../state/editor-store.ts';

/** A finding as the ledger shows it. */
export interface ShownFinding {
  id: string;
  rule: string;
  weight: 'stop' | 'caution' | 'note';
  title: string;
  words: string;
  frameIds: readonly string[];
  figures: readonly Figure[];
  source: string;
}

const weights = ['stop', 'caution', 'note'] as const;

interface Group {
  weight: ShownFinding['weight'];
  title: string;
  source: string;
  list: ShownFinding[];
}

/** Findings of one rule and weight together, heaviest first. */
export function groupedFindings(findings: readonly ShownFinding[]): Group[] {
  const groups = new Map<string, Group>();
  for (const finding of findings) {
    const key = `${finding.weight} ${finding.rule}`;
    const group = groups.get(key);
    if (group) group.list.push(finding);
    else groups.set(key, { weight: finding.weight, title: finding.title, source: finding.source, list: [finding] });
  }
  return [...groups.values()].sort((a, b) => weights.indexOf(a.weight) - weights.indexOf(b.weight));
}

/** The heaviest weight that each frame bears; frames without a finding are left out. */
export function weightOfFrames(findings: readonly ShownFinding[]): ReadonlyMap<string, ShownFinding['weight']> {
  const heaviest = new Map<string, ShownFinding['weight']>();
  for (const { weight, frameIds } of findings) {
    for (const id of frameIds) {
      const known = heaviest.get(id);
      if (known === undefined || weights.indexOf(weight) < weights.indexOf(known)) heaviest.set(id, weight);
    }
  }
  return heaviest;
}

/** What the checks found, by weight; each finding can be opened to its words and figures, and shows its frames on the wall. Null while the checks cannot run. */
export function FindingsLedger({ findings, designs }: { findings: readonly ShownFinding[] | null; designs: Designs }) {
  const frameCount = useEditor((e) => e.bench.frames.length);
  const groups = useMemo(() => groupedFindings(findings ?? []), [findings]);
  const counts = weights.flatMap((weight) => {
    const n = (findings ?? []).filter((f) => f.weight === weight).length;
    return n > 0 ? [{ weight, n }] : [];
  });
  const none = findings === null ? 'The checks cannot run just now.' : frameCount === 0 ? 'Nothing to check yet.' : 'Nothing found.';
  return (
    <section aria-label="Findings">
      <div className="flex items-baseline justify-between border-b border-plaster-200 pb-1">
        <h2 className="text-base font-bold text-ink-900">Findings</h2>
        <p role="status" className="text-sm text-ink-700 tabular-nums">
          {counts.map(({ weight, n }) => `${n} ${weight}`).join(', ') || none}
        </p>
      </div>
      {counts.map(({ weight, n }) => (
        <section key={weight} aria-label={`${weight}: ${n}`} className="mt-2">
          <h3 className="flex items-center gap-2 text-sm">
            <WeightMark weight={weight} />
            <span className="text-ink-700 tabular-nums">× {n}</span>
          </h3>
          <div className="mt-1 grid gap-1">
            {groups
              .filter((group) => group.weight === weight)
              .map((group) => (
                <RuleGroup key={group.title} group={group} designs={designs} />
              ))}
          </div>
        </section>
      ))}
    </section>
  );
}

/** Most findings of one rule that are written out before asking. */
const mostShown = 20;

function RuleGroup({ group: { weight, title, source, list }, designs }: { group: Group; designs: Designs }) {
  const store = useEditorStore();
  const frames = useEditor((e) => e.bench.frames);
  // Stops stand open: nobody should have to look for what must not be hung.
  const [open, setOpen] = useState(weight === 'stop');
  const [all, setAll] = useState(false);
  const labels = new Map(frames.map((f) => [f.id, f]));
  const frameIds = [...new Set(list.flatMap((f) => f.frameIds))];
  const named = (ids: readonly string[]) => {
    const known = ids.flatMap((id) => labels.get(id)?.label ?? []);
    return ids.length === 1 ? `frame ${known[0] ?? ''}` : known.length <= 3 ? `frames ${known.join(', ')}` : `${ids.length} frames`;
  };
  return (
    <details open={open} onToggle={(event) => setOpen(event.currentTarget.open)} className="rounded-sm border border-plaster-200 bg-white">
      <summary className="flex cursor-pointer items-start gap-2 px-2 py-1.5 hover:text-chalk-700">
        <span className="grow text-sm font-semibold">{title}</span>
        {list.length > 1 ? <span className="shrink-0 text-sm whitespace-nowrap text-ink-700 tabular-nums">× {list.length}</span> : null}
      </summary>
      {open ? (
        <>
          <ul className="grid gap-2 border-t border-plaster-200 px-2 py-2 text-sm text-ink-900">
            {inLabelOrder(list, labels)
              .slice(0, all ? undefined : mostShown)
              .map((finding) => (
                <li key={finding.id}>
                  <p>
                    {finding.words}{' '}
                    {finding.frameIds.length > 0 ? <Deed onPress={() => showFrames(store, designs, finding.frameIds)}>Show {named(finding.frameIds)}</Deed> : null}
                  </p>
                  {finding.figures.map((figure) => (
                    <FigureText key={figure.label} figure={figure} />
                  ))}
                </li>
              ))}
          </ul>
          <p className="flex flex-wrap items-baseline justify-between gap-x-3 border-t border-plaster-200 px-2 py-1.5 text-xs text-ink-700">
            <span>Source: {source}</span>
            {list.length > mostShown && !all ? <Deed onPress={() => setAll(true)}>All {list.length}</Deed> : null}
            {list.length > 1 && frameIds.length > 0 ? <Deed onPress={() => showFrames(store, designs, frameIds)}>Show all {frameIds.length} frames</Deed> : null}
          </p>
        </>
      ) : null}
    </details>
  );
}

function inLabelOrder(list: readonly ShownFinding[], frames: ReadonlyMap<string, Frame>): ShownFinding[] {
  const label = (finding: ShownFinding) => ({ label: frames.get(finding.frameIds[0] ?? '')?.label ?? '' });
  return [...list].sort((a, b) => byLabel(label(a), label(b)));
}

function Deed({ onPress, children }: { onPress: () => void; children: ReactNode }) {
  return (
    <button type="button" onClick={onPress} className="min-h-6 font-semibold text-chalk-700 underline underline-offset-4">
      {children}
    </button>
  );
}
