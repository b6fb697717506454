import { contradictionWords } from '../../../shared/walls/contradiction.ts';
import type { FitReport } from '../../../shared/walls/fit-report.ts';
import { nextMeasureWords } from '../../../shared/walls/next-measure.ts';
import { pictureTroubles } from '../../../shared/walls/picture-fitness.ts';
import { lensWords } from '../../../shared/walls/wall-camera.ts';
import { formatLength } from '../../../shared/units/length.ts';
import { Notice } from '../../components/notice.tsx';
import { useUnits } from '../../lib/units.ts';
import { errorWords, measureWords } from './error-words.ts';

/** What a template needs, mm: a screw's own play in its hole and a stud's half width bear this (common practice). */
const wantedMm = 3;

/** How far the picture may be out, where, what the lens did, what contradicts, and what to measure next. */
export function FitFacts({ report, sharpness }: { report: FitReport; sharpness: number | null }) {
  const units = useUnits();
  const tell = measureWords(units, (mm) => formatLength(mm, units));
  const { expectedErrorMm: expected, lens, contradiction } = report;
  const troubles = pictureTroubles({ pxPerMm: report.photoPxPerMm, sharpness }, report.surePx, wantedMm, (mm) => errorWords(mm, units));
  const at = (mm: number) => formatLength(Math.round(mm), units);
  return (
    <div className="grid gap-2 text-ink-900">
      <p>
        <strong>Out by at most {errorWords(expected.worst, units)}</strong>, nineteen times in twenty, and that {at(expected.worstAt.x)} from the left and {at(expected.worstAt.y)} above the floor; over half of the picture by at most{' '}
        {errorWords(expected.middle, units)}.
      </p>
      <p className="text-sm text-ink-700">
        {lens.state === 'fitted'
          ? `${lensWords(lens.lambda)} Told to ±${lens.spreadPercent.toFixed(2)} %.`
          : lens.why === 'too unsure'
            ? 'The lens could not be told surely from this, and is taken for straight. The error above allows for a lens as phones usually have; a wide-angle lens can bend far more.'
            : 'The lens is taken for straight, since nothing marked tells of it. The error above allows for a lens as phones usually have; a wide-angle lens can bend far more. Mark a straight edge or a fifth point, or check a length, to be sure.'}
      </p>
      {contradiction ? (
        <Notice kind="stop" live>
          {contradictionWords(contradiction, tell)}
        </Notice>
      ) : null}
      <p className="text-sm text-ink-700">{nextMeasureWords(report.next, tell)}</p>
      {troubles.map((words) => (
        <Notice key={words} kind="caution">
          {words}
        </Notice>
      ))}
    </div>
  );
}
