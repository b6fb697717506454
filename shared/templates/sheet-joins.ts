import type { Point } from '../geometry/point.ts';
import { formatLength } from '../units/length.ts';
import { line, text, type Primitive, type Rect, type Stroke } from './drawing.ts';
import type { Datums } from './hang-order.ts';
import type { Sheet } from './sheets.ts';
import type { TemplateInput } from './template-input.ts';

const cut: Stroke = { colour: 'ink', widthMm: 0.25 };
const lay: Stroke = { colour: 'grey', widthMm: 0.2, dashMm: [3, 2] };
const tick: Stroke = { colour: 'grey', widthMm: 0.2 };
const tickMm = 2.5;
const small = 2.3;

/** A length as a tape shows it: inches only where they fall on a mark of 1/32, else millimetres, for a cut edge must not be rounded. */
export function tapeFigure(mm: number, units: 'in' | 'mm'): string {
  const marks = (mm / 25.4) * 32;
  return units === 'in' && Math.abs(marks - Math.round(marks)) * (25.4 / 32) > 0.05 ? formatLength(mm, 'mm') : formatLength(mm, units);
}

/** Where a length stands from the wall's edge, in words: a minus sign is easily overlooked. */
export function fromLeft(mm: number, units: 'in' | 'mm'): string {
  return mm >= 0 ? `${tapeFigure(mm, units)} from the wall’s left edge` : `${tapeFigure(-mm, units)} to the left of the wall’s left edge`;
}

export function aboveFloor(mm: number, units: 'in' | 'mm'): string {
  return mm >= 0 ? `${tapeFigure(mm, units)} above the floor` : `${tapeFigure(-mm, units)} below the floor line`;
}

function fromPlumb(mm: number, units: 'in' | 'mm'): string {
  if (mm === 0) return 'on the plumb datum';
  return `${tapeFigure(Math.abs(mm), units)} ${mm < 0 ? 'left' : 'right'} of the plumb datum`;
}

function fromLevel(mm: number, units: 'in' | 'mm'): string {
  if (mm === 0) return 'on the level datum';
  return `${tapeFigure(Math.abs(mm), units)} ${mm < 0 ? 'below' : 'above'} the level datum`;
}

/**
 * Cut edges at left and foot, the lines the next sheets are laid to, ticks that meet across each join, and who the neighbours are.
 * `toPage` carries a point of the wall to the page.
 */
export function joins(sheet: Sheet, datums: Datums, { units, join }: Pick<TemplateInput, 'units' | 'join'>, toPage: (p: Point) => Point): Primitive[] {
  const { live } = sheet.format;
  const { window, step } = sheet;
  const butt = join === 'butt';
  const foot = live.y;
  const left = live.x;
  const right = live.x + live.width;
  const top = live.y + live.height;
  const layX = toPage({ x: window.x + step.x, y: 0 }).x;
  const layY = toPage({ x: 0, y: window.y + step.y }).y;
  const items: Primitive[] = [
    line('joins', { x: left, y: foot }, { x: left, y: top }, cut),
    line('joins', { x: left, y: foot }, { x: right, y: foot }, cut),
    ...alongLeft(window, left, toPage, [0, tickMm]),
    ...alongFoot(window, foot, toPage, [0, tickMm]),
  ];
  const cutWords = (neighbour: string | null) => (neighbour ? `Cut here, ${butt ? 'butt against' : 'lay on'} ${neighbour}` : 'Cut here, no sheet beyond');
  items.push(
    text('joins', { x: left + 3 + small, y: foot + 16 }, `${cutWords(sheet.left)} · this edge is ${fromLeft(window.x, units)}, ${fromPlumb(window.x - datums.plumbMm, units)}`, small, { turnRad: Math.PI / 2, maxWidthMm: live.height - 20 }),
    text('joins', { x: left + 16, y: foot + 3.4 }, `${cutWords(sheet.below)} · this edge is ${aboveFloor(window.y, units)}, ${fromLevel(window.y - datums.levelMm, units)}`, small, { maxWidthMm: live.width - 20 }),
  );
  // A sheet that overlaps is laid to a dashed line and a little past it; one that butts is cut there.
  const style = butt ? cut : lay;
  const past = butt ? 0 : tickMm;
  const words = (neighbour: string) => (butt ? `Cut here, butt against ${neighbour}` : `${neighbour} goes here, its cut edge on the dashed line`);
  if (sheet.right) {
    const x = butt ? layX - 1.2 : right - 2;
    items.push(
      line('joins', { x: layX, y: foot }, { x: layX, y: top }, style),
      ...alongLeft(window, layX, toPage, [-tickMm, past]),
      text('joins', { x, y: foot + 16 }, words(sheet.right), small, { turnRad: Math.PI / 2, colour: 'grey', maxWidthMm: live.height - 20 }),
    );
  }
  if (sheet.above) {
    const y = butt ? layY - 3 : top - 3;
    items.push(
      line('joins', { x: left, y: layY }, { x: right, y: layY }, style),
      ...alongFoot(window, layY, toPage, [-tickMm, past]),
      text('joins', { x: left + 16, y }, words(sheet.above), small, { colour: 'grey', maxWidthMm: live.width - 20 }),
    );
  }
  return items;
}

const tickEveryMm = 50;

function steps(from: number, length: number): number[] {
  const first = Math.ceil(from / tickEveryMm);
  return Array.from({ length: Math.max(0, Math.floor((from + length) / tickEveryMm) - first + 1) }, (_, i) => (first + i) * tickEveryMm);
}

function alongLeft(window: Rect, pageX: number, toPage: (p: Point) => Point, [from, to]: [number, number]): Primitive[] {
  return steps(window.y, window.height).map((y) => {
    const at = toPage({ x: 0, y }).y;
    return line('joins', { x: pageX + from, y: at }, { x: pageX + to, y: at }, tick);
  });
}

function alongFoot(window: Rect, pageY: number, toPage: (p: Point) => Point, [from, to]: [number, number]): Primitive[] {
  return steps(window.x, window.width).map((x) => {
    const at = toPage({ x, y: 0 }).x;
    return line('joins', { x: at, y: pageY + from }, { x: at, y: pageY + to }, tick);
  });
}
