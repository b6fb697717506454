import { Maximize, Minus, Plus, Redo2, Ruler, ScanSearch, Undo2 } from 'lucide-react';
import { useState } from 'react';
import { LayoutSheet } from '../../../../../shared/layouts/layout.ts';
import type { Wall } from '../../../../../shared/walls/wall.ts';
import { Button } from '../../../../components/button.tsx';
import { changeSheet } from '../operations/operations.ts';
import { SetLengthField } from '../ledger/set-field.tsx';
import type { Designs } from '../state/designs.ts';
import { useEditor, useEditorStore } from '../state/editor-store.ts';
import { zoomToFrames } from './show-frames.ts';
import { Tool } from './tool.tsx';
import { TrueSize } from './true-size.tsx';
import { fitted, zoomed } from './view.ts';

/** The strip over the wall: undo, the reveal, what is shown, and how near. */
export function StageToolbar({ wall, designs, readOnly }: { wall: Wall; designs: Designs; readOnly: boolean }) {
  const store = useEditorStore();
  const canUndo = useEditor((e) => e.undo.at(-1)?.words ?? null);
  const canRedo = useEditor((e) => e.redo.at(-1)?.words ?? null);
  const sheet = useEditor((e) => e.bench.sheet);
  const show = useEditor((e) => e.show);
  const snapping = useEditor((e) => e.snapping);
  const seeking = useEditor((e) => e.seeking);
  const measuring = useEditor((e) => e.measuring !== null);
  const chosen = useEditor((e) => e.selected.length > 0);
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
    <div role="toolbar" aria-label="The wall" className="flex flex-wrap items-center gap-x-3 gap-y-2 border-b border-plaster-200 bg-white px-3 py-2">
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
          <SetLengthField label="Reveal" inline value={sheet.revealMm} onSet={setReveal} error={problem} />
          <Tick label="Snap" checked={snapping} onChange={(on) => store.setState({ snapping: on })} />
        </>
      )}
      {readOnly ? null : (
        <Button small id="seek-studs" aria-expanded={seeking} onClick={() => store.setState({ seeking: !seeking })}>
          Seek studs
        </Button>
      )}
      {readOnly ? null : (
        <Button small aria-haspopup="dialog" onClick={() => store.setState({ arranging: true })}>
          Arrange for me
        </Button>
      )}
      <Tick label="Studs" checked={show.studs} onChange={(studs) => store.setState({ show: { ...show, studs } })} />
      <Tick label="Hangers" checked={show.hangers} onChange={(hangers) => store.setState({ show: { ...show, hangers } })} />
      {wall.photo?.elevation ? <PhotoBrightness /> : null}
      <div className="ml-auto flex items-center gap-1">
        <Tool name="Measure" pressed={measuring} onPress={() => store.setState({ measuring: measuring ? null : { from: null, to: null, done: false } })}>
          <Ruler aria-hidden="true" className="size-5" />
        </Tool>
        <TrueSize />
        <Tool name="Farther" onPress={() => zoom(1 / 1.3)}>
          <Minus aria-hidden="true" className="size-5" />
        </Tool>
        <Tool name="Nearer" onPress={() => zoom(1.3)}>
          <Plus aria-hidden="true" className="size-5" />
        </Tool>
        <Tool name={chosen ? 'Zoom to the frames chosen' : 'Zoom to all frames'} onPress={() => zoomToFrames(store, designs)}>
          <ScanSearch aria-hidden="true" className="size-5" />
        </Tool>
        <Tool name="Whole wall" onPress={() => store.setState(({ size }) => ({ view: fitted(wall, size) }))}>
          <Maximize aria-hidden="true" className="size-5" />
        </Tool>
      </div>
    </div>
  );
}

/** How bright the photo behind the frames is: turned down, the drawing stands out. */
function PhotoBrightness() {
  const store = useEditorStore();
  const show = useEditor((e) => e.show);
  return (
    <label className="flex min-h-9 items-center gap-2 text-sm font-semibold text-ink-900">
      Photo
      <input
        type="range"
        aria-label="Photo brightness"
        min={0}
        max={100}
        step={5}
        value={Math.round(show.photo * 100)}
        aria-valuetext={`${Math.round(show.photo * 100)} %`}
        onChange={(event) => store.setState({ show: { ...show, photo: Number(event.target.value) / 100 } })}
        className="h-6 w-16 accent-chalk-600"
      />
    </label>
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
