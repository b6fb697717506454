import { signoffsApi } from '../../shared/signoffs/signoffs.api.ts';
import type { Mount } from '../http/mount.ts';
import type { SignoffsService } from './signoffs.service.ts';

export function signoffsRoutes(mount: Mount, signoffs: SignoffsService): void {
  const done = { done: true as const };
  mount.on(signoffsApi.send, ({ who, params, body }) => signoffs.send(who, params.layoutId, body));
  mount.on(signoffsApi.links, ({ who, params }) => signoffs.links(who, params.jobId));
  mount.on(signoffsApi.revoke, async ({ who, params }) => {
    await signoffs.revoke(who, params.linkId);
    return done;
  });
  mount.on(signoffsApi.record, ({ who, params }) => signoffs.record(who, params.revisionId));
  mount.on(signoffsApi.portal, ({ params }) => signoffs.portal(params.token));
  mount.on(signoffsApi.portalElevation, async ({ params, res }) => {
    await signoffs.files.sendTo(res, await signoffs.portalElevation(params.token, params.revisionId), 'image/jpeg');
  });
  mount.on(signoffsApi.sign, ({ params, body }) => signoffs.sign(params.token, params.revisionId, body));
  mount.on(signoffsApi.askChanges, ({ params, body }) => signoffs.askChanges(params.token, params.revisionId, body));
}
