import { z } from 'zod';
import { done, endpoint, id, instant } from '../api/endpoint.ts';
import { roles } from './permissions.ts';

const role = z.enum(roles);
const email = z.email({ error: 'Please give a full e-mail address, such as ana@example.com.' }).max(254).transform((s) => s.toLowerCase());
/** bcrypt reads 72 bytes and no more: a longer password is refused, never cut short in silence. */
export const password = z
  .string()
  .min(10, 'At least 10 characters, please.')
  .refine((s) => utf8Length(s) <= 72, 'At most 72 bytes, please: about 72 plain letters.');
const personName = z.string().trim().min(1, 'Please give a name.').max(120, 'At most 120 characters, please.');

/** Bytes of a text in UTF-8. */
export function utf8Length(text: string): number {
  let bytes = 0;
  for (const c of text) {
    const p = c.codePointAt(0) ?? 0;
    bytes += p < 0x80 ? 1 : p < 0x800 ? 2 : p < 0x10000 ? 3 : 4;
  }
  return bytes;
}

export const units = z.enum(['in', 'mm']);

export const Me = z.object({
  userId: id,
  name: z.string(),
  email: z.string(),
  role,
  shop: z.object({ id, name: z.string(), units }),
});
export type Me = z.infer<typeof Me>;

export const Member = z.object({ id, name: z.string(), email: z.string(), role, active: z.boolean(), createdAt: instant });
export type Member = z.infer<typeof Member>;

export const peopleApi = {
  register: endpoint({
    method: 'post', path: '/api/people/register', permission: 'anyone', limit: 'sign-in', status: 201,
    summary: 'Register a shop; its first user is owner and is signed in.',
    body: z.object({ shopName: z.string().trim().min(1, 'Please give the shop a name.').max(120), name: personName, email, password, units: units.default('in') }),
    reply: Me,
  }),
  signIn: endpoint({
    method: 'post', path: '/api/people/sign-in', permission: 'anyone', limit: 'sign-in',
    summary: 'Sign in; the session travels in httpOnly cookies.',
    body: z.object({ email, password: z.string().min(1, 'Please type your password.').max(500) }),
    reply: Me,
  }),
  refresh: endpoint({
    method: 'post', path: '/api/people/refresh', permission: 'anyone',
    summary: 'Trade the refresh cookie for a new pair; a refresh token works once.',
    reply: Me,
  }),
  signOut: endpoint({ method: 'post', path: '/api/people/sign-out', permission: 'anyone', summary: 'End this session.', reply: done }),
  me: endpoint({ method: 'get', path: '/api/people/me', permission: 'signed in', summary: 'Who is signed in.', reply: Me }),
  members: endpoint({ method: 'get', path: '/api/people/members', permission: 'change jobs', summary: 'The people of the shop.', reply: z.array(Member) }),
  addMember: endpoint({
    method: 'post', path: '/api/people/members', permission: 'run shop', status: 201,
    summary: 'Add a person to the shop with a first password.',
    body: z.object({ name: personName, email, role, password }),
    reply: Member,
  }),
};
