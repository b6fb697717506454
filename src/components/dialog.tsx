import { X } from 'lucide-react';
import { Dialog as Parts } from 'radix-ui';
import type { ReactNode } from 'react';
import { classNames } from './class-names.ts';

interface Props {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: string;
  /** What it is for, in a sentence. */
  about?: ReactNode;
  /** `all`: nearly the whole window, for a dialog that one works in. */
  wide?: boolean | 'all';
  children: ReactNode;
}

/** A sheet laid over the page: focus stays in it, Escape closes it, the page behind is hidden from readers. */
export function Dialog({ open, onOpenChange, title, about, wide = false, children }: Props) {
  return (
    <Parts.Root open={open} onOpenChange={onOpenChange}>
      <Parts.Portal>
        <Parts.Overlay className="fixed inset-0 z-40 bg-ink-900/50" />
        <Parts.Content
          aria-describedby={about ? undefined : ''}
          className={classNames(
            'fixed inset-x-0 bottom-0 z-50 mx-auto flex max-h-[94dvh] w-full flex-col border border-ink-700 bg-plaster-50 sm:inset-y-0 sm:my-auto sm:h-fit',
            wide === 'all' ? 'sm:max-w-[88rem]' : wide ? 'sm:max-w-4xl' : 'sm:max-w-lg',
          )}
        >
          <header className="flex items-start justify-between gap-4 border-b border-ink-700 px-5 py-3">
            <div>
              <Parts.Title className="text-lg font-bold text-ink-900">{title}</Parts.Title>
              {about ? <Parts.Description className="mt-0.5 text-sm text-ink-700">{about}</Parts.Description> : null}
            </div>
            <Parts.Close className="-mr-2 inline-flex size-8 shrink-0 items-center justify-center rounded-sm text-ink-700 hover:text-chalk-700" aria-label="Close">
              <X aria-hidden="true" className="size-5" />
            </Parts.Close>
          </header>
          <div className="overflow-y-auto px-5 py-4">{children}</div>
        </Parts.Content>
      </Parts.Portal>
    </Parts.Root>
  );
}

/** The row of buttons that ends a dialog or a form. */
export function Actions({ children }: { children: ReactNode }) {
  return <div className="mt-5 flex flex-wrap items-center justify-end gap-3">{children}</div>;
}
