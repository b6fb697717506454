import type { Point } from '../../../shared/geometry/point.ts';

const round = (mm: number) => Math.round(mm * 100) / 100;

/** Closed ring as path data. Drawings have y up and SVG has it down: `y` is turned here, and only here, by its sign. */
export function ringPath(points: readonly Point[]): string {
  return `M${points.map(({ x, y }) => `${round(x)} ${round(-y)}`).join('L')}Z`;
}

/** A box with y up as an SVG viewBox, with `margin` on all sides, mm. */
export function viewBoxOf(box: { left: number; bottom: number; right: number; top: number }, margin: number): string {
  return [box.left - margin, -box.top - margin, box.right - box.left + 2 * margin, box.top - box.bottom + 2 * margin].map(round).join(' ');
}
