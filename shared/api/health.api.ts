import { z } from 'zod';
import { endpoint } from './endpoint.ts';

export const Health = z.object({
  process: z.literal('up'),
  database: z.enum(['up', 'down']),
  /** True outside production: the fake mailbox and its like can be opened. */
  development: z.boolean(),
  /** Sign-in details of the invented shop, in demo mode only. */
  demo: z.array(z.object({ email: z.string(), password: z.string(), role: z.string(), name: z.string() })).nullable(),
});

export const healthApi = {
  health: endpoint({ method: 'get', path: '/api/health', permission: 'anyone', summary: 'Whether process and database are up.', reply: Health }),
  document: endpoint({ method: 'get', path: '/api/openapi.json', permission: 'anyone', summary: 'This API as an OpenAPI 3.1 document.', reply: z.unknown() }),
};
