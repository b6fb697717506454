import type { Point } from '../geometry/point.ts';
import { formatLength } from '../units/length.ts';
import { line, text, type Primitive, type Stroke } from './drawing.ts';

const lengths = {
  mm: { bars: [1000, 500, 300, 200, 150, 100, 50], tick: 10 },
  in: { bars: [36, 24, 18, 12, 8, 6, 4, 2].map((inches) => inches * 25.4), tick: 25.4 },
};
const bar: Stroke = { colour: 'ink', widthMm: 0.2 };
const endMm = 4;

/** Longest round bar that fits, mm. */
export function barLength(roomMm: number, units: 'in' | 'mm'): number {
  return lengths[units].bars.find((mm) => mm <= roomMm) ?? lengths[units].bars.at(-1)!;
}

/**
 * A bar whose end ticks stand exactly `lengthMm` apart once printed. `start` is its left (or lower) end on the page; `correction` is the
 * printer's factor on its axis, which the bar takes just as the drawing does.
 */
export function scaleBar(start: Point, lengthMm: number, axis: 'across' | 'up', units: 'in' | 'mm', correction: number): Primitive[] {
  const at = (along: number, aside: number): Point =>
    axis === 'across' ? { x: start.x + along * correction, y: start.y + aside } : { x: start.x - aside, y: start.y + along * correction };
  const items: Primitive[] = [line('scale', at(0, 0), at(lengthMm, 0), bar)];
  const { tick } = lengths[units];
  const count = Math.round(lengthMm / tick);
  for (let i = 0; i <= count; i += 1) {
    const isEnd = i === 0 || i === count;
    items.push(line('scale', at((lengthMm * i) / count, 0), at((lengthMm * i) / count, isEnd ? endMm : 1.4), bar));
  }
  const words = `This bar is ${formatLength(lengthMm, units)} ${axis === 'across' ? 'across' : 'up'}`;
  items.push(text('scale', at(lengthMm / 2, 2.2), words, 2.8, { anchor: 'middle', weight: 'bold', turnRad: axis === 'across' ? 0 : Math.PI / 2 }));
  return items;
}
