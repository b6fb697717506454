import { createHash } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { aLaidOutJob } from '../../support/builders.ts';
import { aBrowser, aShop, aTestApp, type Browser, type TestApp } from '../../support/test-app.ts';

let app: TestApp;
let shop: Browser;
beforeAll(async () => {
  app = await aTestApp();
  shop = (await aShop(app, 'Comb & Sons <workshop>')).browser;
});
afterAll(() => app.close());

/** Sends the layout and takes the token out of the client's mail, as the client would. */
async function sent(layout: { id: string; version: number }) {
  const reply = await shop.post(`/api/layouts/${layout.id}/send`).send({ version: layout.version, note: 'Two boxes <b>as</b> talked over.' }).expect(200);
  await app.outbox.sendDue();
  const mail = (await app.fakeMail.list()).find((m) => m.subject.includes('please look'))!;
  return { layout: reply.body, mail, token: /\/p\/([A-Za-z0-9_-]+)/.exec(mail.text)![1]! };
}

const moved = async (layout: { id: string; version: number; frames: { xMm: number; id: string }[] }) => {
  const before = layout.frames[0]!;
  return (await shop.post(`/api/layouts/${layout.id}/edits`).send({ version: layout.version, edits: [{ kind: 'frame', frameId: before.id, before, after: { ...before, xMm: before.xMm + 10 } }] }).expect(200)).body;
};

describe('sign-off', () => {
  it('goes by mail, is opened without a password, signed by name, and frozen with a hash anyone can check', async () => {
    const { job, layout } = await aLaidOutJob(shop);
    const first = await sent(layout);
    expect(first.layout).toMatchObject({ letter: 'A', state: 'with client' });
    expect(first.mail.to).toContain('tova@client.example');
    expect(first.mail.html).not.toContain('<b>as</b>');

    const client = aBrowser(app);
    const portal = (await client.get(`/api/portal/${first.token}`).expect(200)).body;
    const revision = portal.revisions[0];
    expect(revision.snapshot.frames).toHaveLength(2);
    const signed = await client.post(`/api/portal/${first.token}/revisions/${revision.id}/sign`).send({ name: 'Tova Lind', sha256: revision.sha256, agreed: true }).expect(200);
    expect(signed.body).toMatchObject({ state: 'signed', signedName: 'Tova Lind' });

    const record = (await shop.get(`/api/revisions/${revision.id}/record`).expect(200)).body;
    expect(createHash('sha256').update(record.canonical, 'utf8').digest('hex')).toBe(record.sha256);
    expect(record).toMatchObject({ verified: true, state: 'signed', signedName: 'Tova Lind', signedAt: '2026-03-02T09:00:00.000Z' });
    expect((await shop.get(`/api/jobs/${job.id}`)).body.state).toBe('build');
    await app.outbox.sendDue();
    expect((await app.fakeMail.list()).filter((m) => m.subject.includes('sign')).length).toBeGreaterThanOrEqual(2);
  });

  it('makes a change after signing the next letter, and leaves the signed record as it was', async () => {
    const { layout } = await aLaidOutJob(shop);
    const { token, layout: withClient } = await sent(layout);
    const id = withClient.revisions[0].id as string;
    await aBrowser(app).post(`/api/portal/${token}/revisions/${id}/sign`).send({ name: 'Tova Lind', sha256: withClient.revisions[0].sha256, agreed: true }).expect(200);
    const before = (await shop.get(`/api/revisions/${id}/record`)).body.canonical;
    const changed = await moved(withClient);
    expect(changed).toMatchObject({ letter: 'B', state: 'draft', changedSinceSigned: true });
    expect((await shop.get(`/api/revisions/${id}/record`)).body).toMatchObject({ canonical: before, state: 'signed', verified: true });
  });

  it('counts a double click once, and a second name not at all', async () => {
    const { layout } = await aLaidOutJob(shop);
    const { token, layout: withClient } = await sent(layout);
    const { id, sha256 } = withClient.revisions[0];
    const sign = (name: string) => aBrowser(app).post(`/api/portal/${token}/revisions/${id}/sign`).send({ name, sha256, agreed: true });
    const replies = await Promise.all([sign('Tova Lind'), sign('Tova Lind'), sign('Tova Lind')]);
    expect(replies.map((r) => r.status)).toEqual([200, 200, 200]);
    await sign('Somebody Else').expect(410);
    const mails = await app.data.query("SELECT COUNT(*) AS n FROM outbox WHERE subject LIKE '%your signature%' AND text LIKE ?", [`%${sha256}%`]);
    expect(Number(mails[0].n)).toBe(1);
  });

  it('lets the client ask for changes; the next send supersedes, and says so by the old link', async () => {
    const { layout } = await aLaidOutJob(shop);
    const first = await sent(layout);
    const { id, sha256 } = first.layout.revisions[0];
    await aBrowser(app).post(`/api/portal/${first.token}/revisions/${id}/changes`).send({ words: 'A little higher, please.' }).expect(200);
    const now = (await shop.get(`/api/layouts/${layout.id}`)).body;
    expect(now.revisions[0]).toMatchObject({ state: 'changes asked', askedFor: 'A little higher, please.' });
    await shop.post(`/api/layouts/${layout.id}/send`).send({ version: now.version, note: '' }).expect(409);
    await sent(await moved(now));
    const old = (await aBrowser(app).get(`/api/portal/${first.token}`).expect(200)).body;
    expect(old.revisions.map((r: { letter: string; state: string }) => `${r.letter} ${r.state}`)).toEqual(['A superseded', 'B with client']);
    await aBrowser(app).post(`/api/portal/${first.token}/revisions/${id}/sign`).send({ name: 'Tova Lind', sha256, agreed: true }).expect(410);
  });

  it('keeps a link of one job away from the revisions of another', async () => {
    const one = await sent((await aLaidOutJob(shop)).layout);
    const two = await sent((await aLaidOutJob(shop)).layout);
    const { id, sha256 } = two.layout.revisions[0];
    await aBrowser(app).post(`/api/portal/${one.token}/revisions/${id}/sign`).send({ name: 'Tova Lind', sha256, agreed: true }).expect(404);
  });

  it('closes a link that is revoked, and one past its time, with words', async () => {
    const { job, layout } = await aLaidOutJob(shop);
    const { token } = await sent(layout);
    const link = (await shop.get(`/api/jobs/${job.id}/links`)).body[0];
    expect(JSON.stringify(link)).not.toContain(token);
    await shop.post(`/api/links/${link.id}/revoke`).expect(200);
    expect((await aBrowser(app).get(`/api/portal/${token}`).expect(410)).body.detail).toContain('closed');
    const other = await sent((await aLaidOutJob(shop)).layout);
    const today = app.time.now;
    app.time.now = new Date(today.getTime() + 31 * 86_400_000);
    expect((await aBrowser(app).get(`/api/portal/${other.token}`).expect(410)).body.detail).toContain('past its time');
    app.time.now = today;
  });

  it('shows a record whose text was tampered with as broken, and will not let it be signed', async () => {
    const { layout } = await aLaidOutJob(shop);
    const { token, layout: withClient } = await sent(layout);
    const { id, sha256 } = withClient.revisions[0];
    await app.data.query("UPDATE revisions SET canonical = REPLACE(canonical, '\"revealMm\":6', '\"revealMm\":7') WHERE id = ?", [id]);
    expect((await shop.get(`/api/revisions/${id}/record`).expect(200)).body.verified).toBe(false);
    await aBrowser(app).post(`/api/portal/${token}/revisions/${id}/sign`).send({ name: 'Tova Lind', sha256, agreed: true }).expect(409);
  });
});
