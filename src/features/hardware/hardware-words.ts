import type { ScrewBody } from '../../../shared/hardware/screws.ts';
import { formatLength } from '../../../shared/units/length.ts';

/** How a screw is called in the book until the shop calls it otherwise: `Wood screw #10 × 2 1/2 in`. */
export function screwName({ kind, size, lengthMm }: Pick<ScrewBody, 'kind' | 'size' | 'lengthMm'>, units: 'in' | 'mm'): string {
  const length = Number.isFinite(lengthMm) && lengthMm > 0 ? formatLength(lengthMm, units, 'bare') : '…';
  return `${kind === 'wood screw' ? 'Wood screw' : 'Lag screw'} ${size} × ${length} ${units}`;
}
