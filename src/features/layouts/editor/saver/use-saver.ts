import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect, useRef } from 'react';
import type { Layout } from '../../../../../shared/layouts/layout.ts';
import { layoutsApi } from '../../../../../shared/layouts/layouts.api.ts';
import { call } from '../../../../lib/call.ts';
import { keys } from '../../../../lib/keys.ts';
import { useMe } from '../../../../lib/session.ts';
import type { EditorStore } from '../state/editor-store.ts';
import { layoutVersionQuery } from '../../layouts.queries.ts';
import { keptEdits } from './kept-edits.ts';
import { type Saver, startSaver } from './saver.ts';

/** Saves the draft while the page is open, and takes in what others save. Gives how to save at once. */
export function useSaver(store: EditorStore, layout: Layout, readOnly: boolean): () => Promise<void> {
  const client = useQueryClient();
  const { userId } = useMe();
  const saver = useRef<Saver | null>(null);
  const { id, jobId } = layout;

  useEffect(() => {
    if (readOnly) return;
    const running = startSaver({
      store,
      kept: keptEdits(userId, id),
      send: async (version, edits) => {
        const saved = await call(layoutsApi.edit, { params: { layoutId: id }, body: { version, edits } });
        // An answer to an older question may be on its way: it must not come in over this one.
        await client.cancelQueries({ queryKey: keys.layout(id) });
        client.setQueryData(keys.layout(id), saved);
        void client.invalidateQueries({ queryKey: keys.job(jobId), refetchType: 'none' });
        return saved;
      },
    });
    saver.current = running;
    return () => {
      saver.current = null;
      running.stop();
    };
  }, [client, store, userId, id, jobId, readOnly]);

  useEffect(() => {
    // A newer version that did not come by an own save is another person's.
    const { stored, save } = store.getState();
    if (layout.version <= stored.version || save.kind === 'saving') return;
    store.dispatch({ kind: 'stored', layout });
    store.dispatch({ kind: 'say', words: `${layout.updatedBy} saved: their changes are on the wall.` });
  }, [store, layout]);

  const version = useQuery(layoutVersionQuery(id)).data?.version;
  useEffect(() => {
    if (version !== undefined && version > store.getState().stored.version && store.getState().save.kind !== 'saving') void client.invalidateQueries({ queryKey: keys.layout(id), exact: true });
  }, [client, store, id, version]);

  return async () => {
    await saver.current?.flush();
  };
}
