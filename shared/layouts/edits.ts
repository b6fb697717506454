import type { Edit, Frame, LayoutSheet } from './layout.ts';

/** What edits are made on: the frames of a layout, and its sheet. */
export interface Bench {
  frames: readonly Frame[];
  sheet: LayoutSheet;
}

/** A bench after edits. Edits whose `before` is not what stood there were left out and are told in `conflicts`. */
export interface Applied {
  frames: Frame[];
  sheet: LayoutSheet;
  conflicts: Edit[];
}

/** The frames of a layout are a set; they are held in order of id, so that equal layouts are equal lists. */
export function framesInOrder(frames: Iterable<Frame>): Frame[] {
  return [...frames].sort((a, b) => (a.id < b.id ? -1 : a.id > b.id ? 1 : 0));
}

/** Whether two states of a frame are the same; absent (null) is a state too. */
export function sameFrame(a: Frame | null, b: Frame | null): boolean {
  if (a === b) return true;
  if (a === null || b === null) return false;
  return (
    a.id === b.id &&
    a.patternId === b.patternId &&
    a.xMm === b.xMm &&
    a.yMm === b.yMm &&
    a.turnRad === b.turnRad &&
    a.flipped === b.flipped &&
    a.locked === b.locked &&
    a.label === b.label &&
    a.contentsKg === b.contentsKg &&
    a.hungGroup === b.hungGroup &&
    sameSlides(a.hangerSlides ?? {}, b.hangerSlides ?? {})
  );
}

/** A hanger that is not named has not been slid. */
function sameSlides(a: Readonly<Record<string, number>>, b: Readonly<Record<string, number>>): boolean {
  return a === b || [...Object.keys(a), ...Object.keys(b)].every((hanger) => (a[hanger] ?? 0) === (b[hanger] ?? 0));
}

/** Whether two sheets say the same. */
export function sameSheet(a: LayoutSheet, b: LayoutSheet): boolean {
  return a.name === b.name && a.revealMm === b.revealMm;
}

/**
 * Makes edits in their order. An edit is made only where its `before` is what stands; where it is not, nothing is
 * overwritten and the edit comes back among the conflicts. An edit that speaks of one frame and carries another
 * is a conflict too.
 */
export function applyEdits(frames: Iterable<Frame>, sheet: LayoutSheet, edits: readonly Edit[]): Applied {
  const byId = new Map<string, Frame>();
  for (const frame of frames) byId.set(frame.id, frame);
  const conflicts: Edit[] = [];
  let standing: LayoutSheet = { name: sheet.name, revealMm: sheet.revealMm };

  for (const edit of edits) {
    if (edit.kind === 'sheet') {
      if (sameSheet(edit.before, standing)) standing = edit.after;
      else conflicts.push(edit);
      continue;
    }
    const fits = sameFrame(edit.before, byId.get(edit.frameId) ?? null) && (edit.after === null || edit.after.id === edit.frameId);
    if (!fits) conflicts.push(edit);
    else if (edit.after === null) byId.delete(edit.frameId);
    else byId.set(edit.frameId, edit.after);
  }
  return { frames: framesInOrder(byId.values()), sheet: standing, conflicts };
}

/** The edits that take the given ones back: applied after them, they leave exactly what was there before. */
export function invert(edits: readonly Edit[]): Edit[] {
  return edits.toReversed().map((edit): Edit =>
    edit.kind === 'sheet'
      ? { kind: 'sheet', before: edit.after, after: edit.before }
      : { kind: 'frame', frameId: edit.frameId, before: edit.after, after: edit.before },
  );
}

/**
 * The shortest edits that do the same as the given ones: one for each frame that ends other than it began,
 * and at most one for the sheet. The given edits must follow one another (each `before` is the last `after`).
 */
export function compose(edits: readonly Edit[]): Edit[] {
  const ofFrame = new Map<string, { before: Frame | null; after: Frame | null }>();
  let ofSheet: { before: LayoutSheet; after: LayoutSheet } | null = null;
  for (const edit of edits) {
    if (edit.kind === 'sheet') {
      ofSheet = { before: ofSheet ? ofSheet.before : edit.before, after: edit.after };
    } else {
      const first = ofFrame.get(edit.frameId);
      ofFrame.set(edit.frameId, { before: first ? first.before : edit.before, after: edit.after });
    }
  }
  const short: Edit[] = [];
  for (const [frameId, { before, after }] of ofFrame) {
    if (!sameFrame(before, after)) short.push({ kind: 'frame', frameId, before, after });
  }
  if (ofSheet && !sameSheet(ofSheet.before, ofSheet.after)) short.push({ kind: 'sheet', ...ofSheet });
  return short;
}

/** The edits that lead from one bench to another; used to compare revisions. */
export function editsBetween(from: Bench, to: Bench): Edit[] {
  const before = new Map(from.frames.map((frame) => [frame.id, frame]));
  const after = new Map(to.frames.map((frame) => [frame.id, frame]));
  const edits: Edit[] = [];
  for (const frameId of new Set([...before.keys(), ...after.keys()])) {
    const a = before.get(frameId) ?? null;
    const b = after.get(frameId) ?? null;
    if (!sameFrame(a, b)) edits.push({ kind: 'frame', frameId, before: a, after: b });
  }
  if (!sameSheet(from.sheet, to.sheet)) edits.push({ kind: 'sheet', before: from.sheet, after: to.sheet });
  return edits;
}

/** Own edits met with what another person saved meanwhile. */
export interface Rebased {
  /** Still to be saved: they fit what stands now. */
  kept: Edit[];
  /** Someone else changed the same frame, or the sheet, to something else: a person must choose. */
  conflicts: { own: Edit; standing: Frame | LayoutSheet | null }[];
}

/**
 * Sorts own unsaved edits (shortened first) against what stands on the server now: those that fit are kept,
 * those already done there fall away, the rest are conflicts.
 */
export function rebase(own: readonly Edit[], now: Bench): Rebased {
  const byId = new Map(now.frames.map((frame) => [frame.id, frame]));
  const rebased: Rebased = { kept: [], conflicts: [] };
  for (const edit of compose(own)) {
    if (edit.kind === 'sheet') {
      if (sameSheet(edit.after, now.sheet)) continue;
      if (sameSheet(edit.before, now.sheet)) rebased.kept.push(edit);
      else rebased.conflicts.push({ own: edit, standing: now.sheet });
      continue;
    }
    const standing = byId.get(edit.frameId) ?? null;
    if (sameFrame(edit.after, standing)) continue;
    if (sameFrame(edit.before, standing)) rebased.kept.push(edit);
    else rebased.conflicts.push({ own: edit, standing });
  }
  return rebased;
}

/** Own edits that a person chose over what stands: the same ends, starting from what stands now. */
export function restate(conflicts: Rebased['conflicts']): Edit[] {
  return conflicts.map(({ own, standing }): Edit =>
    own.kind === 'sheet'
      ? { ...own, before: standing as LayoutSheet }
      : { ...own, before: standing as Frame | null },
  );
}
