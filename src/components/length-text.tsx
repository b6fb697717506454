import { formatLength } from '../../shared/units/length.ts';
import { useUnits } from '../lib/units.ts';

/** A length for reading, in the shop's units. */
export function LengthText({ mm }: { mm: number }) {
  return <span className="whitespace-nowrap tabular-nums">{formatLength(mm, useUnits())}</span>;
}
