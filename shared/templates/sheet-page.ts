import type { Point } from '../geometry/point.ts';
import { sidesOf } from '../geometry/polygon.ts';
import { polygon, text, type Page, type Primitive, type Rect, type Stroke } from './drawing.ts';
import type { Datums } from './hang-order.ts';
import { crosses } from './label-places.ts';
import { joins } from './sheet-joins.ts';
import { sheetKey } from './sheet-key.ts';
import { labels } from './sheet-labels.ts';
import { signature, sheetTitle } from './sheet-title.ts';
import type { Sheet } from './sheets.ts';
import type { TemplateFrame, TemplateInput } from './template-input.ts';
import { estimateWidth } from './text-fitting.ts';
import { crossHair, datumLines, nearView, studs, wallEdges, type View } from './wall-drawing.ts';

const outline: Stroke = { colour: 'ink', widthMm: 0.35 };
/** Where only the screws matter, outlines merely show which frame is which. */
const faint: Stroke = { colour: 'grey', widthMm: 0.18, dashMm: [2, 1.2] };

/** One sheet at full size: the wall's part in its window, and the bands, joins and figures round it. */
export function sheetPage(input: TemplateInput, sheets: readonly Sheet[], sheet: Sheet, datums: Datums): Page {
  const { format, window, step } = sheet;
  const { live, widthMm, heightMm } = format;
  const { correction } = input;
  const view: View = {
    live, window,
    toPage: (p: Point): Point => ({ x: live.x + (p.x - window.x) * correction.x, y: live.y + (p.y - window.y) * correction.y }),
    seen: { width: sheet.right ? step.x * correction.x : live.width, height: sheet.above ? step.y * correction.y : live.height },
  };
  // Sheets that butt show nothing past the line they are cut along.
  const clip = input.join === 'butt' ? { ...live, width: view.seen.width, height: view.seen.height } : live;
  return {
    name: sheet.name, widthMm, heightMm,
    items: [
      { kind: 'clip', rect: clip, items: [...stateMark(input, live), ...wallPart(input, view, datums)] },
      ...joins(sheet, datums, input, view.toPage),
      ...sheetTitle(input, format, sheet.name, true),
      ...sheetKey(input, sheets, sheet),
    ],
  };
}

/** All that a part of the wall shows at full size. */
export function wallPart(input: TemplateInput, view: View, datums: Datums): Primitive[] {
  const frames = input.frames.filter((f) => reaches(f, view));
  return [
    ...studs(input, view),
    ...frames.map((f) => polygon('outlines', f.outlineMm.map(view.toPage), input.kind === 'screws' ? faint : outline)),
    ...wallEdges(input, view),
    ...datumLines(input, datums, view),
    ...frames.flatMap((f) => f.hangers.filter((h) => nearView(h, view)).flatMap((h) => crossHair(view.toPage(h)))),
    ...labels(input, frames, view),
  ];
}

function reaches(frame: TemplateFrame, view: View): boolean {
  return sidesOf(frame.outlineMm).some((side) => crosses(side, view.window)) || frame.hangers.some((h) => nearView(h, view));
}

/** The words that lie across a sheet that nobody has signed, faint and under all else. */
export function stateMark(input: TemplateInput, live: Rect): Primitive[] {
  const { mark } = signature(input.title);
  if (mark === null) return [];
  const turnRad = Math.atan2(live.height, live.width);
  const sizeMm = (0.8 * Math.hypot(live.width, live.height)) / estimateWidth(mark, 1, 'bold');
  const middle = { x: live.x + live.width / 2, y: live.y + live.height / 2 };
  const at = { x: middle.x + Math.sin(turnRad) * sizeMm * 0.35, y: middle.y - Math.cos(turnRad) * sizeMm * 0.35 };
  return [text('state', at, mark, sizeMm, { anchor: 'middle', turnRad, colour: 'pale madder', weight: 'bold' })];
}
