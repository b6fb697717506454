import { boxOf, type Point } from '../../geometry/polygon.ts';
import { movedPut, piecesOf, putAt, type ArrangeAsk, type Piece, type Put } from './ask.ts';
import { chanceOf, type Chance } from './chance.ts';
import { circles } from './circles.ts';
import type { Ground } from './ground.ts';
import { grow } from './grow.ts';
import { combCounts, dealt, evenCounts, largestInTheMiddle, rows, sizeOf, type LinesRun } from './rows.ts';

/** One way to try: its name in words, and the frames it comes to (none where it has no room). */
export interface Plan {
  how: string;
  make: () => Put[];
}

/** The ways tried for what is asked, the likeliest first. Chance comes from the seed alone. */
export function plansFor(ask: ArrangeAsk, ground: Ground): Plan[] {
  const pieces = piecesOf(ask);
  if (pieces.length === 0) return [];
  const chance = chanceOf(ask.seed);
  switch (ask.kind) {
    case 'rows':
      return rowPlans(pieces, ask, ground, chance);
    case 'ring':
      return ringPlans(pieces, ask, ground, chance);
    case 'drift':
      return driftPlans(pieces, ask, ground, chance);
    case 'fill':
      return fillPlans(pieces, ask, ground, chance);
  }
}

const bySize = (pieces: readonly Piece[]): Piece[] => [...pieces].sort((a, b) => b.radiusMm - a.radiusMm);
const turnsOf = (ask: ArrangeAsk): boolean[] => (ask.mayTurn ? [false, true] : [false]);
/** Pieces all alike have one order. */
const ordersOf = (pieces: readonly Piece[], orders: Piece[][]): Piece[][] => (new Set(pieces).size === 1 ? orders.slice(0, 1) : orders);
/** Most lines tried. */
const mostLines = 9;

function rowPlans(pieces: readonly Piece[], ask: ArrangeAsk, ground: Ground, chance: Chance): Plan[] {
  const n = pieces.length;
  const plans: (Plan & { liking: number })[] = [];
  const orders = ordersOf(pieces, [chance.shuffled(pieces), largestInTheMiddle(pieces)]);
  for (const turned of turnsOf(ask)) {
    const size = sizeOf(pieces[0]!, turned);
    for (const run of ['across', 'up'] as LinesRun[]) {
      for (let k = 1; k <= Math.min(n, mostLines); k++) {
        const combs = combCounts(n, k).slice(0, 2);
        const counted: { counts: number[]; staggered: boolean; words: string }[] = [
          ...combs.map((counts) => ({ counts, staggered: false, words: 'comb' })),
          ...(combs.some((c) => c.join() === evenCounts(n, k).join()) ? [] : [{ counts: evenCounts(n, k), staggered: false, words: 'even' }]),
          { counts: evenCounts(n, k), staggered: true, words: 'staggered' },
        ];
        for (const { counts, staggered, words } of counted) {
          const longest = Math.max(...counts);
          const across = size.acrossMm * (run === 'across' ? longest : k);
          const up = size.upMm * (run === 'across' ? k : longest);
          // Half as wide again as high reads well over furniture (common practice); the rest comes after.
          const liking = Math.abs(Math.log(across / up / 1.6)) + chance.next() * 0.6;
          for (const order of orders) {
            plans.push({
              liking,
              how: `${counts.length} ${run === 'across' ? (k === 1 ? 'row' : 'rows') : k === 1 ? 'column' : 'columns'}, ${words}${turned ? ', turned' : ''}`,
              make: () => ground.settled(centred(rows(dealt(order, counts), run, turned, staggered, ground.revealMm), ask.centre)) ?? [],
            });
          }
        }
      }
    }
  }
  return plans.sort((a, b) => a.liking - b.liking);
}

const centred = (puts: readonly Put[], { x, y }: Point): Put[] => puts.map((p) => movedPut(p, x, y));

function ringPlans(pieces: readonly Piece[], ask: ArrangeAsk, ground: Ground, chance: Chance): Plan[] {
  const orders = ordersOf(pieces, [bySize(pieces), chance.shuffled(pieces), bySize(pieces).reverse()]);
  const commonest = pieces.reduce((best, p) => (count(pieces, p) > count(pieces, best) ? p : best));
  const plans: Plan[] = [];
  // A place left free in the middle may lie over anything.
  const open: Ground = { ...ground, isFree: () => true };
  for (const left of [0, 1, 7, 3]) {
    for (const turned of turnsOf(ask)) {
      for (const order of orders) {
        const tilt = chance.next() * 2 * Math.PI;
        const cost = (at: Point): number => Math.hypot(at.x - ask.centre.x, at.y - ask.centre.y) * (1 + 0.04 * Math.cos(Math.atan2(at.y - ask.centre.y, at.x - ask.centre.x) - tilt));
        const startTurnRad = turned ? commonest.stepRad : 0;
        const growing = { start: ask.centre, startTurnRad, mayTurn: ask.mayTurn, cost, neighbourMm: 0 };
        plans.push({
          how: `Rings of a comb, ${left === 0 ? 'closed in the middle' : `room for ${left} left in the middle`}${turned ? ', turned' : ''}`,
          make: () => {
            const kept = grow({ ...growing, pieces: Array.from({ length: left }, () => commonest), ground: open });
            return grow({ ...growing, pieces: order, ground, kept });
          },
        });
      }
    }
  }
  for (const counts of circleCounts(pieces.length)) {
    for (const outwards of turnsOf(ask)) {
      for (const order of orders.slice(0, 2)) {
        plans.push({
          how: `${counts.filter((c) => c > 1).length === 1 ? 'A circle' : 'Circles'} of ${counts.join(' and ')}${outwards ? ', turned outwards' : ''}`,
          make: () => ground.settled(centred(circles(outwards ? order : [...order].reverse(), counts, outwards, ground.revealMm), ask.centre)) ?? [],
        });
      }
    }
  }
  return plans;
}

const count = (pieces: readonly Piece[], piece: Piece): number => pieces.filter((p) => p === piece).length;

/** One circle, a middle and a circle, or circles that hold twice and three times the first. */
function circleCounts(n: number): number[][] {
  const found: number[][] = [];
  if (n >= 3) found.push([n]);
  if (n >= 4) found.push([1, n - 1]);
  if (n >= 9) found.push([Math.round(n / 3), n - Math.round(n / 3)]);
  if (n >= 10) found.push([1, Math.round((n - 1) / 3), n - 1 - Math.round((n - 1) / 3)]);
  return found;
}

/** Drifts tried. */
const drifts = 18;

function driftPlans(pieces: readonly Piece[], ask: ArrangeAsk, ground: Ground, chance: Chance): Plan[] {
  const radius = pieces.reduce((s, p) => s + p.radiusMm, 0) / pieces.length;
  return Array.from({ length: drifts }, (_, i): Plan => {
    const own = chanceOf(ask.seed * 7919 + i * 104729 + 1);
    const order = i % 3 === 0 ? bySize(pieces) : own.shuffled(pieces);
    const rises = (own.next() - 0.5) * 0.9;
    const longer = 1.3 + own.next() * 1.2;
    const arms = 1 + own.below(4);
    const phase = own.next() * 2 * Math.PI;
    const loose = own.next() * 1.2;
    const turned = ask.mayTurn && chance.next() < 0.5;
    const cost = (at: Point): number => {
      const dx = at.x - ask.centre.x;
      const dy = at.y - ask.centre.y;
      const along = (dx * Math.cos(rises) + dy * Math.sin(rises)) / longer;
      const across = dy * Math.cos(rises) - dx * Math.sin(rises);
      return Math.hypot(along, across) * (1 + 0.35 * Math.sin(arms * Math.atan2(dy, dx) + phase)) + own.next() * loose * radius;
    };
    return {
      how: `Drift ${rises > 0.12 ? 'rising to the right' : rises < -0.12 ? 'falling to the right' : 'along the wall'}, ${loose > 0.6 ? 'loose' : 'close'}${turned ? ', turned' : ''}`,
      make: () => grow({ pieces: order, ground, start: ask.centre, startTurnRad: turned ? order[0]!.stepRad : 0, mayTurn: ask.mayTurn, cost, neighbourMm: radius * (0.9 - loose / 2) }),
    };
  });
}

function fillPlans(pieces: readonly Piece[], ask: ArrangeAsk, ground: Ground, chance: Chance): Plan[] {
  const { left, right, bottom, top } = ground.bounds;
  const middle = { x: (left + right) / 2, y: (bottom + top) / 2 };
  const from: { words: string; x: -1 | 0 | 1; y: -1 | 0 | 1 }[] = [
    { words: 'the lower left', x: -1, y: -1 }, { words: 'the lower right', x: 1, y: -1 }, { words: 'the upper left', x: -1, y: 1 },
    { words: 'the upper right', x: 1, y: 1 }, { words: 'the middle', x: 0, y: 0 }, { words: 'the foot', x: 0, y: -1 }, { words: 'the top', x: 0, y: 1 },
  ];
  const plans: Plan[] = [];
  for (const order of ordersOf(pieces, [bySize(pieces), chance.shuffled(pieces)])) {
    for (const { words, x, y } of from) {
      for (const turned of turnsOf(ask)) {
        const startTurnRad = turned ? order[0]!.stepRad : 0;
        const box = boxOf(putAt(order[0]!, 0, 0, startTurnRad).outline);
        const start = {
          x: x < 0 ? left - box.left : x > 0 ? right - box.right : middle.x,
          y: y < 0 ? bottom - box.bottom : y > 0 ? top - box.top : middle.y,
        };
        // Line after line from a side; in rings from the middle.
        const cost = x === 0 && y === 0
          ? (at: Point) => Math.hypot(at.x - middle.x, at.y - middle.y)
          : (at: Point) => Math.abs(at.y - start.y) + 0.25 * Math.abs(at.x - start.x);
        plans.push({
          how: `Packed from ${words}${turned ? ', turned' : ''}`,
          make: () => grow({ pieces: order, ground, start, startTurnRad, mayTurn: ask.mayTurn, cost, neighbourMm: order[0]!.radiusMm / 4 }),
        });
      }
    }
  }
  return plans;
}
