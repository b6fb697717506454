import type { z } from 'zod';
import type { BodyInputOf, Endpoint, ParamsOf, ReplyOf } from '../../shared/api/endpoint.ts';
import { peopleApi } from '../../shared/people/people.api.ts';
import { type Answer, callHeaders, readJson } from './answer.ts';
import { type CallError, errorOfAnswer, isCallError, misshapen, unreachable } from './call-error.ts';
import { upload } from './upload.ts';

type QueryInputOf<E extends Endpoint> = z.input<E['query']>;

/** `key` may be left out where nothing in it is required. */
type Given<Key extends string, Value> = Record<string, never> extends Value ? { [K in Key]?: Value } : { [K in Key]: Value };

export type CallInput<E extends Endpoint> = Given<'params', ParamsOf<E>> &
  Given<'query', QueryInputOf<E>> &
  Given<'body', BodyInputOf<E>> & {
    signal?: AbortSignal;
    /** The file of an `upload` endpoint. */
    file?: File;
    /** Share of the file that has been sent, 0 to 1. */
    onProgress?: (share: number) => void;
  };

interface LooseInput {
  params?: Record<string, unknown>;
  query?: Record<string, unknown>;
  body?: unknown;
  signal?: AbortSignal;
  file?: File;
  onProgress?: (share: number) => void;
}

type InputArgument<E extends Endpoint> = Record<string, never> extends CallInput<E> ? [input?: CallInput<E>] : [input: CallInput<E>];

/** Where an endpoint stands, with its params and query filled in: for links and pictures as for calls. */
export function addressOf<E extends Endpoint>(
  endpoint: E,
  input: Given<'params', ParamsOf<E>> & Given<'query', QueryInputOf<E>>,
): string {
  const { params = {}, query = {} } = input as LooseInput;
  const path = endpoint.path.replace(/:([A-Za-z]+)/g, (_, name: string) => encodeURIComponent(String(params[name])));
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query)) {
    if (value !== undefined && value !== null) search.set(name, String(value));
  }
  const text = search.toString();
  return text === '' ? path : `${path}?${text}`;
}

/**
 * The one way to the server. Throws `CallError` for everything but a good answer, and the signal's own
 * abort error when cancelled. Replies are parsed by the endpoint's schema; `file` endpoints give a Blob.
 */
export async function call<E extends Endpoint>(endpoint: E, ...[given]: InputArgument<E>): Promise<ReplyOf<E>> {
  const input = (given ?? {}) as LooseInput;
  try {
    return (await once(endpoint, input)) as ReplyOf<E>;
  } catch (error) {
    if (!isCallError(error, 'sign-in-needed') || !travelsWithSession(endpoint)) throw error;
    if (!(await renewSession())) throw error;
    return (await once(endpoint, input)) as ReplyOf<E>;
  }
}

function travelsWithSession(endpoint: Endpoint): boolean {
  return endpoint.permission !== 'anyone' && endpoint.permission !== 'hold link';
}

let renewing: Promise<boolean> | null = null;

/** Trades the refresh cookie for a new session, however many calls ask at once; true when that worked. */
export function renewSession(): Promise<boolean> {
  renewing ??= once(peopleApi.refresh, {})
    .then(() => true)
    .catch((error: CallError) => {
      if (isCallError(error) && error.status >= 400 && error.status < 500) return false;
      throw error;
    })
    .finally(() => {
      renewing = null;
    });
  return renewing;
}

async function once(endpoint: Endpoint, input: LooseInput): Promise<unknown> {
  const address = addressOf(endpoint, input as never);
  const answer = endpoint.kind === 'upload' ? await upload(endpoint.method, address, input) : await send(endpoint, address, input);
  if (answer.status < 200 || answer.status > 299) throw errorOfAnswer(answer.status, answer.body);
  if (endpoint.kind === 'file') return answer.body;
  const parsed = endpoint.reply.safeParse(answer.body);
  if (!parsed.success) throw misshapen(address, answer.requestId);
  return parsed.data;
}

async function send(endpoint: Endpoint, address: string, input: LooseInput): Promise<Answer> {
  const hasBody = endpoint.method !== 'get' && input.body !== undefined;
  let response: Response;
  try {
    response = await fetch(address, {
      method: endpoint.method.toUpperCase(),
      credentials: 'same-origin',
      headers: hasBody ? { ...callHeaders, 'Content-Type': 'application/json' } : callHeaders,
      body: hasBody ? JSON.stringify(input.body) : undefined,
      signal: input.signal,
    });
  } catch (error) {
    if (input.signal?.aborted) throw error;
    throw unreachable();
  }
  const requestId = response.headers.get('x-request-id') ?? undefined;
  if (endpoint.kind === 'file' && response.ok) return { status: response.status, body: await response.blob(), requestId };
  return { status: response.status, body: readJson(await response.text()), requestId };
}
