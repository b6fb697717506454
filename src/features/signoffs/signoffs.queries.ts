import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { BodyInputOf } from '../../../shared/api/endpoint.ts';
import { type Portal, type PortalRevision, signoffsApi } from '../../../shared/signoffs/signoffs.api.ts';
import { call } from '../../lib/call.ts';
import { isCallError } from '../../lib/call-error.ts';
import { keys } from '../../lib/keys.ts';

/** Links given to the client of a job. */
export const linksQuery = (jobId: string) =>
  queryOptions({ queryKey: keys.linksOf(jobId), queryFn: ({ signal }) => call(signoffsApi.links, { params: { jobId }, signal }) });

export function useRevokeLink(jobId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (linkId: string) => call(signoffsApi.revoke, { params: { linkId } }),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.linksOf(jobId) }),
  });
}

/** What the holder of a link sees. */
export const portalQuery = (token: string) =>
  queryOptions({ queryKey: keys.portal(token), queryFn: ({ signal }) => call(signoffsApi.portal, { params: { token }, signal }) });

/** Signing and asking for changes, by link. What was answered replaces the revision on the page at once. */
export function useAnswer(token: string, revisionId: string) {
  const client = useQueryClient();
  const params = { token, revisionId };
  const onSuccess = async (revision: PortalRevision) => {
    client.setQueryData<Portal>(keys.portal(token), (portal) => portal && { ...portal, revisions: portal.revisions.map((r) => (r.id === revision.id ? revision : r)) });
    await client.invalidateQueries({ queryKey: keys.portal(token) });
  };
  // The shop may have sent something newer meanwhile: show what stands now beside the refusal.
  const onError = (error: Error) => (isCallError(error) && (error.status === 409 || error.status === 410) ? client.invalidateQueries({ queryKey: keys.portal(token) }) : undefined);
  return {
    sign: useMutation({ mutationFn: (body: BodyInputOf<typeof signoffsApi.sign>) => call(signoffsApi.sign, { params, body }), onSuccess, onError }),
    askChanges: useMutation({ mutationFn: (body: BodyInputOf<typeof signoffsApi.askChanges>) => call(signoffsApi.askChanges, { params, body }), onSuccess, onError }),
  };
}
