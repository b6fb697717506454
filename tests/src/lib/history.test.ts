import { describe, expect, it } from 'vitest';
import { begun, did, redone, undone } from '../../../src/lib/history.ts';

describe('a draft’s history', () => {
  it('takes changes back one by one and makes them again', () => {
    const made = did(did(begun('a'), 'b', { words: 'B', atMs: 0 }), 'c', { words: 'C', atMs: 1 });
    const back = undone(made)!;
    expect([back.history.now, back.words]).toEqual(['b', 'C']);
    const start = undone(back.history)!;
    expect([start.history.now, start.words]).toEqual(['a', 'B']);
    expect(undone(start.history)).toBeNull();
    expect(redone(redone(start.history)!.history)!.history.now).toBe('c');
    expect(redone(made)).toBeNull();
  });

  it('counts a run of changes within a moment as one step, and no longer after a pause', () => {
    const at = (history: ReturnType<typeof begun<string>>, now: string, atMs: number) => did(history, now, { words: 'Width typed', run: 'width', atMs });
    const typed = at(at(at(begun(''), '1', 0), '12', 400), '120', 900);
    expect(undone(typed)!.history.now).toBe('');
    expect(undone(at(typed, '1200', 5000))!.history.now).toBe('120');
  });

  it('forgets what was taken back once something else is done', () => {
    const back = undone(did(begun('a'), 'b', { words: 'B', atMs: 0 }))!.history;
    expect(redone(did(back, 'c', { words: 'C', atMs: 1 }))).toBeNull();
  });
});
