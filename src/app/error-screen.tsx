import { useRouteError } from 'react-router-dom';
import { ErrorState } from '../components/error-state.tsx';
import { Page } from '../components/page.tsx';
import { TitleBlock } from '../components/title-block.tsx';
import { usePageTitle } from '../lib/page-title.ts';
import { paths } from '../lib/paths.ts';

/** What is shown when a page itself breaks. */
export function ErrorScreen({ inShell = false }: { inShell?: boolean }) {
  const error = useRouteError();
  usePageTitle('Something went wrong');
  const page = (
    <Page narrow>
      <TitleBlock title="This page could not be shown" />
      <ErrorState error={error} onRetry={() => window.location.reload()} />
      <p>
        <a href={paths.home} className="font-semibold text-chalk-600 underline">
          Go to the job book
        </a>
      </p>
    </Page>
  );
  return inShell ? page : <main id="main">{page}</main>;
}
