import type { ComponentProps } from 'react';
import { Link } from 'react-router-dom';
import { classNames } from './class-names.ts';

type Weight = 'primary' | 'plain' | 'quiet' | 'danger';

const looks: Record<Weight, string> = {
  primary: 'border border-chalk-600 bg-chalk-600 text-white hover:border-chalk-700 hover:bg-chalk-700',
  plain: 'border border-ink-500 bg-white text-ink-900 hover:border-chalk-600 hover:text-chalk-700',
  quiet: 'border border-transparent text-chalk-600 underline-offset-4 hover:text-chalk-700 hover:underline',
  danger: 'border border-madder-600 bg-white text-madder-600 hover:bg-madder-100',
};

function look(weight: Weight, small: boolean, className?: string): string {
  return classNames(
    'inline-flex items-center justify-center gap-2 rounded-sm font-semibold disabled:cursor-not-allowed disabled:opacity-60',
    'aria-disabled:cursor-not-allowed aria-disabled:opacity-60',
    small ? 'min-h-8 px-3 py-1 text-sm' : 'min-h-10 px-4 py-2',
    looks[weight],
    className,
  );
}

interface Own {
  weight?: Weight;
  small?: boolean;
  /** Work is under way: the button says so, keeps its place and takes no second press. */
  busy?: boolean;
}

/** A button. `weight` is primary at most once in view. */
export function Button({ weight = 'plain', small = false, busy = false, className, type = 'button', onClick, children, ...rest }: ComponentProps<'button'> & Own) {
  return (
    <button
      type={type}
      className={look(weight, small, className)}
      aria-disabled={busy || undefined}
      aria-busy={busy || undefined}
      onClick={busy ? (event) => event.preventDefault() : onClick}
      {...rest}
    >
      {busy ? <span aria-hidden="true" className="size-4 rounded-full border-2 border-current border-r-transparent motion-safe:animate-spin" /> : null}
      {children}
    </button>
  );
}

/** A link that looks like a button: for going somewhere, not for doing. */
export function ButtonLink({ weight = 'plain', small = false, className, ...rest }: ComponentProps<typeof Link> & Omit<Own, 'busy'>) {
  return <Link className={look(weight, small, className)} {...rest} />;
}
