import { z } from 'zod';

/** Who may call: the names only. The table of who they are stands in people/permissions.ts. */
export type Permission =
  | 'anyone'
  | 'signed in'
  | 'read jobs'
  | 'change jobs'
  | 'record hanging'
  | 'change patterns'
  | 'run shop'
  | 'hold link'
  | 'develop';

/** What is declared once about a call: the server mounts it, the page calls it, the document lists it. */
export interface Endpoint<
  Params extends z.ZodType = z.ZodType,
  Query extends z.ZodType = z.ZodType,
  Body extends z.ZodType = z.ZodType,
  Reply extends z.ZodType = z.ZodType,
> {
  method: 'get' | 'post' | 'put' | 'patch' | 'delete';
  /** Express path, e.g. `/api/jobs/:jobId`. */
  path: string;
  permission: Permission;
  summary: string;
  params: Params;
  query: Query;
  body: Body;
  reply: Reply;
  /** Status of a good reply. */
  status: 200 | 201 | 202 | 204;
  /** `upload`: multipart with one file in the field `file`; `file`: the reply is bytes, not JSON. */
  kind: 'json' | 'upload' | 'file';
  /** Which limit guards it, beside the general one. */
  limit?: 'sign-in' | 'mail' | 'heavy';
}

const nothing = z.object({});
type Nothing = typeof nothing;

type Declared<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType> = Pick<
  Endpoint<P, Q, B, R>,
  'method' | 'path' | 'permission' | 'summary' | 'reply'
> &
  Partial<Endpoint<P, Q, B, R>>;

/** Declares an endpoint; params, query and body are empty unless given. */
export function endpoint<
  R extends z.ZodType,
  P extends z.ZodType = Nothing,
  Q extends z.ZodType = Nothing,
  B extends z.ZodType = Nothing,
>(declared: Declared<P, Q, B, R>): Endpoint<P, Q, B, R> {
  return {
    params: nothing as unknown as P,
    query: nothing as unknown as Q,
    body: nothing as unknown as B,
    status: 200,
    kind: 'json',
    ...declared,
  };
}

export type ParamsOf<E extends Endpoint> = z.output<E['params']>;
export type QueryOf<E extends Endpoint> = z.output<E['query']>;
export type BodyOf<E extends Endpoint> = z.output<E['body']>;
export type BodyInputOf<E extends Endpoint> = z.input<E['body']>;
export type ReplyOf<E extends Endpoint> = z.output<E['reply']>;
export type ReplyInputOf<E extends Endpoint> = z.input<E['reply']>;

export const id = z.uuid({ error: 'This is not an identifier of ours.' });
export const done = z.object({ done: z.literal(true) });
/** Reply of endpoints whose kind is `file`. */
export const bytes = z.unknown();
/** UTC instant as ISO 8601 text. */
export const instant = z.iso.datetime();
