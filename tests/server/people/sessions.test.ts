import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { aBrowser, aMember, aShop, aTestApp, type TestApp } from '../../support/test-app.ts';

let app: TestApp;
beforeAll(async () => {
  app = await aTestApp();
});
afterAll(() => app.close());

const cookie = (headers: Record<string, unknown>, name: string) => ((headers['set-cookie'] as string[] | undefined) ?? []).find((c) => c.startsWith(`${name}=`)) ?? '';

describe('signing in', () => {
  it('makes the first user of a registered shop its owner, in cookies that no script can read', async () => {
    const reply = await aBrowser(app).post('/api/people/register').send({ shopName: 'Comb & Co', name: 'Ona', email: 'Ona@Example.com', password: 'a good long password' }).expect(201);
    expect(reply.body).toMatchObject({ role: 'owner', email: 'ona@example.com', shop: { name: 'Comb & Co', units: 'in' } });
    for (const name of ['cw_access', 'cw_refresh']) expect(cookie(reply.headers, name)).toMatch(/HttpOnly.*SameSite=Lax/);
    expect(JSON.stringify(reply.body)).not.toContain('hash');
  });

  it('says the same of an unknown address and of a wrong password', async () => {
    const shop = await aShop(app);
    const unknown = await aBrowser(app).post('/api/people/sign-in').send({ email: 'nobody@example.com', password: 'whatever it is' }).expect(401);
    const wrong = await aBrowser(app).post('/api/people/sign-in').send({ email: shop.email, password: 'whatever it is' }).expect(401);
    expect(unknown.body.detail).toBe(wrong.body.detail);
  });

  it('refuses a password over 72 bytes, which bcrypt would cut short', async () => {
    const reply = await aBrowser(app).post('/api/people/register').send({ shopName: 'S', name: 'N', email: 'long@example.com', password: 'ä'.repeat(37) }).expect(400);
    expect(reply.body.fields).toEqual([{ path: 'password', words: expect.stringContaining('72 bytes') }]);
  });

  it('refuses an address that has an account, and keeps no half of the second shop', async () => {
    const shop = await aShop(app);
    const before = await app.data.query('SELECT COUNT(*) AS n FROM shops');
    await aBrowser(app).post('/api/people/register').send({ shopName: 'Twice', name: 'N', email: shop.email, password: 'a good long password' }).expect(409);
    expect(await app.data.query('SELECT COUNT(*) AS n FROM shops')).toEqual(before);
  });
});

describe('a session', () => {
  it('keeps only hashes of its refresh token, and gives a new one at each use', async () => {
    const { browser, userId } = await aShop(app);
    const reply = await browser.post('/api/people/refresh').expect(200);
    const token = /cw_refresh=([^;]+)/.exec(cookie(reply.headers, 'cw_refresh'))?.[1] ?? '';
    expect(token.length).toBeGreaterThan(40);
    const rows = await app.data.query('SELECT * FROM sessions WHERE userId = ?', [userId]);
    expect(JSON.stringify(rows)).not.toContain(token);
  });

  it('ends when a used refresh token comes back after the grace: somebody copied it', async () => {
    const { browser } = await aShop(app);
    const first = await browser.post('/api/people/refresh').expect(200);
    const old = /cw_refresh=([^;]+)/.exec(cookie(first.headers, 'cw_refresh'))![1]!;
    await browser.post('/api/people/refresh').expect(200);
    app.time.now = new Date(app.time.now.getTime() + 60_000);
    await aBrowser(app).post('/api/people/refresh').set('Cookie', `cw_refresh=${old}`).expect(401);
    await browser.get('/api/people/me').expect(401);
  });

  it('is over at once after signing out, also for an access cookie kept aside', async () => {
    const { browser } = await aShop(app);
    const kept = cookie((await browser.post('/api/people/refresh')).headers, 'cw_access').split(';')[0]!;
    await browser.post('/api/people/sign-out').expect(200);
    await aBrowser(app).get('/api/people/me').set('Cookie', kept).expect(401);
  });

  it('does not carry over: signing in ends the session the browser held before', async () => {
    const owner = await aShop(app);
    const kept = cookie((await owner.browser.post('/api/people/refresh')).headers, 'cw_access').split(';')[0]!;
    const member = await aMember(app, owner.browser, 'maker');
    await owner.browser.post('/api/people/sign-in').send({ email: member.email, password: 'another long password' }).expect(200);
    await aBrowser(app).get('/api/people/me').set('Cookie', kept).expect(401);
  });

  it('outlives a mistyped password', async () => {
    const { browser, email } = await aShop(app);
    await browser.post('/api/people/sign-in').send({ email, password: 'not the password' }).expect(401);
    await browser.get('/api/people/me').expect(200);
  });

  it('is not believed when its token is unsigned, or signed by another hand', async () => {
    const forged = `${Buffer.from('{"alg":"none","typ":"at+jwt"}').toString('base64url')}.${Buffer.from('{"sub":"x"}').toString('base64url')}.`;
    await aBrowser(app).get('/api/people/me').set('Cookie', `cw_access=${forged}`).expect(401);
  });
});

describe('a request from another site', () => {
  it('that would change something is not carried out', async () => {
    const { browser } = await aShop(app);
    await browser.post('/api/jobs').set('Origin', 'https://elsewhere.example').set('Sec-Fetch-Site', 'cross-site').send({}).expect(403);
    await browser.post('/api/jobs').set('Origin', 'null').send({}).expect(403);
  });
});
