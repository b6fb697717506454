import type { Point } from '../geometry/point.ts';

/** A line of the wall that a middle or a hanger can be laid on: upright (`axis` x) or level (y). */
export interface SnapLine {
  axis: 'x' | 'y';
  atMm: number;
  kind: 'wall centre' | 'datum' | 'stud' | 'centre line';
  /** The frame whose middle it runs through, for centre lines. */
  frameId: string | null;
}

/** The lines of one axis that one kind of thing is laid on, in order of place: found by halving, not by trying all. */
type Ruled = readonly SnapLine[];

export interface LineField {
  middlesX: Ruled;
  middlesY: Ruled;
  hangersX: Ruled;
}

export interface LineNeeds {
  wall: { widthMm: number; studs: readonly { xMm: number }[] };
  /** Middles of the frames that stay. */
  middles: readonly { frameId: string; at: Point }[];
  /** Heights above the floor that a middle is hung at, mm. */
  datumsMm: readonly number[];
}

/** A line within reach, and how far what is held is moved to lie on it, mm (signed, along the axis). */
export interface LineSnap {
  line: SnapLine;
  byMm: number;
}

/** Puts the lines of a wall in order. Built once when a drag begins. */
export function lineField({ wall, middles, datumsMm }: LineNeeds): LineField {
  const line = (axis: SnapLine['axis'], atMm: number, kind: SnapLine['kind'], frameId: string | null = null): SnapLine => ({ axis, atMm, kind, frameId });
  const ordered = (lines: SnapLine[]): Ruled => lines.sort((a, b) => a.atMm - b.atMm);
  return {
    middlesX: ordered([line('x', wall.widthMm / 2, 'wall centre'), ...middles.map(({ frameId, at }) => line('x', at.x, 'centre line', frameId))]),
    middlesY: ordered([...datumsMm.map((mm) => line('y', mm, 'datum')), ...middles.map(({ frameId, at }) => line('y', at.y, 'centre line', frameId))]),
    hangersX: ordered(wall.studs.map(({ xMm }) => line('x', xMm, 'stud'))),
  };
}

/** How much nearer a line counts than it is, as a share of the reach: what the wall gives goes before what hangs on it. */
const ease: Record<SnapLine['kind'], number> = { 'wall centre': 0.3, datum: 0.3, stud: 0.2, 'centre line': 0 };

/** The strongest line across and the strongest upwards for middles and hangers held where they are; either may be missing. */
export function strongestLines(field: LineField, held: { middles: readonly Point[]; hangers: readonly Point[] }, reachMm: number): LineSnap[] {
  const x = [...held.middles.flatMap((p) => inReach(field.middlesX, p.x, reachMm)), ...held.hangers.flatMap((p) => inReach(field.hangersX, p.x, reachMm))];
  const y = held.middles.flatMap((p) => inReach(field.middlesY, p.y, reachMm));
  return [strongest(x, reachMm), strongest(y, reachMm)].flatMap((snap) => snap ?? []);
}

function strongest(snaps: readonly LineSnap[], reachMm: number): LineSnap | null {
  const cost = ({ line, byMm }: LineSnap) => Math.abs(byMm) - ease[line.kind] * reachMm;
  return snaps.reduce<LineSnap | null>((best, snap) => (best === null || cost(snap) < cost(best) ? snap : best), null);
}

function inReach(lines: Ruled, at: number, reachMm: number): LineSnap[] {
  let low = 0;
  let high = lines.length;
  while (low < high) {
    const mid = (low + high) >> 1;
    if (lines[mid]!.atMm < at - reachMm) low = mid + 1;
    else high = mid;
  }
  const found: LineSnap[] = [];
  for (let i = low; i < lines.length && lines[i]!.atMm <= at + reachMm; i++) found.push({ line: lines[i]!, byMm: lines[i]!.atMm - at });
  return found;
}
