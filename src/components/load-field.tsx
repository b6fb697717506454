import { formatLoad, parseLoad } from '../../shared/units/mass.ts';
import { useUnits } from '../lib/units.ts';
import { QuantityField, type QuantityFieldProps } from './quantity-field.tsx';

/** A load, in N inside; shown in lbf or N and typed in either. */
export function LoadField(props: QuantityFieldProps) {
  const units = useUnits();
  return (
    <QuantityField
      {...props}
      format={(newton) => formatLoad(newton, units)}
      parse={(text) => {
        const read = parseLoad(text, units);
        return 'error' in read ? read : { value: read.newton };
      }}
    />
  );
}
