import { queryOptions, useQuery } from '@tanstack/react-query';
import type { Permission } from '../../shared/api/endpoint.ts';
import { type Me, peopleApi } from '../../shared/people/people.api.ts';
import { may } from '../../shared/people/permissions.ts';
import { call } from './call.ts';
import { isCallError } from './call-error.ts';
import { keys } from './keys.ts';

/**
 * Who is signed in; null where nobody was. A session that ends while someone works keeps their name here, so that the
 * page and what is typed in it stay: `sessionEndedQuery` tells that it ended.
 */
export const meQuery = queryOptions({
  queryKey: keys.me,
  queryFn: async ({ client, signal }): Promise<Me | null> => {
    try {
      return await call(peopleApi.me, { signal });
    } catch (error) {
      if (isCallError(error, 'sign-in-needed') && !client.getQueryData(keys.me)) return null;
      throw error;
    }
  },
  staleTime: 60_000,
});

/** Whether the session ended since the page was opened. Set by the query cache whenever a call is told so. */
export const sessionEndedQuery = queryOptions({
  queryKey: ['people', 'session ended'] as const,
  queryFn: () => false,
  initialData: false,
  staleTime: Infinity,
});

/** Who is signed in, or null: for parts that also stand on pages without a session. Fetches nothing by itself. */
export function useMaybeMe(): Me | null {
  return useQuery({ ...meQuery, enabled: false }).data ?? null;
}

/** Who is signed in. Only below the shell, which has loaded it. */
export function useMe(): Me {
  const me = useMaybeMe();
  if (!me) throw new Error('useMe stands outside the signed-in part of the pages.');
  return me;
}

/** Whether the reader's role holds a permission: to hide what the server would refuse. */
export function useMay(permission: Permission): boolean {
  const me = useMaybeMe();
  return me !== null && may(me.role, permission);
}
