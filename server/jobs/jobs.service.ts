import { randomUUID } from 'node:crypto';
import { jobCard } from '../../shared/jobs/job-card.ts';
import type { Job, jobsApi } from '../../shared/jobs/jobs.api.ts';
import type { BodyOf } from '../../shared/api/endpoint.ts';
import type { Layout } from '../../shared/layouts/layout.ts';
import { mayReadJob } from '../../shared/people/permissions.ts';
import type { Wall } from '../../shared/walls/wall.ts';
import { notFound, ProblemError } from '../http/problems.ts';
import type { Who } from '../http/who.ts';
import type { PeopleService } from '../people/people.service.ts';
import type { JobsRepository, JobWithPeople } from './jobs.repository.ts';

/** What the job card looks at; given at the wiring, since walls and layouts ask jobs who may read. */
export interface CardSources {
  wallsOf(job: JobWithPeople): Promise<Wall[]>;
  layoutsOf(job: JobWithPeople): Promise<Layout[]>;
}

export function jobsService(jobs: JobsRepository, people: PeopleService, clock: () => Date) {
  let sources: CardSources = { wallsOf: async () => [], layoutsOf: async () => [] };

  async function jobFor(who: Who, jobId: string): Promise<JobWithPeople> {
    const job = await jobs.find(who.shopId, jobId);
    if (!job || !mayReadJob(who, job)) throw notFound('job');
    return job;
  }

  async function told(job: JobWithPeople): Promise<Job> {
    const [walls, layouts] = await Promise.all([sources.wallsOf(job), sources.layoutsOf(job)]);
    return {
      id: job.id, title: job.title, clientName: job.clientName, clientEmail: job.clientEmail, site: job.site, state: job.state,
      version: job.version, assignedTo: job.assignedTo, createdAt: job.createdAt.toISOString(), updatedAt: job.updatedAt.toISOString(),
      card: jobCard({ state: job.state, walls, layouts, assigned: job.assignedTo.length, now: clock().toISOString() }),
    };
  }

  return {
    lookAt(given: CardSources): void {
      sources = given;
    },

    /** The job, where this member may read it; otherwise it is not found, so that its existence stays unknown. */
    jobFor,

    async list(who: Who): Promise<Job[]> {
      const readable = (await jobs.ofShop(who.shopId)).filter((job) => mayReadJob(who, job));
      return Promise.all(readable.map(told));
    },

    async create(who: Who, sheet: BodyOf<typeof jobsApi.create>): Promise<Job> {
      const now = clock();
      const row = { id: randomUUID(), shopId: who.shopId, ...sheet, state: 'enquiry' as const, version: 1, createdAt: now, updatedAt: now };
      await jobs.add(row);
      return told({ ...row, assignedTo: [] });
    },

    async read(who: Who, jobId: string): Promise<Job> {
      return told(await jobFor(who, jobId));
    },

    async change(who: Who, jobId: string, change: BodyOf<typeof jobsApi.change>): Promise<Job> {
      await jobFor(who, jobId);
      const { version, assignedTo, ...values } = change;
      if (assignedTo) await people.requireMembers(who, assignedTo);
      const saved = await jobs.change(jobId, version, { ...values, updatedAt: clock() }, assignedTo);
      const current = await told(await jobFor(who, jobId));
      if (!saved) throw new ProblemError('stale', 'Someone changed this job since you opened it. Look at what stands now and save again.', { current });
      return current;
    },

    /** Marks that something of the job was worked on; an enquiry that is worked on is being designed. */
    async touch(job: { id: string; state: Job['state'] }): Promise<void> {
      await jobs.touch(job.id, clock(), job.state === 'enquiry' ? 'design' : undefined);
    },

    /** After a signature the job goes to the bench. */
    async signed(job: { id: string; state: Job['state'] }): Promise<void> {
      await jobs.touch(job.id, clock(), job.state === 'enquiry' || job.state === 'design' ? 'build' : undefined);
    },

    async ofShop(shopId: string, jobId: string): Promise<JobWithPeople | null> {
      return jobs.find(shopId, jobId);
    },
  };
}
export type JobsService = ReturnType<typeof jobsService>;
