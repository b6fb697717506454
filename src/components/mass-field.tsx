import { formatMass, parseMass } from '../../shared/units/mass.ts';
import { useUnits } from '../lib/units.ts';
import { QuantityField, type QuantityFieldProps } from './quantity-field.tsx';

/** A mass, in kg inside; shown in lb or kg and typed in either. */
export function MassField(props: QuantityFieldProps) {
  const units = useUnits();
  return (
    <QuantityField
      {...props}
      format={(kg) => formatMass(kg, units)}
      parse={(text) => {
        const read = parseMass(text, units);
        return 'error' in read ? read : { value: read.kg };
      }}
    />
  );
}
