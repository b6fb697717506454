import { toast } from 'sonner';
import type { Job } from '../../../shared/jobs/jobs.api.ts';
import type { Member } from '../../../shared/people/people.api.ts';
import { CheckField } from '../../components/check-field.tsx';
import { ErrorState } from '../../components/error-state.tsx';
import { useChangeJob } from './jobs.queries.ts';

/** Which hangers see the job. Each tick is saved as it is made. */
export function HangerAssignment({ job, members }: { job: Job; members: readonly Member[] }) {
  const change = useChangeJob(job.id);
  const hangers = members.filter((member) => member.role === 'hanger' && (member.active || job.assignedTo.includes(member.id)));
  if (hangers.length === 0) return <p className="text-ink-700">No one in the shop is a hanger yet. The owner adds people under Team.</p>;
  const assign = (member: Member, on: boolean) => {
    const assignedTo = on ? [...job.assignedTo, member.id] : job.assignedTo.filter((memberId) => memberId !== member.id);
    change.mutate({ version: job.version, assignedTo }, { onSuccess: () => toast.success(on ? `${member.name} sees this job now` : `${member.name} no longer sees this job`) });
  };
  return (
    <div className="grid gap-3">
      {hangers.map((member) => (
        <CheckField key={member.id} label={member.name} checked={job.assignedTo.includes(member.id)} disabled={change.isPending} onChange={(event) => assign(member, event.target.checked)} />
      ))}
      {change.isError ? <ErrorState error={change.error} /> : null}
    </div>
  );
}
