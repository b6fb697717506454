import { boxOf, placedAll, type Placement, type Point, type Polygon } from '../../../../../shared/geometry/polygon.ts';
import { placed } from '../../../../../shared/geometry/point.ts';
import { isClear, strongestSnap, strongestTip, type EdgeField, type Snap, type SnapAsk } from '../../../../../shared/layouts/snap.ts';
import { strongestLines, type LineField, type LineSnap, type SnapLine } from '../../../../../shared/layouts/snap-lines.ts';

/** What stays while something is held: edges to lie along and lines to lie on. */
export interface Surroundings {
  edges: EdgeField;
  /** Null where the wall is not known. */
  lines: LineField | null;
}

/** What the hand holds, about the middle of the frame under it: its outline, those that go with it, and all their hangers. */
export interface Holding {
  outline: Polygon;
  body: readonly Polygon[];
  hangers: readonly Point[];
  /** Most it may be turned to lie along a neighbour, radians. */
  maxTurnRad: number;
}

export interface How {
  revealMm: number;
  /** How near a snap takes hold, mm; one is told of from twice as far. */
  reachMm: number;
  snapping: boolean;
}

/** Where what is held comes to lie, and why. */
export interface Settled {
  placement: Placement;
  snap: Snap | null;
  lines: readonly SnapLine[];
  /** A snap not yet in reach: shown with its distance, not taken. */
  offered: Snap | null;
}

/** Most that a snap moves a frame, as a share of its largest radius. */
const mostJump = 0.5;

/** The strongest snap for what is held, taken: a neighbour's edge first, then a corner, then the lines of the wall. */
export function settleHold(around: Surroundings, holding: Holding, placement: Placement, asked: How): Settled {
  // However far off the wall is seen, a frame does not jump by more than half of itself.
  const how = { ...asked, reachMm: Math.min(asked.reachMm, mostJump * Math.max(...holding.outline.map((p) => Math.hypot(p.x, p.y)))) };
  const loose: Settled = { placement, snap: null, lines: [], offered: null };
  if (!how.snapping) return loose;
  const ask: SnapAsk = { outline: holding.outline, body: holding.body, placement, revealMm: how.revealMm, reachMm: how.reachMm, maxTurnRad: holding.maxTurnRad };
  const snap = strongestSnap(around.edges, ask);
  if (snap?.fit === 'along') return slidToLine(around, holding, snap, how);
  const taken = snap ?? strongestTip(around.edges, ask);
  if (taken) return { ...loose, placement: taken.placement, snap: taken };

  const lines = linesFor(around, holding, placement, how.reachMm);
  const by = (axis: SnapLine['axis']) => lines.find(({ line }) => line.axis === axis)?.byMm ?? 0;
  return {
    placement: { ...placement, xMm: placement.xMm + by('x'), yMm: placement.yMm + by('y') },
    snap: null,
    lines: lines.map(({ line }) => line),
    // A frame held over another is on its way past it, and about to meet nothing.
    offered: isClear(around.edges, [holding.outline, ...holding.body], placement) ? strongestSnap(around.edges, { ...ask, reachMm: 2 * how.reachMm }) : null,
  };
}

function linesFor({ lines }: Surroundings, holding: Holding, at: Placement, reachMm: number): LineSnap[] {
  if (!lines) return [];
  const outlines = [holding.outline, ...holding.body];
  const middles: Point[] = [{ x: at.xMm, y: at.yMm }];
  if (outlines.length > 1) {
    // A selection has a middle of its own: that of the box round it.
    const { left, right, bottom, top } = boxOf(outlines.flatMap((o) => placedAll(o, at)));
    middles[0] = { x: (left + right) / 2, y: (bottom + top) / 2 };
  }
  return strongestLines(lines, { middles, hangers: holding.hangers.map((h) => placed(h, at)) }, reachMm);
}

/** A frame that is free along the edge it shares slides on to a line of the wall, where one is in reach and the edge stays shared. */
function slidToLine(around: Surroundings, holding: Holding, snap: Snap, how: How): Settled {
  const { from, to } = snap.guide;
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  const unit = { x: (to.x - from.x) / length, y: (to.y - from.y) / length };
  const slides = linesFor(around, holding, snap.placement, how.reachMm)
    .map(({ line, byMm }) => ({ line, slide: byMm / unit[line.axis] }))
    .filter(({ slide }) => Number.isFinite(slide) && Math.abs(slide) <= Math.min(how.reachMm, 0.8 * length))
    .sort((a, b) => Math.abs(a.slide) - Math.abs(b.slide));
  for (const { line, slide } of slides) {
    const placement = { ...snap.placement, xMm: snap.placement.xMm + slide * unit.x, yMm: snap.placement.yMm + slide * unit.y };
    if (isClear(around.edges, [holding.outline, ...holding.body], placement)) return { placement, snap: { ...snap, placement }, lines: [line], offered: null };
  }
  return { placement: snap.placement, snap, lines: [], offered: null };
}
