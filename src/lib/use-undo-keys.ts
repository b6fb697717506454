import { useEffect, useRef } from 'react';

/**
 * The platform's keys for undo and redo, anywhere but in a field (which undoes its own typing) or a dialog.
 * Each returns nothing; what was undone is told by whoever owns the draft.
 */
export function useUndoKeys(undo: () => void, redo: () => void, active: boolean): void {
  const latest = useRef({ undo, redo });
  useEffect(() => {
    latest.current = { undo, redo };
  });
  useEffect(() => {
    if (!active) return;
    const down = (event: KeyboardEvent) => {
      const target = event.target instanceof HTMLElement ? event.target : null;
      const letter = event.key.toLowerCase();
      if (event.defaultPrevented || !(event.ctrlKey || event.metaKey) || event.altKey || (letter !== 'z' && letter !== 'y')) return;
      if (target?.closest('input, textarea, select, [contenteditable], [role="dialog"], [role="menu"]')) return;
      event.preventDefault();
      if (letter === 'y' || event.shiftKey) latest.current.redo();
      else latest.current.undo();
    };
    window.addEventListener('keydown', down);
    return () => window.removeEventListener('keydown', down);
  }, [active]);
}
