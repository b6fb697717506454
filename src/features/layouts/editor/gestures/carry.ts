import { distance } from '../../../../../shared/geometry/point.ts';
import { contains, type Placement, type Point } from '../../../../../shared/geometry/polygon.ts';
import type { Bench } from '../../../../../shared/layouts/edits.ts';
import type { Frame } from '../../../../../shared/layouts/layout.ts';
import { edgeField, strongestSnap, type EdgeField, type Snap } from '../../../../../shared/layouts/snap.ts';
import { plainTurnRad, turnStepRad } from '../../../../../shared/layouts/turn.ts';
import { type Designs, wallOutline } from '../state/designs.ts';

/** Most a frame is turned to lie along a neighbour while it is carried. */
const mostTurnRad = (20 * Math.PI) / 180;
/** How near (screen px) a snap takes hold, and how near a whole step a turn does (radians). */
export const snapReachPx = 18;
const turnHoldRad = (4 * Math.PI) / 180;

/** Frames taken up by the hand, and the edges of those that stay. */
export interface Carry {
  /** The frame under the hand: the one that snaps. */
  leadId: string;
  start: ReadonlyMap<string, Frame>;
  from: Point;
  field: EdgeField;
}

export interface Carried {
  placements: ReadonlyMap<string, Placement>;
  snap: Snap | null;
}

/** The frame at a point of the wall, the last drawn first; null where there is none. Frames with a hole are taken by their hole too. */
export function frameAt(frames: readonly Frame[], designs: Designs, at: Point): Frame | null {
  for (let i = frames.length - 1; i >= 0; i--) {
    const frame = frames[i]!;
    const reach = designs.get(frame.patternId)?.radiusMm ?? 0;
    if (Math.abs(frame.xMm - at.x) > reach || Math.abs(frame.yMm - at.y) > reach) continue;
    const outline = wallOutline(frame, designs);
    if (outline && contains(outline, at)) return frame;
  }
  return null;
}

/** The edges of all frames but those held. */
export function fieldWithout(bench: Bench, designs: Designs, held: readonly string[]): EdgeField {
  const out = new Set(held);
  return edgeField(
    bench.frames.flatMap((frame) => {
      const outline = out.has(frame.id) ? null : wallOutline(frame, designs);
      return outline ? [{ frameId: frame.id, outline }] : [];
    }),
  );
}

/** Takes up frames at a point; null where all of them are locked. */
export function takeUp(bench: Bench, designs: Designs, leadId: string, ids: readonly string[], from: Point): Carry | null {
  const held = bench.frames.filter((f) => ids.includes(f.id) && !f.locked);
  const lead = held.find((f) => f.id === leadId);
  if (!lead) return null;
  return { leadId, start: new Map(held.map((f) => [f.id, f])), from, field: fieldWithout(bench, designs, held.map((f) => f.id)) };
}

/** Where carried frames are with the hand at `to`. One frame alone may be turned by a snap; several keep their turns. */
export function carried(carry: Carry, designs: Designs, to: Point, how: { revealMm: number; reachMm: number; snapping: boolean }): Carried {
  let dx = to.x - carry.from.x;
  let dy = to.y - carry.from.y;
  const lead = carry.start.get(carry.leadId)!;
  const outline = designs.get(lead.patternId)?.outline;
  const alone = carry.start.size === 1;
  let turn = 0;
  let snap: Snap | null = null;
  if (how.snapping && outline) {
    const held = { xMm: lead.xMm + dx, yMm: lead.yMm + dy, turnRad: lead.turnRad, flipped: lead.flipped };
    snap = strongestSnap(carry.field, { outline, placement: held, revealMm: how.revealMm, reachMm: how.reachMm, maxTurnRad: alone ? mostTurnRad : 0 });
    if (snap) {
      dx = snap.placement.xMm - lead.xMm;
      dy = snap.placement.yMm - lead.yMm;
      turn = snap.turnedRad;
    }
  }
  const placements = new Map<string, Placement>();
  for (const frame of carry.start.values()) {
    placements.set(frame.id, { xMm: frame.xMm + dx, yMm: frame.yMm + dy, turnRad: frame.turnRad + turn, flipped: frame.flipped });
  }
  return { placements, snap };
}

/** A frame turned by its handle: it looks to where the hand is, and takes hold at whole steps. */
export function turnedTo(frame: Frame, designs: Designs, to: Point, snapping: boolean): Placement {
  const centre = { x: frame.xMm, y: frame.yMm };
  const place: Placement = { xMm: frame.xMm, yMm: frame.yMm, turnRad: frame.turnRad, flipped: frame.flipped };
  if (distance(centre, to) < 1e-6) return place;
  const turnRad = Math.atan2(to.y - centre.y, to.x - centre.x) - Math.PI / 2;
  const step = turnStepRad(designs.get(frame.patternId)?.outline.length ?? 6);
  const whole = Math.round(turnRad / step) * step;
  return { ...place, turnRad: plainTurnRad(snapping && Math.abs(turnRad - whole) < turnHoldRad ? whole : turnRad) };
}

/** Where the turn handle of a frame stands, on the wall: over its top corner as it is turned. */
export function turnHandle(placement: Placement, radiusMm: number, scale: number): Point {
  const away = radiusMm + 26 / scale;
  return { x: placement.xMm - away * Math.sin(placement.turnRad), y: placement.yMm + away * Math.cos(placement.turnRad) };
}
