import { ChevronDown } from 'lucide-react';
import { DropdownMenu as Parts } from 'radix-ui';
import type { ReactNode } from 'react';
import { classNames } from './class-names.ts';

interface Props {
  label: ReactNode;
  /** Name for those who hear the page, where `label` is only a picture. */
  name?: string;
  className?: string;
  children: ReactNode;
}

/** A button that opens a short list of deeds. */
export function Menu({ label, name, className, children }: Props) {
  return (
    <Parts.Root>
      <Parts.Trigger
        aria-label={name}
        className={classNames('inline-flex min-h-9 items-center gap-1 rounded-sm px-2 font-semibold text-ink-900 hover:text-chalk-700', className)}
      >
        {label}
        <ChevronDown aria-hidden="true" className="size-4" />
      </Parts.Trigger>
      <Parts.Portal>
        <Parts.Content align="end" sideOffset={4} className="z-50 min-w-48 border border-ink-700 bg-white py-1 shadow-md">
          {children}
        </Parts.Content>
      </Parts.Portal>
    </Parts.Root>
  );
}

/** One deed of a menu. */
export function MenuItem({ onSelect, danger = false, disabled, children }: { onSelect: () => void; danger?: boolean; disabled?: boolean; children: ReactNode }) {
  return (
    <Parts.Item
      disabled={disabled}
      onSelect={onSelect}
      className={classNames(
        'flex min-h-9 cursor-pointer items-center gap-2 px-4 outline-none data-[disabled]:opacity-60 data-[highlighted]:bg-chalk-100',
        danger ? 'text-madder-600' : 'text-ink-900',
      )}
    >
      {children}
    </Parts.Item>
  );
}

/** Words in a menu that do nothing. */
export function MenuWords({ children }: { children: ReactNode }) {
  return <Parts.Label className="px-4 py-2 text-sm text-ink-700">{children}</Parts.Label>;
}

export function MenuRule() {
  return <Parts.Separator className="my-1 border-t border-plaster-200" />;
}
