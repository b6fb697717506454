import { MM_PER_INCH } from '../../../../../shared/units/constants.ts';
import { moveBy, remove } from '../operations/operations.ts';
import type { EditorStore } from '../state/editor-store.ts';

export interface KeyNeeds {
  store: EditorStore;
  units: () => 'in' | 'mm';
  readOnly: () => boolean;
}

const ways: Record<string, readonly [number, number]> = { ArrowLeft: [-1, 0], ArrowRight: [1, 0], ArrowUp: [0, 1], ArrowDown: [0, -1] };

/** How far an arrow key moves a frame, mm: 1 or 10 mm; in inch shops 1/16 or 1/2 in. */
export function nudgeMm(units: 'in' | 'mm', far: boolean): number {
  if (units === 'mm') return far ? 10 : 1;
  return far ? MM_PER_INCH / 2 : MM_PER_INCH / 16;
}

/**
 * The platform's own keys: undo and redo anywhere but in a field; arrows, Delete, Escape and choosing all on the wall.
 * Returns how to stop listening, and whether the space bar is held over the wall.
 */
export function listenToKeys({ store, units, readOnly }: KeyNeeds): { stop: () => void; spaceHeld: () => boolean } {
  let space = false;

  function down(event: KeyboardEvent): void {
    const target = event.target instanceof HTMLElement ? event.target : null;
    if (event.defaultPrevented || target?.closest('input, textarea, select, [contenteditable], [role="dialog"], [role="menu"]')) return;
    const command = (event.ctrlKey || event.metaKey) && !event.altKey;
    const letter = event.key.toLowerCase();
    if (command && !readOnly() && (letter === 'z' || letter === 'y')) {
      event.preventDefault();
      store.dispatch({ kind: letter === 'y' || event.shiftKey ? 'redo' : 'undo' });
      return;
    }
    const { stage, selected, bench } = store.getState();
    const onWall = target === null || target === document.body || (stage?.contains(target) ?? false);
    if (onWall && command && letter === 'a') {
      event.preventDefault();
      store.dispatch({ kind: 'select', ids: bench.frames.map((f) => f.id) });
      store.dispatch({ kind: 'say', words: `All ${bench.frames.length} frames chosen.` });
      return;
    }
    if (!onWall || command || event.altKey) return;
    if (event.key === ' ') {
      space = true;
      event.preventDefault();
      return;
    }
    if (event.key === 'Escape') {
      if (store.getState().measuring) {
        store.setState({ measuring: null });
        return;
      }
      store.dispatch({ kind: 'select', ids: [] });
      return;
    }
    if (readOnly() || selected.length === 0) return;
    const way = ways[event.key];
    if (way) {
      event.preventDefault();
      const by = nudgeMm(units(), event.shiftKey);
      const edits = moveBy(bench.frames, selected, way[0] * by, way[1] * by);
      if (edits.length === 0) store.dispatch({ kind: 'say', words: 'Locked in its place.' });
      else store.act(selected.length === 1 ? 'Frame nudged' : `${selected.length} frames nudged`, edits, { run: `nudge ${selected.join(' ')}` });
    } else if (event.key === 'Delete' || event.key === 'Backspace') {
      event.preventDefault();
      const edits = remove(bench.frames, selected);
      store.act(edits.length === 1 ? 'Frame removed' : `${edits.length} frames removed`, edits);
    }
  }
  const up = (event: KeyboardEvent) => {
    if (event.key === ' ') space = false;
  };
  const blur = () => {
    space = false;
  };
  document.addEventListener('keydown', down);
  document.addEventListener('keyup', up);
  window.addEventListener('blur', blur);
  return {
    spaceHeld: () => space,
    stop: () => {
      document.removeEventListener('keydown', down);
      document.removeEventListener('keyup', up);
      window.removeEventListener('blur', blur);
    },
  };
}
