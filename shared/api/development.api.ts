import { z } from 'zod';
import { bytes, endpoint, instant } from './endpoint.ts';

const mailId = z.string().regex(/^[A-Za-z0-9-]{1,60}$/);
export const MailHead = z.object({ id: mailId, from: z.string(), to: z.string(), subject: z.string(), at: instant });
export const Mail = MailHead.extend({ text: z.string(), html: z.string().nullable() });

/** What the local fakes received; served in development only. */
export const developmentApi = {
  mailbox: endpoint({ method: 'get', path: '/api/development/mailbox', permission: 'develop', summary: 'Messages that the fake mail server took in, newest first.', reply: z.array(MailHead) }),
  mail: endpoint({ method: 'get', path: '/api/development/mailbox/:mailId', permission: 'develop', summary: 'One message.', params: z.object({ mailId }), reply: Mail }),
  mailPage: endpoint({ method: 'get', path: '/api/development/mailbox/:mailId/page', permission: 'develop', kind: 'file', summary: 'The HTML of one message, as a mail reader would show it.', params: z.object({ mailId }), reply: bytes }),
};
