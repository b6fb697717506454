import type { LengthUnits } from '../units/constants.ts';
import { formatAngle } from '../units/angle.ts';
import { formatLength } from '../units/length.ts';
import type { Shape } from './shape.ts';

const regularNames: Record<number, string> = {
  3: 'triangle', 4: 'square', 5: 'pentagon', 6: 'hexagon', 7: 'heptagon', 8: 'octagon', 9: 'nonagon', 10: 'decagon', 11: 'hendecagon', 12: 'dodecagon',
};

/** A shape in plain words with its sizes, long point to long point: `hexagon, 10" a side`. */
export function shapeWords(shape: Shape, units: LengthUnits): string {
  const l = (mm: number) => formatLength(mm, units);
  switch (shape.kind) {
    case 'regular':
      return `${regularNames[shape.sides] ?? `${shape.sides} sides`}, ${l(shape.sideMm)} a side`;
    case 'stretched hexagon':
      return `stretched hexagon, ${l(shape.stretchMm)} top and bottom, ${l(shape.sideMm)} the other sides`;
    case 'half hexagon':
      return `half hexagon, ${l(2 * shape.sideMm)} the long side, ${l(shape.sideMm)} the others`;
    case 'rhombus':
      return `rhombus, ${l(shape.sideMm)} a side, ${formatAngle(shape.angleRad)}`;
    case 'kite':
      return `kite, ${l(shape.widthMm)} wide, ${l(shape.upperMm)} upper and ${l(shape.lowerMm)} lower sides`;
    case 'trapezoid':
      return `trapezoid, ${l(shape.baseMm)} below, ${l(shape.topMm)} above, ${l(shape.heightMm)} high`;
    case 'rectangle':
      return `rectangle, ${l(shape.widthMm)} × ${l(shape.heightMm)}`;
    case 'triangle':
      return `triangle, ${l(shape.aMm)}, ${l(shape.bMm)} and ${l(shape.cMm)}`;
    case 'free':
      return `free shape of ${shape.verticesMm.length} sides`;
  }
}
