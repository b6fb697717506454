import { z } from 'zod';
import { endpoint, id } from '../api/endpoint.ts';
import { Edit, Layout, LayoutSheet } from './layout.ts';

const inLayout = z.object({ layoutId: id });

export const layoutsApi = {
  list: endpoint({ method: 'get', path: '/api/jobs/:jobId/layouts', permission: 'read jobs', summary: 'The layouts of a job.', params: z.object({ jobId: id }), reply: z.array(Layout) }),
  create: endpoint({ method: 'post', path: '/api/walls/:wallId/layouts', permission: 'change jobs', status: 201, summary: 'Start a layout on a wall.', params: z.object({ wallId: id }), body: LayoutSheet, reply: Layout }),
  read: endpoint({ method: 'get', path: '/api/layouts/:layoutId', permission: 'read jobs', summary: 'One layout with its frames and revisions.', params: inLayout, reply: Layout }),
  version: endpoint({ method: 'get', path: '/api/layouts/:layoutId/version', permission: 'read jobs', summary: 'The version of a layout alone: a page asks it often, to learn of others’ saves.', params: inLayout, reply: z.object({ version: z.number().int() }) }),
  edit: endpoint({
    method: 'post', path: '/api/layouts/:layoutId/edits', permission: 'change jobs', summary: 'Save edits made on the given version; a stale version is answered 409 with what stands now.',
    params: inLayout, body: z.object({ version: z.number().int(), edits: z.array(Edit).min(1).max(2000) }), reply: Layout,
  }),
  remove: endpoint({ method: 'delete', path: '/api/layouts/:layoutId', permission: 'change jobs', summary: 'Delete a layout that was never sent.', params: inLayout, reply: z.object({ done: z.literal(true) }) }),
};
