import { measured } from '../../../../../shared/layouts/measure.ts';
import { formatLength } from '../../../../../shared/units/length.ts';
import { Button } from '../../../../components/button.tsx';
import { useUnits } from '../../../../lib/units.ts';
import { useEditor, useEditorStore } from '../state/editor-store.ts';

/** What the measure says, in words, while one is being taken. */
export function MeasureReadout() {
  const store = useEditorStore();
  const units = useUnits();
  const measuring = useEditor((e) => e.measuring);
  if (!measuring) return null;
  const { from, to, done } = measuring;
  const taken = from && to ? measured(from, to) : null;
  const words = !from
    ? 'Press on a corner, an edge or anywhere on the wall to measure from. For two whole frames, choose both: the ledger tells what lies between.'
    : !taken
      ? 'Now press where to measure to.'
      : `${formatLength(taken.mm, units)}${taken.square ? ', square to the edge' : ''}; across ${formatLength(taken.acrossMm, units)}, upwards ${formatLength(taken.upMm, units)}.`;
  return (
    <div className="absolute inset-x-0 bottom-0 flex flex-wrap items-center justify-between gap-x-4 border-t border-chalk-600 bg-chalk-100 px-3 py-1 text-sm text-ink-900 tabular-nums">
      {/* Read out when it is taken, not at every move of the pointer. */}
      <p aria-live={done || !from ? 'polite' : 'off'}>{words}</p>
      <Button small weight="quiet" onClick={() => store.setState({ measuring: null })}>
        Put away
      </Button>
    </div>
  );
}
