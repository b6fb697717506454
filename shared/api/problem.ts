import { z } from 'zod';

/** An error as the API tells it (RFC 9457, application/problem+json), in words for a person. */
export const Problem = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  detail: z.string().optional(),
  /** Short name that code may branch on. */
  code: z.string(),
  requestId: z.string().optional(),
  /** What is wrong with which field; `path` is dotted, as in `studs.2.xMm`. */
  fields: z.array(z.object({ path: z.string(), words: z.string() })).optional(),
  /** What stands on the server now, where a save came too late. */
  current: z.unknown().optional(),
});
export type Problem = z.infer<typeof Problem>;

export const problemCodes = {
  'bad-input': { status: 400, title: 'Something in the request does not fit' },
  'sign-in-needed': { status: 401, title: 'Please sign in' },
  'not-allowed': { status: 403, title: 'Your role does not allow this' },
  'not-found': { status: 404, title: 'Not found' },
  stale: { status: 409, title: 'Someone saved before you' },
  conflict: { status: 409, title: 'This does not go together with what is there' },
  gone: { status: 410, title: 'This is no longer open' },
  'too-large': { status: 413, title: 'Too large' },
  'wrong-type': { status: 415, title: 'This kind of file cannot be used' },
  'too-many': { status: 429, title: 'Too many tries' },
  failed: { status: 500, title: 'Something went wrong on our side' },
  unavailable: { status: 503, title: 'Not available just now' },
} as const;
export type ProblemCode = keyof typeof problemCodes;
