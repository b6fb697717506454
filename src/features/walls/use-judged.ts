import { useDeferredValue, useEffect, useMemo, useState } from 'react';
import type { FitReport } from '../../../shared/walls/fit-report.ts';
import { fitReport } from '../../../shared/walls/report-fit.ts';
import { residualsOf } from '../../../shared/walls/accuracy.ts';
import type { Photo, Wall } from '../../../shared/walls/wall.ts';
import { judge, type Judged, type PhotoDraft } from './photo-draft.ts';

/** Leaving each measure out in turn takes a while: it waits until nothing has moved for so long. */
const restMs = 350;

/** What the draft is worth as it stands: the camera it gives follows the hand, the full report comes when the hand rests. */
export function useJudged(draft: PhotoDraft, photo: Photo, wall: Pick<Wall, 'widthMm' | 'heightMm'>): { judged: Judged; report: FitReport | null; residualsMm: number[] | null } {
  const lazy = useDeferredValue(draft);
  const { widthMm, heightMm } = wall;
  const judged = useMemo(() => judge(lazy, photo, { widthMm, heightMm }), [lazy, photo, widthMm, heightMm]);
  const [reported, setReported] = useState<{ of: Judged; report: FitReport | null } | null>(null);
  useEffect(() => {
    if (judged.state !== 'fit') return;
    const timer = setTimeout(() => setReported({ of: judged, report: fitReport(judged.fit, judged.known, photo, judged.plan) }), restMs);
    return () => clearTimeout(timer);
  }, [judged, photo]);
  const residualsMm = useMemo(
    // With nothing to spare the marks agree exactly, whatever they are.
    () => (judged.state === 'fit' && judged.fit.measures.freedom > 0 ? residualsOf(judged.fit, judged.known.marks).map((r) => r.mm) : null),
    [judged],
  );
  return { judged, report: reported?.of === judged ? reported.report : null, residualsMm };
}
