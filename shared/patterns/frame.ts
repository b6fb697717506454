import { distance, type Point } from '../geometry/point.ts';
import { area, boxOf, exteriorAngles } from '../geometry/polygon.ts';
import { spanAlong } from '../geometry/polygon-distance.ts';
import { inset } from '../geometry/polygon-inset.ts';
import { grooveGeometry, type GrooveGeometry } from './groove.ts';
import { membersOf, type Member } from './members.ts';
import { outlineOf } from './outline.ts';
import type { PatternDesign } from './pattern.ts';

export interface Corner {
  index: number;
  at: Point;
  exteriorRad: number;
  interiorRad: number;
  /** Both members' bevel from square: half the exterior angle. */
  bevelRad: number;
}

/** Corner to corner, for the glue-up. */
export interface Diagonal {
  from: number;
  to: number;
  mm: number;
}

/** Distance between two parallel sides, outer face to outer face. */
export interface Flats {
  sides: [number, number];
  mm: number;
}

/** All lengths and angles of a frame, in the pattern's own coordinates: centroid of the outline at (0, 0), lowest side first. */
export interface FrameGeometry {
  thicknessMm: number;
  depthMm: number;
  outline: Point[];
  /** The outline drawn in by the thickness; empty when the members leave none. */
  opening: Point[];
  members: Member[];
  corners: Corner[];
  /** Largest bevel from square of the ring. */
  steepestBevelRad: number;
  flats: Flats[];
  /** Least distance between parallel sides; null where none are parallel. */
  acrossFlatsMm: number | null;
  /** The longest diagonal; of a triangle, its longest side. */
  acrossCornersMm: number;
  /** From every corner to every other that is not its neighbour. A triangle has none. */
  diagonals: Diagonal[];
  /** For regular frames: circle within and circle round. */
  apothemMm: number | null;
  circumradiusMm: number | null;
  widthMm: number;
  heightMm: number;
  outlineAreaMm2: number;
  openingAreaMm2: number;
  /** Face of the ring, without regard to the groove. */
  ringAreaMm2: number;
  groove: GrooveGeometry | null;
  /** False when some member has no inner face left: it cannot be built. */
  buildable: boolean;
}

/** What of a design makes its geometry. */
export type FrameForm = Pick<PatternDesign, 'shape' | 'thicknessMm' | 'depthMm' | 'groove'>;

/** Geometry of a frame. Throws a ShapeError for a shape that cannot be made; tells by `buildable` when its members are too thick. */
export function frameGeometry(design: FrameForm): FrameGeometry {
  const { shape, thicknessMm, depthMm } = design;
  const outline = outlineOf(shape);
  const members = membersOf(outline, thicknessMm);
  const opening = inset(outline, thicknessMm);
  const corners = cornersOf(outline);
  const flats = parallelSides(members, outline);
  const diagonals = diagonalsOf(outline);
  const box = boxOf(outline);
  const outlineAreaMm2 = area(outline);
  const openingAreaMm2 = area(opening);
  const regular = shape.kind === 'regular' ? { n: shape.sides, s: shape.sideMm } : null;
  return {
    thicknessMm,
    depthMm,
    outline,
    opening,
    members,
    corners,
    steepestBevelRad: Math.max(...corners.map(({ bevelRad }) => bevelRad)),
    flats,
    acrossFlatsMm: flats.length > 0 ? Math.min(...flats.map(({ mm }) => mm)) : null,
    acrossCornersMm: Math.max(...(diagonals.length > 0 ? diagonals.map(({ mm }) => mm) : members.map(({ longPointMm }) => longPointMm))),
    diagonals,
    apothemMm: regular && regular.s / (2 * Math.tan(Math.PI / regular.n)),
    circumradiusMm: regular && regular.s / (2 * Math.sin(Math.PI / regular.n)),
    widthMm: box.right - box.left,
    heightMm: box.top - box.bottom,
    outlineAreaMm2,
    openingAreaMm2,
    ringAreaMm2: outlineAreaMm2 - openingAreaMm2,
    groove: design.groove && grooveGeometry(outline, opening, thicknessMm, design.groove),
    buildable: members.every(({ shortPointMm }) => shortPointMm > 0),
  };
}

function cornersOf(outline: Point[]): Corner[] {
  return exteriorAngles(outline).map((exteriorRad, index) => ({
    index,
    at: outline[index]!,
    exteriorRad,
    interiorRad: Math.PI - exteriorRad,
    bevelRad: exteriorRad / 2,
  }));
}

function diagonalsOf(outline: Point[]): Diagonal[] {
  const n = outline.length;
  return outline.flatMap((corner, from) =>
    outline.flatMap((other, to) => (to > from + 1 && !(from === 0 && to === n - 1) ? [{ from, to, mm: distance(corner, other) }] : [])),
  );
}

function parallelSides(members: Member[], outline: Point[]): Flats[] {
  return members.flatMap((a) =>
    members.flatMap((b): Flats[] => {
      if (b.index <= a.index || Math.abs(Math.sin(a.inclinationRad - b.inclinationRad)) > 1e-9) return [];
      const across = { x: -Math.sin(a.inclinationRad), y: Math.cos(a.inclinationRad) };
      const span = spanAlong(outline, across);
      return [{ sides: [a.index, b.index], mm: span.high - span.low }];
    }),
  );
}
