import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useParams } from 'react-router-dom';
import { isConfirmed, type Wall } from '../../shared/walls/wall.ts';
import { Button } from '../components/button.tsx';
import { ConfirmDialog } from '../components/confirm-dialog.tsx';
import { ErrorState } from '../components/error-state.tsx';
import { LeaveGuard } from '../components/leave-guard.tsx';
import { LengthText } from '../components/length-text.tsx';
import { Loading } from '../components/loading.tsx';
import { Page, Section } from '../components/page.tsx';
import { TitleBlock } from '../components/title-block.tsx';
import { WallDrawing } from '../features/drawing/wall-drawing.tsx';
import { jobQuery } from '../features/jobs/jobs.queries.ts';
import { ObstructionFields } from '../features/walls/obstruction-fields.tsx';
import { OutlineFields } from '../features/walls/outline-fields.tsx';
import { PhotoList } from '../features/walls/photo-list.tsx';
import { PhotoUpload } from '../features/walls/photo-upload.tsx';
import { ShapeFields } from '../features/walls/shape-fields.tsx';
import { SheetNotices } from '../features/walls/sheet-notices.tsx';
import { StraightenPanel } from '../features/walls/straighten-panel.tsx';
import { StudFields } from '../features/walls/stud-fields.tsx';
import { usePhotoDraft } from '../features/walls/use-photo-draft.ts';
import { useWallDraft } from '../features/walls/use-wall-draft.ts';
import { useWallTools } from '../features/walls/use-wall-tools.ts';
import { drawable } from '../features/walls/wall-draft.ts';
import { WallFacts } from '../features/walls/wall-facts.tsx';
import { UndoButtons } from '../features/walls/wall-toolbar.tsx';
import { WallView } from '../features/walls/wall-view.tsx';
import { constructionWords } from '../../shared/walls/construction.ts';
import { useRemovePhoto, wallQuery } from '../features/walls/walls.queries.ts';
import { ZoneFields } from '../features/walls/zone-fields.tsx';
import { keys } from '../lib/keys.ts';
import { usePageTitle } from '../lib/page-title.ts';
import { paths } from '../lib/paths.ts';
import { useMay } from '../lib/session.ts';
import { useUndoKeys } from '../lib/use-undo-keys.ts';

/** The site measure of one wall. */
export function MeasurePage() {
  const { wallId = '' } = useParams();
  const wall = useQuery(wallQuery(wallId));
  usePageTitle(wall.data?.name);
  if (!wall.data) {
    return <Page>{wall.isError ? <ErrorState error={wall.error} onRetry={() => void wall.refetch()} /> : <Loading what="the wall" />}</Page>;
  }
  return <Measure key={wallId} wall={wall.data} />;
}

/** What the picture's place shows: the drawn wall, the photo with its marks, or the place to send a photo to. */
type View = 'wall' | 'marks' | 'photo';

function Measure({ wall }: { wall: Wall }) {
  const job = useQuery(jobQuery(wall.jobId));
  const client = useQueryClient();
  const mayChange = useMay('change jobs');
  const sheet = useWallDraft(wall);
  const [view, setView] = useState<View>(() => firstView(wall, mayChange));
  const photoSheet = usePhotoDraft(wall.photo);
  const shown = drawable(sheet.draft, wall);
  const tools = useWallTools(sheet, shown);
  // What is undone is what is on show: the marks of the photo, or the wall.
  const inHand = view === 'marks' ? photoSheet : sheet;
  useUndoKeys(inHand.undo, inHand.redo, mayChange);
  const open = shown.studs.filter((s) => !isConfirmed(s)).length;
  const takeTheirs = () => {
    sheet.takeTheirs();
    void client.invalidateQueries({ queryKey: keys.wall(wall.id) });
  };

  return (
    <Page>
      <TitleBlock
        title={wall.name}
        above={
          <Link to={paths.job(wall.jobId)} className="text-chalk-600 underline">
            {job.data?.title ?? 'Job'}
          </Link>
        }
        cells={[
          { label: 'Size', value: <><LengthText mm={wall.widthMm} /> × <LengthText mm={wall.heightMm} /></> },
          { label: 'Construction', value: constructionWords[wall.construction] },
          { label: 'Studs', value: open > 0 ? `${shown.studs.length}, ${open} unconfirmed` : String(shown.studs.length) },
          { label: 'Picture', value: wall.photo?.elevation ? `1 px = ${(1 / wall.photo.elevation.pxPerMm).toFixed(2)} mm` : wall.photo ? 'not straightened' : 'drawn' },
        ]}
        action={
          mayChange ? (
            <Button weight={sheet.changed ? 'primary' : 'plain'} busy={sheet.saving} disabled={!sheet.changed && !sheet.saving} onClick={sheet.save}>
              {sheet.changed ? 'Save the wall' : 'Saved'}
            </Button>
          ) : null
        }
      />
      {mayChange ? <SheetNotices sheet={sheet} onTakeTheirs={takeTheirs} /> : null}
      <Section
        title={view === 'marks' ? 'Straighten the photo' : 'The wall'}
        action={
          mayChange ? (
            <div className="flex flex-wrap items-center gap-2">
              <UndoButtons of={inHand} />
              <Views wall={wall} view={view} onView={setView} />
            </div>
          ) : null
        }
      >
        {view === 'photo' ? (
          <div className="grid gap-6">
            <PhotoUpload wall={wall} onUploaded={() => setView('marks')} onWithout={() => setView('wall')} />
            {wall.photo ? <PhotoList wall={wall} onChosen={() => setView('wall')} /> : null}
          </div>
        ) : null}
        {view === 'marks' && wall.photo && photoSheet.draft ? (
          <StraightenPanel key={wall.photo.id} wall={wall} photo={wall.photo} sheet={photoSheet} draft={photoSheet.draft} onStraightened={() => setView('wall')} />
        ) : null}
        {view === 'wall' ? (
          <WallView wall={shown} photo={wall.photo} tools={mayChange ? tools : null} unconfirmed={open > 0}>
            {(over, className) => (
              <WallDrawing wall={shown} elevation={wall.photo?.elevation ?? null} siteMarks label={`${wall.name} from the front, with studs and obstructions`} className={className}>
                {over}
              </WallDrawing>
            )}
          </WallView>
        ) : null}
      </Section>
      {mayChange ? (
        <>
          <div className="grid items-start gap-6 lg:grid-cols-[minmax(0,2fr)_minmax(0,3fr)]">
            <Section title="Size and make">
              <ShapeFields draft={sheet.draft} errors={sheet.errors} onChange={sheet.change} />
              <h3 className="mt-6 mb-2 font-semibold text-ink-900">Outline</h3>
              <OutlineFields draft={sheet.draft} errors={sheet.errors} onChange={sheet.change} />
            </Section>
            <Section title="Studs">
              <StudFields draft={sheet.draft} errors={sheet.errors} onChange={(studs, deed) => sheet.change({ studs }, deed)} />
            </Section>
          </div>
          <Section title="Obstructions">
            <ObstructionFields obstructions={sheet.draft.obstructions} errors={sheet.errors} onChange={(obstructions, deed) => sheet.change({ obstructions }, deed)} />
          </Section>
          <Section title="Where people are">
            <ZoneFields zones={sheet.draft.zones} errors={sheet.errors} onChange={(zones, deed) => sheet.change({ zones }, deed)} />
          </Section>
        </>
      ) : (
        <WallFacts wall={wall} />
      )}
      <LeaveGuard unsaved={sheet.changed || photoSheet.changed} />
    </Page>
  );
}

function firstView(wall: Wall, mayChange: boolean): View {
  if (!mayChange || wall.photo?.elevation) return 'wall';
  if (wall.photo) return 'marks';
  return wall.studs.length + wall.obstructions.length === 0 ? 'photo' : 'wall';
}

function Views({ wall, view, onView }: { wall: Wall; view: View; onView: (view: View) => void }) {
  const [asking, setAsking] = useState(false);
  const remove = useRemovePhoto(wall);
  return (
    <div className="flex flex-wrap items-center gap-2">
      {view !== 'wall' ? <Button small onClick={() => onView('wall')}>Show the wall</Button> : null}
      {wall.photo && view !== 'marks' ? <Button small onClick={() => onView('marks')}>{wall.photo.elevation ? 'Set the marks again' : 'Straighten the photo'}</Button> : null}
      {view !== 'photo' ? <Button small onClick={() => onView('photo')}>{wall.photo ? 'Another photo' : 'Add a photo'}</Button> : null}
      {wall.photo ? <Button small weight="danger" onClick={() => setAsking(true)}>Take the photo off</Button> : null}
      <ConfirmDialog
        open={asking}
        title="Take the photo off this wall?"
        deed="Delete the photo"
        danger
        busy={remove.isPending}
        onConfirm={() =>
          wall.photo &&
          remove.mutate(wall.photo.id, {
            onSuccess: () => {
              setAsking(false);
              onView('wall');
            },
          })
        }
        onCancel={() => setAsking(false)}
      >
        <p>The photo and its straightened picture are deleted. Studs, obstructions and layouts stay; what was signed keeps its own copy.</p>
        {remove.error ? <ErrorState error={remove.error} /> : null}
      </ConfirmDialog>
    </div>
  );
}
