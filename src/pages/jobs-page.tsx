import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate, useSearchParams } from 'react-router-dom';
import { jobStates } from '../../shared/jobs/jobs.api.ts';
import { Button } from '../components/button.tsx';
import { EmptyState } from '../components/empty-state.tsx';
import { ErrorState } from '../components/error-state.tsx';
import { Loading } from '../components/loading.tsx';
import { Page } from '../components/page.tsx';
import { SelectField } from '../components/select-field.tsx';
import { TextField } from '../components/text-field.tsx';
import { TitleBlock } from '../components/title-block.tsx';
import { type JobFilter, narrowed } from '../features/jobs/job-book.ts';
import { NewJobDialog } from '../features/jobs/job-dialog.tsx';
import { stateWords } from '../features/jobs/job-states.tsx';
import { JobTable } from '../features/jobs/job-table.tsx';
import { jobsQuery } from '../features/jobs/jobs.queries.ts';
import { usePageTitle } from '../lib/page-title.ts';
import { paths } from '../lib/paths.ts';
import { useMay } from '../lib/session.ts';

const stateOptions = [
  { value: 'running', words: 'All running' },
  { value: 'all', words: 'All' },
  ...jobStates.map((state) => ({ value: state, words: stateWords[state] })),
];

export function JobsPage() {
  usePageTitle('Jobs');
  const mayChange = useMay('change jobs');
  const navigate = useNavigate();
  const jobs = useQuery(jobsQuery);
  const [opening, setOpening] = useState(false);
  const [search, setSearch] = useSearchParams();
  const filter = readFilter(search);
  const narrow = (next: Partial<JobFilter>) => {
    const { text, state } = { ...filter, ...next };
    setSearch({ ...(text ? { find: text } : {}), ...(state === 'running' ? {} : { state }) }, { replace: true });
  };
  const found = jobs.data ? narrowed(jobs.data, filter) : [];
  const openJob = (
    <Button weight="primary" onClick={() => setOpening(true)}>
      New job
    </Button>
  );

  return (
    <Page>
      <TitleBlock
        title="Job book"
        cells={jobs.data ? [{ label: 'Running', value: narrowed(jobs.data, { text: '', state: 'running' }).length }, { label: 'In all', value: jobs.data.length }] : []}
        action={mayChange ? openJob : undefined}
      />
      {jobs.isError && !jobs.data ? <ErrorState error={jobs.error} onRetry={() => void jobs.refetch()} /> : null}
      {jobs.isPending ? <Loading what="the job book" /> : null}
      {jobs.data?.length === 0 ? (
        mayChange ? (
          <EmptyState title="No jobs yet" action={<Button onClick={() => setOpening(true)}>Open the first job</Button>}>
            A job carries a commission from the first photo of the wall to the last screw.
          </EmptyState>
        ) : (
          <EmptyState title="No jobs are assigned to you">The owner or a maker of the shop assigns them on the page of the job.</EmptyState>
        )
      ) : null}
      {jobs.data && jobs.data.length > 0 ? (
        <>
          <search className="grid gap-4 sm:grid-cols-[2fr_1fr]">
            <TextField label="Find" type="search" placeholder="Title, client or site" value={filter.text} onChange={(event) => narrow({ text: event.target.value })} />
            <SelectField label="State" options={stateOptions} value={filter.state} onChange={(event) => narrow({ state: event.target.value as JobFilter['state'] })} />
          </search>
          <p role="status" className="sr-only">
            {found.length === 1 ? '1 job' : `${found.length} jobs`}
          </p>
          {found.length > 0 ? (
            <JobTable jobs={found} />
          ) : (
            <EmptyState title="No job fits" action={<Button onClick={() => narrow({ text: '', state: 'all' })}>Show all jobs</Button>}>
              Nothing in the job book has these words in this state.
            </EmptyState>
          )}
        </>
      ) : null}
      {opening ? <NewJobDialog onClose={() => setOpening(false)} onOpened={(job) => void navigate(paths.job(job.id))} /> : null}
    </Page>
  );
}

function readFilter(search: URLSearchParams): JobFilter {
  const state = stateOptions.find(({ value }) => value === search.get('state'))?.value ?? 'running';
  return { text: search.get('find') ?? '', state: state as JobFilter['state'] };
}
