import { plainTurnRad } from './turn.ts';
import { editsBetween, type Bench } from './edits.ts';
import type { Frame, LayoutSheet } from './layout.ts';
import { byLabel } from './naming.ts';

/** What became of one frame between two states of a layout. */
export interface FrameChange {
  frameId: string;
  label: string;
  before: Frame | null;
  after: Frame | null;
  /** 'noted' changed in nothing that is seen: label, load, lock, group, hangers. */
  kind: 'added' | 'removed' | 'swapped' | 'moved' | 'turned' | 'noted';
  /** How far its centre went, mm: to the right and up. */
  acrossMm: number;
  upMm: number;
  /** How far it was turned, counter-clockwise, radians. */
  turnedRad: number;
}

export interface Changes {
  frames: FrameChange[];
  sheet: { before: LayoutSheet; after: LayoutSheet } | null;
  /** Frames that are the same in both. */
  same: number;
}

/** Less than this is rounding and no move: a hundredth of a millimetre, a thousandth of a degree. */
const leastMm = 0.01;
const leastRad = 1.75e-5;

/** What moved, came and went from one state of a layout to another, in order of label. */
export function changesBetween(from: Bench, to: Bench): Changes {
  const changes: Changes = { frames: [], sheet: null, same: 0 };
  for (const edit of editsBetween(from, to)) {
    if (edit.kind === 'sheet') changes.sheet = { before: edit.before, after: edit.after };
    else changes.frames.push(changeOf(edit.frameId, edit.before, edit.after));
  }
  changes.frames.sort(byLabel);
  changes.same = to.frames.length - changes.frames.filter((c) => c.after).length;
  return changes;
}

function changeOf(frameId: string, before: Frame | null, after: Frame | null): FrameChange {
  const both = before !== null && after !== null;
  const acrossMm = both ? after.xMm - before.xMm : 0;
  const upMm = both ? after.yMm - before.yMm : 0;
  const turnedRad = both ? plainTurnRad(after.turnRad - before.turnRad) : 0;
  const kind = !before ? 'added' : !after ? 'removed'
    : before.patternId !== after.patternId ? 'swapped'
    : Math.hypot(acrossMm, upMm) >= leastMm ? 'moved'
    : Math.abs(turnedRad) >= leastRad || before.flipped !== after.flipped ? 'turned' : 'noted';
  return { frameId, label: (after ?? before)?.label ?? '', before, after, kind, acrossMm, upMm, turnedRad };
}
