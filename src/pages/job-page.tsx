import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useNavigate, useParams } from 'react-router-dom';
import { Button, ButtonLink } from '../components/button.tsx';
import { EmptyState } from '../components/empty-state.tsx';
import { ErrorState } from '../components/error-state.tsx';
import { Loading } from '../components/loading.tsx';
import { Page, Section } from '../components/page.tsx';
import { TitleBlock } from '../components/title-block.tsx';
import { WallDrawing } from '../features/drawing/wall-drawing.tsx';
import { HangerAssignment } from '../features/jobs/hanger-assignment.tsx';
import { JobCard } from '../features/jobs/job-card.tsx';
import { JobMenu } from '../features/jobs/job-menu.tsx';
import { layoutsOfJobQuery, wallsOfJobQuery } from '../features/jobs/job-parts.queries.ts';
import { JobState } from '../features/jobs/job-states.tsx';
import { jobQuery } from '../features/jobs/jobs.queries.ts';
import { leadingLayout } from '../features/jobs/leading-layout.ts';
import { LayoutSlips } from '../features/jobs/layout-slips.tsx';
import { NewLayoutDialog } from '../features/jobs/new-layout-dialog.tsx';
import { NewWallDialog } from '../features/jobs/new-wall-dialog.tsx';
import { WallSlips } from '../features/jobs/wall-slips.tsx';
import { patternsQuery } from '../features/patterns/patterns.queries.ts';
import { membersQuery } from '../features/people/people.queries.ts';
import { LinksTable } from '../features/signoffs/links-table.tsx';
import { linksQuery } from '../features/signoffs/signoffs.queries.ts';
import { useNow } from '../lib/clock.ts';
import { momentOf } from '../lib/dates.ts';
import { usePageTitle } from '../lib/page-title.ts';
import { paths } from '../lib/paths.ts';
import { useMay } from '../lib/session.ts';

export function JobPage() {
  const { jobId = '' } = useParams();
  const mayChange = useMay('change jobs');
  const now = useNow();
  const navigate = useNavigate();
  const job = useQuery(jobQuery(jobId));
  const walls = useQuery(wallsOfJobQuery(jobId));
  const layouts = useQuery(layoutsOfJobQuery(jobId));
  const patterns = useQuery(patternsQuery);
  const links = useQuery({ ...linksQuery(jobId), enabled: mayChange });
  const members = useQuery({ ...membersQuery, enabled: mayChange });
  const [dialog, setDialog] = useState<'wall' | 'layout' | null>(null);
  usePageTitle(job.data?.title);

  if (!job.data) {
    return <Page>{job.isError ? <ErrorState error={job.error} onRetry={() => void job.refetch()} /> : <Loading what="the job" />}</Page>;
  }
  const wallOf = (wallId: string) => walls.data?.find((wall) => wall.id === wallId);
  const newest = leadingLayout(layouts.data ?? []);
  const addWall = () => setDialog('wall');
  const startLayout = () => setDialog('layout');

  const primary = !walls.data || !layouts.data ? null : newest ? (
    <ButtonLink weight="primary" to={paths.layout(jobId, newest.id)}>
      Open {newest.name} {newest.letter}
    </ButtonLink>
  ) : !mayChange ? null : walls.data.length === 0 ? (
    <Button weight="primary" onClick={addWall}>
      Add a wall
    </Button>
  ) : (
    <Button weight="primary" onClick={startLayout}>
      New layout
    </Button>
  );

  return (
    <Page>
      <TitleBlock
        title={job.data.title}
        above={
          <Link to={paths.jobs} className="text-chalk-600 underline">
            Jobs
          </Link>
        }
        cells={[
          { label: 'Client', value: job.data.clientName },
          ...(job.data.site ? [{ label: 'Site', value: <span className="block max-w-64">{job.data.site}</span> }] : []),
          { label: 'State', value: <JobState state={job.data.state} /> },
          { label: 'Changed', value: momentOf(job.data.updatedAt) },
        ]}
        action={
          <div className="flex flex-wrap items-center gap-3 max-md:justify-between">
            {mayChange ? <JobMenu job={job.data} /> : null}
            {primary}
          </div>
        }
      />
      <JobCard card={job.data.card} />

      <Section title="Walls" action={mayChange && walls.data?.length ? <Button small onClick={addWall}>Add a wall</Button> : null}>
        {walls.isError && !walls.data ? <ErrorState error={walls.error} onRetry={() => void walls.refetch()} /> : null}
        {walls.isPending ? <Loading what="the walls" /> : null}
        {walls.data?.length === 0 ? (
          <EmptyState title="No wall yet">{mayChange ? 'Begin with the wall: its size, what it is made of, and a photo if there is one.' : 'The wall has not been measured yet.'}</EmptyState>
        ) : null}
        {walls.data?.length ? (
          <WallSlips
            walls={walls.data}
            draw={(wall) => <WallDrawing wall={wall} elevation={wall.photo?.elevation ?? null} siteMarks small label={`Drawing of ${wall.name}`} className="size-full" />}
          />
        ) : null}
      </Section>

      <Section title="Layouts" action={mayChange && layouts.data?.length ? <Button small onClick={startLayout}>New layout</Button> : null}>
        {layouts.isError && !layouts.data ? <ErrorState error={layouts.error} onRetry={() => void layouts.refetch()} /> : null}
        {layouts.isPending ? <Loading what="the layouts" /> : null}
        {layouts.data?.length === 0 ? (
          <EmptyState title="No layout yet">{walls.data?.length ? 'A layout places frames of the pattern book on a wall. Several can be offered as options.' : 'A layout stands on a wall: add the wall first.'}</EmptyState>
        ) : null}
        {layouts.data?.length ? (
          <LayoutSlips
            layouts={layouts.data}
            mayChange={mayChange}
            wallName={(wallId) => wallOf(wallId)?.name ?? 'Wall'}
            draw={(layout) => {
              const wall = wallOf(layout.wallId);
              return wall ? (
                <WallDrawing wall={wall} elevation={wall.photo?.elevation ?? null} frames={layout.frames} patterns={patterns.data} small label={`Drawing of ${layout.name}`} className="size-full" />
              ) : null;
            }}
          />
        ) : null}
      </Section>

      {mayChange ? (
        <div className="grid items-start gap-6 lg:grid-cols-[2fr_1fr]">
          <Section title="Links given to the client">
            {links.isError ? <ErrorState error={links.error} onRetry={() => void links.refetch()} /> : null}
            {links.data?.length === 0 ? <p className="text-ink-700">None yet. Sending a layout for sign-off mails the client a personal link.</p> : null}
            {links.data?.length ? <LinksTable jobId={jobId} links={links.data} now={now} /> : null}
          </Section>
          <Section title="Hangers on this job">
            {members.isError ? <ErrorState error={members.error} onRetry={() => void members.refetch()} /> : null}
            {members.data ? <HangerAssignment job={job.data} members={members.data} /> : null}
          </Section>
        </div>
      ) : null}

      {dialog === 'wall' ? <NewWallDialog jobId={jobId} onClose={() => setDialog(null)} onAdded={(wall) => void navigate(paths.measure(jobId, wall.id))} /> : null}
      {dialog === 'layout' && walls.data?.length ? (
        <NewLayoutDialog jobId={jobId} walls={walls.data} name={`Option ${(layouts.data?.length ?? 0) + 1}`} onClose={() => setDialog(null)} onStarted={(layout) => void navigate(paths.layout(jobId, layout.id))} />
      ) : null}
    </Page>
  );
}
