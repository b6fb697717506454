import { useRef } from 'react';
import type { Photo, Wall } from '../../../shared/walls/wall.ts';
import { Button } from '../../components/button.tsx';
import { ErrorState } from '../../components/error-state.tsx';
import { Notice } from '../../components/notice.tsx';
import { ProgressBar } from '../../components/progress-bar.tsx';
import { SelectField } from '../../components/select-field.tsx';
import { errorWords } from './error-words.ts';
import { FitFacts } from './fit-facts.tsx';
import { MarkPositions } from './mark-positions.tsx';
import { inThisOrder } from './marks-draft.ts';
import { PhotoBoard } from './photo-board.tsx';
import { begunBy, wayOf, type PhotoDraft, type Way } from './photo-draft.ts';
import { withEdge, withHandle, withLength, withLine, withMark } from './photo-handles.ts';
import { PhotoLineFields } from './photo-line-fields.tsx';
import { useJudged } from './use-judged.ts';
import type { PhotoSheet } from './use-photo-draft.ts';
import { progressWords, wayWords } from './wall-words.ts';
import { useStraighten, useStraighteningProgress } from './walls.queries.ts';
import { WarpPreview } from './warp-preview.tsx';

interface Props {
  wall: Wall;
  photo: Photo;
  /** What is known of the photo, as far as it is set. */
  sheet: PhotoSheet;
  draft: PhotoDraft;
  onStraightened: () => void;
}

/** What is known of the photo: marks, lines, lengths and straight edges; what that is worth; and the straightening. */
export function StraightenPanel({ wall, photo, sheet, draft, onStraightened }: Props) {
  const straighten = useStraighten(wall, photo.id);
  const progress = useStraighteningProgress(wall.id, photo.id, straighten.isPending);
  const calledOff = useRef<AbortController | null>(null);
  const { judged, report, residualsMm } = useJudged(draft, photo, wall);
  // Always in millimetres: beside a mark there is no room for both.
  const offBy = residualsMm?.map((mm) => errorWords(mm, 'mm')) ?? [];
  const change = (next: PhotoDraft, words: string, run?: string) => sheet.change(next, { words, run });
  const run = () => {
    if (judged.state !== 'fit') return;
    const controller = new AbortController();
    calledOff.current = controller;
    straighten.mutate(
      { known: judged.known, signal: controller.signal },
      {
        onSuccess: () => {
          sheet.settle();
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
    <div className="grid items-start gap-6 lg:grid-cols-[minmax(0,11fr)_minmax(0,9fr)]">
      <div className="grid gap-3 lg:sticky lg:top-2">
        <PhotoBoard
          photo={photo}
          draft={draft}
          wanting={judged.state === 'trouble' ? judged.trouble.which : []}
          offBy={offBy}
          onMove={(of, px, name) => change(withHandle(draft, of, px), `${name.replace(/,.*/, '')} moved`, `move ${name}`)}
        />
        <div className="flex flex-wrap gap-2">
          <Button small onClick={() => change(withMark(draft, photo), `Mark ${draft.marks.length + 1} added`)}>Add a mark</Button>
          <Button small onClick={() => change(withEdge(draft, photo), 'Straight edge added')}>Add a straight edge</Button>
          <Button small onClick={() => change(withLength(draft, photo), 'Length added')}>Add a known length</Button>
          <Button small onClick={() => change(withLine(draft, 'plumb', photo), 'Plumb line added')}>Add a plumb line</Button>
          <Button small onClick={() => change(withLine(draft, 'level', photo), 'Level line added')}>Add a level line</Button>
        </div>
        <p className="text-sm text-ink-700">What is added stands on the photo at once: drag it to its place. Points along something straight, such as a skirting, tell what the lens bends.</p>
      </div>
      <div className="grid gap-4">
        <SelectField
          label="Straighten by"
          value={wayOf(draft)}
          options={Object.entries(wayWords).map(([value, words]) => ({ value, words }))}
          onChange={(e) => change(begunBy(e.target.value as Way, photo, draft), 'Another way to straighten')}
        />
        <MarkPositions marks={draft.marks} photo={photo} offBy={offBy} onChange={(marks, words, again) => change({ ...draft, marks }, words, again)} />
        <PhotoLineFields draft={draft} photo={photo} onChange={change} />
        {judged.state === 'trouble' ? (
          <Notice kind="caution" live>
            <p>{judged.trouble.words}</p>
            {judged.trouble.order ? (
              <Button small className="mt-2" onClick={() => change({ ...draft, marks: inThisOrder(draft.marks, judged.trouble.order ?? []) }, 'Marks put in order')}>
                Use this order
              </Button>
            ) : null}
          </Notice>
        ) : null}
        {straighten.isPending ? <ProgressBar label={progressWords[progress.data?.state ?? 'waiting']} share={progress.data && progress.data.state !== 'idle' ? progress.data.share : null} /> : null}
        {straighten.error ? <ErrorState error={straighten.error} onRetry={run} /> : null}
        <div className="flex flex-wrap items-center gap-3">
          <Button weight="primary" busy={straighten.isPending} disabled={judged.state !== 'fit'} onClick={run}>
            Straighten the photo
          </Button>
          {straighten.isPending ? <Button onClick={callOff}>Cancel</Button> : null}
          <p className="text-sm text-ink-700" role="status">
            {judged.state === 'unfinished' ? judged.words : judged.state === 'fit' ? `Each pixel will show ${(1 / judged.plan.pxPerMm).toFixed(2)} mm of the wall.` : null}
          </p>
        </div>
        {judged.state === 'fit' ? <WarpPreview photo={photo} plan={judged.plan} /> : null}
        {report ? <FitFacts report={report} sharpness={photo.sharpness ?? null} /> : null}
      </div>
    </div>
  );
}
