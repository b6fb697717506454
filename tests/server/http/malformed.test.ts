import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { aLaidOutJob } from '../../support/builders.ts';
import { aShop, aTestApp, type Browser, type TestApp } from '../../support/test-app.ts';

let app: TestApp;
let owner: Browser;
let own: Record<string, string>;
beforeAll(async () => {
  app = await aTestApp();
  owner = (await aShop(app)).browser;
  const { job, wall, layout, pattern } = await aLaidOutJob(owner, 1);
  own = { jobId: job.id, wallId: wall.id, layoutId: layout.id, patternId: pattern.id, photoId: randomUUID(), token: 'x'.repeat(43), mailId: 'none' };
});
afterAll(() => app.close());

const deep = (depth: number): unknown => (depth === 0 ? 'end' : { a: deep(depth - 1) });

const bodies: [string, string, string][] = [
  ['nothing that is JSON', 'application/json', '{"a":'],
  ['a list', 'application/json', '[1,2,3]'],
  ['null', 'application/json', 'null'],
  ['a bare number', 'application/json', '1e999'],
  ['wrong kinds everywhere', 'application/json', JSON.stringify({ name: 7, title: [], version: 'x', email: {}, password: null, edits: 'all', marks: {}, design: 3, studs: [null], widthMm: '∞' })],
  ['numbers that are none', 'application/json', JSON.stringify({ name: 'n', widthMm: 0, heightMm: -1, construction: 'straw', coveringMm: 1e308, revealMm: -1e308, version: 1.5 })],
  ['a poisoned prototype', 'application/json', '{"__proto__":{"role":"owner"},"constructor":{"prototype":{"x":1}}}'],
  ['great depth', 'application/json', JSON.stringify(deep(500))],
  ['text', 'text/plain', 'hello'],
  ['broken multipart', 'multipart/form-data; boundary=x', '--x\r\nContent-Disposition: form-data; name="file"; filename="a.jpg"\r\n\r\nabc'],
  ['multipart without boundary', 'multipart/form-data', 'abc'],
  ['control signs', 'application/json', JSON.stringify({ name: '\u0000\u0007', title: "'; DROP TABLE jobs; --", email: 'a@b\r\nBcc: c@d' })],
];

describe('malformed requests', () => {
  it.each(bodies)('%s is answered in words on every route, never by a failure', async (_what, type, body) => {
    for (const { endpoint } of app.mounted) {
      // Signing out would end the session for the routes after it.
      if (endpoint.path.endsWith('/sign-out')) continue;
      const path = endpoint.path.replace(/:([A-Za-z]+)/g, (_, name: string) => own[name] ?? randomUUID());
      const request = owner[endpoint.method](path).set('Content-Type', type);
      const reply = await (endpoint.method === 'get' ? request : request.send(body));
      expect(reply.status, `${endpoint.method} ${path}: ${reply.text}`).toBeLessThan(500);
      if (reply.status < 400) continue;
      expect(reply.headers['content-type']).toMatch(/^application\/problem\+json/);
      expect(reply.text).not.toMatch(/node_modules|at .*\.ts:\d+|SELECT |INSERT /);
    }
    await owner.get('/api/people/me').expect(200);
  });

  it.each(['/api/jobs/%00', '/api/jobs/%E0%A4%A', '/api/jobs/..%2f..%2fetc', `/api/jobs/${'9'.repeat(5000)}`, '/api/layouts/1%20OR%201=1', '/api/portal/short', '/api/no/such/place'])('%s is not found', async (address) => {
    expect((await owner.get(address)).status).toBe(404);
  });
});
