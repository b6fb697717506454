import { useMemo, useState } from 'react';
import { LayoutSheet } from '../../../../../shared/layouts/layout.ts';
import { byLabel } from '../../../../../shared/layouts/naming.ts';
import { formatAngle } from '../../../../../shared/units/angle.ts';
import { formatLength } from '../../../../../shared/units/length.ts';
import { Table, Td, Th } from '../../../../components/table.tsx';
import { TextField } from '../../../../components/text-field.tsx';
import { useUnits } from '../../../../lib/units.ts';
import { pictureHeightsMm } from '../../../../../shared/layouts/picture-heights.ts';
import { boxRound, changeSheet } from '../operations/operations.ts';
import { type Designs, wallOutline } from '../state/designs.ts';
import { useEditor, useEditorStore } from '../state/editor-store.ts';

/** The frames on the wall as a list: the same wall for those who do not see it. Pressing a label chooses the frame. */
export function FramesTable({ designs }: { designs: Designs }) {
  const store = useEditorStore();
  const units = useUnits();
  const frames = useEditor((e) => e.bench.frames);
  const selected = useEditor((e) => e.selected);
  const inOrder = useMemo(() => [...frames].sort(byLabel), [frames]);
  return (
    <section aria-label="Frames">
      <h2 className="mb-2 border-b border-plaster-200 pb-1 text-base font-bold text-ink-900">
        Frames <span className="font-normal text-ink-700 tabular-nums">({frames.length})</span>
      </h2>
      {inOrder.length === 0 ? (
        <p className="text-sm text-ink-700">No frame is on this wall yet.</p>
      ) : (
        <Table caption="Frames on the wall: centre from the left edge and above the floor, and turn to the left" className="max-h-80 overflow-y-auto text-sm">
          <thead className="sticky top-0 bg-white">
            <tr>
              <Th>Frame</Th>
              <Th figure>From left</Th>
              <Th figure>Above floor</Th>
              <Th figure>Turn</Th>
            </tr>
          </thead>
          <tbody>
            {inOrder.map((frame) => {
              const on = selected.includes(frame.id);
              return (
                <tr key={frame.id} className={on ? 'bg-chalk-100' : undefined}>
                  <Th scope="row" className="py-1">
                    <button
                      type="button"
                      aria-pressed={on}
                      onClick={(event) =>
                        store.dispatch({ kind: 'select', ids: event.shiftKey ? (on ? selected.filter((id) => id !== frame.id) : [...selected, frame.id]) : [frame.id] })
                      }
                      className="min-h-7 w-full text-left text-chalk-700 underline-offset-4 hover:underline"
                    >
                      {frame.label || 'no label'} <span className="block text-xs font-normal text-ink-700">{designs.get(frame.patternId)?.name ?? 'pattern not in the book'}</span>
                    </button>
                  </Th>
                  <Td figure>{formatLength(frame.xMm, units)}</Td>
                  <Td figure>{formatLength(frame.yMm, units)}</Td>
                  <Td figure>{formatAngle(frame.turnRad)}</Td>
                </tr>
              );
            })}
          </tbody>
        </Table>
      )}
    </section>
  );
}

/** How large all frames together are, and how far from the wall's edges. */
export function WholeSizes({ designs, wall, readOnly }: { designs: Designs; wall: { widthMm: number; heightMm: number }; readOnly: boolean }) {
  const units = useUnits();
  const frames = useEditor((e) => e.bench.frames);
  const box = useMemo(() => boxRound(frames, (f) => wallOutline(f, designs)), [frames, designs]);
  const rows: [string, number][] = !box ? [] : [
    ['Width', box.right - box.left],
    ['Height', box.top - box.bottom],
    ['From left edge', box.left],
    ['From right edge', wall.widthMm - box.right],
    ['Above floor', box.bottom],
    ['Below top', wall.heightMm - box.top],
    ['Middle from left', (box.left + box.right) / 2],
    ['Middle above floor', (box.bottom + box.top) / 2],
  ];
  return (
    <section aria-label="The whole">
      <h2 className="mb-2 border-b border-plaster-200 pb-1 text-base font-bold text-ink-900">The whole</h2>
      <dl className="grid grid-cols-2 gap-x-4 text-sm">
        {rows.map(([name, mm]) => (
          <div key={name} className="flex justify-between gap-2 py-0.5">
            <dt className="text-ink-700">{name}</dt>
            <dd className="font-semibold text-ink-900 tabular-nums">{formatLength(mm, units)}</dd>
          </div>
        ))}
      </dl>
      {box ? <p className="mt-1 text-xs text-ink-700">Common practice hangs the middle {formatLength(pictureHeightsMm[0], units)} to {formatLength(pictureHeightsMm[1], units)} above the floor where people stand to look.</p> : null}
      {readOnly ? null : <LayoutName />}
    </section>
  );
}

/** The layout's name, as the client will read it; takes effect when the field is left. */
function LayoutName() {
  const store = useEditorStore();
  const sheet = useEditor((e) => e.bench.sheet);
  const [typed, setTyped] = useState<string | null>(null);
  const read = LayoutSheet.shape.name.safeParse(typed ?? sheet.name);
  const finish = () => {
    if (typed === null || !read.success) return;
    setTyped(null);
    if (read.data !== sheet.name) store.act('Layout renamed', changeSheet(sheet, { name: read.data }));
  };
  return (
    <div className="mt-3" onKeyDown={(event) => (event.key === 'Enter' ? finish() : undefined)}>
      <TextField
        label="Name of the layout"
        maxLength={80}
        value={typed ?? sheet.name}
        error={read.success ? undefined : read.error.issues[0]?.message}
        onChange={(event) => setTyped(event.target.value)}
        onBlur={finish}
      />
    </div>
  );
}
