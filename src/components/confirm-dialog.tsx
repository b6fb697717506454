import type { ReactNode } from 'react';
import { Button } from './button.tsx';
import { Actions, Dialog } from './dialog.tsx';

interface Props {
  open: boolean;
  title: string;
  children: ReactNode;
  /** What the confirming button says: the deed itself, never "OK". */
  deed: string;
  keep?: string;
  danger?: boolean;
  busy?: boolean;
  onConfirm: () => void;
  onCancel: () => void;
}

/** Asks before something that cannot be undone. */
export function ConfirmDialog({ open, title, children, deed, keep = 'Cancel', danger = false, busy = false, onConfirm, onCancel }: Props) {
  return (
    <Dialog open={open} onOpenChange={(next) => (next ? undefined : onCancel())} title={title}>
      <div className="text-ink-900">{children}</div>
      <Actions>
        <Button onClick={onCancel}>{keep}</Button>
        <Button weight={danger ? 'danger' : 'primary'} busy={busy} onClick={onConfirm}>
          {deed}
        </Button>
      </Actions>
    </Dialog>
  );
}
