import { WeightMark } from '../../../../components/weight-mark.tsx';
import { useEditor, useEditorStore } from '../state/editor-store.ts';

/** A finding as the ledger shows it. */
export interface ShownFinding {
  id: string;
  weight: 'stop' | 'caution' | 'note';
  title: string;
  words: string;
  frameIds: readonly string[];
}

const weights = ['stop', 'caution', 'note'] as const;

/** What the checks found, heaviest first; pressing one chooses the frames it speaks of. Null while the checks cannot run. */
export function FindingsLedger({ findings }: { findings: readonly ShownFinding[] | null }) {
  const store = useEditorStore();
  const frames = useEditor((e) => e.bench.frames);
  const counted = weights.map((weight) => ({ weight, list: (findings ?? []).filter((f) => f.weight === weight) })).filter(({ list }) => list.length > 0);
  const labels = (ids: readonly string[]) => ids.map((id) => frames.find((f) => f.id === id)?.label ?? '?').join(', ');
  return (
    <section aria-label="Findings">
      <h2 className="border-b border-plaster-200 pb-1 text-base font-bold text-ink-900">Findings</h2>
      <p role="status" className="sr-only">
        {findings ? counted.map(({ weight, list }) => `${list.length} ${weight}`).join(', ') || 'No findings' : ''}
      </p>
      {counted.length === 0 ? <p className="mt-2 text-sm text-ink-700">{findings === null ? 'The checks cannot run just now.' : frames.length === 0 ? 'Nothing to check yet.' : 'Nothing found.'}</p> : null}
      {counted.map(({ weight, list }) => (
        <ul key={weight} className="mt-2 grid gap-1">
          {list.map((finding) => (
            <li key={finding.id}>
              <button
                type="button"
                onClick={() => store.dispatch({ kind: 'select', ids: finding.frameIds })}
                className="block w-full rounded-sm border border-plaster-200 bg-white px-2 py-1.5 text-left hover:border-chalk-600"
              >
                <span className="flex items-baseline gap-2">
                  <WeightMark weight={weight} />
                  <span className="text-sm font-semibold text-ink-900">{finding.title}</span>
                  {finding.frameIds.length > 0 ? <span className="ml-auto text-xs text-ink-700">{labels(finding.frameIds)}</span> : null}
                </span>
                <span className="block text-sm text-ink-700">{finding.words}</span>
              </button>
            </li>
          ))}
        </ul>
      ))}
    </section>
  );
}
