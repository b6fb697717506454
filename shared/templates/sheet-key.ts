import type { Point } from '../geometry/point.ts';
import { rectangle, polygon, type Primitive, type Rect } from './drawing.ts';
import { barBandMm, titleBandMm } from './sheet-format.ts';
import { keyMm } from './sheet-title.ts';
import type { Sheet } from './sheets.ts';
import type { TemplateInput } from './template-input.ts';

/** Past so many frames their outlines in so small a drawing are but a blot. */
const mostFrames = 80;

/** The wall small in the sheet's upper right corner, with the place of this sheet filled in. */
export function sheetKey(input: TemplateInput, sheets: readonly Sheet[], sheet: Sheet): Primitive[] {
  const { live } = sheet.format;
  const box: Rect = { x: live.x + live.width + barBandMm - keyMm.width, y: live.y + live.height + titleBandMm - keyMm.height, ...keyMm };
  const all = [{ x: 0, y: 0, width: input.wall.widthMm, height: input.wall.heightMm }, ...sheets.map((s) => s.window)];
  const left = Math.min(...all.map((r) => r.x));
  const foot = Math.min(...all.map((r) => r.y));
  const width = Math.max(...all.map((r) => r.x + r.width)) - left;
  const height = Math.max(...all.map((r) => r.y + r.height)) - foot;
  const scale = Math.min(box.width / width, box.height / height);
  const at = (p: Point): Point => ({ x: box.x + box.width - (width - (p.x - left)) * scale, y: box.y + box.height - (height - (p.y - foot)) * scale });
  const scaled = (r: Rect): Rect => ({ ...at(r), width: r.width * scale, height: r.height * scale });
  return [
    rectangle('title', scaled({ ...sheet.window, width: sheet.step.x, height: sheet.step.y }), null, 'grey'),
    ...(input.frames.length <= mostFrames ? input.frames.map((f) => polygon('title', f.outlineMm.map(at), { colour: 'ink', widthMm: 0.1 })) : []),
    rectangle('title', scaled(all[0]!), { colour: 'ink', widthMm: 0.25 }),
  ];
}
