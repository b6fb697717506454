import { z } from 'zod';
import { bytes, done, endpoint, id, instant } from '../api/endpoint.ts';
import { Layout, revisionStates } from '../layouts/layout.ts';
import { Snapshot } from './snapshot.ts';

const inLayout = z.object({ layoutId: id });
const token = z.string().regex(/^[A-Za-z0-9_-]{20,100}$/, 'This link is not complete.');
const byLink = z.object({ token });
const ofRevision = z.object({ token, revisionId: id });

export const PortalRevision = z.object({
  id, letter: z.string(), layoutName: z.string(), state: z.enum(revisionStates), sha256: z.string(), sentAt: instant,
  signedAt: instant.nullable(), signedName: z.string().nullable(), askedFor: z.string().nullable(),
  snapshot: Snapshot,
  /** Address of the straightened photo through this link, or null for a drawn wall. */
  elevationUrl: z.string().nullable(),
});
export type PortalRevision = z.infer<typeof PortalRevision>;

export const Portal = z.object({
  shopName: z.string(), jobTitle: z.string(), clientName: z.string(), units: z.enum(['in', 'mm']), expiresAt: instant, consent: z.string(),
  revisions: z.array(PortalRevision),
});
export type Portal = z.infer<typeof Portal>;

export const Link = z.object({ id, letter: z.string(), layoutName: z.string(), sentTo: z.string(), createdAt: instant, expiresAt: instant, revokedAt: instant.nullable() });
export type Link = z.infer<typeof Link>;

export const signoffsApi = {
  send: endpoint({
    method: 'post', path: '/api/layouts/:layoutId/send', permission: 'change jobs', limit: 'mail', summary: 'Freeze the layout as a revision and mail the client a personal link.',
    params: inLayout, body: z.object({ version: z.number().int(), note: z.string().max(2000).default('') }), reply: Layout,
  }),
  links: endpoint({ method: 'get', path: '/api/jobs/:jobId/links', permission: 'change jobs', summary: 'Links given to the client of a job.', params: z.object({ jobId: id }), reply: z.array(Link) }),
  revoke: endpoint({ method: 'post', path: '/api/links/:linkId/revoke', permission: 'change jobs', summary: 'Close a link.', params: z.object({ linkId: id }), reply: done }),
  record: endpoint({
    method: 'get', path: '/api/revisions/:revisionId/record', permission: 'read jobs', summary: 'A revision as it was frozen; its hash is verified as it is read.',
    params: z.object({ revisionId: id }),
    reply: z.object({ canonical: z.string(), sha256: z.string(), verified: z.boolean(), state: z.enum(revisionStates), signedName: z.string().nullable(), signedAt: instant.nullable(), consent: z.string().nullable() }),
  }),
  portal: endpoint({ method: 'get', path: '/api/portal/:token', permission: 'hold link', summary: 'What a client sees by their link.', params: byLink, reply: Portal }),
  portalElevation: endpoint({ method: 'get', path: '/api/portal/:token/revisions/:revisionId/elevation', permission: 'hold link', kind: 'file', summary: 'The wall photo of a revision.', params: ofRevision, reply: bytes }),
  sign: endpoint({
    method: 'post', path: '/api/portal/:token/revisions/:revisionId/sign', permission: 'hold link', summary: 'Sign a revision with a typed name.',
    params: ofRevision,
    body: z.object({ name: z.string().trim().min(2, 'Please type your full name.').max(120), sha256: z.string(), agreed: z.literal(true, { error: 'Please tick the sentence you agree to.' }) }), reply: PortalRevision,
  }),
  askChanges: endpoint({
    method: 'post', path: '/api/portal/:token/revisions/:revisionId/changes', permission: 'hold link', summary: 'Ask for changes in words.',
    params: ofRevision, body: z.object({ words: z.string().trim().min(1, 'Please say what should change.').max(4000) }), reply: PortalRevision,
  }),
};
