import { describe, expect, it } from 'vitest';
import type { Snapshot } from '../../../shared/signoffs/snapshot.ts';
import { plainSizes } from '../../../src/features/signoffs/plain-sizes.ts';

const design = (over: object = {}) => ({ shape: { kind: 'rectangle', widthMm: 400, heightMm: 200 }, thicknessMm: 15, depthMm: 100, species: 'beech', moisturePercent: 8, groove: null, hangers: [], contentsKg: null, ...over });
const frame = (id: string, xMm: number, yMm: number, over: object = {}) => ({ id, patternId: 'box', xMm, yMm, turnRad: 0, flipped: false, locked: false, label: id, contentsKg: null, hungGroup: null, ...over });
const snapshot = (frames: object[], patterns: object[] = [{ id: 'box', name: 'Box', design: design() }]) =>
  ({ frames, patterns, wall: { name: 'North', widthMm: 3000, heightMm: 2400, construction: 'masonry', coveringMm: 0 } }) as unknown as Snapshot;

describe('sizes in plain words', () => {
  it('tell the whole from its outermost faces: two boxes side by side on a wall of 3 m by 2.4 m', () => {
    const { whole } = plainSizes(snapshot([frame('1', 700, 1200), frame('2', 1200, 1300)]), 'mm');
    // By hand: left 700 − 200, right 1200 + 200, bottom 1200 − 100, top 1300 + 100.
    expect(whole).toEqual([
      '2 frames, 900 mm wide and 300 mm high over all.',
      'The lowest point is 1100 mm above the floor, the highest 1000 mm below the ceiling.',
      '500 mm clear at the left end of the wall, 1600 mm at the right.',
      'The deepest frame stands 100 mm off the wall.',
    ]);
  });

  it('follow a frame that is turned a quarter', () => {
    expect(plainSizes(snapshot([frame('1', 700, 1200, { turnRad: Math.PI / 2 })]), 'mm').whole[0]).toBe('One frame, 200 mm wide and 400 mm high over all.');
  });

  it('count each pattern with its labels as a person counts, and leave out patterns that are not used', () => {
    const patterns = [{ id: 'box', name: 'Box', design: design({ groove: { widthMm: 5, depthMm: 7, clearanceMm: 1, mirrorMm: 3, backerMm: 3 } }) }, { id: 'idle', name: 'Idle', design: design({ depthMm: 300 }) }];
    const { frames, whole } = plainSizes(snapshot([frame('10', 700, 1200), frame('2', 1200, 1300)], patterns), 'mm');
    expect(frames).toEqual([{ name: 'Box', words: '2 × rectangle, 400 mm × 200 mm; beech, 15 mm thick, 100 mm deep; with a mirror', labels: '2, 10' }]);
    expect(whole[3]).toContain('100 mm');
  });

  it('say so where the wall is empty', () => {
    expect(plainSizes(snapshot([]), 'in').whole).toEqual(['There are no frames on this wall yet.']);
  });
});
