import type { Point, Segment } from '../geometry/point.ts';
import { sidesOf } from '../geometry/polygon.ts';
import { cornersOf, type Rect } from './drawing.ts';
import { InkGrid } from './ink-grid.ts';
import { isRoll, type Orientation } from './papers.ts';
import { pieceRoomMm, sheetFormat, usableOrientations, type PaperWish, type SheetFormat } from './sheet-format.ts';
import { cellsMet, type Places } from './sheet-search.ts';

const edgeRoomMm = 6;
/** Half the length of a cross-hair's arms; a screw counts as ink this far round its centre. */
export const crossHairMm = 8;

/** One printed sheet. `window` is the part of the wall it shows; its left and bottom edges are cut, its right and top overlap lie under neighbours. */
export interface Sheet {
  name: string;
  /** Label of the one frame it shows, of a template of single frames. */
  frame?: string;
  row: number;
  column: number;
  window: Rect;
  format: SheetFormat;
  /** From its cut edges to those of the next sheets, mm on the wall. */
  step: Point;
  left: string | null;
  right: string | null;
  below: string | null;
  above: string | null;
}

export interface SheetPlan {
  format: SheetFormat;
  sheets: Sheet[];
  /** From one sheet's cut edge to the next one's, mm on the wall. */
  step: Point;
  /** What neighbours share, mm on the wall. */
  overlap: Point;
  /** A corner of the grid, mm on the wall. */
  origin: Point;
  /** Sheets of the grid that would have been blank and are left out. */
  blank: number;
}

export interface SheetWish extends PaperWish {
  overlapMm: number;
  join: 'overlap' | 'butt';
  orientation: Orientation | 'fewest';
  /** Where the reader has pulled the grid to, or null for the best place. */
  origin: Point | null;
  correction: { x: number; y: number };
}

export interface Ink {
  outlines: Point[][];
  screws: Point[];
}

interface Wall {
  widthMm: number;
  heightMm: number;
}

/** A grid under trial: its step and the places it may take. */
interface Raster {
  step: Point;
  xs: Places;
  ys: Places;
}

interface Found {
  plan: SheetPlan;
  /** Fewest sheets (of rolls, least length), fewest past the wall, fewest screws cut by a join, most room at the first edges. */
  score: number[];
}

/**
 * Lays the grid of sheets over what is to be drawn, in either orientation of the paper unless one is asked for. Places on whole millimetres or
 * eighths of an inch are tried first, so that cut edges fall on figures a tape shows; then sheets set apart as far as the paper allows, on a raster
 * of 1 or 2 mm, which are taken only where they save a sheet. No place on either raster needs fewer sheets.
 */
export function planSheets(ink: Ink, wall: Wall, wish: SheetWish): SheetPlan {
  const usable = usableOrientations(wish);
  const asked = wish.orientation === 'fewest' || !usable.includes(wish.orientation) ? usable : [wish.orientation];
  let best: Found | null = null;
  for (const orientation of asked) {
    const found = bestGrid(ink, wall, wish, orientation);
    if (best === null || isLess(found.score, best.score)) best = found;
  }
  if (best === null) throw new RangeError('This paper leaves no room to draw in.');
  return best.plan;
}

function bestGrid(ink: Ink, wall: Wall, wish: SheetWish, orientation: Orientation): Found {
  const segments = [...ink.outlines.flatMap(sidesOf), ...ink.screws.flatMap(armsOf)];
  const bounds = boundsOf(segments);
  const format = sheetFormat(wish, orientation, { width: bounds.width * wish.correction.x, height: bounds.height * wish.correction.y });
  const shown = { x: format.live.width / wish.correction.x, y: format.live.height / wish.correction.y };
  const [onTape, closest] = rasters(wish, format, shown, bounds);
  if (segments.length === 0) {
    return { plan: { format, sheets: [], step: onTape.step, overlap: minus(shown, onTape.step), origin: { x: 0, y: 0 }, blank: 0 }, score: [0] };
  }
  const trial = (raster: Raster, atMost: number) => bestPlace(segments, ink.screws, wall, wish, format, shown, raster, atMost);
  const first = trial(onTape, Infinity)!;
  return (closest && wish.origin === null ? trial(closest, first.score[0]! - 1e-6) : null) ?? first;
}

/** Both rasters; the second is null where it would only repeat the first. */
function rasters(wish: SheetWish, format: SheetFormat, shown: Point, bounds: Rect): [Raster, Raster | null] {
  const lap = wish.join === 'butt' ? 0 : wish.overlapMm;
  const mark = wish.units === 'mm' ? 1 : 3.175;
  const most = { x: shown.x - lap, y: shown.y - lap };
  const step = { x: Math.floor(most.x / mark + 1e-9) * mark, y: Math.floor(most.y / mark + 1e-9) * mark };
  const rolled = isRoll(format.paper) ? format.orientation : null;
  const places = (axis: 'x' | 'y', pitch: number, raster: number, only: boolean): Places => {
    const start = axis === 'x' ? bounds.x : bounds.y;
    // One piece of a roll is as long as what it shows: there is but one place along it.
    if (only) return { first: Math.floor((start - pieceRoomMm) / mark) * mark, apart: mark, count: 1 };
    const apart = Math.max(1, Math.ceil(pitch / raster / 650)) * raster;
    return { first: 0, apart, count: Math.ceil(pitch / apart - 1e-9) };
  };
  if (wish.origin) {
    const at = (axis: 'x' | 'y'): Places => ({ first: Math.round(wish.origin![axis] / mark) * mark, apart: mark, count: 1 });
    return [{ step, xs: at('x'), ys: at('y') }, null];
  }
  const raster = (pitch: Point, apart: number): Raster => ({ step: pitch, xs: places('x', pitch.x, apart, rolled === 'landscape'), ys: places('y', pitch.y, apart, rolled === 'portrait') });
  const fine = most.x * most.y <= 60_000 ? 1 : 2;
  return [raster(step, mark), most.x - step.x + most.y - step.y < 1e-6 && fine >= mark ? null : raster(most, fine)];
}

/** The best of the places with the fewest cells to show; null where none of them needs `atMost` or less. */
function bestPlace(segments: Segment[], screws: Point[], wall: Wall, wish: SheetWish, format: SheetFormat, shown: Point, { step, xs, ys }: Raster, atMost: number): Found | null {
  const each = isRoll(wish.paper) ? (format.orientation === 'portrait' ? format.heightMm : format.widthMm) : 1;
  const counts = cellsMet(segments, step, xs, ys);
  const overlap = minus(shown, step);
  const grid = new InkGrid(segments, screws, crossHairMm, step, overlap);
  let best: { origin: Point; score: number[] } | null = null;
  for (const i of fewest(counts, Math.max(60, Math.min(1500, 2e5 / segments.length)))) {
    const origin = {
      x: lastBefore(grid.bounds.x, xs.first + (i % xs.count) * xs.apart, step.x),
      y: lastBefore(grid.bounds.y, ys.first + Math.floor(i / xs.count) * ys.apart, step.y),
    };
    const { sheets, pastWall, cutScrews } = grid.score(origin, wall, shown, best ? best.score[0]! / each : Infinity);
    // A line on the very edge of the first sheets would lose half its width to the printer's margin.
    const room = Math.min(edgeRoomMm, grid.bounds.x - origin.x, grid.bounds.y - origin.y);
    const score = [sheets * each, pastWall, cutScrews, -room];
    if (score[0]! <= atMost && (best === null || isLess(score, best.score))) best = { origin, score };
  }
  if (best === null) return null;
  const kept = grid.kept(best.origin);
  const { rows, columns } = grid.spanned(best.origin);
  const sheets = named(kept, best.origin, step, shown, format);
  return { plan: { format, sheets, step, overlap, origin: best.origin, blank: Math.max(0, rows * columns - sheets.length) }, score: best.score };
}

/** Places with the fewest cells first, as many as can be looked at closely, spread over those that are alike. */
function fewest(counts: Int32Array, atMost: number): number[] {
  const byCount = new Map<number, number[]>();
  for (const [i, n] of counts.entries()) {
    const list = byCount.get(n);
    if (list) list.push(i);
    else byCount.set(n, [i]);
  }
  const chosen: number[] = [];
  for (const n of [...byCount.keys()].sort((a, b) => a - b)) {
    const list = byCount.get(n)!;
    const every = Math.max(1, Math.ceil(list.length / (atMost - chosen.length)));
    for (let k = 0; k < list.length; k += every) chosen.push(list[k]!);
    if (chosen.length >= atMost) break;
  }
  return chosen;
}

function named(kept: { row: number; column: number }[], origin: Point, step: Point, shown: Point, format: SheetFormat): Sheet[] {
  const lowest = Math.min(...kept.map((k) => k.row));
  const leftmost = Math.min(...kept.map((k) => k.column));
  const names = new Map(kept.map((k) => [`${k.row}/${k.column}`, sheetName(k.row - lowest, k.column - leftmost)]));
  const nameAt = (row: number, column: number) => names.get(`${row}/${column}`) ?? null;
  return kept
    .map(({ row, column }) => ({
      name: nameAt(row, column)!,
      row: row - lowest,
      column: column - leftmost,
      window: { x: origin.x + column * step.x, y: origin.y + row * step.y, width: shown.x, height: shown.y },
      format, step,
      left: nameAt(row, column - 1),
      right: nameAt(row, column + 1),
      below: nameAt(row - 1, column),
      above: nameAt(row + 1, column),
    }))
    .sort((a, b) => a.row - b.row || a.column - b.column);
}

/** `A1` is the lowest row's leftmost column; rows run A … Z, AA, AB … */
export function sheetName(row: number, column: number): string {
  let letters = '';
  for (let rest = row + 1; rest > 0; rest = Math.floor((rest - 1) / 26)) letters = String.fromCharCode(65 + ((rest - 1) % 26)) + letters;
  return `${letters}${column + 1}`;
}

function armsOf({ x, y }: Point): Segment[] {
  const corners = cornersOf({ x: x - crossHairMm, y: y - crossHairMm, width: 2 * crossHairMm, height: 2 * crossHairMm });
  return [{ from: corners[0]!, to: corners[2]! }, { from: corners[1]!, to: corners[3]! }];
}

/** The last line of a grid through `place` that is not past `start`. */
const lastBefore = (start: number, place: number, step: number): number => place + Math.floor((start - place) / step) * step;

const minus = (a: Point, b: Point): Point => ({ x: a.x - b.x, y: a.y - b.y });

function boundsOf(segments: Segment[]): Rect {
  const box = { left: Infinity, bottom: Infinity, right: -Infinity, top: -Infinity };
  for (const { from, to } of segments) {
    box.left = Math.min(box.left, from.x, to.x);
    box.right = Math.max(box.right, from.x, to.x);
    box.bottom = Math.min(box.bottom, from.y, to.y);
    box.top = Math.max(box.top, from.y, to.y);
  }
  return segments.length === 0 ? { x: 0, y: 0, width: 0, height: 0 } : { x: box.left, y: box.bottom, width: box.right - box.left, height: box.top - box.bottom };
}

function isLess(a: number[], b: number[]): boolean {
  for (const [i, value] of a.entries()) if (value !== b[i]) return value < b[i]!;
  return false;
}
