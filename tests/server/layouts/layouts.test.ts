import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { aFrame, aLaidOutJob } from '../../support/builders.ts';
import { aShop, aTestApp, type Browser, type TestApp } from '../../support/test-app.ts';

let app: TestApp;
let browser: Browser;
beforeAll(async () => {
  app = await aTestApp();
  browser = (await aShop(app)).browser;
});
afterAll(() => app.close());

describe('saving a layout', () => {
  it('answers a stale save with what stands now, and overwrites nothing', async () => {
    const { layout, frames } = await aLaidOutJob(browser, 1);
    const frame = frames[0]!;
    const move = (xMm: number) => ({ version: layout.version, edits: [{ kind: 'frame', frameId: frame.id, before: frame, after: { ...frame, xMm } }] });
    await browser.post(`/api/layouts/${layout.id}/edits`).send(move(1000)).expect(200);
    const late = await browser.post(`/api/layouts/${layout.id}/edits`).send(move(1200)).expect(409);
    expect(late.body).toMatchObject({ code: 'stale', current: { version: layout.version + 1, frames: [{ id: frame.id, xMm: 1000 }] } });
    expect((await browser.get(`/api/layouts/${layout.id}`)).body.frames[0].xMm).toBe(1000);
  });

  it('tells its version alone, which goes up with every save; of another shop it is not found', async () => {
    const { layout, frames } = await aLaidOutJob(browser, 1);
    const frame = frames[0]!;
    const version = async () => (await browser.get(`/api/layouts/${layout.id}/version`).expect(200)).body;
    expect(await version()).toEqual({ version: layout.version });
    await browser.post(`/api/layouts/${layout.id}/edits`).send({ version: layout.version, edits: [{ kind: 'frame', frameId: frame.id, before: frame, after: null }] }).expect(200);
    expect(await version()).toEqual({ version: layout.version + 1 });
    await (await aShop(app)).browser.get(`/api/layouts/${layout.id}/version`).expect(404);
  });

  it('lets one of two saves at the same moment through', async () => {
    const { layout, frames } = await aLaidOutJob(browser, 1);
    const frame = frames[0]!;
    const replies = await Promise.all([900, 950, 1000, 1050].map((xMm) =>
      browser.post(`/api/layouts/${layout.id}/edits`).send({ version: layout.version, edits: [{ kind: 'frame', frameId: frame.id, before: frame, after: { ...frame, xMm } }] })));
    expect(replies.map((r) => r.status).sort()).toEqual([200, 409, 409, 409]);
  });

  it('keeps places to the last bit and takes labels in any script', async () => {
    const { layout, pattern } = await aLaidOutJob(browser, 0);
    const frame = aFrame(pattern.id, { xMm: 1000 / 3, yMm: Math.PI * 100, turnRad: Math.PI / 6, label: '蜂七🐝' });
    const saved = await browser.post(`/api/layouts/${layout.id}/edits`).send({ version: layout.version, edits: [{ kind: 'frame', frameId: frame.id, before: null, after: frame }] }).expect(200);
    expect(saved.body.frames).toEqual([frame]);
    expect((await browser.get(`/api/layouts/${layout.id}`)).body.frames).toEqual([frame]);
  });

  it('keeps how far hangers were slid, and forgets it when they are slid back', async () => {
    const { layout, frames } = await aLaidOutJob(browser, 1);
    const frame = frames[0]!;
    const slid = { ...frame, hangerSlides: { h1: 12.5, h2: -1 / 3 } };
    const save = (version: number, before: object, after: object) => browser.post(`/api/layouts/${layout.id}/edits`).send({ version, edits: [{ kind: 'frame', frameId: frame.id, before, after }] }).expect(200);
    expect((await save(layout.version, frame, slid)).body.frames).toEqual([slid]);
    expect((await browser.get(`/api/layouts/${layout.id}`)).body.frames).toEqual([slid]);
    expect((await save(layout.version + 1, slid, frame)).body.frames).toEqual([frame]);
  });

  it('refuses a pattern that is not in the shop’s book, and a place that is no number, saving nothing', async () => {
    const { layout } = await aLaidOutJob(browser, 0);
    const strange = aFrame('6b1f6f9c-1c1a-4a0e-9c39-2f2d6a3b1c11');
    const edit = (after: object) => ({ version: layout.version, edits: [{ kind: 'frame', frameId: strange.id, before: null, after }] });
    await browser.post(`/api/layouts/${layout.id}/edits`).send(edit(strange)).expect(400);
    const reply = await browser.post(`/api/layouts/${layout.id}/edits`).send(edit({ ...strange, xMm: 'far' })).expect(400);
    expect(reply.body.fields[0].path).toContain('xMm');
    expect((await browser.get(`/api/layouts/${layout.id}`)).body).toMatchObject({ version: layout.version, frames: [] });
  });
});
