import Flatbush from 'flatbush';
import { boxOf, sidesOf, type Box, type Point, type Polygon } from '../geometry/polygon.ts';

/** A frame that stays where it is while another is moved: its outline on the wall, counter-clockwise, convex, mm. */
export interface Neighbour {
  frameId: string;
  outline: Polygon;
}

/** One side of a frame on the wall. */
export interface Edge {
  frameId: string;
  number: number;
  a: Point;
  /** Direction along the edge and its length; the frame lies on the left. */
  ux: number;
  uy: number;
  length: number;
  /** Outward from the frame at `a`, halfway between its two edges there; a unit vector. */
  tipX: number;
  tipY: number;
}

/** The edges of all frames that stay, in a spatial index. Built once when a drag begins. */
export interface EdgeField {
  neighbours: readonly Neighbour[];
  edges: readonly Edge[];
  near: (box: Box) => Edge[];
  frames: (box: Box) => Neighbour[];
}

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

export function grown({ left, bottom, right, top }: Box, by: number): Box {
  return { left: left - by, bottom: bottom - by, right: right + by, top: top + by };
}

/** The sides of an outline, in its order. */
export function edgesOf(frameId: string, outline: Polygon): Edge[] {
  const sides = sidesOf(outline).map(({ from, to }) => {
    const length = Math.hypot(to.x - from.x, to.y - from.y);
    return { a: from, ux: (to.x - from.x) / length, uy: (to.y - from.y) / length, length };
  });
  return sides.map((side, number) => {
    const before = sides[(number + sides.length - 1) % sides.length]!;
    const nx = before.uy + side.uy;
    const ny = -before.ux - side.ux;
    const size = Math.hypot(nx, ny) || 1;
    return { frameId, number, ...side, tipX: nx / size, tipY: ny / size };
  });
}
