import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { BodyInputOf } from '../../../shared/api/endpoint.ts';
import { hardwareApi } from '../../../shared/hardware/hardware.api.ts';
import { call } from '../../lib/call.ts';
import { keys } from '../../lib/keys.ts';

/** The shop's hardware book. */
export const hardwareQuery = queryOptions({ queryKey: keys.hardware, queryFn: ({ signal }) => call(hardwareApi.book, { signal }), staleTime: 60_000 });

/** Puts an entry in the book, or in the place of one that is there. */
export function useSaveHardware() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ hardwareId, item }: { hardwareId: string | null; item: BodyInputOf<typeof hardwareApi.add> }) =>
      hardwareId ? call(hardwareApi.change, { params: { hardwareId }, body: item }) : call(hardwareApi.add, { body: item }),
    onSuccess: (book) => client.setQueryData(keys.hardware, book),
  });
}

export function useRemoveHardware() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (hardwareId: string) => call(hardwareApi.remove, { params: { hardwareId } }),
    onSettled: () => client.invalidateQueries({ queryKey: keys.hardware }),
  });
}
