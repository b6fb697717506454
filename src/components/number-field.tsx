import { QuantityField, type QuantityFieldProps } from './quantity-field.tsx';

/** A plain number, such as a count. */
export function NumberField(props: QuantityFieldProps) {
  return (
    <QuantityField
      {...props}
      format={(value) => String(value)}
      parse={(text) => {
        const value = Number(text.trim().replace(',', '.'));
        return Number.isFinite(value) ? { value } : { error: 'Please give a number.' };
      }}
    />
  );
}
