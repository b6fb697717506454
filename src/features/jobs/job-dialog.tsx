import { toast } from 'sonner';
import { type Job, jobsApi } from '../../../shared/jobs/jobs.api.ts';
import { FormDialog } from '../../components/form-dialog.tsx';
import { TextAreaField, TextField } from '../../components/text-field.tsx';
import { useSheetForm } from '../../lib/sheet-form.ts';
import { useChangeJob, useOpenJob } from './jobs.queries.ts';

/** Opens a new job. */
export function NewJobDialog({ onClose, onOpened }: { onClose: () => void; onOpened: (job: Job) => void }) {
  const open = useOpenJob();
  return (
    <JobDialog
      title="New job"
      deed="Open the job"
      start={{ title: '', clientName: '', clientEmail: '', site: '' }}
      onClose={onClose}
      send={async (sheet) => onOpened(await open.mutateAsync(sheet))}
    />
  );
}

/** Changes what a job says of itself. */
export function ChangeJobDialog({ job, onClose }: { job: Job; onClose: () => void }) {
  const change = useChangeJob(job.id);
  return (
    <JobDialog
      title="Change the job"
      deed="Save"
      start={{ title: job.title, clientName: job.clientName, clientEmail: job.clientEmail, site: job.site }}
      onClose={onClose}
      send={async (sheet) => {
        await change.mutateAsync({ ...sheet, version: job.version });
        toast.success('Job saved');
        onClose();
      }}
    />
  );
}

type Sheet = Pick<Job, 'title' | 'clientName' | 'clientEmail' | 'site'>;

interface Props {
  title: string;
  deed: string;
  start: Sheet;
  send: (sheet: Sheet) => Promise<void>;
  onClose: () => void;
}

function JobDialog({ title, deed, start, send, onClose }: Props) {
  const sheet = useSheetForm({ schema: jobsApi.create.body, defaultValues: start, send });
  const { register, formState } = sheet.form;
  const { errors } = formState;
  return (
    <FormDialog title={title} deed={deed} sheet={sheet} onClose={onClose}>
      <TextField label="Title" hint="What the shop calls it, such as “Reading room, north wall”." error={errors.title?.message} {...register('title')} />
      <TextField label="Client" autoComplete="off" error={errors.clientName?.message} {...register('clientName')} />
      <TextField label="Client's e-mail" type="email" autoComplete="off" hint="Links for sign-off go here." error={errors.clientEmail?.message} {...register('clientEmail')} />
      <TextAreaField label="Site" optional rows={2} hint="Address, and how to get in." error={errors.site?.message} {...register('site')} />
    </FormDialog>
  );
}
