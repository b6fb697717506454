import type { Point } from '../geometry/point.ts';
import { centroid, sidesOf } from '../geometry/polygon.ts';
import { clippedTo } from '../geometry/polygon-overlap.ts';
import { formatLength } from '../units/length.ts';
import { cornersOf, text, type Primitive } from './drawing.ts';
import { drillText } from './hang-order.ts';
import { LabelPlaces } from './label-places.ts';
import { crossHairMm } from './sheets.ts';
import type { TemplateFrame, TemplateHanger, TemplateInput } from './template-input.ts';
import { estimateWidth } from './text-fitting.ts';
import { nearView, type View } from './wall-drawing.ts';

/** Names of frames and all that is said beside screws, kept off the lines, the holes and one another. */
export function labels(input: TemplateInput, frames: TemplateFrame[], view: View): Primitive[] {
  const { live, toPage, seen } = view;
  const inner = { x: live.x + 6.5, y: live.y + 5, width: seen.width - 7.5, height: seen.height - 6 };
  const pageOutlines = frames.map((f) => f.outlineMm.map(toPage));
  const lines = pageOutlines.flatMap(sidesOf);
  const places = new LabelPlaces(inner, lines);
  const screws = frames.flatMap((f) => f.hangers).filter((h) => nearView(h, view));
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
  // Screws speak for what they are even where their frames' names stand elsewhere.
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
