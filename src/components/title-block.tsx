import type { ReactNode } from 'react';

export interface TitleCell {
  label: string;
  value: ReactNode;
}

interface Props {
  title: ReactNode;
  /** Small line over the title, such as the way back. */
  above?: ReactNode;
  cells?: readonly TitleCell[];
  /** The page's one primary action. */
  action?: ReactNode;
}

/** The ruled band that heads a working page, in the manner of a drawing's title block. Holds the page's h1. */
export function TitleBlock({ title, above, cells = [], action }: Props) {
  return (
    <div className="flex flex-wrap items-stretch gap-px overflow-hidden border border-ink-700 bg-plaster-200">
      <div className="flex min-w-0 grow basis-64 flex-col justify-center bg-white px-4 py-2">
        {above ? <div className="text-sm text-ink-700">{above}</div> : null}
        <h1 tabIndex={-1} data-page-heading className="text-xl font-bold break-words text-ink-900 outline-none">
          {title}
        </h1>
      </div>
      {cells.length > 0 ? (
        <dl className="contents">
          {cells.map(({ label, value }) => (
            <div
              key={label}
              className="flex grow basis-32 flex-col justify-center bg-white px-4 py-2 md:basis-auto"
            >
              <dt className="text-xs text-ink-500">{label}</dt>
              <dd className="text-sm font-semibold break-words text-ink-900 tabular-nums">{value}</dd>
            </div>
          ))}
        </dl>
      ) : null}
      {action ? (
        <div className="flex grow items-center bg-white px-4 py-2 max-md:basis-full md:justify-end [&>*]:max-md:w-full">{action}</div>
      ) : null}
    </div>
  );
}
