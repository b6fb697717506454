import type { Segment } from '../geometry/point.ts';
import { holds, type Rect } from './drawing.ts';

/** Chooses places for labels on one sheet: inside it, off the lines, off each other. */
export class LabelPlaces {
  private readonly taken: Rect[] = [];

  constructor(
    private readonly window: Rect,
    private readonly lines: Segment[],
  ) {}

  /** Keeps labels off a place, as a screw's ring. */
  reserve(rect: Rect): void {
    this.taken.push(rect);
  }

  /** The best of the offered places, earlier ones first among equals; it is then taken. */
  choose(offered: Rect[]): Rect {
    let best = offered[0]!;
    let least = Infinity;
    for (const rect of offered) {
      const cost = this.cost(rect);
      if (cost < least) {
        best = rect;
        least = cost;
      }
    }
    this.taken.push(best);
    return best;
  }

  private cost(rect: Rect): number {
    const inside = holds(this.window, rect) && holds(this.window, { x: rect.x + rect.width, y: rect.y + rect.height });
    const hits = this.taken.filter((t) => overlap(t, rect)).length;
    const crossed = this.lines.filter((l) => crosses(l, rect)).length;
    return (inside ? 0 : 100) + hits * 10 + crossed * 2;
  }
}

function overlap(a: Rect, b: Rect): boolean {
  return a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height;
}

/** Whether a segment passes through a rectangle (Liang and Barsky's clipping). */
export function crosses({ from, to }: Segment, rect: Rect): boolean {
  let enter = 0;
  let leave = 1;
  const dx = to.x - from.x;
  const dy = to.y - from.y;
  const gates: [number, number][] = [
    [-dx, from.x - rect.x], [dx, rect.x + rect.width - from.x], [-dy, from.y - rect.y], [dy, rect.y + rect.height - from.y],
  ];
  for (const [run, room] of gates) {
    if (run === 0) {
      if (room < 0) return false;
    } else if (run < 0) enter = Math.max(enter, room / run);
    else leave = Math.min(leave, room / run);
  }
  return enter < leave;
}
