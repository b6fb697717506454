import { placedHangers } from '../../../../../shared/patterns/hangers.ts';
import { place } from '../operations/operations.ts';
import type { Designs } from '../state/designs.ts';
import { type EditorStore, handWith } from '../state/editor-store.ts';
import { toWall } from '../stage/view.ts';
import { type CarryWall, snapReachPx, surroundings } from './carry.ts';
import { type Holding, settleHold } from './hold.ts';
import { snapsNow } from './snap-pause.ts';

const stirPx = 6;

/**
 * Follows a press on a pattern of the tray: carried over the wall it snaps as a frame does, and is placed where it is
 * let go. Let go elsewhere, or with Escape, nothing is placed.
 */
export function carryFromTray(pressed: PointerEvent, patternId: string, { store, designs, wall, newId }: { store: EditorStore; designs: Designs; wall: CarryWall; newId: () => string }): void {
  const pattern = designs.get(patternId);
  if (!pattern || pressed.button !== 0) return;
  const around = surroundings(store.getState().bench, designs, [], wall);
  const holding: Holding = {
    outline: pattern.outline, body: [], maxTurnRad: (31 * Math.PI) / 180,
    hangers: placedHangers({ xMm: 0, yMm: 0, turnRad: 0, flipped: false }, pattern.design),
  };
  let stirred = false;

  function move(event: PointerEvent): void {
    if (event.pointerId !== pressed.pointerId) return;
    stirred ||= Math.hypot(event.clientX - pressed.clientX, event.clientY - pressed.clientY) >= stirPx;
    if (!stirred) return;
    const { stage, view, bench, snapping } = store.getState();
    const box = stage?.getBoundingClientRect();
    const over = box && event.clientX >= box.left && event.clientX <= box.right && event.clientY >= box.top && event.clientY <= box.bottom;
    if (!box || !over) {
      store.setState({ hand: handWith(new Map(), { patternId, at: null }) });
      return;
    }
    const point = toWall(view, { x: event.clientX - box.left, y: event.clientY - box.top });
    const held = { xMm: point.x, yMm: point.y, turnRad: 0, flipped: false };
    const { placement, ...why } = settleHold(around, holding, held, { revealMm: bench.sheet.revealMm, reachMm: snapReachPx / view.scale, snapping: snapsNow(snapping, event) });
    store.setState({ hand: { placements: new Map(), fromTray: { patternId, at: placement }, ...why } });
  }

  function up(event: PointerEvent): void {
    if (event.pointerId !== pressed.pointerId) return;
    const at = store.getState().hand?.fromTray?.at;
    stop();
    if (stirred) swallowClick();
    if (!at) return;
    const frameId = newId();
    const edits = place(store.getState().bench.frames, frameId, patternId, at);
    store.act(`${pattern!.name} placed`, edits, { select: [frameId] });
    store.getState().stage?.focus({ preventScroll: true });
  }

  const cancel = (event: PointerEvent) => (event.pointerId === pressed.pointerId ? stop() : undefined);
  const escape = (event: KeyboardEvent) => (event.key === 'Escape' ? stop() : undefined);
  function stop(): void {
    window.removeEventListener('pointermove', move);
    window.removeEventListener('pointerup', up);
    window.removeEventListener('pointercancel', cancel);
    window.removeEventListener('keydown', escape);
    store.setState({ hand: null });
  }
  window.addEventListener('pointermove', move);
  window.addEventListener('pointerup', up);
  window.addEventListener('pointercancel', cancel);
  window.addEventListener('keydown', escape);
}

/** A drag that ends over the tray again ends in a click on it, which would place what was just put back. */
function swallowClick(): void {
  const swallow = (event: MouseEvent) => event.stopPropagation();
  window.addEventListener('click', swallow, { capture: true });
  setTimeout(() => window.removeEventListener('click', swallow, { capture: true }), 0);
}
