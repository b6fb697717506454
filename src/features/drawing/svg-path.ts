import type { Box, Polygon } from '../../../shared/geometry/polygon.ts';

const round = (mm: number) => Math.round(mm * 100) / 100;

/** Points as path data. Drawings have y up and SVG has it down: `y` is turned here by its sign. */
export function linePath(points: Polygon): string {
  return `M${points.map(({ x, y }) => `${round(x)} ${round(-y)}`).join('L')}`;
}

/** A closed ring as path data. */
export function ringPath(points: Polygon): string {
  return `${linePath(points)}Z`;
}

/** A box with y up as an SVG viewBox, with `margin` on all sides, mm. */
export function viewBoxOf(box: Box, margin: number): string {
  return [box.left - margin, -box.top - margin, box.right - box.left + 2 * margin, box.top - box.bottom + 2 * margin].map(round).join(' ');
}
