import { NumberField } from '../../components/number-field.tsx';

/** A place on the photo in pixels, held within it; what cannot be read leaves the place as it is. */
export function PxField({ label, value, most, onChange }: { label: string; value: number; most: number; onChange: (px: number) => void }) {
  return (
    <NumberField
      className="min-w-24 [&>label]:sr-only"
      label={label}
      value={Math.round(value * 10) / 10}
      onChange={(px) => {
        if (px !== null && Number.isFinite(px) && px >= 0 && px <= most) onChange(px);
      }}
    />
  );
}
