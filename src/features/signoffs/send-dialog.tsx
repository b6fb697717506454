import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { z } from 'zod';
import type { Layout } from '../../../shared/layouts/layout.ts';
import { signoffsApi } from '../../../shared/signoffs/signoffs.api.ts';
import { Button } from '../../components/button.tsx';
import { Actions, Dialog } from '../../components/dialog.tsx';
import { FormDialog } from '../../components/form-dialog.tsx';
import { TextAreaField } from '../../components/text-field.tsx';
import { call } from '../../lib/call.ts';
import { keys } from '../../lib/keys.ts';
import { useSheetForm } from '../../lib/sheet-form.ts';

const Sheet = z.object({ note: z.string().max(2000, 'At most 2,000 characters, please.') });

interface Props {
  layout: Layout;
  client: { name: string; email: string };
  /** How many frames the client will see, and what the checks would stop; shown before it is sent. */
  frameCount: number;
  stops: number;
  /** Saves what is unsaved, and gives the version that stands then; throws where it could not be saved. */
  readyVersion: () => Promise<number>;
  onClose: () => void;
}

/** Freezes the layout as a revision and mails the client their link. */
export function SendDialog({ layout, client, frameCount, stops, readyVersion, onClose }: Props) {
  const queries = useQueryClient();
  const [sent, setSent] = useState<Layout | null>(null);
  const sheet = useSheetForm({
    schema: Sheet,
    defaultValues: { note: '' },
    send: async ({ note }) => {
      const version = await readyVersion();
      const now = await call(signoffsApi.send, { params: { layoutId: layout.id }, body: { version, note } });
      queries.setQueryData(keys.layout(layout.id), now);
      void queries.invalidateQueries({ queryKey: keys.job(layout.jobId) });
      setSent(now);
    },
  });

  if (sent) {
    return (
      <Dialog open onOpenChange={onClose} title={`Revision ${sent.letter} is with the client`}>
        <p>
          {client.name} has a mail at {client.email} with a personal link to {sent.name}, revision {sent.letter}. What was sent is frozen; what you change from now on becomes the next revision.
        </p>
        <Actions>
          <Button weight="primary" onClick={onClose}>
            Back to the layout
          </Button>
        </Actions>
      </Dialog>
    );
  }
  return (
    <FormDialog
      title={`Send “${layout.name}” to the client`}
      about={`${client.name} gets a mail at ${client.email} with a personal link, sees the layout on the wall, and can sign it or ask for changes.`}
      deed={`Send revision ${layout.letter}`}
      sheet={sheet}
      onClose={onClose}
    >
      <p className="text-ink-900">
        {frameCount === 1 ? 'One frame' : `${frameCount} frames`}.{' '}
        {stops > 0 ? <strong>{stops === 1 ? 'One check says stop' : `${stops} checks say stop`}: look at the ledger before the client signs what cannot be hung.</strong> : null}
      </p>
      <TextAreaField label="Note to the client" optional error={sheet.form.formState.errors.note?.message} {...sheet.form.register('note')} />
    </FormDialog>
  );
}
