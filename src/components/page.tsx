import type { ReactNode } from 'react';
import { classNames } from './class-names.ts';

/** The measure of an ordinary page; `narrow` for forms and reading. */
export function Page({ narrow = false, children }: { narrow?: boolean; children: ReactNode }) {
  return <div className={classNames('mx-auto flex w-full flex-col gap-6 px-4 py-4 sm:px-6', narrow ? 'max-w-2xl' : 'max-w-7xl')}>{children}</div>;
}

/** A headed part of a page, with what can be done to it at the right. */
export function Section({ title, action, children }: { title: string; action?: ReactNode; children: ReactNode }) {
  return (
    <section aria-label={title} className="min-w-0">
      <div className="mb-3 flex flex-wrap items-center justify-between gap-3 border-b border-plaster-200 pb-2">
        <h2 className="text-lg font-bold text-ink-900">{title}</h2>
        {action}
      </div>
      {children}
    </section>
  );
}
