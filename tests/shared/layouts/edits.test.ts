import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { applyEdits, compose, editsBetween, framesInOrder, invert, rebase, restate, sameFrame } from '../../../shared/layouts/edits.ts';
import type { Edit, Frame, LayoutSheet } from '../../../shared/layouts/layout.ts';
import { nextLabel, nextLetter } from '../../../shared/layouts/naming.ts';

const ids = ['f1', 'f2', 'f3', 'f4', 'f5'];
const mm = fc.integer({ min: -4000, max: 4000 }).map((n) => (n === 0 ? 0 : n / 7));
const sheet: LayoutSheet = { name: 'Over the settee', revealMm: 3 };

const state = (id: string): fc.Arbitrary<Frame> =>
  fc.record({
    id: fc.constant(id),
    patternId: fc.constantFrom('p1', 'p2'),
    xMm: mm,
    yMm: mm,
    turnRad: fc.constantFrom(0, Math.PI / 6, -1.25),
    flipped: fc.boolean(),
    locked: fc.boolean(),
    label: fc.constantFrom('1', '2', 'top'),
    contentsKg: fc.option(fc.constantFrom(2, 7.5)),
    hungGroup: fc.option(fc.constantFrom('left')),
  });

const start = fc.subarray(ids).chain((some) => fc.tuple(...some.map(state))).map((frames) => framesInOrder(frames));

/** What a person does at the bench: each step sets one frame to a state, or takes it off, or changes the sheet. */
const steps = fc.array(
  fc.oneof(
    { weight: 5, arbitrary: fc.constantFrom(...ids).chain((id) => fc.record({ id: fc.constant(id), to: fc.option(state(id)) })) },
    { weight: 1, arbitrary: fc.record({ name: fc.constantFrom('Over the settee', 'Stair'), revealMm: fc.constantFrom(0, 3, 6.35) }) },
  ),
  { maxLength: 25 },
);

type Step = { id: string; to: Frame | null } | LayoutSheet;

function work(frames: Frame[], todo: Step[]) {
  let bench = { frames, sheet };
  const done: Edit[] = [];
  for (const step of todo) {
    const edit: Edit =
      'id' in step
        ? { kind: 'frame', frameId: step.id, before: bench.frames.find((f) => f.id === step.id) ?? null, after: step.to }
        : { kind: 'sheet', before: bench.sheet, after: step };
    const next = applyEdits(bench.frames, bench.sheet, [edit]);
    expect(next.conflicts).toEqual([]);
    bench = next;
    done.push(edit);
  }
  return { bench: { frames: bench.frames, sheet: bench.sheet }, done };
}

describe('edits of a layout', () => {
  it('taken back, whatever they were, leave exactly what was there before', () => {
    fc.assert(
      fc.property(start, steps, (frames, todo) => {
        const { bench, done } = work(frames, todo);
        const back = applyEdits(bench.frames, bench.sheet, invert(done));
        expect(back).toEqual({ frames, sheet, conflicts: [] });
      }),
    );
  });

  it('shortened, do the same, with no frame named twice, and can be taken back too', () => {
    fc.assert(
      fc.property(start, steps, (frames, todo) => {
        const { bench, done } = work(frames, todo);
        const short = compose(done);
        const named = short.map((e) => (e.kind === 'frame' ? e.frameId : 'sheet'));
        expect(new Set(named).size).toBe(named.length);
        expect(applyEdits(frames, sheet, short)).toEqual({ ...bench, conflicts: [] });
        expect(applyEdits(bench.frames, bench.sheet, invert(short))).toEqual({ frames, sheet, conflicts: [] });
      }),
    );
  });

  it('can be found again from the two benches they lead between', () => {
    fc.assert(
      fc.property(start, steps, (frames, todo) => {
        const { bench } = work(frames, todo);
        const edits = editsBetween({ frames, sheet }, bench);
        expect(applyEdits(frames, sheet, edits)).toEqual({ ...bench, conflicts: [] });
      }),
    );
  });

  it('of two people never overwrite each other: what one saved stands unless the other, asked, chooses own', () => {
    fc.assert(
      fc.property(start, steps, steps, (frames, anas, bos) => {
        const ana = work(frames, anas);
        const bo = work(frames, bos);
        const { kept, conflicts } = rebase(bo.done, ana.bench);
        const merged = applyEdits(ana.bench.frames, ana.bench.sheet, kept);
        expect(merged.conflicts).toEqual([]);
        const touchedByAna = new Set(compose(ana.done).map((e) => (e.kind === 'frame' ? e.frameId : 'sheet')));
        for (const id of ids) {
          const anas_ = ana.bench.frames.find((f) => f.id === id);
          if (touchedByAna.has(id)) expect(merged.frames.find((f) => f.id === id)).toEqual(anas_);
        }
        const chosen = applyEdits(merged.frames, merged.sheet, restate(conflicts));
        expect(chosen.conflicts).toEqual([]);
        for (const edit of compose(bo.done)) {
          if (edit.kind === 'frame') expect(chosen.frames.find((f) => f.id === edit.frameId) ?? null).toEqual(edit.after);
        }
      }),
    );
  });

  const frame: Frame = { id: 'f1', patternId: 'p1', xMm: 100, yMm: 200, turnRad: 0, flipped: false, locked: false, label: '1', contentsKg: null, hungGroup: null };

  it.each<[string, Frame[], Edit]>([
    ['a move of a frame that someone else moved', [{ ...frame, xMm: 101 }], { kind: 'frame', frameId: 'f1', before: frame, after: { ...frame, xMm: 150 } }],
    ['a move of a frame that is gone', [], { kind: 'frame', frameId: 'f1', before: frame, after: { ...frame, xMm: 150 } }],
    ['a placing where a frame of that id stands', [frame], { kind: 'frame', frameId: 'f1', before: null, after: { ...frame, xMm: 150 } }],
    ['an edit that speaks of one frame and carries another', [frame], { kind: 'frame', frameId: 'f1', before: frame, after: { ...frame, id: 'f2' } }],
    ['a hanger slid in a frame whose hanger someone else slid', [{ ...frame, hangerSlides: { h1: 4 } }], { kind: 'frame', frameId: 'f1', before: frame, after: { ...frame, hangerSlides: { h1: 6 } } }],
    ['a reveal changed from one that no longer stands', [frame], { kind: 'sheet', before: { ...sheet, revealMm: 9 }, after: sheet }],
  ])('refuse %s, and say so', (_, frames, edit) => {
    expect(applyEdits(frames, sheet, [edit])).toEqual({ frames, sheet, conflicts: [edit] });
  });
});

describe('a slide of nothing', () => {
  it('is no slide at all', () => {
    const frame: Frame = { id: 'f1', patternId: 'p1', xMm: 0, yMm: 0, turnRad: 0, flipped: false, locked: false, label: '1', contentsKg: null, hungGroup: null };
    expect(sameFrame(frame, { ...frame, hangerSlides: {} })).toBe(true);
    expect(sameFrame({ ...frame, hangerSlides: { h1: 0, h2: 3 } }, { ...frame, hangerSlides: { h2: 3 } })).toBe(true);
    expect(sameFrame(frame, { ...frame, hangerSlides: { h2: 3 } })).toBe(false);
  });
});

describe('letters and labels', () => {
  it('letter revisions A, B … Z, AA, AZ, BA, ZZ, AAA', () => {
    expect(['A', 'Y', 'Z', 'AA', 'AZ', 'ZZ'].map(nextLetter)).toEqual(['B', 'Z', 'AA', 'AB', 'BA', 'AAA']);
    expect(() => nextLetter('a')).toThrow(/A to Z/);
    expect(() => nextLetter('')).toThrow(/A to Z/);
  });

  it('number the next frame after the highest number in use, whatever words stand beside', () => {
    expect(nextLabel([])).toBe('1');
    expect(nextLabel([{ label: '2' }, { label: '10' }, { label: 'top' }])).toBe('11');
  });
});
