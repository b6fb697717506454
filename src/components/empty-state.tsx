import type { ReactNode } from 'react';

/** Says that there is nothing yet and what to do next. */
export function EmptyState({ title, children, action }: { title: string; children?: ReactNode; action?: ReactNode }) {
  return (
    <div className="border border-dashed border-ink-500 px-6 py-8">
      <p className="font-bold text-ink-900">{title}</p>
      {children ? <div className="mt-1 max-w-prose text-ink-700">{children}</div> : null}
      {action ? <div className="mt-4">{action}</div> : null}
    </div>
  );
}
