import { distanceToRim, gapBetween, overlapDepth } from '../../geometry/polygon-distance.ts';
import { boxOf, contains, type Box, type Polygon } from '../../geometry/polygon.ts';
import { allowedShifts, type WallOutline } from '../../hanging/allowed-shifts.ts';
import type { Obstruction } from '../../walls/wall.ts';
import { wallFace } from '../../walls/wall-face.ts';
import type { Scene, SceneWall } from '../scene.ts';
import { placeFrame } from '../placed-frame.ts';
import { boxRoundPuts, movedPut, type Put } from './ask.ts';

/** Nearer to a bound than this is on it, mm. */
const nothingMm = 1e-4;
/** Steps in which a block that must stand higher or lower is tried, mm. */
const heightStepMm = 20;

/** Where frames may stand: on the wall, within the bounds, clear of obstructions, and a reveal off what hangs there already. */
export interface Ground {
  bounds: Box;
  revealMm: number;
  /** Whether an outline may stand there, whatever else is being put. */
  isFree: (outline: Polygon) => boolean;
  /** Whether an outline keeps the reveal to all of these. */
  isClearOf: (outline: Polygon, puts: readonly Put[]) => boolean;
  /** The wall as what moves along it sees it: what hangs there, and the bounds' ends, stand in the way too. */
  fenced: (bounds: Box) => SceneWall;
  /** A block of frames moved, no farther than it must be, to where all of it is free; null where it has no place. */
  settled: (puts: readonly Put[]) => Put[] | null;
}

interface Standing {
  outline: Polygon;
  box: Box;
}

/** The ground of a scene; `area` bounds it further. */
export function groundOf(scene: Scene, area: Box | null): Ground {
  const { wall, sheet: { revealMm } } = scene;
  const bounds: Box = {
    left: Math.max(0, area?.left ?? 0), bottom: Math.max(0, area?.bottom ?? 0),
    right: Math.min(wall.widthMm, area?.right ?? Infinity), top: Math.min(wall.heightMm, area?.top ?? Infinity),
  };
  const byId = new Map(scene.patterns.map((p) => [p.id, p]));
  const standing = scene.frames.flatMap((frame): Standing[] => {
    const pattern = byId.get(frame.patternId);
    return pattern ? [withBox(placeFrame(frame, pattern).outline)] : [];
  });
  const obstructions = wall.obstructions.map((o) => ({ ...withBox(o.outlineMm.map(([x, y]) => ({ x, y }))), clearanceMm: Math.max(o.clearanceMm, 0.01) }));
  const face = wall.outlineMm ? wallFace(wall) : null;

  const isFree = (outline: Polygon): boolean => {
    const box = boxOf(outline);
    if (box.left < bounds.left - nothingMm || box.right > bounds.right + nothingMm || box.bottom < bounds.bottom - nothingMm || box.top > bounds.top + nothingMm) return false;
    if (face && (outline.some((p) => !contains(face, p) && distanceToRim(face, p) > nothingMm) || face.some((p) => contains(outline, p) && distanceToRim(outline, p) > nothingMm))) return false;
    if (obstructions.some((o) => !apart(box, o.box, o.clearanceMm) && gapBetween(o.outline, outline).mm < o.clearanceMm - nothingMm)) return false;
    return standing.every((s) => apart(box, s.box, revealMm) || keepsReveal(outline, s.outline, revealMm));
  };
  const isClearOf = (outline: Polygon, puts: readonly Put[]): boolean => {
    const box = boxOf(outline);
    return puts.every((put) => apart(box, put.box, revealMm) || keepsReveal(outline, put.outline, revealMm));
  };
  const fenced = (within: Box): SceneWall => {
    const far = wall.widthMm + wall.heightMm + 1e4;
    const fences = [fence('left end', within.left - far, within.left), fence('right end', within.right, within.right + far)];
    const hung = standing.map(({ outline }, i) => inTheWay(`hung ${i}`, outline, revealMm));
    return { ...wall, obstructions: [...wall.obstructions, ...hung, ...fences] };
  };

  const settled = (puts: readonly Put[]): Put[] | null => {
    const box = boxRoundPuts(puts);
    const room = bounds.top - bounds.bottom - (box.top - box.bottom);
    if (room < -nothingMm || bounds.right - bounds.left - (box.right - box.left) < -nothingMm) return null;
    const { obstructions: inWay } = fenced(bounds);
    const low = bounds.bottom - box.bottom;
    const wanted = Math.min(Math.max(0, low), low + Math.max(0, room));
    let best: { dx: number; dy: number; far: number } | null = null;
    for (let k = 0; k <= (2 * Math.max(0, room)) / heightStepMm + 1; k++) {
      // Up and down in turns from where it is wanted.
      const dy = wanted + (k % 2 ? 1 : -1) * Math.ceil(k / 2) * heightStepMm;
      if (dy < low - nothingMm || dy > low + room + nothingMm) continue;
      if (best && Math.abs(dy) >= best.far) continue;
      for (const [from, to] of allowedShifts(puts.map((p): WallOutline => p.outline.map(({ x, y }) => [x, y + dy] as const)), wall.widthMm, inWay)) {
        const dx = Math.min(Math.max(0, from), to);
        const far = Math.hypot(dx, dy);
        if ((!best || far < best.far) && puts.every((p) => isFree(movedPut(p, dx, dy).outline))) best = { dx, dy, far };
      }
    }
    return best && puts.map((p) => movedPut(p, best.dx, best.dy));
  };
  return { bounds, revealMm, isFree, isClearOf, fenced, settled };
}

const withBox = (outline: Polygon): Standing => ({ outline, box: boxOf(outline) });

/** Whether two boxes alone show that there is room enough between what lies in them. */
const apart = (a: Box, b: Box, mm: number): boolean => Math.max(a.left - b.right, b.left - a.right, a.bottom - b.top, b.bottom - a.top) > mm;

function keepsReveal(a: Polygon, b: Polygon, revealMm: number): boolean {
  return overlapDepth(a, b) <= nothingMm && (revealMm <= nothingMm || gapBetween(a, b).mm >= revealMm - 1e-3);
}

function inTheWay(id: string, outline: Polygon, clearanceMm: number): Obstruction {
  return { id, kind: 'furniture', name: '', outlineMm: outline.map(({ x, y }) => [x, y]), clearanceMm };
}

function fence(id: string, left: number, right: number): Obstruction {
  return inTheWay(id, [{ x: left, y: -1e5 }, { x: right, y: -1e5 }, { x: right, y: 2e5 }, { x: left, y: 2e5 }], 0);
}
