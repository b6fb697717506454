import { mostArranged, type ArrangeAsk, type ArrangeKind } from '../../../../../shared/findings/arrange/ask.ts';
import { staying } from '../../../../../shared/findings/arrange/take.ts';
import type { Surroundings } from '../../../../../shared/findings/scene.ts';
import type { Bench } from '../../../../../shared/layouts/edits.ts';
import type { Frame } from '../../../../../shared/layouts/layout.ts';
import { pictureHeightsMm } from '../../../../../shared/layouts/picture-heights.ts';
import type { Designs } from '../state/designs.ts';

/** What has been typed: lengths in mm, null while empty, NaN while they cannot be read. */
export interface Wanted {
  counts: Readonly<Record<string, number>>;
  kind: ArrangeKind;
  centreX: number | null;
  centreY: number | null;
  left: number | null;
  right: number | null;
  bottom: number | null;
  top: number | null;
  mayTurn: boolean;
  inPlace: boolean;
  seed: number | null;
}

/** Round the wall's middle, at the height where pictures hang; the area is what lies within easy reach. */
export function firstWanted({ widthMm, heightMm }: { widthMm: number; heightMm: number }): Wanted {
  return {
    counts: {}, kind: 'rows',
    centreX: widthMm / 2, centreY: Math.min((pictureHeightsMm[0] + pictureHeightsMm[1]) / 2, heightMm / 2 + heightMm / 4),
    left: Math.round(widthMm * 0.1), right: Math.round(widthMm * 0.9), bottom: Math.round(heightMm * 0.3), top: Math.round(heightMm * 0.95),
    mayTurn: false, inPlace: false, seed: 1,
  };
}

export const totalOf = (counts: Wanted['counts']): number => Object.values(counts).reduce((sum, n) => sum + n, 0);

/** How many of each pattern hang there and are not locked. */
export function countsOf(frames: readonly Frame[]): Record<string, number> {
  const counts: Record<string, number> = {};
  for (const { locked, patternId } of frames) if (!locked) counts[patternId] = (counts[patternId] ?? 0) + 1;
  return counts;
}

/** What is typed as an ask, or what is wrong with it. */
export function askOf(wanted: Wanted, bench: Bench, around: Surroundings, designs: Designs): ArrangeAsk | { problem: string } {
  const total = totalOf(wanted.counts);
  if (total === 0) return { problem: 'Choose how many frames of which pattern.' };
  if (total > mostArranged) return { problem: `At most ${mostArranged} frames are arranged at once; these are ${total}.` };
  const seed = read(wanted.seed);
  if (seed === null || !Number.isInteger(seed)) return { problem: 'The seed is a whole number.' };
  const x = read(wanted.centreX);
  const y = read(wanted.centreY);
  if (wanted.kind !== 'fill' && (x === null || y === null)) return { problem: 'Say where the middle is to be.' };
  const [left, right, bottom, top] = [wanted.left, wanted.right, wanted.bottom, wanted.top].map(read) as [number | null, number | null, number | null, number | null];
  const area = left === null || right === null || bottom === null || top === null ? null : { left, right, bottom, top };
  if (wanted.kind === 'fill' && (!area || area.right <= area.left || area.top <= area.bottom)) return { problem: 'The area’s right is to be beyond its left, and its top over its foot.' };
  return {
    scene: {
      wall: around.wall, book: around.book, limits: around.limits, sheet: bench.sheet, frames: staying(bench.frames, wanted.inPlace),
      patterns: [...designs.values()].map(({ id, name, design }) => ({ id, name, design })), changedSinceSigned: false,
    },
    counts: Object.entries(wanted.counts).map(([patternId, count]) => ({ patternId, count })),
    kind: wanted.kind, centre: { x: x ?? 0, y: y ?? 0 }, area: wanted.kind === 'fill' ? area : null, mayTurn: wanted.mayTurn, seed,
  };
}

const read = (value: number | null): number | null => (value === null || Number.isNaN(value) ? null : value);
