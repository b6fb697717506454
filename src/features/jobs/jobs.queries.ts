import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { BodyInputOf } from '../../../shared/api/endpoint.ts';
import { jobsApi } from '../../../shared/jobs/jobs.api.ts';
import { call } from '../../lib/call.ts';
import { keys } from '../../lib/keys.ts';

/** The job book. */
export const jobsQuery = queryOptions({ queryKey: keys.jobs, queryFn: ({ signal }) => call(jobsApi.list, { signal }) });

/** One job with its card. */
export const jobQuery = (jobId: string) =>
  queryOptions({ queryKey: keys.job(jobId), queryFn: ({ signal }) => call(jobsApi.read, { params: { jobId }, signal }) });

export function useOpenJob() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: BodyInputOf<typeof jobsApi.create>) => call(jobsApi.create, { body }),
    onSuccess: (job) => {
      client.setQueryData(keys.job(job.id), job);
      return client.invalidateQueries({ queryKey: keys.jobs, exact: true });
    },
  });
}

export function useChangeJob(jobId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: BodyInputOf<typeof jobsApi.change>) => call(jobsApi.change, { params: { jobId }, body }),
    onSuccess: (job) => {
      client.setQueryData(keys.job(jobId), job);
      return client.invalidateQueries({ queryKey: keys.jobs, exact: true });
    },
    // A stale save leaves an old version here: fetch what stands now.
    onError: () => client.invalidateQueries({ queryKey: keys.job(jobId), exact: true }),
  });
}
