import { text, type Primitive } from './drawing.ts';
import type { Words } from './front-words.ts';
import { hangOrder, hardwareBags } from './hang-order.ts';
import type { SheetFormat } from './sheet-format.ts';
import { rule } from './sheet-title.ts';
import type { TemplateInput } from './template-input.ts';
import { wrap } from './text-fitting.ts';

/** A heading with its paragraphs, broken to a width; `end` is where the next may stand. */
export function block(words: Words, at: { x: number; y: number }, width: number): { items: Primitive[]; end: number } {
  const size = 2.9;
  const items: Primitive[] = [text('front', { x: at.x, y: at.y }, words.heading, 3.8, { weight: 'bold', colour: words.warns ? 'madder' : 'ink', maxWidthMm: width }), rule({ x: at.x, y: at.y - 1.4 }, width)];
  let y = at.y - 5.6;
  words.paragraphs.forEach((paragraph, i) => {
    const indent = words.numbered ? 4.5 : 0;
    if (words.numbered) items.push(text('front', { x: at.x, y }, `${i + 1}.`, size, { weight: 'bold' }));
    for (const row of wrap(paragraph, size, width - indent)) {
      items.push(text('front', { x: at.x + indent, y }, row, size, { maxWidthMm: width - indent }));
      y -= size * 1.25;
    }
    y -= 1;
  });
  return { items, end: y - 1.5 };
}

/** Blocks set one below another in two columns, over as many pages as they take. */
export function flowed(title: string, blocks: Words[], { live }: SheetFormat): { name: string; items: Primitive[] }[] {
  const gap = 6;
  const width = (live.width - gap - 2) / 2;
  const top = live.y + live.height;
  const pages: { name: string; items: Primitive[] }[] = [];
  let column = 2;
  let y = 0;
  for (const words of blocks) {
    let placed = block(words, { x: live.x + column * (width + gap), y }, width);
    if (column > 1 || (placed.end < live.y && y < top - 13)) {
      column += 1;
      y = top - 13;
      if (column > 1) {
        column = 0;
        pages.push({ name: title, items: [text('front', { x: live.x, y: top - 7 }, pages.length === 0 ? title : `${title}, continued`, 6, { weight: 'bold' })] });
      }
      placed = block(words, { x: live.x + column * (width + gap), y }, width);
    }
    pages.at(-1)!.items.push(...placed.items);
    y = placed.end - 1;
  }
  return pages;
}

const headings = { stop: 'Stop: not to be hung so', caution: 'Caution: a person must decide', note: 'Good to know' };
const together = 10;

/** What the ledger still says, the heaviest first, in blocks that fit a column. */
export function openFindings(findings: TemplateInput['findings']): Words[] {
  return (['stop', 'caution', 'note'] as const).flatMap((weight) => {
    const words = findings.filter((f) => f.weight === weight).map((f) => f.words);
    return chunks(words).map((paragraphs, i): Words => ({ heading: `${headings[weight]}${i > 0 ? ', continued' : ''}`, paragraphs, numbered: false, warns: weight === 'stop' }));
  });
}

/** How many are open, in a line; empty where none is. */
export function findingsLine(findings: TemplateInput['findings']): string {
  const count = (weight: string, one: string) => {
    const n = findings.filter((f) => f.weight === weight).length;
    return n === 0 ? [] : [`${n} ${one}${n === 1 ? '' : 's'}`];
  };
  const parts = [...count('stop', 'stop'), ...count('caution', 'caution')];
  return parts.length === 0 ? '' : `Still open when this was drawn: ${parts.join(' and ')}. See the list of findings.`;
}

/** One bag a frame, packed before going to the wall. */
export function bagWords(input: TemplateInput): Words[] {
  return hardwareBags(hangOrder(input.frames, input.firstFrameId)).flatMap(({ frames, pieces }) => {
    const each = frames.length === 1 ? `Bag for frame ${frames[0]}` : `Bag for each of ${frames.length} frames`;
    const listed = pieces.length === 0 ? ['nothing: no hanger is set'] : pieces.map(({ name, count }) => `${count} × ${name}`);
    return [{ heading: each, paragraphs: [...(frames.length === 1 ? [] : [`Frames ${frames.join(', ')}`]), ...listed], numbered: false }];
  });
}

function chunks(words: string[]): string[][] {
  return Array.from({ length: Math.ceil(words.length / together) }, (_, i) => words.slice(i * together, (i + 1) * together));
}
