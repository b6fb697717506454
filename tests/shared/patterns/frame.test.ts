import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { distance, placed, type Placement } from '../../../shared/geometry/point.ts';
import { area, contains, signedArea, sidesOf } from '../../../shared/geometry/polygon.ts';
import { distanceToRim } from '../../../shared/geometry/polygon-distance.ts';
import { frameGeometry } from '../../../shared/patterns/frame.ts';
import { bevelFigure, lipFigure, longPointFigure, shortPointFigure } from '../../../shared/patterns/frame-figures.ts';
import { routerPasses } from '../../../shared/patterns/groove.ts';
import { defaultHangers, hangerPosition, placedHangers, placedMembers, placedOutline } from '../../../shared/patterns/hangers.ts';
import { PatternDesign } from '../../../shared/patterns/pattern.ts';
import { degrees } from '../../../shared/units/angle.ts';
import { jtsBufferArea } from '../geometry/jts-reference.ts';
import { aDesign, anyShape, inch } from './shapes.ts';

const place: fc.Arbitrary<Placement> = fc.record({
  xMm: fc.double({ min: -5000, max: 5000, noNaN: true }), yMm: fc.double({ min: -5000, max: 5000, noNaN: true }),
  turnRad: fc.double({ min: -10, max: 10, noNaN: true }), flipped: fc.boolean(),
});
const groove = { widthMm: 7, depthMm: 6.35, clearanceMm: 1, mirrorMm: 3.175, backerMm: 3.175 };

describe('the hexagon of the trade', () => {
  const frame = frameGeometry(aDesign());

  // 30-60-90 triangle: across flats √3 s, corners 2 s; 3/4 in stock takes 2 t tan 30° = 21.997 mm off each member: 150 → 128.003.
  it('has its flats, corners and short points', () => {
    expect(frame.acrossFlatsMm).toBeCloseTo(Math.sqrt(3) * 150, 9);
    expect(frame.flats).toHaveLength(3);
    expect(frame.acrossCornersMm).toBeCloseTo(300, 9);
    for (const member of frame.members) {
      expect(member.longPointMm).toBeCloseTo(150, 9);
      expect(member.shortPointMm).toBeCloseTo(128.003, 3);
      expect([member.start.bevelRad, member.start.fromEdgeRad, member.end.bevelRad].map((rad) => Math.round(degrees(rad)))).toEqual([30, 60, 30]);
    }
    expect(frame.members.map((member) => Math.round(degrees(Math.abs(member.inclinationRad))))).toEqual([0, 60, 120, 180, 120, 60]);
  });

  it('has nine diagonals: three of 2 s, six of √3 s', () => {
    const all = frame.diagonals.map(({ mm }) => mm).sort((a, b) => a - b);
    expect(all).toHaveLength(9);
    for (const mm of all.slice(0, 6)) expect(mm).toBeCloseTo(Math.sqrt(3) * 150, 9);
    for (const mm of all.slice(6)) expect(mm).toBeCloseTo(300, 9);
  });
});

describe('other frames by published ratios', () => {
  const corners = (sides: number) => frameGeometry(aDesign({ shape: { kind: 'regular', sides, sideMm: 200 }, thicknessMm: 10 })).acrossCornersMm / 200;
  it('diagonals: square √2, pentagon the golden ratio 1.618034, octagon 2.613126', () => {
    expect([corners(4), corners(5), corners(8)].map((ratio) => ratio.toFixed(6))).toEqual(['1.414214', '1.618034', '2.613126']);
  });

  it('a half hexagon is bevelled 60° at its long side and 30° above', () => {
    const { members } = frameGeometry(aDesign({ shape: { kind: 'half hexagon', sideMm: 200 } }));
    expect([members[0]!, members[2]!].map(({ start, end }) => [start, end].map(({ bevelRad }) => Math.round(degrees(bevelRad))))).toEqual([[60, 60], [30, 30]]);
    // Long side 400 − 2 t tan 60° = 400 − 65.991.
    expect(members[0]!.shortPointMm).toBeCloseTo(334.009, 3);
  });

  it('a member without inner face is told, not hidden', () => {
    const thick = frameGeometry(aDesign({ shape: { kind: 'trapezoid', baseMm: 300, topMm: 20, heightMm: 250 } }));
    expect([thick.buildable, thick.members[2]!.shortPointMm < 0, thick.opening.length]).toEqual([false, true, 3]);
    expect(frameGeometry(aDesign({ shape: { kind: 'regular', sides: 3, sideMm: 60 }, thicknessMm: 30 })).opening).toEqual([]);
  });
});

describe('every frame that can be built', () => {
  it('has bevels that sum to 180°, members that close outside and inside, and an opening agreeing with JTS', () => {
    fc.assert(
      fc.property(anyShape, fc.double({ min: 5, max: 25, noNaN: true }), (shape, thicknessMm) => {
        const frame = frameGeometry(aDesign({ shape, thicknessMm }));
        fc.pre(frame.buildable);
        expect(frame.corners.reduce((sum, { bevelRad }) => sum + bevelRad, 0)).toBeCloseTo(Math.PI, 9);
        for (const length of ['longPointMm', 'shortPointMm'] as const) {
          // Walk along the members, turning by both bevels at each joint: the last end must meet the first.
          let [x, y, heading] = [0, 0, 0];
          for (const member of frame.members) {
            x += member[length] * Math.cos(heading);
            y += member[length] * Math.sin(heading);
            heading += 2 * member.end.bevelRad;
          }
          expect(Math.hypot(x, y)).toBeLessThan(1e-6);
        }
        expect(frame.openingAreaMm2).toBeCloseTo(jtsBufferArea(frame.outline, -thicknessMm), 3);
        sidesOf(frame.opening).forEach(({ from, to }) => expect(frame.members.some(({ shortPointMm }) => Math.abs(shortPointMm - distance(from, to)) < 1e-6)).toBe(true));
        for (const member of frame.members) expect(distance(member.innerFrom, member.innerTo)).toBeCloseTo(member.shortPointMm, 6);
      }),
    );
  });

  it('is changed by turning, flipping or moving in nothing but its place', () => {
    fc.assert(
      fc.property(anyShape, place, (shape, at) => {
        const design = aDesign({ shape, thicknessMm: 8 });
        const still = frameGeometry(design).members;
        const there = placedMembers(at, design);
        there.forEach((member, i) => {
          expect(member.index).toBe(i);
          expect(member.longPointMm).toBeCloseTo(still[i]!.longPointMm, 6);
          expect(member.shortPointMm).toBeCloseTo(still[i]!.shortPointMm, 6);
          const [ours, theirs] = at.flipped ? [member.end, member.start] : [member.start, member.end];
          expect(ours.bevelRad).toBeCloseTo(still[i]!.start.bevelRad, 9);
          expect(theirs.bevelRad).toBeCloseTo(still[i]!.end.bevelRad, 9);
          const middle = (m: typeof member) => ({ x: (m.outerFrom.x + m.outerTo.x) / 2, y: (m.outerFrom.y + m.outerTo.y) / 2 });
          expect(distance(middle(member), placed(middle(still[i]!), at))).toBeLessThan(1e-6);
        });
        expect(signedArea(placedOutline(at, design))).toBeGreaterThan(0);
      }),
    );
  });
});

describe('the groove and its panel', () => {
  it('of 7 mm in 3/4 in stock leaves a lip of 12.05 mm, and the panel grows from the opening by 6 mm a side', () => {
    const frame = frameGeometry(aDesign({ groove }));
    expect(frame.groove!.lipMm).toBeCloseTo(12.05, 9);
    expect(frame.groove!.shareOfThickness).toBeCloseTo(7 / 19.05, 9);
    expect(frame.groove!.restMm).toBe(6);
    // Two sheets of 1/8 in fill 1/4 in exactly.
    expect(frame.groove!.spareDepthMm).toBeCloseTo(0, 9);
    // Hexagon with apothem r has area 2√3 r² (table: n r² tan(π/n)); the panel's r is the opening's + 7 − 1.
    const r = Math.sqrt(3) * 75 - 19.05 + 6;
    expect(frame.groove!.panelAreaMm2).toBeCloseTo(2 * Math.sqrt(3) * r * r, 4);
    expect(frame.groove!.volumeMm3).toBeCloseTo(2 * Math.sqrt(3) * ((r + 1) ** 2 - (r - 6) ** 2) * 6.35, 3);
    expect(area(frame.groove!.wall)).toBeGreaterThan(frame.groove!.panelAreaMm2);
  });

  it('is routed in equal passes none wider than 1/8 in', () => {
    expect(routerPasses(inch / 4)).toMatchObject({ count: 2, eachMm: inch / 8 });
    expect(routerPasses(7)).toMatchObject({ count: 3, eachMm: 7 / 3 });
    expect(routerPasses(2).count).toBe(1);
  });
});

describe('hangers', () => {
  it('are placed along a member, in from its outer face', () => {
    // Top of the hexagon: along its middle to the left is positive; the outer face is 75 √3 = 129.904 above the centre.
    const at = hangerPosition(aDesign(), { member: 3, alongMm: 40, insetMm: 6 });
    expect([at.x, at.y].map((v) => v.toFixed(3))).toEqual(['-40.000', '123.904']);
    expect(() => hangerPosition(aDesign(), { member: 6, alongMm: 0, insetMm: 0 })).toThrow('member');
  });

  it('keep their distances and stay on their slide wherever the frame is put', () => {
    const design = aDesign({ hangers: defaultHangers(aDesign()) });
    fc.assert(
      fc.property(place, (at) => {
        const [a, b] = placedHangers(at, design);
        expect(distance(a!, b!)).toBeCloseTo(distance(hangerPosition(design, design.hangers[0]!), hangerPosition(design, design.hangers[1]!)), 6);
        for (const { slide, ...hanger } of [a!, b!]) {
          expect(distance(slide.from, hanger) + distance(hanger, slide.to)).toBeCloseTo(distance(slide.from, slide.to), 6);
          expect(distanceToRim(placedOutline(at, design), hanger)).toBeCloseTo(19.05 / 2, 6);
        }
      }),
    );
  });

  it('slid in their frame run along their member, whatever its turn and flip, and no farther than their allowance', () => {
    const design = aDesign({ hangers: defaultHangers(aDesign()) });
    const { id, allowanceMm: [low, high] } = design.hangers[0]!;
    fc.assert(
      fc.property(place, fc.double({ min: -500, max: 500, noNaN: true }), (at, slide) => {
        const [as, other] = placedHangers(at, design);
        const [now, still] = placedHangers({ ...at, hangerSlides: { [id]: slide } }, design);
        const went = Math.min(Math.max(slide, low), high);
        expect(distance(as!, now!)).toBeCloseTo(Math.abs(went), 6);
        expect(distance(now!, now!.slide.from)).toBeCloseTo(went - low, 6);
        expect(still).toEqual(other);
        // The same way on the wall as on the pattern: a plain slide of the pattern's own hanger ends at the same place.
        const moved = { ...design, hangers: design.hangers.map((h) => (h.id === id ? { ...h, alongMm: h.alongMm + went } : h)) };
        expect(distance(placedHangers(at, moved)[0]!, now!)).toBeLessThan(1e-9);
      }),
    );
  });

  it('by default are two on the upper members, in wood, side by side, their middle above the centre, whatever the shape', () => {
    fc.assert(
      fc.property(anyShape, (shape) => {
        const form = aDesign({ shape, thicknessMm: 12 });
        const frame = frameGeometry(form);
        fc.pre(frame.buildable && frame.members.every(({ shortPointMm }) => shortPointMm > 60));
        const design = { ...form, hangers: defaultHangers(form) };
        expect(PatternDesign.safeParse(design).success).toBe(true);
        const hung = placedHangers({ xMm: 0, yMm: 0, turnRad: 0, flipped: false }, design);
        const [left, right] = hung;
        expect(left!.x).toBeLessThan(right!.x);
        for (const { slide, ...hanger } of hung) {
          for (const end of [slide.from, slide.to, hanger]) {
            expect(contains(frame.outline, end) && !contains(frame.opening, end)).toBe(true);
          }
        }
        expect(left!.y + right!.y).toBeGreaterThan(0);
      }),
    );
  });
});

describe('figures of a frame', () => {
  it('show what went in', () => {
    const frame = frameGeometry(aDesign({ groove }));
    expect(degrees(bevelFigure(frame, 2).value)).toBeCloseTo(30, 9);
    expect(longPointFigure(frame, 0).value).toBeCloseTo(150, 9);
    const short = shortPointFigure(frame, 0);
    const [long, t, b1, b2] = short.inputs.map(({ value }) => value);
    expect(long! - t! * (Math.tan(b1!) + Math.tan(b2!))).toBeCloseTo(short.value, 9);
    expect(lipFigure(frame)!.value).toBeCloseTo(12.05, 9);
    expect(lipFigure(frameGeometry(aDesign()))).toBeNull();
  });
});
