import { spawn, type ChildProcess } from 'node:child_process';
import { randomUUID } from 'node:crypto';
import path from 'node:path';
import { chromium, type Browser, type Page } from '@playwright/test';
import type KonvaLibrary from 'konva';
import { demoOwner } from '../../database/seed/accounts.ts';
import { build, isBuilt } from '../prepare/build.ts';
import { freePort } from '../prepare/ports.ts';
import { prepareTools } from '../prepare/system-tools.ts';
import { startThrowawayDatabase } from '../prepare/throwaway-database.ts';
import { browserTools, databaseTools } from '../prepare/tool-list.ts';

const clone = path.resolve(import.meta.dirname, '../../..');
const count = 500;
const columns = 40;
const side = 48;
const reveal = 4;
const moves = 200;

/** What one drag cost, ms for each pointer move: from the move to the drawn frame, and work on the main thread. */
interface Drag {
  drawn: number[];
  work: number[];
}

/**
 * Drags one of 500 frames over a 12 megapixel photo in Chromium, and in the same run one of 500 equal polygons on a
 * bare Konva stage of the same size.
 */
export async function run(): Promise<string[]> {
  const tools = await prepareTools([databaseTools, browserTools]);
  const database = process.env.TEST_DATABASE_URL ? null : await startThrowawayDatabase(tools);
  let app: ChildProcess | null = null;
  let browser: Browser | null = null;
  try {
    if (!isBuilt(clone) && !build(clone)) throw new Error('The page does not build.');
    const port = await freePort();
    const origin = `http://127.0.0.1:${port}`;
    app = spawn(process.execPath, ['--import', 'tsx', 'e2e/support/serve.ts'], {
      cwd: clone, stdio: ['ignore', 'ignore', 'inherit'],
      env: { ...process.env, TEST_DATABASE_URL: process.env.TEST_DATABASE_URL ?? database!.serverUrl, E2E_PORT: String(port) },
    });
    await untilUp(`${origin}/api/health`);
    browser = await chromium.launch({ executablePath: process.env.COMBWRIGHT_CHROMIUM ?? tools.path('chromium'), args: ['--no-sandbox', '--disable-gpu', '--disable-background-networking'] });
    return await measure(browser, origin);
  } finally {
    await browser?.close();
    if (app) {
      const ended = new Promise((resolve) => app!.once('exit', resolve));
      app.kill('SIGTERM');
      await ended;
    }
    await database?.stop();
  }
}

async function measure(browser: Browser, origin: string): Promise<string[]> {
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 } });
  // What runs in the page was compiled here, with names kept by a function that the page lacks.
  await context.addInitScript({ content: 'globalThis.__name = (made) => made;' });
  const page = await context.newPage();
  const address = await layoutOf500(page, origin);
  const openedAt = performance.now();
  await page.goto(`${origin}${address}`);
  await page.getByRole('heading', { name: `Frames (${count})` }).waitFor();
  const opened = performance.now() - openedAt;
  const findings = page.getByRole('region', { name: 'Findings' }).getByText(/caution|stop/).first();
  await findings.waitFor();
  await page.waitForTimeout(1500);

  const box = (await page.locator('[data-wall-stage]').boundingBox())!;
  const bare = await context.newPage();
  await bare.goto('about:blank');
  await bare.addScriptTag({ path: path.join(clone, 'node_modules/konva/konva.min.js') });
  await bare.evaluate(bareStage, { width: box.width, height: box.height, count, columns });

  // In turns, so that what else the machine does meets both alike.
  const own: Drag = { drawn: [], work: [] };
  const plain: Drag = { drawn: [], work: [] };
  for (let round = 0; round < 3; round++) {
    await page.bringToFront();
    append(own, await drag(page, { x: box.x + box.width / 2, y: box.y + box.height / 2 }));
    await bare.bringToFront();
    append(plain, await drag(bare, await bare.evaluate(() => (globalThis as unknown as { held: { x: number; y: number } }).held)));
  }
  const ratio = p95(own.drawn) / p95(plain.drawn);
  return [
    `${count} frames over a 12 megapixel photo open in ${(opened / 1000).toFixed(1)} s, to the full list of frames`,
    `pointer move to drawn frame, p95 of ${own.drawn.length} moves: ${p95(own.drawn).toFixed(1)} ms; bare Konva stage ${p95(plain.drawn).toFixed(1)} ms: ratio ${ratio.toFixed(2)} (goal: at most 1.25)`,
    `main-thread work for each move, p95: ${p95(own.work).toFixed(1)} ms (goal: at most 8 ms); bare ${p95(plain.work).toFixed(1)} ms; medians ${p50(own.work).toFixed(1)} and ${p50(plain.work).toFixed(1)} ms`,
  ];
}

const p95 = (list: number[]) => [...list].sort((a, b) => a - b)[Math.floor(list.length * 0.95)] ?? 0;
const p50 = (list: number[]) => [...list].sort((a, b) => a - b)[Math.floor(list.length / 2)] ?? 0;

function append(to: Drag, more: Drag): void {
  to.drawn.push(...more.drawn);
  to.work.push(...more.work);
}

/** A layout of 500 small combs on the demo's wall with the café's photo; gives the page's address. */
async function layoutOf500(page: Page, origin: string): Promise<string> {
  const headers = { Origin: origin };
  const post = async <T>(url: string, data: object): Promise<T> => {
    const reply = await page.request.post(`${origin}${url}`, { data, headers });
    if (!reply.ok()) throw new Error(`${url}: ${reply.status()} ${await reply.text()}`);
    return (await reply.json()) as T;
  };
  const get = async <T>(url: string) => (await (await page.request.get(`${origin}${url}`)).json()) as T;
  await post('/api/people/sign-in', { email: demoOwner.email, password: demoOwner.password });
  const jobs = await get<{ id: string; title: string }[]>('/api/jobs');
  const job = jobs.find((j) => j.title.startsWith('Café counter'))!;
  const wall = (await get<{ id: string; widthMm: number; heightMm: number }[]>(`/api/jobs/${job.id}/walls`))[0]!;
  const pattern = await post<{ id: string }>('/api/patterns', {
    name: 'Small comb',
    design: {
      shape: { kind: 'regular', sides: 6, sideMm: side }, thicknessMm: 9, depthMm: 90, species: 'walnut', moisturePercent: 8, groove: null, contentsKg: null,
      hangers: [{ id: 'h1', member: 3, alongMm: 0, insetMm: 4, allowanceMm: [-5, 5], bracketId: null, wallScrewId: null, anchorId: null }],
    },
  });
  const layout = await post<{ id: string; version: number }>(`/api/walls/${wall.id}/layouts`, { name: 'Five hundred', revealMm: reveal });
  const [pitchX, pitchY] = [side * 1.5 + reveal * Math.cos(Math.PI / 6), side * Math.sqrt(3) + reveal];
  const left = wall.widthMm / 2 - (columns / 2) * pitchX;
  const low = wall.heightMm / 2 - (count / columns / 2) * pitchY;
  await post(`/api/layouts/${layout.id}/edits`, {
    version: layout.version,
    edits: Array.from({ length: count }, (_, i) => {
      const id = randomUUID();
      const [column, row] = [i % columns, Math.floor(i / columns)];
      return { kind: 'frame', frameId: id, before: null, after: { id, patternId: pattern.id, xMm: left + column * pitchX, yMm: low + row * pitchY + (column % 2) * (pitchY / 2), turnRad: 0, flipped: false, locked: false, label: String(i + 1), contentsKg: null, hungGroup: null } };
    }),
  });
  return `/jobs/${job.id}/layouts/${layout.id}`;
}

/** Runs in the page: 500 equal polygons on one layer, the middle one to be dragged. */
function bareStage({ width, height, count: n, columns: across }: { width: number; height: number; count: number; columns: number }): void {
  const { Konva } = globalThis as unknown as { Konva: typeof KonvaLibrary };
  document.body.style.margin = '0';
  document.body.innerHTML = '<div id="bare"></div>';
  const stage = new Konva.Stage({ container: 'bare' as never, width, height });
  const layer = new Konva.Layer();
  const radius = (0.45 * width) / across;
  for (let i = 0; i < n; i++) {
    const at = { x: (((i % across) + 0.7) * width) / (across + 1), y: (Math.floor(i / across) + 1) * ((height - 40) / (n / across + 1)) };
    layer.add(new Konva.RegularPolygon({ ...at, sides: 6, radius, fill: '#8a6a4a', stroke: '#1e2b2a', strokeWidth: 1, draggable: true }));
    if (i === Math.floor(n / 2) + across / 2) Object.assign(globalThis, { held: at });
  }
  stage.add(layer);
}

/** Presses where a frame is, and moves in circles; measures in the page what each move costs. */
async function drag(page: Page, at: { x: number; y: number }): Promise<Drag> {
  await page.evaluate(watchMoves);
  await page.mouse.move(at.x, at.y);
  await page.mouse.down();
  await page.mouse.move(at.x + 8, at.y + 8, { steps: 2 });
  // The first moves take the frame up; they are a press more than a move.
  await page.evaluate(() => (globalThis as unknown as { costs: Drag }).costs.drawn.splice(0) && (globalThis as unknown as { costs: Drag }).costs.work.splice(0));
  for (let i = 0; i < moves / 3; i++) {
    await page.mouse.move(at.x + 90 * Math.sin(i / 9), at.y + 60 * Math.sin(i / 13));
    await page.waitForTimeout(20);
  }
  const costs = await page.evaluate(() => (globalThis as unknown as { costs: Drag }).costs);
  await page.mouse.move(at.x, at.y);
  await page.keyboard.press('Escape');
  await page.mouse.up();
  await page.waitForTimeout(400);
  return costs;
}

/** Runs in the page: for each pointer move, when its frame is drawn, and how long its listeners and its frame kept the thread. */
function watchMoves(): void {
  const page = globalThis as unknown as { costs?: Drag };
  if (page.costs) {
    page.costs = { drawn: [], work: [] };
    return;
  }
  page.costs = { drawn: [], work: [] };
  let began = 0;
  let heard = 0;
  let moved = 0;
  let waiting = false;
  // Konva listens to both kinds of move; all listeners of one move are counted, from before the first to after the last.
  const first = (event: Event) => {
    if (event.type === 'pointermove') moved = event.timeStamp;
    began = performance.now();
  };
  const last = () => {
    heard += performance.now() - began;
    if (waiting) return;
    waiting = true;
    requestAnimationFrame(() => {
      const from = performance.now();
      // After every other callback of this frame has drawn.
      const channel = new MessageChannel();
      channel.port1.onmessage = () => {
        const now = performance.now();
        page.costs!.drawn.push(now - moved);
        page.costs!.work.push(heard + now - from);
        heard = 0;
        waiting = false;
      };
      channel.port2.postMessage(null);
    });
  };
  for (const kind of ['pointermove', 'mousemove']) {
    window.addEventListener(kind, first, true);
    window.addEventListener(kind, last, false);
  }
}

async function untilUp(url: string): Promise<void> {
  for (let tries = 0; tries < 300; tries++) {
    if (await fetch(url).then((r) => r.ok, () => false)) return;
    await new Promise((resolve) => setTimeout(resolve, 300));
  }
  throw new Error('The app did not come up.');
}
