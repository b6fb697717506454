import { AlignCenterHorizontal, AlignCenterVertical, AlignEndHorizontal, AlignEndVertical, AlignHorizontalSpaceAround, AlignStartHorizontal, AlignStartVertical, AlignVerticalSpaceAround, type LucideIcon } from 'lucide-react';
import { gapBetween } from '../../../../../shared/geometry/polygon-distance.ts';
import type { Edit, Frame } from '../../../../../shared/layouts/layout.ts';
import { formatLength } from '../../../../../shared/units/length.ts';
import { Button } from '../../../../components/button.tsx';
import { useUnits } from '../../../../lib/units.ts';
import { align, type Alignment, spaceEvenly } from '../operations/arranging.ts';
import { boxRound, moveBy } from '../operations/operations.ts';
import { type Designs, wallOutline } from '../state/designs.ts';
import { useEditorStore } from '../state/editor-store.ts';
import { SetLengthField } from './set-field.tsx';

const alignments: [Alignment, string, LucideIcon][] = [
  ['left', 'Align left edges', AlignStartVertical],
  ['middle across', 'Align middles, one over another', AlignCenterVertical],
  ['right', 'Align right edges', AlignEndVertical],
  ['top', 'Align top edges', AlignStartHorizontal],
  ['middle up', 'Align middles, side by side', AlignCenterHorizontal],
  ['bottom', 'Align bottom edges', AlignEndHorizontal],
];

/** Several frames brought into order: aligned, spaced, set as a whole to exact places. Locked ones stay, and the others go by them. */
export function ArrangeSheet({ frames, designs }: { frames: readonly Frame[]; designs: Designs }) {
  const store = useEditorStore();
  const ids = frames.map((f) => f.id);
  const outlineOf = (frame: Frame) => wallOutline(frame, designs);
  const act = (words: string, edits: Edit[]) => {
    if (edits.length === 0) store.dispatch({ kind: 'say', words: 'They are so already, or locked.' });
    else store.act(`${frames.length} frames ${words}`, edits);
  };
  const bench = () => store.getState().bench.frames;
  return (
    <div className="mt-3 grid gap-3">
      <div role="group" aria-label="Align and space" className="flex flex-wrap gap-1">
        {alignments.map(([alignment, name, Icon]) => (
          <Tool key={alignment} name={name} Icon={Icon} onPress={() => act('aligned', align(bench(), ids, alignment, outlineOf))} />
        ))}
        {frames.length > 2 ? (
          <>
            <Tool name="Space evenly across" Icon={AlignHorizontalSpaceAround} onPress={() => act('spaced evenly', spaceEvenly(bench(), ids, 'across', outlineOf))} />
            <Tool name="Space evenly upwards" Icon={AlignVerticalSpaceAround} onPress={() => act('spaced evenly', spaceEvenly(bench(), ids, 'up', outlineOf))} />
          </>
        ) : null}
      </div>
      <TogetherAt frames={frames} designs={designs} />
      {frames.length === 2 ? <BetweenTwo frames={frames} designs={designs} /> : null}
    </div>
  );
}

function Tool({ name, Icon, onPress }: { name: string; Icon: LucideIcon; onPress: () => void }) {
  return (
    <Button small aria-label={name} title={name} onClick={onPress} className="px-2">
      <Icon aria-hidden="true" className="size-4" />
    </Button>
  );
}

/** Where the frames are as a whole, to be set exactly: all of them move alike. */
function TogetherAt({ frames, designs }: { frames: readonly Frame[]; designs: Designs }) {
  const store = useEditorStore();
  const box = boxRound(frames, (f) => wallOutline(f, designs));
  if (!box) return null;
  // Moved in part, a selection would lose its order: one locked frame holds all.
  const fixed = frames.some((f) => f.locked);
  const places = [
    { label: 'Left edge from left', value: box.left, across: true },
    { label: 'Lowest point above floor', value: box.bottom, across: false },
    { label: 'Middle from left', value: (box.left + box.right) / 2, across: true },
    { label: 'Middle above floor', value: (box.bottom + box.top) / 2, across: false },
  ];
  return (
    <div className="grid grid-cols-2 gap-3">
      {places.map(({ label, value, across }) => (
        <SetLengthField
          key={label}
          label={label}
          value={value}
          disabled={fixed}
          onSet={(to) => {
            if (to === null) return;
            store.act(`${frames.length} frames moved`, moveBy(store.getState().bench.frames, frames.map((f) => f.id), across ? to - value : 0, across ? 0 : to - value));
          }}
        />
      ))}
    </div>
  );
}

/** What lies between two frames. */
function BetweenTwo({ frames, designs }: { frames: readonly Frame[]; designs: Designs }) {
  const units = useUnits();
  const [a, b] = frames as [Frame, Frame];
  const [from, to] = [wallOutline(a, designs), wallOutline(b, designs)];
  const rows: [string, number][] = [
    ...(from && to ? [['Gap, where nearest', gapBetween(from, to).mm] as [string, number]] : []),
    ['Centre to centre', Math.hypot(b.xMm - a.xMm, b.yMm - a.yMm)],
    ['Centres, across', Math.abs(b.xMm - a.xMm)],
    ['Centres, upwards', Math.abs(b.yMm - a.yMm)],
  ];
  return (
    <dl aria-label={`Between frames ${a.label} and ${b.label}`} className="grid grid-cols-2 gap-x-4 text-sm">
      {rows.map(([name, mm]) => (
        <div key={name} className="flex justify-between gap-2 py-0.5">
          <dt className="text-ink-700">{name}</dt>
          <dd className="font-semibold text-ink-900 tabular-nums">{formatLength(mm, units)}</dd>
        </div>
      ))}
    </dl>
  );
}
