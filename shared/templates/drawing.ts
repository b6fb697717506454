import type { Point } from '../geometry/point.ts';

/** Drawings as data, in mm, y up: whatever pen draws them (PDF, SVG, DXF) adds nothing of its own. */

export interface Rect {
  x: number;
  y: number;
  width: number;
  height: number;
}

/** Theme colours by name; each pen knows what they look like on its medium. */
export type Colour = 'ink' | 'grey' | 'chalk' | 'brass' | 'madder' | 'pale madder' | 'rule' | 'white';

/** What a primitive belongs to; pens that know layers keep them apart, the others ignore them. */
export type Layer = 'state' | 'studs' | 'wall' | 'outlines' | 'datums' | 'screws' | 'labels' | 'joins' | 'scale' | 'title' | 'front';

export interface Stroke {
  colour: Colour;
  widthMm: number;
  /** Dash and gap lengths by turns, mm; solid when left out. */
  dashMm?: number[];
}

export type Weight = 'regular' | 'bold';

export interface Text {
  kind: 'text';
  layer: Layer;
  /** Where the anchor stands on the baseline. */
  at: Point;
  text: string;
  /** Type size (em), mm. */
  sizeMm: number;
  anchor: 'start' | 'middle' | 'end';
  /** Counter-clockwise about `at`. */
  turnRad: number;
  colour: Colour;
  weight: Weight;
  /** The pen sets smaller type when the text would be wider than this. */
  maxWidthMm?: number;
}

export type Primitive =
  | { kind: 'line'; layer: Layer; from: Point; to: Point; stroke: Stroke }
  | { kind: 'polyline'; layer: Layer; points: Point[]; closed: boolean; stroke: Stroke | null; fill: Colour | null }
  | { kind: 'circle'; layer: Layer; centre: Point; radiusMm: number; stroke: Stroke | null; fill: Colour | null }
  | Text
  | { kind: 'clip'; rect: Rect; items: Primitive[] };

/** One page: its size and all that stands on it, from its lower left corner. */
export interface Page {
  name: string;
  widthMm: number;
  heightMm: number;
  items: Primitive[];
}

export function line(layer: Layer, from: Point, to: Point, stroke: Stroke): Primitive {
  return { kind: 'line', layer, from, to, stroke };
}

export function polygon(layer: Layer, points: Point[], stroke: Stroke | null, fill: Colour | null = null): Primitive {
  return { kind: 'polyline', layer, points, closed: true, stroke, fill };
}

export function rectangle(layer: Layer, rect: Rect, stroke: Stroke | null, fill: Colour | null = null): Primitive {
  return polygon(layer, cornersOf(rect), stroke, fill);
}

export function circle(layer: Layer, centre: Point, radiusMm: number, stroke: Stroke | null, fill: Colour | null = null): Primitive {
  return { kind: 'circle', layer, centre, radiusMm, stroke, fill };
}

/** Text from its left end, regular, level and in ink unless told otherwise. */
export function text(layer: Layer, at: Point, words: string, sizeMm: number, more: Partial<Text> = {}): Text {
  return { kind: 'text', layer, at, text: words, sizeMm, anchor: 'start', turnRad: 0, colour: 'ink', weight: 'regular', ...more };
}

/** Corners counter-clockwise from the lower left. */
export function cornersOf(rect: Rect): Point[] {
  const right = rect.x + rect.width;
  const top = rect.y + rect.height;
  return [{ x: rect.x, y: rect.y }, { x: right, y: rect.y }, { x: right, y: top }, { x: rect.x, y: top }];
}

export function holds(rect: Rect, point: Point, inset = 0): boolean {
  return (
    point.x >= rect.x + inset && point.x <= rect.x + rect.width - inset &&
    point.y >= rect.y + inset && point.y <= rect.y + rect.height - inset
  );
}
