import { queryOptions, type QueryClient, useMutation, useQueryClient } from '@tanstack/react-query';
import type { BodyInputOf } from '../../../shared/api/endpoint.ts';
import type { Mark } from '../../../shared/walls/marks.ts';
import type { Photo, Wall } from '../../../shared/walls/wall.ts';
import { wallsApi } from '../../../shared/walls/walls.api.ts';
import { call } from '../../lib/call.ts';
import { keys } from '../../lib/keys.ts';

export const wallQuery = (wallId: string) =>
  queryOptions({ queryKey: keys.wall(wallId), queryFn: ({ signal }) => call(wallsApi.read, { params: { wallId }, signal }) });

/** The wall as just told by the server; the job's card, walls and layouts look at it too. */
function settle(client: QueryClient, wall: Wall): Promise<void> {
  client.setQueryData(keys.wall(wall.id), wall);
  return client.invalidateQueries({ queryKey: keys.job(wall.jobId) });
}

async function settlePhoto(client: QueryClient, { id, jobId }: Pick<Wall, 'id' | 'jobId'>, photo: Photo): Promise<void> {
  client.setQueryData<Wall>(keys.wall(id), (before) => before && { ...before, photo });
  await client.invalidateQueries({ queryKey: keys.job(jobId) });
}

export function useChangeWall(wallId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: BodyInputOf<typeof wallsApi.change>) => call(wallsApi.change, { params: { wallId }, body }),
    onSuccess: (wall) => settle(client, wall),
  });
}

export function useUploadPhoto(wall: Wall) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (input: { file: File; signal: AbortSignal; onProgress: (share: number) => void }) => call(wallsApi.upload, { params: { wallId: wall.id }, ...input }),
    onSuccess: (photo) => settlePhoto(client, wall, photo),
  });
}

export function useStraighten(wall: Wall, photoId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ marks, signal }: { marks: Mark[]; signal: AbortSignal }) => call(wallsApi.straighten, { params: { wallId: wall.id, photoId }, body: { marks }, signal }),
    onSuccess: (photo) => settlePhoto(client, wall, photo),
  });
}

export function useRemovePhoto(wall: Wall) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (photoId: string) => call(wallsApi.removePhoto, { params: { wallId: wall.id, photoId } }),
    onSuccess: (after) => settle(client, after),
  });
}
