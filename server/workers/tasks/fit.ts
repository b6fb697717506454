import { elevationPlanOf, type ElevationPlan } from '../../../shared/walls/elevation-plan.ts';
import { fitPhoto } from '../../../shared/walls/fit.ts';
import type { FitReport } from '../../../shared/walls/fit-report.ts';
import type { Knowledge } from '../../../shared/walls/knowledge.ts';
import { marksTrouble } from '../../../shared/walls/marks.ts';
import { fitReport } from '../../../shared/walls/report-fit.ts';

export interface FitInput {
  known: Knowledge;
  photo: { widthPx: number; heightPx: number };
  wall: { widthMm: number; heightMm: number };
}

export type FitResult =
  | { state: 'fitted'; plan: ElevationPlan; report: FitReport }
  /** Words for whoever set the marks, and which of them are meant, counted from 0. */
  | { state: 'refused'; words: string; marks: number[] };

/** Fits the camera to what is known and plans the elevation; in a worker, for leaving each measure out in turn takes a while. */
export default function fit({ known, photo, wall }: FitInput): FitResult {
  const trouble = known.marks.length >= 4 ? marksTrouble(known.marks, photo) : null;
  if (trouble) return { state: 'refused', words: trouble.words, marks: trouble.which };
  const fitted = fitPhoto(known, photo);
  const first = known.marks[0];
  if (!fitted || !first) {
    return { state: 'refused', marks: [], words: 'These lines and lengths do not tell how the wall stands. Draw the plumb lines far apart and the level lines far apart, and give a length across and one up.' };
  }
  const plan = elevationPlanOf(fitted, first.mm, photo, wall);
  const report = plan && fitReport(fitted, known, photo, plan);
  if (!plan || !report) {
    return { state: 'refused', marks: [], words: 'By these positions the photo shows nothing of the wall. Check the marks’ positions and the wall’s width and height.' };
  }
  return { state: 'fitted', plan, report };
}
