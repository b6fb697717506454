import { describe, expect, it } from 'vitest';
import type { Photo } from '../../../shared/walls/wall.ts';
import { inThisOrder, marksOf, onPhoto, rectangleOf, withRectangle, type MarkDraft } from '../../../src/features/walls/marks-draft.ts';
import { judge as judgeAll } from '../../../src/features/walls/photo-draft.ts';

const photo: Photo = { id: 'p', widthPx: 4000, heightPx: 3000, previewUrl: '/p', marks: null, elevation: null, createdAt: '2026-03-02T09:00:00Z' };
const wall = { widthMm: 3000, heightMm: 2400 };
const judge = (marks: MarkDraft[], of: Photo, on: typeof wall) => judgeAll({ marks, straightEdges: [], lines: [], lengths: [] }, of, on);
const tape = { leftMm: 300, bottomMm: 450, widthMm: 2400, heightMm: 1500 };

describe('marks being set on a new photo', () => {
  it('begin well apart with no places, and cannot be used yet', () => {
    const marks = marksOf(photo);
    expect(marks).toHaveLength(4);
    expect(judge(marks, photo, wall)).toMatchObject({ state: 'unfinished' });
  });

  it('take their places from the taped rectangle, side by side as it is typed', () => {
    const half = withRectangle(marksOf(photo), { ...tape, widthMm: null });
    expect(half.map((m) => [m.xMm, m.yMm])).toEqual([[300, 450], [null, 450], [null, 1950], [300, 1950]]);
    const whole = withRectangle(half, tape);
    expect(whole.map((m) => [m.xMm, m.yMm])).toEqual([[300, 450], [2700, 450], [2700, 1950], [300, 1950]]);
    expect(rectangleOf(whole)).toEqual(tape);
    expect(judge(whole, photo, wall)).toMatchObject({ state: 'fit' });
  });

  it('set in a wrong order are told the one that works, which then is taken', () => {
    const right = withRectangle(marksOf(photo), tape);
    const crossed = inThisOrder(right, [0, 1, 3, 2]);
    const judged = judge(crossed, photo, wall);
    expect(judged).toMatchObject({ state: 'trouble', trouble: { order: [0, 1, 3, 2] } });
    if (judged.state === 'trouble') expect(inThisOrder(crossed, judged.trouble.order!)).toEqual(right);
  });

  it('cannot be used while a length cannot be read', () => {
    const marks = withRectangle(marksOf(photo), { ...tape, heightMm: Number.NaN });
    expect(judge(marks, photo, wall)).toMatchObject({ state: 'unfinished' });
  });

  it('are held on the photo', () => {
    expect(onPhoto({ x: -5, y: 3004 }, photo)).toEqual({ x: 0, y: 3000 });
  });
});
