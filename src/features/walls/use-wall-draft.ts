import { useState } from 'react';
import { Wall } from '../../../shared/walls/wall.ts';
import { isCallError } from '../../lib/call-error.ts';
import { bodyOf, draftOf, isChanged, type DraftErrors, type WallDraft } from './wall-draft.ts';
import { useChangeWall } from './walls.queries.ts';

/** What someone else saved meanwhile. */
export interface Overtaken {
  current: Wall;
}

/** The wall's sheet while it is worked on: the draft over what the server told, and its saving. */
export function useWallDraft(wall: Wall) {
  // The draft holds the version it was begun on: what others save meanwhile is not lost under it.
  const [edit, setEdit] = useState<{ draft: WallDraft; version: number } | null>(null);
  const [errors, setErrors] = useState<DraftErrors>({});
  const [overtaken, setOvertaken] = useState<Overtaken | null>(null);
  const saving = useChangeWall(wall.id);
  const draft = edit?.draft ?? draftOf(wall);

  const send = (version: number) => {
    const read = bodyOf(draft);
    setErrors('errors' in read ? read.errors : {});
    if ('errors' in read) return;
    saving.mutate(
      { ...read.body, version },
      {
        onSuccess: () => {
          setEdit(null);
          setOvertaken(null);
        },
        onError: (error) => {
          const current = isCallError(error, 'stale') ? Wall.safeParse(error.problem.current) : null;
          if (current?.success) setOvertaken({ current: current.data });
          const fields = isCallError(error) ? (error.problem.fields ?? []) : [];
          setErrors(Object.fromEntries(fields.map((f) => [f.path, f.words])));
        },
      },
    );
  };

  return {
    draft,
    errors,
    overtaken,
    changed: edit !== null && isChanged(draft, wall),
    saving: saving.isPending,
    failure: overtaken || !saving.error ? null : saving.error,
    change(part: Partial<WallDraft>) {
      setErrors({});
      setEdit({ draft: { ...draft, ...part }, version: edit?.version ?? wall.version });
    },
    save: () => send(edit?.version ?? wall.version),
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
