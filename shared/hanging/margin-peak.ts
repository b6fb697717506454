import type { Reach } from './hanger-reach.ts';
import type { Range } from './shift-sweep.ts';

/**
 * The greatest least margin of the hangers in studs over shifts from `from` to `to`, throughout which the same hangers are in studs,
 * and all shifts that reach it. Null when nothing there comes up to `floor`. Without any hanger in a stud every shift is as good.
 *
 * In one stud a hanger's margin rises, stays and falls with the shift: min(half, shift − start, end − shift). Where a hanger changes
 * from one stud to the next its margin has a valley; between valleys the least of all is min(H, shift − S, E − shift), whose top is plain.
 */
export function marginPeak(hangers: readonly Reach[], from: number, to: number, floor: number): { margin: number; at: Range[] } | null {
  const inside = hangers.filter((h) => h.best(from).margin >= 0);
  if (inside.length === 0) return { margin: 0, at: [[from, to]] };

  const near = inside.map((h) => studsMet(h, from, to));
  const valleys = new Set<number>();
  inside.forEach((h, i) => {
    for (const v of valleysOf(h, near[i] ?? [], from, to)) valleys.add(v);
  });
  const cuts = [from, ...[...valleys].sort((a, b) => a - b), to];

  let best = floor;
  let at: Range[] = [];
  for (let c = 0; c + 1 < cuts.length; c++) {
    const low = cuts[c] as number;
    const high = cuts[c + 1] as number;
    let half = Infinity;
    let start = -Infinity;
    let end = Infinity;
    for (let i = 0; i < inside.length; i++) {
      const h = inside[i] as Reach;
      const stud = bestOf(h, near[i] as number[], (low + high) / 2);
      half = Math.min(half, h.half(stud));
      start = Math.max(start, h.start(stud));
      end = Math.min(end, h.end(stud));
      if (Math.min(half, (end - start) / 2) < best) break;
    }
    const x = Math.min(Math.max((start + end) / 2, low), high);
    const margin = Math.min(half, x - start, end - x);
    if (margin < best) continue;
    if (margin > best) at = [];
    best = margin;
    at.push([Math.max(low, start + margin), Math.min(high, end - margin)]);
  }
  return at.length === 0 ? null : { margin: best, at };
}

function studsMet(h: Reach, from: number, to: number): number[] {
  const met: number[] = [];
  for (let k = 0; k < h.studCount; k++) {
    if (h.half(k) >= 0 && h.start(k) <= to && h.end(k) >= from) met.push(k);
  }
  return met;
}

function bestOf(h: Reach, studs: readonly number[], shift: number): number {
  let best = studs[0] as number;
  for (const k of studs) if (h.margin(k, shift) > h.margin(best, shift)) best = k;
  return best;
}

/** Shifts at which two studs give a hanger the same margin; some are none of its valleys, which does no harm. */
function valleysOf(h: Reach, studs: readonly number[], from: number, to: number): number[] {
  const found: number[] = [];
  for (let i = 0; i < studs.length; i++) {
    for (let j = i + 1; j < studs.length; j++) {
      const a = studs[i] as number;
      const b = studs[j] as number;
      const start = Math.max(h.start(a), h.start(b));
      const end = Math.min(h.end(a), h.end(b));
      const level = Math.min(h.half(a), h.half(b), (end - start) / 2);
      // One falls while the other rises, or one crosses the other's plateau: at its near or its far side.
      for (const v of [start + level, end - level]) if (v > from && v < to) found.push(v);
    }
  }
  return found;
}
