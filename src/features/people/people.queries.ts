import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { BodyInputOf } from '../../../shared/api/endpoint.ts';
import { peopleApi } from '../../../shared/people/people.api.ts';
import { call } from '../../lib/call.ts';
import { keys } from '../../lib/keys.ts';
import { meQuery, sessionEndedQuery } from '../../lib/session.ts';

/** The people of the shop. */
export const membersQuery = queryOptions({ queryKey: keys.members, queryFn: ({ signal }) => call(peopleApi.members, { signal }) });

/** Signs in, or registers a shop and signs in; whatever was cached for someone else is dropped. */
export function useEnter() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (input: { signIn: BodyInputOf<typeof peopleApi.signIn> } | { register: BodyInputOf<typeof peopleApi.register> }) =>
      'signIn' in input ? call(peopleApi.signIn, { body: input.signIn }) : call(peopleApi.register, { body: input.register }),
    onSuccess: (me) => {
      client.clear();
      client.setQueryData(sessionEndedQuery.queryKey, false);
      client.setQueryData(meQuery.queryKey, me);
    },
  });
}

export function useAddMember() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: BodyInputOf<typeof peopleApi.addMember>) => call(peopleApi.addMember, { body }),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.members }),
  });
}
