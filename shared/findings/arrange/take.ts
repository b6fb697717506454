import type { Edit, Frame } from '../../layouts/layout.ts';
import { nextLabel } from '../../layouts/naming.ts';
import type { Candidate } from './judge.ts';

/** What stays where it is while an arrangement is made: everything, or, in place of the rest, what is locked. */
export const staying = (frames: readonly Frame[], inPlace: boolean): Frame[] => frames.filter((f) => f.locked || !inPlace);

/**
 * The edits that put a candidate on the wall, beside what stands there or in place of all that is not locked. `newIds` has one id for
 * each of its frames; they are labelled on from the highest number that stays.
 */
export function takeEdits({ frames }: Candidate, standing: readonly Frame[], newIds: readonly string[], inPlace: boolean): Edit[] {
  const stay = staying(standing, inPlace);
  const gone = standing.filter((f) => !stay.includes(f)).map((before): Edit => ({ kind: 'frame', frameId: before.id, before, after: null }));
  const all: Frame[] = [...stay];
  // Numbered as one reads: from the top down, left to right within a hand's breadth.
  const read = [...frames].sort((a, b) => Math.round(b.yMm / 100) - Math.round(a.yMm / 100) || a.xMm - b.xMm);
  const put = read.map((frame, i): Edit => {
    const after: Frame = { ...frame, id: newIds[i]!, label: nextLabel(all) };
    all.push(after);
    return { kind: 'frame', frameId: after.id, before: null, after };
  });
  return [...gone, ...put];
}
