import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createLedger } from '../../../shared/findings/ledger.ts';
import { seekEdits, seekOnWall } from '../../../shared/findings/seek-on-wall.ts';
import type { Scene } from '../../../shared/findings/scene.ts';
import { applyEdits, invert } from '../../../shared/layouts/edits.ts';
import { aFrame, aStud } from '../../support/builders.ts';
import { anObstruction, aScene, patternId } from '../../support/a-scene.ts';

const seek = (scene: Scene) => {
  const { frames } = createLedger()(scene);
  return { frames, found: seekOnWall(frames, scene)! };
};
const inStuds = (scene: Scene) => createLedger()(scene).bodies.flatMap((b) => b.hangers).filter((h) => h.meeting?.inStud).length;

describe('seeking studs for a layout', () => {
  it('moves two frames that miss by one way onto the studs, and says how they stand today', () => {
    // Hangers at 1750 and 1850 of the frame at 1800; studs 40 mm to the right, out of reach of the 20 mm they may slide.
    const scene = aScene({ wall: { studs: [aStud(1790), aStud(1890)] } });
    const { found, frames } = seek(scene);
    expect(found.today).toMatchObject({ framesHeld: 0, hangersInStuds: 0 });
    // Zone: 38.1/2 − 1.5 × 0.19 in − 1.5875 = 10.22 mm either side of the centre (NDS-2018 table 12.5.1C); a slide of 20 mm more centres it.
    expect(found.slidOnly!.score.hangersInStuds).toBe(0);
    expect(found.best[0]).toMatchObject({ shiftMm: expect.closeTo(20, 5), score: { framesHeld: 1, hangersInStuds: 2 } });
    const after = applyEdits(scene.frames, scene.sheet, seekEdits(frames, found.best[0]!)).frames;
    expect(after[0]!.xMm).toBeCloseTo(1820, 5);
    expect(inStuds({ ...scene, frames: after })).toBe(2);
  });

  it('keeps clear of obstructions, the wall’s ends and locked frames', () => {
    const studs = [aStud(1790), aStud(1890)];
    const right = 1800 + 177.8; // A corner of the hexagon, half its height up.
    const boxed = seek(aScene({ wall: { studs, obstructions: [anObstruction('vent', right + 30, 1400, 100, 100, 25)] } }));
    for (const choice of boxed.found.best) expect(choice.shiftMm).toBeLessThanOrEqual(5 + 1e-6);
    const locked = seek(aScene({ wall: { studs }, frames: [aFrame(patternId, { locked: true })] }));
    expect(locked.found.held).toMatch(/locked/);
    expect(locked.found.best.map((c) => c.shiftMm)).toEqual([0]);
  });

  it('has nothing to say of a wall without studs', () => {
    expect(seekOnWall([], aScene({ wall: { studs: [] } }))).toBeNull();
    const scene = aScene({ wall: { construction: 'masonry' } });
    expect(seekOnWall(createLedger()(scene).frames, scene)).toBeNull();
  });

  it('puts on the wall exactly what it promised, in one set of edits that can be taken back, for frames turned, flipped and slid before', () => {
    const frame = fc.record({ x: fc.integer({ min: 400, max: 3200 }), turn: fc.integer({ min: -90, max: 90 }), flipped: fc.boolean(), slide: fc.integer({ min: -20, max: 20 }) });
    fc.assert(
      fc.property(fc.array(frame, { minLength: 1, maxLength: 4 }), fc.array(fc.integer({ min: 0, max: 3600 }), { minLength: 1, maxLength: 5 }), fc.nat(), (list, studs, pick) => {
        const frames = list.map((f, i) => aFrame(patternId, { id: `f${i}`, label: String(i), xMm: f.x, turnRad: (f.turn * Math.PI) / 180, flipped: f.flipped, ...(f.slide ? { hangerSlides: { h1: f.slide } } : {}) }));
        const scene = aScene({ frames, wall: { studs: studs.map((x, i) => aStud(x, { id: `s${i}` })) } });
        const { found, frames: placed } = seek(scene);
        expect(found.today.hangersInStuds).toBe(inStuds(scene));
        const choices = [...found.best, ...(found.slidOnly ? [found.slidOnly] : [])];
        const choice = choices[pick % choices.length];
        if (!choice) return;
        const edits = seekEdits(placed, choice);
        const applied = applyEdits(scene.frames, scene.sheet, edits);
        expect(applied.conflicts).toEqual([]);
        expect(inStuds({ ...scene, frames: applied.frames })).toBe(choice.score.hangersInStuds);
        const now = createLedger()({ ...scene, frames: applied.frames }).bodies.flatMap((b) => b.hangers);
        for (const place of choice.places) expect(now.find((h) => h.key === place.id)!.x).toBeCloseTo(place.xMm, 4);
        expect(applyEdits(applied.frames, scene.sheet, invert(edits)).frames).toEqual(scene.frames);
      }),
      { numRuns: 150 },
    );
  });
});
