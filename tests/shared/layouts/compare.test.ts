import { expect, it } from 'vitest';
import { changesBetween } from '../../../shared/layouts/compare.ts';
import type { Frame } from '../../../shared/layouts/layout.ts';

const frame = (id: string, over: Partial<Frame> = {}): Frame => ({ id, patternId: 'p', xMm: 500, yMm: 800, turnRad: 0, flipped: false, locked: false, label: id, contentsKg: null, hungGroup: null, ...over });
const sheet = { name: 'Over the settee', revealMm: 3 };

it('two revisions tell what moved and how far, what came, what went, and how many stayed', () => {
  const from = { sheet, frames: [frame('1'), frame('2'), frame('10'), frame('4'), frame('5')] };
  const to = { sheet: { ...sheet, revealMm: 6 }, frames: [frame('1'), frame('2', { xMm: 530, yMm: 760, turnRad: Math.PI / 6 }), frame('10', { turnRad: Math.PI / 2 }), frame('5', { contentsKg: 4 }), frame('6')] };
  const { frames, same, sheet: rule } = changesBetween(from, to);
  expect(frames.map(({ label, kind, acrossMm, upMm }) => [label, kind, acrossMm, upMm])).toEqual([
    ['2', 'moved', 30, -40],
    ['4', 'removed', 0, 0],
    ['5', 'noted', 0, 0],
    ['6', 'added', 0, 0],
    ['10', 'turned', 0, 0],
  ]);
  expect(frames[0]!.turnedRad).toBeCloseTo(Math.PI / 6, 12);
  expect([same, rule?.after.revealMm]).toEqual([1, 6]);
});
