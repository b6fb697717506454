import { describe, expect, it } from 'vitest';
import { arrange, ranked } from '../../../shared/findings/arrange/arrange.ts';
import { arrangeKinds, type ArrangeAsk, type ArrangeKind } from '../../../shared/findings/arrange/ask.ts';
import type { Candidate } from '../../../shared/findings/arrange/judge.ts';
import { takeEdits } from '../../../shared/findings/arrange/take.ts';
import { createLedger } from '../../../shared/findings/ledger.ts';
import { placeFrame, type PlacedFrame } from '../../../shared/findings/placed-frame.ts';
import type { Scene } from '../../../shared/findings/scene.ts';
import { allowedShifts } from '../../../shared/hanging/allowed-shifts.ts';
import type { SeekInput } from '../../../shared/hanging/seek-studs.ts';
import { applyEdits, invert } from '../../../shared/layouts/edits.ts';
import type { LayoutPattern } from '../../../shared/layouts/layout.ts';
import { aFrame, aStud } from '../../support/builders.ts';
import { anObstruction, aPattern, aScene, patternId } from '../../support/a-scene.ts';
import { jtsDistance, jtsOverlap } from '../geometry/jts-reference.ts';
import { scan, tellShift } from '../hanging/scan-shifts.ts';

const smallId = '00000000-0000-4000-8000-000000000006';
const small: LayoutPattern = { ...aPattern({ shape: { kind: 'regular', sides: 6, sideMm: 120 } }), id: smallId, name: 'Small comb' };

/** A wall of 3 × 2.4 m, studs at 16 in on centre (a usual framing), 20 frames of two patterns. */
function aTask(kind: ArrangeKind, change: Partial<ArrangeAsk> & { scene?: Scene } = {}): ArrangeAsk {
  const studs = [90, 496.4, 902.8, 1309.2, 1715.6, 2122, 2528.4, 2934.8].map((x, i) => aStud(x, { id: `s${i}` }));
  return {
    scene: aScene({ frames: [], patterns: [aPattern(), small], wall: { widthMm: 3000, heightMm: 2400, studs } }),
    counts: [{ patternId, count: 12 }, { patternId: smallId, count: 8 }],
    kind, centre: { x: 1500, y: 1486 }, area: kind === 'fill' ? { left: 200, bottom: 500, right: 2800, top: 2300 } : null, mayTurn: true, seed: 1, ...change,
  };
}

const all = (ask: ArrangeAsk): Candidate[] => ranked([...arrange(ask, () => false)].flatMap((step) => step.candidate ?? []));
const known = new Map<ArrangeKind, Candidate[]>();
/** The candidates of the plain task, tried once for all that look at them. */
function ofTask(kind: ArrangeKind): Candidate[] {
  if (!known.has(kind)) known.set(kind, all(aTask(kind)));
  return known.get(kind)!;
}

function placedOf(candidate: Candidate, { scene }: ArrangeAsk): PlacedFrame[] {
  return candidate.frames.map((f) => placeFrame(f, scene.patterns.find((p) => p.id === f.patternId)!));
}

/** How hangers reach studs, from the rules and not from the seeking. */
function seekInput(placed: readonly PlacedFrame[], { scene }: ArrangeAsk): SeekInput {
  const { wall, book } = scene;
  return {
    hangers: placed.flatMap((p) => p.hangers.map((h, i) => {
      const screw = book.screws.find((s) => s.id === p.pattern.design.hangers[i]!.wallScrewId)!;
      const ends = [h.slide.from.x - h.x, h.slide.to.x - h.x];
      return { id: `${p.frame.id}/${h.id}`, frameId: p.frame.id, xMm: h.x, slide: [Math.min(...ends), Math.max(...ends)] as [number, number], edgeMm: 1.5 * screw.diameterMm };
    })),
    zones: wall.studs.map((s) => ({ studId: s.id, xMm: s.xMm, halfMm: s.widthMm / 2 - s.uncertaintyMm })),
    allowed: allowedShifts(placed.map((p) => p.outline.map(({ x, y }) => [x, y] as const)), wall.widthMm, wall.obstructions),
  };
}

describe('arranging for the maker', () => {
  it.each(arrangeKinds)('%s: puts 20 frames on a wall of 3 × 2.4 m, none in another, none off the wall, the reveal between them', (kind) => {
    const ask = aTask(kind);
    const found = ofTask(kind);
    expect(found.length).toBeGreaterThanOrEqual(4);
    for (const candidate of found.slice(0, 8)) {
      const placed = placedOf(candidate, ask);
      placed.forEach((a, i) => {
        for (const { x, y } of a.outline) {
          expect(Math.min(x, y, 3000 - x, 2400 - y)).toBeGreaterThan(-1e-3);
          if (ask.area) expect(Math.min(x - ask.area.left, y - ask.area.bottom, ask.area.right - x, ask.area.top - y)).toBeGreaterThan(-1e-3);
        }
        for (const b of placed.slice(i + 1)) {
          expect(jtsOverlap(a.outline, b.outline)).toBeLessThan(1e-3);
          expect(jtsDistance(a.outline, b.outline)).toBeGreaterThan(6 - 2e-3);
        }
      });
    }
    expect(found[0]!.frames).toHaveLength(20);
  });

  it.each(arrangeKinds.filter((k) => k !== 'fill'))('%s: no uniform shift of the same arrangement holds more by studs', (kind) => {
    const ask = aTask(kind);
    for (const candidate of ofTask(kind).slice(0, 3)) {
      const placed = placedOf(candidate, ask);
      const input = seekInput(placed, ask);
      const here = tellShift(input, 0);
      const best = scan(input)!;
      expect([here.framesHeld, here.hangersInStuds]).toEqual([candidate.studs!.framesHeld, candidate.studs!.hangersInStuds]);
      expect(best.framesHeld - here.framesHeld || best.hangersInStuds - here.hangersInStuds).toBeLessThanOrEqual(0);
    }
  });

  it('gives the same for the same seed, and other drifts for another', () => {
    const keys = (seed: number) => all(aTask('drift', { seed })).map((c) => c.key);
    expect(keys(5)).toEqual(keys(5));
    expect(keys(6)).not.toEqual(keys(5));
  });

  it.each(arrangeKinds)('%s: keeps off a door, its clearance, and a frame that is locked, and turns none where none may be turned', (kind) => {
    const locked = aFrame(patternId, { id: 'locked', locked: true, xMm: 2500, yMm: 1800 });
    const base = aTask(kind).scene;
    const door = anObstruction('opening', 600, 0, 700, 2000, 50);
    const ask = aTask(kind, { mayTurn: false, counts: [{ patternId, count: 6 }], area: kind === 'fill' ? { left: 0, bottom: 0, right: 3000, top: 2400 } : null, scene: { ...base, frames: [locked], wall: { ...base.wall, obstructions: [door] } } });
    const found = all(ask);
    expect(found.length).toBeGreaterThan(0);
    const ring = door.outlineMm.map(([x, y]) => ({ x, y }));
    const hung = placeFrame(locked, aPattern());
    for (const candidate of found) {
      for (const p of placedOf(candidate, ask)) {
        expect(p.frame.turnRad).toBe(0);
        expect(jtsDistance(p.outline, ring)).toBeGreaterThan(50 - 2e-3);
        expect(jtsDistance(p.outline, hung.outline)).toBeGreaterThan(6 - 2e-3);
      }
    }
  });

  it('nests a comb of one pattern in rows: every neighbour at the reveal', () => {
    // Regular hexagons with their flat sides facing, one lattice throughout: each inner frame has six neighbours at the reveal.
    const ask = aTask('rows', { counts: [{ patternId, count: 7 }] });
    const best = all(ask).find((c) => c.how.includes('comb') && c.size.widthMm < 1150 && c.size.heightMm < 1150)!;
    const placed = placedOf(best, ask);
    const gaps = placed.map((a) => placed.filter((b) => b !== a && Math.abs(jtsDistance(a.outline, b.outline) - 6) < 0.01).length);
    expect(gaps.sort()).toEqual([3, 3, 3, 3, 3, 3, 6]);
  });

  it('is put on the wall by one set of edits that can be taken back, labels going on from those that stay', () => {
    const ask = aTask('drift');
    const standing = [aFrame(patternId, { id: 'a', label: '3' }), aFrame(patternId, { id: 'b', label: '7', locked: true })];
    const [best] = ofTask('drift');
    const ids = best!.frames.map((_, i) => `id ${i}`);
    for (const [inPlace, stay] of [[false, 2], [true, 1]] as const) {
      const edits = takeEdits(best!, standing, ids, inPlace);
      const done = applyEdits(standing, ask.scene.sheet, edits);
      expect(done.conflicts).toEqual([]);
      expect(done.frames).toHaveLength(20 + stay);
      expect(new Set(done.frames.map((f) => f.label)).size).toBe(20 + stay);
      expect(done.frames.some((f) => f.label === '27')).toBe(true);
      expect(applyEdits(done.frames, done.sheet, invert(edits)).frames).toEqual(standing);
    }
  });

  it('tells findings as the ledger does, and stops when it is late', () => {
    const ask = aTask('ring');
    const [best] = ofTask('ring');
    const findings = createLedger()({ ...ask.scene, frames: best!.frames }).findings;
    expect(findings.filter((f) => f.weight === 'stop')).toHaveLength(best!.stops);
    expect(findings.filter((f) => f.weight === 'caution')).toHaveLength(best!.cautions);
    let asked = 0;
    expect([...arrange(ask, () => ++asked > 2)]).toHaveLength(2);
  });
});
