import { useMemo } from 'react';
import { formatLength } from '../../../shared/units/length.ts';
import { checkLength, checkWords } from '../../../shared/walls/accuracy.ts';
import type { Photo } from '../../../shared/walls/wall.ts';
import { Button } from '../../components/button.tsx';
import { LengthField } from '../../components/length-field.tsx';
import { Notice } from '../../components/notice.tsx';
import { useUnits } from '../../lib/units.ts';
import { endsOf, typed, type Check } from './check.ts';
import { errorWords } from './error-words.ts';
import { fitOf } from './photo-draft.ts';

/** Proves the picture: the length drawn over a thing against the one measured, with what may be expected. */
export function CheckLength({ photo, check, onChange, onClose }: { photo: Photo; check: Check; onChange: (check: Check) => void; onClose: () => void }) {
  const units = useUnits();
  const fit = useMemo(() => fitOf(photo), [photo]);
  const ends = endsOf(check);
  const tell = (mm: number) => (Math.abs(mm) < 80 ? errorWords(mm, units) : formatLength(Math.round(mm * 10) / 10, units));
  const result = fit && ends && typed(check.measuredMm) && check.measuredMm > 0 ? checkLength(fit, ends[0], ends[1], check.measuredMm) : null;
  const field = (label: string, key: keyof Check) => <LengthField label={label} value={check[key]} onChange={(mm) => onChange({ ...check, [key]: mm })} />;
  return (
    <fieldset className="grid gap-3 border border-plaster-200 bg-white p-4">
      <legend className="font-semibold text-ink-900">Check a length</legend>
      <p className="text-sm text-ink-700">Draw a line over a thing on the picture, or type its two ends, and give its length as you measure it on the wall.</p>
      <div className="grid grid-cols-2 items-end gap-3 sm:grid-cols-3 lg:grid-cols-5">
        {field('First end from the left', 'fromXMm')}
        {field('First end above the floor', 'fromYMm')}
        {field('Second end from the left', 'toXMm')}
        {field('Second end above the floor', 'toYMm')}
        {field('Length as measured', 'measuredMm')}
      </div>
      {ends ? <p className="text-sm text-ink-700 tabular-nums">Drawn length: {formatLength(Math.hypot(ends[1].x - ends[0].x, ends[1].y - ends[0].y), units)}</p> : null}
      {result ? (
        <Notice kind={result.agrees ? 'good' : 'caution'} live>
          {checkWords(result, tell)}
        </Notice>
      ) : null}
      <div>
        <Button small onClick={onClose}>
          Done checking
        </Button>
      </div>
    </fieldset>
  );
}
