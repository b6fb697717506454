import type { Box, Point } from '../../../../../shared/geometry/polygon.ts';
import { measured } from '../../../../../shared/layouts/measure.ts';
import type { Snap } from '../../../../../shared/layouts/snap.ts';
import type { SnapLine } from '../../../../../shared/layouts/snap-lines.ts';
import { colours } from '../../../../../tailwind.config.ts';
import type { Ghost, Hand, Measuring } from '../state/editor-store.ts';
import { write } from './canvas-pen.ts';

const chalk = colours.chalk[600];
const textPx = 13;

interface Look {
  wall: { widthMm: number; heightMm: number };
  /** A screen pixel in wall mm. */
  px: number;
  reveal: number;
  lengthText: (mm: number) => string;
}

/** Why what is held lies where it does: the edge it shares with the reveal, the lines it lies on; and what it would meet next. */
export function paintSnap(context: CanvasRenderingContext2D, { snap, lines, offered }: Pick<Hand, 'snap' | 'lines' | 'offered'>, look: Look): void {
  for (const line of lines) paintLine(context, line, look);
  if (snap) paintEdge(context, snap, look.px, look.lengthText(look.reveal), [6, 3], 2);
  // Finer and wider dashed than a snap that is taken, and told by how far it is.
  else if (offered) paintEdge(context, offered, look.px, `${look.lengthText(offered.distanceMm)} away`, [2, 5], 1.5);
}

function paintEdge(context: CanvasRenderingContext2D, { guide: { from, to } }: Snap, px: number, words: string, dash: readonly [number, number], weight: number): void {
  const dx = to.x - from.x;
  const dy = to.y - from.y;
  const length = Math.hypot(dx, dy);
  // A tip's guide may have no length: it then runs level.
  const unit = length > 0 ? { x: dx / length, y: dy / length } : { x: 1, y: 0 };
  const over = 22 * px;
  stroke(context, { x: from.x - unit.x * over, y: from.y - unit.y * over }, { x: to.x + unit.x * over, y: to.y + unit.y * over }, px, weight, dash);
  const beside = over + 24 * px;
  write(context, words, to.x + unit.x * beside, to.y + unit.y * beside, textPx * px, chalk, colours.plaster[50]);
}

function paintLine(context: CanvasRenderingContext2D, { axis, atMm, kind }: SnapLine, { wall, px, lengthText }: Look): void {
  const upright = axis === 'x';
  stroke(context, upright ? { x: atMm, y: 0 } : { x: 0, y: atMm }, upright ? { x: atMm, y: wall.heightMm } : { x: wall.widthMm, y: atMm }, px, 1.5, [10, 4]);
  const words = kind === 'datum' ? `${lengthText(atMm)} above floor` : kind;
  const beside = (words.length * 3.6 + 8) * px;
  if (upright) write(context, words, atMm + beside, wall.heightMm - 14 * px, textPx * px, chalk, colours.plaster[50]);
  else write(context, words, beside, atMm + 11 * px, textPx * px, chalk, colours.plaster[50]);
}

function stroke(context: CanvasRenderingContext2D, from: Point, to: Point, px: number, weight: number, dash: readonly number[]): void {
  context.strokeStyle = chalk;
  context.lineWidth = weight * px;
  context.setLineDash(dash.map((d) => d * px));
  context.beginPath();
  context.moveTo(from.x, from.y);
  context.lineTo(to.x, to.y);
  context.stroke();
  context.setLineDash([]);
}

/** The box of a choice being drawn. */
export function paintMarquee(context: CanvasRenderingContext2D, { left, bottom, right, top }: Box, px: number): void {
  context.fillStyle = `${chalk}1a`;
  context.fillRect(left, bottom, right - left, top - bottom);
  context.strokeStyle = chalk;
  context.lineWidth = px;
  context.strokeRect(left, bottom, right - left, top - bottom);
}

/** A measure: its ends as ticks, the line between and its length. */
export function paintMeasure(context: CanvasRenderingContext2D, { from, to }: Measuring, px: number, lengthText: (mm: number) => string): void {
  if (!from) return;
  if (!to) {
    paintEnd(context, from.at, px);
    return;
  }
  const taken = measured(from, to);
  stroke(context, taken.from, taken.to, px, 2, []);
  paintEnd(context, taken.from, px);
  paintEnd(context, taken.to, px);
  write(context, lengthText(taken.mm), (taken.from.x + taken.to.x) / 2, (taken.from.y + taken.to.y) / 2 + 13 * px, (textPx + 1) * px, chalk, colours.white);
}

function paintEnd(context: CanvasRenderingContext2D, at: Point, px: number): void {
  context.beginPath();
  context.arc(at.x, at.y, 4 * px, 0, 2 * Math.PI);
  context.fillStyle = colours.white;
  context.fill();
  context.strokeStyle = chalk;
  context.lineWidth = 1.5 * px;
  context.stroke();
}

/** A frame as it would stand: a dashed chalk line, its hangers full where they meet a stud and hollow where not. */
export function paintGhost(context: CanvasRenderingContext2D, { outline, hangers }: Ghost, px: number): void {
  context.strokeStyle = chalk;
  context.lineWidth = 1.5 * px;
  context.setLineDash([6 * px, 4 * px]);
  context.beginPath();
  outline.forEach(({ x, y }, i) => (i === 0 ? context.moveTo(x, y) : context.lineTo(x, y)));
  context.closePath();
  context.stroke();
  context.setLineDash([]);
  for (const { at, held } of hangers) {
    context.beginPath();
    context.arc(at.x, at.y, 4.5 * px, 0, 2 * Math.PI);
    context.fillStyle = held ? chalk : colours.white;
    context.fill();
    context.stroke();
  }
}
