import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { endpoint, id } from '../../../shared/api/endpoint.ts';
import { peopleApi } from '../../../shared/people/people.api.ts';
import { addressOf, call } from '../../../src/lib/call.ts';
import { CallError } from '../../../src/lib/call-error.ts';

const boardId = '6f1c2a34-9b7e-4d10-8a55-0c2f7e9d1b23';
const read = endpoint({ method: 'get', path: '/api/boards/:boardId', permission: 'read jobs', summary: '', params: z.object({ boardId: id }), query: z.object({ side: z.string().optional() }), reply: z.object({ feet: z.number() }) });
const write = endpoint({ method: 'post', path: '/api/boards', permission: 'change jobs', summary: '', body: z.object({ feet: z.number() }), reply: z.object({ feet: z.number() }) });

type Answer = [status: number, body: unknown];
let asked: { path: string; init: RequestInit }[] = [];
let answers: (path: string) => Answer | Promise<Answer>;
const problem = (status: number, code: string): Answer => [status, { type: 'about:blank', title: 'No', status, code, requestId: 'r1' }];

beforeEach(() => {
  asked = [];
  vi.stubGlobal('fetch', async (path: string, init: RequestInit) => {
    asked.push({ path, init });
    if (init.signal?.aborted) throw init.signal.reason;
    const [status, body] = await answers(path);
    return new Response(body === undefined ? '<html>' : JSON.stringify(body), { status });
  });
});
afterEach(() => vi.unstubAllGlobals());

const failure = async (doing: Promise<unknown>): Promise<CallError> => {
  const error: unknown = await doing.then(() => null, (e: unknown) => e);
  expect(error).toBeInstanceOf(CallError);
  return error as CallError;
};

describe('a call', () => {
  it('fills in the path and the query, and leaves out what is not given', () => {
    expect(addressOf(read, { params: { boardId }, query: { side: 'a b&c' } })).toBe(`/api/boards/${boardId}?side=a+b%26c`);
    expect(addressOf(read, { params: { boardId } })).toBe(`/api/boards/${boardId}`);
  });

  it('sends JSON with the mark that other sites cannot set, and gives the parsed reply', async () => {
    answers = () => [200, { feet: 8, secret: 'left out' }];
    expect(await call(write, { body: { feet: 8 } })).toEqual({ feet: 8 });
    expect(asked[0]?.init).toMatchObject({ method: 'POST', credentials: 'same-origin', body: '{"feet":8}', headers: { 'X-Requested-With': 'combwright', 'Content-Type': 'application/json' } });
  });

  it('throws the problem as the server told it', async () => {
    answers = () => problem(409, 'stale');
    expect((await failure(call(write, { body: { feet: 8 } }))).problem).toMatchObject({ code: 'stale', status: 409, requestId: 'r1' });
  });

  it('tells a reply of another shape, a page where JSON was due, and a dead line apart', async () => {
    answers = () => [200, { feet: 'eight' }];
    expect((await failure(call(write, { body: { feet: 8 } }))).code).toBe('misshapen');
    answers = () => [502, undefined];
    expect((await failure(call(write, { body: { feet: 8 } }))).code).toBe('unavailable');
    answers = () => Promise.reject(new TypeError('Failed to fetch'));
    expect((await failure(call(write, { body: { feet: 8 } }))).code).toBe('unreachable');
  });

  it('gives back the reason of whoever cancelled it, not an error of ours', async () => {
    const stop = new AbortController();
    stop.abort(new Error('left the page'));
    await expect(call(read, { params: { boardId }, signal: stop.signal })).rejects.toThrow('left the page');
  });
});

describe('a session that has run out', () => {
  const me = { userId: boardId, name: 'Ana', email: 'ana@example.com', role: 'owner', shop: { id: boardId, name: 'Boxes', units: 'in' } };

  it('is renewed once for all calls that find it so, and they are made again', async () => {
    let renewed = false;
    answers = async (path) => {
      if (path === peopleApi.refresh.path) {
        await new Promise((go) => setTimeout(go, 5));
        renewed = true;
        return [200, me];
      }
      return renewed ? [200, { feet: 8 }] : problem(401, 'sign-in-needed');
    };
    const replies = await Promise.all([1, 2, 3].map(() => call(read, { params: { boardId } })));
    expect(replies).toEqual([{ feet: 8 }, { feet: 8 }, { feet: 8 }]);
    expect(asked.filter(({ path }) => path === peopleApi.refresh.path)).toHaveLength(1);
  });

  it('that cannot be renewed is told as it is, without asking over and over', async () => {
    answers = () => problem(401, 'sign-in-needed');
    expect((await failure(call(read, { params: { boardId } }))).code).toBe('sign-in-needed');
    expect(asked.map(({ path }) => path)).toEqual([`/api/boards/${boardId}`, peopleApi.refresh.path]);
  });

  it('has nothing to do with a wrong password', async () => {
    answers = () => problem(401, 'sign-in-needed');
    await failure(call(peopleApi.signIn, { body: { email: 'ana@example.com', password: 'x' } }));
    expect(asked).toHaveLength(1);
  });
});
