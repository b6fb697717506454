import { queryOptions, type QueryClient, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { BodyInputOf } from '../../../shared/api/endpoint.ts';
import type { Knowledge } from '../../../shared/walls/knowledge.ts';
import type { Photo, Wall } from '../../../shared/walls/wall.ts';
import { wallsApi } from '../../../shared/walls/walls.api.ts';
import { call } from '../../lib/call.ts';
import { keys } from '../../lib/keys.ts';

export const wallQuery = (wallId: string) =>
  queryOptions({ queryKey: keys.wall(wallId), queryFn: ({ signal }) => call(wallsApi.read, { params: { wallId }, signal }) });

/** All photos of a wall, newest first. */
export const photosQuery = (wallId: string) =>
  queryOptions({ queryKey: keys.photosOf(wallId), queryFn: ({ signal }) => call(wallsApi.photos, { params: { wallId }, signal }) });

/** The wall as just told by the server; the job's card, walls and layouts look at it too. */
function settle(client: QueryClient, wall: Wall): Promise<void> {
  client.setQueryData(keys.wall(wall.id), wall);
  void client.invalidateQueries({ queryKey: keys.photosOf(wall.id) });
  return client.invalidateQueries({ queryKey: keys.job(wall.jobId) });
}

async function settlePhoto(client: QueryClient, { id, jobId }: Pick<Wall, 'id' | 'jobId'>, photo: Photo): Promise<void> {
  client.setQueryData<Wall>(keys.wall(id), (before) => before && { ...before, photo });
  void client.invalidateQueries({ queryKey: keys.photosOf(id) });
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
    mutationFn: ({ known, signal }: { known: Knowledge; signal: AbortSignal }) => call(wallsApi.straighten, { params: { wallId: wall.id, photoId }, body: known, signal }),
    onSuccess: (photo) => settlePhoto(client, wall, photo),
  });
}

/** How far a straightening has come, asked for while it is under way. */
export function useStraighteningProgress(wallId: string, photoId: string, underWay: boolean) {
  return useQuery({
    queryKey: keys.photoProgress(photoId),
    queryFn: ({ signal }) => call(wallsApi.progress, { params: { wallId, photoId }, signal }),
    enabled: underWay,
    refetchInterval: 400,
    gcTime: 0,
  });
}

export function useChoosePhoto(wall: Wall) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (photoId: string) => call(wallsApi.choosePhoto, { params: { wallId: wall.id, photoId } }),
    onSuccess: (after) => settle(client, after),
  });
}

export function useRemovePhoto(wall: Wall) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (photoId: string) => call(wallsApi.removePhoto, { params: { wallId: wall.id, photoId } }),
    onSuccess: (after) => settle(client, after),
  });
}
