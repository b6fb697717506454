import Flatbush from 'flatbush';
import { overlapDepth } from '../geometry/polygon-distance.ts';
import { boxOf, placedAll, sidesOf, type Box, type Placement, type Point, type Polygon } from '../geometry/polygon.ts';

/** A frame that stays where it is while another is moved: its outline on the wall, counter-clockwise, convex, mm. */
export interface Neighbour {
  frameId: string;
  outline: Polygon;
}

interface Edge {
  frameId: string;
  number: number;
  a: Point;
  /** Direction along the edge and its length; the frame lies on the left. */
  ux: number;
  uy: number;
  length: number;
}

/** The edges of all frames that stay, in a spatial index. Built once when a drag begins. */
export interface EdgeField {
  neighbours: readonly Neighbour[];
  edges: readonly Edge[];
  near: (box: Box) => Edge[];
  frames: (box: Box) => Neighbour[];
}

export interface SnapAsk {
  /** Outline of the moved frame about its own centroid, as its pattern gives it; counter-clockwise, convex. */
  outline: Polygon;
  /** Where the hand holds it. */
  placement: Placement;
  revealMm: number;
  /** How far the frame may jump. */
  reachMm: number;
  /** How far it may be turned to lie along a neighbour; 0 snaps only edges that are parallel already. */
  maxTurnRad: number;
}

/** How the frame sits along the shared edge: a corner opposite a corner, at the reveal from a second frame too, or anywhere. */
export type SnapFit = 'corner' | 'second frame' | 'along';

export interface Snap {
  placement: Placement;
  fit: SnapFit;
  /** Edge of the moved outline and the neighbour's edge that face each other. */
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

/** Puts the outlines of the frames that stay into an index. */
export function edgeField(neighbours: readonly Neighbour[]): EdgeField {
  const edges = neighbours.flatMap(({ frameId, outline }) => edgesOf(frameId, outline));
  const byEdge = indexOf(edges.map((e) => boxOf([e.a, { x: e.a.x + e.ux * e.length, y: e.a.y + e.uy * e.length }])));
  const byFrame = indexOf(neighbours.map(({ outline }) => boxOf(outline)));
  return {
    neighbours,
    edges,
    near: (box) => byEdge(box).map((i) => edges[i]!),
    frames: (box) => byFrame(box).map((i) => neighbours[i]!),
  };
}

function indexOf(boxes: Box[]): (box: Box) => number[] {
  if (boxes.length === 0) return () => [];
  const index = new Flatbush(boxes.length);
  for (const { left, bottom, right, top } of boxes) index.add(left, bottom, right, top);
  index.finish();
  return ({ left, bottom, right, top }) => index.search(left, bottom, right, top);
}

function grown({ left, bottom, right, top }: Box, by: number): Box {
  return { left: left - by, bottom: bottom - by, right: right + by, top: top + by };
}

function edgesOf(frameId: string, outline: Polygon): Edge[] {
  return sidesOf(outline).map(({ from: a, to: b }, number) => {
    const length = Math.hypot(b.x - a.x, b.y - a.y);
    return { frameId, number, a, ux: (b.x - a.x) / length, uy: (b.y - a.y) / length, length };
  });
}

/**
 * The strongest snap for a frame held near others, or null where none is in reach. Edges are laid parallel and at
 * the reveal; along the shared edge the frame takes, where one is in reach, the place at which corners face each
 * other or at which a second frame is met at the reveal too. No snap makes frames overlap.
 */
export function strongestSnap(field: EdgeField, ask: SnapAsk): Snap | null {
  const radius = Math.max(...ask.outline.map((p) => Math.hypot(p.x, p.y)));
  const held = placedAll(ask.outline, ask.placement);
  const found: { snap: Snap; cost: number }[] = [];
  const search = grown(boxOf(held), ask.revealMm + ask.reachMm + radius * Math.min(ask.maxTurnRad, 1));
  const near = field.near(search);

  for (const theirs of near) {
    for (const own of edgesOf('', held)) {
      const toFace = turnToFace(own, theirs);
      // Rounding is no turn: a frame that lies parallel keeps its turn to the last digit.
      const turn = Math.abs(toFace) < PARALLEL / 10 ? 0 : toFace;
      if (Math.abs(turn) > Math.max(ask.maxTurnRad, PARALLEL)) continue;
      for (const { snap, jump } of snapsOnto(theirs, own.number, turn, ask, near)) {
        const ease = { 'second frame': 0.6, corner: 0.5, along: 0 }[snap.fit] * ask.reachMm;
        found.push({ snap, cost: jump + 0.25 * radius * Math.abs(turn) - ease });
      }
    }
  }
  found.sort((p, q) => p.cost - q.cost);
  return found.find(({ snap }) => isClear(field, ask, snap.placement))?.snap ?? null;
}

/** Turn, within half a circle either way, after which an edge runs opposite to the neighbour's. */
function turnToFace(own: Edge, theirs: Edge): number {
  const cross = own.ux * -theirs.uy - own.uy * -theirs.ux;
  const dot = own.ux * -theirs.ux + own.uy * -theirs.uy;
  return Math.atan2(cross, dot);
}

function snapsOnto(theirs: Edge, number: number, turn: number, ask: SnapAsk, near: readonly Edge[]): { snap: Snap; jump: number }[] {
  const turnRad = ask.placement.turnRad + turn;
  const turned = placedAll(ask.outline, { ...ask.placement, turnRad });
  const p = turned[number]!;
  const q = turned[(number + 1) % turned.length]!;
  // Outward from the neighbour: its edge runs counter-clockwise, so outside is on the right.
  const nx = theirs.uy;
  const ny = -theirs.ux;
  const away = ask.revealMm - (((p.x + q.x) / 2 - theirs.a.x) * nx + ((p.y + q.y) / 2 - theirs.a.y) * ny);
  if (Math.abs(away) > ask.reachMm) return [];

  const at = (s: Point) => (s.x - theirs.a.x) * theirs.ux + (s.y - theirs.a.y) * theirs.uy;
  const low = at(q);
  const high = at(p);
  const slides: { slide: number; fit: SnapFit }[] = [
    { slide: 0, fit: 'along' },
    { slide: -low, fit: 'corner' },
    { slide: theirs.length - high, fit: 'corner' },
    ...slidesToSecond(turned, away * nx, away * ny, theirs, ask.revealMm, near).map((slide) => ({ slide, fit: 'second frame' as const })),
  ];
  const shorter = Math.min(high - low, theirs.length);
  const snaps: { snap: Snap; jump: number }[] = [];
  for (const { slide, fit } of slides) {
    const from = Math.max(0, low + slide);
    const to = Math.min(theirs.length, high + slide);
    const jump = Math.hypot(away, slide);
    if (jump > ask.reachMm || to - from < shorter * LEAST_SHARE) continue;
    const half = ask.revealMm / 2;
    const onGuide = (s: number): Point => ({ x: theirs.a.x + theirs.ux * s + nx * half, y: theirs.a.y + theirs.uy * s + ny * half });
    const placement = {
      ...ask.placement,
      xMm: ask.placement.xMm + away * nx + slide * theirs.ux,
      yMm: ask.placement.yMm + away * ny + slide * theirs.uy,
      turnRad,
    };
    snaps.push({
      jump,
      snap: {
        placement, fit, edge: number, frameId: theirs.frameId, neighbourEdge: theirs.number,
        distanceMm: jump, turnedRad: turn, guide: { from: onGuide(from), to: onGuide(to) },
      },
    });
  }
  return snaps;
}

/** Slides along one neighbour's edge that bring another edge of the frame to the reveal from a second frame. */
function slidesToSecond(turned: Polygon, dx: number, dy: number, along: Edge, revealMm: number, near: readonly Edge[]): number[] {
  const slides: number[] = [];
  for (const own of edgesOf('', turned)) {
    for (const second of near) {
      if (second.frameId === along.frameId) continue;
      if (Math.abs(turnToFace(own, second)) > PARALLEL) continue;
      const nx = second.uy;
      const ny = -second.ux;
      const rate = along.ux * nx + along.uy * ny;
      if (Math.abs(rate) < 1e-3) continue;
      const gap = (own.a.x + dx - second.a.x) * nx + (own.a.y + dy - second.a.y) * ny;
      const slide = (revealMm - gap) / rate;
      const at = (own.a.x + dx + along.ux * slide - second.a.x) * second.ux + (own.a.y + dy + along.uy * slide - second.a.y) * second.uy;
      const shared = Math.min(second.length, at) - Math.max(0, at - own.length);
      if (shared >= LEAST_SHARE * Math.min(own.length, second.length)) slides.push(slide);
    }
  }
  return slides;
}

function isClear(field: EdgeField, ask: SnapAsk, placement: Placement): boolean {
  const outline = placedAll(ask.outline, placement);
  return field.frames(boxOf(outline)).every((n) => overlapDepth(outline, n.outline) <= 1e-6);
}
