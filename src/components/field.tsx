import { type ReactNode, useId } from 'react';

export interface FieldWiring {
  id: string;
  'aria-describedby': string | undefined;
  'aria-invalid': true | undefined;
}

interface Props {
  label: string;
  hint?: ReactNode;
  error?: string;
  /** Marks a field that may stay empty. */
  optional?: boolean;
  className?: string;
  children: (wiring: FieldWiring) => ReactNode;
}

/** Label, hint and error round one control, tied together for those who hear the page. */
export function Field({ label, hint, error, optional = false, className, children }: Props) {
  const id = useId();
  const told = [hint ? `${id}-hint` : '', error ? `${id}-error` : ''].filter(Boolean).join(' ');
  return (
    <div className={className}>
      <label htmlFor={id} className="mb-1 block text-sm font-semibold text-ink-900">
        {label}
        {optional ? <span className="font-normal text-ink-500"> (may stay empty)</span> : null}
      </label>
      {children({ id, 'aria-describedby': told || undefined, 'aria-invalid': error ? true : undefined })}
      {hint ? (
        <p id={`${id}-hint`} className="mt-1 text-sm text-ink-500">
          {hint}
        </p>
      ) : null}
      {error ? (
        <p id={`${id}-error`} className="mt-1 text-sm font-semibold text-madder-600">
          {error}
        </p>
      ) : null}
    </div>
  );
}

/** The look shared by every box that is typed or chosen in. */
export const controlLook =
  'block w-full min-h-10 rounded-sm border border-ink-500 bg-white px-3 py-2 text-ink-900 placeholder:text-ink-500 ' +
  'aria-invalid:border-madder-600 aria-invalid:ring-1 aria-invalid:ring-madder-600 disabled:bg-plaster-100 disabled:text-ink-500';
