import { useState } from 'react';
import { Wall } from '../../../shared/walls/wall.ts';
import { isCallError } from '../../lib/call-error.ts';
import { begun, did, redone, undone, type History } from '../../lib/history.ts';
import { bodyOf, draftOf, isChanged, type DraftErrors, type WallDraft } from './wall-draft.ts';
import { useChangeWall } from './walls.queries.ts';

/** What someone else saved meanwhile. */
export interface Overtaken {
  current: Wall;
}

/** Told with a change for the undo list: what was done, and under which run it joins what was done just before. */
export interface Deed {
  words: string;
  run?: string;
}

interface Edit {
  history: History<WallDraft>;
  /** The wall as it was told when the draft was begun or last saved: what others save meanwhile is not lost under it. */
  base: Wall;
}

/** The wall's sheet while it is worked on: the draft over what the server told, its undoing, and its saving. */
export function useWallDraft(wall: Wall) {
  const [edit, setEdit] = useState<Edit | null>(null);
  const [errors, setErrors] = useState<DraftErrors>({});
  const [overtaken, setOvertaken] = useState<Overtaken | null>(null);
  const [said, setSaid] = useState('');
  const saving = useChangeWall(wall.id);
  const changed = edit !== null && isChanged(edit.history.now, edit.base);
  // A draft that holds nothing of its own follows what the server tells.
  const current: Edit = edit && (changed || edit.base.version === wall.version) ? edit : { history: begun(draftOf(wall)), base: wall };
  const draft = current.history.now;

  const send = (version: number) => {
    const read = bodyOf(draft);
    setErrors('errors' in read ? read.errors : {});
    if ('errors' in read) return;
    saving.mutate(
      { ...read.body, version },
      {
        onSuccess: (saved) => {
          // What came before can still be taken back; it then waits to be saved again.
          setEdit((now) => ({ history: did(now?.history ?? current.history, draftOf(saved), { words: 'Saved', run: 'save', atMs: performance.now() }), base: saved }));
          setOvertaken(null);
        },
        onError: (error) => {
          const told = isCallError(error, 'stale') ? Wall.safeParse(error.problem.current) : null;
          if (told?.success) setOvertaken({ current: told.data });
          const fields = isCallError(error) ? (error.problem.fields ?? []) : [];
          setErrors(Object.fromEntries(fields.map((f) => [f.path, f.words])));
        },
      },
    );
  };
  const turn = (turned: { history: History<WallDraft>; words: string } | null, which: string) => {
    setSaid(turned ? `${which}: ${turned.words}.` : `${which}: nothing left.`);
    if (!turned) return;
    setErrors({});
    setEdit({ ...current, history: turned.history });
  };

  return {
    draft,
    errors,
    overtaken,
    changed,
    saving: saving.isPending,
    failure: overtaken || !saving.error ? null : saving.error,
    change(part: Partial<WallDraft>, deed?: Deed) {
      setErrors({});
      const what = Object.keys(part).join(' ');
      setEdit({ ...current, history: did(current.history, { ...draft, ...part }, { words: deed?.words ?? `Change to ${what}`, run: deed ? (deed.run ?? null) : what, atMs: performance.now() }) });
      if (deed) setSaid(`${deed.words}.`);
    },
    undo: () => turn(undone(current.history), 'Undone'),
    redo: () => turn(redone(current.history), 'Redone'),
    mayUndo: current.history.past.length > 0,
    mayRedo: current.history.future.length > 0,
    /** Last thing worth saying aloud. */
    said,
    save: () => send(current.base.version),
    /** Puts this draft over what the other saved. */
    saveOver: () => overtaken && send(overtaken.current.version),
    /** Gives this draft up for what the other saved. */
    takeTheirs() {
      setEdit(null);
      setErrors({});
      setOvertaken(null);
      saving.reset();
    },
  };
}
export type WallSheet = ReturnType<typeof useWallDraft>;
