import { gapBetween, overlapDepth } from '../../geometry/polygon-distance.ts';
import { putAt, type Piece, type Put } from './ask.ts';

/** How finely a circle's radius is sought, mm. */
const fineMm = 0.01;

/**
 * Frames on circles round the origin, evenly by angle, the first at the top; each circle as small as leaves the reveal everywhere.
 * `outwards` turns each frame with its place on the circle. Counts go from the inner circle out; a first count of 1 is the middle itself.
 */
export function circles(pieces: readonly Piece[], counts: readonly number[], outwards: boolean, revealMm: number): Put[] {
  const all: Put[] = [];
  let next = 0;
  let inner = 0;
  for (const count of counts) {
    const own = pieces.slice(next, (next += count));
    const at = (radius: number): Put[] => own.map((piece, k) => {
      const angle = Math.PI / 2 - (2 * Math.PI * k) / own.length;
      return putAt(piece, radius * Math.cos(angle), radius * Math.sin(angle), outwards ? angle - Math.PI / 2 : 0);
    });
    if (count === 1 && all.length === 0) {
      all.push(...at(0));
      continue;
    }
    const isClear = (puts: readonly Put[]): boolean => puts.every((a, i) => [...puts.slice(i + 1), ...all].every((b) => keeps(a, b, revealMm)));
    let low = inner;
    let high = inner + 100;
    while (!isClear(at(high))) {
      low = high;
      high += 100;
      if (high > 1e5) return [];
    }
    while (high - low > fineMm) {
      const half = (low + high) / 2;
      if (isClear(at(half))) high = half;
      else low = half;
    }
    all.push(...at(high));
    inner = high;
  }
  return all;
}

function keeps(a: Put, b: Put, revealMm: number): boolean {
  const apart = Math.hypot(a.at.xMm - b.at.xMm, a.at.yMm - b.at.yMm);
  if (apart > a.piece.radiusMm + b.piece.radiusMm + revealMm) return true;
  return overlapDepth(a.outline, b.outline) <= 0 && gapBetween(a.outline, b.outline).mm >= revealMm;
}
