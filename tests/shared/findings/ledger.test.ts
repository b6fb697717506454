import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createLedger, findingsOf } from '../../../shared/findings/ledger.ts';
import { aFrame } from '../../support/builders.ts';
import { anObstruction, aPattern, aScene, patternId } from '../../support/a-scene.ts';

const place = fc.record({ xMm: fc.integer({ min: 0, max: 3600 }), yMm: fc.integer({ min: 0, max: 2600 }), turn: fc.integer({ min: 0, max: 5 }), group: fc.constantFrom(null, 'one', 'two') });
const step = fc.record({ frame: fc.nat(), to: place, kind: fc.constantFrom('move', 'remove', 'reveal') });

describe('the ledger', () => {
  it('after any sequence of changes says the same as if it were worked out anew', () => {
    fc.assert(
      fc.property(fc.array(place, { minLength: 1, maxLength: 8 }), fc.array(step, { maxLength: 8 }), (places, steps) => {
        const at = (id: string, p: (typeof places)[number]) => aFrame(patternId, { id, label: id, xMm: p.xMm, yMm: p.yMm, turnRad: (p.turn * Math.PI) / 6, hungGroup: p.group });
        let scene = aScene({ patterns: [aPattern()], wall: { obstructions: [anObstruction('outlet', 900, 300, 80, 80, 50)] }, frames: places.map((p, i) => at(`f${i}`, p)) });
        const ledger = createLedger();
        ledger(scene);
        for (const { frame, to, kind } of steps) {
          const i = frame % Math.max(1, scene.frames.length);
          if (kind === 'reveal') scene = { ...scene, sheet: { ...scene.sheet, revealMm: (to.xMm % 5) + 0.5 } };
          else if (kind === 'remove') scene = { ...scene, frames: scene.frames.filter((_, j) => j !== i) };
          else scene = { ...scene, frames: scene.frames.map((f, j) => (j === i ? at(f.id, to) : f)) };
          const byId = (list: { id: string }[]) => [...list].sort((a, b) => (a.id < b.id ? -1 : 1));
          expect(byId(ledger(scene).findings)).toEqual(byId(findingsOf(scene)));
        }
      }),
      { numRuns: 60 },
    );
  });

  it('keeps what did not change: frames far from the moved one are the same objects', () => {
    const scene = aScene({ frames: [aFrame(patternId, { id: 'a', xMm: 500 }), aFrame(patternId, { id: 'b', xMm: 2500 })] });
    const ledger = createLedger();
    const before = ledger(scene);
    const after = ledger({ ...scene, frames: [scene.frames[0]!, { ...scene.frames[1]!, xMm: 2600 }] });
    expect(after.frames[0]).toBe(before.frames[0]);
    expect(after.bodies.find((b) => b.id === 'frame a')).toBe(before.bodies.find((b) => b.id === 'frame a'));
  });
});
