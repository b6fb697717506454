import type { Groove } from '../../../shared/patterns/pattern.ts';
import { CheckField } from '../../components/check-field.tsx';
import { LengthField } from '../../components/length-field.tsx';

interface Props {
  value: Groove | null;
  onChange: (groove: Groove | null) => void;
  errorAt: (path: string) => string | undefined;
}

/** A groove for a backer of 1/8 in in members of 1/2 in and more (common practice). */
const start: Groove = { widthMm: 4.7625, depthMm: 6.35, clearanceMm: 1, mirrorMm: 0, backerMm: 3.175 };

const lengths = [
  ['widthMm', 'Width', 'From the inner face outwards'],
  ['depthMm', 'Depth', 'From the back edge'],
  ['mirrorMm', 'Mirror', 'Thickness; 0 for none'],
  ['backerMm', 'Backer', 'Thickness; 0 for none'],
  ['clearanceMm', 'Clearance', 'Play all round the panel'],
] as const;

/** The groove in the back of a frame, and the panels it holds. */
export function GrooveFields({ value, onChange, errorAt }: Props) {
  return (
    <>
      <CheckField label="Groove in the back, for a mirror or a backer" checked={value !== null} onChange={(event) => onChange(event.target.checked ? start : null)} />
      {value ? (
        <div className="grid grid-cols-2 gap-4">
          {lengths.map(([field, label, hint]) => (
            <LengthField key={field} label={label} hint={hint} value={value[field]} onChange={(mm) => onChange({ ...value, [field]: mm as number })} error={errorAt(field)} />
          ))}
        </div>
      ) : null}
    </>
  );
}
