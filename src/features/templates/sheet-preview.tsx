import { useMemo } from 'react';
import { frontPages } from '../../../shared/templates/front-pages.ts';
import { chooseDatums } from '../../../shared/templates/hang-order.ts';
import type { SheetPlan } from '../../../shared/templates/sheets.ts';
import { drawSvg } from '../../../shared/templates/svg-pen.ts';
import type { TemplateInput } from '../../../shared/templates/template-input.ts';
import { onePage, sheetPages } from '../../../shared/templates/template.ts';

/** The name under which the front page can be chosen; no sheet bears it. */
export const frontName = 'Front page';

/** One page as it will be printed, by the same drawing. */
export function SheetPreview({ input, plan, name }: { input: TemplateInput; plan: SheetPlan; name: string }) {
  const drawn = useMemo(() => {
    const datums = chooseDatums(input);
    const sheet = plan.sheets.find((s) => s.name === name);
    const page = !sheet ? frontPages(input, plan, datums)[0]! : input.kind === 'story stick' ? sheetPages(input, plan, datums)[plan.sheets.indexOf(sheet)]! : onePage(input, plan, sheet, datums);
    return { address: `data:image/svg+xml;charset=utf-8,${encodeURIComponent(drawSvg(page, page.name))}`, wide: page.widthMm, high: page.heightMm };
  }, [input, plan, name]);
  return <img src={drawn.address} width={drawn.wide} height={drawn.high} alt={name === frontName ? 'The front page as it will be printed' : `Sheet ${name} as it will be printed`} className="mx-auto block max-h-[46dvh] w-auto max-w-full border border-ink-500 bg-white" />;
}
