import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { overlapDepth } from '../../../shared/geometry/polygon-distance.ts';
import { placedAll, type Placement, type Point } from '../../../shared/geometry/polygon.ts';
import { edgeField, strongestSnap } from '../../../shared/layouts/snap.ts';
import type { SnapAsk } from '../../../shared/layouts/snap.ts';
import { nextStepRad, plainTurnRad, turnStepRad } from '../../../shared/layouts/turn.ts';

const placed = (outline: Point[], at: Omit<Placement, 'flipped'>) => placedAll(outline, { ...at, flipped: false });

/** Corners of a regular outline about its centroid, lowest side level, counter-clockwise. */
function regular(sides: number, side: number): Point[] {
  const radius = side / (2 * Math.sin(Math.PI / sides));
  return Array.from({ length: sides }, (_, i) => {
    const angle = -Math.PI / 2 - Math.PI / sides + (2 * Math.PI * i) / sides;
    return { x: radius * Math.cos(angle), y: radius * Math.sin(angle) };
  });
}

const rectangle = (w: number, h: number): Point[] => [{ x: -w / 2, y: -h / 2 }, { x: w / 2, y: -h / 2 }, { x: w / 2, y: h / 2 }, { x: -w / 2, y: h / 2 }];
const side = (outline: Point[], i: number) => [outline[i]!, outline[(i + 1) % outline.length]!] as const;
const ask = (over: Partial<Omit<SnapAsk, 'placement'>> & { outline: Point[]; placement: Omit<Placement, 'flipped'> }): SnapAsk => ({
  revealMm: 3, reachMm: 40, maxTurnRad: 0.35, ...over, placement: { ...over.placement, flipped: false },
});

const anOutline = fc.oneof(
  fc.tuple(fc.integer({ min: 3, max: 12 }), fc.integer({ min: 60, max: 400 })).map(([n, s]) => regular(n, s)),
  fc.tuple(fc.integer({ min: 60, max: 700 }), fc.integer({ min: 60, max: 700 })).map(([w, h]) => rectangle(w, h)),
);
const aPlacement = fc.record({
  xMm: fc.double({ min: 0, max: 2000, noNaN: true }),
  yMm: fc.double({ min: 0, max: 2000, noNaN: true }),
  turnRad: fc.double({ min: -7, max: 7, noNaN: true }),
});

describe('a snap', () => {
  it('leaves shared edges parallel within 1e-6 rad and at the reveal within 1e-6 mm, no frame over another, in reach', () => {
    let taken = 0;
    fc.assert(
      fc.property(
        fc.array(fc.tuple(anOutline, aPlacement), { minLength: 1, maxLength: 3 }),
        anOutline,
        fc.record({ from: fc.double({ min: 0, max: 6.3, noNaN: true }), share: fc.double({ min: 0.7, max: 1.2, noNaN: true }), turnRad: fc.double({ min: -7, max: 7, noNaN: true }) }),
        fc.double({ min: 0, max: 30, noNaN: true }),
        fc.constantFrom(0, 0.35, Math.PI),
        fc.boolean(),
        (others, outline, beside, revealMm, maxTurnRad, flipped) => {
          // Held beside the first frame, more or less at touching distance.
          const [first, at] = others[0]!;
          const apart = beside.share * (Math.hypot(first[0]!.x, first[0]!.y) + Math.hypot(outline[0]!.x, outline[0]!.y));
          const held = { xMm: at.xMm + apart * Math.cos(beside.from), yMm: at.yMm + apart * Math.sin(beside.from), turnRad: beside.turnRad };
          const neighbours = others.map(([o, p], i) => ({ frameId: `f${i}`, outline: placed(o, p) }));
          const snap = strongestSnap(edgeField(neighbours), { outline, placement: { ...held, flipped }, revealMm, reachMm: 250, maxTurnRad });
          if (!snap) return;
          taken++;
          const now = placedAll(outline, snap.placement);
          const theirs = neighbours.find((n) => n.frameId === snap.frameId)!.outline;
          const [p, q] = side(now, snap.edge);
          const [a, b] = side(theirs, snap.neighbourEdge);
          const along = Math.atan2(b.y - a.y, b.x - a.x);
          expect(Math.abs(plainTurnRad(Math.atan2(p.y - q.y, p.x - q.x) - along))).toBeLessThan(1e-6);
          for (const end of [p, q]) {
            const gap = (end.x - a.x) * Math.sin(along) - (end.y - a.y) * Math.cos(along);
            expect(Math.abs(gap - revealMm)).toBeLessThan(1e-6);
          }
          for (const n of neighbours) expect(overlapDepth(now, n.outline)).toBeLessThan(1e-5);
          expect(Math.hypot(snap.placement.xMm - held.xMm, snap.placement.yMm - held.yMm)).toBeCloseTo(snap.distanceMm, 6);
          expect(snap.distanceMm).toBeLessThanOrEqual(250);
          expect(Math.abs(snap.turnedRad)).toBeLessThanOrEqual(Math.max(maxTurnRad, 1e-9));
        },
      ),
      { numRuns: 400 },
    );
    // The check above means nothing unless snaps were taken.
    expect(taken).toBeGreaterThan(80);
  });

  const hexagon = regular(6, 200);
  const across = 200 * Math.sqrt(3);

  it('puts regular hexagons corner to corner at across flats (s√3, plane geometry) plus the reveal', () => {
    const field = edgeField([{ frameId: 'a', outline: placed(hexagon, { xMm: 1000, yMm: 1000, turnRad: 0 }) }]);
    const snap = strongestSnap(field, ask({ outline: hexagon, placement: { xMm: 1012, yMm: 1000 + across + 11, turnRad: 0.1 }, revealMm: 6 }))!;
    expect(snap.fit).toBe('corner');
    expect(snap.placement.xMm).toBeCloseTo(1000, 9);
    expect(snap.placement.yMm).toBeCloseTo(1000 + across + 6, 9);
    expect(snap.placement.turnRad).toBeCloseTo(0, 9);
    expect(snap.guide.from.y).toBeCloseTo(1000 + across / 2 + 3, 9);
    expect(Math.abs(snap.guide.to.x - snap.guide.from.x)).toBeCloseTo(200, 9);
  });

  it('settles a hexagon into the notch between two, at the reveal from both', () => {
    const pitch = across + 6;
    const left = placed(hexagon, { xMm: 1000, yMm: 1000, turnRad: 0 });
    const upper = placed(hexagon, { xMm: 1000, yMm: 1000 + pitch, turnRad: 0 });
    const snap = strongestSnap(edgeField([{ frameId: 'a', outline: left }, { frameId: 'b', outline: upper }]), ask({
      outline: hexagon, revealMm: 6, placement: { xMm: 1000 + pitch * Math.cos(Math.PI / 6) + 9, yMm: 1000 + pitch / 2 - 14, turnRad: 0 },
    }))!;
    // Triangular lattice: the third centre makes an equilateral triangle with the other two.
    expect(snap.placement.xMm).toBeCloseTo(1000 + (pitch * Math.sqrt(3)) / 2, 9);
    expect(snap.placement.yMm).toBeCloseTo(1000 + pitch / 2, 9);
  });

  it('slides a narrow frame along a wide one until a second frame is met at the reveal', () => {
    const shelf = placed(rectangle(1000, 100), { xMm: 500, yMm: 50, turnRad: 0 });
    const post = placed(rectangle(100, 300), { xMm: 500, yMm: 253, turnRad: 0 });
    const snap = strongestSnap(edgeField([{ frameId: 'shelf', outline: shelf }, { frameId: 'post', outline: post }]), ask({
      outline: rectangle(120, 120), placement: { xMm: 622, yMm: 170, turnRad: 0 },
    }))!;
    expect(snap.placement.xMm).toBeCloseTo(550 + 3 + 60, 9);
    expect(snap.placement.yMm).toBeCloseTo(100 + 3 + 60, 9);
  });

  it('keeps the place along the edge where the hand holds it far from any corner', () => {
    const shelf = placed(rectangle(1000, 100), { xMm: 500, yMm: 50, turnRad: 0 });
    const snap = strongestSnap(edgeField([{ frameId: 'shelf', outline: shelf }]), ask({ outline: rectangle(120, 120), placement: { xMm: 500, yMm: 180, turnRad: 0 } }))!;
    expect(snap.fit).toBe('along');
    expect(snap.placement).toEqual({ xMm: 500, yMm: 163, turnRad: 0, flipped: false });
  });

  it('is not offered where nothing is in reach, where edges are not parallel and no turn is allowed, or on an empty wall', () => {
    const one = edgeField([{ frameId: 'a', outline: placed(hexagon, { xMm: 0, yMm: 0, turnRad: 0 }) }]);
    expect(strongestSnap(one, ask({ outline: hexagon, placement: { xMm: 0, yMm: 900, turnRad: 0 } }))).toBeNull();
    expect(strongestSnap(one, ask({ outline: hexagon, placement: { xMm: 0, yMm: across + 5, turnRad: 0.2 }, maxTurnRad: 0 }))).toBeNull();
    expect(strongestSnap(edgeField([]), ask({ outline: hexagon, placement: { xMm: 0, yMm: 0, turnRad: 0 } }))).toBeNull();
  });

  it('never falls on the middle of another frame, even when held right over one', () => {
    const field = edgeField([
      { frameId: 'a', outline: placed(hexagon, { xMm: 0, yMm: 0, turnRad: 0 }) },
      { frameId: 'b', outline: placed(hexagon, { xMm: 0, yMm: across + 3, turnRad: 0 }) },
    ]);
    const snap = strongestSnap(field, ask({ outline: hexagon, placement: { xMm: 4, yMm: across, turnRad: 0 } }));
    expect(snap).toBeNull();
  });
});

describe('a turn', () => {
  it('goes by half the angle between corners: 30° for a hexagon, 45° for a square', () => {
    expect((turnStepRad(6) * 180) / Math.PI).toBeCloseTo(30, 12);
    expect((turnStepRad(4) * 180) / Math.PI).toBeCloseTo(45, 12);
  });
  it('off the steps goes to the next step that way', () => {
    const degrees = (rad: number) => (rad * 180) / Math.PI;
    expect(degrees(nextStepRad(0.1, 6, 1))).toBeCloseTo(30, 9);
    expect(degrees(nextStepRad(0.1, 6, -1))).toBeCloseTo(0, 9);
    expect(degrees(nextStepRad(Math.PI / 6, 6, 1))).toBeCloseTo(60, 9);
    expect(degrees(nextStepRad(Math.PI / 6, 6, -1))).toBeCloseTo(0, 9);
    expect(degrees(nextStepRad(Math.PI, 6, 1))).toBeCloseTo(-150, 9);
  });
  it('is told between −180° and 180°', () => {
    expect(plainTurnRad(3 * Math.PI)).toBeCloseTo(Math.PI, 12);
    expect(plainTurnRad(-Math.PI / 2 - 4 * Math.PI)).toBeCloseTo(-Math.PI / 2, 12);
    expect(Object.is(plainTurnRad(-2 * Math.PI), 0)).toBe(true);
  });
});
