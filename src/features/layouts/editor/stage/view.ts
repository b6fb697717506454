import type { Box, Point } from '../../../../../shared/geometry/polygon.ts';

/**
 * How the wall is seen: screen px = (left + scale · x, bottom − scale · y). The one place where y is turned over:
 * the wall's y runs up, the screen's down.
 */
export interface View {
  /** CSS px for a millimetre. */
  scale: number;
  /** Where the wall's lower left corner is on the stage, px. */
  left: number;
  bottom: number;
}

export interface Size {
  width: number;
  height: number;
}

export const leastScale = 0.01;
export const mostScale = 8;
const marginPx = 28;

export const toScreen = (view: View, { x, y }: Point): Point => ({ x: view.left + view.scale * x, y: view.bottom - view.scale * y });
export const toWall = (view: View, { x, y }: Point): Point => ({ x: (x - view.left) / view.scale, y: (view.bottom - y) / view.scale });

/** A layer's position and scale under this view: what is drawn in it is wall mm, y up. */
export const layerPlace = ({ scale, left, bottom }: View) => ({ x: left, y: bottom, scaleX: scale, scaleY: -scale });

/** The whole wall, in the middle of the stage, with a margin. */
export function fitted(wall: { widthMm: number; heightMm: number }, size: Size): View {
  const scale = clamped(Math.min((size.width - 2 * marginPx) / wall.widthMm, (size.height - 2 * marginPx) / wall.heightMm));
  return { scale, left: (size.width - wall.widthMm * scale) / 2, bottom: (size.height + wall.heightMm * scale) / 2 };
}

/** Nearer (factor above 1) or farther, with the wall's point under `at` (px) kept where it is. */
export function zoomed(view: View, factor: number, at: Point): View {
  const scale = clamped(view.scale * factor);
  const held = toWall(view, at);
  return { scale, left: at.x - held.x * scale, bottom: at.y + held.y * scale };
}

export const panned = (view: View, dx: number, dy: number): View => ({ ...view, left: view.left + dx, bottom: view.bottom + dy });

/** A part of the wall in the middle of the stage, with a margin; never nearer than `nearest` (CSS px for a millimetre). */
export function fittedTo({ left, bottom, right, top }: Box, size: Size, nearest = 1): View {
  const room = { width: Math.max(1, size.width - 4 * marginPx), height: Math.max(1, size.height - 4 * marginPx) };
  const scale = clamped(Math.min(nearest, room.width / Math.max(1, right - left), room.height / Math.max(1, top - bottom)));
  return { scale, left: size.width / 2 - ((left + right) / 2) * scale, bottom: size.height / 2 + ((bottom + top) / 2) * scale };
}

/** The same view moved and, only if need be, drawn farther, so that a part of the wall is wholly in sight. */
export function showing(view: View, box: Box, size: Size): View {
  const a = toScreen(view, { x: box.left, y: box.top });
  const b = toScreen(view, { x: box.right, y: box.bottom });
  const inside = a.x >= 0 && a.y >= 0 && b.x <= size.width && b.y <= size.height;
  return inside ? view : fittedTo(box, size, view.scale);
}

function clamped(scale: number): number {
  return Number.isFinite(scale) ? Math.min(mostScale, Math.max(leastScale, scale)) : leastScale;
}
