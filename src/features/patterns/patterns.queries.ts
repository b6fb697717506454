import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { BodyInputOf } from '../../../shared/api/endpoint.ts';
import { patternsApi } from '../../../shared/patterns/patterns.api.ts';
import { call } from '../../lib/call.ts';
import { keys } from '../../lib/keys.ts';

/** The shop's pattern book, archived patterns too. */
export const patternsQuery = queryOptions({ queryKey: keys.patterns, queryFn: ({ signal }) => call(patternsApi.list, { signal }), staleTime: 60_000 });

export function useAddPattern() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: BodyInputOf<typeof patternsApi.create>) => call(patternsApi.create, { body }),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.patterns }),
  });
}

export function useChangePattern() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ patternId, ...body }: BodyInputOf<typeof patternsApi.change> & { patternId: string }) => call(patternsApi.change, { params: { patternId }, body }),
    onSettled: () => client.invalidateQueries({ queryKey: keys.patterns }),
  });
}
