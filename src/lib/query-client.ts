import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query';
import { isCallError } from './call-error.ts';
import { meQuery } from './session.ts';

/** The cache of all that the server told. A session that ended anywhere ends everywhere. */
export function createQueryClient(): QueryClient {
  const onError = (error: Error) => {
    if (isCallError(error, 'sign-in-needed')) client.setQueryData(meQuery.queryKey, null);
  };
  const client: QueryClient = new QueryClient({
    queryCache: new QueryCache({ onError }),
    mutationCache: new MutationCache({ onError }),
    defaultOptions: {
      queries: {
        staleTime: 15_000,
        // A 4xx will not get better by asking again; a lost line may.
        retry: (failures, error) => failures < 2 && isCallError(error) && (error.status === 0 || error.status >= 502),
      },
      mutations: { networkMode: 'always' },
    },
  });
  return client;
}
