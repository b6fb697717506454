import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import type { PortalRevision } from '../../shared/signoffs/signoffs.api.ts';
import { EmptyState } from '../components/empty-state.tsx';
import { ErrorState } from '../components/error-state.tsx';
import { Loading } from '../components/loading.tsx';
import { Notice } from '../components/notice.tsx';
import { Page } from '../components/page.tsx';
import { TitleBlock } from '../components/title-block.tsx';
import { WallDrawing } from '../features/drawing/wall-drawing.tsx';
import { PortalOption } from '../features/signoffs/portal-option.tsx';
import { portalQuery } from '../features/signoffs/signoffs.queries.ts';
import { isCallError } from '../lib/call-error.ts';
import { dayOf } from '../lib/dates.ts';
import { usePageTitle } from '../lib/page-title.ts';
import { UnitsContext } from '../lib/units.ts';

/** What a client sees by their link; made for a phone first. */
export function PortalPage() {
  const { token = '' } = useParams();
  const portal = useQuery(portalQuery(token));
  usePageTitle(portal.data ? `${portal.data.jobTitle}, ${portal.data.shopName}` : 'Your layout');
  return (
    <main id="main" tabIndex={-1} className="outline-none">
      <Page narrow>
        {portal.data ? (
          <UnitsContext value={portal.data.units}>
            <TitleBlock
              title={portal.data.jobTitle}
              above={portal.data.shopName}
              cells={[
                { label: 'For', value: portal.data.clientName },
                { label: 'Open until', value: dayOf(portal.data.expiresAt) },
              ]}
            />
            <p className="max-w-prose text-ink-700">{introduction(portal.data.revisions)}</p>
            {portal.data.revisions.length === 0 ? <EmptyState title="Nothing to look at yet">The shop has not put an option here. They will write again.</EmptyState> : null}
            {portal.data.revisions.map((revision) => (
              <PortalOption key={revision.id} token={token} consent={portal.data.consent} revision={revision} signedInstead={signedInstead(portal.data.revisions, revision)} picture={<OptionPicture revision={revision} />} />
            ))}
            <p className="border-t border-plaster-200 pt-3 text-sm text-ink-700">This page is personal: whoever has its address can answer in your name. Pass it on only to those who decide with you.</p>
          </UnitsContext>
        ) : portal.isError ? (
          <PortalClosed error={portal.error} onRetry={() => void portal.refetch()} />
        ) : (
          <Loading what="your layout" />
        )}
      </Page>
    </main>
  );
}

function introduction(revisions: readonly PortalRevision[]): string {
  const open = revisions.filter(({ state }) => state === 'with client').length;
  if (open === 0) return 'Nothing here waits for your answer just now.';
  return open === 1
    ? 'This is how it would look on your wall, drawn to scale. Look it over, then sign it or say what should change.'
    : `These ${open} options are drawn to scale on your wall. Look them over, then sign one or say what should change.`;
}

function signedInstead(revisions: readonly PortalRevision[], than: PortalRevision): string | null {
  return revisions.find((revision) => revision.id !== than.id && revision.state === 'signed')?.layoutName ?? null;
}

function OptionPicture({ revision }: { revision: PortalRevision }) {
  const { snapshot, elevationUrl } = revision;
  return (
    <WallDrawing
      wall={snapshot.wall}
      elevation={snapshot.elevation && elevationUrl ? { ...snapshot.elevation, url: elevationUrl } : null}
      frames={snapshot.frames}
      patterns={snapshot.patterns}
      labels
      label={`${revision.layoutName} on ${snapshot.wall.name}: ${snapshot.frames.length} frames`}
      className="max-h-[70dvh] w-full"
    />
  );
}

function PortalClosed({ error, onRetry }: { error: unknown; onRetry: () => void }) {
  const closed = isCallError(error) && (error.status === 404 || error.status === 410 || error.status === 400);
  if (!closed) return <ErrorState error={error} onRetry={onRetry} />;
  return (
    <>
      <TitleBlock title={error.status === 410 ? 'This link is closed' : 'This link leads nowhere'} />
      <Notice>
        <p>
          {error.status === 410
            ? 'It has run out, or the shop has closed it. Nothing you answered before is lost.'
            : 'Part of the address may be missing: open it from the message itself, or copy it whole.'}
        </p>
        <p className="mt-1">Write to the shop if you still need it: they can send you a new one.</p>
      </Notice>
    </>
  );
}
