import { overlapDepth } from '../geometry/polygon-distance.ts';
import { boxOf, placedAll, type Placement, type Point, type Polygon } from '../geometry/polygon.ts';
import { edgesOf, grown, type Edge, type EdgeField } from './snap-edges.ts';

export { edgeField, type EdgeField, type Neighbour } from './snap-edges.ts';

export interface SnapAsk {
  /** Outline of the moved frame about its own centroid, as its pattern gives it; counter-clockwise, convex. */
  outline: Polygon;
  /** Outlines of more frames, about the same point, that move with it as one body. */
  body?: readonly Polygon[];
  /** Where the hand holds it. */
  placement: Placement;
  revealMm: number;
  /** How far the frame may jump. */
  reachMm: number;
  /** How far it may be turned to lie along a neighbour; 0 snaps only edges that are parallel already. */
  maxTurnRad: number;
}

/**
 * How the frame sits along the shared edge: a corner opposite a corner, at the reveal from a second frame too, or
 * anywhere. 'tip' shares no edge: a corner points at a corner.
 */
export type SnapFit = 'corner' | 'second frame' | 'along' | 'tip';

export interface Snap {
  placement: Placement;
  fit: SnapFit;
  /** Which outline of the body meets (0 is the first), and its edge and the neighbour's that face each other; for a tip, the corners they begin at. */
  outline: number;
  edge: number;
  frameId: string;
  neighbourEdge: number;
  /** From where the hand holds the centroid to where the snap puts it, mm. */
  distanceMm: number;
  /** Turn that the snap adds, radians, counter-clockwise. */
  turnedRad: number;
  /** The stretch of the neighbour's edge, at half the reveal, that both frames share. */
  guide: { from: Point; to: Point };
}

/** Edges closer to parallel than this count as parallel already, radians. */
const PARALLEL = 1e-9;
/** Two frames share an edge only where their edges face each other over at least this share of the shorter one. */
const LEAST_SHARE = 0.1;
/** A corner points at another where the angle between their ways out is more than 120° (its cosine under this). */
const FACING = -0.5;

/** One outline of what the hand holds, and the edges it could meet. */
interface Part {
  outline: Polygon;
  held: Polygon;
  edges: readonly Edge[];
  near: readonly Edge[];
}

function partsOf(field: EdgeField, { outline, body = [], placement }: SnapAsk, reachOf: (outline: Polygon) => number): Part[] {
  return [outline, ...body].map((own) => {
    const held = placedAll(own, placement);
    return { outline: own, held, edges: edgesOf('', held), near: field.near(grown(boxOf(held), reachOf(own))) };
  });
}

const radiusOf = (outline: Polygon) => Math.max(...outline.map((p) => Math.hypot(p.x, p.y)));

/** Most places tried before a crowded spot is left without a snap. */
const mostTried = 80;

/**
 * The strongest snap for a frame, or a body of frames, held near others; null where none is in reach. Edges are laid
 * parallel and at the reveal; along the shared edge the frame takes, where one is in reach, the place at which corners
 * face each other or at which a second frame is met at the reveal too. No snap makes frames overlap.
 */
export function strongestSnap(field: EdgeField, ask: SnapAsk): Snap | null {
  const parts = partsOf(field, ask, (own) => ask.revealMm + ask.reachMm + (ask.maxTurnRad > 0 ? radiusOf(own) * Math.min(ask.maxTurnRad, 1) : 0));
  const radius = radiusOf(ask.outline);
  const found: { snap: Snap; cost: number }[] = [];
  const leastFacing = Math.cos(Math.max(ask.maxTurnRad, PARALLEL)) - 1e-12;
  const seconds = secondsOf(parts, ask);
  parts.forEach((part, outline) => {
    for (const theirs of part.near) {
      for (const own of part.edges) {
        if (facing(own, theirs) < leastFacing) continue;
        const toFace = turnToFace(own, theirs);
        // Rounding is no turn: a frame that lies parallel keeps its turn to the last digit.
        const turn = Math.abs(toFace) < PARALLEL / 10 ? 0 : toFace;
        if (Math.abs(turn) > Math.max(ask.maxTurnRad, PARALLEL)) continue;
        for (const { snap, jump } of snapsOnto(theirs, part, outline, own.number, turn, ask, seconds)) {
          const ease = { 'second frame': 0.6, corner: 0.5, along: 0, tip: 0 }[snap.fit] * ask.reachMm;
          found.push({ snap, cost: jump + 0.25 * radius * Math.abs(turn) - ease });
        }
      }
    }
  });
  return strongestOf(found, field, parts);
}

/** The nearest snap of a corner that points at a neighbour's corner, the reveal between them; null where none is in reach. */
export function strongestTip(field: EdgeField, ask: SnapAsk): Snap | null {
  const parts = partsOf(field, ask, () => ask.revealMm + ask.reachMm);
  const found: { snap: Snap; cost: number }[] = [];
  parts.forEach((part, outline) => {
    for (const own of part.edges) {
      for (const theirs of part.near) {
        if (own.tipX * theirs.tipX + own.tipY * theirs.tipY > FACING) continue;
        const to = { x: theirs.a.x + theirs.tipX * ask.revealMm, y: theirs.a.y + theirs.tipY * ask.revealMm };
        const jump = Math.hypot(to.x - own.a.x, to.y - own.a.y);
        if (jump > ask.reachMm) continue;
        const placement = { ...ask.placement, xMm: ask.placement.xMm + to.x - own.a.x, yMm: ask.placement.yMm + to.y - own.a.y };
        found.push({
          cost: jump,
          snap: { placement, fit: 'tip', outline, edge: own.number, frameId: theirs.frameId, neighbourEdge: theirs.number, distanceMm: jump, turnedRad: 0, guide: { from: theirs.a, to } },
        });
      }
    }
  });
  return strongestOf(found, field, parts);
}

/** By cost to the millionth of a millimetre; of two that are as near, the same one whatever the order in which they were met: the lower, then the one to the left. */
function nearer(p: { snap: Snap; cost: number }, q: { snap: Snap; cost: number }): number {
  const [a, b] = [p.snap.placement, q.snap.placement];
  return Math.round(p.cost * 1e6) - Math.round(q.cost * 1e6) || Math.round((a.yMm - b.yMm) * 1e6) || Math.round((a.xMm - b.xMm) * 1e6) || a.turnRad - b.turnRad;
}

function strongestOf(found: { snap: Snap; cost: number }[], field: EdgeField, parts: readonly Part[]): Snap | null {
  found.sort((p, q) => nearer(p, q));
  const outlines = parts.map((p) => p.outline);
  const refused: Placement[] = [];
  for (const { snap } of found.slice(0, mostTried)) {
    // Edges in one line with one another lead to the same place.
    if (refused.some((r) => Math.abs(r.xMm - snap.placement.xMm) < 1e-9 && Math.abs(r.yMm - snap.placement.yMm) < 1e-9 && Math.abs(r.turnRad - snap.placement.turnRad) < 1e-12)) continue;
    if (isClear(field, outlines, snap.placement)) return snap;
    refused.push(snap.placement);
  }
  return null;
}

/** How squarely an edge faces another: the cosine of the turn between, 1 where they are parallel and opposite. */
const facing = (own: Edge, theirs: Edge) => -own.ux * theirs.ux - own.uy * theirs.uy;

/** Turn, within half a circle either way, after which an edge runs opposite to the neighbour's. */
function turnToFace(own: Edge, theirs: Edge): number {
  const cross = own.ux * -theirs.uy - own.uy * -theirs.ux;
  const dot = own.ux * -theirs.ux + own.uy * -theirs.uy;
  return Math.atan2(cross, dot);
}

function snapsOnto(theirs: Edge, part: Part, outline: number, number: number, turn: number, ask: SnapAsk, seconds: Seconds): { snap: Snap; jump: number }[] {
  const turnRad = ask.placement.turnRad + turn;
  const turned = turn === 0 ? part.held : placedAll(part.outline, { ...ask.placement, turnRad });
  const p = turned[number]!;
  const q = turned[(number + 1) % turned.length]!;
  // Outward from the neighbour: its edge runs counter-clockwise, so outside is on the right.
  const nx = theirs.uy;
  const ny = -theirs.ux;
  const away = ask.revealMm - (((p.x + q.x) / 2 - theirs.a.x) * nx + ((p.y + q.y) / 2 - theirs.a.y) * ny);
  if (Math.abs(away) > ask.reachMm) return [];

  const low = (q.x - theirs.a.x) * theirs.ux + (q.y - theirs.a.y) * theirs.uy;
  const high = (p.x - theirs.a.x) * theirs.ux + (p.y - theirs.a.y) * theirs.uy;
  // However it slides, it would not come to lie beside this edge.
  if (high + ask.reachMm < 0 || low - ask.reachMm > theirs.length) return [];
  const slides: { slide: number; fit: SnapFit }[] = [
    { slide: 0, fit: 'along' },
    { slide: -low, fit: 'corner' },
    { slide: theirs.length - high, fit: 'corner' },
  ];
  for (const slide of slidesToSecond(seconds(turn), away * nx, away * ny, theirs, ask)) slides.push({ slide, fit: 'second frame' });
  const shorter = Math.min(high - low, theirs.length);
  const half = ask.revealMm / 2;
  const snaps: { snap: Snap; jump: number }[] = [];
  for (const { slide, fit } of slides) {
    const from = Math.max(0, low + slide);
    const to = Math.min(theirs.length, high + slide);
    const jump = Math.hypot(away, slide);
    if (jump > ask.reachMm || to - from < shorter * LEAST_SHARE) continue;
    const placement = {
      ...ask.placement,
      xMm: ask.placement.xMm + away * nx + slide * theirs.ux,
      yMm: ask.placement.yMm + away * ny + slide * theirs.uy,
      turnRad,
    };
    snaps.push({
      jump,
      snap: {
        placement, fit, outline, edge: number, frameId: theirs.frameId, neighbourEdge: theirs.number, distanceMm: jump, turnedRad: turn,
        guide: {
          from: { x: theirs.a.x + theirs.ux * from + nx * half, y: theirs.a.y + theirs.uy * from + ny * half },
          to: { x: theirs.a.x + theirs.ux * to + nx * half, y: theirs.a.y + theirs.uy * to + ny * half },
        },
      },
    });
  }
  return snaps;
}

/** Pairs of an own edge, as turned, and an edge of a neighbour parallel to it: what could meet as a second frame. */
type Seconds = (turn: number) => readonly { own: Edge; second: Edge }[];

/** The pairs for each turn, worked out once: the edges of one neighbour mostly ask for the same few turns. */
function secondsOf(parts: readonly Part[], ask: SnapAsk): Seconds {
  const known = new Map<number, { own: Edge; second: Edge }[]>();
  return (turn) => {
    // Turns that differ by rounding are one.
    const key = Math.round(turn / PARALLEL);
    let pairs = known.get(key);
    if (!pairs) {
      pairs = [];
      for (const part of parts) {
        if (part.near.length === 0) continue;
        const edges = turn === 0 ? part.edges : edgesOf('', placedAll(part.outline, { ...ask.placement, turnRad: ask.placement.turnRad + turn }));
        for (const own of edges) {
          for (const second of part.near) {
            if (facing(own, second) > 0 && Math.abs(own.ux * second.uy - own.uy * second.ux) <= PARALLEL) pairs.push({ own, second });
          }
        }
      }
      known.set(key, pairs);
    }
    return pairs;
  };
}

/** Slides along one neighbour's edge, within reach, that bring another edge to the reveal from a second frame. */
function slidesToSecond(pairs: ReturnType<Seconds>, dx: number, dy: number, along: Edge, { revealMm, reachMm }: SnapAsk): number[] {
  const slides: number[] = [];
  for (const { own, second } of pairs) {
    if (second.frameId === along.frameId) continue;
    const nx = second.uy;
    const ny = -second.ux;
    const rate = along.ux * nx + along.uy * ny;
    if (Math.abs(rate) < 1e-3) continue;
    const gap = (own.a.x + dx - second.a.x) * nx + (own.a.y + dy - second.a.y) * ny;
    const slide = (revealMm - gap) / rate;
    if (Math.abs(slide) > reachMm) continue;
    const at = (own.a.x + dx + along.ux * slide - second.a.x) * second.ux + (own.a.y + dy + along.uy * slide - second.a.y) * second.uy;
    const shared = Math.min(second.length, at) - Math.max(0, at - own.length);
    if (shared >= LEAST_SHARE * Math.min(own.length, second.length)) slides.push(slide);
  }
  return slides;
}

/** Whether outlines, where a placement puts them, lie over no frame that stays. */
export function isClear(field: EdgeField, outlines: readonly Polygon[], placement: Placement): boolean {
  return outlines.every((own) => {
    const outline = placedAll(own, placement);
    return field.frames(boxOf(outline)).every((n) => overlapDepth(outline, n.outline) <= 1e-6);
  });
}
