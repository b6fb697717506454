import { parts, Reach, Studs, whole, type SeekHanger, type SeekPlace, type StudZone } from './hanger-reach.ts';
import { marginPeak } from './margin-peak.ts';
import { bestCounts, mergeRanges, type FrameNeed, type Range } from './shift-sweep.ts';

export interface SeekInput {
  hangers: readonly SeekHanger[];
  zones: readonly StudZone[];
  /** Shifts that keep the layout on the wall and clear of obstructions; closed ranges, mm. */
  allowed: readonly Range[];
  /** How many hangers of a frame must meet studs; all of them where nothing is said. */
  neededByFrame?: Readonly<Record<string, number>>;
  /** How lengths are written in the words of each place; mm unless told otherwise. */
  lengthText?: (mm: number) => string;
}

/** What a shift achieves, in the order in which it is judged. */
export interface SeekScore {
  framesHeld: number;
  frames: number;
  hangersInStuds: number;
  hangers: number;
  /** Least margin among the hangers in studs, mm; null when none is. */
  leastMarginMm: number | null;
}

export interface SeekResult {
  /** The winning shift; null when no shift is allowed. */
  shiftMm: number | null;
  score: SeekScore | null;
  places: SeekPlace[];
  /** Shifts as good but for their length, the winner's own range among them, left to right. */
  ties: { fromMm: number; toMm: number }[];
  /** As drawn: no shift, no slide; and with slides alone. */
  today: SeekScore;
  slidOnly: SeekScore;
}

/**
 * The shift of the whole layout that wins, in order: most frames with all needed hangers in studs, most hangers in studs, largest
 * least margin, shortest way. Exact: the counts change only where an interval of shifts begins or ends, and between those the least
 * margin is piecewise linear. Of two equal shifts to either side the one to the right is taken.
 */
export function seekStuds(input: SeekInput): SeekResult {
  const studs = new Studs(input.zones);
  const allowed = mergeRanges(input.allowed.map(([from, to]): Range => [whole(from), whole(to)]).filter(([from, to]) => from <= to));
  const hangers = input.hangers.map((h) => new Reach(h, studs));
  const frames = framesOf(hangers, input.neededByFrame ?? {});
  const today = scoreOf(hangers.map((h) => h.marginAsDrawn()), frames);
  const slidOnly = scoreOf(hangers.map((h) => h.best(0).margin), frames);

  const spans = hangers.map((h) => h.ranges(allowed));
  const best = bestCounts(spans, frames, allowed);
  if (best.length === 0) return { shiftMm: null, score: null, places: [], ties: [], today, slidOnly };

  let peak = -Infinity;
  let ties: Range[] = [];
  for (const [from, to] of best) {
    const found = marginPeak(hangers, from, to, peak);
    if (!found || found.margin < peak) continue;
    if (found.margin > peak) ties = [];
    peak = found.margin;
    ties.push(...found.at);
  }
  ties = mergeRanges(ties);
  const shift = shortest(ties);
  return {
    shiftMm: shift / parts,
    score: scoreOf(hangers.map((h) => h.best(shift).margin), frames),
    places: hangers.map((h) => h.place(shift, input.lengthText)),
    ties: ties.map(([from, to]) => ({ fromMm: from / parts, toMm: to / parts })),
    today,
    slidOnly,
  };
}

function framesOf(hangers: readonly Reach[], needed: Readonly<Record<string, number>>): FrameNeed[] {
  const byId = new Map<string, number[]>();
  hangers.forEach((h, i) => {
    const members = byId.get(h.hanger.frameId);
    if (members) members.push(i);
    else byId.set(h.hanger.frameId, [i]);
  });
  return [...byId].map(([id, members]) => ({ members, needed: needed[id] ?? members.length }));
}

function scoreOf(margins: readonly number[], frames: readonly FrameNeed[]): SeekScore {
  const inside = margins.filter((m) => m >= 0);
  return {
    framesHeld: frames.filter((f) => f.members.filter((i) => (margins[i] ?? -1) >= 0).length >= f.needed).length,
    frames: frames.length,
    hangersInStuds: inside.length,
    hangers: margins.length,
    leastMarginMm: inside.length === 0 ? null : inside.reduce((a, b) => Math.min(a, b)) / parts,
  };
}

function shortest(ranges: readonly Range[]): number {
  let best = Infinity;
  for (const [from, to] of ranges) {
    const near = Math.min(Math.max(0, from), to);
    if (Math.abs(near) < Math.abs(best) || (Math.abs(near) === Math.abs(best) && near > best)) best = near;
  }
  return best;
}
