import { randomUUID } from 'node:crypto';
import supertest from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { aLaidOutJob } from '../../support/builders.ts';
import { aMember, aShop, aTestApp, origin, type Browser, type TestApp } from '../../support/test-app.ts';

/**
 * Every route, and who may call it. `o` owner, `m` maker, `h` hanger, `n` nobody signed in; a letter stands where the call
 * passes the gate (the reply may still be a complaint about the input). A route that is missing here fails the test.
 */
const table: Record<string, string> = {
  'get /api/health': 'omhn',
  'get /api/openapi.json': 'omhn',
  'get /api/development/mailbox': 'omhn',
  'get /api/development/mailbox/:mailId': 'omhn',
  'get /api/development/mailbox/:mailId/page': 'omhn',
  'post /api/people/register': 'omhn',
  'post /api/people/sign-in': 'omhn',
  'post /api/people/refresh': 'omhn',
  'post /api/people/sign-out': 'omhn',
  'get /api/people/me': 'omh',
  'get /api/people/members': 'om',
  'post /api/people/members': 'o',
  'get /api/jobs': 'omh',
  'post /api/jobs': 'om',
  'get /api/jobs/:jobId': 'omh',
  'patch /api/jobs/:jobId': 'om',
  'get /api/hardware': 'omh',
  'post /api/hardware': 'om',
  'put /api/hardware/:hardwareId': 'om',
  'delete /api/hardware/:hardwareId': 'om',
  'get /api/patterns': 'omh',
  'post /api/patterns': 'om',
  'put /api/patterns/:patternId': 'om',
  'get /api/jobs/:jobId/walls': 'omh',
  'post /api/jobs/:jobId/walls': 'om',
  'get /api/walls/:wallId': 'omh',
  'patch /api/walls/:wallId': 'om',
  'post /api/walls/:wallId/photos': 'om',
  'post /api/walls/:wallId/photos/:photoId/straighten': 'om',
  'get /api/walls/:wallId/photos': 'omh',
  'get /api/walls/:wallId/photos/:photoId/progress': 'omh',
  'post /api/walls/:wallId/photos/:photoId/choose': 'om',
  'delete /api/walls/:wallId/photos/:photoId': 'om',
  'get /api/walls/:wallId/photos/:photoId/preview': 'omh',
  'get /api/walls/:wallId/photos/:photoId/elevation': 'omh',
  'get /api/jobs/:jobId/layouts': 'omh',
  'post /api/walls/:wallId/layouts': 'om',
  'get /api/layouts/:layoutId': 'omh',
  'get /api/layouts/:layoutId/version': 'omh',
  'post /api/layouts/:layoutId/edits': 'om',
  'delete /api/layouts/:layoutId': 'om',
  'post /api/layouts/:layoutId/send': 'om',
  'get /api/jobs/:jobId/links': 'om',
  'post /api/links/:linkId/revoke': 'om',
  'get /api/revisions/:revisionId/record': 'omh',
  'get /api/portal/:token': 'omhn',
  'get /api/portal/:token/revisions/:revisionId/elevation': 'omhn',
  'post /api/portal/:token/revisions/:revisionId/sign': 'omhn',
  'post /api/portal/:token/revisions/:revisionId/changes': 'omhn',
  'get /api/layouts/:layoutId/template.pdf': 'omh',
  'get /api/layouts/:layoutId/template.dxf': 'omh',
  'get /api/layouts/:layoutId/template.svg': 'omh',
  'get /api/layouts/:layoutId/template/plan': 'omh',
  'get /api/layouts/:layoutId/template/progress': 'omh',
  'get /api/printers': 'omh',
  'post /api/printers': 'omh',
  'post /api/printers/:printerId/measurements': 'omh',
  'delete /api/printers/:printerId': 'omh',
};

let app: TestApp;
const browsers: Record<string, Browser> = {};

beforeAll(async () => {
  app = await aTestApp();
  const owner = await aShop(app);
  browsers.o = owner.browser;
  browsers.m = (await aMember(app, owner.browser, 'maker')).browser;
  browsers.h = (await aMember(app, owner.browser, 'hanger')).browser;
  browsers.n = supertest.agent(app.app);
  browsers.n.set('Origin', origin);
});
afterAll(() => app.close());

const names = () => app.mounted.map(({ endpoint }) => `${endpoint.method} ${endpoint.path}`).sort();
const filled = (path: string) => path.replace(':token', 'x'.repeat(43)).replace(':mailId', 'none').replace(/:[A-Za-z]+/g, () => randomUUID());

describe('who may call what', () => {
  it('names every route in the table, and no route that is gone', () => {
    expect(names()).toEqual(Object.keys(table).sort());
  });

  it.each(Object.entries(table))('%s is open to %s alone', async (route, open) => {
    const [method, path] = route.split(' ') as ['get', string];
    for (const letter of 'omhn') {
      // A signed-in reader who signs out here would lose the session for the rows after it.
      if (path === '/api/people/sign-out' && letter !== 'n') continue;
      const reply = await browsers[letter]![method](filled(path));
      const refused = (reply.status === 401 && path !== '/api/people/refresh' && path !== '/api/people/sign-in') || reply.status === 403;
      expect({ letter, refused, status: reply.status }).toMatchObject({ letter, refused: !open.includes(letter) });
      if (letter === 'n' && refused) expect(reply.status).toBe(401);
      if (reply.status >= 400) expect(reply.headers['content-type']).toMatch(/^application\/problem\+json/);
      expect(reply.status).toBeLessThan(500);
    }
  });
});

describe('two shops', () => {
  it('never see each other: every address with an id of the other shop is not found', async () => {
    const theirs = await aShop(app, 'The other shop');
    const mine = await aLaidOutJob(browsers.o!);
    await browsers.o!.post(`/api/layouts/${mine.layout.id}/send`).send({ version: mine.layout.version, note: '' }).expect(200);
    const revisionId = (await browsers.o!.get(`/api/layouts/${mine.layout.id}`)).body.revisions[0].id as string;
    const linkId = (await browsers.o!.get(`/api/jobs/${mine.job.id}/links`)).body[0].id as string;
    const hardwareId = (await browsers.o!.get('/api/hardware')).body.screws[0].id as string;
    const printerId = (await browsers.o!.post('/api/printers').send({ name: 'Bench printer' }).expect(201)).body.id as string;
    const own: Record<string, string> = { hardwareId, printerId, jobId: mine.job.id, wallId: mine.wall.id, layoutId: mine.layout.id, patternId: mine.pattern.id, revisionId, linkId, photoId: randomUUID() };
    const bodies: Record<string, object> = {
      'put /api/hardware/:hardwareId': { kind: 'anchor', name: 'Theirs', body: { kind: 'masonry', ratedAs: 'allowable', shearN: null, tensionN: null } },
      'post /api/printers/:printerId/measurements': { across: { statedMm: 150, measuredMm: 149 }, up: { statedMm: 150, measuredMm: 149 } },
      'patch /api/jobs/:jobId': { version: 1, title: 'Taken over' },
      'post /api/jobs/:jobId/walls': { name: 'w', widthMm: 1000, heightMm: 1000, construction: 'masonry', coveringMm: 0 },
      'patch /api/walls/:wallId': { version: 1, name: 'Taken over' },
      'post /api/walls/:wallId/layouts': { name: 'l', revealMm: 3 },
      'put /api/patterns/:patternId': { name: 'p', version: 1, design: (await browsers.o!.get('/api/patterns')).body[0].design },
      'post /api/layouts/:layoutId/edits': { version: 1, edits: [{ kind: 'sheet', before: { name: 'First', revealMm: 6 }, after: { name: 'Taken', revealMm: 6 } }] },
      'post /api/layouts/:layoutId/send': { version: 1, note: '' },
      'post /api/walls/:wallId/photos/:photoId/straighten': { marks: [[0, 0], [1, 0], [1, 1], [0, 1]].map(([x, y]) => ({ px: { x: x! * 900, y: y! * 900 }, mm: { x: x! * 900, y: y! * 900 } })) },
    };
    for (const route of Object.keys(table).filter((r) => /:(job|wall|layout|pattern|revision|link|hardware|printer)Id/.test(r) && !r.includes('portal'))) {
      const [method, path] = route.split(' ') as ['get', string];
      const address = path.replace(/:([A-Za-z]+)/g, (_, name: string) => own[name] ?? randomUUID());
      const request = theirs.browser[method](address);
      const reply = await (path.endsWith('/photos') ? request.attach('file', Buffer.from('no picture'), 'wall.jpg') : request.send(method === 'get' ? undefined : bodies[route]));
      expect(`${route} ${reply.status}`).toBe(`${route} 404`);
    }
    expect((await theirs.browser.get('/api/jobs')).body).toEqual([]);
    expect((await theirs.browser.get('/api/patterns')).body).toEqual([]);
  });

  it('lets a hanger read the jobs they are sent to and no others', async () => {
    const owner = await aShop(app);
    const hanger = await aMember(app, owner.browser, 'hanger');
    const sent = await aLaidOutJob(owner.browser, 1);
    const other = await aLaidOutJob(owner.browser, 1);
    const job = (await owner.browser.get(`/api/jobs/${sent.job.id}`)).body;
    await owner.browser.patch(`/api/jobs/${sent.job.id}`).send({ version: job.version, assignedTo: [hanger.userId] }).expect(200);
    expect((await hanger.browser.get('/api/jobs')).body.map((j: { id: string }) => j.id)).toEqual([sent.job.id]);
    await hanger.browser.get(`/api/layouts/${sent.layout.id}`).expect(200);
    await hanger.browser.get(`/api/walls/${other.wall.id}`).expect(404);
    await hanger.browser.get(`/api/layouts/${other.layout.id}`).expect(404);
    await hanger.browser.get(`/api/layouts/${other.layout.id}/template.pdf`).expect(404);
  });
});
