import { useState } from 'react';
import { type PortalRevision, signoffsApi } from '../../../shared/signoffs/signoffs.api.ts';
import { Button } from '../../components/button.tsx';
import { CheckField } from '../../components/check-field.tsx';
import { Actions } from '../../components/dialog.tsx';
import { ErrorState } from '../../components/error-state.tsx';
import { LeaveGuard } from '../../components/leave-guard.tsx';
import { TextAreaField, TextField } from '../../components/text-field.tsx';
import { useSheetForm } from '../../lib/sheet-form.ts';
import { useAnswer } from './signoffs.queries.ts';

interface Props {
  token: string;
  revision: PortalRevision;
  /** The sentence that signing agrees to. */
  consent: string;
}

/** The two answers a client can give: sign, or ask for changes. */
export function AnswerForms({ token, revision, consent }: Props) {
  const [way, setWay] = useState<'none' | 'sign' | 'changes'>('none');
  const back = () => setWay('none');
  if (way === 'sign') return <SignForm token={token} revision={revision} consent={consent} onBack={back} />;
  if (way === 'changes') return <ChangesForm token={token} revision={revision} onBack={back} />;
  return (
    <div className="grid gap-3 sm:grid-cols-2">
      <Button weight="primary" className="min-h-12" onClick={() => setWay('sign')}>
        Sign {revision.layoutName}
      </Button>
      <Button className="min-h-12" onClick={() => setWay('changes')}>
        Ask for changes<span className="sr-only"> to {revision.layoutName}</span>
      </Button>
    </div>
  );
}

function SignForm({ token, revision, consent, onBack }: Props & { onBack: () => void }) {
  const { sign } = useAnswer(token, revision.id);
  const sheet = useSheetForm({
    schema: signoffsApi.sign.body,
    defaultValues: { name: '', sha256: revision.sha256 },
    send: (body) => sign.mutateAsync(body),
  });
  const { register, formState } = sheet.form;
  return (
    <form noValidate onSubmit={(event) => void sheet.submit(event)} className="border border-ink-700 bg-white px-4 py-4">
      <h3 className="mb-3 text-lg font-bold">Sign {revision.layoutName}</h3>
      <div className="grid gap-4">
        <TextField label="Your full name" autoComplete="name" hint="Typed here, it stands as your signature." error={formState.errors.name?.message} {...register('name')} />
        <CheckField label={consent} error={formState.errors.agreed?.message} {...register('agreed')} />
        {sheet.failure ? <ErrorState error={sheet.failure} /> : null}
      </div>
      {sheet.unsaved ? <LeaveGuard unsaved /> : null}
      <Actions>
        <Button onClick={onBack}>Back</Button>
        <Button type="submit" weight="primary" busy={sheet.sending}>
          Sign
        </Button>
      </Actions>
    </form>
  );
}

function ChangesForm({ token, revision, onBack }: Omit<Props, 'consent'> & { onBack: () => void }) {
  const { askChanges } = useAnswer(token, revision.id);
  const sheet = useSheetForm({ schema: signoffsApi.askChanges.body, defaultValues: { words: '' }, send: (body) => askChanges.mutateAsync(body) });
  const { register, formState } = sheet.form;
  return (
    <form noValidate onSubmit={(event) => void sheet.submit(event)} className="border border-ink-700 bg-white px-4 py-4">
      <h3 className="mb-3 text-lg font-bold">Ask for changes to {revision.layoutName}</h3>
      <TextAreaField label="What should change?" rows={5} hint="Frames can be named by their numbers on the drawing." error={formState.errors.words?.message} {...register('words')} />
      {sheet.failure ? <ErrorState error={sheet.failure} /> : null}
      {sheet.unsaved ? <LeaveGuard unsaved /> : null}
      <Actions>
        <Button onClick={onBack}>Back</Button>
        <Button type="submit" weight="primary" busy={sheet.sending}>
          Send to the shop
        </Button>
      </Actions>
    </form>
  );
}
