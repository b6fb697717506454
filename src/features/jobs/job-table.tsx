import { Link } from 'react-router-dom';
import type { Job } from '../../../shared/jobs/jobs.api.ts';
import { dayOf } from '../../lib/dates.ts';
import { paths } from '../../lib/paths.ts';
import { nextOutstanding } from './job-card.tsx';
import { JobState } from './job-states.tsx';

/** The job book as a list: a table where there is room, ruled slips on a phone. */
export function JobTable({ jobs }: { jobs: readonly Job[] }) {
  return (
    <table className="block w-full text-left md:table md:border md:border-plaster-200 md:bg-white">
      <caption className="sr-only">Jobs</caption>
      <thead className="sr-only md:not-sr-only md:table-header-group">
        <tr className="text-sm text-ink-700">
          {['Job', 'Client', 'Site', 'State', 'Outstanding', 'Changed'].map((words) => (
            <th key={words} scope="col" className="border-b border-ink-700 px-3 py-2 font-semibold">
              {words}
            </th>
          ))}
        </tr>
      </thead>
      <tbody className="grid gap-3 md:table-row-group">
        {jobs.map((job) => (
          <Row key={job.id} job={job} />
        ))}
      </tbody>
    </table>
  );
}

const cell = 'block px-3 md:table-cell md:border-b md:border-plaster-200 md:py-2 md:align-top';

function Row({ job }: { job: Job }) {
  const next = nextOutstanding(job.card);
  return (
    <tr className="relative block border border-plaster-200 bg-white py-2 hover:bg-chalk-100 md:table-row">
      <th scope="row" className={`${cell} font-bold`}>
        <Link to={paths.job(job.id)} className="text-chalk-600 underline-offset-4 after:absolute after:inset-0 hover:underline">
          {job.title}
        </Link>
      </th>
      <td className={cell}>{job.clientName}</td>
      <td className={`${cell} text-ink-700`}>{job.site}</td>
      <td className={`${cell} py-1`}>
        <JobState state={job.state} />
      </td>
      <td className={`${cell} text-sm`}>
        {next ? (
          <>
            <span className="font-semibold">{next.step}:</span> {next.words}
          </>
        ) : (
          <span className="text-ink-700">Nothing outstanding</span>
        )}
      </td>
      <td className={`${cell} text-sm whitespace-nowrap text-ink-700 tabular-nums`}>
        <span className="md:sr-only">Changed </span>
        {dayOf(job.updatedAt)}
      </td>
    </tr>
  );
}
