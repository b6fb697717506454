import { describe, expect, it } from 'vitest';
import { canonicalText, contentText, Snapshot } from '../../../shared/signoffs/snapshot.ts';
import { aFrame, aStud, aWallShape } from '../../support/builders.ts';
import { aPattern, patternId } from '../../support/a-scene.ts';

const snapshot = (): Snapshot => ({
  format: 1, shop: 'S', job: 'J', client: 'C', letter: 'A', note: '', layoutId: patternId, sheet: { name: 'First', revealMm: 6 },
  frames: [aFrame(patternId)], patterns: [aPattern()], elevation: null,
  wall: { ...aWallShape(), studs: [aStud(400)], obstructions: [], zones: [] },
});

describe('what was signed before studs had a species and hangers could slide', () => {
  it('is read with the species it was reckoned with, and keeps its text and so its hash', () => {
    const now = snapshot();
    const old = JSON.parse(JSON.stringify(now)) as { wall: { studSpecies?: string } };
    delete old.wall.studSpecies;
    const read = Snapshot.parse(old);
    expect(read.wall.studSpecies).toBe('spruce-pine-fir');
    expect(JSON.parse(canonicalText(read))).toEqual(old);
  });

  it('keeps its text where the wall has no outline of its own, and differs once it has one', () => {
    const now = snapshot();
    const text = contentText(now);
    expect(contentText({ ...now, wall: { ...now.wall, outlineMm: null } })).toBe(text);
    expect(contentText({ ...now, wall: { ...now.wall, outlineMm: [[0, 0], [4000, 0], [0, 2000]] } })).not.toBe(text);
  });

  it('differs from the bench once another species is chosen or a hanger slid', () => {
    const now = snapshot();
    const text = contentText(now);
    expect(contentText({ ...now, wall: { ...now.wall, studSpecies: 'southern pine' } })).not.toBe(text);
    expect(contentText({ ...now, frames: [{ ...now.frames[0]!, hangerSlides: { h1: 2 } }] })).not.toBe(text);
  });
});
