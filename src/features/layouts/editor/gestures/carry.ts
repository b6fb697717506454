import { distance } from '../../../../../shared/geometry/point.ts';
import { contains, moved, type Placement, type Point } from '../../../../../shared/geometry/polygon.ts';
import type { Bench } from '../../../../../shared/layouts/edits.ts';
import type { Frame } from '../../../../../shared/layouts/layout.ts';
import { pictureHeightsMm } from '../../../../../shared/layouts/picture-heights.ts';
import { edgeField } from '../../../../../shared/layouts/snap.ts';
import { lineField, type LineNeeds } from '../../../../../shared/layouts/snap-lines.ts';
import { plainTurnRad, turnStepRad } from '../../../../../shared/layouts/turn.ts';
import { placedHangers } from '../../../../../shared/patterns/hangers.ts';
import { type Designs, wallOutline } from '../state/designs.ts';
import { type Holding, type How, type Settled, settleHold, type Surroundings } from './hold.ts';

/** What of a wall gives lines to lie on. */
export type CarryWall = LineNeeds['wall'];

/** Most a frame is turned to lie along a neighbour while it is carried. */
const mostTurnRad = (20 * Math.PI) / 180;
/** How near (screen px) a snap takes hold, and how near a whole step a turn does (radians). */
export const snapReachPx = 18;
const turnHoldRad = (4 * Math.PI) / 180;

/** Frames taken up by the hand, and all they could lie along. */
export interface Carry {
  /** The frame under the hand. */
  leadId: string;
  start: ReadonlyMap<string, Frame>;
  from: Point;
  around: Surroundings;
  holding: Holding | null;
}

export interface Carried extends Pick<Settled, 'snap' | 'lines' | 'offered'> {
  placements: ReadonlyMap<string, Placement>;
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

/** What all frames but those held are to what is held; `wall` gives the lines, where it is known. */
export function surroundings(bench: Bench, designs: Designs, held: readonly string[], wall: CarryWall | null): Surroundings {
  const out = new Set(held);
  const staying = bench.frames.filter((f) => !out.has(f.id) && designs.has(f.patternId));
  return {
    edges: edgeField(staying.map((frame) => ({ frameId: frame.id, outline: wallOutline(frame, designs)! }))),
    lines: wall && lineField({ wall, middles: staying.map((f) => ({ frameId: f.id, at: { x: f.xMm, y: f.yMm } })), datumsMm: pictureHeightsMm }),
  };
}

/** Takes up frames at a point; null where all of them are locked. */
export function takeUp(bench: Bench, designs: Designs, leadId: string, ids: readonly string[], from: Point, wall: CarryWall | null = null): Carry | null {
  const chosen = new Set(ids);
  const held = bench.frames.filter((f) => chosen.has(f.id) && !f.locked);
  const lead = held.find((f) => f.id === leadId);
  if (!lead) return null;
  return { leadId, start: new Map(held.map((f) => [f.id, f])), from, around: surroundings(bench, designs, held.map((f) => f.id), wall), holding: holdingOf(lead, held, designs) };
}

/** One frame is held as its pattern gives it, and may be turned; several as they stand on the wall, about the middle of the one under the hand. */
function holdingOf(lead: Frame, held: readonly Frame[], designs: Designs): Holding | null {
  const pattern = designs.get(lead.patternId);
  if (!pattern) return null;
  const hangers = (f: Frame) => {
    const design = designs.get(f.patternId)?.design;
    return design ? placedHangers(f, design).map(({ x, y }) => ({ x: x - lead.xMm, y: y - lead.yMm })) : [];
  };
  if (held.length === 1) {
    return { outline: pattern.outline, body: [], maxTurnRad: mostTurnRad, hangers: placedHangers({ xMm: 0, yMm: 0, turnRad: 0, flipped: false, hangerSlides: lead.hangerSlides }, pattern.design).map(({ x, y }) => ({ x, y })) };
  }
  const outlineOf = (f: Frame) => moved(wallOutline(f, designs) ?? [], -lead.xMm, -lead.yMm);
  const others = held.filter((f) => f.id !== lead.id && designs.has(f.patternId));
  return { outline: outlineOf(lead), body: others.map(outlineOf), hangers: held.flatMap(hangers), maxTurnRad: 0 };
}

/** Where carried frames are with the hand at `to`. One frame alone may be turned by a snap; several snap as one body and keep their turns. */
export function carried({ start, leadId, from, around, holding }: Carry, to: Point, how: How): Carried {
  const lead = start.get(leadId)!;
  const alone = start.size === 1;
  const as = alone ? { turnRad: lead.turnRad, flipped: lead.flipped } : { turnRad: 0, flipped: false };
  const free: Placement = { xMm: lead.xMm + to.x - from.x, yMm: lead.yMm + to.y - from.y, ...as };
  const { placement, ...why } = holding ? settleHold(around, holding, free, how) : { placement: free, snap: null, lines: [], offered: null };
  const dx = placement.xMm - lead.xMm;
  const dy = placement.yMm - lead.yMm;
  const turn = placement.turnRad - as.turnRad;
  const placements = new Map<string, Placement>();
  for (const frame of start.values()) {
    placements.set(frame.id, { xMm: frame.xMm + dx, yMm: frame.yMm + dy, turnRad: frame.turnRad + turn, flipped: frame.flipped });
  }
  return { placements, ...why };
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
