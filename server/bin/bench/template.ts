import { execFile } from 'node:child_process';
import { mkdtempSync, rmSync, statSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { promisify } from 'node:util';
import type { Page } from '../../../shared/templates/drawing.ts';
import { planSheets, type Ink } from '../../../shared/templates/sheets.ts';
import { TemplateInput } from '../../../shared/templates/template-input.ts';
import { makeTemplate } from '../../../shared/templates/template.ts';
import { drawPdf } from '../../templates/template-pdf.ts';

const run_ = promisify(execFile);
const wish = { paper: 'letter', units: 'in', marginMm: 12.7, overlapMm: 12, join: 'overlap', correction: { x: 1, y: 1 }, rollWidthMm: null, longPages: 'split', orientation: 'fewest', origin: null } as const;

/** The same layouts at every run (mulberry32). */
function chance(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

/** Hexagons strewn over a wall, each with two screws. */
function layout(count: number, widthMm: number, heightMm: number, seed: number): TemplateInput {
  const random = chance(seed);
  const frames = Array.from({ length: count }, (_, i) => {
    const side = 90 + random() * 90;
    const centre = { x: 250 + random() * (widthMm - 500), y: 350 + random() * (heightMm - 700) };
    return {
      id: String(i), label: String(i + 1),
      outlineMm: Array.from({ length: 6 }, (_, k) => ({ x: centre.x + side * Math.cos((k * Math.PI) / 3), y: centre.y + side * Math.sin((k * Math.PI) / 3) })),
      hangers: [-0.3, 0.3].map((s, k) => ({ id: `${i}${k}`, label: `${i + 1}${'ab'[k]}`, x: centre.x + s * side, y: centre.y + 0.8 * side, drillMm: 2.8, hardware: 'Plate 40; Wood screw #10 × 2 1/2 in' })),
    };
  });
  return TemplateInput.parse({
    title: { shop: 'Bench', job: 'Bench', wall: 'Long wall', layout: 'Strewn', letter: 'A', state: 'signed', sha256: '0'.repeat(64) },
    wall: { widthMm, heightMm, studs: Array.from({ length: Math.floor(widthMm / 406.4) }, (_, i) => ({ xMm: 200 + i * 406.4, widthMm: 38.1, confirmed: i % 3 > 0 })) },
    frames, units: 'in', paper: 'letter', drawnAt: 'at the bench',
  });
}

const median = (list: number[]) => [...list].sort((a, b) => a - b)[Math.floor(list.length / 2)]!;

/** The fewest sheets, upright or lying, of a grid pinned to the corner of what is drawn. */
function pinned(ink: Ink, wall: { widthMm: number; heightMm: number }): number {
  const corner = [...ink.outlines.flat(), ...ink.screws].reduce((low, p) => ({ x: Math.min(low.x, p.x), y: Math.min(low.y, p.y) }), { x: Infinity, y: Infinity });
  return planSheets(ink, wall, { ...wish, origin: { x: corner.x - 6, y: corner.y - 6 } }).sheets.length;
}

function saved(): string[] {
  let ours = 0;
  let theirs = 0;
  let never = 0;
  for (let seed = 1; seed <= 100; seed += 1) {
    const input = layout(4 + (seed % 12), 4000, 2600, seed);
    const ink = { outlines: input.frames.map((f) => f.outlineMm), screws: input.frames.flatMap((f) => f.hangers) };
    const best = planSheets(ink, input.wall, wish).sheets.length;
    const corner = pinned(ink, input.wall);
    ours += best;
    theirs += corner;
    if (best > corner) never += 1;
  }
  return [`100 random layouts on Letter: ${ours} sheets against ${theirs} of a grid pinned to the corner (${(100 * (1 - ours / theirs)).toFixed(1)} % saved; worse in ${never})`];
}

/** The same primitives drawn by cairo: time of the drawing alone, best of three, and bytes. */
async function native(pages: Page[], folder: string): Promise<{ ms: number; bytes: number } | null> {
  const given = path.join(folder, 'pages.json');
  const file = path.join(folder, 'native.pdf');
  writeFileSync(given, JSON.stringify(pages));
  try {
    const { stdout } = await run_('/usr/bin/python3', [path.join(import.meta.dirname, 'template', 'cairo-pen.py'), given, file], { maxBuffer: 1e6 });
    return { ms: Number(stdout), bytes: statSync(file).size };
  } catch {
    return null;
  }
}

/** The most memory a thread of its own grows this process by while it draws, MB. */
async function memory(input: TemplateInput): Promise<{ mb: number; pages: number }> {
  const task = path.join(import.meta.dirname, '..', '..', 'workers', 'tasks', 'template.ts');
  const out = path.join(mkdtempSync(path.join(os.tmpdir(), 'cw-bench-')), 'large.pdf');
  const script = `import { pathToFileURL } from 'node:url'; const { default: draw } = await import(pathToFileURL(${JSON.stringify(task)}).href); const { input, place } = JSON.parse((await import('node:fs')).readFileSync(0, 'utf8')); await draw({ input, output: 'pdf', place }); console.log(process.resourceUsage().maxRSS / 1024);`;
  const child = execFile(process.execPath, ['--import', 'tsx', '--input-type=module', '-e', script]);
  let said = '';
  child.stdout!.on('data', (part: string) => (said += part));
  child.stdin!.end(JSON.stringify({ input, place: out }));
  await new Promise((done) => child.on('exit', done));
  const { stdout } = await run_('pdfinfo', [out]);
  rmSync(path.dirname(out), { recursive: true });
  return { mb: Number(said), pages: Number(/Pages: +(\d+)/.exec(stdout)?.[1] ?? 0) };
}

export async function run(): Promise<string[]> {
  const folder = mkdtempSync(path.join(os.tmpdir(), 'cw-bench-'));
  try {
    const input = layout(60, 6000, 3000, 7);
    const planned = performance.now();
    const { pages } = makeTemplate(input);
    const planMs = performance.now() - planned;
    const times: number[] = [];
    let bytes = 0;
    for (let i = 0; i < 5; i += 1) {
      const started = performance.now();
      bytes = (await drawPdf(pages, { title: 'Bench', subject: '', author: '' })).length;
      times.push(performance.now() - started);
    }
    const cairo = await native(pages, folder);
    const large = await memory(layout(300, 10_000, 3000, 11));
    return [
      `60 frames on 6 × 3 m, Letter: ${pages.length} pages; laying out and making primitives ${planMs.toFixed(0)} ms, drawing ${median(times).toFixed(0)} ms (best ${Math.min(...times).toFixed(0)}), ${(bytes / 1024).toFixed(0)} kB`,
      cairo
        ? `native cairo, the same primitives: ${cairo.ms.toFixed(0)} ms, ${(cairo.bytes / 1024).toFixed(0)} kB; ours takes ${(Math.min(...times) / cairo.ms).toFixed(2)} times as long (goal 2) and ${(bytes / cairo.bytes).toFixed(2)} times the bytes (goal 1.2)`
        : 'native cairo is not here (python3-cairo): not compared',
      `300 frames on 10 × 3 m: ${large.pages} pages in a process of ${large.mb.toFixed(0)} MB at most (goal 256)`,
      ...saved(),
    ];
  } finally {
    rmSync(folder, { recursive: true });
  }
}
