import type { Point } from '../geometry/point.ts';
import { formatLength } from '../units/length.ts';
import { circle, line, text, type Primitive, type Rect, type Stroke } from './drawing.ts';
import type { Datums } from './hang-order.ts';
import { aboveFloor, fromLeft } from './sheet-joins.ts';
import { crossHairMm } from './sheets.ts';
import type { TemplateInput } from './template-input.ts';

/** Where a part of the wall is drawn: `window` of the wall in `live` of the page. */
export interface View {
  live: Rect;
  window: Rect;
  toPage: (p: Point) => Point;
  /** What is still seen once the neighbours lie over the overlap, mm on the page. */
  seen: { width: number; height: number };
}

const cross: Stroke = { colour: 'brass', widthMm: 0.25 };
const ring: Stroke = { colour: 'brass', widthMm: 0.4 };
const studEdge: Stroke = { colour: 'chalk', widthMm: 0.2, dashMm: [4, 2.5] };
const datum: Stroke = { colour: 'ink', widthMm: 0.25, dashMm: [10, 2, 1.5, 2] };
const ringMm = 4;
const upright = { turnRad: Math.PI / 2 };

/** Whether any part of a cross-hair about a point shows. */
export function nearView(p: Point, { window }: Pick<View, 'window'>): boolean {
  const r = crossHairMm;
  return p.x > window.x - r && p.x < window.x + window.width + r && p.y > window.y - r && p.y < window.y + window.height + r;
}

/** Arms and ring about a screw's centre; nothing else on the sheet is drawn in brass. */
export function crossHair(at: Point, scale = 1): Primitive[] {
  const arm = crossHairMm * scale;
  return [
    line('screws', { x: at.x - arm, y: at.y }, { x: at.x + arm, y: at.y }, cross),
    line('screws', { x: at.x, y: at.y - arm }, { x: at.x, y: at.y + arm }, cross),
    circle('screws', at, ringMm * scale, ring),
  ];
}

export function studs(input: TemplateInput, { live, window, toPage, seen }: View): Primitive[] {
  const top = live.y + live.height;
  return input.wall.studs.flatMap((stud): Primitive[] => {
    const left = toPage({ x: stud.xMm - stud.widthMm / 2, y: 0 }).x;
    const right = toPage({ x: stud.xMm + stud.widthMm / 2, y: 0 }).x;
    if (right < live.x || left > live.x + live.width) return [];
    const middle = (left + right) / 2;
    const certainty = stud.uncertaintyMm === null ? '' : ` ± ${formatLength(stud.uncertaintyMm, input.units)}`;
    const words = `Stud, centre ${fromLeft(stud.xMm, input.units)}${certainty}${stud.confirmed ? '' : ' ? not confirmed'}`;
    const items: Primitive[] = [
      line('studs', { x: left, y: live.y }, { x: left, y: top }, studEdge),
      line('studs', { x: right, y: live.y }, { x: right, y: top }, studEdge),
      // At the edge words would be cut in two, or lie under the next sheet, which says them itself.
      ...(middle > live.x + 3 && middle < live.x + seen.width - 8 ? [text('studs', { x: middle + 0.9, y: live.y + 20 }, words, 2.5, { ...upright, colour: 'chalk', maxWidthMm: live.height - 30 })] : []),
    ];
    if (stud.confirmed) return items;
    const every = 60;
    for (let k = Math.ceil(window.y / every); k * every < window.y + window.height - 8; k += 1) {
      items.push(text('studs', { x: right - 1.5, y: toPage({ x: 0, y: k * every }).y }, '?', 7, { anchor: 'end', colour: 'chalk', weight: 'bold' }));
    }
    return items;
  });
}

export function wallEdges(input: TemplateInput, { window, toPage }: View): Primitive[] {
  const { widthMm, heightMm } = input.wall;
  const heavy: Stroke = { colour: 'ink', widthMm: 0.7 };
  const items: Primitive[] = [];
  const low = toPage(window);
  const high = toPage({ x: window.x + window.width, y: window.y + window.height });
  const note = (at: Point, words: string, turned: boolean) => text('wall', at, words, 2.6, { weight: 'bold', ...(turned ? upright : {}) });
  for (const [x, words] of [[0, 'left'], [widthMm, 'right']] as const) {
    if (x <= window.x || x >= window.x + window.width) continue;
    const at = toPage({ x, y: 0 }).x;
    items.push(line('wall', { x: at, y: low.y }, { x: at, y: high.y }, heavy), note({ x: at - 1.5, y: low.y + 60 }, `The wall’s ${words} edge: trim or fold here`, true));
  }
  for (const [y, words] of [[0, 'Floor'], [heightMm, 'The wall’s top']] as const) {
    if (y <= window.y || y >= window.y + window.height) continue;
    const at = toPage({ x: 0, y }).y;
    items.push(line('wall', { x: low.x, y: at }, { x: high.x, y: at }, heavy), note({ x: low.x + 60, y: at + 1.5 }, `${words}: trim or fold here`, false));
  }
  return items;
}

export function datumLines(input: TemplateInput, datums: Datums, { live, window, toPage }: View): Primitive[] {
  const items: Primitive[] = [];
  if (datums.levelMm > window.y && datums.levelMm < window.y + window.height) {
    const { y } = toPage({ x: 0, y: datums.levelMm });
    items.push(
      line('datums', { x: live.x, y }, { x: live.x + live.width, y }, datum),
      text('datums', { x: live.x + live.width - 16, y: y + 1.2 }, `LEVEL DATUM ${aboveFloor(datums.levelMm, input.units)}`, 2.8, { anchor: 'end', weight: 'bold' }),
    );
  }
  if (datums.plumbMm > window.x && datums.plumbMm < window.x + window.width) {
    const { x } = toPage({ x: datums.plumbMm, y: 0 });
    items.push(
      line('datums', { x, y: live.y }, { x, y: live.y + live.height }, datum),
      text('datums', { x: x - 1.2, y: live.y + live.height - 16 }, `PLUMB DATUM ${fromLeft(datums.plumbMm, input.units)}`, 2.8, { ...upright, anchor: 'end', weight: 'bold' }),
    );
  }
  return items;
}
