import type { Point } from '../geometry/point.ts';
import { centroid, sidesOf } from '../geometry/polygon.ts';
import { clippedTo } from '../geometry/polygon-overlap.ts';
import { formatLength } from '../units/length.ts';
import { circle, cornersOf, line, polygon, text, type Page, type Primitive, type Stroke } from './drawing.ts';
import { drillText, type Datums } from './hang-order.ts';
import { crosses, LabelPlaces } from './label-places.ts';
import { aboveFloor, fromLeft, joins } from './sheet-joins.ts';
import { signature, sheetTitle } from './sheet-title.ts';
import { crossHairMm, type Sheet, type SheetPlan } from './sheets.ts';
import type { TemplateFrame, TemplateHanger, TemplateInput } from './template-input.ts';
import { estimateWidth } from './text-fitting.ts';

const outline: Stroke = { colour: 'ink', widthMm: 0.35 };
const cross: Stroke = { colour: 'brass', widthMm: 0.25 };
const ring: Stroke = { colour: 'brass', widthMm: 0.4 };
const studEdge: Stroke = { colour: 'chalk', widthMm: 0.2, dashMm: [4, 2.5] };
const datum: Stroke = { colour: 'ink', widthMm: 0.25, dashMm: [10, 2, 1.5, 2] };
const ringMm = 4;
const upright = { turnRad: Math.PI / 2 };

/** One sheet at full size: the wall's part in its window, and the bands, joins and figures round it. */
export function sheetPage(input: TemplateInput, plan: SheetPlan, sheet: Sheet, datums: Datums): Page {
  const { live, widthMm, heightMm } = plan.format;
  const { window } = sheet;
  const toPage = (p: Point): Point => ({
    x: live.x + (p.x - window.x) * input.correction.x,
    y: live.y + (p.y - window.y) * input.correction.y,
  });
  const frames = input.frames.filter((f) => reaches(f, sheet));
  const outlines = frames.map((f) => polygon('outlines', f.outlineMm.map(toPage), outline));
  const shown: Primitive[] = [
    ...stateMark(input, plan),
    ...studs(input, sheet, plan, toPage),
    ...outlines,
    ...wallEdges(input, sheet, toPage),
    ...datumLines(input, sheet, plan, datums, toPage),
    ...frames.flatMap((f) => f.hangers.filter((h) => near(h, sheet)).flatMap((h) => crossHair(toPage(h)))),
    ...labels(input, frames, sheet, plan, toPage),
  ];
  return {
    name: sheet.name, widthMm, heightMm,
    items: [{ kind: 'clip', rect: live, items: shown }, ...joins(sheet, plan, datums, input.units, toPage), ...sheetTitle(input, plan.format, sheet.name, true)],
  };
}

function reaches(frame: TemplateFrame, sheet: Sheet): boolean {
  return sidesOf(frame.outlineMm).some((side) => crosses(side, sheet.window)) || frame.hangers.some((h) => near(h, sheet));
}

function near(p: Point, { window }: Sheet): boolean {
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

function stateMark(input: TemplateInput, { format }: SheetPlan): Primitive[] {
  const { mark } = signature(input.title);
  if (mark === null) return [];
  const { live } = format;
  const turnRad = Math.atan2(live.height, live.width);
  const sizeMm = (0.8 * Math.hypot(live.width, live.height)) / estimateWidth(mark, 1, 'bold');
  const middle = { x: live.x + live.width / 2, y: live.y + live.height / 2 };
  const at = { x: middle.x + Math.sin(turnRad) * sizeMm * 0.35, y: middle.y - Math.cos(turnRad) * sizeMm * 0.35 };
  return [text('state', at, mark, sizeMm, { anchor: 'middle', turnRad, colour: 'pale madder', weight: 'bold' })];
}

function studs(input: TemplateInput, sheet: Sheet, plan: SheetPlan, toPage: (p: Point) => Point): Primitive[] {
  const { live } = plan.format;
  const top = live.y + live.height;
  return input.wall.studs.flatMap((stud): Primitive[] => {
    const left = toPage({ x: stud.xMm - stud.widthMm / 2, y: 0 }).x;
    const right = toPage({ x: stud.xMm + stud.widthMm / 2, y: 0 }).x;
    if (right < live.x || left > live.x + live.width) return [];
    const middle = (left + right) / 2;
    const words = `Stud, centre ${fromLeft(stud.xMm, input.units)}${stud.confirmed ? '' : ' ? not confirmed'}`;
    const items: Primitive[] = [
      line('studs', { x: left, y: live.y }, { x: left, y: top }, studEdge),
      line('studs', { x: right, y: live.y }, { x: right, y: top }, studEdge),
      text('studs', { x: middle + 0.9, y: live.y + 20 }, words, 2.5, { ...upright, colour: 'chalk', maxWidthMm: live.height - 30 }),
    ];
    if (stud.confirmed) return items;
    const every = 60;
    for (let k = Math.ceil(sheet.window.y / every); k * every < sheet.window.y + sheet.window.height - 8; k += 1) {
      items.push(text('studs', { x: right - 1.5, y: toPage({ x: 0, y: k * every }).y }, '?', 7, { anchor: 'end', colour: 'chalk', weight: 'bold' }));
    }
    return items;
  });
}

function wallEdges(input: TemplateInput, { window }: Sheet, toPage: (p: Point) => Point): Primitive[] {
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

function datumLines(input: TemplateInput, { window }: Sheet, plan: SheetPlan, datums: Datums, toPage: (p: Point) => Point): Primitive[] {
  const { live } = plan.format;
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

function labels(input: TemplateInput, frames: TemplateFrame[], sheet: Sheet, plan: SheetPlan, toPage: (p: Point) => Point): Primitive[] {
  const { live } = plan.format;
  // Labels keep to what is still seen once the neighbours lie over the overlap.
  const width = sheet.right ? plan.step.x * input.correction.x : live.width;
  const height = sheet.above ? plan.step.y * input.correction.y : live.height;
  const inner = { x: live.x + 6.5, y: live.y + 5, width: width - 7.5, height: height - 6 };
  const pageOutlines = frames.map((f) => f.outlineMm.map(toPage));
  const lines = pageOutlines.flatMap(sidesOf);
  const places = new LabelPlaces(inner, lines);
  const screws = frames.flatMap((f) => f.hangers).filter((h) => near(h, sheet));
  for (const screw of screws) places.reserve(square(toPage(screw), crossHairMm + 0.5));
  const items: Primitive[] = [];
  for (const [i, frame] of frames.entries()) {
    const part = clippedTo(pageOutlines[i]!, cornersOf(live));
    if (part.length < 3) continue;
    const at = centroid(part);
    const words = `Frame ${frame.label}`;
    const width = estimateWidth(words, 7, 'bold');
    const offered = around(at, [0, 14, -14, 28, -28, 42, -42], [0, 20, -20, 40, -40]).map((p) => ({ x: p.x - width / 2, y: p.y - 3, width, height: 8 }));
    const place = places.choose(offered);
    items.push(text('labels', { x: place.x + width / 2, y: place.y + 1.5 }, words, 7, { anchor: 'middle', weight: 'bold' }));
  }
  for (const screw of screws) {
    const at = toPage(screw);
    if (at.x < live.x || at.x > live.x + live.width || at.y < live.y || at.y > live.y + live.height) continue;
    items.push(...screwLabel(screw, at, input.units, places));
  }
  return items;
}

function screwLabel(screw: TemplateHanger, at: Point, units: 'in' | 'mm', places: LabelPlaces): Primitive[] {
  const rows = [
    { words: screw.label, size: 4.6, weight: 'bold' as const },
    { words: drillText(screw, units), size: 2.8, weight: 'bold' as const },
    { words: screw.hardware, size: 2.6, weight: 'regular' as const },
    { words: `${formatLength(screw.x, units)} from left, ${formatLength(screw.y, units)} up`, size: 2.4, weight: 'regular' as const },
  ].filter((r) => r.words !== '');
  const width = Math.min(70, Math.max(...rows.map((r) => estimateWidth(r.words, r.size, r.weight))));
  const height = rows.reduce((sum, r) => sum + r.size * 1.15, 0);
  const clear = crossHairMm + 1;
  const offered = [
    { x: at.x - width / 2, y: at.y - clear - height },
    { x: at.x + clear, y: at.y - height / 2 },
    { x: at.x - clear - width, y: at.y - height / 2 },
    { x: at.x - width / 2, y: at.y + clear },
    { x: at.x + clear / 2, y: at.y - clear - height },
    { x: at.x - clear / 2 - width, y: at.y - clear - height },
    { x: at.x + clear / 2, y: at.y + clear },
    { x: at.x - clear / 2 - width, y: at.y + clear },
  ].map((corner) => ({ ...corner, width, height }));
  const place = places.choose(offered);
  const side = place.x > at.x ? 'start' : place.x + width < at.x ? 'end' : 'middle';
  const x = side === 'start' ? place.x : side === 'end' ? place.x + width : place.x + width / 2;
  let y = place.y + height;
  return rows.map((r) => {
    y -= r.size * 1.15;
    return text('labels', { x, y: y + r.size * 0.3 }, r.words, r.size, { anchor: side, weight: r.weight, maxWidthMm: 70 });
  });
}

function square(at: Point, half: number) {
  return { x: at.x - half, y: at.y - half, width: 2 * half, height: 2 * half };
}

function around(at: Point, ups: number[], asides: number[]): Point[] {
  return asides.flatMap((x) => ups.map((y) => ({ x: at.x + x, y: at.y + y })));
}
