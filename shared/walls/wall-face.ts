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
