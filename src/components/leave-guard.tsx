import { useLeaveGuard } from '../lib/leave-guard.ts';
import { ConfirmDialog } from './confirm-dialog.tsx';

/** Warns before a page with unsaved input is left. */
export function LeaveGuard({ unsaved }: { unsaved: boolean }) {
  const blocker = useLeaveGuard(unsaved);
  return (
    <ConfirmDialog
      open={blocker.state === 'blocked'}
      title="Leave without saving?"
      deed="Leave and lose it"
      keep="Stay"
      danger
      onConfirm={() => blocker.proceed?.()}
      onCancel={() => blocker.reset?.()}
    >
      <p>What you have typed on this page has not been saved.</p>
    </ConfirmDialog>
  );
}
