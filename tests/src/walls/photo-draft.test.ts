import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { unproject } from '../../../shared/walls/wall-camera.ts';
import type { Photo } from '../../../shared/walls/wall.ts';
import { begunBy, judge, photoDraftOf, wayOf, type PhotoDraft } from '../../../src/features/walls/photo-draft.ts';
import { handlesOf, withEdge, withEdgePoint, withHandle, withMark } from '../../../src/features/walls/photo-handles.ts';

// A painted scene whose targets' places on wall and photo are known by its own geometry.
interface Target { id: string; pixel: [number, number]; wallMm: [number, number] }
const scene = JSON.parse(readFileSync('server/database/seed/scenes/calibration-wall.json', 'utf8')) as { marks: Target[] };
const photo: Photo = { id: 'p', widthPx: 4000, heightPx: 3000, previewUrl: '/p', marks: null, elevation: null, createdAt: '2026-03-02T09:00:00Z' };
const wall = { widthMm: 3000, heightMm: 2400 };
const target = (id: string) => scene.marks.find((m) => m.id === id)!;
const px = (id: string) => ({ x: target(id).pixel[0], y: target(id).pixel[1] });
// The taped rectangle: its sides are plumb and level.
const [ll, lr, ur, ul] = ['tape-lower-left', 'tape-lower-right', 'tape-upper-right', 'tape-upper-left'] as const;

/** The draft of a way with its lines on the sides of the taped rectangle, and its lengths on foot and right side. */
function onTheTape(way: 'rectangle' | 'lines'): PhotoDraft {
  const begun = begunBy(way, photo, photoDraftOf(photo));
  const ends = [[ll, ul], [lr, ur], [ll, lr], [ul, ur]] as const;
  const sides = [[ll, lr, 2400], [lr, ur, 1500]] as const;
  return {
    ...begun,
    marks: [{ px: px(ll), xMm: 300, yMm: 450 }],
    lines: begun.lines.map((l, i) => ({ ...l, px: [px(ends[i]![0]), px(ends[i]![1])] })),
    lengths: begun.lengths.map((_, i) => ({ px: [px(sides[i]![0]), px(sides[i]![1])], mm: sides[i]![2] })),
  };
}

/** How far from their true places the straightened picture would show the scene's targets, at worst, mm. */
function worstMm(draft: PhotoDraft): number {
  const judged = judge(draft, photo, wall);
  if (judged.state !== 'fit') throw new Error(JSON.stringify(judged));
  return Math.max(...scene.marks.map((m) => {
    const at = unproject(judged.fit.frame, judged.fit.camera, { x: m.pixel[0], y: m.pixel[1] });
    return Math.hypot(at.x - m.wallMm[0], at.y - m.wallMm[1]);
  }));
}

describe('a photo straightened without four measured points', () => {
  it('is true to a few millimetres by a rectangle’s sides, two lengths and one mark', () => {
    expect(wayOf(onTheTape('lines'))).toBe('lines');
    expect(worstMm(onTheTape('lines'))).toBeLessThan(5);
  });

  it('is true to two hundredths by a rectangle’s sides and one length', () => {
    expect(wayOf(onTheTape('rectangle'))).toBe('rectangle');
    expect(worstMm(onTheTape('rectangle'))).toBeLessThan(0.02 * 3000);
  });

  it('says what is still wanting: a length, a line', () => {
    const draft = onTheTape('lines');
    expect(judge({ ...draft, lengths: draft.lengths.map((l) => ({ ...l, mm: null })) }, photo, wall)).toMatchObject({ state: 'unfinished', words: 'Give all lengths first.' });
    expect(judge({ ...draft, lines: draft.lines.slice(1) }, photo, wall)).toMatchObject({ state: 'trouble', trouble: { words: expect.stringMatching(/two plumb and two level/) as string } });
  });
});

describe('handles on the photo', () => {
  it('are one for each mark, end and point, by name, and move alone', () => {
    const draft = withEdgePoint(withEdge(onTheTape('rectangle'), photo), 0);
    const names = handlesOf(draft).map((h) => h.name);
    expect(names).toHaveLength(1 + 4 * 2 + 2 + 4);
    expect(names).toEqual(expect.arrayContaining(['Plumb line 2, second end', 'Level line 1, first end', 'Length 1, second end', 'Straight edge 1, point 4']));
    const moved = withHandle(draft, { kind: 'line', index: 1, end: 1 }, { x: 7, y: 8 });
    expect(handlesOf(moved).filter((h, i) => h.px !== handlesOf(draft)[i]!.px).map((h) => h.name)).toEqual(['Plumb line 2, second end']);
  });

  it('of a new mark stand apart from those there', () => {
    const draft = withMark(withMark(photoDraftOf(photo), photo), photo);
    const places = handlesOf(draft).map((h) => `${h.px.x} ${h.px.y}`);
    expect(new Set(places).size).toBe(6);
    expect(judge(draft, photo, wall)).toMatchObject({ state: 'unfinished', words: 'Give the positions of all marks first.' });
  });
});
