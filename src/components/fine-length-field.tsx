import { MM_PER_INCH } from '../../shared/units/constants.ts';
import { parseLength } from '../../shared/units/length.ts';
import { tidyNumber } from '../../shared/units/number-text.ts';
import { useUnits } from '../lib/units.ts';
import { QuantityField, type QuantityFieldProps } from './quantity-field.tsx';

/** A small length told in decimals, as screws and sheet steel are: thousandths of an inch, or hundredths of a millimetre. */
export function fineLength(mm: number, units: 'in' | 'mm'): string {
  return units === 'in' ? `${tidyNumber(mm / MM_PER_INCH, 3)} in` : `${tidyNumber(mm, 2)} mm`;
}

/** A length in mm inside, shown and typed in decimals of the shop's unit; fractions are read too. */
export function FineLengthField(props: QuantityFieldProps) {
  const units = useUnits();
  return (
    <QuantityField
      {...props}
      format={(mm) => fineLength(mm, units)}
      parse={(text) => {
        const read = parseLength(text, units);
        return 'error' in read ? read : { value: read.mm };
      }}
    />
  );
}
