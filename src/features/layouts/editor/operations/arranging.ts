import type { Box } from '../../../../../shared/geometry/polygon.ts';
import type { Edit, Frame } from '../../../../../shared/layouts/layout.ts';
import { boxRound, moveBy, type OutlineOf } from './operations.ts';

/** Moves that bring chosen frames into order with one another. Pure; locked frames stay, and the others go by them. */

export type Alignment = 'left' | 'right' | 'top' | 'bottom' | 'middle across' | 'middle up';

const isChosen = (ids: readonly string[]) => {
  const some = new Set(ids);
  return (frame: Frame) => some.has(frame.id);
};

/** How far a box is moved so that it lies with another, mm. */
function wayTo(alignment: Alignment, own: Box, by: Box): { dx: number; dy: number } {
  switch (alignment) {
    case 'left':
      return { dx: by.left - own.left, dy: 0 };
    case 'right':
      return { dx: by.right - own.right, dy: 0 };
    case 'top':
      return { dx: 0, dy: by.top - own.top };
    case 'bottom':
      return { dx: 0, dy: by.bottom - own.bottom };
    case 'middle across':
      return { dx: (by.left + by.right - own.left - own.right) / 2, dy: 0 };
    case 'middle up':
      return { dx: 0, dy: (by.bottom + by.top - own.bottom - own.top) / 2 };
  }
}

/** Lays the outer edges or the middles of frames in one line: that of the box round them, or of those that are locked. */
export function align(frames: readonly Frame[], ids: readonly string[], alignment: Alignment, outlineOf: OutlineOf): Edit[] {
  const some = frames.filter(isChosen(ids));
  const locked = some.filter((f) => f.locked);
  const by = boxRound(locked.length > 0 ? locked : some, outlineOf);
  if (!by) return [];
  return moves(frames, some.map((frame) => {
    const own = boxRound([frame], outlineOf);
    return { frame, ...(own ? wayTo(alignment, own, by) : { dx: 0, dy: 0 }) };
  }));
}

/** Gives the frames equal gaps across or upwards, between the outer edges of their boxes; the first and the last stay. */
export function spaceEvenly(frames: readonly Frame[], ids: readonly string[], way: 'across' | 'up', outlineOf: OutlineOf): Edit[] {
  const spans = frames.filter(isChosen(ids)).flatMap((frame) => {
    const box = boxRound([frame], outlineOf);
    return box ? [{ frame, ...(way === 'across' ? { low: box.left, high: box.right } : { low: box.bottom, high: box.top }) }] : [];
  });
  if (spans.length < 3) return [];
  spans.sort((a, b) => a.low + a.high - b.low - b.high);
  const inner = spans.reduce((sum, { low, high }) => sum + high - low, 0);
  const gap = (spans.at(-1)!.high - spans[0]!.low - inner) / (spans.length - 1);
  let next = spans[0]!.low;
  return moves(frames, spans.map(({ frame, low, high }, i) => {
    // The last stays to the last digit, whatever the sum rounds to.
    const by = i === 0 || i === spans.length - 1 ? 0 : next - low;
    next += high - low + gap;
    return { frame, dx: way === 'across' ? by : 0, dy: way === 'up' ? by : 0 };
  }));
}

function moves(frames: readonly Frame[], ways: readonly { frame: Frame; dx: number; dy: number }[]): Edit[] {
  return ways.flatMap(({ frame, dx, dy }) => (dx === 0 && dy === 0 ? [] : moveBy(frames, [frame.id], dx, dy)));
}

/** Makes frames of another pattern in their places: centre, turn, label and load stay. */
export function swapPattern(frames: readonly Frame[], ids: readonly string[], patternId: string): Edit[] {
  return frames
    .filter(isChosen(ids))
    .filter((f) => !f.locked && f.patternId !== patternId)
    .map((before) => ({ kind: 'frame', frameId: before.id, before, after: { ...before, patternId } }));
}

/** The frames made by the same patterns as those chosen. */
export function ofSamePatterns(frames: readonly Frame[], ids: readonly string[]): string[] {
  const patterns = new Set(frames.filter(isChosen(ids)).map((f) => f.patternId));
  return frames.filter((f) => patterns.has(f.patternId)).map((f) => f.id);
}

/** The frames whose outline lies wholly within a box. */
export function within(frames: readonly Frame[], box: Box, outlineOf: OutlineOf): string[] {
  return frames
    .filter((frame) => {
      const own = boxRound([frame], outlineOf);
      return own !== null && own.left >= box.left && own.right <= box.right && own.bottom >= box.bottom && own.top <= box.top;
    })
    .map((f) => f.id);
}
