import type { ComponentProps, ReactNode } from 'react';
import { controlLook, Field } from './field.tsx';

interface Own {
  label: string;
  hint?: ReactNode;
  error?: string;
  optional?: boolean;
  className?: string;
  options: readonly { value: string; words: string }[];
}

/** A choice of one from a short list, by the platform's own control. */
export function SelectField({ label, hint, error, optional, className, options, ...rest }: Own & Omit<ComponentProps<'select'>, keyof Own>) {
  return (
    <Field label={label} hint={hint} error={error} optional={optional} className={className}>
      {(wiring) => (
        <select className={controlLook} {...rest} {...wiring}>
          {options.map(({ value, words }) => (
            <option key={value} value={value}>
              {words}
            </option>
          ))}
        </select>
      )}
    </Field>
  );
}
