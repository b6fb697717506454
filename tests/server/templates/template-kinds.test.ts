import { execFileSync, spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { templateBytes } from '../../../server/workers/tasks/template.ts';
import type { TemplateInput } from '../../../shared/templates/template-input.ts';
import { aHexagon, aTemplate } from '../../shared/templates/a-template.ts';
import { pdfFacts, readSheets } from '../../support/printed-template.ts';

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(path.join(tmpdir(), 'template-'));
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const small: TemplateInput = { ...aTemplate({ paper: 'a4' }), frames: [aHexagon('1', 611.3, 1002.7, 90), aHexagon('2', 790.9, 1127.4, 90)] };

async function print(name: string, change: Partial<TemplateInput>): Promise<string> {
  const file = path.join(folder, `${name.replace(/\W/g, '-')}.pdf`);
  writeFileSync(file, await templateBytes({ ...small, ...change }, 'pdf'));
  return file;
}

/** What MuPDF, an engine other than poppler, says while it draws every page; nothing where it is content. */
function warnings(file: string): string {
  const { stdout, stderr, status, error } = spawnSync('mutool', ['draw', '-q', '-r', '20', '-o', path.join(folder, 'out.png'), file], { encoding: 'utf8' });
  if (error || status !== 0) throw new Error(`mutool could not draw the file: ${error?.message ?? stderr}`);
  return `${stdout}${stderr}`.split('\n').filter((row) => row !== '' && !/ICC support is not available/.test(row)).join('\n');
}

describe('each kind of template', { timeout: 120_000 }, () => {
  it.each<[string, Partial<TemplateInput>]>([
    ['full on A3, butt joins, black', { paper: 'a3', join: 'butt', colours: 'black' }],
    ['screws only on Tabloid', { kind: 'screws', paper: 'tabloid' }],
    ['one frame at a time on Legal', { kind: 'frames', paper: 'legal' }],
    ['a story stick on A4', { kind: 'story stick' }],
    ['a roll of 24 in', { paper: 'roll-24in' }],
    ['a long roll with UserUnit', { paper: 'roll-914', longPages: 'user unit', orientation: 'landscape', wall: { ...small.wall, widthMm: 9000 }, frames: [aHexagon('1', 700, 1000, 90), aHexagon('2', 8200, 1000, 90)] }],
    ['findings and a first frame', { findings: [{ weight: 'stop', words: 'Screw 1a carries more than it holds.' }], firstFrameId: '2' }],
  ])('%s: is read without a word of complaint', async (name, change) => {
    const file = await print(name, change);
    execFileSync('qpdf', ['--check', file]);
    expect(warnings(file)).toBe('');
    // No page is past 14,400 units (ISO 32000-1, annex C).
    for (const [width, height] of pdfFacts(file).sizesPt) expect(Math.max(width, height)).toBeLessThanOrEqual(14_400);
  });

  it('butts true: screws stand where they belong from the cut edges', async () => {
    const input = { ...small, join: 'butt' as const };
    const found = (await readSheets(await print('butt', { join: 'butt' }))).flatMap((s) => s.screws);
    for (const screw of input.frames.flatMap((f) => f.hangers)) expect(Math.min(...found.map((f) => Math.hypot(f.x - screw.x, f.y - screw.y)))).toBeLessThan(0.2);
  });

  it('says the height of every screw on the story stick', async () => {
    const words = execFileSync('pdftotext', ['-layout', await print('stick', { kind: 'story stick' }), '-'], { encoding: 'utf8' });
    // Under the top side by a fifth of the side: 1002.7 + 0.8 × 90 and 1127.4 + 0.8 × 90.
    expect(words).toMatch(/1074\.7 mm · 1a, 1b · drill 2\.4 mm/);
    expect(words).toMatch(/1199\.4 mm · 2a, 2b/);
    expect(words).toContain('LEVEL DATUM');
  });

  it('gives cutters the same places in DXF and SVG, in the wall’s own millimetres', async () => {
    const dxf = (await templateBytes(small, 'dxf')) as string;
    const rows = dxf.split(/\r?\n/).map((r) => r.trim());
    const circles = rows.flatMap((row, i) => {
      if (row !== 'CIRCLE') return [];
      const value = (code: string) => Number(rows[rows.indexOf(code, i + 1) + 1]);
      return [{ x: value('10'), y: value('20') }];
    });
    const svg = (await templateBytes(small, 'svg')) as string;
    // The frame round the drawing names its own corner.
    const [, left, foot] = /lower left corner is (-?\d+) mm from the wall’s left edge and (-?\d+) mm/.exec(svg)!;
    const high = Number(/viewBox="0 0 [\d.]+ ([\d.]+)"/.exec(svg)![1]);
    const drawn = [...svg.matchAll(/<circle cx="([\d.]+)" cy="([\d.]+)"/g)].map((m) => ({ x: Number(m[1]) + Number(left), y: high - Number(m[2]) + Number(foot) }));
    for (const screw of small.frames.flatMap((f) => f.hangers)) {
      for (const list of [circles, drawn]) expect(Math.min(...list.map((c) => Math.hypot(c.x - screw.x, c.y - screw.y)))).toBeLessThan(0.01);
    }
    expect(rows).toContain('SCREWS');
  });
});
