import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { templateBytes } from '../../../server/workers/tasks/template.ts';
import type { TemplateInput } from '../../../shared/templates/template-input.ts';
import { aHexagon, aTemplate } from '../../shared/templates/a-template.ts';
import { PrintedPage } from '../../support/printed-page.ts';
import { pdfFacts, readSheets, type PrintedSheet } from '../../support/printed-template.ts';

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(path.join(tmpdir(), 'template-'));
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

let count = 0;
async function print(input: TemplateInput): Promise<string> {
  const file = path.join(folder, `${(count += 1)}.pdf`);
  writeFileSync(file, await templateBytes(input, 'pdf'));
  return file;
}

/** The first and the last of the frames only: pages take a while to read. */
const fewer = (input: TemplateInput): TemplateInput => ({ ...input, frames: [input.frames[0]!, input.frames.at(-1)!] });

function expectTrue(sheets: PrintedSheet[], input: TemplateInput, correction = { x: 1, y: 1 }): void {
  for (const { page, bars } of sheets) {
    for (const bar of bars) {
      const wanted = bar.statedMm * correction[bar.axis === 'across' ? 'x' : 'y'];
      expect(Math.abs(bar.printedMm - wanted), `bar ${bar.axis} on page ${page}: ${bar.printedMm} for ${wanted}`).toBeLessThan(0.1);
    }
  }
  const found = sheets.flatMap((s) => s.screws);
  const wanted = input.frames.flatMap((f) => f.hangers);
  for (const screw of wanted) {
    const nearest = Math.min(...found.map((f) => Math.hypot(f.x - screw.x, f.y - screw.y)));
    expect(nearest, `screw ${screw.label}`).toBeLessThan(0.2);
  }
  for (const cross of found) {
    const nearest = Math.min(...wanted.map((w) => Math.hypot(cross.x - w.x, cross.y - w.y)));
    expect(nearest, `a cross-hair at ${cross.x}, ${cross.y}`).toBeLessThan(0.2);
  }
}

// Pages are drawn and read at 300 dpi, which takes a busy machine its time.
describe('a printed template', { timeout: 120_000 }, () => {
  // Sizes: ANSI/ASME Y14.1 size A is 8 1/2 by 11 in; ISO 216 A4 is 210 by 297 mm. 72 units of a PDF are one inch (ISO 32000).
  it.each([
    ['letter', [8.5 * 25.4, 11 * 25.4]],
    ['a4', [210, 297]],
  ] as const)('has pages of exactly %s paper, upright or lying, and asks not to be scaled', async (paper, size) => {
    const pdf = await print(aTemplate({ paper }));
    const { sizesPt, text } = pdfFacts(pdf);
    expect(sizesPt.length).toBeGreaterThan(4);
    for (const pt of sizesPt) {
      const mm = pt.map((n) => (n / 72) * 25.4).sort((a, b) => a - b);
      expect(Math.abs(mm[0]! - size[0])).toBeLessThan(0.1);
      expect(Math.abs(mm[1]! - size[1])).toBeLessThan(0.1);
    }
    expect(text).toMatch(/Producer: +Combwright\n/);
    expect(text).toMatch(/Title: +Hanging template: Reading corner/);
    const objects = execFileSync('qpdf', ['--qdf', '--object-streams=disable', pdf, '-'], { encoding: 'latin1' });
    expect(objects).toMatch(/\/PrintScaling \/None/);
    expect(objects).toMatch(/\/Lang \(en\)/);
    execFileSync('qpdf', ['--check', pdf]);
  });

  it('puts every screw within 0.2 mm of its place and prints bars as long as they say, on A4 in millimetres', async () => {
    const input = aTemplate({ paper: 'a4', units: 'mm' });
    expectTrue(await readSheets(await print(input)), input);
  });

  it('does so on Letter in inches too, unsigned mark and all', async () => {
    const input = fewer(aTemplate({ paper: 'letter', units: 'in', state: 'draft' }));
    expectTrue(await readSheets(await print(input)), input);
  });

  it('stretches bars and screws alike by the correction of the printer', async () => {
    const correction = { x: 1.012, y: 0.994 };
    const input = fewer(aTemplate({ paper: 'a4', units: 'mm', correction }));
    expectTrue(await readSheets(await print(input), correction), input, correction);
  });

  it('keeps letters of many scripts readable and never fails on one it cannot draw', async () => {
    const input = aTemplate({ paper: 'a4' });
    input.title.job = 'Łąka — Večer Ångström, Київ 木の棚 🪵 \u0007→ ½';
    const words = execFileSync('pdftotext', ['-l', '1', await print(input), '-'], { encoding: 'utf8' });
    expect(words).toContain('Łąka — Večer Ångström, Київ');
  });

  it('prints a mark across every sheet, and says why, until it is signed', async () => {
    const one = (state: TemplateInput['title']['state']) => print({ ...aTemplate({ state }), frames: [aHexagon('1', 600, 900, 75)] });
    const sent = await PrintedPage.read(await one('with client'), 4);
    expect(sent.words).toContain('not signed (with client)');
    expect(sent.paleRedShare()).toBeGreaterThan(0.02);
    const signed = await PrintedPage.read(await one('signed'), 4);
    expect(signed.words).toContain('Revision B · signed');
    expect(signed.paleRedShare()).toBe(0);
  });

  it('still has a front page when no frame is placed', async () => {
    const pdf = await print({ ...aTemplate({}), frames: [] });
    execFileSync('qpdf', ['--check', pdf]);
  });

  it('draws a frame of one sheet whole', async () => {
    const input = { ...aTemplate({ paper: 'a4' }), frames: [aHexagon('1', 600, 900, 75)] };
    expectTrue(await readSheets(await print(input)), input);
  });
});
