import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';

interface Props {
  /** Where the slip leads. */
  to: string;
  title: string;
  picture: ReactNode;
  children?: ReactNode;
  /** Deeds beside the link, such as a menu. */
  deeds?: ReactNode;
}

/** A ruled slip with a drawing, that leads somewhere: the whole of it can be pressed. */
export function Slip({ to, title, picture, children, deeds }: Props) {
  return (
    <li className="relative flex flex-col border border-plaster-200 bg-white has-[a:hover]:border-chalk-600">
      <div className="flex h-44 items-center justify-center border-b border-plaster-200 bg-plaster-100 p-3">{picture}</div>
      <div className="flex grow items-start justify-between gap-2 px-4 py-3">
        <div className="min-w-0">
          <h3 className="font-bold break-words">
            <Link to={to} className="text-chalk-600 underline-offset-4 after:absolute after:inset-0 hover:underline">
              {title}
            </Link>
          </h3>
          <div className="mt-1 text-sm text-ink-700">{children}</div>
        </div>
        {deeds ? <div className="relative z-10 shrink-0">{deeds}</div> : null}
      </div>
    </li>
  );
}

/** Slips side by side, as many as there is room for. */
export function Slips({ children }: { children: ReactNode }) {
  return <ul className="grid gap-4 sm:grid-cols-2 lg:grid-cols-3">{children}</ul>;
}
