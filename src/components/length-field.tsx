import { formatLength, parseLength } from '../../shared/units/length.ts';
import { useUnits } from '../lib/units.ts';
import { QuantityField, type QuantityFieldProps } from './quantity-field.tsx';

/** A length, in mm inside; shown in the shop's units and typed in either: `13 7/8`, `1' 1 7/8"`, `352.4 mm`. */
export function LengthField(props: QuantityFieldProps) {
  const units = useUnits();
  return (
    <QuantityField
      {...props}
      format={(mm) => formatLength(mm, units)}
      parse={(text) => {
        const read = parseLength(text, units);
        return 'error' in read ? read : { value: read.mm };
      }}
    />
  );
}
