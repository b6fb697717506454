import { distance, type Point } from '../../../../../shared/geometry/point.ts';
import { boxOf } from '../../../../../shared/geometry/polygon.ts';
import type { Frame } from '../../../../../shared/layouts/layout.ts';
import type { Wall } from '../../../../../shared/walls/wall.ts';
import { within } from '../operations/arranging.ts';
import { settle } from '../operations/operations.ts';
import { type Designs, wallOutline } from '../state/designs.ts';
import { type EditorStore, handWith } from '../state/editor-store.ts';
import { panned, toScreen, toWall, zoomed } from '../stage/view.ts';
import { type Carry, carried, frameAt, snapReachPx, takeUp, turnedTo, turnHandle } from './carry.ts';
import { followMeasure, setMeasure } from './measure.ts';
import { snapsNow } from './snap-pause.ts';

export interface PointerNeeds {
  store: EditorStore;
  designs: () => Designs;
  wall: () => Wall;
  readOnly: () => boolean;
  /** Whether the space bar is held: then a drag moves the view. */
  spaceHeld: () => boolean;
}

type Doing =
  /** What would be carried is made ready at the press, so that the first move is as light as the rest; null where all of it is locked. */
  | { kind: 'pressed'; frame: Frame; at: Point; carry: Carry | null }
  | { kind: 'carrying'; carry: Carry }
  | { kind: 'turning'; frame: Frame }
  /** A box drawn over the bare wall; `base` was chosen before, with Shift. */
  | { kind: 'boxing'; from: Point; base: readonly string[] }
  | { kind: 'panning'; last: Point }
  | { kind: 'pinching'; apart: number; middle: Point };

/** A press becomes a drag after this way, px. */
const stirPx = 4;
const handlePx = 16;

/** Turns pointer events on the wall into selection, moves, turns and views. Returns how to stop listening. */
export function listenToPointer(element: HTMLElement, { store, designs, wall, readOnly, spaceHeld }: PointerNeeds): () => void {
  let doing: Doing | null = null;
  const touches = new Map<number, Point>();

  const at = (event: { clientX: number; clientY: number }): Point => {
    const box = element.getBoundingClientRect();
    return { x: event.clientX - box.left, y: event.clientY - box.top };
  };
  const onWall = (point: Point) => toWall(store.getState().view, point);
  const letGo = () => {
    // What is in the hand may have come from the tray: then it is not ours to let go.
    if (doing && store.getState().hand) store.setState({ hand: null });
    if (store.getState().marquee) store.setState({ marquee: null });
    doing = null;
  };

  function down(event: PointerEvent): void {
    const point = at(event);
    // A finger or button may go up outside the wall.
    try {
      element.setPointerCapture(event.pointerId);
    } catch {
      // A pointer that is already gone cannot be captured, and need not be.
    }
    element.focus({ preventScroll: true });
    if (event.pointerType === 'touch') {
      touches.set(event.pointerId, point);
      if (touches.size === 2) {
        letGo();
        const [a, b] = [...touches.values()] as [Point, Point];
        doing = { kind: 'pinching', apart: distance(a, b), middle: { x: (a.x + b.x) / 2, y: (a.y + b.y) / 2 } };
        return;
      }
    }
    if (event.button === 1 || (event.button === 0 && spaceHeld())) {
      event.preventDefault();
      doing = { kind: 'panning', last: point };
      return;
    }
    if (event.button === 0) press(event, point);
  }

  function press(event: PointerEvent, point: Point): void {
    const { bench, selected, view } = store.getState();
    if (store.getState().measuring) {
      setMeasure(store, designs(), wall(), onWall(point));
      return;
    }
    const turning = readOnly() ? null : handleAt(point);
    if (turning) {
      doing = { kind: 'turning', frame: turning };
      return;
    }
    const frame = frameAt(bench.frames, designs(), toWall(view, point));
    if (!frame) {
      if (!event.shiftKey) store.dispatch({ kind: 'select', ids: [] });
      doing = event.pointerType === 'touch' ? { kind: 'panning', last: point } : { kind: 'boxing', from: point, base: event.shiftKey ? selected : [] };
      return;
    }
    const among = selected.includes(frame.id);
    const ids = event.shiftKey ? (among ? selected.filter((id) => id !== frame.id) : [...selected, frame.id]) : among ? selected : [frame.id];
    store.dispatch({ kind: 'select', ids });
    if (!readOnly() && ids.includes(frame.id)) doing = { kind: 'pressed', frame, at: point, carry: takeUp(bench, designs(), frame.id, ids, toWall(view, point), wall()) };
  }

  function handleAt(point: Point): Frame | null {
    const { bench, selected, view } = store.getState();
    const frame = selected.length === 1 ? bench.frames.find((f) => f.id === selected[0]) : undefined;
    const pattern = frame && designs().get(frame.patternId);
    if (!frame || !pattern || frame.locked) return null;
    return distance(toScreen(view, turnHandle(frame, pattern.radiusMm, view.scale)), point) <= handlePx ? frame : null;
  }

  function move(event: PointerEvent): void {
    const point = at(event);
    if (touches.has(event.pointerId)) touches.set(event.pointerId, point);
    if (!doing) {
      if (store.getState().measuring) followMeasure(store, designs(), wall(), onWall(point));
      return;
    }
    const { bench, view, snapping: snapOn } = store.getState();
    const snapping = snapsNow(snapOn, event);
    switch (doing.kind) {
      case 'pressed': {
        if (distance(doing.at, point) < stirPx) return;
        const { carry } = doing;
        if (!carry) {
          store.dispatch({ kind: 'say', words: `Frame ${doing.frame.label} is locked in its place.` });
          doing = null;
          return;
        }
        doing = { kind: 'carrying', carry };
        break;
      }
      case 'boxing': {
        if (distance(doing.from, point) < stirPx) return;
        const marquee = boxOf([onWall(doing.from), onWall(point)]);
        store.setState({ marquee });
        store.dispatch({ kind: 'select', ids: [...doing.base, ...within(bench.frames, marquee, (f) => wallOutline(f, designs()))] });
        return;
      }
      case 'panning':
        store.setState({ view: panned(view, point.x - doing.last.x, point.y - doing.last.y) });
        doing.last = point;
        return;
      case 'pinching': {
        const [a, b] = [...touches.values()];
        if (!a || !b) return;
        const apart = Math.max(1, distance(a, b));
        const middle = { x: (a.x + b.x) / 2, y: (a.y + b.y) / 2 };
        const moved = panned(view, middle.x - doing.middle.x, middle.y - doing.middle.y);
        store.setState({ view: zoomed(moved, apart / Math.max(1, doing.apart), middle) });
        doing = { kind: 'pinching', apart, middle };
        return;
      }
      case 'turning': {
        const placement = turnedTo(doing.frame, designs(), onWall(point), snapping);
        store.setState({ hand: handWith(new Map([[doing.frame.id, placement]])) });
        return;
      }
      case 'carrying':
        break;
    }
    if (doing.kind !== 'carrying') return;
    const now = carried(doing.carry, onWall(point), { revealMm: bench.sheet.revealMm, reachMm: snapReachPx / view.scale, snapping });
    store.setState({ hand: { ...now, fromTray: null } });
  }

  function up(event: PointerEvent): void {
    touches.delete(event.pointerId);
    const { hand, bench, marquee, selected } = store.getState();
    if (hand && doing && (doing.kind === 'carrying' || doing.kind === 'turning')) {
      const edits = settle(bench.frames, hand.placements);
      const words = doing.kind === 'turning' ? `Frame ${doing.frame.label} turned` : wordsOfMove(bench.frames, [...hand.placements.keys()]);
      store.act(words, edits);
    }
    if (doing?.kind === 'boxing' && marquee) store.dispatch({ kind: 'say', words: selected.length === 1 ? '1 frame chosen.' : `${selected.length} frames chosen.` });
    letGo();
  }

  function cancel(event: PointerEvent): void {
    touches.delete(event.pointerId);
    letGo();
  }

  function wheel(event: WheelEvent): void {
    event.preventDefault();
    const lines = event.deltaMode === WheelEvent.DOM_DELTA_LINE ? 16 : 1;
    if (event.shiftKey) {
      store.setState(({ view }) => ({ view: panned(view, -(event.deltaX || event.deltaY) * lines, 0) }));
      return;
    }
    store.setState(({ view }) => ({ view: zoomed(view, Math.exp(-event.deltaY * lines * 0.0015), at(event)) }));
  }

  const stopEscape = (event: KeyboardEvent) => {
    if (event.key !== 'Escape' || !doing) return;
    event.stopPropagation();
    letGo();
  };
  element.addEventListener('pointerdown', down);
  element.addEventListener('pointermove', move);
  element.addEventListener('pointerup', up);
  element.addEventListener('pointercancel', cancel);
  element.addEventListener('wheel', wheel, { passive: false });
  document.addEventListener('keydown', stopEscape, true);
  return () => {
    element.removeEventListener('pointerdown', down);
    element.removeEventListener('pointermove', move);
    element.removeEventListener('pointerup', up);
    element.removeEventListener('pointercancel', cancel);
    element.removeEventListener('wheel', wheel);
    document.removeEventListener('keydown', stopEscape, true);
  };
}

function wordsOfMove(frames: readonly Frame[], ids: readonly string[]): string {
  const one = ids.length === 1 ? frames.find((f) => f.id === ids[0]) : undefined;
  return one ? `Frame ${one.label} moved` : `${ids.length} frames moved`;
}
