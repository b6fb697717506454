import { formatAngle, parseAngle } from '../../shared/units/angle.ts';
import { QuantityField, type QuantityFieldProps } from './quantity-field.tsx';

/** An angle, in radians inside; shown and typed in degrees. */
export function AngleField(props: QuantityFieldProps) {
  return (
    <QuantityField
      {...props}
      format={(rad) => formatAngle(rad)}
      parse={(text) => {
        const read = parseAngle(text);
        return 'error' in read ? read : { value: read.rad };
      }}
    />
  );
}
