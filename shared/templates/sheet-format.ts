import { formatLength } from '../units/length.ts';
import type { Rect } from './drawing.ts';
import { isRoll, longestPageMm, orientations, paperName, paperSize, rollWidth, type Orientation, type Paper } from './papers.ts';

/** Bands kept free of drawing inside the printer's margin: the title above, the upright scale bar at the right. */
export const titleBandMm = 25;
export const barBandMm = 9;
/** A screw's label and its cross-hair need this much; a part of the wall smaller than that is not worth a sheet. */
export const smallestLabelMm = 70;
/** Longest page with UserUnit, which some printers' own programs do not heed. */
const longestScaledPageMm = 4 * longestPageMm;

/** How a paper is used: the part of the page, mm on paper, that shows the wall. */
export interface SheetFormat {
  paper: Paper;
  /** `Letter`, `Roll 24 in` … */
  name: string;
  orientation: Orientation;
  widthMm: number;
  heightMm: number;
  live: Rect;
}

/** What decides a format. */
export interface PaperWish {
  paper: Paper;
  /** For rolls of another width. */
  rollWidthMm: number | null;
  marginMm: number;
  longPages: 'split' | 'user unit';
  units: 'in' | 'mm';
}

export function sheetFormat(wish: PaperWish, orientation: Orientation, inkMm: { width: number; height: number } = { width: 0, height: 0 }): SheetFormat {
  const { paper, marginMm } = wish;
  const { widthMm, heightMm } = isRoll(paper) ? cutFromRoll(wish, rollWidth(paper, wish.rollWidthMm), orientation, inkMm) : paperSize(paper, orientation);
  return {
    paper, name: paperName(paper, wish.rollWidthMm), orientation, widthMm, heightMm,
    live: { x: marginMm, y: marginMm, width: widthMm - 2 * marginMm - barBandMm, height: heightMm - 2 * marginMm - titleBandMm },
  };
}

/**
 * A piece of a roll: upright it runs up the wall, lying along it. As long as what is drawn asks for, in as many equal pieces as keep each within
 * the longest page.
 */
function cutFromRoll({ marginMm, longPages }: PaperWish, acrossMm: number, orientation: Orientation, ink: { width: number; height: number }): { widthMm: number; heightMm: number } {
  const longest = longPages === 'split' ? longestPageMm : longestScaledPageMm;
  const bands = 2 * marginMm + (orientation === 'portrait' ? titleBandMm : barBandMm);
  const room = 60;
  const wanted = Math.max((orientation === 'portrait' ? ink.height : ink.width) + 2 * pieceRoomMm, 120);
  const pieces = Math.max(1, Math.ceil((wanted - room) / (longest - bands - room)));
  const alongMm = Math.min(longest, Math.ceil((wanted - room) / pieces + room + bands));
  return orientation === 'portrait' ? { widthMm: acrossMm, heightMm: alongMm } : { widthMm: alongMm, heightMm: acrossMm };
}

/** Bare paper left beyond the outermost line at both ends of a piece of a roll. */
export const pieceRoomMm = 8;

/** Orientations in which the paper leaves room enough to draw in. */
export function usableOrientations(wish: PaperWish): Orientation[] {
  return orientations.filter((o) => {
    const { live } = sheetFormat(wish, o, { width: 1000, height: 1000 });
    return live.width >= smallestLabelMm && live.height >= smallestLabelMm;
  });
}

/** Words for a paper that cannot be drawn on, or null. */
export function paperProblem(wish: PaperWish): { path: 'marginMm' | 'rollWidthMm'; words: string } | null {
  const length = (mm: number) => formatLength(mm, wish.units);
  const roll = isRoll(wish.paper);
  const across = roll ? rollWidth(wish.paper as never, wish.rollWidthMm) : Math.min(...Object.values(paperSize(wish.paper as never, 'portrait')));
  const name = paperName(wish.paper, wish.rollWidthMm);
  if (2 * wish.marginMm >= across) return { path: 'marginMm', words: `Margins of ${length(wish.marginMm)} on both sides are wider than ${name}, which is ${length(across)} across.` };
  if (usableOrientations(wish).length > 0) return null;
  const left = across - 2 * wish.marginMm - barBandMm;
  return {
    path: roll && wish.marginMm <= 20 ? 'rollWidthMm' : 'marginMm',
    words: `${name} with margins of ${length(wish.marginMm)} leaves ${length(Math.max(0, left))} to draw in; the smallest label needs ${length(smallestLabelMm)}.`,
  };
}
