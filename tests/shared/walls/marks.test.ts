import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { elevationPlan, elevationToPhoto } from '../../../shared/walls/elevation-plan.ts';
import { applyHomography, magnification } from '../../../shared/walls/homography.ts';
import { marksTrouble, type Mark } from '../../../shared/walls/marks.ts';
import { aCamera, photoSize, seenBy } from '../../support/a-camera.ts';

const camera = aCamera({ at: [2550, 1450, 2780], lookAt: [1540, 1200, 0], rollDegrees: 1.4 });
const tape = [{ x: 300, y: 450 }, { x: 2700, y: 450 }, { x: 2700, y: 1950 }, { x: 300, y: 1950 }];
const marksOf = (points: { x: number; y: number }[]): Mark[] => points.map((mm) => ({ mm, px: seenBy(camera, mm) }));

describe('four marks on a photo', () => {
  it('are taken when they are the corners of a tape rectangle, whichever comes first', () => {
    for (const turn of [0, 1, 2, 3]) {
      expect(marksTrouble(marksOf([...tape.slice(turn), ...tape.slice(0, turn)]), photoSize)).toBeNull();
    }
  });

  it('are refused when two stand on one spot of the photo or of the wall', () => {
    const marks = marksOf(tape);
    expect(marksTrouble(marks.map((m, i) => (i === 2 ? { ...m, px: marks[1]!.px } : m)), photoSize)).toMatchObject({ code: 'repeated on photo', which: [1, 2] });
    expect(marksTrouble(marks.map((m, i) => (i === 3 ? { ...m, mm: { x: 300, y: 452 } } : m)), photoSize)).toMatchObject({ code: 'repeated on wall', which: [0, 3] });
  });

  it('are refused when three lie nearly in one line', () => {
    const trouble = marksTrouble(marksOf([tape[0]!, { x: 1500, y: 470 }, tape[1]!, tape[2]!]), photoSize);
    expect(trouble).toMatchObject({ code: 'in line on photo', which: [0, 1, 2] });
    expect(trouble?.words).toMatch(/^Marks 1, 2 and 3 lie nearly in one line/);
  });

  it('are refused when one has been dragged off the picture', () => {
    const marks = marksOf(tape);
    expect(marksTrouble(marks.map((m, i) => (i === 0 ? { ...m, px: { x: -3, y: 50 } } : m)), photoSize)).toMatchObject({ code: 'outside photo', which: [0] });
  });

  it('typed in a wrong order are refused with the order that works', () => {
    fc.assert(
      fc.property(fc.shuffledSubarray([0, 1, 2, 3], { minLength: 4 }), (order) => {
        const right = marksOf(tape);
        const typed = right.map((m, i) => ({ ...m, mm: right[order[i]!]!.mm }));
        const trouble = marksTrouble(typed, photoSize);
        if (!trouble) return; // One of the four ways round, which only the reader can tell from the true one.
        expect(trouble.code).toBe('wrong order');
        const mended = typed.map((m, i) => ({ ...m, mm: typed[trouble.order![i]!]!.mm }));
        expect(mended).toEqual(right);
      }),
    );
  });

  it('whose places were typed as if seen from behind the wall are refused, for a photo never mirrors', () => {
    const mirrored = marksOf(tape).map((m) => ({ ...m, mm: { x: 3000 - m.mm.x, y: m.mm.y } }));
    expect(marksTrouble(mirrored, photoSize)).toMatchObject({ code: 'wrong order', order: [1, 0, 3, 2] });
  });
});

describe('more than four marks', () => {
  const eight = [...tape, { x: 1500, y: 430 }, { x: 2650, y: 1300 }, { x: 1450, y: 2000 }, { x: 350, y: 1150 }];

  it('are taken, some of them in line, as long as four stand well', () => {
    expect(marksTrouble(marksOf(eight), photoSize)).toBeNull();
    const inLine = marksOf([0, 500, 1000, 1500, 2000].map((x) => ({ x, y: 500 })));
    expect(marksTrouble(inLine, photoSize)).toMatchObject({ code: expect.stringMatching(/^in line/) });
  });

  it('of which two have each other’s positions are refused with the exchange that works', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 3 }), fc.integer({ min: 0, max: 3 }), (a, b) => {
        fc.pre(a !== b);
        const right = marksOf(eight);
        const typed = right.map((m, i) => ({ ...m, mm: right[i === a ? b : i === b ? a : i]!.mm }));
        const trouble = marksTrouble(typed, photoSize);
        expect(trouble).toMatchObject({ code: 'wrong order' });
        expect(typed.map((m, i) => ({ ...m, mm: typed[trouble!.order![i]!]!.mm }))).toEqual(right);
      }),
    );
  });

  it('forty at the most are judged in the time of a picture’s frame or a few', () => {
    const forty = marksOf(Array.from({ length: 40 }, (_, i) => ({ x: 200 + 330 * (i % 8), y: 300 + 380 * Math.floor(i / 8) })));
    const row = marksOf(Array.from({ length: 40 }, (_, i) => ({ x: 200 + 65 * i, y: 300 })));
    const began = performance.now();
    expect(marksTrouble(forty, photoSize)).toBeNull();
    expect(marksTrouble(row, photoSize)).toMatchObject({ code: expect.stringMatching(/^in line/) });
    expect(performance.now() - began).toBeLessThan(1500);
  });
});

describe('the straightened picture', () => {
  const wall = { widthMm: 3000, heightMm: 2400 };

  it('shows the whole wall at a millimetre a pixel or finer where the photo has it', () => {
    const plan = elevationPlan(marksOf(tape), photoSize, wall)!;
    expect(plan).toMatchObject({ leftMm: 0, bottomMm: 0, widthMm: 3000, heightMm: 2400 });
    expect(plan.pxPerMm).toBeGreaterThanOrEqual(1);
    expect(plan.widthPx).toBe(Math.round(3000 * plan.pxPerMm));
    const toPhoto = elevationToPhoto(plan);
    for (const p of [{ x: 0, y: 0 }, { x: 1234, y: 567 }, { x: 2999, y: 2399 }]) {
      const direct = seenBy(camera, p);
      const viaPicture = applyHomography(toPhoto, { x: p.x * plan.pxPerMm, y: (2400 - p.y) * plan.pxPerMm });
      expect(Math.hypot(direct.x - viaPicture.x, direct.y - viaPicture.y)).toBeLessThan(1e-3);
    }
  });

  it('leaves out what the photo does not reach', () => {
    const plan = elevationPlan(marksOf(tape), photoSize, { widthMm: 9000, heightMm: 2400 })!;
    const right = plan.leftMm + plan.widthMm;
    expect(right).toBeLessThan(9000);
    // The photo's right edge is where x = 4000 px: the picture must reach it somewhere and nowhere leave it far behind.
    expect(Math.max(seenBy(camera, { x: right, y: 0 }).x, seenBy(camera, { x: right, y: 2400 }).x)).toBeGreaterThan(3999);
    expect(elevationPlan(marksOf(tape), photoSize, { widthMm: 3000, heightMm: 2400 })!.photoPxPerMm).toBeGreaterThan(0.8);
  });

  it('is never finer than the photo, nor larger than 30 megapixels', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1500, max: 30_000 }), fc.integer({ min: 1500, max: 6000 }), fc.integer({ min: 1200, max: 12_000 }), (widthMm, heightMm, z) => {
        const far = aCamera({ at: [1500, 1300, z], lookAt: [1700, 1200, 0] });
        const marks = tape.map((mm) => ({ mm, px: seenBy(far, mm) }));
        const plan = elevationPlan(marks, photoSize, { widthMm, heightMm })!;
        expect(plan.widthPx * plan.heightPx).toBeLessThan(30.1e6);
        expect(Math.max(plan.widthPx, plan.heightPx)).toBeLessThanOrEqual(16_000);
        expect(plan.pxPerMm).toBeLessThanOrEqual(plan.photoPxPerMm);
        // On the lens's axis, at distance d and lean θ to the wall: f/d across, f·cos θ/d along, their mean f·√cos θ/d.
        const d = Math.hypot(200, 100, z);
        expect(magnification(plan.wallToPhoto, { x: 1700, y: 1200 })).toBeCloseTo((3000 / d) * Math.sqrt(z / d), 6);
      }),
    );
  });

  it('is none where the photo shows nothing of the wall', () => {
    const elsewhere = marksOf(tape).map((m) => ({ ...m, mm: { x: m.mm.x + 20_000, y: m.mm.y } }));
    expect(elevationPlan(elsewhere, photoSize, { widthMm: 1000, heightMm: 2400 })).toBeNull();
  });
});
