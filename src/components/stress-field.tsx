import { formatStress, parseStress } from '../../shared/units/stress.ts';
import { useUnits } from '../lib/units.ts';
import { QuantityField, type QuantityFieldProps } from './quantity-field.tsx';

/** A strength, in N/mm² inside; shown in psi or N/mm² and typed in either. */
export function StressField(props: QuantityFieldProps) {
  const units = useUnits();
  return (
    <QuantityField
      {...props}
      format={(mpa) => formatStress(mpa, units)}
      parse={(text) => {
        const read = parseStress(text, units);
        return 'error' in read ? read : { value: read.mpa };
      }}
    />
  );
}
