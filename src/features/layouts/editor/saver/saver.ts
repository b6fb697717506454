import { editsBetween, type Bench } from '../../../../../shared/layouts/edits.ts';
import { Layout, type Edit } from '../../../../../shared/layouts/layout.ts';
import { isCallError } from '../../../../lib/call-error.ts';
import { storedOf, unsavedEdits } from '../state/editor-state.ts';
import type { EditorStore } from '../state/editor-store.ts';
import type { KeptEdits } from './kept-edits.ts';

export interface SaverNeeds {
  store: EditorStore;
  /** Sends edits made on a version; gives the layout as it stands then, or throws a CallError. */
  send: (version: number, edits: Edit[]) => Promise<Layout>;
  kept: KeptEdits;
  /** After this long without a change the edits are sent, ms. */
  restMs?: number;
  /** After this long a failed save is tried again, ms. */
  againMs?: number;
}

export interface Saver {
  /** Sends what is unsaved at once; resolves when the answer is in. */
  flush: () => Promise<void>;
  /** Stops watching. What is unsaved is sent once more and stays kept on this device until the server has it. */
  stop: () => void;
}

/** Most edits in one request; the rest follow in the next. */
const mostEdits = 2000;

/**
 * Saves the draft by its edits: shortly after each change, one request at a time, on the version the server told last.
 * A stale version is answered with what stands there; own edits are laid over it where they fit, and the person is
 * asked about the rest. Nothing is overwritten in silence, and nothing is given up before the server has it.
 */
export function startSaver({ store, send, kept, restMs = 800, againMs = 5000 }: SaverNeeds): Saver {
  let timer: ReturnType<typeof setTimeout> | undefined;
  let sending: Promise<void> | null = null;
  /** The bench of a request whose answer never came: the server may hold it or not. */
  let doubtful: Bench | null = null;
  let stopped = false;

  const setSave = (save: ReturnType<typeof store.getState>['save']) => {
    if (store.getState().save.kind !== save.kind) store.setState({ save });
  };

  function later(ms: number): void {
    clearTimeout(timer);
    if (!stopped) timer = setTimeout(() => void flush(), ms);
  }

  function flush(): Promise<void> {
    clearTimeout(timer);
    sending ??= saveOnce().finally(() => {
      sending = null;
    });
    return sending;
  }

  async function saveOnce(): Promise<void> {
    const { bench, stored } = store.getState();
    const edits = unsavedEdits({ bench, stored }).slice(0, mostEdits);
    if (edits.length === 0) {
      kept.clear();
      setSave({ kind: 'saved' });
      return;
    }
    setSave({ kind: 'saving' });
    try {
      const layout = await send(stored.version, edits);
      doubtful = null;
      // All of the bench was sent, unless there was more than one request holds.
      store.dispatch({ kind: 'stored', layout, sent: edits.length < mostEdits ? bench : storedOf(layout).bench });
      afterAnswer();
    } catch (error) {
      onFailure(error, bench);
    }
  }

  function onFailure(error: unknown, sent: Bench): void {
    const current = isCallError(error) && error.status === 409 ? Layout.safeParse(error.problem.current) : null;
    if (current?.success) {
      const ours = doubtful !== null && editsBetween(doubtful, storedOf(current.data).bench).length === 0;
      store.dispatch({ kind: 'stored', layout: current.data, sent: ours && doubtful ? doubtful : undefined });
      doubtful = null;
      afterAnswer();
      return;
    }
    const mayRecover = !isCallError(error) || error.status === 0 || error.status === 429 || error.status >= 500 || error.code === 'sign-in-needed';
    if (isCallError(error) && error.status === 0) doubtful = sent;
    if (mayRecover) {
      setSave({ kind: 'offline' });
      later(againMs);
    } else {
      store.setState({ save: { kind: 'refused', words: error.message } });
    }
  }

  function afterAnswer(): void {
    const edits = unsavedEdits(store.getState());
    kept.write(edits);
    if (edits.length === 0) setSave({ kind: 'saved' });
    else later(restMs);
  }

  const unwatch = store.subscribe((now, before) => {
    if (now.bench === before.bench) return;
    const edits = unsavedEdits(now);
    kept.write(edits);
    if (edits.length === 0 && !sending) {
      clearTimeout(timer);
      setSave({ kind: 'saved' });
      return;
    }
    if (now.save.kind !== 'offline') setSave({ kind: 'saving' });
    later(restMs);
  });

  const left = kept.read();
  if (left.length > 0) store.dispatch({ kind: 'kept', edits: left });

  const onOnline = () => void flush();
  globalThis.addEventListener?.('online', onOnline);

  return {
    async flush() {
      // A request under way may have been sent before the last change.
      await sending;
      await flush();
    },
    stop() {
      unwatch();
      globalThis.removeEventListener?.('online', onOnline);
      void flush();
      stopped = true;
      clearTimeout(timer);
    },
  };
}
