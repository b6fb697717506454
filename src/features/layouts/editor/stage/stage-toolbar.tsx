import { Maximize, Minus, Plus, Redo2, Undo2 } from 'lucide-react';
import { useState, type ReactNode } from 'react';
import { LayoutSheet } from '../../../../../shared/layouts/layout.ts';
import type { Wall } from '../../../../../shared/walls/wall.ts';
import { changeSheet } from '../operations/operations.ts';
import { SetLengthField } from '../ledger/set-field.tsx';
import { useEditor, useEditorStore } from '../state/editor-store.ts';
import { fitted, zoomed } from './view.ts';

/** The strip over the wall: undo, the reveal, what is shown, and how near. */
export function StageToolbar({ wall, readOnly }: { wall: Wall; readOnly: boolean }) {
  const store = useEditorStore();
  const canUndo = useEditor((e) => e.undo.at(-1)?.words ?? null);
  const canRedo = useEditor((e) => e.redo.at(-1)?.words ?? null);
  const sheet = useEditor((e) => e.bench.sheet);
  const show = useEditor((e) => e.show);
  const snapping = useEditor((e) => e.snapping);
  const [problem, setProblem] = useState<string | undefined>();

  const zoom = (factor: number) => {
    const { size, view } = store.getState();
    store.setState({ view: zoomed(view, factor, { x: size.width / 2, y: size.height / 2 }) });
  };
  const setReveal = (revealMm: number | null) => {
    const read = LayoutSheet.shape.revealMm.safeParse(revealMm);
    setProblem(read.success ? undefined : 'A reveal is between 0 and 200 mm (7 7/8").');
    if (!read.success || read.data === sheet.revealMm) return;
    store.act('Reveal changed; frames already placed stay where they are', changeSheet(sheet, { revealMm: read.data }));
  };

  return (
    <div role="toolbar" aria-label="The wall" className="flex flex-wrap items-center gap-x-4 gap-y-2 border-b border-plaster-200 bg-white px-3 py-2">
      {readOnly ? null : (
        <>
          <div className="flex gap-1">
            <Tool name={canUndo ? `Undo: ${canUndo}` : 'Undo'} disabled={!canUndo} onPress={() => store.dispatch({ kind: 'undo' })}>
              <Undo2 aria-hidden="true" className="size-5" />
            </Tool>
            <Tool name={canRedo ? `Redo: ${canRedo}` : 'Redo'} disabled={!canRedo} onPress={() => store.dispatch({ kind: 'redo' })}>
              <Redo2 aria-hidden="true" className="size-5" />
            </Tool>
          </div>
          <SetLengthField label="Reveal" inline className="w-44" value={sheet.revealMm} onSet={setReveal} error={problem} />
          <Tick label="Snap" checked={snapping} onChange={(on) => store.setState({ snapping: on })} />
        </>
      )}
      <Tick label="Studs" checked={show.studs} onChange={(studs) => store.setState({ show: { ...show, studs } })} />
      <Tick label="Hangers" checked={show.hangers} onChange={(hangers) => store.setState({ show: { ...show, hangers } })} />
      <div className="ml-auto flex items-center gap-1">
        <Tool name="Farther" onPress={() => zoom(1 / 1.3)}>
          <Minus aria-hidden="true" className="size-5" />
        </Tool>
        <Tool name="Nearer" onPress={() => zoom(1.3)}>
          <Plus aria-hidden="true" className="size-5" />
        </Tool>
        <Tool name="Whole wall" onPress={() => store.setState(({ size }) => ({ view: fitted(wall, size) }))}>
          <Maximize aria-hidden="true" className="size-5" />
        </Tool>
      </div>
    </div>
  );
}

function Tool({ name, disabled = false, onPress, children }: { name: string; disabled?: boolean; onPress: () => void; children: ReactNode }) {
  return (
    <button
      type="button"
      aria-label={name}
      title={name}
      aria-disabled={disabled || undefined}
      onClick={disabled ? undefined : onPress}
      className="inline-flex size-9 items-center justify-center rounded-sm border border-ink-500 bg-white text-ink-900 hover:border-chalk-600 hover:text-chalk-700 aria-disabled:cursor-not-allowed aria-disabled:opacity-50"
    >
      {children}
    </button>
  );
}

function Tick({ label, checked, onChange }: { label: string; checked: boolean; onChange: (on: boolean) => void }) {
  return (
    <label className="flex min-h-9 items-center gap-2 text-sm font-semibold text-ink-900">
      <input type="checkbox" checked={checked} onChange={(event) => onChange(event.target.checked)} className="size-5 accent-chalk-600" />
      {label}
    </label>
  );
}
