import type { SheetPlan } from '../../../shared/templates/sheets.ts';
import type { TemplateInput } from '../../../shared/templates/template-input.ts';
import { planTemplate } from '../../../shared/templates/template.ts';

/** Lays the grid of sheets; runs in a worker, since the search tries tens of thousands of places. */
export default function templatePlan(input: TemplateInput): SheetPlan {
  return planTemplate(input);
}
