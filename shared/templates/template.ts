import type { Page } from './drawing.ts';
import { frontPages } from './front-pages.ts';
import { chooseDatums, type Datums } from './hang-order.ts';
import { sheetPage } from './sheet-page.ts';
import { planSheets, type SheetPlan } from './sheets.ts';
import type { TemplateInput } from './template-input.ts';

export interface Template {
  /** Front pages first, then the sheets row by row from the bottom, each from the left. */
  pages: Page[];
  plan: SheetPlan;
  datums: Datums;
}

/** The whole hanging template at 1:1 as drawings in mm. The wall's plane is carried to paper unturned; only the printer's correction scales it. */
export function makeTemplate(input: TemplateInput): Template {
  const ink = { outlines: input.frames.map((f) => f.outlineMm), screws: input.frames.flatMap((f) => f.hangers) };
  const plan = planSheets(ink, input.wall, input);
  const datums = chooseDatums(input);
  const sheets = plan.sheets.map((sheet) => sheetPage(input, plan, sheet, datums));
  return { pages: [...frontPages(input, plan, datums), ...sheets], plan, datums };
}
