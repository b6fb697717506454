import { writeFile } from 'node:fs/promises';
import type { Page } from '../../../shared/templates/drawing.ts';
import { frontPages } from '../../../shared/templates/front-pages.ts';
import { chooseDatums } from '../../../shared/templates/hang-order.ts';
import { drawSvg } from '../../../shared/templates/svg-pen.ts';
import { templateFacts } from '../../../shared/templates/template-facts.ts';
import type { TemplateInput } from '../../../shared/templates/template-input.ts';
import { onePage, planTemplate, sheetPages } from '../../../shared/templates/template.ts';
import { wholeWall } from '../../../shared/templates/whole-wall.ts';
import { drawDxf } from '../../templates/template-dxf.ts';
import { drawPdf } from '../../templates/template-pdf.ts';
import { setPages } from '../../templates/template-progress.ts';

export interface TemplateTask {
  input: TemplateInput;
  output: 'pdf' | 'dxf' | 'svg';
  /** Where the file is written. */
  place: string;
  cell?: SharedArrayBuffer;
}

/** Draws the hanging template into a file; runs in a worker, for the search for the fewest sheets and the drawing hold a thread for a second or more. */
export default async function template({ input, output, place, cell }: TemplateTask): Promise<void> {
  await writeFile(place, await templateBytes(input, output, cell));
}

export async function templateBytes(input: TemplateInput, output: TemplateTask['output'], cell?: SharedArrayBuffer): Promise<Uint8Array | string> {
  if (output === 'pdf') {
    const { total, pages } = pagesOneByOne(input);
    setPages(cell, 0, total);
    return drawPdf(pages, templateFacts(input), { palette: input.colours, onPage: (drawn) => setPages(cell, drawn, total) });
  }
  const { page, originMm } = wholeWall(input);
  return output === 'svg' ? drawSvg(page, templateFacts(input).title) : drawDxf(page, originMm);
}

/** Pages made as they are asked for: a large template is never whole in memory. */
function pagesOneByOne(input: TemplateInput): { total: number; pages: Iterable<Page> } {
  const plan = planTemplate(input);
  const datums = chooseDatums(input);
  const front = frontPages(input, plan, datums);
  function* all(): Generator<Page> {
    yield* front;
    if (input.kind === 'story stick') yield* sheetPages(input, plan, datums);
    else for (const sheet of plan.sheets) yield onePage(input, plan, sheet, datums);
  }
  return { total: front.length + plan.sheets.length, pages: all() };
}
