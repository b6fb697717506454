import { placed, type Placement, type Point } from '../geometry/point.ts';
import { boxOf, boxRing, placedAll, type Polygon } from '../geometry/polygon.ts';
import { frameGeometry } from '../patterns/frame.ts';
import { placedHangers, type HangerPlacement } from '../patterns/hangers.ts';
import type { PatternDesign, Species } from '../patterns/pattern.ts';
import { faceTopAt, wallFace } from '../walls/wall-face.ts';
import { isConfirmed, type Obstruction, type Stud, type WallOutline } from '../walls/wall.ts';
import type { Frame, LayoutPattern } from './layout.ts';

/** What a thing is drawn as; each pen knows the colours and line weights of its medium. */
export type Ink =
  | 'wall' | 'wall rim' | 'stud' | 'stud unconfirmed' | 'obstruction' | 'shadow' | 'rim' | 'joint' | 'grain' | 'glint'
  | 'mirror' | 'backer' | 'hanger' | 'hanger rim' | 'words' | Species;

/** A drawing as data: wall millimetres, y up. Lengths that belong to the paper and not to the wall (line weights) are the pen's. */
export type Primitive =
  | { kind: 'area'; ink: Ink; points: Polygon; holes: readonly Polygon[]; opacity?: number }
  | { kind: 'line'; ink: Ink; points: Polygon; closed: boolean; dashed: boolean }
  /** Hatched at 45° within its outline and ruled round, never filled. */
  | { kind: 'hatch'; ink: Ink; points: Polygon; pitchMm: number }
  | { kind: 'dot'; ink: Ink; at: Point; radiusMm: number }
  | { kind: 'text'; ink: Ink; at: Point; words: string; sizeMm: number }
  | { kind: 'picture'; url: string; corners: Polygon };

/** A straightened photo and the wall rectangle it shows. */
export interface ElevationPicture { url: string; leftMm: number; bottomMm: number; widthMm: number; heightMm: number }

/** What of a wall is drawn; a `Wall` and a snapshot's wall are both such. */
export interface DrawnWall { widthMm: number; heightMm: number; outlineMm?: WallOutline | null; studs: readonly Stud[]; obstructions: readonly Obstruction[] }

const hatchPitchMm = 45;
const hangerRadiusMm = 7;

/** A frame as the real thing, seen from the front, about its own centroid: not turned, but flipped if asked. Hangers apart, for they may be hidden or slid. */
export function frameDrawing(design: PatternDesign, isFlipped = false, hangerSlides?: HangerPlacement['hangerSlides']): { body: Primitive[]; hangers: Primitive[] } {
  const at: Placement = { xMm: 0, yMm: 0, turnRad: 0, flipped: isFlipped };
  const geometry = frameGeometry(design);
  const outline = placedAll(geometry.outline, at);
  const opening = placedAll(geometry.opening, at);
  const holes = opening.length > 0 ? [opening] : [];
  const filling = !design.groove ? null : design.groove.mirrorMm > 0 ? 'mirror' : design.groove.backerMm > 0 ? 'backer' : null;
  const body: Primitive[] = [];
  if (filling && opening.length > 0) body.push({ kind: 'area', ink: filling, points: opening, holes: [] });
  if (filling === 'mirror' && opening.length > 0) body.push(...glints(opening));
  body.push({ kind: 'area', ink: design.species, points: outline, holes });
  for (const { outerFrom, outerTo, innerFrom, innerTo } of geometry.members) {
    for (const share of [0.3, 0.62]) {
      body.push({ kind: 'line', ink: 'grain', closed: false, dashed: false, points: [between(outerFrom, innerFrom, share), between(outerTo, innerTo, share)].map((p) => placed(p, at)) });
    }
    body.push({ kind: 'line', ink: 'joint', closed: false, dashed: false, points: [placed(outerFrom, at), placed(innerFrom, at)] });
  }
  body.push({ kind: 'line', ink: 'rim', points: outline, closed: true, dashed: false });
  for (const hole of holes) body.push({ kind: 'line', ink: 'rim', points: hole, closed: true, dashed: false });
  return { body, hangers: hangerDrawing(design, isFlipped, hangerSlides) };
}

/** The hangers of a frame, in the same plane as `frameDrawing`. */
export function hangerDrawing(design: PatternDesign, flipped: boolean, hangerSlides?: HangerPlacement['hangerSlides']): Primitive[] {
  return placedHangers({ xMm: 0, yMm: 0, turnRad: 0, flipped, hangerSlides }, design).flatMap(({ x, y }): Primitive[] => [
    { kind: 'dot', ink: 'hanger rim', at: { x, y }, radiusMm: hangerRadiusMm },
    { kind: 'dot', ink: 'hanger', at: { x, y }, radiusMm: hangerRadiusMm * 0.72 },
  ]);
}

const between = (a: Point, b: Point, share: number): Point => ({ x: a.x + (b.x - a.x) * share, y: a.y + (b.y - a.y) * share });

/** Two slanting strokes in the middle of a mirror. */
function glints(opening: Polygon): Primitive[] {
  const { left, right } = boxOf(opening);
  const reach = (right - left) * 0.12;
  return [-0.5, 0.5].map((shift) => ({
    kind: 'line', ink: 'glint', closed: false, dashed: false,
    points: [{ x: shift * reach - reach, y: -reach }, { x: shift * reach + reach, y: reach }],
  }));
}

/** The soft shadow a ring throws down and to the right, outside it and within: deeper frames throw a longer one. On the wall, mm. */
export function shadowDrawing(design: Pick<PatternDesign, 'depthMm'>, outline: Polygon, opening: Polygon): Primitive[] {
  return [0.18, 0.12, 0.06].map((share) => {
    const thrown = ({ x, y }: Point): Point => ({ x: x + design.depthMm * share, y: y - design.depthMm * share });
    return { kind: 'area', ink: 'shadow', opacity: 0.1, points: outline.map(thrown), holes: opening.length > 0 ? [opening.map(thrown)] : [] };
  });
}

/** A primitive brought from a frame's own plane to its place on the wall. */
export function brought(primitive: Primitive, at: Omit<Placement, 'flipped'>): Primitive {
  const to = (p: Point) => placed(p, { ...at, flipped: false });
  switch (primitive.kind) {
    case 'area':
      return { ...primitive, points: primitive.points.map(to), holes: primitive.holes.map((hole) => hole.map(to)) };
    case 'line':
    case 'hatch':
      return { ...primitive, points: primitive.points.map(to) };
    case 'dot':
    case 'text':
      return { ...primitive, at: to(primitive.at) };
    case 'picture':
      return { ...primitive, corners: primitive.corners.map(to) };
  }
}

/** The wall by itself: its face or its photo, studs as chalk-dashed bands (those unconfirmed with a question mark), obstructions hatched. */
export function wallDrawing(wall: DrawnWall, picture: ElevationPicture | null): { ground: Primitive[]; studs: Primitive[]; obstructions: Primitive[] } {
  const face = wallFace(wall);
  const ground: Primitive[] = [{ kind: 'area', ink: 'wall', points: face, holes: [] }];
  if (picture) {
    const { leftMm, bottomMm, widthMm, heightMm } = picture;
    ground.push({ kind: 'picture', url: picture.url, corners: boxRing({ left: leftMm, bottom: bottomMm, right: leftMm + widthMm, top: bottomMm + heightMm }) });
  }
  ground.push({ kind: 'line', ink: 'wall rim', points: face, closed: true, dashed: false });
  const studs = wall.studs.flatMap((stud) => studDrawing(stud, faceTopAt(wall, stud.xMm)));
  const obstructions = wall.obstructions.map((o): Primitive => ({ kind: 'hatch', ink: 'obstruction', pitchMm: hatchPitchMm, points: o.outlineMm.map(([x, y]) => ({ x, y })) }));
  return { ground, studs, obstructions };
}

function studDrawing(stud: Stud, heightMm: number): Primitive[] {
  const confirmed = isConfirmed(stud);
  const ink = confirmed ? 'stud' : 'stud unconfirmed';
  const half = stud.widthMm / 2;
  const edge = (x: number): Primitive => ({ kind: 'line', ink, closed: false, dashed: true, points: [{ x, y: 0 }, { x, y: heightMm }] });
  const band = boxRing({ left: stud.xMm - half, bottom: 0, right: stud.xMm + half, top: heightMm });
  const drawn: Primitive[] = [{ kind: 'area', ink, points: band, holes: [], opacity: 0.08 }, edge(stud.xMm - half), edge(stud.xMm + half)];
  if (!confirmed) drawn.push({ kind: 'text', ink, at: { x: stud.xMm, y: Math.max(0, heightMm - 90) }, words: '?', sizeMm: 70 });
  return drawn;
}

/** A layout on its wall as primitives in the order they are drawn; frames whose pattern is not given are left out. */
export function layoutDrawing(input: {
  wall: DrawnWall;
  picture: ElevationPicture | null;
  frames: readonly Frame[];
  patterns: readonly LayoutPattern[];
  show?: { studs?: boolean; hangers?: boolean; labels?: boolean };
}): Primitive[] {
  const { studs = true, hangers = true, labels = true } = input.show ?? {};
  const wall = wallDrawing(input.wall, input.picture);
  const designs = new Map(input.patterns.map(({ id, design }) => [id, design]));
  const shadows: Primitive[] = [];
  const bodies: Primitive[] = [];
  const over: Primitive[] = [];
  for (const frame of input.frames) {
    const design = designs.get(frame.patternId);
    if (!design) continue;
    const drawn = frameDrawing(design, frame.flipped, frame.hangerSlides);
    const { outline, opening } = frameGeometry(design);
    shadows.push(...shadowDrawing(design, placedAll(outline, frame), placedAll(opening, frame)));
    bodies.push(...drawn.body.map((p) => brought(p, frame)));
    if (hangers) over.push(...drawn.hangers.map((p) => brought(p, frame)));
    if (labels && frame.label) over.push({ kind: 'text', ink: 'words', at: { x: frame.xMm, y: frame.yMm }, words: frame.label, sizeMm: 60 });
  }
  return [...wall.ground, ...(studs ? wall.studs : []), ...wall.obstructions, ...shadows, ...bodies, ...over];
}

/** Strokes at 45° that hatch an outline of any simple shape, as pairs of ends, mm. (Scan lines against the sides, even-odd.) */
export function hatchStrokes(outline: Polygon, pitchMm: number): { from: Point; to: Point }[] {
  const strokes: { from: Point; to: Point }[] = [];
  // Along u = y − x; a stroke is all points of one u, told by v = x + y.
  const us = outline.map(({ x, y }) => y - x);
  const low = Math.ceil(Math.min(...us) / pitchMm + 1e-9);
  for (let k = low; k * pitchMm < Math.max(...us); k++) {
    const u = k * pitchMm;
    const vs: number[] = [];
    outline.forEach((a, i) => {
      const b = outline[(i + 1) % outline.length]!;
      const ua = a.y - a.x - u;
      const ub = b.y - b.x - u;
      if (ua >= 0 === ub >= 0) return;
      const t = ua / (ua - ub);
      vs.push(a.x + a.y + t * (b.x + b.y - a.x - a.y));
    });
    vs.sort((p, q) => p - q);
    for (let i = 0; i + 1 < vs.length; i += 2) {
      const at = (v: number): Point => ({ x: (v - u) / 2, y: (v + u) / 2 });
      strokes.push({ from: at(vs[i]!), to: at(vs[i + 1]!) });
    }
  }
  return strokes;
}
