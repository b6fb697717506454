import { copyFileSync, mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { placeFrame } from '../../../shared/findings/placed-frame.ts';
import { usualLimits } from '../../../shared/findings/scene.ts';
import { seekEdits, seekOnWall } from '../../../shared/findings/seek-on-wall.ts';
import type { Frame, Layout } from '../../../shared/layouts/layout.ts';
import type { Rooms } from '../../app.ts';
import type { Who } from '../../http/who.ts';
import type { Database } from '../data-source.ts';
import { demoMembers, demoOwner, demoShop } from './accounts.ts';
import { comb, demoScene, zone } from './demo-jobs.ts';
import { demoAnchor, demoBracket, demoPatterns } from './demo-patterns.ts';

const jobsSeeded = 3;
const inch = 25.4;

/** Seeds the demo where there is no shop yet, or only a demo whose seeding broke off. */
export async function seedDemo(data: Database, rooms: Rooms): Promise<void> {
  const count = async (query: string, values: unknown[] = []) => Number(((await data.query(query, values)) as { n: string }[])[0]?.n ?? 0);
  const shops = await count('SELECT COUNT(*) AS n FROM shops');
  const demo = await count('SELECT COUNT(*) AS n FROM users WHERE email = ?', [demoOwner.email]);
  const brokeOff = shops === 1 && demo === 1 && (await count('SELECT COUNT(*) AS n FROM jobs')) < jobsSeeded;
  if (shops > 0 && !brokeOff) return;
  if (brokeOff) {
    await data.query('DELETE FROM revisions');
    await data.query('DELETE FROM frames');
    await data.query('DELETE FROM shops');
  }
  await seed(data, rooms);
}

/** The invented shop, by way of the services that a person's clicks would call. */
async function seed(data: Database, rooms: Rooms): Promise<void> {
  const owner = await rooms.people.register({ ...demoShop, ...demoOwner }, 'demo');
  const who = (await rooms.people.whoIs(owner))!;
  const members = await Promise.all(demoMembers.map((account) => rooms.people.addMember(who, account)));
  const hanger = members.find((m) => m.role === 'hanger')!;

  const screws = (await rooms.hardware.bookOf(who.shopId)).screws;
  await rooms.hardware.add(who, demoBracket(screws.find((s) => s.name.includes('#8 × 1 1/4'))!.id));
  const book = await rooms.hardware.add(who, demoAnchor);
  const patterns = new Map<string, string>();
  for (const pattern of demoPatterns(book)) patterns.set(pattern.name, (await rooms.patterns.create(who, pattern)).id);
  const plain = patterns.get('Comb 10 1/2')!;
  const mirror = patterns.get('Comb 10 1/2 with mirror')!;

  // Signed and on the bench: a comb of nine over the sideboard.
  const reading = await measuredJob(rooms, who, 'reading-room', {
    title: 'Reading room, Sallow Street', clientName: 'Tamsin Okoro', clientEmail: 'tamsin@okoro.example', site: '18 Sallow Street, Port Selwick',
  }, 0, []);
  const readingLayout = await onStuds(rooms, who, await laidOut(rooms, who, reading.wallId, 'Over the sideboard', 0.25 * inch, comb({ xMm: 2620, yMm: 1580, sideMm: 10.5 * inch, revealMm: 0.25 * inch }, [
    [-2, 0, plain], [-1, 0, mirror], [0, 0, plain], [1, 0, plain], [2, 0, mirror], [-1, -1, plain], [0, 1, mirror], [1, -1, plain], [-2, 1, plain],
  ])));
  const sent = await rooms.signoffs.send(who, readingLayout.id, { version: readingLayout.version, note: 'The mirrors catch the window in the morning.' });
  const revision = sent.revisions[0]!;
  await rooms.signoffs.sign(await mailedToken(data, 'tamsin@okoro.example'), revision.id, { name: 'Tamsin Okoro', sha256: revision.sha256, agreed: true });
  const job = await rooms.jobs.read(who, reading.jobId);
  await rooms.jobs.change(who, job.id, { version: job.version, assignedTo: [hanger.id] });

  // With the client: a row above the counter.
  const cafe = await measuredJob(rooms, who, 'cafe-counter', {
    title: 'Café counter, Tidewater Arcade', clientName: 'Bela Marsh', clientEmail: 'bela@tidewater.example', site: 'Unit 6, Tidewater Arcade, Port Selwick',
  }, 1, [zone('seat', 300, 3600)]);
  const cafeLayout = await onStuds(rooms, who, await laidOut(rooms, who, cafe.wallId, 'Row above the tiles', 0.25 * inch, comb({ xMm: 2200, yMm: 1680, sideMm: 10.5 * inch, revealMm: 0.25 * inch }, [
    [-4, 0, plain], [-3, 0, plain], [-2, 0, plain], [-1, 0, plain], [0, 0, plain], [1, 0, plain], [2, 0, plain], [3, 0, plain],
  ])));
  await rooms.signoffs.send(who, cafeLayout.id, { version: cafeLayout.version, note: 'Eight boxes for the cups. Please look whether the row is high enough over the machine.' });

  // Still being measured and drawn.
  const hall = await measuredJob(rooms, who, 'stairwell-hall', {
    title: 'Stair hall, Hollin House', clientName: 'Ines Caddow', clientEmail: 'ines@hollin.example', site: 'Hollin House, Upper Reach, Port Selwick',
  }, 3, [zone('passage', 1080, 1560)]);
  await laidOut(rooms, who, hall.wallId, 'Climbing', 0.25 * inch, comb({ xMm: 2150, yMm: 1450, sideMm: 10.5 * inch, revealMm: 0.25 * inch }, [
    [-1, -1, plain], [0, 0, mirror], [1, 0, plain], [2, 1, plain],
  ]));
}

async function measuredJob(rooms: Rooms, who: Who, sceneName: string, sheet: { title: string; clientName: string; clientEmail: string; site: string }, unsure: number, zones: ReturnType<typeof zone>[]) {
  const scene = demoScene(sceneName);
  const job = await rooms.jobs.create(who, sheet);
  const wall = await rooms.walls.create(who, job.id, { name: 'Long wall', widthMm: scene.widthMm, heightMm: scene.heightMm, construction: 'wood studs', coveringMm: 0.5 * inch, studSpecies: 'spruce-pine-fir' });
  await rooms.walls.change(who, wall.id, { version: wall.version, studs: scene.studs(unsure), obstructions: scene.obstructions, zones });
  // The upload takes the file it is given, so it gets a copy.
  const folder = mkdtempSync(path.join(os.tmpdir(), 'combwright-demo-'));
  try {
    const copy = path.join(folder, 'photo.jpg');
    copyFileSync(scene.photo, copy);
    const photo = await rooms.walls.upload(who, wall.id, copy);
    await rooms.walls.straighten(who, wall.id, photo.id, { marks: scene.marks }, new AbortController().signal);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
  return { jobId: job.id, wallId: wall.id };
}

async function laidOut(rooms: Rooms, who: Who, wallId: string, name: string, revealMm: number, frames: Frame[]) {
  const layout = await rooms.layouts.create(who, wallId, { name, revealMm });
  return rooms.layouts.edit(who, layout.id, { version: layout.version, edits: frames.map((after) => ({ kind: 'frame' as const, frameId: after.id, before: null, after })) });
}

/** Moves the layout, and each hanger within its allowance, to where the most of them meet studs. */
async function onStuds(rooms: Rooms, who: Who, layout: Layout): Promise<Layout> {
  const [wall, book, patterns] = await Promise.all([rooms.walls.read(who, layout.wallId), rooms.hardware.book(who), rooms.patterns.list(who)]);
  const placed = layout.frames.map((frame) => placeFrame(frame, patterns.find((p) => p.id === frame.patternId)!));
  const best = seekOnWall(placed, { wall, book, limits: usualLimits })?.best[0];
  const edits = best ? seekEdits(placed, best) : [];
  return edits.length > 0 ? rooms.layouts.edit(who, layout.id, { version: layout.version, edits }) : layout;
}

/** The token of the newest link mailed to an address, read where it alone stands: in the mail. */
async function mailedToken(data: Database, address: string): Promise<string> {
  const mails = (await data.query('SELECT text FROM outbox WHERE recipient = ? ORDER BY createdAt DESC LIMIT 1', [address])) as { text: string }[];
  return /\/p\/([A-Za-z0-9_-]+)/.exec(mails[0]?.text ?? '')?.[1] ?? '';
}
