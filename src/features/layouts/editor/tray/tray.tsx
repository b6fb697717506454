import { useMemo } from 'react';
import { boxOf } from '../../../../../shared/geometry/polygon.ts';
import { nextPlace } from '../../../../../shared/layouts/next-place.ts';
import { formatLength } from '../../../../../shared/units/length.ts';
import type { Wall } from '../../../../../shared/walls/wall.ts';
import { newId } from '../../../../lib/new-id.ts';
import { useUnits } from '../../../../lib/units.ts';
import { carryFromTray } from '../gestures/from-tray.ts';
import { place } from '../operations/operations.ts';
import { type Designs, type ReadyPattern, wallOutline } from '../state/designs.ts';
import { type EditorStore, useEditorStore } from '../state/editor-store.ts';
import { PatternPicture } from './pattern-picture.tsx';

/** Places a pattern without a hand: beside the frame chosen, else beside the last one. */
export function placeNext(store: EditorStore, designs: Designs, pattern: ReadyPattern, wall: Wall): void {
  const { bench, selected } = store.getState();
  const neighbours = [...bench.frames]
    .sort((a, b) => Number(a.label) - Number(b.label) || 0)
    .flatMap((frame) => {
      const outline = wallOutline(frame, designs);
      return outline ? [{ frameId: frame.id, outline }] : [];
    });
  const at = nextPlace({ outline: pattern.outline, neighbours, besideId: selected.at(-1) ?? null, wall, keepClear: wall.obstructions.map((o) => o.outlineMm.map(([x, y]) => ({ x, y }))), revealMm: bench.sheet.revealMm });
  const frameId = newId();
  store.act(`${pattern.name} placed`, place(bench.frames, frameId, pattern.id, at), { select: [frameId] });
}

/** The strip below the wall that holds the shop's patterns, ready to place. */
export function Tray({ designs, wall }: { designs: Designs; wall: Wall }) {
  const store = useEditorStore();
  const units = useUnits();
  const ready = useMemo(() => [...designs.values()].filter((d) => !d.archived), [designs]);
  return (
    <section aria-label="Tray" className="border-t border-ink-700 bg-white">
      <p id="tray-how" className="px-3 pt-2 text-sm text-ink-700">
        {ready.length > 0 ? 'Drag a pattern to the wall, or press Enter on one to place it beside the last.' : 'The pattern book is empty: add a pattern there first.'}
      </p>
      <ul className="flex gap-2 overflow-x-auto px-3 py-2">
        {ready.map((pattern) => {
          const { left, right, bottom, top } = boxOf(pattern.outline);
          return (
            <li key={pattern.id} className="shrink-0">
              <button
                type="button"
                aria-describedby="tray-how"
                onPointerDown={(event) => carryFromTray(event.nativeEvent, pattern.id, { store, designs, wall, newId })}
                // A press by mouse or finger is a drag; a click without one comes from keys or from a screen reader, or is a plain press: both place.
                onClick={() => placeNext(store, designs, pattern, wall)}
                className="flex w-44 cursor-grab touch-pan-x items-center gap-2 rounded-sm border border-plaster-200 bg-plaster-50 p-2 text-left hover:border-chalk-600"
              >
                <PatternPicture pattern={pattern} className="size-12 shrink-0" />
                <span className="min-w-0 text-sm">
                  <span className="line-clamp-2 font-semibold text-ink-900">{pattern.name}</span>
                  <span className="block text-xs text-ink-700 tabular-nums">
                    {formatLength(right - left, units)} × {formatLength(top - bottom, units)}
                  </span>
                </span>
              </button>
            </li>
          );
        })}
      </ul>
    </section>
  );
}
