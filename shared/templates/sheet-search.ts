import type { Point, Segment } from '../geometry/point.ts';

/** Places a grid may take along one axis: `at` is a coordinate of one of its lines. */
export interface Places {
  first: number;
  apart: number;
  count: number;
}

/**
 * How many cells of a grid are met by the segments, for every place of the grid: `counts[j * xs.count + i]` stands for the place `i` across and
 * `j` up. Exact for straight segments and any step. For each place up, every row of cells sees the ink as stretches along x, whose cells are then
 * counted for all places across. A cell holds its left and lower edge; ink on that edge alone belongs to it.
 */
export function cellsMet(segments: readonly Segment[], step: Point, xs: Places, ys: Places): Int32Array {
  const counts = new Int32Array(xs.count * ys.count);
  if (segments.length === 0) return counts;
  const low = segments.reduce((least, s) => Math.min(least, s.from.y, s.to.y), Infinity);
  const high = segments.reduce((most, s) => Math.max(most, s.from.y, s.to.y), -Infinity);
  for (let j = 0; j < ys.count; j += 1) {
    const origin = ys.first + j * ys.apart;
    const firstRow = Math.floor((low - origin) / step.y);
    const rows = stretches(segments, origin, step.y, firstRow, Math.floor((high - origin) / step.y) - firstRow + 1);
    for (const row of rows) count(joined(row), step.x, xs, counts, j * xs.count);
  }
  return counts;
}

/** For each row of cells the x-stretches of the ink in it, as from, to, from, to … */
function stretches(segments: readonly Segment[], origin: number, step: number, firstRow: number, rowCount: number): number[][] {
  const rows: number[][] = Array.from({ length: rowCount }, () => []);
  for (const { from, to } of segments) {
    const [foot, top] = from.y <= to.y ? [from, to] : [to, from];
    const lowest = Math.floor((foot.y - origin) / step);
    const highest = Math.floor((top.y - origin) / step);
    const slope = highest === lowest ? 0 : (top.x - foot.x) / (top.y - foot.y);
    for (let row = lowest; row <= highest; row += 1) {
      const a = row === lowest ? foot.x : foot.x + slope * (origin + row * step - foot.y);
      const b = row === highest ? top.x : foot.x + slope * (origin + (row + 1) * step - foot.y);
      rows[row - firstRow]!.push(Math.min(a, b), Math.max(a, b));
    }
  }
  return rows;
}

/** The same stretches, each from left to right and those that touch made one. */
function joined(row: number[]): number[] {
  const order: number[] = [];
  for (let i = 0; i < row.length; i += 2) order.push(i);
  order.sort((a, b) => row[a]! - row[b]!);
  const result: number[] = [];
  for (const i of order) {
    const last = result.length - 1;
    if (last >= 0 && row[i]! <= result[last]!) result[last] = Math.max(result[last]!, row[i + 1]!);
    else result.push(row[i]!, row[i + 1]!);
  }
  return result;
}

function count(row: number[], step: number, { first, apart, count: places }: Places, counts: Int32Array, offset: number): void {
  for (let i = 0; i < places; i += 1) {
    const origin = first + i * apart;
    let met = 0;
    let last = -Infinity;
    for (let k = 0; k < row.length; k += 2) {
      const from = Math.floor((row[k]! - origin) / step);
      const to = Math.floor((row[k + 1]! - origin) / step);
      met += to - from + (from === last ? 0 : 1);
      last = to;
    }
    counts[offset + i]! += met;
  }
}
