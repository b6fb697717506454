import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { applyEdits } from '../../../shared/layouts/edits.ts';
import type { Edit, Frame, Layout } from '../../../shared/layouts/layout.ts';
import { moveBy } from '../../../src/features/layouts/editor/operations/operations.ts';
import { startSaver } from '../../../src/features/layouts/editor/saver/saver.ts';
import { savedTime, saveWords } from '../../../src/features/layouts/editor/saver/save-state.ts';
import { createEditorStore } from '../../../src/features/layouts/editor/state/editor-store.ts';
import { CallError, unreachable } from '../../../src/lib/call-error.ts';

const id = (n: number) => `00000000-0000-4000-8000-00000000000${n}`;
const frame = (n: number): Frame => ({ id: id(n), patternId: id(9), xMm: 100 * n, yMm: 500, turnRad: 0, flipped: false, locked: false, label: String(n), contentsKg: null, hungGroup: null });
const first: Layout = {
  id: id(7), jobId: id(8), wallId: id(6), name: 'Over the settee', revealMm: 3, version: 1, frames: [frame(1), frame(2)], letter: 'A', state: 'draft',
  changedSinceSigned: false, revisions: [], updatedAt: '2026-03-03T14:02:00Z', updatedBy: 'Ana',
};

/** A server of one layout, as the contract has it: edits on the version that stands, or 409 with what stands. */
function aServer() {
  const server = {
    now: first,
    down: false,
    /** Takes the edits but loses its answer. */
    deafens: false,
    asked: 0,
    async take(version: number, edits: Edit[], who = 'Ana'): Promise<Layout> {
      server.asked++;
      if (server.down) throw unreachable();
      const { frames, sheet, conflicts } = applyEdits(server.now.frames, server.now, edits);
      if (version !== server.now.version || conflicts.length > 0) {
        throw new CallError({ type: 'about:blank', title: 'Someone saved before you', status: 409, code: 'stale', current: structuredClone(server.now) });
      }
      server.now = { ...server.now, frames, ...sheet, version: version + 1, updatedBy: who };
      if (server.deafens) throw unreachable();
      return structuredClone(server.now);
    },
  };
  return server;
}

function aPage(server: ReturnType<typeof aServer>, box: { edits: Edit[] } = { edits: [] }) {
  const store = createEditorStore(structuredClone(server.now));
  const kept = { read: () => box.edits, write: (edits: readonly Edit[]) => void (box.edits = [...edits]), clear: () => void (box.edits = []) };
  const saver = startSaver({ store, send: (version, edits) => server.take(version, edits), kept });
  const move = (n: number, dx: number) => store.act('moved', moveBy(store.getState().bench.frames, [id(n)], dx, 0));
  const x = (n: number) => store.getState().bench.frames.find((f) => f.id === id(n))?.xMm;
  return { store, saver, move, x, box, save: () => store.getState().save.kind };
}
const xOn = (server: ReturnType<typeof aServer>, n: number) => server.now.frames.find((f) => f.id === id(n))?.xMm;

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());

describe('the saver', () => {
  it('sends a flurry of changes as one, a moment after the last', async () => {
    const server = aServer();
    const page = aPage(server);
    page.move(1, 5);
    page.move(1, 5);
    page.move(2, 1);
    expect(page.save()).toBe('saving');
    await vi.advanceTimersByTimeAsync(1000);
    expect(server.asked).toBe(1);
    expect([xOn(server, 1), xOn(server, 2), page.save()]).toEqual([110, 201, 'saved']);
    expect(page.box.edits).toEqual([]);
  });

  it('sends nothing for a change that was undone in time', async () => {
    const server = aServer();
    const page = aPage(server);
    page.move(1, 5);
    page.store.dispatch({ kind: 'undo' });
    await vi.advanceTimersByTimeAsync(2000);
    expect([server.asked, page.save()]).toEqual([0, 'saved']);
  });

  it('merges with what another person saved of other frames, and saves on', async () => {
    const server = aServer();
    const page = aPage(server);
    await server.take(1, moveBy(first.frames, [id(2)], 50, 0), 'Bo');
    page.move(1, 5);
    await vi.advanceTimersByTimeAsync(3000);
    expect([xOn(server, 1), xOn(server, 2), page.x(2), page.save()]).toEqual([105, 250, 250, 'saved']);
  });

  it('never overwrites what another person saved of the same frame: it asks, then saves what was chosen', async () => {
    const server = aServer();
    const page = aPage(server);
    await server.take(1, moveBy(first.frames, [id(1)], 50, 0), 'Bo');
    page.move(1, 5);
    await vi.advanceTimersByTimeAsync(3000);
    expect([xOn(server, 1), page.x(1), page.store.getState().conflicts.length]).toEqual([150, 150, 1]);
    page.store.settle('mine');
    await vi.advanceTimersByTimeAsync(3000);
    expect([xOn(server, 1), page.save()]).toEqual([105, 'saved']);
  });

  it('offline keeps edits on the device and sends them when the line is back', async () => {
    const server = aServer();
    server.down = true;
    const page = aPage(server);
    page.move(1, 5);
    await vi.advanceTimersByTimeAsync(1000);
    expect(page.save()).toBe('offline');
    expect(page.box.edits).toHaveLength(1);
    server.down = false;
    await vi.advanceTimersByTimeAsync(6000);
    expect([xOn(server, 1), page.save(), page.box.edits.length]).toEqual([105, 'saved', 0]);
  });

  it('takes up what an earlier page left, and sends it', async () => {
    const server = aServer();
    server.down = true;
    const box = { edits: [] as Edit[] };
    const earlier = aPage(server, box);
    earlier.move(1, 5);
    earlier.saver.stop();
    await vi.advanceTimersByTimeAsync(1000);
    server.down = false;
    const page = aPage(server, box);
    expect(page.x(1)).toBe(105);
    await page.saver.flush();
    expect(xOn(server, 1)).toBe(105);
    expect(box.edits).toEqual([]);
  });

  it('does not mistake its own save, whose answer was lost, for another person', async () => {
    const server = aServer();
    server.deafens = true;
    const page = aPage(server);
    page.move(1, 5);
    await vi.advanceTimersByTimeAsync(1000);
    server.deafens = false;
    page.move(1, 5);
    await vi.advanceTimersByTimeAsync(8000);
    expect(page.store.getState().conflicts).toEqual([]);
    expect([xOn(server, 1), page.save()]).toEqual([110, 'saved']);
  });

  it('says what the server refused, and keeps it', async () => {
    const server = aServer();
    const page = aPage(server);
    server.take = () => Promise.reject(new CallError({ type: 'about:blank', title: 'Your role does not allow this', status: 403, code: 'not-allowed' }));
    page.move(1, 5);
    await vi.advanceTimersByTimeAsync(1000);
    expect(page.store.getState().save).toEqual({ kind: 'refused', words: 'Your role does not allow this' });
    expect(page.box.edits).toHaveLength(1);
  });
});

describe('the words of the title block', () => {
  it('tell who saved and when', () => {
    const at = new Date(2026, 2, 3, 14, 2);
    expect(savedTime(at.toISOString(), () => 'long ago', new Date(2026, 2, 3, 18, 0))).toBe('14:02');
    expect(savedTime(at.toISOString(), () => 'long ago', new Date(2026, 2, 5))).toBe('long ago');
    expect(saveWords({ kind: 'saved' }, '', 'Ana', () => '14:02')).toBe('Saved 14:02 by Ana');
    expect(saveWords({ kind: 'offline' }, '', 'Ana', () => '14:02')).toBe('Not saved: offline, kept here');
  });
});
