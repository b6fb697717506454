import { boxOf, type Box, type Placement, type Point, type Polygon } from '../../../../../shared/geometry/polygon.ts';
import type { Edit, Frame, LayoutSheet } from '../../../../../shared/layouts/layout.ts';
import { nextLabel } from '../../../../../shared/layouts/naming.ts';
import { plainTurnRad } from '../../../../../shared/layouts/turn.ts';

/** What a person does to the frames on the bench, as edits. Every operation is pure; locked frames stay where they are. */

export interface OutlineOf {
  (frame: Frame): Polygon | null;
}

const changed = (before: Frame, after: Frame): Edit => ({ kind: 'frame', frameId: before.id, before, after });
const chosen = (frames: readonly Frame[], ids: readonly string[]): Frame[] => frames.filter((f) => ids.includes(f.id));
const loose = (frames: readonly Frame[], ids: readonly string[]): Frame[] => chosen(frames, ids).filter((f) => !f.locked);

/** Puts a new frame of a pattern on the wall. */
export function place(frames: readonly Frame[], frameId: string, patternId: string, at: Placement): Edit[] {
  const { xMm, yMm, turnRad, flipped } = at;
  const after: Frame = {
    id: frameId, patternId, xMm, yMm, turnRad: plainTurnRad(turnRad), flipped, locked: false, label: nextLabel(frames), contentsKg: null, hungGroup: null,
  };
  return [{ kind: 'frame', frameId, before: null, after }];
}

/** Sets frames to given placements, as a drag leaves them. */
export function settle(frames: readonly Frame[], placements: ReadonlyMap<string, Placement>): Edit[] {
  return loose(frames, [...placements.keys()]).map((frame) => {
    const { xMm, yMm, turnRad, flipped } = placements.get(frame.id)!;
    return changed(frame, { ...frame, xMm, yMm, turnRad: plainTurnRad(turnRad), flipped });
  });
}

/** Moves frames by the same way, mm. */
export function moveBy(frames: readonly Frame[], ids: readonly string[], dx: number, dy: number): Edit[] {
  return loose(frames, ids).map((frame) => changed(frame, { ...frame, xMm: frame.xMm + dx, yMm: frame.yMm + dy }));
}

/** Turns frames together about the middle of the box round their centres; one frame turns about its own centre. */
export function turnBy(frames: readonly Frame[], ids: readonly string[], byRad: number): Edit[] {
  const some = loose(frames, ids);
  if (some.length === 0) return [];
  const middle = middleOf(some);
  const cos = Math.cos(byRad);
  const sin = Math.sin(byRad);
  return some.map((frame) => {
    const x = frame.xMm - middle.x;
    const y = frame.yMm - middle.y;
    const at = some.length === 1 ? frame : { xMm: middle.x + x * cos - y * sin, yMm: middle.y + x * sin + y * cos };
    return changed(frame, { ...frame, xMm: at.xMm, yMm: at.yMm, turnRad: plainTurnRad(frame.turnRad + byRad) });
  });
}

/** Flips frames together, left for right, as seen on the wall: a mirrored turn runs the other way. */
export function flip(frames: readonly Frame[], ids: readonly string[]): Edit[] {
  const some = loose(frames, ids);
  if (some.length === 0) return [];
  const { x } = middleOf(some);
  return some.map((frame) => changed(frame, { ...frame, xMm: some.length === 1 ? frame.xMm : 2 * x - frame.xMm, turnRad: plainTurnRad(-frame.turnRad), flipped: !frame.flipped }));
}

function middleOf(frames: readonly Frame[]): Point {
  const { left, right, bottom, top } = boxOf(frames.map((f) => ({ x: f.xMm, y: f.yMm })));
  return { x: (left + right) / 2, y: (bottom + top) / 2 };
}

/** Copies of frames beside them: to the right of their box at the reveal, or to the left where the wall ends. `newIds` has one id for each. */
export function duplicate(frames: readonly Frame[], ids: readonly string[], newIds: readonly string[], sheet: LayoutSheet, outlineOf: OutlineOf, wallWidthMm: number): Edit[] {
  const some = chosen(frames, ids);
  const box = boxRound(some, outlineOf);
  if (!box) return [];
  const way = box.right - box.left + sheet.revealMm;
  const dx = box.right + way <= wallWidthMm || box.left - way < 0 ? way : -way;
  const all = [...frames];
  return some.flatMap((frame, i): Edit[] => {
    const frameId = newIds[i];
    if (!frameId) return [];
    const after: Frame = { ...frame, id: frameId, xMm: frame.xMm + dx, locked: false, label: nextLabel(all), hungGroup: null };
    all.push(after);
    return [{ kind: 'frame', frameId, before: null, after }];
  });
}

/** Takes frames off the wall. */
export function remove(frames: readonly Frame[], ids: readonly string[]): Edit[] {
  return loose(frames, ids).map((before) => ({ kind: 'frame', frameId: before.id, before, after: null }));
}

/** Changes what is written of a frame; its place only where it is not locked. */
export function change(frames: readonly Frame[], frameId: string, to: Partial<Omit<Frame, 'id'>>): Edit[] {
  const frame = frames.find(({ id }) => id === frameId);
  if (!frame) return [];
  const after = { ...frame, ...to };
  if (frame.locked) Object.assign(after, { xMm: frame.xMm, yMm: frame.yMm, turnRad: frame.turnRad, flipped: frame.flipped });
  return [changed(frame, { ...after, turnRad: plainTurnRad(after.turnRad) })];
}

/** Declares frames one hung group under a name of its own, or each by itself again. */
export function hangTogether(frames: readonly Frame[], ids: readonly string[], together: boolean): Edit[] {
  const names = new Set(frames.map((f) => f.hungGroup));
  let number = 1;
  while (names.has(`group ${number}`)) number++;
  const hungGroup = together ? `group ${number}` : null;
  return chosen(frames, ids).map((frame) => changed(frame, { ...frame, hungGroup }));
}

/** Changes the layout's name or reveal. */
export function changeSheet(before: LayoutSheet, to: Partial<LayoutSheet>): Edit[] {
  return [{ kind: 'sheet', before, after: { ...before, ...to } }];
}

/** The box round frames on the wall, or null where none is drawn. */
export function boxRound(frames: readonly Frame[], outlineOf: OutlineOf): Box | null {
  const points = frames.flatMap((frame) => outlineOf(frame) ?? []);
  return points.length > 0 ? boxOf(points) : null;
}
