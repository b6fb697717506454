import polygonClipping from 'polygon-clipping';
import type { WallShape } from './wall.ts';

interface Corner { x: number; y: number }

/** The wall's face, mm, counter-clockwise from the lower left where it is a rectangle: its outline, or all of width by height. */
export function wallFace({ outlineMm, widthMm, heightMm }: Pick<WallShape, 'widthMm' | 'heightMm' | 'outlineMm'>): Corner[] {
  if (outlineMm) return outlineMm.map(([x, y]) => ({ x, y }));
  return [{ x: 0, y: 0 }, { x: widthMm, y: 0 }, { x: widthMm, y: heightMm }, { x: 0, y: heightMm }];
}

/** How high the wall's face reaches at `xMm`; its height where the face has no part there. */
export function faceTopAt(wall: Pick<WallShape, 'widthMm' | 'heightMm' | 'outlineMm'>, xMm: number): number {
  const face = wallFace(wall);
  const met = face.flatMap((a, i) => {
    const b = face[(i + 1) % face.length]!;
    if (a.x === b.x) return a.x === xMm ? [a.y, b.y] : [];
    const t = (xMm - a.x) / (b.x - a.x);
    return t >= 0 && t <= 1 ? [a.y + t * (b.y - a.y)] : [];
  });
  return met.length > 0 ? Math.max(...met) : wall.heightMm;
}

/**
 * What of the wall's width and height lies past its outline, mm: simple polygons, none where the wall is a rectangle. The rectangle is
 * halved through the outline first, so that what is left round it is never a ring with a hole.
 */
export function pastFace(wall: Pick<WallShape, 'widthMm' | 'heightMm' | 'outlineMm'>): [number, number][][] {
  if (!wall.outlineMm) return [];
  const xs = wall.outlineMm.map(([x]) => x);
  const cut = (Math.min(...xs) + Math.max(...xs)) / 2;
  const half = (from: number, to: number): [number, number][] => [[from, 0], [to, 0], [to, wall.heightMm], [from, wall.heightMm]];
  const halves = [half(0, cut), half(cut, wall.widthMm)];
  const rest = halves.flatMap((rectangle) => polygonClipping.difference([rectangle], [wall.outlineMm as [number, number][]]));
  // The library closes its rings by the first corner once more.
  return rest.flatMap(([ring]) => (ring ? [ring.slice(0, -1)] : []));
}
