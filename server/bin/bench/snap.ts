import { placedAll, type Placement, type Point } from '../../../shared/geometry/polygon.ts';
import { edgeField, strongestSnap, type EdgeField, type Neighbour } from '../../../shared/layouts/snap.ts';

const side = 120;
const count = 1000;
const asked = 40;

/** Numbers that look thrown but are the same at every run (linear congruential, Numerical Recipes' constants). */
function thrower(seed: number): () => number {
  let state = seed >>> 0;
  return () => (state = (Math.imul(state, 1664525) + 1013904223) >>> 0) / 2 ** 32;
}

const hexagon: Point[] = Array.from({ length: 6 }, (_, i) => {
  const angle = (2 * Math.PI * i) / 6;
  return { x: side * Math.cos(angle), y: side * Math.sin(angle) };
});

/** 1,000 hexagons strewn over a wall, turned by steps of 30°, with room for one more between any two. */
function strewn(): { neighbours: Neighbour[]; places: Placement[] } {
  const next = thrower(20260301);
  const pitch = 4 * side;
  const places = Array.from({ length: count }, (_, i): Placement => ({
    xMm: (i % 40) * pitch + next() * 40, yMm: Math.floor(i / 40) * pitch + next() * 40, turnRad: (Math.floor(next() * 12) * Math.PI) / 6, flipped: false,
  }));
  return { places, neighbours: places.map((at, i) => ({ frameId: String(i), outline: placedAll(hexagon, at) })) };
}

/** Every edge and every frame looked at, whatever is asked. */
function everyEdge(neighbours: readonly Neighbour[]): EdgeField {
  const { edges } = edgeField(neighbours);
  return { neighbours, edges, near: () => [...edges], frames: () => [...neighbours] };
}

const median = (list: number[]) => [...list].sort((a, b) => a - b)[Math.floor(list.length / 2)] ?? 0;

/** How long a snap takes at 1,000 frames by the index, against looking at every edge; and whether both say the same. */
export function run(): Promise<string[]> {
  const { neighbours, places } = strewn();
  const builtFrom = performance.now();
  const field = edgeField(neighbours);
  const built = performance.now() - builtFrom;
  const slow = everyEdge(neighbours);
  const next = thrower(7);
  const asks = Array.from({ length: asked }, () => {
    const beside = places[Math.floor(next() * count)]!;
    // Held an apothem and an apothem apart, and a little more than the reveal.
    const way = next() * 2 * Math.PI;
    return {
      outline: hexagon, revealMm: 4, reachMm: 40, maxTurnRad: 0.35,
      placement: { xMm: beside.xMm + 1.9 * side * Math.cos(way), yMm: beside.yMm + 1.9 * side * Math.sin(way), turnRad: next(), flipped: false },
    };
  });
  const timed = (on: EdgeField) =>
    asks.map((ask) => {
      const from = performance.now();
      const snap = strongestSnap(on, ask);
      return { ms: performance.now() - from, at: JSON.stringify(snap?.placement ?? null) };
    });
  for (let warm = 0; warm < 5; warm++) timed(field);
  const quick = timed(field);
  const brute = timed(slow);
  const differ = quick.filter(({ at }, i) => at !== brute[i]!.at).length;
  const ratio = median(brute.map((t) => t.ms)) / median(quick.map((t) => t.ms));
  const taken = quick.filter(({ at }) => at !== 'null').length;
  return Promise.resolve([
    `${count} frames, ${asked} places asked, ${taken} of them snap; the index is built in ${built.toFixed(1)} ms`,
    `by the index ${median(quick.map((t) => t.ms)).toFixed(3)} ms, by every edge ${median(brute.map((t) => t.ms)).toFixed(2)} ms (median): ${ratio.toFixed(0)} times (goal: at least 50)`,
    differ === 0 ? 'both give the same answer at every place' : `THEY DIFFER at ${differ} places`,
  ]);
}
