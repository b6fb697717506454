import type { Point } from '../geometry/point.ts';
import { boxOf, centroid } from '../geometry/polygon.ts';
import { circle, cornersOf, line, polygon, rectangle, text, type Primitive, type Rect } from './drawing.ts';
import type { Datums } from './hang-order.ts';
import type { SheetPlan } from './sheets.ts';
import type { TemplateInput } from './template-input.ts';

/** The part of the wall that the sheets cover, drawn small inside `box`: sheets with their names, frames, screws, studs and datums. */
export function sheetMap(input: TemplateInput, plan: SheetPlan, datums: Datums, box: Rect): Primitive[] {
  const covered = coveredBy(plan, input);
  const { at, scaled, area } = fitted(covered, box);
  const top = area.y + area.height;
  const items: Primitive[] = [];
  for (const stud of input.wall.studs) {
    const { x } = at({ x: stud.xMm, y: 0 });
    if (x < area.x || x > area.x + area.width) continue;
    items.push(line('front', { x, y: area.y }, { x, y: top }, { colour: 'chalk', widthMm: 0.2, dashMm: stud.confirmed ? [2, 1] : [0.8, 1] }));
    if (!stud.confirmed) items.push(text('front', { x: x + 0.5, y: area.y + 1 }, '?', 3.4, { colour: 'chalk', weight: 'bold' }));
  }
  for (const sheet of plan.sheets) {
    // Each sheet is drawn to where the next one's cut edge comes: what is seen once they are taped.
    const r = scaled({ ...sheet.window, width: sheet.step.x, height: sheet.step.y });
    const size = Math.min(3.6, r.height * 0.35, r.width * 0.35);
    items.push(
      rectangle('front', r, { colour: 'grey', widthMm: 0.2 }),
      text('front', { x: r.x + 0.8, y: r.y + r.height - size * 0.95 }, sheet.name, size, { colour: 'grey' }),
    );
  }
  const size = Math.max(2.6, Math.min(6, area.width / 30));
  for (const frame of input.frames) {
    items.push(polygon('front', frame.outlineMm.map(at), { colour: 'ink', widthMm: 0.35 }));
    const middle = at(centroid(frame.outlineMm));
    items.push(text('front', { x: middle.x, y: middle.y - size * 0.35 }, frame.label, size, { anchor: 'middle', weight: 'bold' }));
    for (const screw of frame.hangers) items.push(circle('front', at(screw), 0.7, null, 'brass'));
  }
  const chain = { colour: 'ink' as const, widthMm: 0.2, dashMm: [3, 0.8, 0.6, 0.8] };
  const level = at({ x: 0, y: datums.levelMm }).y;
  const plumb = at({ x: datums.plumbMm, y: 0 }).x;
  items.push(
    line('front', { x: area.x, y: level }, { x: area.x + area.width, y: level }, chain),
    line('front', { x: plumb, y: area.y }, { x: plumb, y: top }, chain),
    rectangle('front', scaled({ x: 0, y: 0, width: input.wall.widthMm, height: input.wall.heightMm }), { colour: 'ink', widthMm: 0.6 }),
  );
  return [{ kind: 'clip', rect: area, items }, rectangle('front', area, { colour: 'grey', widthMm: 0.15 })];
}

/** The whole wall, smaller still, with the covered part marked. */
export function wallLocator(input: TemplateInput, plan: SheetPlan, box: Rect): Primitive[] {
  const wall = { x: 0, y: 0, width: input.wall.widthMm, height: input.wall.heightMm };
  const covered = coveredBy(plan, input);
  const { at, scaled } = fitted(boxRect([...cornersOf(wall), ...cornersOf(covered)]), { ...box, height: box.height - 5 });
  const whole = scaled(wall);
  return [
    ...input.frames.map((frame) => polygon('front', frame.outlineMm.map(at), { colour: 'ink', widthMm: 0.15 })),
    rectangle('front', whole, { colour: 'ink', widthMm: 0.4 }),
    rectangle('front', scaled(covered), { colour: 'grey', widthMm: 0.2, dashMm: [1, 0.7] }),
    text('front', { x: box.x, y: whole.y - 3.6 }, 'The wall, and the part mapped', 2.4, { colour: 'grey', maxWidthMm: box.width }),
  ];
}

function coveredBy(plan: SheetPlan, input: TemplateInput): Rect {
  if (plan.sheets.length === 0) return { x: 0, y: 0, width: input.wall.widthMm, height: input.wall.heightMm };
  return boxRect(plan.sheets.flatMap((s) => cornersOf(s.window)));
}

function boxRect(points: Point[]): Rect {
  const { left, right, bottom, top } = boxOf(points);
  return { x: left, y: bottom, width: right - left, height: top - bottom };
}

/** Scale and place that fit `part` of the wall into the middle of `box`. */
function fitted(part: Rect, box: Rect) {
  const scale = Math.min(box.width / part.width, box.height / part.height);
  const area: Rect = {
    x: box.x + (box.width - part.width * scale) / 2, y: box.y + box.height - part.height * scale,
    width: part.width * scale, height: part.height * scale,
  };
  const at = (p: Point): Point => ({ x: area.x + (p.x - part.x) * scale, y: area.y + (p.y - part.y) * scale });
  const scaled = (r: Rect): Rect => ({ ...at(r), width: r.width * scale, height: r.height * scale });
  return { area, at, scaled };
}
