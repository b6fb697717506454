import type { Page } from './drawing.ts';
import { frontPages } from './front-pages.ts';
import { chooseDatums, type Datums } from './hang-order.ts';
import { isRoll } from './papers.ts';
import { sheetPage } from './sheet-page.ts';
import { planSheets, type Sheet, type SheetPlan } from './sheets.ts';
import { stickPages, stickPlan } from './story-stick.ts';
import type { TemplateInput } from './template-input.ts';

export interface Template {
  /** Front pages first, then the sheets row by row from the bottom, each from the left. */
  pages: Page[];
  plan: SheetPlan;
  datums: Datums;
}

/** The whole hanging template at 1:1 as drawings in mm. The wall's plane is carried to paper unturned; only the printer's correction scales it. */
export function makeTemplate(input: TemplateInput): Template {
  const plan = planTemplate(input);
  const datums = chooseDatums(input);
  return { pages: [...frontPages(input, plan, datums), ...sheetPages(input, plan, datums)], plan, datums };
}

/** Which sheets are printed, by what kind of template is asked for. */
export function planTemplate(input: TemplateInput): SheetPlan {
  if (input.kind === 'story stick') return stickPlan(input);
  if (input.kind === 'frames') return together(input.frames.map((frame) => called(planSheets(inkOf({ ...input, frames: [frame] }), input.wall, { ...input, origin: null }), frame.label)));
  return planSheets(inkOf(input), input.wall, input);
}

/** The pages of the plan's sheets, without the front pages. */
export function sheetPages(input: TemplateInput, plan: SheetPlan, datums: Datums): Page[] {
  if (input.kind === 'story stick') return stickPages(input, datums);
  return plan.sheets.map((sheet) => onePage(input, plan, sheet, datums));
}

/** One sheet's page; of a template of single frames it shows its own frame alone. */
export function onePage(input: TemplateInput, plan: SheetPlan, sheet: Sheet, datums: Datums): Page {
  const frames = input.kind === 'frames' ? input.frames.filter((f) => f.label === sheet.frame) : input.frames;
  return sheetPage({ ...input, frames }, plan.sheets, sheet, datums);
}

/** What the drawing cannot do as it was asked to, in words for the page and nobody else. */
export function planNotes(input: TemplateInput, plan: SheetPlan): string[] {
  const { format } = plan;
  const notes: string[] = [];
  if (isRoll(input.paper)) {
    const along = Math.max(format.widthMm, format.heightMm);
    const inLine = new Set(plan.sheets.map((s) => (format.orientation === 'portrait' ? s.row : s.column))).size;
    if (along > 5080) notes.push('A page is longer than 14,400 units (5.08 m), so the file scales its units (UserUnit). Some printers’ programs do not heed that: check the bars, or choose split pages.');
    else if (inLine > 1) notes.push('What is drawn is longer than 14,400 units (5.08 m), the most that every reader of PDF takes, so it is split into pieces.');
  }
  return notes;
}

/** Screws alone where only they are asked for and there are any. */
function inkOf({ frames, kind }: Pick<TemplateInput, 'frames' | 'kind'>) {
  const screws = frames.flatMap((f) => f.hangers);
  return { outlines: kind === 'screws' && screws.length > 0 ? [] : frames.map((f) => f.outlineMm), screws };
}

/** Sheets of one frame, named after it. */
function called(plan: SheetPlan, label: string): SheetPlan {
  const name = (own: string | null) => (own === null ? null : plan.sheets.length === 1 ? label : `${label}·${own}`);
  return {
    ...plan,
    sheets: plan.sheets.map((s) => ({ ...s, frame: label, name: name(s.name)!, left: name(s.left), right: name(s.right), below: name(s.below), above: name(s.above) })),
  };
}

function together(plans: SheetPlan[]): SheetPlan {
  return { ...plans[0]!, sheets: plans.flatMap((p) => p.sheets), blank: plans.reduce((sum, p) => sum + p.blank, 0) };
}
