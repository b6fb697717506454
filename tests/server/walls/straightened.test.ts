import { readdirSync } from 'node:fs';
import path from 'node:path';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { measuredScenes, seen } from '../../../server/bin/bench/scenes/measured-scenes.ts';
import type { Point } from '../../../shared/walls/homography.ts';
import type { Photo } from '../../../shared/walls/photo.ts';
import { aJobSheet, aWallShape } from '../../support/builders.ts';
import { darkMiddle, paintedWall } from '../../support/painted-wall.ts';
import { aShop, aTestApp, type Browser, type TestApp } from '../../support/test-app.ts';

let app: TestApp;
let browser: Browser;
let jobId: string;

beforeAll(async () => {
  app = await aTestApp();
  browser = (await aShop(app)).browser;
  jobId = (await browser.post('/api/jobs').send(aJobSheet()).expect(201)).body.id as string;
});
afterAll(() => app.close());

const filesKept = () => readdirSync(path.join(app.dataDir, 'files'), { recursive: true, withFileTypes: true }).filter((f) => f.isFile());

/** The barrel scene on a photo of a fifth of the pixels each way that count: 1612 × 1209. */
const barrel = measuredScenes.find((s) => s.name === 'barrel')!;
const size = { widthPx: 1612, heightPx: 1209 };
const camera = { ...barrel.camera, photo: size, focalPx: barrel.camera.focalPx * (1612 / 4032) };
const see = (p: Point) => seen(camera, p);
const on = (p: Point) => { const q = see(p); return q.x > 40 && q.y > 40 && q.x < size.widthPx - 40 && q.y < size.heightPx - 40; };
const discs = [200, 600, 1000, 1400, 1800, 2200].flatMap((y) => [200, 600, 1000, 1400, 1800, 2200, 2600, 3000, 3400, 3800].map((x) => ({ x, y }))).filter(on);
const marks = barrel.fourMm.map((mm) => ({ mm, px: see(mm) }));
const along = (a: Point, b: Point) => Array.from({ length: 9 }, (_, i) => see({ x: a.x + ((b.x - a.x) * i) / 8, y: a.y + ((b.y - a.y) * i) / 8 }));
const straightEdges = [along({ x: 200, y: 150 }, { x: 3800, y: 150 }), along({ x: 250, y: 200 }, { x: 250, y: 2200 })];
const known = { marks, straightEdges };

/** Stored pixels and orientation that stand upright as the painted wall (Exif 2.32, tag 0x0112: 6 is turned a quarter clockwise to view). */
async function aPhoto(orientation: 1 | 6): Promise<Buffer> {
  const { data, width, height } = paintedWall(size, see, discs);
  const upright = sharp(data, { raw: { width, height, channels: 3 } });
  return (orientation === 6 ? upright.rotate(-90) : upright).withExif({ IFD2: { FocalLengthIn35mmFilm: '27' } }).withMetadata({ orientation }).jpeg({ quality: 92 }).toBuffer();
}

async function aWallWithPhoto(orientation: 1 | 6) {
  const wall = (await browser.post(`/api/jobs/${jobId}/walls`).send(aWallShape({ widthMm: 4000, heightMm: 2400 })).expect(201)).body as { id: string };
  const photo = (await browser.post(`/api/walls/${wall.id}/photos`).attach('file', await aPhoto(orientation), 'a.jpg').expect(201)).body as Photo;
  return { at: `/api/walls/${wall.id}/photos/${photo.id}`, photo, wallId: wall.id };
}

/** How far each disc lies from its true place in an elevation, mm. */
async function misses(elevation: NonNullable<Photo['elevation']>): Promise<number[]> {
  const picture = (await browser.get(elevation.url).expect(200)).body as Buffer;
  const { data, info } = await sharp(picture).greyscale().raw().toBuffer({ resolveWithObject: true });
  const { leftMm, bottomMm, heightMm, pxPerMm } = elevation;
  return discs.map((d) => {
    const at = darkMiddle(data, info.width, info.height, { x: (d.x - leftMm) * pxPerMm, y: (bottomMm + heightMm - d.y) * pxPerMm }, 70 * pxPerMm);
    return Math.hypot(at.x / pxPerMm + leftMm - d.x, bottomMm + heightMm - at.y / pxPerMm - d.y);
  });
}

describe('a photo by a barrel lens, stored on its side as phones do', () => {
  it('comes out straight when edges are marked: every disc within 2 mm of its place, and within what is stated; without them it does not', async () => {
    const { at, photo } = await aWallWithPhoto(6);
    expect(photo).toMatchObject({ ...size, focal35Mm: 27 });
    const plain = (await browser.post(`${at}/straighten`).send({ marks }).expect(200)).body as Photo;
    const worstPlain = Math.max(...(await misses(plain.elevation!)));
    const bent = (await browser.post(`${at}/straighten`).send(known).expect(200)).body as Photo;
    const off = await misses(bent.elevation!);
    expect(discs.length).toBeGreaterThan(40);
    expect(Math.max(...off)).toBeLessThan(2);
    expect(Math.max(...off)).toBeLessThan(bent.fit!.expectedErrorMm.worst);
    expect(worstPlain).toBeGreaterThan(3 * Math.max(...off));
    expect(bent.fit!.lens).toMatchObject({ state: 'fitted' });
    expect(bent.known).toEqual({ straightEdges, lines: [], lengths: [] });
  });

  it('is straightened anew without sending it again, keeps the original, and one elevation', async () => {
    const before = filesKept().length;
    const { at, wallId } = await aWallWithPhoto(1);
    const one = (await browser.post(`${at}/straighten`).send({ marks }).expect(200)).body as Photo;
    const two = (await browser.post(`${at}/straighten`).send(known).expect(200)).body as Photo;
    expect(two.elevation!.url).not.toBe(one.elevation!.url);
    expect(filesKept()).toHaveLength(before + 3);
    expect((await browser.get(`/api/walls/${wallId}`).expect(200)).body.photo).toEqual(two);
    expect((await browser.get(`/api/walls/${wallId}/photos`).expect(200)).body).toEqual([{ ...two, inForce: true }]);
  });

  it('tells how far the work has come, and nothing when there is none', async () => {
    const { at } = await aWallWithPhoto(1);
    expect((await browser.get(`${at}/progress`).expect(200)).body).toEqual({ state: 'idle', share: 0 });
    const states = new Set<string>();
    let done = false;
    const work = browser.post(`${at}/straighten`).send(known).expect(200).then(() => (done = true));
    while (!done) states.add((await browser.get(`${at}/progress`).expect(200)).body.state as string);
    await work;
    expect([...states]).toEqual(expect.arrayContaining(['drawing']));
    expect((await browser.get(`${at}/progress`).expect(200)).body).toEqual({ state: 'idle', share: 0 });
  });
});

describe('a photo without any four marks', () => {
  it('is straightened by plumb and level lines, a length each way and one mark', async () => {
    const { at } = await aWallWithPhoto(1);
    const [a, b, c, d] = marks.map((m) => m.px) as [Point, Point, Point, Point];
    const lines = [{ direction: 'level', px: [a, b] }, { direction: 'level', px: [d, c] }, { direction: 'plumb', px: [a, d] }, { direction: 'plumb', px: [b, c] }];
    const lengths = [{ px: [a, b], mm: 2600 }, { px: [a, d], mm: 1500 }];
    const done = (await browser.post(`${at}/straighten`).send({ marks: [marks[0]], lines, lengths, straightEdges }).expect(200)).body as Photo;
    expect(Math.max(...(await misses(done.elevation!)))).toBeLessThan(4);
    await browser.post(`${at}/straighten`).send({ marks: [marks[0]], lines: lines.slice(0, 3), lengths }).expect(400);
    const same = await browser.post(`${at}/straighten`).send({ marks: [marks[0]], lines: [lines[0], lines[0], lines[2], lines[2]], lengths: lengths.slice(0, 1) }).expect(400);
    expect(same.body.detail).toMatch(/far apart/);
  });

  it('with more marks than forty, or edges of two points, is refused at the door', async () => {
    const { at } = await aWallWithPhoto(1);
    await browser.post(`${at}/straighten`).send({ marks: Array.from({ length: 41 }, () => marks[0]) }).expect(400);
    await browser.post(`${at}/straighten`).send({ marks, straightEdges: [[marks[0]!.px, marks[1]!.px]] }).expect(400);
  });
});
