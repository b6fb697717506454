import type { Point } from '../geometry/point.ts';
import { line, text, type Primitive } from './drawing.ts';
import { barLength, scaleBar } from './scale-bars.ts';
import { barBandMm, titleBandMm, type SheetFormat } from './sheet-format.ts';
import type { TemplateInput } from './template-input.ts';
import { shorten } from './text-fitting.ts';

/** Whether the client has signed just this, and the words for it. */
export function signature(title: TemplateInput['title']): { signed: boolean; words: string; mark: string | null } {
  if (title.state === 'signed') return { signed: true, words: 'signed', mark: null };
  if (title.state === 'superseded') return { signed: false, words: 'superseded by a later revision', mark: 'SUPERSEDED' };
  return { signed: false, words: `not signed (${title.state})`, mark: 'NOT SIGNED' };
}

export function revisionWords(title: TemplateInput['title']): string {
  const hash = title.sha256 ? ` · record ${title.sha256.slice(0, 10)}` : '';
  return `Revision ${title.letter} · ${signature(title).words}${hash}`;
}

/** Room at the right of a sheet's title for the key to where it belongs. */
export const keyMm = { width: 24, height: 11.5 };

/**
 * What stands in the bands of every page: its name, whose template it is, the printing rule and both scale bars. The upper neighbour
 * lies over none of it that the hanger still needs once the sheets are taped.
 */
export function sheetTitle(input: TemplateInput, format: SheetFormat, name: string, isSheet: boolean): Primitive[] {
  const { live } = format;
  const { title } = input;
  const top = live.y + live.height + titleBandMm;
  const nameWidth = isSheet ? 26 : 0;
  const left = live.x + nameWidth;
  const width = live.width + barBandMm - nameWidth - (isSheet ? keyMm.width + 2 : 0);
  const heading = [title.shop, title.job, title.wall, title.layout].filter(Boolean).join(' · ');
  const items: Primitive[] = [
    text('title', { x: left, y: top - 3.4 }, shorten(heading, 3.2, width, 'bold'), 3.2, { weight: 'bold', maxWidthMm: width }),
    text('title', { x: left, y: top - 7.6 }, `${revisionWords(title)} · ${input.drawnAt}`, 2.8, { maxWidthMm: width, colour: signature(title).signed ? 'ink' : 'madder' }),
    text('title', { x: left, y: top - 11.6 }, 'Print at 100 % (actual size), no fit-to-page. Measure both bars before use.', 2.8, { maxWidthMm: width }),
  ];
  if (isSheet) {
    items.push(
      text('title', { x: live.x, y: top - 9.2 }, name, 11, { weight: 'bold', maxWidthMm: nameWidth - 2 }),
      text('title', { x: live.x, y: top - 12.6 }, 'row and column', 2.2, { colour: 'grey' }),
    );
  }
  return [...items, ...bars(input, format)];
}

/** How long the two bars of a page are, mm: as long as it allows. */
export function barLengths({ live }: Pick<SheetFormat, 'live'>, { correction, units }: Pick<TemplateInput, 'correction' | 'units'>): { across: number; up: number } {
  return { across: barLength((live.width - 1) / correction.x, units), up: barLength((live.height - 1) / correction.y, units) };
}

function bars(input: TemplateInput, format: SheetFormat): Primitive[] {
  const { live } = format;
  const { across, up } = barLengths(format, input);
  const foot: Point = { x: live.x + 0.5, y: live.y + live.height + 4 };
  const side: Point = { x: live.x + live.width + barBandMm - 1.5, y: live.y + 0.5 };
  return [
    ...scaleBar(foot, across, 'across', input.units, input.correction.x),
    ...scaleBar(side, up, 'up', input.units, input.correction.y),
    ...(input.correction.x === 1 && input.correction.y === 1 ? [] : [correctionNote(input, foot, across)]),
  ];
}

function correctionNote(input: TemplateInput, foot: Point, across: number): Primitive {
  const figure = (n: number) => n.toFixed(4);
  const words = `${input.printer === '' ? 'corrected' : `corrected for ${shorten(input.printer, 2.2, 40)}:`} × ${figure(input.correction.x)} across, × ${figure(input.correction.y)} up`;
  return text('title', { x: foot.x + (across * input.correction.x) / 2, y: foot.y - 3 }, words, 2.2, { colour: 'grey', anchor: 'middle' });
}

/** Thin rule under a heading. */
export function rule(from: Point, widthMm: number): Primitive {
  return line('front', from, { x: from.x + widthMm, y: from.y }, { colour: 'grey', widthMm: 0.2 });
}
