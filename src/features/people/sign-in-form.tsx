import { peopleApi } from '../../../shared/people/people.api.ts';
import { Button } from '../../components/button.tsx';
import { ErrorState } from '../../components/error-state.tsx';
import { TextField } from '../../components/text-field.tsx';
import { useSheetForm } from '../../lib/sheet-form.ts';
import { useEnter } from './people.queries.ts';

interface Props {
  /** Invented people of the demo shop, who can be entered as at a press; empty outside demo mode. */
  demo: readonly { email: string; password: string; role: string; name: string }[];
  onEntered: () => void;
}

/** Signing in by e-mail and password. */
export function SignInForm({ demo, onEntered }: Props) {
  const enter = useEnter();
  const sheet = useSheetForm({
    schema: peopleApi.signIn.body,
    defaultValues: { email: '', password: '' },
    send: async (signIn) => {
      await enter.mutateAsync({ signIn });
      onEntered();
    },
  });
  const { register, formState, setValue } = sheet.form;
  return (
    <form noValidate onSubmit={(event) => void sheet.submit(event)} className="grid gap-4">
      <TextField label="E-mail" type="email" autoComplete="username" error={formState.errors.email?.message} {...register('email')} />
      <TextField label="Password" type="password" autoComplete="current-password" error={formState.errors.password?.message} {...register('password')} />
      {sheet.failure ? <ErrorState error={sheet.failure} /> : null}
      <Button type="submit" weight="primary" busy={sheet.sending}>
        Sign in
      </Button>
      {demo.length > 0 ? (
        <fieldset className="border border-dashed border-ink-500 px-4 pt-2 pb-4">
          <legend className="px-1 text-sm font-semibold">Demo shop</legend>
          <p className="mb-3 text-sm text-ink-700">The people and jobs of this shop are invented. Go in as:</p>
          <div className="grid gap-2 sm:grid-cols-3">
            {demo.map((person) => (
              <Button
                key={person.email}
                aria-label={`Sign in as ${person.name}, ${person.role}`}
                className="flex-col !gap-0"
                onClick={() => {
                  setValue('email', person.email);
                  setValue('password', person.password);
                  void sheet.submit();
                }}
              >
                <span>{person.name}</span>
                <span className="text-sm font-normal text-ink-700">{person.role}</span>
              </Button>
            ))}
          </div>
        </fieldset>
      ) : null}
    </form>
  );
}
