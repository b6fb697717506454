import type { Point } from '../../../shared/walls/homography.ts';

/** What can be drawn on the wall. */
export const tools = ['stud', 'box', 'polygon', 'zone', 'check'] as const;
export type Tool = (typeof tools)[number];

/** A drawing under way: the points set so far, and where the crosshair (or the pointer) is; wall mm. */
export interface Drawing {
  tool: Tool;
  points: readonly Point[];
  at: Point;
}

/** What a finished drawing is. */
export type Drawn =
  | { kind: 'stud'; xMm: number }
  | { kind: 'box'; leftMm: number; bottomMm: number; widthMm: number; heightMm: number }
  | { kind: 'polygon'; corners: [number, number][] }
  | { kind: 'zone'; fromMm: number; toMm: number }
  | { kind: 'check'; a: Point; b: Point };

export const begunWith = (tool: Tool, at: Point): Drawing => ({ tool, points: [], at });

const whole = (p: Point): Point => ({ x: Math.round(p.x), y: Math.round(p.y) });
/** A box or stretch thinner than this is a slip of the hand, mm. */
const leastMm = 5;

/**
 * Sets a point. A stud is done with one, a box, a stretch and a check with two; a polygon closes on its first point, within
 * `nearMm`. Points are whole millimetres, but for a check, which reads what the picture shows.
 */
export function pressed(drawing: Drawing, point: Point, nearMm: number): { drawing: Drawing; drawn: Drawn | null } {
  const at = drawing.tool === 'check' ? point : whole(point);
  const anew: Drawing = { ...drawing, points: [], at };
  const first = drawing.points[0];
  if (drawing.tool === 'stud') return { drawing: anew, drawn: { kind: 'stud', xMm: at.x } };
  if (!first) return { drawing: { ...anew, points: [at] }, drawn: null };
  if (drawing.tool === 'polygon') {
    if (drawing.points.length >= 3 && Math.hypot(at.x - first.x, at.y - first.y) <= nearMm) return closed(drawing);
    return { drawing: { ...drawing, at, points: [...drawing.points, at] }, drawn: null };
  }
  const drawn = between(drawing.tool, first, at);
  return drawn ? { drawing: anew, drawn } : { drawing: { ...drawing, at }, drawn: null };
}

/** A polygon closed with the corners it has; three at least. */
export function closed(drawing: Drawing): { drawing: Drawing; drawn: Drawn | null } {
  if (drawing.tool !== 'polygon' || drawing.points.length < 3) return { drawing, drawn: null };
  return { drawing: { ...drawing, points: [] }, drawn: { kind: 'polygon', corners: drawing.points.map(({ x, y }) => [x, y]) } };
}

/** The point set last taken back. */
export const unpressed = (drawing: Drawing): Drawing => ({ ...drawing, points: drawing.points.slice(0, -1) });

function between(tool: 'box' | 'zone' | 'check', a: Point, b: Point): Drawn | null {
  const [leftMm, bottomMm] = [Math.min(a.x, b.x), Math.min(a.y, b.y)];
  const [widthMm, heightMm] = [Math.abs(a.x - b.x), Math.abs(a.y - b.y)];
  switch (tool) {
    case 'box':
      return widthMm < leastMm || heightMm < leastMm ? null : { kind: 'box', leftMm, bottomMm, widthMm, heightMm };
    case 'zone':
      return widthMm < leastMm ? null : { kind: 'zone', fromMm: leftMm, toMm: leftMm + widthMm };
    case 'check':
      return Math.hypot(widthMm, heightMm) < leastMm ? null : { kind: 'check', a, b };
  }
}
