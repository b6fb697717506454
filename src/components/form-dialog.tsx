import { type ReactNode, useState } from 'react';
import type { FieldValues } from 'react-hook-form';
import type { SheetForm } from '../lib/sheet-form.ts';
import { Button } from './button.tsx';
import { Actions, Dialog } from './dialog.tsx';
import { ErrorState } from './error-state.tsx';
import { LeaveGuard } from './leave-guard.tsx';
import { Notice } from './notice.tsx';

interface Props<In extends FieldValues, Out extends FieldValues> {
  title: string;
  about?: ReactNode;
  wide?: boolean;
  /** What the button says: the deed itself. */
  deed: string;
  sheet: SheetForm<In, Out>;
  onClose: () => void;
  children: ReactNode;
}

/** A form in a dialog. Closing it with something typed asks first. Mount it to open it. */
export function FormDialog<In extends FieldValues, Out extends FieldValues>({ title, about, wide, deed, sheet, onClose, children }: Props<In, Out>) {
  const [asking, setAsking] = useState(false);
  const close = () => (sheet.unsaved ? setAsking(true) : onClose());
  return (
    <Dialog open onOpenChange={(open) => (open ? undefined : close())} title={title} about={about} wide={wide}>
      <form noValidate onSubmit={(event) => void sheet.submit(event)}>
        <div className="grid gap-4">
          {children}
          {sheet.failure ? <ErrorState error={sheet.failure} /> : null}
          {asking && sheet.unsaved ? (
            <Notice kind="caution" live>
              <p className="font-semibold">What you have typed is not saved yet.</p>
              <div className="mt-2 flex flex-wrap gap-3">
                <Button small onClick={() => setAsking(false)}>
                  Keep typing
                </Button>
                <Button small weight="danger" onClick={onClose}>
                  Throw it away
                </Button>
              </div>
            </Notice>
          ) : null}
        </div>
        {sheet.unsaved ? <LeaveGuard unsaved /> : null}
        <Actions>
          <Button onClick={close}>Cancel</Button>
          <Button type="submit" weight="primary" busy={sheet.sending}>
            {deed}
          </Button>
        </Actions>
      </form>
    </Dialog>
  );
}
