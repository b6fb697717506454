import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { BodyInputOf } from '../../../shared/api/endpoint.ts';
import { layoutsApi } from '../../../shared/layouts/layouts.api.ts';
import { wallsApi } from '../../../shared/walls/walls.api.ts';
import { call } from '../../lib/call.ts';
import { keys } from '../../lib/keys.ts';

/** The walls of a job, as its page lists them. */
export const wallsOfJobQuery = (jobId: string) =>
  queryOptions({ queryKey: keys.wallsOf(jobId), queryFn: ({ signal }) => call(wallsApi.list, { params: { jobId }, signal }) });

/** The layouts of a job, as its page lists them. */
export const layoutsOfJobQuery = (jobId: string) =>
  queryOptions({ queryKey: keys.layoutsOf(jobId), queryFn: ({ signal }) => call(layoutsApi.list, { params: { jobId }, signal }) });

export function useAddWall(jobId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: BodyInputOf<typeof wallsApi.create>) => call(wallsApi.create, { params: { jobId }, body }),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.job(jobId) }),
  });
}

export function useStartLayout(jobId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ wallId, ...body }: BodyInputOf<typeof layoutsApi.create> & { wallId: string }) => call(layoutsApi.create, { params: { wallId }, body }),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.job(jobId) }),
  });
}

export function useRemoveLayout(jobId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (layoutId: string) => call(layoutsApi.remove, { params: { layoutId } }),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.job(jobId) }),
  });
}
