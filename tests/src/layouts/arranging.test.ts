import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Polygon } from '../../../shared/geometry/polygon.ts';
import { applyEdits } from '../../../shared/layouts/edits.ts';
import type { Edit, Frame } from '../../../shared/layouts/layout.ts';
import { align, ofSamePatterns, spaceEvenly, swapPattern, within } from '../../../src/features/layouts/editor/operations/arranging.ts';

const frame = (id: string, xMm: number, yMm: number, over: Partial<Frame> = {}): Frame => ({ id, patternId: 'p', xMm, yMm, turnRad: 0, flipped: false, locked: false, label: id, contentsKg: null, hungGroup: null, ...over });
/** Pattern "p" is 100 × 60, pattern "wide" 300 × 60. */
const outlineOf = ({ patternId, xMm, yMm }: Frame): Polygon => {
  const half = patternId === 'wide' ? 150 : 50;
  return [{ x: xMm - half, y: yMm - 30 }, { x: xMm + half, y: yMm - 30 }, { x: xMm + half, y: yMm + 30 }, { x: xMm - half, y: yMm + 30 }];
};
const after = (frames: Frame[], edits: Edit[]) => {
  const { frames: now, conflicts } = applyEdits(frames, { name: 'x', revealMm: 3 }, edits);
  expect(conflicts).toEqual([]);
  return new Map(now.map((f) => [f.id, f]));
};

describe('frames aligned', () => {
  const frames = [frame('1', 500, 1000), frame('2', 900, 1100, { patternId: 'wide' }), frame('3', 2000, 900)];
  it('by their left edges stand where the leftmost does', () => {
    const now = after(frames, align(frames, ['1', '2'], 'left', outlineOf));
    expect([now.get('1')!.xMm, now.get('2')!.xMm, now.get('3')!.xMm]).toEqual([500, 600, 2000]);
  });
  it('by a locked one go to it, and it stays', () => {
    const locked = [frames[0]!, { ...frames[1]!, locked: true }];
    const now = after(locked, align(locked, ['1', '2'], 'top', outlineOf));
    expect([now.get('1')!.yMm, now.get('2')!.yMm]).toEqual([1100, 1100]);
  });
  it('by their middles share the middle of the box round them', () => {
    const now = after(frames, align(frames, ['1', '3'], 'middle across', outlineOf));
    expect([now.get('1')!.xMm, now.get('3')!.xMm]).toEqual([1250, 1250]);
  });
});

it('frames spaced evenly have equal gaps, and the first and last stay', () => {
  fc.assert(
    fc.property(fc.array(fc.record({ gap: fc.integer({ min: 0, max: 900 }), wide: fc.boolean() }), { minLength: 3, maxLength: 9 }), (list) => {
      let edge = 0;
      const frames = list.map(({ gap, wide }, i) => {
        const half = wide ? 150 : 50;
        const xMm = edge + gap + half;
        edge = xMm + half;
        return frame(String(i), xMm, 500, { patternId: wide ? 'wide' : 'p' });
      });
      const now = [...after(frames, spaceEvenly(frames, frames.map((f) => f.id), 'across', outlineOf)).values()].sort((a, b) => a.xMm - b.xMm);
      const half = (f: Frame) => (f.patternId === 'wide' ? 150 : 50);
      const gaps = now.slice(1).map((f, i) => f.xMm - half(f) - now[i]!.xMm - half(now[i]!));
      for (const gap of gaps) expect(gap).toBeCloseTo(gaps[0]!, 6);
      expect([Math.min(...now.map((f) => f.xMm)), Math.max(...now.map((f) => f.xMm))]).toEqual([Math.min(...frames.map((f) => f.xMm)), Math.max(...frames.map((f) => f.xMm))]);
    }),
  );
});

it('a pattern swapped in place keeps centre, turn, label and load; a locked frame keeps its pattern', () => {
  const frames = [frame('1', 500, 1000, { turnRad: 0.4, contentsKg: 3 }), frame('2', 900, 1000, { locked: true })];
  const now = after(frames, swapPattern(frames, ['1', '2'], 'wide'));
  expect(now.get('1')).toEqual({ ...frames[0], patternId: 'wide' });
  expect(now.get('2')).toEqual(frames[1]);
});

it('a box chooses the frames that lie wholly in it, and one frame stands for all of its pattern', () => {
  const frames = [frame('1', 500, 1000), frame('2', 620, 1000), frame('3', 900, 1000, { patternId: 'wide' })];
  expect(within(frames, { left: 440, right: 650, bottom: 900, top: 1100 }, outlineOf)).toEqual(['1']);
  expect(ofSamePatterns(frames, ['2'])).toEqual(['1', '2']);
});
