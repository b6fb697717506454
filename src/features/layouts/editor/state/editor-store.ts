import { createContext, useContext } from 'react';
import { createStore, useStore, type StoreApi } from 'zustand';
import type { Box, Placement, Point, Polygon } from '../../../../../shared/geometry/polygon.ts';
import type { Edit, Layout } from '../../../../../shared/layouts/layout.ts';
import type { MeasuredPoint } from '../../../../../shared/layouts/measure.ts';
import type { Snap } from '../../../../../shared/layouts/snap.ts';
import type { SnapLine } from '../../../../../shared/layouts/snap-lines.ts';
import type { SaveState } from '../saver/save-state.ts';
import { fitted, type View } from '../stage/view.ts';
import { reduce, startState, type EditorAction, type EditorState } from './editor-state.ts';

/** What the hand holds between press and release: nothing of it is on the bench yet. */
export interface Hand {
  /** Frames held, where the hand has them now. */
  placements: ReadonlyMap<string, Placement>;
  /** A pattern on its way from the tray; null while it is not over the wall. */
  fromTray: { patternId: string; at: Placement | null } | null;
  snap: Snap | null;
  /** Lines of the wall that what is held lies on. */
  lines: readonly SnapLine[];
  /** A snap just out of reach, shown with its distance. */
  offered: Snap | null;
}

/** A measure being taken: its first end, and the second, which follows the pointer until it is `done`. */
export interface Measuring {
  from: MeasuredPoint | null;
  to: MeasuredPoint | null;
  done: boolean;
}

/** A frame as it would stand, shown while someone chooses. */
export interface Ghost {
  outline: Polygon;
  hangers: readonly { at: Point; /** In a stud. */ held: boolean }[];
}

/** A hand that holds frames by no snap. */
export const handWith = (placements: Hand['placements'], fromTray: Hand['fromTray'] = null): Hand => ({ placements, fromTray, snap: null, lines: [], offered: null });

/** Everything the editor holds: the draft, and beside it what is only of the moment. */
export interface Editor extends EditorState {
  view: View;
  size: { width: number; height: number };
  hand: Hand | null;
  save: SaveState;
  /** What of the wall is drawn; `photo` is the photo's brightness, 0 (gone) to 1 (as taken). */
  show: { studs: boolean; hangers: boolean; photo: number };
  /** The box drawn by a drag over the bare wall, on the wall. */
  marquee: Box | null;
  /** Null while no measure is being taken. */
  measuring: Measuring | null;
  /** Whether studs are being sought, and how the frames would stand by what is chosen there. */
  seeking: boolean;
  ghosts: readonly Ghost[];
  /** Whether the dialog that arranges frames is open. */
  arranging: boolean;
  /** Whether a held frame snaps to its neighbours. */
  snapping: boolean;
  /** Where the wall is drawn; gestures that begin elsewhere find it here. */
  stage: HTMLElement | null;
}

export interface EditorStore extends StoreApi<Editor> {
  dispatch: (action: EditorAction) => void;
  /** Does something now: edits under the words the undo list tells. */
  act: (words: string, edits: Edit[], more?: { select?: readonly string[]; run?: string }) => void;
  settle: (choose: 'mine' | 'theirs') => void;
}

/** A store for one layout, from first load to leaving the page. */
export function createEditorStore(layout: Layout): EditorStore {
  const store = createStore<Editor>(() => ({
    ...startState(layout),
    view: fitted({ widthMm: 1000, heightMm: 1000 }, { width: 100, height: 100 }),
    size: { width: 0, height: 0 },
    hand: null,
    save: { kind: 'saved' },
    show: { studs: true, hangers: true, photo: 1 },
    marquee: null,
    measuring: null,
    seeking: false,
    ghosts: [],
    arranging: false,
    snapping: true,
    stage: null,
  }));
  const dispatch = (action: EditorAction) => store.setState((editor) => ({ ...editor, ...reduce(editor, action) }));
  return Object.assign(store, {
    dispatch,
    act: (words: string, edits: Edit[], more: { select?: readonly string[]; run?: string } = {}) => dispatch({ kind: 'do', words, edits, atMs: performance.now(), ...more }),
    settle: (choose: 'mine' | 'theirs') => dispatch({ kind: 'settle', choose, atMs: performance.now() }),
  });
}

export const EditorContext = createContext<EditorStore | null>(null);

/** The store of the layout on this page. */
export function useEditorStore(): EditorStore {
  const store = useContext(EditorContext);
  if (!store) throw new Error('The editor stands outside its page.');
  return store;
}

/** A part of the editor's state; renders again only when that part changes. */
export function useEditor<T>(part: (editor: Editor) => T): T {
  return useStore(useEditorStore(), part);
}
