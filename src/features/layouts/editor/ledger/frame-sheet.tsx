import { Copy, FlipHorizontal2, Lock, RotateCcw, RotateCw, Trash2, Unlock } from 'lucide-react';
import { type ReactNode, useState } from 'react';
import { Frame } from '../../../../../shared/layouts/layout.ts';
import { nextStepRad, turnStepRad } from '../../../../../shared/layouts/turn.ts';
import { formatAngle } from '../../../../../shared/units/angle.ts';
import type { Wall } from '../../../../../shared/walls/wall.ts';
import { Button } from '../../../../components/button.tsx';
import { SelectField } from '../../../../components/select-field.tsx';
import { TextField } from '../../../../components/text-field.tsx';
import { newId } from '../../../../lib/new-id.ts';
import { ofSamePatterns, swapPattern } from '../operations/arranging.ts';
import * as operation from '../operations/operations.ts';
import { type Designs, wallOutline } from '../state/designs.ts';
import { useEditor, useEditorStore } from '../state/editor-store.ts';
import { ArrangeSheet } from './arrange-sheet.tsx';
import { SetAngleField, SetLengthField, SetMassField } from './set-field.tsx';

/** What can be done to the frames chosen, and one frame's exact place. */
export function FrameSheet({ designs, wall }: { designs: Designs; wall: Wall }) {
  const store = useEditorStore();
  const frames = useEditor((e) => e.bench.frames);
  const selected = useEditor((e) => e.selected);
  const chosen = frames.filter((f) => selected.includes(f.id));
  const only = chosen.length === 1 ? chosen[0] : undefined;
  if (chosen.length === 0) return null;

  const name = only ? `Frame ${only.label}` : `${chosen.length} frames`;
  const sides = (only && designs.get(only.patternId)?.outline.length) || 6;
  const locked = chosen.every((f) => f.locked);
  const doIt = (words: string, edits: ReturnType<typeof operation.remove>, select?: readonly string[]) =>
    store.act(`${name} ${words}`, edits, { select });
  const turn = (way: 1 | -1) =>
    doIt('turned', operation.turnBy(frames, selected, only ? nextStepRad(only.turnRad, sides, way) - only.turnRad : way * turnStepRad(sides)));
  const duplicate = () => {
    const ids = chosen.map(newId);
    const { sheet } = store.getState().bench;
    doIt('duplicated', operation.duplicate(frames, selected, ids, sheet, (f) => wallOutline(f, designs), wall.widthMm), ids);
  };

  return (
    <section aria-label={name} className="border border-chalk-600 bg-white p-3">
      <h2 className="text-base font-bold text-ink-900">{name}</h2>
      <div className="mt-2 flex flex-wrap gap-2">
        <Deed disabled={locked} onPress={() => turn(1)} icon={<RotateCcw aria-hidden="true" className="size-4" />} name={`Turn left ${formatAngle(turnStepRad(sides))}`}>
          {formatAngle(turnStepRad(sides))}
        </Deed>
        <Deed disabled={locked} onPress={() => turn(-1)} icon={<RotateCw aria-hidden="true" className="size-4" />} name={`Turn right ${formatAngle(turnStepRad(sides))}`}>
          {formatAngle(turnStepRad(sides))}
        </Deed>
        <Deed disabled={locked} onPress={() => doIt('flipped', operation.flip(frames, selected))} icon={<FlipHorizontal2 aria-hidden="true" className="size-4" />}>
          Flip
        </Deed>
        <Deed onPress={duplicate} icon={<Copy aria-hidden="true" className="size-4" />}>
          Duplicate
        </Deed>
        <Deed
          onPress={() => doIt(locked ? 'unlocked' : 'locked', chosen.flatMap((f) => operation.change(frames, f.id, { locked: !locked })))}
          icon={locked ? <Unlock aria-hidden="true" className="size-4" /> : <Lock aria-hidden="true" className="size-4" />}
        >
          {locked ? 'Unlock' : 'Lock'}
        </Deed>
        <Deed disabled={locked} onPress={() => doIt('removed', operation.remove(frames, selected))} icon={<Trash2 aria-hidden="true" className="size-4" />}>
          Remove
        </Deed>
      </div>
      <PatternOf frames={chosen} designs={designs} />
      {only ? null : <ArrangeSheet frames={chosen} designs={designs} />}
      {only ? null : <HungTogether frames={chosen} />}
      {only ? <OneFrame key={only.id} frame={only} /> : null}
    </section>
  );
}

function OneFrame({ frame }: { frame: Frame }) {
  const store = useEditorStore();
  const [label, setLabel] = useState<string | null>(null);
  const [problem, setProblem] = useState<string | undefined>();
  const set = (to: Partial<Frame>, words: string) => {
    const read = Frame.partial().safeParse(to);
    setProblem(read.success ? undefined : 'That is out of range.');
    if (!read.success) return;
    store.act(`Frame ${frame.label} ${words}`, operation.change(store.getState().bench.frames, frame.id, to));
  };
  const finishLabel = () => {
    if (label !== null && label.trim() !== frame.label) set({ label: label.trim() }, 'named');
    setLabel(null);
  };
  return (
    <div className="mt-3 grid grid-cols-2 gap-3">
      <SetLengthField label="Centre from left" value={frame.xMm} disabled={frame.locked} onSet={(xMm) => (xMm === null ? undefined : set({ xMm }, 'moved'))} />
      <SetLengthField label="Centre above floor" value={frame.yMm} disabled={frame.locked} onSet={(yMm) => (yMm === null ? undefined : set({ yMm }, 'moved'))} />
      <SetAngleField label="Turn, to the left" value={frame.turnRad} disabled={frame.locked} onSet={(turnRad) => (turnRad === null ? undefined : set({ turnRad }, 'turned'))} />
      <div onKeyDown={(event) => (event.key === 'Enter' ? finishLabel() : undefined)}>
        <TextField label="Label" maxLength={12} value={label ?? frame.label} onChange={(event) => setLabel(event.target.value)} onBlur={finishLabel} />
      </div>
      <SetMassField
        className="col-span-2"
        label="Is to carry"
        hint="Empty takes what its pattern says, or the usual load for its size."
        optional
        value={frame.contentsKg}
        onSet={(contentsKg) => set({ contentsKg }, 'loaded otherwise')}
      />
      {problem ? <p className="col-span-2 text-sm font-semibold text-madder-600">{problem}</p> : null}
    </div>
  );
}

/** The pattern of the frames chosen: swapped in place, or all of it chosen. */
function PatternOf({ frames, designs }: { frames: readonly Frame[]; designs: Designs }) {
  const store = useEditorStore();
  const patternIds = new Set(frames.map((f) => f.patternId));
  const only = patternIds.size === 1 ? frames[0]!.patternId : '';
  const ids = frames.map((f) => f.id);
  const swap = (patternId: string) => {
    const edits = swapPattern(store.getState().bench.frames, ids, patternId);
    const words = frames.length === 1 ? `Frame ${frames[0]!.label} is` : `${edits.length} frames are`;
    if (edits.length > 0) store.act(`${words} now ${designs.get(patternId)?.name ?? 'of another pattern'}`, edits);
  };
  const options = [
    ...(only === '' ? [{ value: '', words: 'Several patterns' }] : designs.has(only) ? [] : [{ value: only, words: 'Not in the book' }]),
    ...[...designs.values()].filter((d) => !d.archived || patternIds.has(d.id)).map((d) => ({ value: d.id, words: d.name })),
  ];
  return (
    <div className="mt-3 flex items-end gap-2">
      <SelectField
        className="min-w-0 grow"
        label="Pattern"
        value={only}
        disabled={frames.every((f) => f.locked)}
        onChange={(event) => (event.target.value === '' ? undefined : swap(event.target.value))}
        options={options}
      />
      <Button
        className="shrink-0"
        onClick={() => {
          const all = ofSamePatterns(store.getState().bench.frames, ids);
          store.dispatch({ kind: 'select', ids: all });
          store.dispatch({ kind: 'say', words: all.length === 1 ? 'It is the only one of its pattern.' : `${all.length} frames chosen.` });
        }}
      >
        Choose all of it
      </Button>
    </div>
  );
}

/** Frames screwed to one another hang as one body: the checks reckon with it. */
function HungTogether({ frames }: { frames: readonly Frame[] }) {
  const store = useEditorStore();
  const group = frames[0]?.hungGroup ?? null;
  const together = group !== null && frames.every((f) => f.hungGroup === group);
  const set = () => {
    const { bench } = store.getState();
    const edits = operation.hangTogether(bench.frames, frames.map((f) => f.id), !together);
    store.act(together ? 'Frames hang apart again' : `${frames.length} frames hang as one`, edits);
  };
  return (
    <p className="mt-3 flex flex-wrap items-center gap-3 text-sm text-ink-700">
      <Button small onClick={set}>
        {together ? 'Hang apart' : 'Hang as one'}
      </Button>
      {together ? 'Screwed to one another: one body over all its hangers.' : 'For frames screwed to one another.'}
    </p>
  );
}

function Deed({ onPress, icon, name, disabled = false, children }: { onPress: () => void; icon: ReactNode; name?: string; disabled?: boolean; children: ReactNode }) {
  return (
    <Button small aria-label={name} disabled={disabled} onClick={onPress}>
      {icon}
      {children}
    </Button>
  );
}
