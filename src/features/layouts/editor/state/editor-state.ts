import { applyEdits, compose, editsBetween, framesInOrder, invert, rebase, restate, type Bench, type Rebased } from '../../../../../shared/layouts/edits.ts';
import type { Edit, Layout } from '../../../../../shared/layouts/layout.ts';

/** One thing a person did, as the undo list tells it. */
export interface Step {
  words: string;
  edits: Edit[];
  /** Steps that follow one another under one name within a moment are one step: a run of nudges, a field typed in. */
  run: string | null;
  atMs: number;
}

/** What the server is known to hold. */
export interface Stored {
  version: number;
  bench: Bench;
  savedAt: string;
  savedBy: string;
}

/** The draft of one layout: what stands on the bench, how it came there, and what the server holds. */
export interface EditorState {
  bench: Bench;
  stored: Stored;
  undo: readonly Step[];
  redo: readonly Step[];
  selected: readonly string[];
  /** Own edits of frames that someone else saved otherwise: the person must choose. Theirs stand on the bench meanwhile. */
  conflicts: Rebased['conflicts'];
  /** Last thing worth saying aloud; `count` makes the same words news again. */
  news: { words: string; count: number };
}

export type EditorAction =
  | { kind: 'do'; words: string; edits: Edit[]; atMs: number; run?: string; select?: readonly string[] }
  | { kind: 'undo' }
  | { kind: 'redo' }
  | { kind: 'select'; ids: readonly string[] }
  | { kind: 'say'; words: string }
  /**
   * What stands on the server now: after an own save (`sent` is the bench as it was then), or because someone else's
   * save came to light.
   */
  | { kind: 'stored'; layout: Layout; sent?: Bench }
  /** Edits kept from an earlier visit that never reached the server. */
  | { kind: 'kept'; edits: readonly Edit[] }
  | { kind: 'settle'; choose: 'mine' | 'theirs'; atMs: number };

const runMs = 1200;
const longestUndo = 500;

/** The bench of a layout as the server tells it. */
export function storedOf(layout: Layout): Stored {
  return {
    version: layout.version,
    bench: { frames: framesInOrder(layout.frames), sheet: { name: layout.name, revealMm: layout.revealMm } },
    savedAt: layout.updatedAt,
    savedBy: layout.updatedBy,
  };
}

export function startState(layout: Layout): EditorState {
  const stored = storedOf(layout);
  return { bench: stored.bench, stored, undo: [], redo: [], selected: [], conflicts: [], news: { words: '', count: 0 } };
}

/** What has not reached the server yet, as the fewest edits from what it holds. */
export function unsavedEdits(state: Pick<EditorState, 'bench' | 'stored'>): Edit[] {
  return state.bench === state.stored.bench ? [] : editsBetween(state.stored.bench, state.bench);
}

/** The next state of the draft. Pure: times and new ids come in with the action. */
export function reduce(state: EditorState, action: EditorAction): EditorState {
  switch (action.kind) {
    case 'do':
      return done(state, action);
    case 'undo':
      return takenBack(state);
    case 'redo':
      return madeAgain(state);
    case 'select':
      return { ...state, selected: present(action.ids, state.bench) };
    case 'say':
      return said(state, action.words);
    case 'stored':
      return met(state, storedOf(action.layout), action.sent ?? state.stored.bench);
    case 'kept':
      return laidOver(state, action.edits);
    case 'settle':
      return settled(state, action.choose, action.atMs);
  }
}

function done(state: EditorState, action: Extract<EditorAction, { kind: 'do' }>): EditorState {
  const { frames, sheet, conflicts } = applyEdits(state.bench.frames, state.bench.sheet, action.edits);
  const made = action.edits.filter((edit) => !conflicts.includes(edit));
  if (compose(made).length === 0) return action.select ? { ...state, selected: present(action.select, state.bench) } : state;
  const bench = { frames, sheet };
  const last = state.undo.at(-1);
  const run = action.run ?? null;
  const joins = last && run !== null && last.run === run && action.atMs - last.atMs <= runMs && state.redo.length === 0;
  const step: Step = { words: action.words, edits: joins ? compose([...last.edits, ...made]) : made, run, atMs: action.atMs };
  const before = joins ? state.undo.slice(0, -1) : state.undo;
  const undo = step.edits.length > 0 ? [...before, step].slice(-longestUndo) : before;
  return said({ ...state, bench, undo, redo: [], selected: present(action.select ?? state.selected, bench) }, action.words);
}

function takenBack(state: EditorState): EditorState {
  const step = state.undo.at(-1);
  if (!step) return said(state, 'There is nothing to undo.');
  return replayed({ ...state, undo: state.undo.slice(0, -1), redo: [...state.redo, { ...step, run: null }] }, invert(step.edits), `Undone: ${step.words}`);
}

function madeAgain(state: EditorState): EditorState {
  const step = state.redo.at(-1);
  if (!step) return said(state, 'There is nothing to redo.');
  return replayed({ ...state, redo: state.redo.slice(0, -1), undo: [...state.undo, step] }, step.edits, `Redone: ${step.words}`);
}

function replayed(state: EditorState, edits: Edit[], words: string): EditorState {
  const { frames, sheet, conflicts } = applyEdits(state.bench.frames, state.bench.sheet, edits);
  const bench = { frames, sheet };
  const left = conflicts.length > 0 ? `${words}, except ${conflicts.length} that someone else has changed since.` : `${words}.`;
  const touched = edits.flatMap((edit) => (edit.kind === 'frame' ? [edit.frameId] : []));
  return said({ ...state, bench, selected: present(touched, bench) }, left);
}

/** Meets what stands on the server: own unsaved edits are laid over it again where they fit; where not, theirs stands and the person is asked. */
function met(state: EditorState, now: Stored, from: Bench): EditorState {
  if (now.version < state.stored.version) return state;
  const own = state.bench === from ? [] : editsBetween(from, state.bench);
  if (own.length === 0) return { ...state, stored: now, bench: now.bench, selected: present(state.selected, now.bench) };
  return laidOver({ ...state, stored: now, bench: now.bench }, own);
}

function laidOver(state: EditorState, own: readonly Edit[]): EditorState {
  const { kept, conflicts } = rebase(own, state.bench);
  const { frames, sheet } = kept.length > 0 ? applyEdits(state.bench.frames, state.bench.sheet, kept) : state.bench;
  const bench = kept.length > 0 ? { frames: framesInOrder(frames), sheet } : state.bench;
  const asked = new Set(conflicts.map(({ own: edit }) => subjectOf(edit)));
  const earlier = state.conflicts.filter(({ own: edit }) => !asked.has(subjectOf(edit)));
  return { ...state, bench, conflicts: [...earlier, ...conflicts], selected: present(state.selected, bench) };
}

const subjectOf = (edit: Edit): string => (edit.kind === 'frame' ? edit.frameId : 'sheet');

function settled(state: EditorState, choose: 'mine' | 'theirs', atMs: number): EditorState {
  const conflicts = state.conflicts.map(({ own }) => ({
    own,
    standing: own.kind === 'sheet' ? state.bench.sheet : (state.bench.frames.find((f) => f.id === own.frameId) ?? null),
  }));
  const clear: EditorState = { ...state, conflicts: [] };
  if (choose === 'theirs') return said(clear, 'What was saved before you stands.');
  return done(clear, { kind: 'do', words: 'Your own changes put in place', edits: restate(conflicts), atMs });
}

function present(ids: readonly string[], bench: Bench): readonly string[] {
  const there = new Set(bench.frames.map(({ id }) => id));
  return [...new Set(ids)].filter((id) => there.has(id));
}

function said(state: EditorState, words: string): EditorState {
  return { ...state, news: { words, count: state.news.count + 1 } };
}
