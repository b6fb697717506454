import { describe, expect, it } from 'vitest';
import type { Wall } from '../../../shared/walls/wall.ts';
import { bodyOf, drawable, draftOf, isChanged } from '../../../src/features/walls/wall-draft.ts';

const uuid = (n: number) => `00000000-0000-4000-8000-00000000000${n}`;
const wall: Wall = {
  id: uuid(1), jobId: uuid(2), version: 3, name: 'Stair wall', widthMm: 3600, heightMm: 2600, construction: 'wood studs', coveringMm: 12.7, studSpecies: 'spruce-pine-fir',
  studs: [{ id: uuid(3), xMm: 406.4, widthMm: 38.1, foundBy: 'probe', uncertaintyMm: 3 }],
  obstructions: [
    { id: uuid(4), kind: 'outlet', name: '', outlineMm: [[300, 250], [370, 250], [370, 364], [300, 364]], clearanceMm: 50 },
    { id: uuid(5), kind: 'trim', name: 'Stair string', outlineMm: [[0, 0], [900, 0], [0, 700]], clearanceMm: 10 },
  ],
  outlineMm: null, zones: [], photo: null,
};

describe('a wall’s sheet', () => {
  it('opened and left alone changes nothing, a slanting outline with it', () => {
    const draft = draftOf(wall);
    expect(isChanged(draft, wall)).toBe(false);
    expect(bodyOf(draft)).toEqual({ body: expect.objectContaining({ studs: wall.studs, obstructions: wall.obstructions, widthMm: 3600 }) });
    expect(drawable(draft, wall)).toEqual(wall);
  });

  it('moves an outlet by its lower left corner', () => {
    const draft = draftOf(wall);
    draft.obstructions[0] = { ...draft.obstructions[0]!, leftMm: 1000 };
    expect(isChanged(draft, wall)).toBe(true);
    expect(bodyOf(draft)).toMatchObject({ body: { obstructions: [{ outlineMm: [[1000, 250], [1070, 250], [1070, 364], [1000, 364]] }, {}] } });
  });

  it('names every field that is empty, unread, or puts a stud off the wall, and sends nothing', () => {
    const draft = draftOf(wall);
    draft.name = ' ';
    draft.heightMm = Number.NaN;
    draft.obstructions[0] = { ...draft.obstructions[0]!, widthMm: null, heightMm: 0 };
    const read = bodyOf(draft);
    expect(Object.keys('errors' in read ? read.errors : {}).sort()).toEqual(['heightMm', 'name', 'obstructions.0.heightMm', 'obstructions.0.widthMm']);
    const off = bodyOf({ ...draftOf(wall), widthMm: 300 });
    expect(off).toEqual({ errors: { 'studs.0.xMm': expect.stringMatching(/off the wall/) } });
  });

  it('draws what can be read and leaves out what cannot', () => {
    const draft = draftOf(wall);
    draft.widthMm = null;
    draft.studs.push({ id: uuid(6), xMm: null, widthMm: 38.1, foundBy: 'probe', uncertaintyMm: 3 });
    draft.obstructions[0] = { ...draft.obstructions[0]!, leftMm: Number.NaN };
    expect(drawable(draft, wall)).toMatchObject({ widthMm: 3600, studs: wall.studs, obstructions: [wall.obstructions[1]] });
  });
});

describe('a wall under a sloped ceiling', () => {
  const sloped = { ...wall, outlineMm: [[0, 0], [3600, 0], [3600, 2600], [1800, 2600], [0, 1300]] as [number, number][] };

  it('keeps its outline as it is', () => {
    expect(isChanged(draftOf(sloped), sloped)).toBe(false);
    expect(bodyOf(draftOf(sloped))).toEqual({ body: expect.objectContaining({ outlineMm: sloped.outlineMm }) });
    expect(drawable(draftOf(sloped), sloped)).toEqual(sloped);
  });

  it('is not sent with an outline that crosses itself or reaches past width and height, and says where', () => {
    const crossed = draftOf(sloped);
    crossed.outline = [0, 2, 1, 3].map((i) => ({ xMm: [0, 3600, 3600, 0][i]!, yMm: [0, 0, 2600, 2600][i]! }));
    expect(bodyOf(crossed)).toEqual({ errors: { outline: expect.stringMatching(/cross/) } });
    const wide = draftOf(sloped);
    wide.outline![1] = { xMm: 3700, yMm: 0 };
    expect(bodyOf(wide)).toEqual({ errors: { 'outline.1.xMm': expect.stringMatching(/past the wall’s width/) } });
  });
});

describe('where people are', () => {
  it('runs from left to right', () => {
    const draft = draftOf(wall);
    draft.zones = [{ id: uuid(7), kind: 'bed', fromMm: 2000, toMm: 500 }];
    expect(bodyOf(draft)).toEqual({ errors: { 'zones.0.toMm': expect.stringMatching(/right/) } });
  });
});
