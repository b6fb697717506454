import { randomUUID } from 'node:crypto';
import { type Browser, expect, type Page } from '@playwright/test';

const headersFor = (baseURL: string) => ({ Origin: baseURL });

async function post<T>(page: Page, baseURL: string, url: string, data: object): Promise<T> {
  const reply = await page.request.post(url, { data, headers: headersFor(baseURL) });
  expect(reply.ok(), `${url}: ${reply.status()} ${await reply.text()}`).toBe(true);
  return (await reply.json()) as T;
}

const design = (shape: object) => ({ shape, thicknessMm: 18, depthMm: 110, species: 'cherry', moisturePercent: 8, groove: null, contentsKg: null, hangers: [] });

/** Three patterns that meet one another edge to edge: hexagon, square and triangle of one side, 200 mm. */
export const patternNames = ['Comb', 'Box', 'Wedge'] as const;

export interface Bench {
  jobId: string;
  layoutId: string;
  address: string;
  email: string;
  patternIds: string[];
}

/** A new shop whose maker is signed in on the page, with a drawn wall of 4 × 2.6 m, three patterns and a layout of `frames` combs in a row. */
export async function aBench(page: Page, baseURL: string, frames = 0): Promise<Bench> {
  const email = `maker.${randomUUID()}@example.com`;
  await post(page, baseURL, '/api/people/register', { shopName: 'Bench & Rule', name: 'Ines Maker', email, password: 'a good long password', units: 'mm' });
  const job = await post<{ id: string }>(page, baseURL, '/api/jobs', { title: 'Stair hall', clientName: 'Tova Lind', clientEmail: 'tova@client.example', site: '4 Quay Row' });
  const wall = await post<{ id: string }>(page, baseURL, `/api/jobs/${job.id}/walls`, { name: 'Long wall', widthMm: 4000, heightMm: 2600, construction: 'wood studs', coveringMm: 12.5, studSpecies: 'spruce-pine-fir' });
  const patternIds: string[] = [];
  for (const [i, sides] of [6, 4, 3].entries()) {
    const made = await post<{ id: string }>(page, baseURL, '/api/patterns', { name: patternNames[i], design: design({ kind: 'regular', sides, sideMm: 200 }) });
    patternIds.push(made.id);
  }
  const layout = await post<{ id: string; version: number }>(page, baseURL, `/api/walls/${wall.id}/layouts`, { name: 'Over the landing', revealMm: 6 });
  if (frames > 0) {
    const edits = Array.from({ length: frames }, (_, i) => {
      const id = randomUUID();
      return { kind: 'frame', frameId: id, before: null, after: { id, patternId: patternIds[0], xMm: 600 + i * 700, yMm: 1400, turnRad: 0, flipped: false, locked: false, label: String(i + 1), contentsKg: null, hungGroup: null } };
    });
    await post(page, baseURL, `/api/layouts/${layout.id}/edits`, { version: layout.version, edits });
  }
  return { jobId: job.id, layoutId: layout.id, address: `/jobs/${job.id}/layouts/${layout.id}`, email, patternIds };
}

/** Another browser of the same maker, on the same page. */
export async function anotherBrowser(browser: Browser, baseURL: string, { email, address }: Bench): Promise<Page> {
  const context = await browser.newContext({ baseURL, viewport: { width: 1280, height: 860 } });
  const page = await context.newPage();
  await post(page, baseURL, '/api/people/sign-in', { email, password: 'a good long password' });
  await page.goto(address);
  await expect(page.locator('[data-wall-stage] canvas').first()).toBeVisible();
  return page;
}

export interface SavedFrame { id: string; label: string; patternId: string; xMm: number; yMm: number; turnRad: number }

/** The layout as the server holds it. */
export async function saved(page: Page, { layoutId }: Bench): Promise<{ version: number; frames: SavedFrame[] }> {
  return (await (await page.request.get(`/api/layouts/${layoutId}`)).json()) as { version: number; frames: SavedFrame[] };
}

/** Waits until the title block says that all is saved. */
export async function untilSaved(page: Page): Promise<void> {
  await expect(page.getByText(/^Saved \d/)).toBeVisible();
}

/** The frame's row in the ledger, pressed: chooses it. */
export async function choose(page: Page, label: string, withShift = false): Promise<void> {
  await page.getByRole('region', { name: 'Frames', exact: true }).getByRole('button', { name: new RegExp(`^${label} `) }).click({ modifiers: withShift ? ['Shift'] : [] });
}

/** Where a place on the wall is on the screen while the whole of it is in view (as it is when the page opens). */
export async function onScreen(page: Page, xMm: number, yMm: number): Promise<{ x: number; y: number }> {
  const box = (await page.locator('[data-wall-stage]').boundingBox())!;
  const [width, height, margin] = [4000, 2600, 28];
  const scale = Math.min((box.width - 2 * margin) / width, (box.height - 2 * margin) / height);
  return { x: box.x + (box.width - width * scale) / 2 + xMm * scale, y: box.y + (box.height + height * scale) / 2 - yMm * scale };
}
