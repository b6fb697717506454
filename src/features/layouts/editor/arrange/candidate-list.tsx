import type { Box } from '../../../../../shared/geometry/polygon.ts';
import type { Candidate } from '../../../../../shared/findings/arrange/judge.ts';
import type { Frame } from '../../../../../shared/layouts/layout.ts';
import type { LengthUnits } from '../../../../../shared/units/constants.ts';
import { formatLength } from '../../../../../shared/units/length.ts';
import type { Wall } from '../../../../../shared/walls/wall.ts';
import { WeightMark } from '../../../../components/weight-mark.tsx';
import { useUnits } from '../../../../lib/units.ts';
import type { Designs } from '../state/designs.ts';
import { CandidatePicture } from './candidate-picture.tsx';

interface Props {
  candidates: readonly Candidate[];
  picked: Candidate | null;
  onPick: (key: string) => void;
  wall: Wall;
  designs: Designs;
  staying: readonly Frame[];
  area: Box | null;
}

/** The candidates as drawings with their figures; one is picked. */
export function CandidateList({ candidates, picked, onPick, wall, designs, staying, area }: Props) {
  const units = useUnits();
  return (
    <fieldset>
      <legend className="sr-only">Candidates, the best first</legend>
      <div className="grid grid-cols-1 gap-3 lg:grid-cols-2 xl:grid-cols-3">
        {candidates.map((candidate, i) => (
          <label key={candidate.key} className={`block cursor-pointer border p-2 text-sm has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-chalk-600 ${candidate === picked ? 'border-chalk-600 bg-chalk-100' : 'border-plaster-200 bg-white hover:border-chalk-600'}`}>
            <CandidatePicture wall={wall} designs={designs} staying={staying} frames={candidate.frames} area={area} />
            <span className="mt-2 flex items-start gap-2">
              <input type="radio" name="arrange-candidate" checked={candidate === picked} onChange={() => onPick(candidate.key)} className="mt-0.5 size-5 shrink-0 accent-chalk-600" />
              <span className="font-semibold">
                {i + 1}. {candidate.how}
              </span>
            </span>
            <Figures candidate={candidate} units={units} />
          </label>
        ))}
      </div>
    </fieldset>
  );
}

function Figures({ candidate: { frames, asked, stops, cautions, studs, balance, size, shiftMm }, units }: { candidate: Candidate; units: LengthUnits }) {
  const length = (mm: number) => formatLength(Math.abs(mm), units);
  return (
    <span className="mt-1 block text-ink-700 tabular-nums">
      {frames.length < asked ? <span className="block font-semibold text-ochre-600">{frames.length} of {asked} frames found room</span> : null}
      <span className="flex flex-wrap gap-x-3">
        {stops === 0 && cautions === 0 ? <span className="font-semibold text-sage-600">No stops, no cautions</span> : null}
        {stops > 0 ? <span className="inline-flex items-center gap-1"><WeightMark weight="stop" wordHidden />{stops === 1 ? '1 stop' : `${stops} stops`}</span> : null}
        {cautions > 0 ? <span className="inline-flex items-center gap-1"><WeightMark weight="caution" wordHidden />{cautions === 1 ? '1 caution' : `${cautions} cautions`}</span> : null}
      </span>
      <span className="block">{studs ? `${studs.hangersInStuds} of ${studs.hangers} hangers in studs; ${studs.framesHeld} of ${studs.frames} frames held by studs alone` : 'No studs to meet'}</span>
      <span className="block">
        Balance point {Math.round(Math.hypot(balance.acrossMm, balance.upMm)) === 0 ? 'in the middle of the shape' : `${length(balance.acrossMm)} to the ${balance.acrossMm < 0 ? 'left' : 'right'}, ${length(balance.upMm)} ${balance.upMm < 0 ? 'below' : 'over'} the middle`}
      </span>
      <span className="block">
        {length(size.widthMm)} × {length(size.heightMm)}, middle {length(size.middleAboveFloorMm)} above floor
        {Math.abs(shiftMm) > 0.05 ? `; shifted ${length(shiftMm)} ${shiftMm < 0 ? 'left' : 'right'} to the studs` : ''}
      </span>
    </span>
  );
}
