import { useRef } from 'react';
import type { Photo, Wall } from '../../../shared/walls/wall.ts';
import { Button } from '../../components/button.tsx';
import { ErrorState } from '../../components/error-state.tsx';
import { Notice } from '../../components/notice.tsx';
import { ProgressBar } from '../../components/progress-bar.tsx';
import { MarkPositions } from './mark-positions.tsx';
import { inThisOrder, judge, type MarkDraft, marksOf } from './marks-draft.ts';
import { PhotoMarks } from './photo-marks.tsx';
import { useStraighten } from './walls.queries.ts';

interface Props {
  wall: Wall;
  photo: Photo;
  /** Marks as moved and typed since the photo was last straightened; kept by the page, so that they outlive this panel. */
  moved: readonly MarkDraft[] | null;
  onMoved: (marks: MarkDraft[] | null) => void;
  onStraightened: () => void;
}

/** Four marks on the photo, their places on the wall, and the straightening. */
export function StraightenPanel({ wall, photo, moved, onMoved, onStraightened }: Props) {
  const marks = moved ?? marksOf(photo);
  const straighten = useStraighten(wall, photo.id);
  const calledOff = useRef<AbortController | null>(null);
  const judged = judge(marks, photo, wall);
  const run = () => {
    if (judged.state !== 'fit') return;
    const controller = new AbortController();
    calledOff.current = controller;
    straighten.mutate(
      { marks: judged.marks, signal: controller.signal },
      {
        onSuccess: () => {
          onMoved(null);
          onStraightened();
        },
      },
    );
  };
  const callOff = () => {
    calledOff.current?.abort();
    straighten.reset();
  };

  return (
    <div className="grid items-start gap-6 lg:grid-cols-[minmax(0,3fr)_minmax(20rem,2fr)]">
      <PhotoMarks
        photo={photo}
        marks={marks}
        wanting={judged.state === 'trouble' ? judged.trouble.which : []}
        onMove={(index, px) => onMoved(marks.map((m, i) => (i === index ? { ...m, px } : m)))}
      />
      <div className="grid gap-4">
        <MarkPositions marks={marks} onChange={onMoved} />
        {judged.state === 'trouble' ? (
          <Notice kind="caution" live>
            <p>{judged.trouble.words}</p>
            {judged.trouble.order ? (
              <Button small className="mt-2" onClick={() => onMoved(inThisOrder(marks, judged.trouble.order ?? []))}>
                Use this order
              </Button>
            ) : null}
          </Notice>
        ) : null}
        {straighten.isPending ? <ProgressBar label="Straightening the photo" share={null} /> : null}
        {straighten.error ? <ErrorState error={straighten.error} onRetry={run} /> : null}
        <div className="flex flex-wrap items-center gap-3">
          <Button weight="primary" busy={straighten.isPending} disabled={judged.state !== 'fit'} onClick={run}>
            Straighten the photo
          </Button>
          {straighten.isPending ? <Button onClick={callOff}>Cancel</Button> : null}
          <p className="text-sm text-ink-700" role="status">
            {judged.state === 'unfinished' ? 'Give all four positions first.' : judged.state === 'fit' ? `Each pixel will show ${judged.mmPerPx.toFixed(2)} mm of the wall.` : null}
          </p>
        </div>
      </div>
    </div>
  );
}
