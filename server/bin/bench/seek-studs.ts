import { performance } from 'node:perf_hooks';
import { allowedShifts, type WallOutline } from '../../../shared/hanging/allowed-shifts.ts';
import { seekStuds, type SeekInput } from '../../../shared/hanging/seek-studs.ts';

/** Numbers between 0 and 1 that are the same at every run (linear congruential, constants of Numerical Recipes). */
function evenNumbers(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 2 ** 32;
  };
}

/** A wall of 8.2 m with studs 16 in on centre and frames of two hangers each, of no order whatever. */
function wall(frames: number, studs: number, reachMm: number): SeekInput {
  const next = evenNumbers(7);
  const hangers = Array.from({ length: frames }, (_, f) => {
    const x = 300 + next() * 7600;
    // Every other frame is wide enough to reach from stud to stud.
    return (f % 2 === 0 ? [-203.2, 203.2] : [-60, 60]).map((side) => ({ id: `${f} ${side}`, frameId: `${f}`, xMm: x + side, slide: [-25, 25] as const, edgeMm: 7.2 }));
  }).flat();
  return {
    hangers,
    zones: Array.from({ length: studs }, (_, k) => ({ studId: `${k}`, xMm: 100 + k * 406.4, halfMm: 19.05 - 3 })),
    allowed: [[-reachMm, reachMm]],
  };
}

/** The plain way: every tenth of a millimetre, told anew. */
function scan(input: SeekInput): { frames: number; hangers: number; margin: number } {
  let best = { frames: -1, hangers: -1, margin: -Infinity };
  for (const [from, to] of input.allowed) {
    for (let tenth = Math.ceil(from * 10); tenth <= to * 10; tenth++) {
      const shift = tenth / 10;
      const met = new Map<string, boolean>();
      let count = 0;
      let least = Infinity;
      for (const h of input.hangers) {
        let margin = -Infinity;
        for (const z of input.zones) {
          const wanted = z.xMm - h.xMm - shift;
          margin = Math.max(margin, z.halfMm - h.edgeMm - Math.abs(wanted - Math.min(Math.max(wanted, h.slide[0]), h.slide[1])));
        }
        const inStud = margin >= 0;
        met.set(h.frameId, (met.get(h.frameId) ?? true) && inStud);
        if (inStud) {
          count++;
          least = Math.min(least, margin);
        }
      }
      const held = [...met.values()].filter(Boolean).length;
      if (held > best.frames || (held === best.frames && (count > best.hangers || (count === best.hangers && least > best.margin)))) {
        best = { frames: held, hangers: count, margin: least };
      }
    }
  }
  return best;
}

/** Middle and shortest of several runs, ms: on a busy machine the shortest tells more of the work itself. */
function timed(runs: number, work: () => unknown): { middle: number; shortest: number } {
  for (let i = 0; i < 5; i++) work();
  const times = Array.from({ length: runs }, () => {
    const from = performance.now();
    work();
    return performance.now() - from;
  });
  times.sort((a, b) => a - b);
  return { middle: times[Math.floor(runs / 2)] ?? NaN, shortest: times[0] ?? NaN };
}

/** Times the seek on a large wall, beside trying every tenth of a millimetre. Goal: 300 frames on 20 studs in under 5 ms. */
export async function run(): Promise<string[]> {
  const lines: string[] = [];
  for (const [frames, reach] of [[30, 200], [300, 200], [300, 2000]] as const) {
    const input = wall(frames, 20, reach);
    const sought = timed(51, () => seekStuds(input));
    const from = performance.now();
    const plain = scan(input);
    const scanned = performance.now() - from;
    const { score, ties } = seekStuds(input);
    const same = score?.framesHeld === plain.frames && score.hangersInStuds >= plain.hangers ? 'no worse' : 'WORSE';
    lines.push(
      `${frames} frames, 20 studs, ±${reach} mm: ${sought.middle.toFixed(2)} ms, at best ${sought.shortest.toFixed(2)} (scan by 0.1 mm ${scanned.toFixed(0)} ms, ${Math.round(scanned / sought.middle)} times as long; ` +
        `${same}: ${score?.framesHeld} frames and ${score?.hangersInStuds} hangers held, ${ties.length} tied)`,
    );
  }
  const hexagon = (x: number, y: number): WallOutline =>
    Array.from({ length: 6 }, (_, k) => [x + 120 * Math.cos((k * Math.PI) / 3), y + 120 * Math.sin((k * Math.PI) / 3)] as const);
  const outlines = Array.from({ length: 300 }, (_, i) => hexagon(300 + (i % 30) * 200, 300 + Math.floor(i / 30) * 220));
  const obstructions = Array.from({ length: 20 }, (_, i) => ({
    outlineMm: [[400 * i, 250], [400 * i + 70, 250], [400 * i + 70, 365], [400 * i, 365]] as WallOutline, clearanceMm: 30,
  }));
  const clear = timed(31, () => allowedShifts(outlines, 8200, obstructions));
  lines.push(`allowed shifts, 300 hexagons and 20 outlets: ${clear.middle.toFixed(2)} ms, at best ${clear.shortest.toFixed(2)}`);
  return lines;
}
