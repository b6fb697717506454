import { distance, middle, type Point } from '../geometry/point.ts';
import { boxOf, centroid, cornerAt, counterClockwise, crossesItself, exteriorAngles, moved, sidesOf, signedArea } from '../geometry/polygon.ts';
import type { Shape } from './shape.ts';

/** A shape that cannot be made a frame of: which field of it is wrong, and why. */
export class ShapeError extends Error {
  override readonly name = 'ShapeError';
  /** Path inside the shape, such as `['verticesMm', 2]`. */
  readonly path: readonly (string | number)[];

  constructor(path: readonly (string | number)[], words: string) {
    super(words);
    this.path = path;
  }
}

/** Corners closer than this and bends below half a degree are no corners that a shop could cut. */
const shortestSideMm = 20;
const leastBendRad = Math.PI / 360;

/**
 * Corners of a shape's outer faces, mm: counter-clockwise, centre of area at (0, 0), the lowest side first (running to the right) and
 * level where the shape has a level side. Throws a ShapeError where the shape does not close, is concave, crosses itself or has no body.
 */
export function outlineOf(shape: Shape): Point[] {
  let known = outlines.get(shape);
  if (!known) outlines.set(shape, (known = freshOutline(shape)));
  return known;
}

/** Shapes are never changed in place, and every check of a moving frame asks for its outline again. */
const outlines = new WeakMap<Shape, Point[]>();

function freshOutline(shape: Shape): Point[] {
  const corners = shape.kind === 'free' ? freeCorners(shape.verticesMm) : readyCorners(shape);
  const centre = centroid(corners);
  return lowestSideFirst(moved(corners, -centre.x, -centre.y));
}

function needLength(shape: object, fields: readonly string[]): void {
  for (const field of fields) {
    const value = (shape as Record<string, unknown>)[field];
    if (typeof value !== 'number' || !Number.isFinite(value) || value <= 0) throw new ShapeError([field], `${fieldWords[field] ?? field} must be a length above zero, not ${String(value)}.`);
  }
}

const fieldWords: Record<string, string> = {
  sideMm: 'The side', stretchMm: 'The level side', upperMm: 'The upper side', lowerMm: 'The lower side', widthMm: 'The width', baseMm: 'The base',
  topMm: 'The top', heightMm: 'The height', aMm: 'Side a', bMm: 'Side b', cMm: 'Side c',
};

function readyCorners(shape: Exclude<Shape, { kind: 'free' }>): Point[] {
  needLength(shape, Object.keys(shape).filter((field) => field.endsWith('Mm')));
  switch (shape.kind) {
    case 'regular':
      return regularCorners(shape.sides, shape.sideMm);
    case 'stretched hexagon': {
      const rise = (shape.sideMm * Math.sqrt(3)) / 2;
      const half = shape.stretchMm / 2;
      const wide = half + shape.sideMm / 2;
      return ring([-half, -rise], [half, -rise], [wide, 0], [half, rise], [-half, rise], [-wide, 0]);
    }
    case 'half hexagon': {
      const s = shape.sideMm;
      const rise = (s * Math.sqrt(3)) / 2;
      return ring([-s, 0], [s, 0], [s / 2, rise], [-s / 2, rise]);
    }
    case 'rhombus': {
      const { sideMm: s, angleRad } = shape;
      if (!(angleRad >= 2 * leastBendRad && angleRad <= Math.PI - 2 * leastBendRad)) throw new ShapeError(['angleRad'], 'At this angle the rhombus has no body: it must be between 1° and 179°.');
      const over = s * Math.cos(angleRad);
      const rise = s * Math.sin(angleRad);
      return ring([0, 0], [s, 0], [s + over, rise], [over, rise]);
    }
    case 'kite':
      return kiteCorners(shape.upperMm, shape.lowerMm, shape.widthMm);
    case 'trapezoid':
      return ring([-shape.baseMm / 2, 0], [shape.baseMm / 2, 0], [shape.topMm / 2, shape.heightMm], [-shape.topMm / 2, shape.heightMm]);
    case 'rectangle':
      return ring([0, 0], [shape.widthMm, 0], [shape.widthMm, shape.heightMm], [0, shape.heightMm]);
    case 'triangle':
      return triangleCorners(shape.aMm, shape.bMm, shape.cMm);
  }
}

const ring = (...corners: [number, number][]): Point[] => corners.map(([x, y]) => ({ x, y }));

function regularCorners(sides: number, sideMm: number): Point[] {
  if (!Number.isInteger(sides) || sides < 3 || sides > 12) throw new ShapeError(['sides'], `A frame has 3 to 12 sides, not ${sides}.`);
  const reach = sideMm / (2 * Math.sin(Math.PI / sides));
  return Array.from({ length: sides }, (_, k) => {
    const angle = -Math.PI / 2 + ((2 * k - 1) * Math.PI) / sides;
    return { x: reach * Math.cos(angle), y: reach * Math.sin(angle) };
  });
}

function kiteCorners(upper: number, lower: number, width: number): Point[] {
  for (const [field, side] of [['upperMm', upper], ['lowerMm', lower]] as const) {
    if (2 * side <= width) throw new ShapeError([field], `Two sides of ${tell(side)} do not reach across a width of ${tell(width)}: the kite does not close.`);
  }
  const up = Math.sqrt(upper ** 2 - (width / 2) ** 2);
  const down = Math.sqrt(lower ** 2 - (width / 2) ** 2);
  const corners = ring([0, -down], [width / 2, 0], [0, up], [-width / 2, 0]);
  if (exteriorAngles(corners).some((bend) => bend < leastBendRad)) throw new ShapeError(['widthMm'], 'At this width the sides of the kite run straight on: take it narrower.');
  return corners;
}

function triangleCorners(a: number, b: number, c: number): Point[] {
  const fields = [['aMm', a, b + c], ['bMm', b, c + a], ['cMm', c, a + b]] as const;
  for (const [field, side, others] of fields) {
    if (side >= others) throw new ShapeError([field], `A side of ${tell(side)} is not shorter than the two others together (${tell(others)}): the triangle does not close.`);
  }
  const x = (a * a + c * c - b * b) / (2 * a);
  const corners = ring([0, 0], [a, 0], [x, Math.sqrt(Math.max(0, c * c - x * x))]);
  if (exteriorAngles(corners).some((bend) => bend < leastBendRad)) throw new ShapeError(['aMm'], 'These three sides lie all but in one line: the triangle has no body.');
  return corners;
}

const tell = (mm: number): string => `${Math.round(mm * 10) / 10} mm`;

function freeCorners(vertices: readonly (readonly [number, number])[]): Point[] {
  const at = (index: number) => ['verticesMm', index] as const;
  if (vertices.length < 3 || vertices.length > 12) throw new ShapeError(['verticesMm'], `A frame has 3 to 12 corners, not ${vertices.length}.`);
  const drawn = vertices.map(([x, y], i) => {
    if (!Number.isFinite(x) || !Number.isFinite(y)) throw new ShapeError(at(i), `Corner ${i + 1} has a coordinate that is not a number.`);
    return { x, y };
  });
  drawn.forEach((corner, i) => {
    if (distance(corner, cornerAt(drawn, i + 1)) < shortestSideMm) throw new ShapeError(at(i), `Corner ${i + 1} is less than ${shortestSideMm} mm from the next one.`);
  });
  if (crossesItself(drawn)) throw new ShapeError(['verticesMm'], 'The outline crosses itself: give the corners in their order round the frame.');
  const clockwise = signedArea(drawn) < 0;
  const bends = exteriorAngles(drawn).map((bend) => (clockwise ? -bend : bend));
  bends.forEach((bend, i) => {
    if (bend < -1e-9) throw new ShapeError(at(i), `Corner ${i + 1} points inwards: a frame's outline must be convex.`);
    if (bend < leastBendRad) throw new ShapeError(at(i), `The outline runs straight on at corner ${i + 1}: leave that corner out.`);
    if (bend > Math.PI - 2 * leastBendRad) throw new ShapeError(at(i), `Corner ${i + 1} folds back on itself.`);
  });
  const whole = bends.reduce((sum, bend) => sum + bend, 0);
  if (Math.abs(whole - 2 * Math.PI) > 1e-6) throw new ShapeError(['verticesMm'], 'The outline goes round more than once: give the corners in their order round the frame.');
  return counterClockwise(drawn);
}

/** Starts the ring at its lowest side; of two equally low ones, at the one that starts lower. */
function lowestSideFirst(corners: Point[]): Point[] {
  const { bottom, top } = boxOf(corners);
  const equal = (top - bottom) * 1e-9;
  let first = 0;
  sidesOf(corners).forEach((side, i, sides) => {
    const best = sides[first]!;
    const lower = middle(best.from, best.to).y - middle(side.from, side.to).y;
    if (lower > equal || (lower > -equal && best.from.y - side.from.y > equal)) first = i;
  });
  return corners.map((_, i) => cornerAt(corners, i + first));
}
