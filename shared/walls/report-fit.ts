import { accuracyOver, residualsOf } from './accuracy.ts';
import { contradictionIn } from './contradiction.ts';
import type { ElevationPlan } from './elevation-plan.ts';
import type { Fit } from './fit.ts';
import type { FitReport } from './fit-report.ts';
import type { Knowledge } from './knowledge.ts';
import { cornerPercent } from './lens.ts';
import { nextMeasure } from './next-measure.ts';

/** The report of a fit over the part of the wall that its elevation shows; null where the photo shows none of it. */
export function fitReport(fit: Fit, k: Knowledge, photo: { widthPx: number; heightPx: number }, plan: ElevationPlan): FitReport | null {
  const over = accuracyOver(fit, photo, plan);
  if (!over) return null;
  const { verdict } = fit;
  return {
    residuals: residualsOf(fit, k.marks),
    lens: verdict.state === 'fitted'
      ? { state: 'fitted', lambda: verdict.lambda, cornerPercent: cornerPercent(verdict.lambda), spreadPercent: cornerPercent(verdict.spread) }
      : verdict,
    expectedErrorMm: { worst: over.worstMm, worstAt: over.worstAt, middle: over.middleMm, grid: { ...over.grid, values: over.grid.values.map((v) => v && Math.round(v * 100) / 100) } },
    next: nextMeasure(fit, photo, plan, k.marks),
    contradiction: contradictionIn(fit, k, photo),
    photoPxPerMm: plan.photoPxPerMm,
    surePx: fit.sure.px,
  };
}
