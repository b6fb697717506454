import type { Progress } from '../../shared/walls/photo.ts';

const states = ['waiting', 'fitting', 'reading', 'drawing', 'writing'] as const satisfies readonly Progress['state'][];
export type Stage = (typeof states)[number];

/** A few bytes that both threads see: the stage and its share in thousandths. */
export function progressCell(): SharedArrayBuffer {
  return new SharedArrayBuffer(8);
}

export function setProgress(cell: SharedArrayBuffer | undefined, stage: Stage, share: number): void {
  if (!cell) return;
  const view = new Int32Array(cell);
  Atomics.store(view, 0, states.indexOf(stage));
  Atomics.store(view, 1, Math.round(share * 1000));
}

export function progressOf(cell: SharedArrayBuffer | undefined): Progress {
  if (!cell) return { state: 'idle', share: 0 };
  const view = new Int32Array(cell);
  return { state: states[Atomics.load(view, 0)] ?? 'waiting', share: Math.min(1, Atomics.load(view, 1) / 1000) };
}
