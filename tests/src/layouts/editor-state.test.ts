import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { applyEdits, type Bench } from '../../../shared/layouts/edits.ts';
import type { Edit, Frame, Layout } from '../../../shared/layouts/layout.ts';
import * as operation from '../../../src/features/layouts/editor/operations/operations.ts';
import { reduce, startState, unsavedEdits, type EditorState } from '../../../src/features/layouts/editor/state/editor-state.ts';

const frame = (id: string, xMm = 100): Frame => ({ id, patternId: 'p', xMm, yMm: 500, turnRad: 0, flipped: false, locked: false, label: id, contentsKg: null, hungGroup: null });
const layout = (over: Partial<Layout> = {}): Layout => ({
  id: 'l', jobId: 'j', wallId: 'w', name: 'Over the settee', revealMm: 3, version: 1, frames: [frame('1'), frame('2', 600)], letter: 'A', state: 'draft',
  changedSinceSigned: false, revisions: [], updatedAt: '2026-03-03T14:02:00Z', updatedBy: 'Ana', ...over,
});
const act = (state: EditorState, edits: Edit[], atMs = 0, run?: string) => reduce(state, { kind: 'do', words: 'done', edits, atMs, run });
const x = (state: { bench: Bench }, id: string) => state.bench.frames.find((f) => f.id === id)?.xMm;
/** What the server would hold after taking a draft's edits on its version. */
function savedBy(state: EditorState, who: string): Layout {
  const { frames, sheet, conflicts } = applyEdits(state.stored.bench.frames, state.stored.bench.sheet, unsavedEdits(state));
  expect(conflicts).toEqual([]);
  return layout({ frames, ...sheet, version: state.stored.version + 1, updatedBy: who });
}

describe('undo', () => {
  it('of everything returns the exact start, and redo of everything the exact end', () => {
    const deed = fc.oneof(
      fc.record({ kind: fc.constant('move' as const), by: fc.integer({ min: -50, max: 50 }) }),
      fc.record({ kind: fc.constant('turn' as const), by: fc.constantFrom(0.3, -1.1, Math.PI / 6) }),
      fc.record({ kind: fc.constantFrom('flip' as const, 'remove' as const, 'copy' as const), by: fc.constant(0) }),
    );
    fc.assert(
      fc.property(fc.array(fc.record({ deed, on: fc.nat(5) }), { maxLength: 25 }), (deeds) => {
        const start = startState(layout());
        let state = start;
        let made = 0;
        for (const { deed: { kind, by }, on } of deeds) {
          const { frames, sheet } = state.bench;
          const id = frames[on % Math.max(1, frames.length)]?.id ?? '';
          const edits = {
            move: () => operation.moveBy(frames, [id], by / 3, by),
            turn: () => operation.turnBy(frames, [id], by),
            flip: () => operation.flip(frames, [id]),
            remove: () => operation.remove(frames, [id]),
            copy: () => operation.duplicate(frames, [id], [`n${made++}`], sheet, (f) => [{ x: f.xMm, y: f.yMm }, { x: f.xMm + 10, y: f.yMm }, { x: f.xMm, y: f.yMm + 10 }], 3000),
          }[kind]();
          state = act(state, edits);
        }
        const end = state.bench;
        while (state.undo.length > 0) state = reduce(state, { kind: 'undo' });
        expect(state.bench).toEqual(start.bench);
        while (state.redo.length > 0) state = reduce(state, { kind: 'redo' });
        expect(state.bench).toEqual(end);
      }),
    );
  });

  it('takes a run of nudges back at once, but not one that came after a pause', () => {
    let state = startState(layout());
    for (const at of [0, 300, 600]) state = act(state, operation.moveBy(state.bench.frames, ['1'], 1, 0), at, 'nudge 1');
    state = act(state, operation.moveBy(state.bench.frames, ['1'], 1, 0), 5000, 'nudge 1');
    expect(x(state, '1')).toBe(104);
    state = reduce(state, { kind: 'undo' });
    expect(x(state, '1')).toBe(103);
    state = reduce(state, { kind: 'undo' });
    expect(x(state, '1')).toBe(100);
    expect(state.undo).toEqual([]);
  });

  it('leaves alone what someone else has changed since, and says so', () => {
    let state = act(startState(layout()), operation.moveBy([frame('1')], ['1'], 10, 0));
    state = reduce(state, { kind: 'stored', layout: savedBy(state, 'Ana'), sent: state.bench });
    const bo = savedBy(act(state, operation.moveBy(state.bench.frames, ['1'], 7, 0)), 'Bo');
    state = reduce(reduce(state, { kind: 'stored', layout: bo }), { kind: 'undo' });
    expect(x(state, '1')).toBe(117);
    expect(state.news.words).toMatch(/except 1 that someone else/);
  });
});

describe('saving', () => {
  it('keeps what was done while the answer was on its way', () => {
    const first = act(startState(layout()), operation.moveBy([frame('1')], ['1'], 10, 0));
    const answer = savedBy(first, 'Ana');
    const meanwhile = act(first, operation.moveBy(first.bench.frames, ['1'], 5, 0));
    const state = reduce(meanwhile, { kind: 'stored', layout: answer, sent: first.bench });
    expect(x(state, '1')).toBe(115);
    expect(state.conflicts).toEqual([]);
    expect(unsavedEdits(state)).toHaveLength(1);
  });

  it('met by another save, lays own edits over it where they touch other frames', () => {
    const start = startState(layout());
    const bo = savedBy(act(start, operation.moveBy(start.bench.frames, ['2'], 7, 0)), 'Bo');
    const state = reduce(act(start, operation.moveBy(start.bench.frames, ['1'], 10, 0)), { kind: 'stored', layout: bo });
    expect([x(state, '1'), x(state, '2')]).toEqual([110, 607]);
    expect(state.conflicts).toEqual([]);
    expect(unsavedEdits(state)).toHaveLength(1);
  });

  const both = () => {
    const start = startState(layout());
    const bo = savedBy(act(start, operation.moveBy(start.bench.frames, ['1'], 7, 0)), 'Bo');
    return reduce(act(start, operation.moveBy(start.bench.frames, ['1'], 10, 0)), { kind: 'stored', layout: bo });
  };

  it('met by another save of the same frame, lets that stand and asks', () => {
    const state = both();
    expect(x(state, '1')).toBe(107);
    expect(state.conflicts).toHaveLength(1);
    expect(unsavedEdits(state)).toEqual([]);
    expect(x(reduce(state, { kind: 'settle', choose: 'theirs', atMs: 0 }), '1')).toBe(107);
  });

  it('puts own changes in place when so answered, as a step that can be undone', () => {
    const mine = reduce(both(), { kind: 'settle', choose: 'mine', atMs: 0 });
    expect(x(mine, '1')).toBe(110);
    expect(unsavedEdits(mine)).toHaveLength(1);
    expect(x(reduce(mine, { kind: 'undo' }), '1')).toBe(107);
  });

  it('takes up edits kept from an earlier visit', () => {
    const earlier = act(startState(layout()), operation.moveBy([frame('1')], ['1'], 10, 0));
    expect(x(reduce(startState(layout()), { kind: 'kept', edits: unsavedEdits(earlier) }), '1')).toBe(110);
  });

  it('does not go back to an older answer that comes late', () => {
    const state = startState(layout({ version: 5 }));
    expect(reduce(state, { kind: 'stored', layout: layout({ version: 4, frames: [] }) })).toBe(state);
  });
});

describe('operations', () => {
  it('leave locked frames where they are', () => {
    const locked = { ...frame('1'), locked: true };
    expect(operation.moveBy([locked], ['1'], 5, 5)).toEqual([]);
    expect(operation.turnBy([locked], ['1'], 1)).toEqual([]);
    expect(operation.remove([locked], ['1'])).toEqual([]);
    expect(operation.change([locked], '1', { xMm: 0, label: 'top' })[0]).toMatchObject({ after: { xMm: 100, label: 'top' } });
  });

  it('flip several frames as a mirror would: about their middle, twice is nothing', () => {
    const frames = [{ ...frame('1', 0), turnRad: 0.4 }, frame('2', 300)];
    const flipped = applyEdits(frames, layout(), operation.flip(frames, ['1', '2'])).frames;
    expect(flipped.map((f) => [f.xMm, f.turnRad, f.flipped])).toEqual([[300, -0.4, true], [0, 0, true]]);
    expect(applyEdits(flipped, layout(), operation.flip(flipped, ['1', '2'])).frames).toEqual(frames);
  });

  it('turn several frames about their middle, keeping their distance', () => {
    const frames = [frame('1', 0), frame('2', 300)];
    const turned = applyEdits(frames, layout(), operation.turnBy(frames, ['1', '2'], Math.PI / 2)).frames;
    expect(turned[0]!.xMm).toBeCloseTo(150, 9);
    expect(turned[0]!.yMm).toBeCloseTo(350, 9);
    expect(turned[1]!.yMm).toBeCloseTo(650, 9);
  });
});
