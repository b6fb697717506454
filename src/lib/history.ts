/** What stood before a change: its value, what the change did in words, and the run it belongs to. */
interface Step<T> {
  value: T;
  words: string;
  run: string | null;
  atMs: number;
}

/** A draft with what stood before each change, and what undoing has taken back. Values are never changed in place. */
export interface History<T> {
  now: T;
  past: readonly Step<T>[];
  future: readonly Step<T>[];
}

const runMs = 1200;
const longest = 200;

export function begun<T>(now: T): History<T> {
  return { now, past: [], future: [] };
}

/**
 * A change made at `atMs`. Changes that follow one another under one `run` within a moment are one step, such as a field
 * typed in or a handle dragged.
 */
export function did<T>(history: History<T>, now: T, { words, run = null, atMs }: { words: string; run?: string | null; atMs: number }): History<T> {
  if (Object.is(now, history.now)) return history;
  const last = history.past.at(-1);
  if (last && run !== null && last.run === run && atMs - last.atMs <= runMs && history.future.length === 0) {
    return { now, past: [...history.past.slice(0, -1), { ...last, atMs }], future: [] };
  }
  return { now, past: [...history.past, { value: history.now, words, run, atMs }].slice(-longest), future: [] };
}

/** The last change taken back, and its words; null where there is none. */
export function undone<T>(history: History<T>): { history: History<T>; words: string } | null {
  const step = history.past.at(-1);
  if (!step) return null;
  return { words: step.words, history: { now: step.value, past: history.past.slice(0, -1), future: [...history.future, { ...step, value: history.now, run: null }] } };
}

/** The change taken back last made again, and its words; null where there is none. */
export function redone<T>(history: History<T>): { history: History<T>; words: string } | null {
  const step = history.future.at(-1);
  if (!step) return null;
  return { words: step.words, history: { now: step.value, past: [...history.past, { ...step, value: history.now }], future: history.future.slice(0, -1) } };
}
