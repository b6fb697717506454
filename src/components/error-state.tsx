import { isCallError } from '../lib/call-error.ts';
import { Button } from './button.tsx';
import { Notice } from './notice.tsx';

/** A failure in words, with the request's number for whoever is asked for help, and a way to try again. */
export function ErrorState({ error, onRetry }: { error: unknown; onRetry?: () => void }) {
  const problem = isCallError(error) ? error.problem : null;
  return (
    <Notice kind="stop" live>
      <p className="font-bold">{problem?.title ?? 'Something went wrong on this page'}</p>
      <p className="mt-1">{problem?.detail ?? (problem ? null : 'Reload the page. If it happens again, tell whoever keeps this program.')}</p>
      {problem?.requestId ? <p className="mt-1 text-sm text-ink-700">Request {problem.requestId}</p> : null}
      {onRetry ? (
        <Button small className="mt-3" onClick={onRetry}>
          Try again
        </Button>
      ) : null}
    </Notice>
  );
}
