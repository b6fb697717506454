import { boxOf, type Point } from '../../geometry/polygon.ts';
import { allowedShifts, type WallOutline } from '../../hanging/allowed-shifts.ts';
import { boxRoundPuts, movedPut, putAt, type Piece, type Put } from './ask.ts';

/** Lines run across the wall and are stacked downwards, or run upwards and are stacked to the right. */
export type LinesRun = 'across' | 'up';

const ways: Record<LinesRun, { along: Point; stacked: Point }> = {
  across: { along: { x: 1, y: 0 }, stacked: { x: 0, y: -1 } },
  up: { along: { x: 0, y: 1 }, stacked: { x: 1, y: 0 } },
};

/** Far enough that everything to be moved lies between here and there, mm. */
const far = 1e5;

/**
 * Lines of frames about the origin: in each, frames on one middle line, as near to one another as the reveal lets them; lines on one
 * middle, each drawn up to those before it until the reveal is left, so that combs nest. `staggered` sets every other line off by half
 * a pitch.
 */
export function rows(lines: readonly (readonly Piece[])[], run: LinesRun, turned: boolean, staggered: boolean, revealMm: number): Put[] {
  const { along, stacked } = ways[run];
  const all: Put[] = [];
  lines.forEach((pieces, number) => {
    const line: Put[] = [];
    for (const piece of pieces) {
      const put = putAt(piece, 0, 0, turned ? piece.stepRad : 0);
      const by = wayClear(put, line, along, revealMm);
      line.push(movedPut(put, along.x * by, along.y * by));
    }
    if (line.length === 0) return;
    const box = boxRoundPuts(line);
    const offset = staggered && number % 2 === 1 ? (run === 'across' ? box.right - box.left + revealMm : box.top - box.bottom + revealMm) / line.length / 2 : 0;
    const dx = run === 'across' ? offset - (box.left + box.right) / 2 : 0;
    const dy = run === 'up' ? offset - (box.bottom + box.top) / 2 : 0;
    const centred = line.map((p) => movedPut(p, dx, dy));
    const by = Math.max(0, ...centred.map((p) => wayClear(p, all, stacked, revealMm)));
    all.push(...centred.map((p) => movedPut(p, stacked.x * by, stacked.y * by)));
  });
  const box = boxRoundPuts(all);
  return all.map((p) => movedPut(p, -(box.left + box.right) / 2, -(box.bottom + box.top) / 2));
}

/** How far along a way a frame is moved to be the reveal past all others, mm. */
function wayClear(put: Put, others: readonly Put[], way: Point, revealMm: number): number {
  if (others.length === 0) return 0;
  // Turned so that the way runs to the right, where moves along a wall are known exactly.
  const seen = (outline: readonly Point[]): WallOutline => outline.map(({ x, y }) => [x * way.x + y * way.y + far, y * way.x - x * way.y] as const);
  const free = allowedShifts([seen(put.outline)], 2 * far, others.map((o) => ({ outlineMm: seen(o.outline), clearanceMm: revealMm })));
  const from = free.at(-1)?.[0] ?? 0;
  return from < -far / 2 ? 0 : from;
}

/** Counts for k lines, each one more or one less than the line before, so that a comb nests about one middle; the most even ones first. */
export function combCounts(n: number, k: number): number[][] {
  const found: number[][] = [];
  for (let signs = 0; signs < 2 ** (k - 1); signs++) {
    const steps = [0];
    for (let i = 1; i < k; i++) steps.push(steps[i - 1]! + ((signs >> (i - 1)) & 1 ? 1 : -1));
    const first = (n - steps.reduce((s, x) => s + x, 0)) / k;
    const counts = steps.map((s) => first + s);
    if (Number.isInteger(first) && counts.every((c) => c > 0)) found.push(counts);
  }
  const spread = (c: number[]) => Math.max(...c) - Math.min(...c);
  const lopsided = (c: number[]) => c.reduce((s, x, i) => s + Math.abs(x - c[c.length - 1 - i]!), 0);
  return found.sort((a, b) => spread(a) - spread(b) || lopsided(a) - lopsided(b));
}

/** Counts for k lines as even as can be, the longer lines in the middle. */
export function evenCounts(n: number, k: number): number[] {
  const counts = Array.from({ length: k }, () => Math.floor(n / k));
  const fromMiddle = counts.map((_, i) => i).sort((a, b) => Math.abs(a - (k - 1) / 2) - Math.abs(b - (k - 1) / 2));
  for (let i = 0; i < n % k; i++) counts[fromMiddle[i]!]!++;
  return counts;
}

/** Pieces dealt to lines in their order. */
export function dealt(pieces: readonly Piece[], counts: readonly number[]): Piece[][] {
  let next = 0;
  return counts.map((count) => pieces.slice(next, (next += count)));
}

/** The largest in the middle of the list, smaller ones to both ends. */
export function largestInTheMiddle(pieces: readonly Piece[]): Piece[] {
  const bySize = [...pieces].sort((a, b) => b.radiusMm - a.radiusMm);
  const result: Piece[] = [];
  bySize.forEach((piece, i) => (i % 2 ? result.push(piece) : result.unshift(piece)));
  return result;
}

/** Height and width of one piece as it would stand. */
export function sizeOf(piece: Piece, turned: boolean): { acrossMm: number; upMm: number } {
  const box = boxOf(putAt(piece, 0, 0, turned ? piece.stepRad : 0).outline);
  return { acrossMm: box.right - box.left, upMm: box.top - box.bottom };
}
