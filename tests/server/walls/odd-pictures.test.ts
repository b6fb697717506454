import { readdirSync } from 'node:fs';
import path from 'node:path';
import sharp from 'sharp';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { aJobSheet, aWallShape } from '../../support/builders.ts';
import { oddPictures } from '../../support/odd-pictures.ts';
import { aShop, aTestApp, type Browser, type TestApp } from '../../support/test-app.ts';

let app: TestApp;
let browser: Browser;
let wallId: string;
let mostMemory = 0;
let watch: NodeJS.Timeout;

beforeAll(async () => {
  app = await aTestApp();
  browser = (await aShop(app)).browser;
  const job = await browser.post('/api/jobs').send(aJobSheet()).expect(201);
  wallId = (await browser.post(`/api/jobs/${job.body.id}/walls`).send(aWallShape()).expect(201)).body.id as string;
  watch = setInterval(() => (mostMemory = Math.max(mostMemory, process.memoryUsage.rss())), 20);
});
// One picture's failure is not the next one's.
afterEach(async () => {
  for (const photo of (await browser.get(`/api/walls/${wallId}/photos`)).body as { id: string }[]) await browser.delete(`/api/walls/${wallId}/photos/${photo.id}`);
});
afterAll(async () => {
  clearInterval(watch);
  await app.close();
});

const filesKept = () => readdirSync(path.join(app.dataDir, 'files'), { recursive: true, withFileTypes: true }).filter((f) => f.isFile());

describe('a corpus of odd and hostile pictures', () => {
  it('holds at least forty, taken and refused', () => {
    expect(oddPictures.length).toBeGreaterThanOrEqual(40);
    expect(new Set(oddPictures.map((p) => p.what)).size).toBe(oddPictures.length);
  });

  it.each(oddPictures)('$what', async ({ make, fate, name = 'photo.jpg', type }) => {
    const bytes = await make();
    const before = process.memoryUsage.rss();
    mostMemory = before;
    const reply = await browser.post(`/api/walls/${wallId}/photos`).attach('file', bytes, type ? { filename: name, contentType: type } : name);
    if ('refused' in fate) {
      expect([reply.status, reply.body.detail]).toEqual([fate.refused, expect.stringMatching(fate.words)]);
      expect(reply.type).toBe('application/problem+json');
    } else {
      expect([reply.status, reply.body.widthPx, reply.body.heightPx]).toEqual([201, ...fate.taken]);
      const preview = (await browser.get(reply.body.previewUrl).expect(200)).body as Buffer;
      const meta = await sharp(preview).metadata();
      expect(meta).toMatchObject({ format: 'jpeg', space: 'srgb', channels: 3 });
      for (const part of ['exif', 'iptc', 'xmp', 'icc', 'orientation', 'comments'] as const) expect(meta[part]).toBeUndefined();
      expect(preview.includes('Invented')).toBe(false);
      await browser.delete(`/api/walls/${wallId}/photos/${reply.body.id}`).expect(200);
    }
    // Twice the 180 MB that sixty megapixels fill, and the file itself on its way through the test's own client.
    expect(mostMemory - before).toBeLessThan(400e6 + 4 * bytes.length);
    // The server is alive, and nothing is left over.
    await browser.get(`/api/walls/${wallId}`).expect(200);
    await expect.poll(() => readdirSync(path.join(app.dataDir, 'incoming')), { timeout: 3000 }).toEqual([]);
    expect(filesKept()).toEqual([]);
  });
});
