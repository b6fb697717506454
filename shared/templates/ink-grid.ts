import type { Point, Segment } from '../geometry/point.ts';
import type { Rect } from './drawing.ts';

interface Cells {
  columns: number;
  rows: number;
  /** Box of the ink in each cell, by row then column; minX is Infinity where a cell is blank. */
  minX: Float64Array;
  minY: Float64Array;
  maxX: Float64Array;
  maxY: Float64Array;
}

/** Lines that lie this near the overlap's far edge are not trusted to its strip, mm. */
const stripSlackMm = 0.5;

/** Which cells of a grid carry ink, for any origin of the grid: the heart of the search for the fewest sheets. */
export class InkGrid {
  readonly bounds: Rect;
  private readonly cells: Cells;

  constructor(
    private readonly segments: Segment[],
    private readonly screws: Point[],
    private readonly screwReachMm: number,
    private readonly step: Point,
    private readonly overlap: Point,
  ) {
    const ends = segments.flatMap((s) => [s.from, s.to]);
    const least = (of: (p: Point) => number) => ends.reduce((low, p) => Math.min(low, of(p)), Infinity);
    const x = least((p) => p.x);
    const y = least((p) => p.y);
    this.bounds = { x, y, width: -least((p) => -p.x) - x, height: -least((p) => -p.y) - y };
    const columns = Math.ceil(this.bounds.width / step.x) + 2;
    const rows = Math.ceil(this.bounds.height / step.y) + 2;
    const size = columns * rows;
    this.cells = {
      columns, rows,
      minX: new Float64Array(size), minY: new Float64Array(size), maxX: new Float64Array(size), maxY: new Float64Array(size),
    };
  }

  /** Sheets that must be printed with the grid at `origin`, which lies at most one step left of and below all ink. */
  kept(origin: Point): { row: number; column: number }[] {
    this.fill(origin);
    const needed = this.prune(origin);
    const kept: { row: number; column: number }[] = [];
    for (const [i, on] of needed.entries()) if (on) kept.push({ row: Math.floor(i / this.cells.columns), column: i % this.cells.columns });
    return kept;
  }

  /** How good an origin is; the finer counts are only made when the number of sheets is not above `atMost`. */
  score(origin: Point, wall: { widthMm: number; heightMm: number }, shown: Point, atMost: number): { sheets: number; pastWall: number; cutScrews: number } {
    this.fill(origin);
    const needed = this.prune(origin);
    let sheets = 0;
    for (let i = 0; i < needed.length; i += 1) sheets += needed[i]!;
    if (sheets > atMost) return { sheets, pastWall: Infinity, cutScrews: Infinity };
    let pastWall = 0;
    for (const [i, on] of needed.entries()) {
      if (!on) continue;
      const x = origin.x + (i % this.cells.columns) * this.step.x;
      const y = origin.y + Math.floor(i / this.cells.columns) * this.step.y;
      if (x < 0 || y < 0 || x + shown.x > wall.widthMm || y + shown.y > wall.heightMm) pastWall += 1;
    }
    return { sheets, pastWall, cutScrews: this.cutScrews(origin) };
  }

  /** Rows and columns of the grid between the outermost ink. */
  spanned({ x, y }: Point): { rows: number; columns: number } {
    const { bounds, step } = this;
    const cells = (start: number, size: number, origin: number, pitch: number) => Math.floor((start + size - origin) / pitch - 1e-9) - Math.floor((start - origin) / pitch) + 1;
    return { rows: cells(bounds.y, bounds.height, y, step.y), columns: cells(bounds.x, bounds.width, x, step.x) };
  }

  private cutScrews(origin: Point): number {
    const reach = this.screwReachMm;
    return this.screws.filter(
      ({ x, y }) =>
        Math.floor((x - reach - origin.x) / this.step.x) !== Math.floor((x + reach - origin.x) / this.step.x) ||
        Math.floor((y - reach - origin.y) / this.step.y) !== Math.floor((y + reach - origin.y) / this.step.y),
    ).length;
  }

  private fill(origin: Point): void {
    const { cells } = this;
    cells.minX.fill(Infinity);
    cells.minY.fill(Infinity);
    cells.maxX.fill(-Infinity);
    cells.maxY.fill(-Infinity);
    for (const segment of this.segments) this.mark(segment, origin);
  }

  /** Walks a segment from grid line to grid line and grows the box of each cell it passes. */
  private mark({ from, to }: Segment, origin: Point): void {
    const { step, cells } = this;
    const dx = to.x - from.x;
    const dy = to.y - from.y;
    // Where along the segment (0 … 1) the next upright and the next level grid line are met, and from line to line.
    const pitchX = dx === 0 ? Infinity : step.x / Math.abs(dx);
    const pitchY = dy === 0 ? Infinity : step.y / Math.abs(dy);
    const startX = (from.x - origin.x) / step.x;
    const startY = (from.y - origin.y) / step.y;
    let nextX = dx === 0 ? Infinity : (dx > 0 ? Math.floor(startX) + 1 - startX : startX - Math.ceil(startX) + 1) * pitchX;
    let nextY = dy === 0 ? Infinity : (dy > 0 ? Math.floor(startY) + 1 - startY : startY - Math.ceil(startY) + 1) * pitchY;
    let at = 0;
    while (at < 1) {
      const next = Math.min(nextX, nextY, 1);
      const middle = (at + next) / 2;
      const column = Math.floor((from.x + dx * middle - origin.x) / step.x);
      const row = Math.floor((from.y + dy * middle - origin.y) / step.y);
      this.grow(row * cells.columns + column, from.x + dx * at, from.y + dy * at, from.x + dx * next, from.y + dy * next);
      if (nextX <= next) nextX += pitchX;
      if (nextY <= next) nextY += pitchY;
      at = next;
    }
  }

  private grow(cell: number, x1: number, y1: number, x2: number, y2: number): void {
    const { minX, minY, maxX, maxY } = this.cells;
    const left = x1 < x2 ? x1 : x2;
    const right = x1 < x2 ? x2 : x1;
    const foot = y1 < y2 ? y1 : y2;
    const top = y1 < y2 ? y2 : y1;
    if (left < minX[cell]!) minX[cell] = left;
    if (foot < minY[cell]!) minY[cell] = foot;
    if (right > maxX[cell]!) maxX[cell] = right;
    if (top > maxY[cell]!) maxY[cell] = top;
  }

  /**
   * Cells that need a sheet of their own: those with ink, but for a cell whose ink lies wholly in the overlap strip of the printed sheet
   * at its left or below it.
   */
  private prune(origin: Point): Uint8Array {
    const { columns, rows, minX, maxX, maxY } = this.cells;
    const needed = new Uint8Array(columns * rows);
    for (let i = 0; i < needed.length; i += 1) needed[i] = minX[i] === Infinity ? 0 : 1;
    const leaned = new Uint8Array(needed.length);
    for (let i = needed.length - 1; i >= 0; i -= 1) {
      if (!needed[i] || leaned[i]) continue;
      const column = i % columns;
      const row = Math.floor(i / columns);
      const right = origin.x + column * this.step.x + this.overlap.x - stripSlackMm;
      const top = origin.y + row * this.step.y + this.overlap.y - stripSlackMm;
      const cover = column > 0 && needed[i - 1] && maxX[i]! <= right ? i - 1 : row > 0 && needed[i - columns] && maxY[i]! <= top ? i - columns : -1;
      if (cover < 0) continue;
      needed[i] = 0;
      leaned[cover] = 1;
    }
    return needed;
  }
}
