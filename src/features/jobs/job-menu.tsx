import { useState } from 'react';
import { toast } from 'sonner';
import { type Job, jobStates } from '../../../shared/jobs/jobs.api.ts';
import { Menu, MenuItem, MenuRule, MenuWords } from '../../components/menu.tsx';
import { isCallError } from '../../lib/call-error.ts';
import { ChangeJobDialog } from './job-dialog.tsx';
import { stateWords } from './job-states.tsx';
import { useChangeJob } from './jobs.queries.ts';

/** Changing a job's sheet, and moving it to another state. */
export function JobMenu({ job }: { job: Job }) {
  const change = useChangeJob(job.id);
  const [changing, setChanging] = useState(false);
  const moveTo = (state: Job['state']) =>
    change.mutate(
      { version: job.version, state },
      {
        onSuccess: () => toast.success(`The job is in ${stateWords[state].toLowerCase()} now`),
        onError: (error) => toast.error(isCallError(error) ? error.problem.title : 'The job was not changed', { description: isCallError(error) ? error.problem.detail : undefined }),
      },
    );
  return (
    <>
      <Menu label="Job" className="border border-ink-500 bg-white">
        <MenuItem onSelect={() => setChanging(true)}>Change title, client or site…</MenuItem>
        <MenuRule />
        <MenuWords>Move to</MenuWords>
        {jobStates
          .filter((state) => state !== job.state)
          .map((state) => (
            <MenuItem key={state} onSelect={() => moveTo(state)}>
              {stateWords[state]}
            </MenuItem>
          ))}
      </Menu>
      {changing ? <ChangeJobDialog job={job} onClose={() => setChanging(false)} /> : null}
    </>
  );
}
