import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { contentsOf, floorMembers } from '../../../shared/patterns/contents.ts';
import { frameGeometry } from '../../../shared/patterns/frame.ts';
import { defaultHangers } from '../../../shared/patterns/hangers.ts';
import { frameMass, massFigure } from '../../../shared/patterns/mass.ts';
import { radians } from '../../../shared/units/angle.ts';
import { jtsArea, jtsCentroid } from '../geometry/jts-reference.ts';
import { aDesign, anyShape, inch } from './shapes.ts';

const still = { xMm: 0, yMm: 0, turnRad: 0, flipped: false, contentsKg: null };

describe('the mass of an empty frame', () => {
  it('is ring × depth × density: a hexagon of 150 mm by the table of regular polygons', () => {
    // A = 2.598076 s² (CRC tables); short points 128.003; walnut at 12 % is 616 kg/m³ (0.55 × 1.12).
    const expected = 2.598076 * (150 ** 2 - 128.003 ** 2) * 100 * 616e-9;
    expect(frameMass(aDesign()).kg).toBeCloseTo(expected, 4);
  });

  it('a square box of four boards weighs what its boards weigh, and its groove is taken off', () => {
    const square = aDesign({ shape: { kind: 'rectangle', widthMm: 300, heightMm: 300 }, thicknessMm: 20 });
    const boards = (300 * 300 - 260 * 260) * 100 * 616e-9;
    expect(frameMass(square).membersKg).toBeCloseTo(boards, 9);
    const groove = { widthMm: 8, depthMm: 7, clearanceMm: 1, mirrorMm: 3, backerMm: 4 };
    const grooved = frameMass({ ...square, groove });
    expect(grooved.membersKg).toBeCloseTo(boards - (276 * 276 - 260 * 260) * 7 * 616e-9, 9);
    // 3 mm glass is 7.5 kg/m² (EN 572-1: 2500 kg/m³); 4 mm birch plywood of 680 kg/m³ is 2.72 kg/m². The panel is 274 mm square.
    expect(grooved.mirrorKg).toBeCloseTo(0.274 ** 2 * 7.5, 9);
    expect(grooved.backerKg).toBeCloseTo(0.274 ** 2 * 2.72, 9);
    expect(grooved.kg).toBeCloseTo(grooved.membersKg + grooved.mirrorKg + grooved.backerKg, 12);
  });

  it('acts at the centre of a symmetric frame, half its depth off the wall; hardware draws it up a little', () => {
    const { centre } = frameMass(aDesign());
    expect([centre.x, centre.y].map(Math.abs).every((v) => v < 1e-9)).toBe(true);
    expect(centre.z).toBe(50);
    const hung = frameMass(aDesign({ hangers: defaultHangers(aDesign()) }), 0.1);
    expect(hung.hardwareKg).toBeCloseTo(0.2, 12);
    expect(hung.centre.y).toBeCloseTo((0.2 * (75 * Math.sqrt(3) - 19.05 / 2)) / hung.kg, 6);
    expect(Math.abs(hung.centre.x)).toBeLessThan(1e-9);
  });

  it('acts at the centre of the ring as JTS finds it, for any shape', () => {
    fc.assert(
      fc.property(anyShape, (shape) => {
        const design = aDesign({ shape, thicknessMm: 10 });
        const { outline, opening, buildable } = frameGeometry(design);
        fc.pre(buildable);
        const [out, hole] = [jtsArea(outline), jtsArea(opening)];
        const [a, b] = [jtsCentroid(outline), jtsCentroid(opening)];
        const { centre } = frameMass(design);
        expect(centre.x).toBeCloseTo((a.x * out - b.x * hole) / (out - hole), 5);
        expect(centre.y).toBeCloseTo((a.y * out - b.y * hole) / (out - hole), 5);
      }),
    );
  });

  it('is explained by figures that sum to it', () => {
    const figure = massFigure(aDesign({ hangers: defaultHangers(aDesign()), groove: { widthMm: 7, depthMm: 7, clearanceMm: 1, mirrorMm: 3, backerMm: 3 } }));
    const parts = figure.inputs.filter(({ unit }) => unit === 'kg').reduce((sum, { value }) => sum + value, 0);
    expect(parts).toBeCloseTo(figure.value, 12);
  });
});

describe('what a frame is to carry', () => {
  it('by default is 15 lb/ft² on its floor: 12 in of inner length by 12 in of depth carry 15 lb', () => {
    // ANSI/KCMA A161.1, section 5.1. A box 13 1/2 in wide of 3/4 in stock is 12 in inside.
    const box = aDesign({ shape: { kind: 'rectangle', widthMm: 13.5 * inch, heightMm: 300 }, depthMm: 12 * inch });
    const { kg, from } = contentsOf(box, still);
    expect([kg.toFixed(4), from]).toEqual([(15 * 0.45359237).toFixed(4), 'default']);
  });

  it('is never silently less than 2.5 kg', () => expect(contentsOf(aDesign(), still).kg).toBe(2.5));

  it('what the frame says wins over its pattern, and that over the rule; nothing may be said too', () => {
    const pattern = aDesign({ contentsKg: 4 });
    expect(contentsOf(pattern, still)).toMatchObject({ kg: 4, from: 'pattern' });
    expect(contentsOf(pattern, { ...still, contentsKg: 7 })).toMatchObject({ kg: 7, from: 'frame' });
    expect(contentsOf(pattern, { ...still, contentsKg: 0 })).toMatchObject({ kg: 0, from: 'frame' });
  });

  it('the floor is what looks up within 35° of level as the frame hangs', () => {
    const floor = (turnDegrees: number, flipped = false) => floorMembers({ ...still, turnRad: radians(turnDegrees), flipped }, aDesign()).map(({ index }) => index);
    expect(floor(0)).toEqual([0]);
    expect(floor(30)).toEqual([0, 5]);
    expect(floor(60)).toEqual([5]);
    expect(floor(180)).toEqual([3]);
    expect(floor(60, true)).toEqual([1]);
    expect(floor(20)).toEqual([0]);
    // A square on its point has no floor: 45° is too steep.
    expect(floorMembers({ ...still, turnRad: radians(45) }, aDesign({ shape: { kind: 'regular', sides: 4, sideMm: 200 } }))).toEqual([]);
  });
});
