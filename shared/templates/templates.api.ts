import { z } from 'zod';
import { bytes, endpoint, id } from '../api/endpoint.ts';

export const papers = ['letter', 'a4'] as const;

export const templatesApi = {
  pdf: endpoint({
    method: 'get', path: '/api/layouts/:layoutId/template.pdf', permission: 'read jobs', kind: 'file', limit: 'heavy', summary: 'The hanging template of the layout as it stands, 1:1, in PDF.',
    params: z.object({ layoutId: id }), query: z.object({ paper: z.enum(papers).default('letter') }), reply: bytes,
  }),
};
