import { useQuery } from '@tanstack/react-query';
import { Link, useSearchParams } from 'react-router-dom';
import { classNames } from '../components/class-names.ts';
import { EmptyState } from '../components/empty-state.tsx';
import { ErrorState } from '../components/error-state.tsx';
import { Loading } from '../components/loading.tsx';
import { Page } from '../components/page.tsx';
import { TitleBlock } from '../components/title-block.tsx';
import { MailView } from '../features/development/mail-view.tsx';
import { mailboxQuery, mailQuery } from '../features/development/mailbox.queries.ts';
import { momentOf } from '../lib/dates.ts';
import { usePageTitle } from '../lib/page-title.ts';
import { paths } from '../lib/paths.ts';

/** The mail that the program sent while it runs without a real mail server. */
export function MailboxPage() {
  usePageTitle('Mailbox');
  const [search] = useSearchParams();
  const box = useQuery(mailboxQuery);
  const openId = search.get('mail') ?? box.data?.[0]?.id;
  const mail = useQuery({ ...mailQuery(openId ?? ''), enabled: openId !== undefined });
  return (
    <main id="main" tabIndex={-1} className="outline-none">
      <Page>
        <TitleBlock
          title="Development mailbox"
          above={
            <Link to={paths.jobs} className="text-chalk-600 underline">
              Jobs
            </Link>
          }
          cells={[{ label: 'Messages', value: box.data?.length ?? '…' }]}
        />
        <p className="max-w-prose text-ink-700">Mail sent while developing goes to nobody: it is caught here.</p>
        {box.isError && !box.data ? <ErrorState error={box.error} onRetry={() => void box.refetch()} /> : null}
        {box.isPending ? <Loading what="the mailbox" /> : null}
        {box.data?.length === 0 ? <EmptyState title="No mail yet">Send a layout to a client, and the message with their link appears here.</EmptyState> : null}
        {box.data && box.data.length > 0 ? (
          <div className="grid items-start gap-6 md:grid-cols-[minmax(0,1fr)_minmax(0,2fr)]">
            <nav aria-label="Messages" className="max-h-[70dvh] overflow-y-auto border border-plaster-200 bg-white">
              <ul>
                {box.data.map((head) => (
                  <li key={head.id} className="border-b border-plaster-200 last:border-b-0">
                    <Link
                      to={{ search: `?mail=${head.id}` }}
                      replace
                      aria-current={head.id === openId || undefined}
                      className={classNames('block px-4 py-2 hover:bg-chalk-100', head.id === openId && 'bg-chalk-100')}
                    >
                      <span className="block font-semibold">{head.subject}</span>
                      <span className="block text-sm break-words text-ink-700">
                        {head.to}, {momentOf(head.at)}
                      </span>
                    </Link>
                  </li>
                ))}
              </ul>
            </nav>
            <div className="min-w-0">{mail.data ? <MailView mail={mail.data} /> : mail.isError ? <ErrorState error={mail.error} onRetry={() => void mail.refetch()} /> : <Loading what="the message" />}</div>
          </div>
        ) : null}
      </Page>
    </main>
  );
}
