import type { ComponentProps, ReactNode } from 'react';
import { classNames } from './class-names.ts';
import { controlLook, Field } from './field.tsx';

interface Own {
  label: string;
  hint?: ReactNode;
  error?: string;
  optional?: boolean;
  className?: string;
}

/** One line of text; takes what `register()` of a form gives. */
export function TextField({ label, hint, error, optional, className, ...rest }: Own & Omit<ComponentProps<'input'>, keyof Own>) {
  return (
    <Field label={label} hint={hint} error={error} optional={optional} className={className}>
      {(wiring) => <input type="text" className={controlLook} {...rest} {...wiring} />}
    </Field>
  );
}

/** Several lines of text. */
export function TextAreaField({ label, hint, error, optional, className, rows = 4, ...rest }: Own & Omit<ComponentProps<'textarea'>, keyof Own>) {
  return (
    <Field label={label} hint={hint} error={error} optional={optional} className={className}>
      {(wiring) => <textarea rows={rows} className={classNames(controlLook, 'resize-y')} {...rest} {...wiring} />}
    </Field>
  );
}
