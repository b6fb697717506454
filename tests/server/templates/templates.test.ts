import { existsSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { aLaidOutJob } from '../../support/builders.ts';
import { aShop, aTestApp, type Browser, type TestApp } from '../../support/test-app.ts';

let app: TestApp;
let shop: Browser;
beforeAll(async () => {
  app = await aTestApp();
  shop = (await aShop(app)).browser;
});
afterAll(() => app.close());

const stored = (): string[] => {
  const root = path.join(app.dataDir, 'templates');
  return existsSync(root) ? readdirSync(root, { recursive: true, encoding: 'utf8' }).filter((name) => name.endsWith('.pdf')) : [];
};

describe('the templates of a layout', { timeout: 60_000 }, () => {
  it('are told as a plan before they are printed, and drawn once for the same choices', async () => {
    const { layout, frames } = await aLaidOutJob(shop);
    const { body } = await shop.get(`/api/layouts/${layout.id}/template/plan?paper=a3&kind=screws&firstFrameId=${frames[1]!.id}`).expect(200);
    expect(body.plan.sheets.length).toBeGreaterThan(0);
    expect(body.input.frames).toHaveLength(2);
    const ask = () => shop.get(`/api/layouts/${layout.id}/template.pdf?paper=a3`).expect(200).expect('Content-Type', 'application/pdf');
    const first = await ask();
    const again = await ask();
    expect(stored()).toHaveLength(1);
    expect(Buffer.compare(first.body as Buffer, again.body as Buffer)).toBe(0);
    await shop.get(`/api/layouts/${layout.id}/template.pdf?paper=a3&join=butt`).expect(200);
    expect(stored()).toHaveLength(2);
  });

  it('are refused with words for what cannot be printed', async () => {
    const { layout } = await aLaidOutJob(shop, 1);
    const bare = await aLaidOutJob(shop, 0);
    const words = async (query: string, id = layout.id) => (await shop.get(`/api/layouts/${id}/template/plan?${query}`).expect(400)).body.detail as string;
    expect(await words('marginMm=120')).toContain('wider than Letter');
    expect(await words('paper=roll&rollWidthMm=100')).toContain('the smallest label needs');
    expect(await words('correctionX=0')).toContain('print setting is wrong');
    expect(await words('correctionY=NaN')).toContain('number');
    expect(await words('firstFrameId=nobody')).toContain('not on this wall');
    expect(await words('paper=a4', bare.layout.id)).toContain('no frame on the wall');
  });

  it('take the correction of the printer they are for; past 3 % it is refused and nothing kept', async () => {
    const { layout } = await aLaidOutJob(shop, 1);
    const printer = (await shop.post('/api/printers').send({ name: 'Workshop' }).expect(201)).body as { id: string };
    const measure = (measuredMm: number) => shop.post(`/api/printers/${printer.id}/measurements`).send({ across: { statedMm: 150, measuredMm }, up: { statedMm: 150, measuredMm: 150.1 } });
    expect((await measure(144).expect(400)).body.detail).toContain('Untick “Fit to page”');
    expect((await shop.get('/api/printers')).body).toMatchObject([{ name: 'Workshop', correctionX: 1, correctionY: 1, measuredAt: null }]);
    const { body } = await measure(148.5).expect(200);
    expect(body.across.applied).toBe(true);
    expect(body.up).toMatchObject({ applied: false, factor: 1 });
    // 150 / 148.5.
    expect((await shop.get(`/api/layouts/${layout.id}/template/plan?printerId=${printer.id}`)).body.input.correction.x).toBeCloseTo(1.010101, 6);
    await shop.delete(`/api/printers/${printer.id}`).expect(200);
    expect((await shop.get('/api/printers')).body).toEqual([]);
  });
});
