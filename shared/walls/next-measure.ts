import { gridOver, isSeen, pointsOf, scaledCovariance, slopesAt, movedBy, twiceSpread, type WallRectangle } from './accuracy.ts';
import type { Fit } from './fit.ts';
import type { Point } from './homography.ts';
import { spreadPx } from './observations.ts';
import { lensAt, pxPerMmAt } from './wall-camera.ts';

/** What lowers the worst error the most, and what the worst would then be, mm: a mark at a point, or a straight edge marked. */
export interface NextMeasure {
  /** Null for a straight edge, which needs no tape. */
  mm: Point | null;
  worstMm: number;
  worstThenMm: number;
  /** Which part of the wall's picture the point lies in. */
  where: string;
}

/** A mark so near another (part of the picture's longer side) tells little that the other does not. */
const nearMark = 0.06;
/** Less of an improvement than this is not worth a walk with the tape. */
const worthIt = 0.97;
/** A straight edge across the picture tells the lens's term to about this. */
const edgeTells = 0.002;

/**
 * Tries a mark at each of some thirty points of the rectangle that the photo shows, by the update of a covariance for one more
 * measurement (Kalman 1960), and a straight edge likewise. Null where nothing lowers the worst error by a thirtieth.
 */
export function nextMeasure(fit: Fit, photo: { widthPx: number; heightPx: number }, r: WallRectangle, marks: readonly { mm: Point }[]): NextMeasure | null {
  const covariance = scaledCovariance(fit);
  const judged = pointsOf(gridOver(r)).filter((p) => isSeen(fit, photo, p)).map((p) => movedBy(fit, p)).filter((m) => m !== null);
  if (judged.length === 0) return null;
  const worst = (c: readonly (readonly number[])[]) => Math.max(...judged.map((m) => twiceSpread(m, c)));
  const worstMm = worst(covariance);
  const lens = Array.from({ length: covariance.length }, (_, i) => (i === lensAt ? 1 : 0));
  const withEdge = fit.verdict.state === 'left out' ? worst(measured(covariance, [lens], edgeTells)) : Infinity;
  let best: NextMeasure | null = withEdge < worthIt * worstMm ? { mm: null, worstMm, worstThenMm: withEdge, where: '' } : null;
  for (const mm of candidates(r)) {
    if (marks.some((m) => Math.hypot(m.mm.x - mm.x, m.mm.y - mm.y) < nearMark * Math.max(r.widthMm, r.heightMm))) continue;
    const slopes = isSeen(fit, photo, mm, 0) ? slopesAt(fit, mm) : null;
    if (!slopes) continue;
    const then = worst(measured(covariance, slopes, spreadPx(pxPerMmAt(fit.frame, fit.camera, mm), fit.sure)));
    if (then < worthIt * worstMm && (!best || then < best.worstThenMm)) best = { mm, worstMm, worstThenMm: then, where: partOf(r, mm) };
  }
  return best;
}

/** What to measure next, in words; `tell` writes a length in the reader's units. */
export function nextMeasureWords(next: NextMeasure | null, tell: (mm: number) => string): string {
  if (!next) return 'One more mark would make little difference.';
  if (!next.mm) {
    return `Next, mark points along something straight that runs across the picture, a skirting or a door’s edge, so that the lens can be told: the worst error would fall from ${tell(next.worstMm)} to about ${tell(next.worstThenMm)}.`;
  }
  return `Next, measure a point ${next.where}, about ${tell(Math.round(next.mm.x))} from the wall’s left edge and ${tell(Math.round(next.mm.y))} above the floor, and mark it: ` +
    `the worst error would fall from ${tell(next.worstMm)} to about ${tell(next.worstThenMm)}.`;
}

/** The covariance after measuring something of the given slopes to a spread: one row after another, C − C·g·gᵀ·C / (gᵀ·C·g + r²). */
function measured(c: readonly (readonly number[])[], rows: readonly number[][], spread: number): number[][] {
  return rows.reduce<number[][]>(
    (now, g) => {
      const cg = now.map((row) => g.reduce((s, v, k) => s + row[k]! * v, 0));
      const by = g.reduce((s, v, i) => s + v * cg[i]!, 0) + spread * spread;
      return now.map((row, i) => row.map((v, k) => v - (cg[i]! * cg[k]!) / by));
    },
    c.map((row) => [...row]),
  );
}

function candidates(r: WallRectangle): Point[] {
  const columns = 7;
  const rows = 5;
  return Array.from({ length: columns * rows }, (_, i) => ({
    x: r.leftMm + (r.widthMm * (0.02 + (0.96 * (i % columns)) / (columns - 1))),
    y: r.bottomMm + (r.heightMm * (0.02 + (0.96 * Math.floor(i / columns)) / (rows - 1))),
  }));
}

function partOf(r: WallRectangle, p: Point): string {
  const third = (v: number, names: readonly [string, string, string]) => names[v < 1 / 3 ? 0 : v <= 2 / 3 ? 1 : 2];
  const across = third((p.x - r.leftMm) / r.widthMm, ['left', 'middle', 'right']);
  const up = third((p.y - r.bottomMm) / r.heightMm, ['lower', 'middle', 'upper']);
  if (across === 'middle' && up === 'middle') return 'in the middle of the picture';
  if (across === 'middle') return `at the picture’s ${up} middle`;
  return up === 'middle' ? `at the picture’s ${across} side` : `at the picture’s ${up} ${across}`;
}
