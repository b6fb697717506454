import type { Request, RequestHandler, Response, Router } from 'express';
import type { z } from 'zod';
import type { BodyOf, Endpoint, ParamsOf, QueryOf, ReplyInputOf } from '../../shared/api/endpoint.ts';
import { may } from '../../shared/people/permissions.ts';
import { ProblemError } from './problems.ts';
import type { Who } from './who.ts';

export interface Call<E extends Endpoint> {
  params: ParamsOf<E>;
  query: QueryOf<E>;
  body: BodyOf<E>;
  /** The signed-in member. Reading it where nobody is signed in is answered 401. */
  readonly who: Who;
  req: Request;
  res: Response;
}

/** A reply of JSON, or `undefined` where the handler has sent bytes itself. */
export type Handler<E extends Endpoint> = (call: Call<E>) => Promise<ReplyInputOf<E> | void>;

export interface Mounted {
  endpoint: Endpoint;
}

/** Things that stand before handlers, given once by the app. */
export interface Gate {
  whoOf(req: Request): Promise<Who | null>;
  limits: Partial<Record<NonNullable<Endpoint['limit']>, RequestHandler>>;
  receiveFile: RequestHandler;
  developing: boolean;
}

/** Ties declared endpoints to handlers: permit, parse, run, parse the reply. Keeps the list of what is mounted. */
export class Mount {
  readonly mounted: Mounted[] = [];
  private readonly router: Router;
  private readonly gate: Gate;

  constructor(router: Router, gate: Gate) {
    this.router = router;
    this.gate = gate;
  }

  on<E extends Endpoint>(endpoint: E, handler: Handler<E>): void {
    if (endpoint.permission === 'develop' && !this.gate.developing) return;
    this.mounted.push({ endpoint });
    const before: RequestHandler[] = [];
    const limit = endpoint.limit && this.gate.limits[endpoint.limit];
    if (limit) before.push(limit);
    before.push(async (req, res, next) => {
      // Permission comes before anything of the request is read, so that a stranger learns nothing from errors.
      res.locals.who = await this.permit(endpoint, req);
      next();
    });
    if (endpoint.kind === 'upload') before.push(this.gate.receiveFile);
    this.router[endpoint.method](endpoint.path, ...before, async (req, res) => {
      const call: Call<E> = {
        params: parse(endpoint.params, req.params, 'address') as ParamsOf<E>,
        query: parse(endpoint.query, req.query, 'query') as QueryOf<E>,
        body: (endpoint.kind === 'upload' ? {} : parse(endpoint.body, req.body ?? {}, 'body')) as BodyOf<E>,
        get who(): Who {
          const who = res.locals.who as Who | null;
          if (!who) throw new ProblemError('sign-in-needed', 'Please sign in to go on.');
          return who;
        },
        req,
        res,
      };
      const reply = await handler(call);
      if (endpoint.kind === 'file' || res.headersSent) return;
      if (endpoint.status === 204) res.status(204).end();
      // The reply's schema is applied, so that no column leaves the server that was not declared.
      else res.status(endpoint.status).set('Cache-Control', 'no-store').json(endpoint.reply.parse(reply));
    });
  }

  private async permit(endpoint: Endpoint, req: Request): Promise<Who | null> {
    if (endpoint.permission === 'anyone' || endpoint.permission === 'hold link' || endpoint.permission === 'develop') return null;
    const who = await this.gate.whoOf(req);
    if (!who) throw new ProblemError('sign-in-needed', 'Please sign in to go on.');
    if (!may(who.role, endpoint.permission)) {
      throw new ProblemError('not-allowed', `This needs a role that may ${endpoint.permission}; yours is ${who.role}.`);
    }
    return who;
  }
}

function parse(schema: z.ZodType, value: unknown, where: string): unknown {
  const result = schema.safeParse(value);
  if (result.success) return result.data;
  const fields = result.error.issues.map((i) => ({ path: i.path.join('.'), words: i.message }));
  if (where === 'address') throw new ProblemError('not-found', 'There is nothing at this address.', { fields });
  const first = fields[0];
  throw new ProblemError('bad-input', first ? `${first.path ? `${first.path}: ` : ''}${first.words}` : 'The request does not fit.', { fields });
}
