import { createLedger } from '../ledger.ts';
import { piecesOf, type ArrangeAsk } from './ask.ts';
import { groundOf } from './ground.ts';
import { holds, judge, keyOf, type Candidate } from './judge.ts';
import { plansFor } from './plans.ts';

/** How far the trying has come, and what the last way tried came to; null where it had no room or had been found before. */
export interface ArrangeStep {
  tried: number;
  ways: number;
  candidate: Candidate | null;
}

/** Most candidates that are put before the checks in one go. */
export const mostCandidates = 24;

/** What candidates are ranked by, told to whoever chooses. */
export const rankedBy =
  'Ranked by frames placed, then fewest stops, fewest cautions, frames held by studs alone, hangers in studs, and how near the balance point lies to the middle of the shape. ' +
  'A number of ways are tried, not all there are, and each is moved as one along the wall to where it meets studs best. How it looks is for you to judge.';

/**
 * Tries ways to arrange what is asked, one at each step, so that a caller may show, stop or leave off between any two. Every candidate keeps
 * to the wall, off obstructions, and at least the reveal apart from all others. Ends at the last way, at `mostCandidates`, or once `isLate` says so.
 */
export function* arrange(ask: ArrangeAsk, isLate: () => boolean): Generator<ArrangeStep, void> {
  const ground = groundOf(ask.scene, ask.kind === 'fill' ? ask.area : null);
  const plans = plansFor(ask, ground);
  const asked = piecesOf(ask).length;
  const ledgerOf = createLedger();
  const seen = new Set<string>();
  let found = 0;
  for (const [i, plan] of plans.entries()) {
    if (isLate() || found >= mostCandidates) return;
    const puts = plan.make();
    const key = keyOf(puts);
    const fresh = puts.length > 0 && !seen.has(key);
    seen.add(key);
    const candidate = fresh ? judge(puts, plan.how, ask, ground, ledgerOf, asked) : null;
    if (candidate) found++;
    yield { tried: i + 1, ways: plans.length, candidate };
  }
}

/** Candidates, the best first, in the order that `rankedBy` tells. */
export function ranked(candidates: readonly Candidate[]): Candidate[] {
  const off = ({ balance }: Candidate): number => Math.round(Math.hypot(balance.acrossMm, balance.upMm));
  return [...candidates].sort((a, b) =>
    b.frames.length - a.frames.length
    || a.stops - b.stops
    || a.cautions - b.cautions
    || (a.studs && b.studs ? holds(b.studs, a.studs) : 0)
    || off(a) - off(b)
    || (a.key < b.key ? -1 : a.key > b.key ? 1 : 0));
}
