import { fork, type ChildProcess } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { readFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import os from 'node:os';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import sharp from 'sharp';
import type { Mark } from '../../../../shared/walls/marks.ts';
import type { Photo } from '../../../../shared/walls/photo.ts';
import { prepareTools } from '../../prepare/system-tools.ts';
import { startThrowawayDatabase } from '../../prepare/throwaway-database.ts';
import { databaseTools } from '../../prepare/tool-list.ts';
import { measuredScenes, seeded, seen } from '../scenes/measured-scenes.ts';
import { byImageMagick, imageMagick } from './by-image-magick.ts';
import type { Strain } from './served-app.ts';

const photo = { widthPx: 6000, heightPx: 4000 };
const rounds = 3;

/** A photo of 24 megapixels from upload to elevation, through the whole server, beside ImageMagick on the same file in the same run. */
export async function howFast(): Promise<string[]> {
  const folder = mkdtempSync(path.join(os.tmpdir(), 'cw-bench-'));
  const database = process.env.TEST_DATABASE_URL ? null : await startThrowawayDatabase(await prepareTools([databaseTools]));
  const loader = pathToFileURL(createRequire(import.meta.url).resolve('tsx')).href;
  const child = fork(path.join(import.meta.dirname, 'served-app.ts'), { execArgv: ['--import', loader], env: { ...process.env, DATABASE_SERVER: process.env.TEST_DATABASE_URL ?? database?.serverUrl } });
  try {
    const { port } = await heard<{ port: number }>(child);
    const file = path.join(folder, 'photo.jpg');
    await writeBigPhoto(file);
    const s = measuredScenes[0]!;
    const camera = { ...s.camera, photo, focalPx: (s.camera.focalPx * photo.widthPx) / s.camera.photo.widthPx };
    const marks = s.fourMm.map((mm) => ({ mm, px: seen(camera, mm) }));
    const visit = await aVisitor(`http://127.0.0.1:${port}`, s.wall);
    await visit(file, marks);

    // The same clock while nothing is asked of the server: what the machine itself holds up.
    child.send('begin');
    await heard(child);
    await new Promise((r) => setTimeout(r, 3000));
    child.send('end');
    const atRest = (await heard<{ strain: Strain }>(child)).strain;

    const program = imageMagick();
    const times: number[] = [];
    const theirs: { seconds: number; peakMb: number }[] = [];
    const slow: { seconds: number; peakMb: number }[] = [];
    const strains: Strain[] = [];
    let elevation: NonNullable<Photo['elevation']> | null = null;
    let parts = '';
    for (let round = 0; round < rounds; round++) {
      child.send('begin');
      await heard(child);
      const done = await visit(file, marks);
      child.send('end');
      strains.push((await heard<{ strain: Strain }>(child)).strain);
      times.push(done.uploadSeconds + done.straightenSeconds);
      parts = `upload and preview ${done.uploadSeconds.toFixed(2)} s, straightening ${done.straightenSeconds.toFixed(2)} s`;
      elevation = done.photo.elevation;
      if (program && elevation) {
        theirs.push(await byImageMagick(program, file, folder, marks, elevation, false));
        if (round === 0) slow.push(await byImageMagick(program, file, folder, marks, elevation, true));
      }
    }
    const ours = middle(times);
    const size = elevation ? `${Math.round(elevation.widthMm * elevation.pxPerMm)} × ${Math.round(elevation.heightMm * elevation.pxPerMm)}` : 'none';
    const lines = [`24 megapixels (${photo.widthPx} × ${photo.heightPx} JPEG), upload over HTTP to elevation of ${size} px, middle of ${rounds}: ${ours.toFixed(2)} s (last: ${parts})`];
    if (program) {
      const them = middle(theirs.map((t) => t.seconds));
      lines.push(`ImageMagick, the same preview and warp on a local file, bilinear: ${them.toFixed(2)} s; ours takes ${(ours / them).toFixed(2)} of that (goal: at most 1.5); by its usual elliptical average ${slow[0]!.seconds.toFixed(2)} s; its peak memory ${Math.max(...theirs.map((t) => t.peakMb)).toFixed(0)} MB`);
    } else lines.push('ImageMagick is not here, so there is no ratio: apt-get install imagemagick');
    const peak = strains.reduce((a, b) => (b.peakMb > a.peakMb ? b : a));
    const held = Math.max(...strains.map((x) => x.longestMs));
    lines.push(`memory of the server: ${peak.restMb.toFixed(0)} MB before, ${peak.peakMb.toFixed(0)} MB at most`);
    lines.push(`event loop held up at most ${held.toFixed(0)} ms (goal: 50), 99 in 100 below ${Math.max(...strains.map((x) => x.most99Ms)).toFixed(0)} ms; at rest, on the machine as busy as it is, ${atRest.longestMs.toFixed(0)} and ${atRest.most99Ms.toFixed(0)} ms`);
    const own = strains.flatMap((x) => x.ownMs ?? []);
    if (own.length > 0) lines.push(`of that by the loop's own work at most ${Math.max(...own).toFixed(0)} ms at a time; the rest was waiting for a processor`);
    return lines;
  } finally {
    const ended = new Promise((r) => child.once('exit', r));
    if (child.connected) child.send('stop');
    await ended;
    await database?.stop();
    rmSync(folder, { recursive: true, force: true });
  }
}

/** Registers, adds a job, and gives what sends a photo to a new wall and straightens it. */
async function aVisitor(base: string, wall: { widthMm: number; heightMm: number }) {
  let cookie = '';
  const call = async (method: string, at: string, body?: object | FormData): Promise<unknown> => {
    const form = body instanceof FormData;
    const reply = await fetch(base + at, {
      method, headers: { Origin: 'http://127.0.0.1', 'Sec-Fetch-Site': 'same-origin', cookie, ...(form ? {} : { 'content-type': 'application/json' }) },
      body: form ? body : JSON.stringify(body ?? {}),
    });
    if (!reply.ok) throw new Error(`${method} ${at}: ${reply.status} ${await reply.text()}`);
    const set = reply.headers.getSetCookie();
    if (set.length > 0) cookie = set.map((c) => c.split(';')[0]).join('; ');
    return reply.json();
  };
  await call('POST', '/api/people/register', { shopName: 'Bench', name: 'Bench', email: 'bench@example.com', password: 'a good long password', units: 'mm' });
  const job = (await call('POST', '/api/jobs', { title: 'Bench', clientName: 'Bench', clientEmail: 'client@example.com', site: '' })) as { id: string };

  return async (file: string, marks: readonly Mark[]) => {
    const made = (await call('POST', `/api/jobs/${job.id}/walls`, { name: 'Bench', ...wall, construction: 'masonry', coveringMm: 0 })) as { id: string };
    const form = new FormData();
    form.set('file', new Blob([await readFile(file)]), 'photo.jpg');
    const began = performance.now();
    const sent = (await call('POST', `/api/walls/${made.id}/photos`, form)) as Photo;
    const between = performance.now();
    const done = (await call('POST', `/api/walls/${made.id}/photos/${sent.id}/straighten`, { marks })) as Photo;
    return { photo: done, uploadSeconds: (between - began) / 1000, straightenSeconds: (performance.now() - between) / 1000 };
  };
}

/** A picture as a camera's is: broad shapes, fine detail and noise. */
async function writeBigPhoto(file: string): Promise<void> {
  const { widthPx: width, heightPx: height } = photo;
  const data = new Uint8Array(width * height * 3);
  const chance = seeded(1);
  const grain = Uint8Array.from({ length: 65_536 }, () => chance() * 16);
  for (let j = 0, o = 0; j < height; j++) {
    for (let i = 0; i < width; i++, o += 3) {
      const v = 150 + 40 * Math.sin(i / 240) * Math.cos(j / 310) + ((i >> 5) + (j >> 5)) % 2 * 20 + grain[(i * 31 + j * 7919) & 65_535]!;
      data[o] = v;
      data[o + 1] = v - 8;
      data[o + 2] = v - 20;
    }
  }
  await sharp(data, { raw: { width, height, channels: 3 } }).jpeg({ quality: 90 }).toFile(file);
}

function heard<T>(child: ChildProcess): Promise<T> {
  return new Promise((resolve, reject) => {
    const gone = (code: number | null) => reject(new Error(`The server ended with ${code}.`));
    child.once('exit', gone);
    child.once('message', (m) => {
      child.off('exit', gone);
      resolve(m as T);
    });
  });
}

const middle = (list: readonly number[]) => [...list].sort((a, b) => a - b)[Math.floor(list.length / 2)] ?? NaN;
