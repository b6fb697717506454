import { jobsApi } from '../../shared/jobs/jobs.api.ts';
import type { Mount } from '../http/mount.ts';
import type { JobsService } from './jobs.service.ts';

export function jobsRoutes(mount: Mount, jobs: JobsService): void {
  mount.on(jobsApi.list, ({ who }) => jobs.list(who));
  mount.on(jobsApi.create, ({ who, body }) => jobs.create(who, body));
  mount.on(jobsApi.read, ({ who, params }) => jobs.read(who, params.jobId));
  mount.on(jobsApi.change, ({ who, params, body }) => jobs.change(who, params.jobId, body));
}
