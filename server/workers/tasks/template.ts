import { makeTemplate } from '../../../shared/templates/template.ts';
import type { TemplateInput } from '../../../shared/templates/template-input.ts';
import { templateFacts } from '../../../shared/templates/template-facts.ts';
import { drawPdf } from '../../templates/template-pdf.ts';

/** Draws the hanging template; runs in a worker, for the search for the fewest sheets and the type's subsetting hold a thread for a second or more. */
export default async function template(input: TemplateInput): Promise<Uint8Array> {
  return drawPdf(makeTemplate(input).pages, templateFacts(input));
}
