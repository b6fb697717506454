import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { peopleApi } from '../../shared/people/people.api.ts';
import { Button } from '../components/button.tsx';
import { Actions, Dialog } from '../components/dialog.tsx';
import { ErrorState } from '../components/error-state.tsx';
import { TextField } from '../components/text-field.tsx';
import { call } from '../lib/call.ts';
import { meQuery, sessionEndedQuery } from '../lib/session.ts';

/** Asks for the password over the page when the session ends, so that nothing typed there is lost. */
export function SignInAgain({ email }: { email: string }) {
  const client = useQueryClient();
  const [password, setPassword] = useState('');
  const [state, setState] = useState<{ busy: boolean; error: unknown }>({ busy: false, error: null });
  const send = async () => {
    setState({ busy: true, error: null });
    try {
      client.setQueryData(meQuery.queryKey, await call(peopleApi.signIn, { body: { email, password } }));
      client.setQueryData(sessionEndedQuery.queryKey, false);
      await client.invalidateQueries();
    } catch (error) {
      setState({ busy: false, error });
    }
  };
  return (
    <Dialog open onOpenChange={() => undefined} title="Please sign in again" about="Your session has ended. The page behind this stays as it is.">
      <form
        onSubmit={(event) => {
          event.preventDefault();
          void send();
        }}
      >
        <div className="grid gap-4">
          <input type="hidden" name="username" autoComplete="username" value={email} />
          <TextField label={`Password of ${email}`} type="password" autoComplete="current-password" required value={password} onChange={(event) => setPassword(event.target.value)} />
          {state.error ? <ErrorState error={state.error} /> : null}
        </div>
        <Actions>
          <Button type="submit" weight="primary" busy={state.busy}>
            Sign in
          </Button>
        </Actions>
      </form>
    </Dialog>
  );
}
