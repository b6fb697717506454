import { readdirSync, readFileSync } from 'node:fs';
import { connect, type AddressInfo } from 'node:net';
import path from 'node:path';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { aJobSheet, aWallShape } from '../../support/builders.ts';
import { aPicture } from '../../support/pictures.ts';
import { aBrowser, aShop, aTestApp, origin, type Browser, type TestApp } from '../../support/test-app.ts';

let app: TestApp;
let browser: Browser;
let shopId: string;
let wallId: string;

beforeAll(async () => {
  app = await aTestApp();
  ({ browser, shopId } = await aShop(app));
  const job = await browser.post('/api/jobs').send(aJobSheet()).expect(201);
  wallId = (await browser.post(`/api/jobs/${job.body.id}/walls`).send(aWallShape()).expect(201)).body.id as string;
});
afterAll(() => app.close());

/** A session as it travels in a request's header. */
async function aCookie(): Promise<string> {
  const email = `broken${Date.now()}@example.com`;
  await browser.post('/api/people/members').send({ name: 'A maker', email, role: 'maker', password: 'another long password' }).expect(201);
  const reply = await aBrowser(app).post('/api/people/sign-in').send({ email, password: 'another long password' }).expect(200);
  return (reply.headers['set-cookie'] as unknown as string[]).map((c) => c.split(';')[0]).join('; ');
}

const send = (bytes: Buffer, name = 'photo.jpg') => browser.post(`/api/walls/${wallId}/photos`).attach('file', bytes, name);
const filesKept = () => (readdirSync(path.join(app.dataDir, 'files'), { recursive: true }) as string[]).filter((f) => /\.\w+$/.test(f));
const incoming = () => readdirSync(path.join(app.dataDir, 'incoming'));

/** Deleting what came in follows the reply by a moment. */
async function nothingIncoming(): Promise<void> {
  await expect.poll(incoming, { timeout: 3000 }).toEqual([]);
}

describe('what is refused before any picture is looked at', () => {
  it('no file at all, two files, or a file under another name', async () => {
    const good = await aPicture();
    expect((await browser.post(`/api/walls/${wallId}/photos`).field('note', 'x')).body.detail).toMatch(/choose a photo/);
    expect((await send(good).attach('file', good, 'b.jpg')).status).toBe(400);
    expect((await browser.post(`/api/walls/${wallId}/photos`).attach('photo', good, 'b.jpg')).status).toBe(400);
    expect((await browser.post(`/api/walls/${wallId}/photos`).send({ file: 'x' })).status).toBe(400);
    await nothingIncoming();
  });
});

describe('an upload that breaks off half way', () => {
  it('leaves nothing behind', async () => {
    const server = app.app.listen(0, '127.0.0.1');
    await new Promise((ready) => server.once('listening', ready));
    const cookie = await aCookie();
    const port = (server.address() as AddressInfo).port;
    const socket = connect(port, '127.0.0.1');
    socket.on('error', () => undefined);
    socket.write(
      `POST /api/walls/${wallId}/photos HTTP/1.1\r\nHost: 127.0.0.1\r\nOrigin: ${origin}\r\nCookie: ${cookie}\r\n` +
        'Content-Type: multipart/form-data; boundary=b\r\nContent-Length: 900000\r\n\r\n' +
        '--b\r\nContent-Disposition: form-data; name="file"; filename="a.jpg"\r\nContent-Type: image/jpeg\r\n\r\n',
    );
    socket.write(Buffer.alloc(200_000, 0xff));
    await expect.poll(incoming, { timeout: 3000 }).toHaveLength(1);
    socket.destroy();
    await nothingIncoming();
    await new Promise((closed) => server.close(closed));
  });
});

describe('a photo that is taken', () => {
  it('may lie about its name: content decides, and the name never becomes a path', async () => {
    const reply = await send(await aPicture({ format: 'png' }), '../../../outside.jpg').expect(201);
    expect(reply.body).toMatchObject({ widthPx: 800, heightPx: 600, marks: null, elevation: null });
    expect(filesKept().every((f) => f.startsWith(`${shopId}/`))).toBe(true);
    await nothingIncoming();
  });

  // Exif 2.32, tag 0x0112: where the stored row 0 and column 0 lie in the upright picture.
  it.each([
    [1, 'top left', 'top right'], [2, 'top right', 'top left'], [3, 'bottom right', 'bottom left'], [4, 'bottom left', 'bottom right'],
    [5, 'top left', 'bottom left'], [6, 'top right', 'bottom right'], [7, 'bottom right', 'top right'], [8, 'bottom left', 'top left'],
  ])('with orientation %i stands upright: its first pixel at the %s, the end of its first row at the %s', async (orientation, redAt, greenAt) => {
    const reply = await send(await aPicture({ width: 800, height: 600, orientation })).expect(201);
    const turned = orientation >= 5;
    expect([reply.body.widthPx, reply.body.heightPx]).toEqual(turned ? [600, 800] : [800, 600]);
    const preview = await browser.get(reply.body.previewUrl).expect(200);
    expect(await colouredCorners(preview.body as Buffer)).toEqual({ [redAt]: 'red', [greenAt]: 'green' });
  });

  it('is served without place, camera or any other metadata, while the original stays as it was sent', async () => {
    const original = await aPicture({ width: 3000, height: 2000, gps: true });
    expect((await sharp(original).metadata()).exif).toBeDefined();
    const reply = await send(original).expect(201);
    const preview = await browser.get(reply.body.previewUrl).expect(200);
    expect(preview.headers).toMatchObject({
      'content-type': 'image/jpeg', 'x-content-type-options': 'nosniff', 'content-disposition': 'inline', 'cache-control': expect.stringMatching(/^private/),
    });
    const meta = await sharp(preview.body as Buffer).metadata();
    expect(meta).toMatchObject({ width: 2048, height: 1365 });
    for (const part of ['exif', 'iptc', 'xmp', 'icc', 'orientation'] as const) expect(meta[part]).toBeUndefined();
    expect((preview.body as Buffer).includes('Invented')).toBe(false);
    expect(filesKept().some((f) => readFileSync(path.join(app.dataDir, 'files', f)).equals(original))).toBe(true);
  });

  it('takes the place of the one before, which stays to be chosen again; taken off, the newest left comes in force', async () => {
    for (const photo of (await browser.get(`/api/walls/${wallId}/photos`).expect(200)).body as { id: string }[]) await browser.delete(`/api/walls/${wallId}/photos/${photo.id}`).expect(200);
    expect(filesKept()).toEqual([]);
    const first = await send(await aPicture()).expect(201);
    app.time.now = new Date(app.time.now.getTime() + 1000);
    const second = await send(await aPicture()).expect(201);
    expect(filesKept()).toHaveLength(4);
    const listed = () => browser.get(`/api/walls/${wallId}/photos`).expect(200).then((r) => (r.body as { id: string; inForce: boolean }[]).map((p) => [p.id, p.inForce]));
    expect(await listed()).toEqual([[second.body.id, true], [first.body.id, false]]);
    await browser.get(first.body.previewUrl).expect(200);
    const chosen = await browser.post(`/api/walls/${wallId}/photos/${first.body.id}/choose`).expect(200);
    expect(chosen.body.photo.id).toBe(first.body.id);
    expect((await browser.delete(`/api/walls/${wallId}/photos/${first.body.id}`).expect(200)).body.photo.id).toBe(second.body.id);
    await browser.get(first.body.previewUrl).expect(404);
    await browser.post(`/api/walls/${wallId}/photos/${first.body.id}/choose`).expect(404);
    expect((await browser.delete(`/api/walls/${wallId}/photos/${second.body.id}`).expect(200)).body.photo).toBeNull();
    expect(filesKept()).toEqual([]);
  });

  it('is one of twelve at most', async () => {
    const small = await aPicture({ width: 240, height: 240 });
    for (let i = 0; i < 12; i++) await send(small).expect(201);
    expect((await send(small).expect(400)).body.detail).toMatch(/12 photos/);
    expect(filesKept()).toHaveLength(24);
    for (const photo of (await browser.get(`/api/walls/${wallId}/photos`).expect(200)).body as { id: string }[]) await browser.delete(`/api/walls/${wallId}/photos/${photo.id}`).expect(200);
  });
});

async function colouredCorners(jpeg: Buffer): Promise<Record<string, string>> {
  const { data, info } = await sharp(jpeg).raw().toBuffer({ resolveWithObject: true });
  const found: Record<string, string> = {};
  for (const [row, y] of [['top', 10], ['bottom', info.height - 10]] as const) {
    for (const [column, x] of [['left', 10], ['right', info.width - 10]] as const) {
      const i = (y * info.width + x) * info.channels;
      const [r, g] = [data[i]!, data[i + 1]!];
      if (r > 150 && g < 90) found[`${row} ${column}`] = 'red';
      else if (g > 110 && r < 90) found[`${row} ${column}`] = 'green';
    }
  }
  return found;
}
