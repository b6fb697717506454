import { type ComponentProps, type ReactNode, useId } from 'react';

interface Own {
  label: ReactNode;
  error?: string;
  className?: string;
}

/** A box to tick, with its sentence. */
export function CheckField({ label, error, className, ...rest }: Own & Omit<ComponentProps<'input'>, keyof Own | 'type'>) {
  const id = useId();
  return (
    <div className={className}>
      <div className="flex items-start gap-3">
        <input
          type="checkbox"
          id={id}
          className="mt-0.5 size-6 shrink-0 accent-chalk-600"
          aria-invalid={error ? true : undefined}
          aria-describedby={error ? `${id}-error` : undefined}
          {...rest}
        />
        <label htmlFor={id} className="pt-0.5 text-ink-900">
          {label}
        </label>
      </div>
      {error ? (
        <p id={`${id}-error`} className="mt-1 text-sm font-semibold text-madder-600">
          {error}
        </p>
      ) : null}
    </div>
  );
}
