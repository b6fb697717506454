import { boxRound } from '../operations/operations.ts';
import { type Designs, wallOutline } from '../state/designs.ts';
import type { EditorStore } from '../state/editor-store.ts';
import { fittedTo, showing } from './view.ts';

/** Chooses frames and, if they are not in sight, brings them there: the wall on the page, and the frames on the wall. */
export function showFrames(store: EditorStore, designs: Designs, ids: readonly string[]): void {
  store.dispatch({ kind: 'select', ids });
  const { bench, size, view, stage } = store.getState();
  const box = boxRound(bench.frames.filter((f) => ids.includes(f.id)), (f) => wallOutline(f, designs));
  if (box) store.setState({ view: showing(view, box, size) });
  stage?.scrollIntoView({ block: 'nearest' });
}

/** Draws the frames chosen, or all where none is, as near as the stage allows. */
export function zoomToFrames(store: EditorStore, designs: Designs): void {
  const { bench, selected, size } = store.getState();
  const some = selected.length > 0 ? bench.frames.filter((f) => selected.includes(f.id)) : bench.frames;
  const box = boxRound(some, (f) => wallOutline(f, designs));
  if (box) store.setState({ view: fittedTo(box, size) });
}
