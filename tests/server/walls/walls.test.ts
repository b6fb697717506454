import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { aJobSheet, aStud, aWallShape } from '../../support/builders.ts';
import { aMember, aShop, aTestApp, type Browser, type TestApp } from '../../support/test-app.ts';
import { aPicture } from '../../support/pictures.ts';

let app: TestApp;
let owner: Browser;
let jobId: string;

beforeAll(async () => {
  app = await aTestApp();
  owner = (await aShop(app)).browser;
  jobId = (await owner.post('/api/jobs').send(aJobSheet()).expect(201)).body.id as string;
});
afterAll(() => app.close());

const aWall = async () => (await owner.post(`/api/jobs/${jobId}/walls`).send(aWallShape()).expect(201)).body as { id: string; version: number };

describe('a wall', () => {
  it('is drawn without a photo, then given studs from left to right and what stands in the way', async () => {
    const wall = await aWall();
    const studs = [aStud(812.8), aStud(406.4, { foundBy: 'spacing', uncertaintyMm: 12.7 })];
    const outlet = { id: randomUUID(), kind: 'outlet', name: 'By the door', outlineMm: [[300, 250], [370, 250], [370, 364], [300, 364]], clearanceMm: 50 };
    const saved = await owner.patch(`/api/walls/${wall.id}`).send({ version: wall.version, studs, obstructions: [outlet] }).expect(200);
    expect(saved.body).toMatchObject({ version: wall.version + 1, studs: [studs[1], studs[0]], obstructions: [outlet], photo: null });
    expect((await owner.get(`/api/walls/${wall.id}`).expect(200)).body).toEqual(saved.body);
    expect((await owner.get(`/api/jobs/${jobId}/walls`).expect(200)).body).toContainEqual(saved.body);
  });

  it('is of spruce-pine-fir until the shop says otherwise, and stays what it was told when something else is changed', async () => {
    const { studSpecies: _left, ...plain } = aWallShape();
    const wall = (await owner.post(`/api/jobs/${jobId}/walls`).send(plain).expect(201)).body as { id: string; version: number; studSpecies: string };
    expect(wall.studSpecies).toBe('spruce-pine-fir');
    await owner.patch(`/api/walls/${wall.id}`).send({ version: wall.version, studSpecies: 'southern pine' }).expect(200);
    const named = await owner.patch(`/api/walls/${wall.id}`).send({ version: wall.version + 1, name: 'South wall' }).expect(200);
    expect(named.body).toMatchObject({ name: 'South wall', studSpecies: 'southern pine' });
    const wrong = await owner.patch(`/api/walls/${wall.id}`).send({ version: wall.version + 2, studSpecies: 'balsa' }).expect(400);
    expect(wrong.body.fields).toEqual([{ path: 'studSpecies', words: 'This species group is not in the table.' }]);
  });

  it('keeps the outline of a sloped ceiling until it is a rectangle again', async () => {
    const wall = await aWall();
    const outlineMm = [[0, 0], [3000, 0], [3000, 2400], [1500, 2400], [0, 1200]];
    const saved = await owner.patch(`/api/walls/${wall.id}`).send({ version: wall.version, outlineMm }).expect(200);
    expect(saved.body).toMatchObject({ outlineMm });
    const named = await owner.patch(`/api/walls/${wall.id}`).send({ version: saved.body.version, name: 'Loft wall' }).expect(200);
    expect(named.body).toMatchObject({ outlineMm });
    const square = await owner.patch(`/api/walls/${wall.id}`).send({ version: named.body.version, outlineMm: null }).expect(200);
    expect(square.body.outlineMm).toBeNull();
  });

  it('saved by two people is never overwritten in silence: the later is told what stands', async () => {
    const wall = await aWall();
    await owner.patch(`/api/walls/${wall.id}`).send({ version: wall.version, widthMm: 4000 }).expect(200);
    const late = await owner.patch(`/api/walls/${wall.id}`).send({ version: wall.version, studs: [aStud(100)] }).expect(409);
    expect(late.body).toMatchObject({ code: 'stale', current: { widthMm: 4000, studs: [] } });
  });

  it('refuses a stud off the wall and two studs of one identifier, naming the field', async () => {
    const wall = await aWall();
    const off = await owner.patch(`/api/walls/${wall.id}`).send({ version: wall.version, studs: [aStud(100), aStud(9000)] }).expect(400);
    expect(off.body.fields).toEqual([{ path: 'studs.1.xMm', words: expect.stringMatching(/off the wall/) }]);
    const twin = aStud(100);
    await owner.patch(`/api/walls/${wall.id}`).send({ version: wall.version, studs: [twin, { ...twin, xMm: 500 }] }).expect(400);
    expect((await owner.get(`/api/walls/${wall.id}`)).body).toMatchObject({ version: wall.version, studs: [] });
  });

  it('cannot take a stud away from another wall by naming its identifier', async () => {
    const [one, two] = [await aWall(), await aWall()];
    const stud = aStud(500);
    await owner.patch(`/api/walls/${one.id}`).send({ version: one.version, studs: [stud] }).expect(200);
    await owner.patch(`/api/walls/${two.id}`).send({ version: two.version, studs: [stud] }).expect(400);
    expect((await owner.get(`/api/walls/${one.id}`)).body.studs).toEqual([stud]);
  });
});

describe('who sees a wall', () => {
  it('is its own shop alone: to another it is not there, photo and all', async () => {
    const wall = await aWall();
    const photo = (await owner.post(`/api/walls/${wall.id}/photos`).attach('file', await aPicture(), 'a.jpg').expect(201)).body as { id: string; previewUrl: string };
    const stranger = (await aShop(app)).browser;
    await stranger.get(`/api/walls/${wall.id}`).expect(404);
    await stranger.get(`/api/jobs/${jobId}/walls`).expect(404);
    await stranger.get(photo.previewUrl).expect(404);
    await stranger.patch(`/api/walls/${wall.id}`).send({ version: 1, name: 'Mine' }).expect(404);
    await stranger.delete(`/api/walls/${wall.id}/photos/${photo.id}`).expect(404);
    await stranger.post(`/api/walls/${wall.id}/photos`).attach('file', await aPicture(), 'a.jpg').expect(404);
    await stranger.post(`/api/walls/${wall.id}/photos/${photo.id}/straighten`).send({ marks: fourMarks }).expect(404);
    await owner.get(photo.previewUrl).expect(200);
  });

  it('is the hanger only once the job is theirs, and then to read, not to change', async () => {
    const wall = await aWall();
    const hanger = await aMember(app, owner, 'hanger');
    await hanger.browser.get(`/api/walls/${wall.id}`).expect(404);
    const job = (await owner.get(`/api/jobs/${jobId}`).expect(200)).body as { version: number };
    await owner.patch(`/api/jobs/${jobId}`).send({ version: job.version, assignedTo: [hanger.userId] }).expect(200);
    await hanger.browser.get(`/api/walls/${wall.id}`).expect(200);
    await hanger.browser.patch(`/api/walls/${wall.id}`).send({ version: 1, name: 'Mine' }).expect(403);
    await hanger.browser.post(`/api/walls/${wall.id}/photos`).attach('file', await aPicture(), 'a.jpg').expect(403);
  });
});

describe('straightening', () => {
  it('is refused in words, naming the marks, where they cannot carry it', async () => {
    const wall = await aWall();
    const photo = (await owner.post(`/api/walls/${wall.id}/photos`).attach('file', await aPicture(), 'a.jpg').expect(201)).body as { id: string };
    const at = `/api/walls/${wall.id}/photos/${photo.id}`;
    await owner.get(`${at}/elevation`).expect(404);
    const crossed = await owner.post(`${at}/straighten`).send({ marks: [fourMarks[1], { ...fourMarks[0], mm: fourMarks[2]!.mm }, { ...fourMarks[2], mm: fourMarks[0]!.mm }, fourMarks[3]] }).expect(400);
    expect(crossed.body.detail).toMatch(/This order works: mark 2 with the position typed for mark 3/);
    await owner.post(`${at}/straighten`).send({ marks: fourMarks.slice(0, 3) }).expect(400);
  });

  it('keeps marks and rectangle, serves the picture under an address that changes with it, and leaves one file', async () => {
    const wall = await aWall();
    const photo = (await owner.post(`/api/walls/${wall.id}/photos`).attach('file', await aPicture(), 'a.jpg').expect(201)).body as { id: string };
    const straighten = (marks: object) => owner.post(`/api/walls/${wall.id}/photos/${photo.id}/straighten`).send({ marks }).expect(200);
    const first = (await straighten(fourMarks)).body;
    expect(first).toMatchObject({ marks: fourMarks, elevation: { bottomMm: 0, pxPerMm: expect.any(Number) } });
    const picture = await owner.get(first.elevation.url).expect(200);
    expect(picture.headers['content-type']).toBe('image/jpeg');
    const second = (await straighten(fourMarks.map((m) => ({ ...m, mm: { x: m.mm.x + 100, y: m.mm.y } })))).body;
    expect(second.elevation.url).not.toBe(first.elevation.url);
    expect((await owner.get(`/api/walls/${wall.id}`)).body.photo).toEqual(second);
  });
});

const fourMarks = [
  { px: { x: 100, y: 500 }, mm: { x: 300, y: 300 } },
  { px: { x: 700, y: 520 }, mm: { x: 3300, y: 300 } },
  { px: { x: 690, y: 90 }, mm: { x: 3300, y: 2300 } },
  { px: { x: 110, y: 100 }, mm: { x: 300, y: 2300 } },
];
