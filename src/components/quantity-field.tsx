import { type ReactNode, useState } from 'react';
import { classNames } from './class-names.ts';
import { controlLook, Field } from './field.tsx';

export interface QuantityFieldProps {
  label: string;
  hint?: ReactNode;
  error?: string;
  optional?: boolean;
  className?: string;
  disabled?: boolean;
  /** SI inside (mm, kg, rad); null while empty; NaN while what is typed cannot be read. */
  value: number | null;
  onChange: (value: number | null) => void;
  onBlur?: () => void;
}

interface Props extends QuantityFieldProps {
  parse: (text: string) => { value: number } | { error: string };
  format: (value: number) => string;
}

/**
 * A figure with a unit, typed in any way the trade writes it. Set back in good form on leaving the field; a figure that
 * is merely passed through keeps its exact value, whatever rounding shows.
 */
export function QuantityField({ label, hint, error, optional, className, disabled, value, onChange, onBlur, parse, format }: Props) {
  const shown = value === null || Number.isNaN(value) ? '' : format(value);
  const [typed, setTyped] = useState<{ text: string; gave: number | null } | null>(null);
  // What was typed holds only while the value is still the one it gave: a value set from elsewhere wins.
  const mine = typed !== null && Object.is(typed.gave, value) ? typed : null;
  const text = mine ? mine.text : shown;
  const misread = mine && Number.isNaN(mine.gave) ? parse(mine.text) : null;

  const type = (next: string) => {
    const read = next.trim() === '' ? null : parse(next);
    const gave = read === null ? null : 'error' in read ? Number.NaN : read.value;
    setTyped({ text: next, gave });
    onChange(gave);
  };

  return (
    <Field label={label} hint={hint} error={misread && 'error' in misread ? misread.error : error} optional={optional} className={className}>
      {(wiring) => (
        <input
          type="text"
          inputMode="text"
          autoComplete="off"
          disabled={disabled}
          className={classNames(controlLook, 'tabular-nums')}
          value={text}
          onChange={(event) => type(event.target.value)}
          onBlur={() => {
            if (mine && !Number.isNaN(mine.gave)) setTyped(null);
            onBlur?.();
          }}
          {...wiring}
        />
      )}
    </Field>
  );
}
