/** A closed range of shifts. */
export type Range = readonly [from: number, to: number];

/** Sorts and joins ranges that overlap or touch. */
export function mergeRanges(ranges: readonly Range[]): Range[] {
  const sorted = [...ranges].sort((a, b) => a[0] - b[0]);
  const merged: [number, number][] = [];
  for (const [from, to] of sorted) {
    const last = merged[merged.length - 1];
    if (last && from <= last[1]) last[1] = Math.max(last[1], to);
    else merged.push([from, to]);
  }
  return merged;
}

/** A frame's hangers by index, and how many of them must be in studs. */
export interface FrameNeed {
  members: readonly number[];
  needed: number;
}

/**
 * Ranges of allowed shifts with the most frames held and, among those, the most hangers in studs, left to right.
 * `spans[i]` are the merged closed ranges in which hanger i is in a stud. As all ranges are closed, counts at an end are never less
 * than just beside it, so the best shifts form closed ranges whose ends are ends of the given ones.
 */
export function bestCounts(spans: readonly (readonly Range[])[], frames: readonly FrameNeed[], allowed: readonly Range[]): Range[] {
  if (allowed.length === 0) return [];
  const held = frames.flatMap((f) => heldRanges(f.members.map((i) => spans[i] ?? []), f.needed));
  const hangerStart = ends(spans, 0);
  const hangerEnd = ends(spans, 1);
  const frameStart = ends([held], 0);
  const frameEnd = ends([held], 1);

  const best: [number, number][] = [];
  let bestFrames = -1;
  let bestHangers = -1;
  const offer = (framesHeld: number, hangersIn: number, from: number, to: number): void => {
    if (framesHeld < bestFrames || (framesHeld === bestFrames && hangersIn < bestHangers)) return;
    if (framesHeld > bestFrames || hangersIn > bestHangers) best.length = 0;
    bestFrames = framesHeld;
    bestHangers = hangersIn;
    const last = best[best.length - 1];
    if (last && from <= last[1]) last[1] = Math.max(last[1], to);
    else best.push([from, to]);
  };

  // Ranges begun up to and with x, less those ended before x (at a point) or up to and with x (just after it).
  let hs = 0;
  let he = 0;
  let fs = 0;
  let fe = 0;
  for (const [low, high] of allowed) {
    let x = low;
    for (;;) {
      while (hs < hangerStart.length && (hangerStart[hs] as number) <= x) hs++;
      while (fs < frameStart.length && (frameStart[fs] as number) <= x) fs++;
      while (he < hangerEnd.length && (hangerEnd[he] as number) < x) he++;
      while (fe < frameEnd.length && (frameEnd[fe] as number) < x) fe++;
      offer(fs - fe, hs - he, x, x);
      if (x >= high) break;
      // Just after x.
      while (he < hangerEnd.length && (hangerEnd[he] as number) <= x) he++;
      while (fe < frameEnd.length && (frameEnd[fe] as number) <= x) fe++;
      const next = Math.min(high, hangerStart[hs] ?? high, hangerEnd[he] ?? high, frameStart[fs] ?? high, frameEnd[fe] ?? high);
      offer(fs - fe, hs - he, x, next);
      x = next;
    }
  }
  return best;
}

/** One end of all ranges, in order. */
function ends(spans: readonly (readonly Range[])[], end: 0 | 1): Float64Array {
  let count = 0;
  for (const span of spans) count += span.length;
  const found = new Float64Array(count);
  let at = 0;
  for (const span of spans) for (const range of span) found[at++] = range[end];
  return found.sort();
}

/** Ranges in which at least `needed` of the given are entered at once. */
function heldRanges(members: readonly (readonly Range[])[], needed: number): Range[] {
  if (needed <= 0) return [[-Infinity, Infinity]];
  if (needed > members.length) return [];
  if (needed === members.length) return members.reduce<readonly Range[]>((a, b) => common(a, b), [[-Infinity, Infinity]]) as Range[];
  const starts = ends(members, 0);
  const stops = ends(members, 1);
  const found: Range[] = [];
  let s = 0;
  let e = 0;
  let since: number | null = null;
  // Starts before stops at one place: ranges that touch are both entered there.
  while (e < stops.length) {
    const start = starts[s] ?? Infinity;
    const stop = stops[e] as number;
    if (start <= stop) {
      s++;
      if (s - e === needed) since = start;
    } else {
      if (s - e === needed && since !== null) found.push([since, stop]);
      e++;
    }
  }
  return mergeRanges(found);
}

/** What two lists of merged ranges have in common. */
function common(a: readonly Range[], b: readonly Range[]): Range[] {
  const found: Range[] = [];
  let i = 0;
  let j = 0;
  while (i < a.length && j < b.length) {
    const [aFrom, aTo] = a[i] as Range;
    const [bFrom, bTo] = b[j] as Range;
    const from = Math.max(aFrom, bFrom);
    const to = Math.min(aTo, bTo);
    if (from <= to) found.push([from, to]);
    if (aTo < bTo) i++;
    else j++;
  }
  return found;
}
