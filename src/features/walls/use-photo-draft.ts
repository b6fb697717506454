import { useState } from 'react';
import type { Photo } from '../../../shared/walls/wall.ts';
import { begun, did, redone, undone, type History } from '../../lib/history.ts';
import { photoDraftOf, type PhotoDraft } from './photo-draft.ts';
import type { Deed } from './use-wall-draft.ts';

/** What is known of the photo in force while it is set, with its undoing; kept by the page, so that it outlives the panel. */
export function usePhotoDraft(photo: Photo | null) {
  const [kept, setKept] = useState<{ photoId: string; history: History<PhotoDraft> } | null>(null);
  const [said, setSaid] = useState('');
  const history = !photo ? null : kept?.photoId === photo.id ? kept.history : begun(photoDraftOf(photo));
  const put = (next: History<PhotoDraft>) => photo && setKept({ photoId: photo.id, history: next });
  const turn = (turned: { history: History<PhotoDraft>; words: string } | null | undefined, which: string) => {
    setSaid(turned ? `${which}: ${turned.words}.` : `${which}: nothing left.`);
    if (turned) put(turned.history);
  };
  return {
    draft: history?.now ?? null,
    /** Something was moved or typed since the photo was last straightened. */
    changed: photo !== null && kept?.photoId === photo.id && kept.history.past.length > 0,
    change(draft: PhotoDraft, deed: Deed) {
      if (history) put(did(history, draft, { words: deed.words, run: deed.run ?? null, atMs: performance.now() }));
      if (!deed.run) setSaid(`${deed.words}.`);
    },
    undo: () => turn(history && undone(history), 'Undone'),
    redo: () => turn(history && redone(history), 'Redone'),
    mayUndo: (history?.past.length ?? 0) > 0,
    mayRedo: (history?.future.length ?? 0) > 0,
    said,
    /** After straightening: the photo itself now tells what it was straightened by. */
    settle: () => setKept(null),
  };
}
export type PhotoSheet = ReturnType<typeof usePhotoDraft>;
