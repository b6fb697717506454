import { fitPhoto, type Fit } from './fit.ts';
import type { Knowledge } from './knowledge.ts';
import { unproject } from './wall-camera.ts';

/** Measures that cannot all be true: which one is out, where that can be told. */
export interface Contradiction {
  /** Null where the rest is too little to say which. */
  which: { what: 'mark' | 'length'; index: number; offMm: number } | null;
}

/** Past this a sum of squared misses happens by chance once in a thousand times (Wilson and Hilferty 1931). */
export function chanceLimit(freedom: number): number {
  const k = 2 / (9 * freedom);
  return freedom * (1 - k + 3.09 * Math.sqrt(k)) ** 3;
}

/**
 * Whether what is known contradicts itself: the marks and lengths miss by more than their sureness and the lens allow.
 * Then each mark and each length is left out in turn; the one without which the rest agrees far better than without any
 * other is named, with how far out it is (a mark: from where the others put it; a length: from what they make it).
 */
export function contradictionIn(fit: Fit, k: Knowledge, photo: { widthPx: number; heightPx: number }): Contradiction | null {
  const misfit = misfitOf(fit);
  if (fit.measures.freedom < 1 || fit.measures.chiSquared <= chanceLimit(fit.measures.freedom)) return null;
  const tried = [
    ...k.marks.map((_, index) => ({ what: 'mark' as const, index, rest: { ...k, marks: k.marks.filter((_, i) => i !== index) } })),
    ...k.lengths.map((_, index) => ({ what: 'length' as const, index, rest: { ...k, lengths: k.lengths.filter((_, i) => i !== index) } })),
  ].flatMap(({ what, index, rest }) => {
    // Three marks and less are another way of fitting, which the rest may not bear.
    if (what === 'mark' && k.marks.length >= 4 && rest.marks.length < 4) return [];
    if (rest.marks.length === 0) return [];
    const without = fitPhoto(rest, photo, fit.sure);
    return without && without.measures.freedom > 0 ? [{ what, index, without, misfit: misfitOf(without) }] : [];
  });
  tried.sort((a, b) => a.misfit - b.misfit);
  const [best, second] = tried;
  if (!best) return { which: null };
  const agrees = best.without.measures.chiSquared <= chanceLimit(best.without.measures.freedom) || best.misfit < misfit / 10;
  if (!agrees || (second && second.misfit < 4 * Math.max(best.misfit, 0.25))) return { which: null };
  return { which: { what: best.what, index: best.index, offMm: offBy(best.without, k, best) } };
}

const misfitOf = (fit: Fit) => fit.measures.chiSquared / fit.measures.freedom;

function offBy(fit: Fit, k: Knowledge, { what, index }: { what: 'mark' | 'length'; index: number }): number {
  const seen = (px: { x: number; y: number }) => unproject(fit.frame, fit.camera, px);
  const mark = k.marks[index];
  const length = k.lengths[index];
  if (what === 'mark' && mark) {
    const at = seen(mark.px);
    return Math.hypot(at.x - mark.mm.x, at.y - mark.mm.y);
  }
  if (!length) return NaN;
  const [a, b] = length.px.map(seen) as [{ x: number; y: number }, { x: number; y: number }];
  return Math.abs(Math.hypot(a.x - b.x, a.y - b.y) - length.mm);
}

/** A contradiction in words; `tell` writes a length in the reader's units. */
export function contradictionWords(c: Contradiction, tell: (mm: number) => string): string {
  if (!c.which) return 'These measures contradict one another, and there are too few of them to say which is wrong. Measure them again, or add one more mark.';
  const { what, index, offMm } = c.which;
  const name = `${what === 'mark' ? 'Mark' : 'Length'} ${index + 1}`;
  return `${name} contradicts all the others by ${tell(offMm)}; without it they agree. Measure it again, or take it away.`;
}
