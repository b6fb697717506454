import { randomUUID } from 'node:crypto';
import type { Frame } from '../../shared/layouts/layout.ts';
import type { PatternDesign } from '../../shared/patterns/pattern.ts';
import type { Stud, WallShape } from '../../shared/walls/wall.ts';
import type { Browser } from './test-app.ts';

/** A hexagon of 7 in sides in walnut, with two hangers on its upper member. */
export function aDesign(change: Partial<PatternDesign> = {}): PatternDesign {
  return {
    shape: { kind: 'regular', sides: 6, sideMm: 177.8 },
    thicknessMm: 19.05, depthMm: 127, species: 'walnut', moisturePercent: 8, groove: null,
    hangers: [-50, 50].map((alongMm, i) => ({ id: `h${i + 1}`, member: 3, alongMm, insetMm: 30, allowanceMm: [-20, 20], bracketId: null, wallScrewId: null, anchorId: null })),
    contentsKg: null,
    ...change,
  };
}

export function aWallShape(change: Partial<WallShape> = {}): WallShape {
  return { name: 'Long wall', widthMm: 3600, heightMm: 2600, construction: 'wood studs', coveringMm: 12.7, studSpecies: 'spruce-pine-fir', ...change };
}

export function aStud(xMm: number, change: Partial<Stud> = {}): Stud {
  return { id: randomUUID(), xMm, widthMm: 38.1, foundBy: 'probe', uncertaintyMm: 1.5875, ...change };
}

export function aFrame(patternId: string, change: Partial<Frame> = {}): Frame {
  return {
    id: randomUUID(), patternId, xMm: 1800, yMm: 1450, turnRad: 0, flipped: false, locked: false, label: '1', contentsKg: null, hungGroup: null, ...change,
  };
}

export const aJobSheet = (change: object = {}) => ({ title: 'Stair hall', clientName: 'Tova Lind', clientEmail: 'tova@client.example', site: '4 Quay Row', ...change });

/** A job with a drawn wall, a pattern and a layout of `frames` frames in a row, through the API. */
export async function aLaidOutJob(browser: Browser, frames = 2) {
  const job = (await browser.post('/api/jobs').send(aJobSheet()).expect(201)).body as { id: string; version: number };
  const wall = (await browser.post(`/api/jobs/${job.id}/walls`).send(aWallShape()).expect(201)).body as { id: string; version: number };
  const pattern = (await browser.post('/api/patterns').send({ name: 'Seven inch comb', design: aDesign() }).expect(201)).body as { id: string };
  let layout = (await browser.post(`/api/walls/${wall.id}/layouts`).send({ name: 'First', revealMm: 6 }).expect(201)).body as { id: string; version: number };
  const placed = Array.from({ length: frames }, (_, i) => aFrame(pattern.id, { xMm: 800 + i * 500, label: String(i + 1) }));
  if (frames > 0) {
    layout = (await browser.post(`/api/layouts/${layout.id}/edits`).send({
      version: layout.version, edits: placed.map((after) => ({ kind: 'frame', frameId: after.id, before: null, after })),
    }).expect(200)).body as { id: string; version: number };
  }
  return { job, wall, pattern, layout, frames: placed };
}
