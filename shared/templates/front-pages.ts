import { formatLength } from '../units/length.ts';
import { line, rectangle, text, type Page, type Primitive } from './drawing.ts';
import { bagWords, block, findingsLine, flowed, openFindings } from './front-lists.ts';
import { cautions, proveScale, tapeUp, toBring } from './front-words.ts';
import { drillText, hangOrder, longestSpan, type Datums } from './hang-order.ts';
import { isRoll, paperSizes } from './papers.ts';
import { sheetFormat, type SheetFormat } from './sheet-format.ts';
import { sheetMap, wallLocator } from './sheet-map.ts';
import { sheetTitle, rule } from './sheet-title.ts';
import type { SheetPlan } from './sheets.ts';
import type { TemplateInput } from './template-input.ts';
import { shorten } from './text-fitting.ts';

const rowMm = 5.2;
const locatorMm = 36;

/** Pages before the sheets: the map, how to prove the scale and tape up, cautions, then the hang order with its hardware. */
export function frontPages(input: TemplateInput, plan: SheetPlan, datums: Datums): Page[] {
  const format = frontFormat(input);
  const findings = openFindings(input.findings);
  const lists = flowed(findings.length > 0 ? 'Findings still open, and hardware bags' : 'Hardware bags', [...findings, ...bagWords(input)], format);
  return [firstPage(input, plan, datums, format), ...orderPages(input, format), ...lists.map(({ name, items }) => page(input, format, name, items))];
}

/** What is read in the hand stays on paper of that size, whatever the wall is printed on. */
export function frontFormat(input: TemplateInput): SheetFormat {
  const small = !isRoll(input.paper) && paperSizes[input.paper].heightMm <= 450;
  const paper = small ? input.paper : input.units === 'in' ? 'letter' : 'a4';
  return sheetFormat({ ...input, paper, marginMm: Math.min(input.marginMm, 20) }, 'portrait');
}

function sheetsLine({ sheets, blank, format }: SheetPlan, kind: TemplateInput['kind']): string {
  const turned = new Set(sheets.map((s) => s.format.orientation));
  const noun = isRoll(format.paper) ? 'piece' : 'sheet';
  const left = blank === 0 ? '' : `; ${blank} blank ${blank === 1 ? 'one' : 'ones'} left out`;
  const only = { full: '', screws: ', screws only', frames: ', one frame at a time', 'story stick': ', a story stick with the heights of all hangers' }[kind];
  return `${sheets.length} ${noun}${sheets.length === 1 ? '' : 's'} of ${format.name}${turned.size > 1 ? '' : `, ${format.orientation}`}${left}${only}.`;
}

function page(input: TemplateInput, format: SheetFormat, name: string, items: Primitive[]): Page {
  return { name, widthMm: format.widthMm, heightMm: format.heightMm, items: [...sheetTitle(input, format, name, false), ...items] };
}

function firstPage(input: TemplateInput, plan: SheetPlan, datums: Datums, format: SheetFormat): Page {
  const { live } = format;
  const top = live.y + live.height;
  const mapHeight = Math.min(88, live.height * 0.38);
  const open = findingsLine(input.findings);
  const head = open === '' ? 20 : 25;
  const items: Primitive[] = [
    ...(open === '' ? [] : [text('front', { x: live.x, y: top - 22 }, open, 3, { weight: 'bold', colour: 'madder', maxWidthMm: live.width })]),
    text('front', { x: live.x, y: top - 8 }, 'Hanging template', 8, { weight: 'bold' }),
    text('front', { x: live.x, y: top - 13.5 }, `${sheetsLine(plan, input.kind)} Rows are lettered from the bottom, columns numbered from the left.`, 3, { maxWidthMm: live.width }),
    text('front', { x: live.x, y: top - 17.5 }, `Wall ${formatLength(input.wall.widthMm, input.units)} wide, ${formatLength(input.wall.heightMm, input.units)} high · level datum ${formatLength(datums.levelMm, input.units)} above the floor · plumb datum ${formatLength(datums.plumbMm, input.units)} from the left edge`, 3, { maxWidthMm: live.width }),
    ...sheetMap(input, plan, datums, { x: live.x, y: top - head - mapHeight, width: live.width - locatorMm - 6, height: mapHeight }),
    ...wallLocator(input, plan, { x: live.x + live.width - locatorMm - 2, y: top - head - mapHeight, width: locatorMm, height: mapHeight }),
  ];
  const gap = 6;
  const columnWidth = (live.width - gap - 2) / 2;
  const y = top - head - mapHeight - 6;
  const span = longestSpan(input.frames);
  const left = block(proveScale(input.units, span), { x: live.x, y }, columnWidth);
  const under = block(tapeUp(datums, input), { x: live.x, y: left.end - 2.5 }, columnWidth);
  const right = block(cautions(input), { x: live.x + columnWidth + gap, y }, columnWidth);
  return page(input, format, 'Front page', [...items, ...left.items, ...under.items, ...right.items]);
}

interface OrderRow {
  order: string;
  frame: string;
  screw: string;
  right: string;
  up: string;
  drill: string;
  hardware: string;
}

function orderRows(input: TemplateInput): OrderRow[] {
  return hangOrder(input.frames, input.firstFrameId).flatMap((frame, i) => {
    const head = { order: String(i + 1), frame: frame.label };
    if (frame.hangers.length === 0) return [{ ...head, screw: 'none', right: '', up: '', drill: '', hardware: 'no hanger is set for this frame' }];
    return frame.hangers.map((hanger, k) => ({
      ...(k === 0 ? head : { order: '', frame: '' }),
      screw: hanger.label,
      right: formatLength(hanger.x, input.units),
      up: formatLength(hanger.y, input.units),
      drill: drillText(hanger, input.units).replace(/^drill /, ''),
      hardware: hanger.hardware,
    }));
  });
}

/** The table over as many pages as it takes; what to bring stands under its end, or on a page of its own where there is no room. */
function orderPages(input: TemplateInput, format: SheetFormat): Page[] {
  const { live } = format;
  const top = live.y + live.height;
  const rows = orderRows(input);
  const room = Math.floor((live.height - 26) / rowMm);
  const parts: OrderRow[][] = [];
  for (let i = 0; i < rows.length; i += room) parts.push(rows.slice(i, i + room));
  const pages = parts.map((part, i) => {
    const name = parts.length === 1 ? 'Hang order' : `Hang order ${i + 1} of ${parts.length}`;
    return { name, items: orderTable(input, part, name, live.x, top, live.width - 2) };
  });
  const under = block(toBring(input), { x: live.x, y: top - 19.4 - (parts.at(-1)?.length ?? 0) * rowMm - 10 }, live.width - 2);
  const last = pages.at(-1);
  if (last && under.end > live.y) last.items.push(...under.items);
  else if (last) pages.push({ name: 'To bring', items: block(toBring(input), { x: live.x, y: top - 8 }, live.width - 2).items });
  return pages.map(({ name, items }) => page(input, format, name, items));
}

function orderWords(input: TemplateInput): string {
  const first = input.frames.find((f) => f.id === input.firstFrameId);
  return first ? `From frame ${first.label} outwards, each beside one that hangs already.` : 'From the bottom up, each course from the left.';
}

function orderTable(input: TemplateInput, rows: OrderRow[], name: string, x: number, top: number, width: number): Primitive[] {
  const columns: { key: keyof OrderRow; head: string; at: number; anchor: 'start' | 'end'; width: number }[] = [
    { key: 'order', head: 'Order', at: 10, anchor: 'end', width: 10 },
    { key: 'frame', head: 'Frame', at: 13, anchor: 'start', width: 12 },
    { key: 'screw', head: 'Screw', at: 26, anchor: 'start', width: 12 },
    { key: 'right', head: 'From left', at: 57, anchor: 'end', width: 19 },
    { key: 'up', head: 'Above floor', at: 78, anchor: 'end', width: 19 },
    { key: 'drill', head: 'Drill', at: 82, anchor: 'start', width: 22 },
    { key: 'hardware', head: 'Hardware', at: 106, anchor: 'start', width: width - 106 - 18 },
  ];
  const items: Primitive[] = [
    text('front', { x, y: top - 7 }, `${name} and hardware`, 6, { weight: 'bold' }),
    text('front', { x, y: top - 12 }, `${orderWords(input)} Tick a screw once it is drilled at its cross-hair and the level agrees.`, 2.9, { maxWidthMm: width }),
    text('front', { x: x + width, y: top - 18 }, 'Drilled  Hung', 2.8, { weight: 'bold', anchor: 'end' }),
    rule({ x, y: top - 19.4 }, width),
  ];
  for (const c of columns) items.push(text('front', { x: x + c.at, y: top - 18 }, c.head, 2.8, { weight: 'bold', anchor: c.anchor }));
  rows.forEach((row, i) => {
    const y = top - 19.4 - (i + 1) * rowMm;
    for (const c of columns) {
      const words = c.key === 'hardware' ? shorten(row[c.key], 2.9, c.width * 1.2) : row[c.key];
      items.push(text('front', { x: x + c.at, y: y + 1.6 }, words, 2.9, { anchor: c.anchor, maxWidthMm: c.width, weight: c.key === 'frame' || c.key === 'screw' ? 'bold' : 'regular' }));
    }
    const box = { colour: 'ink' as const, widthMm: 0.25 };
    items.push(rectangle('front', { x: x + width - 14.5, y: y + 1, width: 3.2, height: 3.2 }, box));
    if (row.order !== '') items.push(rectangle('front', { x: x + width - 5, y: y + 1, width: 3.2, height: 3.2 }, box));
    items.push(line('front', { x, y }, { x: x + width, y }, { colour: 'rule', widthMm: 0.15 }));
  });
  return items;
}
