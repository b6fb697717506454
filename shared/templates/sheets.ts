import type { Point, Segment } from '../geometry/point.ts';
import { sidesOf } from '../geometry/polygon.ts';
import { cornersOf, type Rect } from './drawing.ts';
import { InkGrid } from './ink-grid.ts';
import { orientations, paperSize, type Orientation, type Paper } from './papers.ts';

/** Bands kept free of drawing inside the printer's margin: the title above, the upright scale bar at the right. */
export const titleBandMm = 25;
export const barBandMm = 9;
const edgeRoomMm = 6;
/** Half the length of a cross-hair's arms; a screw counts as ink this far round its centre. */
export const crossHairMm = 8;

/** How a paper is used: the part of the page, mm on paper, that shows the wall. */
export interface SheetFormat {
  paper: Paper;
  orientation: Orientation;
  widthMm: number;
  heightMm: number;
  live: Rect;
}

/** One printed sheet. `window` is the part of the wall it shows; its left and bottom edges are cut, its right and top overlap lie under neighbours. */
export interface Sheet {
  name: string;
  row: number;
  column: number;
  window: Rect;
  left: string | null;
  right: string | null;
  below: string | null;
  above: string | null;
}

export interface SheetPlan {
  format: SheetFormat;
  sheets: Sheet[];
  /** From one sheet's cut edge to the next one's, mm on the wall. */
  step: { x: number; y: number };
  /** What neighbours share, mm on the wall. */
  overlap: { x: number; y: number };
  /** How far apart the places tried for the grid stand, mm; no grid on these places needs fewer sheets. */
  placesMm: number;
}

export interface SheetWish {
  paper: Paper;
  marginMm: number;
  overlapMm: number;
  correction: { x: number; y: number };
  units: 'in' | 'mm';
}

interface Ink {
  outlines: Point[][];
  screws: Point[];
}

export function sheetFormat(wish: Pick<SheetWish, 'paper' | 'marginMm'>, orientation: Orientation): SheetFormat {
  const { widthMm, heightMm } = paperSize(wish.paper, orientation);
  const { marginMm } = wish;
  return {
    paper: wish.paper, orientation, widthMm, heightMm,
    live: { x: marginMm, y: marginMm, width: widthMm - 2 * marginMm - barBandMm, height: heightMm - 2 * marginMm - titleBandMm },
  };
}

/**
 * Lays the grid of sheets over what is to be drawn. Every place of the grid on a raster of whole millimetres or eighths of an inch is tried, in both
 * orientations of the paper, so that cut edges fall on figures a tape shows. In order: fewest sheets, fewest that reach past the
 * wall, fewest screws cut by a join, most room at the first edges.
 */
export function planSheets(ink: Ink, wall: { widthMm: number; heightMm: number }, wish: SheetWish): SheetPlan {
  let best: { plan: SheetPlan; score: number[] } | null = null;
  for (const orientation of orientations) {
    const found = bestGrid(ink, wall, wish, sheetFormat(wish, orientation));
    if (best === null || isLess(found.score, best.score)) best = found;
  }
  return best!.plan;
}

function bestGrid(ink: Ink, wall: { widthMm: number; heightMm: number }, wish: SheetWish, format: SheetFormat) {
  const shown = { x: format.live.width / wish.correction.x, y: format.live.height / wish.correction.y };
  const segments = [...ink.outlines.flatMap(sidesOf), ...ink.screws.flatMap(armsOf)];
  const snap = placesApart(wish.units, shown, segments.length);
  const step = { x: Math.floor((shown.x - wish.overlapMm) / snap + 1e-9) * snap, y: Math.floor((shown.y - wish.overlapMm) / snap + 1e-9) * snap };
  const overlap = { x: shown.x - step.x, y: shown.y - step.y };
  if (segments.length === 0) return { plan: { format, sheets: [], step, overlap, placesMm: snap }, score: [0] };
  const grid = new InkGrid(segments, ink.screws, crossHairMm, step, overlap);
  const start = { x: Math.floor(grid.bounds.x / snap) * snap, y: Math.floor(grid.bounds.y / snap) * snap };
  let best: { origin: Point; score: number[] } | null = null;
  for (let down = 0; down < step.y - 1e-9; down += snap) {
    for (let back = 0; back < step.x - 1e-9; back += snap) {
      const origin = { x: start.x - back, y: start.y - down };
      const { sheets, pastWall, cutScrews } = grid.score(origin, wall, shown, best?.score[0] ?? Infinity);
      // A line on the very edge of the first sheets would lose half its width to the printer's margin.
      const room = Math.min(edgeRoomMm, grid.bounds.x - origin.x, grid.bounds.y - origin.y);
      const score = [sheets, pastWall, cutScrews, -room];
      if (best === null || isLess(score, best.score)) best = { origin, score };
    }
  }
  const kept = grid.kept(best!.origin);
  const plan: SheetPlan = { format, sheets: named(kept, best!.origin, step, shown), step, overlap, placesMm: snap };
  return { plan, score: best!.score };
}

/** Raster of places: fine enough to matter, coarse enough that all can be tried. */
function placesApart(units: 'in' | 'mm', shown: Point, segments: number): number {
  const rasters = units === 'mm' ? [1, 2, 5, 10, 20] : [3.175, 6.35, 12.7, 25.4];
  const affordable = 2e6 / Math.max(1, segments);
  return rasters.find((raster) => (shown.x / raster) * (shown.y / raster) <= Math.max(400, affordable)) ?? rasters.at(-1)!;
}

function named(kept: { row: number; column: number }[], origin: Point, step: Point, shown: Point): Sheet[] {
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

function isLess(a: number[], b: number[]): boolean {
  for (const [i, value] of a.entries()) if (value !== b[i]) return value < b[i]!;
  return false;
}
