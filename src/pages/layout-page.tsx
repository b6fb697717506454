import { useQuery } from '@tanstack/react-query';
import { useMemo, useState, useSyncExternalStore } from 'react';
import { Link, useParams } from 'react-router-dom';
import type { Job } from '../../shared/jobs/jobs.api.ts';
import type { Layout } from '../../shared/layouts/layout.ts';
import type { Pattern } from '../../shared/patterns/pattern.ts';
import type { Wall } from '../../shared/walls/wall.ts';
import { Button } from '../components/button.tsx';
import { ErrorState } from '../components/error-state.tsx';
import { LeaveGuard } from '../components/leave-guard.tsx';
import { Loading } from '../components/loading.tsx';
import { Page } from '../components/page.tsx';
import { TitleBlock } from '../components/title-block.tsx';
import { WallDrawing } from '../features/drawing/wall-drawing.tsx';
import { jobQuery } from '../features/jobs/jobs.queries.ts';
import { CompareDialog } from '../features/layouts/compare/compare-dialog.tsx';
import { LayoutEditor } from '../features/layouts/editor/layout-editor.tsx';
import { useChecks } from '../features/layouts/editor/ledger/use-checks.ts';
import { savedTime, saveWords } from '../features/layouts/editor/saver/save-state.ts';
import { useSaver } from '../features/layouts/editor/saver/use-saver.ts';
import { readyDesigns } from '../features/layouts/editor/state/designs.ts';
import {
  createEditorStore,
  EditorContext,
  useEditor,
  useEditorStore,
} from '../features/layouts/editor/state/editor-store.ts';
import {
  hardwareOfLayoutQuery,
  layoutQuery,
  wallOfLayoutQuery,
} from '../features/layouts/layouts.queries.ts';
import { patternsQuery } from '../features/patterns/patterns.queries.ts';
import { SendDialog } from '../features/signoffs/send-dialog.tsx';
import { TemplateDialog } from '../features/templates/template-dialog.tsx';
import { momentOf } from '../lib/dates.ts';
import { usePageTitle } from '../lib/page-title.ts';
import { paths } from '../lib/paths.ts';
import { supposedPxPerMm, useMeasuredPxPerMm } from '../lib/screen-scale.ts';
import { useMay } from '../lib/session.ts';
import { useUnits } from '../lib/units.ts';

export function LayoutPage() {
  const { jobId = '', layoutId = '' } = useParams();
  const layout = useQuery(layoutQuery(layoutId));
  const job = useQuery(jobQuery(jobId));
  const patterns = useQuery(patternsQuery);
  const wallId = layout.data?.wallId;
  const wall = useQuery({ ...wallOfLayoutQuery(wallId ?? ''), enabled: wallId !== undefined });
  usePageTitle(layout.data && job.data ? `${layout.data.name}, ${job.data.title}` : undefined);

  if (layout.data && job.data && patterns.data && wall.data) {
    return (
      <Bench key={layoutId} layout={layout.data} job={job.data} patterns={patterns.data} wall={wall.data} />
    );
  }
  const failed = [layout, job, patterns, wall].find((query) => query.isError);
  return (
    <Page>
      {failed ? (
        <ErrorState error={failed.error} onRetry={() => void failed.refetch()} />
      ) : (
        <Loading what="the layout" />
      )}
    </Page>
  );
}

interface Loaded {
  layout: Layout;
  job: Job;
  patterns: Pattern[];
  wall: Wall;
}

/** The draft lives as long as the page shows this layout. */
function Bench(loaded: Loaded) {
  const [store] = useState(() => createEditorStore(loaded.layout));
  return (
    <EditorContext value={store}>
      <Desk {...loaded} />
    </EditorContext>
  );
}

function Desk({ layout, job, patterns, wall }: Loaded) {
  const store = useEditorStore();
  const mayChange = useMay('change jobs');
  const narrow = useNarrow();
  const readOnly = narrow || !mayChange;
  const units = useUnits();
  const designs = useMemo(() => readyDesigns(patterns), [patterns]);
  const book = useQuery(hardwareOfLayoutQuery).data;
  const checks = useChecks({ wall, patterns, book, changedSinceSigned: layout.changedSinceSigned });
  const flush = useSaver(store, layout, !mayChange);
  const [dialog, setDialog] = useState<'send' | 'template' | 'compare' | null>(null);
  const save = useEditor((e) => e.save);
  const stored = useEditor((e) => e.stored);
  const scale = useEditor((e) => e.view.scale);
  const screen = useMeasuredPxPerMm();
  const frameCount = useEditor((e) => e.bench.frames.length);
  const name = useEditor((e) => e.bench.sheet.name);
  const asking = useEditor((e) => e.conflicts.length > 0);

  const readyVersion = async (): Promise<number> => {
    await flush();
    const now = store.getState();
    if (now.save.kind !== 'saved' || now.conflicts.length > 0)
      throw new Error('The layout is not saved yet.');
    return now.stored.version;
  };

  return (
    <>
      <div className="flex w-full grow flex-col gap-3 px-4 py-3 lg:h-0 lg:min-h-[44rem]">
        <div className="shrink-0">
          <TitleBlock
            title={name}
            above={
              <Link to={paths.job(job.id)} className="text-chalk-600 underline">
                Back to {job.title}
              </Link>
            }
            cells={[
              { label: 'Wall', value: wall.name },
              {
                label: 'Revision',
                value: `${layout.letter}, ${layout.changedSinceSigned && layout.state === 'draft' ? 'changed since signed' : layout.state}`,
              },
              { label: 'Scale on screen', value: scaleWords(scale / (screen ?? supposedPxPerMm)) },
              { label: 'Units', value: units === 'in' ? 'inches' : 'mm' },
              {
                label: 'Draft',
                value: (
                  <span role="status">
                    {saveWords(save, stored.savedAt, stored.savedBy, (instant) =>
                      savedTime(instant, momentOf),
                    )}
                  </span>
                ),
              },
            ]}
            action={
              <div className="flex flex-wrap gap-2">
                {layout.revisions.length > 0 ? <Button onClick={() => setDialog('compare')}>Compare</Button> : null}
                <Button onClick={() => setDialog('template')}>Template</Button>
                {mayChange ? (
                  <Button
                    weight="primary"
                    disabled={frameCount === 0 || asking}
                    onClick={() => setDialog('send')}
                  >
                    Send to client
                  </Button>
                ) : null}
              </div>
            }
          />
        </div>
        <LayoutEditor
          wall={wall}
          designs={designs}
          checks={checks}
          readOnly={readOnly}
          narrow={narrow && mayChange}
        />
      </div>
      {dialog === 'send' ? (
        <SendDialog
          layout={layout}
          client={{ name: job.clientName, email: job.clientEmail }}
          frameCount={frameCount}
          stops={checks?.findings.filter((f) => f.weight === 'stop').length ?? 0}
          readyVersion={readyVersion}
          onClose={() => setDialog(null)}
        />
      ) : null}
      {dialog === 'compare' ? (
        <CompareDialog
          revisions={layout.revisions}
          bench={{ ...store.getState().bench, patterns }}
          draw={({ frames, patterns: made, label, over }) => (
            <WallDrawing wall={wall} elevation={wall.photo?.elevation ?? null} frames={frames} patterns={made} label={label} small className="max-h-[46dvh] w-full bg-plaster-100">
              {over}
            </WallDrawing>
          )}
          onClose={() => setDialog(null)}
        />
      ) : null}
      {dialog === 'template' ? (
        <TemplateDialog layout={layout} ready={readyVersion} onClose={() => setDialog(null)} />
      ) : null}
      <LeaveGuard unsaved={mayChange && (save.kind === 'offline' || save.kind === 'refused' || asking)} />
    </>
  );
}

/** A drawing's size against life, as drawings tell their scale. */
function scaleWords(size: number): string {
  const times = 1 / size;
  if (times >= 1) return `1 : ${times < 10 ? times.toFixed(1) : Math.round(times)}`;
  return `${size.toFixed(1)} : 1`;
}

const narrowQuery = '(max-width: 767px)';

/** Whether the window is too narrow to lay out in. */
function useNarrow(): boolean {
  return useSyncExternalStore(
    (changed) => {
      const media = window.matchMedia(narrowQuery);
      media.addEventListener('change', changed);
      return () => media.removeEventListener('change', changed);
    },
    () => window.matchMedia(narrowQuery).matches,
    () => false,
  );
}
