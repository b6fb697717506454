import { z } from 'zod';
import { endpoint, id } from '../api/endpoint.ts';
import { Pattern, PatternDesign } from './pattern.ts';

const name = z.string().trim().min(1, 'Please name the pattern.').max(80);
const one = z.object({ patternId: id });

export const patternsApi = {
  list: endpoint({ method: 'get', path: '/api/patterns', permission: 'read jobs', summary: "The shop's pattern book.", reply: z.array(Pattern) }),
  create: endpoint({ method: 'post', path: '/api/patterns', permission: 'change patterns', status: 201, summary: 'Add a pattern.', body: z.object({ name, design: PatternDesign }), reply: Pattern }),
  change: endpoint({ method: 'put', path: '/api/patterns/:patternId', permission: 'change patterns', summary: 'Change a pattern; signed revisions keep theirs.', params: one, body: z.object({ name, design: PatternDesign, version: z.number().int(), archived: z.boolean().default(false) }), reply: Pattern }),
};
