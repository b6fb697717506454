import type { ComponentProps, ReactNode } from 'react';
import { classNames } from './class-names.ts';

/** A real table, ruled; it scrolls sideways by itself where the page is narrower. `caption` names it for those who hear it. */
export function Table({ caption, children, className }: { caption: string; children: ReactNode; className?: string }) {
  return (
    // Focusable, so that what is cut off can be reached by keyboard; positioned, so that words hidden from sight scroll along.
    <div role="region" aria-label={`${caption}: table`} tabIndex={0} className={classNames('relative overflow-x-auto border border-plaster-200 bg-white', className)}>
      <table className="w-full border-collapse text-left">
        <caption className="sr-only">{caption}</caption>
        {children}
      </table>
    </div>
  );
}

/** Heading of a column, or of a row with `scope="row"`; `figure` sets it right, over figures. */
export function Th({ figure = false, className, scope = 'col', ...rest }: ComponentProps<'th'> & { figure?: boolean }) {
  const look = scope === 'col' ? 'border-b border-ink-700 text-sm font-semibold text-ink-700' : 'border-b border-plaster-200 font-semibold text-ink-900';
  return <th scope={scope} className={classNames('px-3 py-2 align-top', look, figure && 'text-right', className)} {...rest} />;
}

/** A cell; `figure` sets it right with figures that line up. */
export function Td({ figure = false, className, ...rest }: ComponentProps<'td'> & { figure?: boolean }) {
  return <td className={classNames('border-b border-plaster-200 px-3 py-2 align-top text-ink-900', figure && 'text-right tabular-nums', className)} {...rest} />;
}
