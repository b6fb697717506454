import { formatLength } from '../units/length.ts';
import { line, text, type Page, type Primitive, type Stroke } from './drawing.ts';
import { chooseDatums, drillText, type Datums } from './hang-order.ts';
import { sheetFormat, type SheetFormat } from './sheet-format.ts';
import { aboveFloor } from './sheet-joins.ts';
import { signature, sheetTitle } from './sheet-title.ts';
import { sheetName, type Sheet, type SheetPlan } from './sheets.ts';
import type { TemplateHanger, TemplateInput } from './template-input.ts';

/** Width of the strip, mm: room for a height, its screws and their drill. */
const stripMm = 56;
const gapMm = 2;
const beyondMm = 15;
const cut: Stroke = { colour: 'ink', widthMm: 0.25 };
const height: Stroke = { colour: 'brass', widthMm: 0.25 };
const lay: Stroke = { colour: 'grey', widthMm: 0.2, dashMm: [3, 2] };
/** Screws nearer in height than a pencil's line share one mark, mm. */
const alikeMm = 0.2;

interface Piece {
  name: string;
  /** Height of its lower edge above the floor, mm. */
  foot: number;
  sheet: number;
  /** Which strip of its sheet, from the left. */
  place: number;
}

interface Stick {
  format: SheetFormat;
  pieces: Piece[];
  stepMm: number;
  lengthMm: number;
}

/** The stick cut into strips that stand side by side on upright sheets, each as long as the sheet allows. */
function cutUp(input: TemplateInput): Stick {
  const screws = input.frames.flatMap((f) => f.hangers);
  const heights = [...screws.map((s) => s.y), chooseDatums(input).levelMm];
  const mark = input.units === 'mm' ? 1 : 3.175;
  const low = Math.floor((Math.min(...heights) - beyondMm) / mark) * mark;
  const high = Math.max(...heights) + beyondMm;
  const format = sheetFormat(input, 'portrait', { width: stripMm, height: (high - low) * input.correction.y });
  const lengthMm = format.live.height / input.correction.y;
  const stepMm = Math.floor((lengthMm - (input.join === 'butt' ? 0 : input.overlapMm)) / mark) * mark;
  const across = Math.max(1, Math.floor((format.live.width + gapMm) / (stripMm + gapMm)));
  const count = Math.max(1, Math.ceil((high - low - (lengthMm - stepMm)) / stepMm));
  const pieces = Array.from({ length: count }, (_, i) => ({ name: `S${i + 1}`, foot: low + i * stepMm, sheet: Math.floor(i / across), place: i % across }));
  return { format, pieces, stepMm, lengthMm };
}

/** The stick's sheets; as it belongs to no place across the wall, their windows span it. */
export function stickPlan(input: TemplateInput): SheetPlan {
  const { format, pieces, stepMm, lengthMm } = cutUp(input);
  const step = { x: input.wall.widthMm, y: stepMm };
  const sheets = Array.from({ length: pieces.at(-1)!.sheet + 1 }, (_, i): Sheet => {
    const own = pieces.filter((p) => p.sheet === i);
    const foot = own[0]!.foot;
    return { name: sheetName(i, 0), row: i, column: 0, window: { x: 0, y: foot, width: input.wall.widthMm, height: own.at(-1)!.foot + lengthMm - foot }, format, step: { x: step.x, y: stepMm * own.length }, left: null, right: null, below: null, above: null };
  });
  return { format, sheets, step, overlap: { x: 0, y: lengthMm - stepMm }, origin: { x: 0, y: pieces[0]!.foot }, blank: 0 };
}

/** A narrow strip with the height of every screw: held upright on the level datum beside a frame's plumb, it gives all heights without a tape. */
export function stickPages(input: TemplateInput, datums: Datums): Page[] {
  const stick = cutUp(input);
  const { format, pieces } = stick;
  return Array.from({ length: pieces.at(-1)!.sheet + 1 }, (_, i): Page => {
    const own = pieces.filter((p) => p.sheet === i);
    const name = sheetName(i, 0);
    const items = own.flatMap((piece) => strip(input, datums, stick, piece, pieces[pieces.indexOf(piece) + 1] ?? null, i > 0 || piece.place > 0));
    return { name, widthMm: format.widthMm, heightMm: format.heightMm, items: [...items, ...sheetTitle(input, format, name, true)] };
  });
}

function strip(input: TemplateInput, datums: Datums, { format, stepMm, lengthMm }: Stick, piece: Piece, next: Piece | null, hasBelow: boolean): Primitive[] {
  const { live } = format;
  const x = live.x + piece.place * (stripMm + gapMm);
  const right = x + stripMm;
  const pageY = (mm: number) => live.y + (mm - piece.foot) * input.correction.y;
  const top = live.y + live.height;
  const before = `S${Number(piece.name.slice(1)) - 1}`;
  const joinWords = hasBelow ? `cut, ${input.join === 'butt' ? 'butt against' : 'lay on'} ${before}` : 'cut';
  const state = signature(input.title);
  const items: Primitive[] = [
    line('joins', { x, y: live.y }, { x, y: top }, cut),
    line('joins', { x: right, y: live.y }, { x: right, y: top }, cut),
    line('joins', { x, y: live.y }, { x: right, y: live.y }, cut),
    text('joins', { x: x + 2, y: live.y + 2 }, `${piece.name} · ${joinWords} · this edge is ${aboveFloor(piece.foot, input.units)}`, 2.3, { maxWidthMm: stripMm - 4 }),
    ...(state.signed ? [] : [text('state', { x: right - 1.5, y: live.y + live.height / 2 }, state.mark ?? '', 8, { anchor: 'middle', turnRad: Math.PI / 2, colour: 'pale madder', weight: 'bold' })]),
  ];
  if (next) {
    const y = pageY(piece.foot + stepMm);
    items.push(line('joins', { x, y }, { x: right, y }, input.join === 'butt' ? cut : lay), text('joins', { x: x + 2, y: y - 3 }, `${next.name} goes ${input.join === 'butt' ? 'on top of' : 'over'} this line`, 2.3, { colour: 'grey' }));
  }
  if (datums.levelMm > piece.foot && datums.levelMm < piece.foot + lengthMm) {
    const y = pageY(datums.levelMm);
    items.push(line('datums', { x, y }, { x: right, y }, { colour: 'ink', widthMm: 0.25, dashMm: [10, 2, 1.5, 2] }), text('datums', { x: right - 2, y: y + 1 }, 'LEVEL DATUM', 2.6, { anchor: 'end', weight: 'bold' }));
  }
  return [...items, ...marks(input, x, piece.foot, lengthMm, pageY)];
}

/** One line for each height, with its screws beside it; words that would lie on one another are led aside. */
function marks(input: TemplateInput, x: number, foot: number, lengthMm: number, pageY: (mm: number) => number): Primitive[] {
  const items: Primitive[] = [];
  let last = pageY(foot) + 3;
  for (const group of heightsOf(input)) {
    const { y: mm } = group[0]!;
    if (mm <= foot || mm >= foot + lengthMm) continue;
    const y = pageY(mm);
    const words = Math.max(y - 1, last + 3);
    last = words;
    const names = group.map((s) => s.label).join(', ');
    items.push(
      line('screws', { x, y }, { x: x + 9, y }, height),
      line('labels', { x: x + 9, y }, { x: x + 11, y: words + 1 }, { colour: 'grey', widthMm: 0.15 }),
      text('labels', { x: x + 11.5, y: words }, `${formatLength(mm, input.units)} · ${names} · ${drillText(group[0]!, input.units)}`, 2.6, { maxWidthMm: stripMm - 13, weight: 'bold' }),
    );
  }
  return items;
}

/** Screws by height from the floor up, those of one height and one drill together. */
function heightsOf({ frames }: TemplateInput): TemplateHanger[][] {
  const screws = frames.flatMap((f) => f.hangers).sort((a, b) => a.y - b.y || (a.label < b.label ? -1 : 1));
  const groups: TemplateHanger[][] = [];
  for (const screw of screws) {
    const group = groups.at(-1);
    if (group && screw.y - group[0]!.y <= alikeMm && screw.drillMm === group[0]!.drillMm && group.length < 6) group.push(screw);
    else groups.push([screw]);
  }
  return groups;
}
