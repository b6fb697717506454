import { useOnline } from '../lib/online.ts';

/** Says that the device has no connection, and what that means for the work at hand. */
export function OfflineStrip() {
  const online = useOnline();
  return (
    <div role="status" data-screen-only>
      {online ? null : (
        <p className="border-b border-ochre-600 bg-ochre-100 px-4 py-2 text-sm font-semibold text-ink-900">
          No connection. What is on the page may be out of date; changes that cannot be sent are told where they are made.
        </p>
      )}
    </div>
  );
}
