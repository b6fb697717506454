import { type ReactNode, useState } from 'react';
import type { Frame } from '../../../../../shared/layouts/layout.ts';
import { byLabel } from '../../../../../shared/layouts/naming.ts';
import type { Figure } from '../../../../../shared/units/figure.ts';
import { FigureText } from '../../../../components/figure-text.tsx';
import { WeightMark } from '../../../../components/weight-mark.tsx';
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

/** What the checks found; each can be opened to its words and figures, and chooses its frames. Null while the checks cannot run. */
export function FindingsLedger({ findings }: { findings: readonly ShownFinding[] | null }) {
  const frameCount = useEditor((e) => e.bench.frames.length);
  const groups = groupedFindings(findings ?? []);
  const counts = weights.flatMap((weight) => {
    const n = (findings ?? []).filter((f) => f.weight === weight).length;
    return n > 0 ? [`${n} ${weight}`] : [];
  });
  const none = findings === null ? 'The checks cannot run just now.' : frameCount === 0 ? 'Nothing to check yet.' : 'Nothing found.';
  return (
    <section aria-label="Findings">
      <div className="flex items-baseline justify-between border-b border-plaster-200 pb-1">
        <h2 className="text-base font-bold text-ink-900">Findings</h2>
        <p role="status" className="text-sm text-ink-700 tabular-nums">
          {counts.join(', ') || none}
        </p>
      </div>
      <div className="mt-2 grid gap-1">
        {groups.map((group) => (
          <RuleGroup key={`${group.weight} ${group.title}`} group={group} />
        ))}
      </div>
    </section>
  );
}

/** Most findings of one rule that are written out before asking. */
const mostShown = 20;

function RuleGroup({ group: { weight, title, source, list } }: { group: Group }) {
  const store = useEditorStore();
  const frames = useEditor((e) => e.bench.frames);
  // Stops stand open: nobody should have to look for what must not be hung.
  const [open, setOpen] = useState(weight === 'stop');
  const [all, setAll] = useState(false);
  const labels = new Map(frames.map((f) => [f.id, f]));
  const frameIds = [...new Set(list.flatMap((f) => f.frameIds))];
  return (
    <details open={open} onToggle={(event) => setOpen(event.currentTarget.open)} className="rounded-sm border border-plaster-200 bg-white">
      <summary className="flex cursor-pointer items-start gap-2 px-2 py-1.5 hover:text-chalk-700">
        <WeightMark weight={weight} />
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
                  <p>{finding.words}</p>
                  {finding.figures.map((figure) => (
                    <FigureText key={figure.label} figure={figure} />
                  ))}
                </li>
              ))}
          </ul>
          <p className="flex flex-wrap items-baseline justify-between gap-x-3 border-t border-plaster-200 px-2 py-1.5 text-xs text-ink-700">
            <span>Source: {source}</span>
            {list.length > mostShown && !all ? <Deed onPress={() => setAll(true)}>All {list.length}</Deed> : null}
            {frameIds.length > 0 ? (
              <Deed onPress={() => store.dispatch({ kind: 'select', ids: frameIds })}>
                Show {frameIds.length === 1 ? `frame ${labels.get(frameIds[0]!)?.label ?? ''}` : `${frameIds.length} frames`}
              </Deed>
            ) : null}
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
