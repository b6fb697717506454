import { describe, expect, it } from 'vitest';
import { longestPageMm, papers, type Paper } from '../../../shared/templates/papers.ts';
import { paperProblem } from '../../../shared/templates/sheet-format.ts';
import { templateQuery } from '../../../shared/templates/template-options.ts';
import { planNotes, planTemplate } from '../../../shared/templates/template.ts';
import { aHexagon, aTemplate } from './a-template.ts';

const wish = { paper: 'a4' as Paper, rollWidthMm: null, marginMm: 12.7, longPages: 'split' as const, units: 'mm' as const };

describe('paper', () => {
  it('shows every frame whole on each paper and roll, with both joins', () => {
    for (const paper of papers) {
      for (const join of ['overlap', 'butt'] as const) {
        const input = { ...aTemplate({ paper }), join };
        const { sheets } = planTemplate(input);
        for (const point of input.frames.flatMap((f) => [...f.outlineMm, ...f.hangers])) {
          const on = sheets.some(({ window: w, step }) => point.x >= w.x - 1e-6 && point.x <= w.x + (join === 'butt' ? step.x : w.width) + 1e-6 && point.y >= w.y - 1e-6 && point.y <= w.y + (join === 'butt' ? step.y : w.height) + 1e-6);
          expect(on, `${paper} ${join}: ${point.x}, ${point.y}`).toBe(true);
        }
      }
    }
  });

  it('takes fewer sheets for the screws alone, and at least one a frame when frames are printed one by one', () => {
    const full = planTemplate(aTemplate({})).sheets.length;
    expect(planTemplate({ ...aTemplate({}), kind: 'screws' }).sheets.length).toBeLessThan(full);
    const single = planTemplate({ ...aTemplate({}), kind: 'frames' }).sheets;
    expect(new Set(single.map((s) => s.frame))).toEqual(new Set(['1', '2', '3', '4']));
    expect(new Set(single.map((s) => s.name)).size).toBe(single.length);
  });

  it('splits a roll at 14,400 units and says so, or takes UserUnit and says so', () => {
    // 14,400 units of 1/72 in are 200 in, 5.08 m.
    expect(longestPageMm).toBeCloseTo(5080, 6);
    const input = aTemplate({ paper: 'roll-36in' });
    const long = { ...input, wall: { ...input.wall, widthMm: 30_000 }, frames: [aHexagon('1', 800, 1200, 140), aHexagon('2', 12_000, 1200, 140)], orientation: 'landscape' as const };
    const split = planTemplate(long);
    expect(split.sheets.length).toBeGreaterThan(1);
    expect(Math.max(...split.sheets.map((s) => s.format.widthMm))).toBeLessThanOrEqual(5080);
    expect(planNotes(long, split).join()).toContain('split');
    const whole = { ...long, longPages: 'user unit' as const };
    const one = planTemplate(whole);
    expect(one.sheets).toHaveLength(1);
    expect(planNotes(whole, one).join()).toContain('UserUnit');
  });

  it('says what is wrong with margins wider than the sheet and rolls too narrow for a label', () => {
    expect(paperProblem(wish)).toBeNull();
    expect(paperProblem({ ...wish, marginMm: 110 })).toMatchObject({ path: 'marginMm', words: 'Margins of 110 mm on both sides are wider than A4, which is 210 mm across.' });
    expect(paperProblem({ ...wish, marginMm: 80 })).toMatchObject({ path: 'marginMm', words: expect.stringContaining('the smallest label needs 70 mm') });
    expect(paperProblem({ ...wish, paper: 'roll', rollWidthMm: 100 })).toMatchObject({ path: 'rollWidthMm' });
  });

  it('refuses corrections of nought, of no number and past 3 %, with words', () => {
    for (const correctionX of ['0', 'NaN', '1.031', '0.969', '']) expect(templateQuery.safeParse({ correctionX }).success).toBe(false);
    expect(templateQuery.safeParse({ correctionX: '1.05' }).error?.issues[0]?.message).toContain('untick “Fit to page”');
    expect(templateQuery.parse({ correctionX: '0.975' }).correctionX).toBe(0.975);
  });

  it('stays where the reader pulled the grid, to the nearest mark of a tape, and counts what that takes', () => {
    const best = planTemplate(aTemplate({}));
    const pulled = planTemplate({ ...aTemplate({}), origin: { x: 333.4, y: 777.7 } });
    expect(pulled.sheets.length).toBeGreaterThanOrEqual(best.sheets.length);
    for (const s of pulled.sheets) expect(Math.abs((s.window.x - 333) / s.step.x - Math.round((s.window.x - 333) / s.step.x))).toBeLessThan(1e-9);
  });

  it('counts the blank sheets it leaves out', () => {
    const { sheets, blank } = planTemplate({ ...aTemplate({ paper: 'a4' }), frames: [aHexagon('1', 1200, 1200, 600)] });
    const rows = Math.max(...sheets.map((s) => s.row)) + 1;
    const columns = Math.max(...sheets.map((s) => s.column)) + 1;
    expect(blank).toBe(rows * columns - sheets.length);
    expect(blank).toBeGreaterThan(0);
  });
});
