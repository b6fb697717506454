import type { Job } from '../../../shared/jobs/jobs.api.ts';

/** What the job book is narrowed to: words, and a state, or all that are still running. */
export interface JobFilter {
  text: string;
  state: Job['state'] | 'running' | 'all';
}

const plain = (text: string) => text.normalize('NFD').replace(/\p{Mark}/gu, '').toLowerCase();

/** The jobs that hold every typed word in title, client or site, the last changed first. Accents and case do not matter. */
export function narrowed(jobs: readonly Job[], { text, state }: JobFilter): Job[] {
  const words = plain(text).split(/\s+/).filter(Boolean);
  return jobs
    .filter((job) => state === 'all' || (state === 'running' ? job.state !== 'done' && job.state !== 'declined' : job.state === state))
    .filter((job) => {
      const hay = plain([job.title, job.clientName, job.clientEmail, job.site].join(' '));
      return words.every((word) => hay.includes(word));
    })
    .sort((a, b) => (a.updatedAt < b.updatedAt ? 1 : -1));
}
