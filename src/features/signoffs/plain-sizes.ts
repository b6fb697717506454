import { boxOf, type Box } from '../../../shared/geometry/polygon.ts';
import { byLabel } from '../../../shared/layouts/naming.ts';
import { placedOutline } from '../../../shared/patterns/hangers.ts';
import { shapeWords } from '../../../shared/patterns/shape-words.ts';
import type { Snapshot } from '../../../shared/signoffs/snapshot.ts';
import { formatLength } from '../../../shared/units/length.ts';

export interface PlainSizes {
  /** Where the whole arrangement is and how large, one sentence each. */
  whole: string[];
  /** One line for each pattern used: how many, what shape, what wood, which labels. */
  frames: { name: string; words: string; labels: string }[];
}

/** What a client should know of a revision's sizes, in words; lengths in the shop's units. */
export function plainSizes({ frames, patterns, wall }: Pick<Snapshot, 'frames' | 'patterns' | 'wall'>, units: 'in' | 'mm'): PlainSizes {
  const l = (mm: number) => formatLength(mm, units);
  const designs = new Map(patterns.map((pattern) => [pattern.id, pattern]));
  const boxes = frames.flatMap((frame) => {
    const pattern = designs.get(frame.patternId);
    return pattern ? [boxOf(placedOutline(frame, pattern.design))] : [];
  });
  const whole = wholeBox(boxes);
  const deepest = Math.max(...patterns.filter((p) => frames.some((f) => f.patternId === p.id)).map((p) => p.design.depthMm));
  return {
    whole: whole
      ? [
          `${frames.length === 1 ? 'One frame' : `${frames.length} frames`}, ${l(whole.right - whole.left)} wide and ${l(whole.top - whole.bottom)} high over all.`,
          `The lowest point is ${l(whole.bottom)} above the floor, the highest ${l(wall.heightMm - whole.top)} below the ceiling.`,
          `${l(whole.left)} clear at the left end of the wall, ${l(wall.widthMm - whole.right)} at the right.`,
          `The deepest frame stands ${l(deepest)} off the wall.`,
        ]
      : ['There are no frames on this wall yet.'],
    frames: patterns.flatMap(({ id, name, design }) => {
      const used = frames.filter((frame) => frame.patternId === id).sort(byLabel);
      if (used.length === 0) return [];
      const words = `${used.length} × ${shapeWords(design.shape, units)}; ${design.species}, ${l(design.thicknessMm)} thick, ${l(design.depthMm)} deep`;
      return [{ name, words: words + panelWords(design.groove), labels: used.map(({ label }) => label).join(', ') }];
    }),
  };
}

function panelWords(groove: { mirrorMm: number; backerMm: number } | null): string {
  if (!groove) return '';
  if (groove.mirrorMm > 0) return '; with a mirror';
  return groove.backerMm > 0 ? '; with a back panel' : '';
}

function wholeBox(boxes: readonly Box[]): Box | null {
  const [first, ...rest] = boxes;
  if (!first) return null;
  return rest.reduce(
    (all, b) => ({ left: Math.min(all.left, b.left), bottom: Math.min(all.bottom, b.bottom), right: Math.max(all.right, b.right), top: Math.max(all.top, b.top) }),
    first,
  );
}
