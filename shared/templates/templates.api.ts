import { z } from 'zod';
import { bytes, endpoint, id } from '../api/endpoint.ts';
import { papers } from './papers.ts';
import { correctionFactor } from './template-input.ts';

const factor = z.coerce.number().pipe(correctionFactor).default(1);

export const templatesApi = {
  pdf: endpoint({
    method: 'get', path: '/api/layouts/:layoutId/template.pdf', permission: 'read jobs', kind: 'file', limit: 'heavy', summary: 'The hanging template of the layout as it stands, 1:1, in PDF.',
    params: z.object({ layoutId: id }),
    query: z.object({
      paper: z.enum(papers).default('letter'),
      /** Stated over measured length of the printed bars: what this printer needs to come out true. */
      correctionX: factor,
      correctionY: factor,
    }),
    reply: bytes,
  }),
};
