import type { SeekInput } from '../../../shared/hanging/seek-studs.ts';

/** What one shift achieves, told apart from the sweep: hanger by hanger, zone by zone, straight from the rules. */
export interface Told {
  shiftMm: number;
  framesHeld: number;
  hangersInStuds: number;
  leastMarginMm: number;
}

/** What the computer's rounding may amount to, mm: far above its own error, below half of the millionths that sizes are told in. */
export const hairMm = 4e-7;

export function tellShift(input: SeekInput, shiftMm: number): Told {
  const metByFrame = new Map<string, { met: number; of: number }>();
  let hangersInStuds = 0;
  let leastMarginMm = Infinity;
  for (const h of input.hangers) {
    let margin = -Infinity;
    for (const z of input.zones) {
      // Slide towards the stud's centre as far as the allowance goes.
      const wanted = z.xMm - (h.xMm + shiftMm);
      const slide = Math.max(h.slide[0], Math.min(h.slide[1], wanted));
      margin = Math.max(margin, z.halfMm - h.edgeMm - Math.abs(wanted - slide));
    }
    const tally = metByFrame.get(h.frameId) ?? { met: 0, of: 0 };
    tally.of++;
    if (margin >= -hairMm) {
      tally.met++;
      hangersInStuds++;
      leastMarginMm = Math.min(leastMarginMm, margin);
    }
    metByFrame.set(h.frameId, tally);
  }
  let framesHeld = 0;
  for (const [id, { met, of }] of metByFrame) if (met >= (input.neededByFrame?.[id] ?? of)) framesHeld++;
  return { shiftMm, framesHeld, hangersInStuds, leastMarginMm };
}

/** Above zero when `a` is the better shift, below when `b` is, zero when they are as good. */
export function betterOf(a: Told, b: Told): number {
  if (a.framesHeld !== b.framesHeld) return a.framesHeld - b.framesHeld;
  if (a.hangersInStuds !== b.hangersInStuds) return a.hangersInStuds - b.hangersInStuds;
  if (a.hangersInStuds > 0 && Math.abs(a.leastMarginMm - b.leastMarginMm) > hairMm) return a.leastMarginMm - b.leastMarginMm;
  const way = Math.abs(b.shiftMm) - Math.abs(a.shiftMm);
  return Math.abs(way) > hairMm ? way : 0;
}

/** The best of all allowed shifts that are whole tenths of a millimetre. */
export function scan(input: SeekInput): Told | null {
  let best: Told | null = null;
  for (const [from, to] of input.allowed) {
    for (let tenth = Math.ceil(from * 10 - 1e-6); tenth <= to * 10 + 1e-6; tenth++) {
      const here = tellShift(input, tenth / 10);
      if (!best || betterOf(here, best) > 0) best = here;
    }
  }
  return best;
}
