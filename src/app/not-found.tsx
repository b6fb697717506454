import { ButtonLink } from '../components/button.tsx';
import { EmptyState } from '../components/empty-state.tsx';
import { Page } from '../components/page.tsx';
import { TitleBlock } from '../components/title-block.tsx';
import { usePageTitle } from '../lib/page-title.ts';
import { paths } from '../lib/paths.ts';

/** An address that is no page of ours. */
export function NotFound() {
  usePageTitle('Not found');
  return (
    <main id="main" tabIndex={-1} className="outline-none">
      <Page narrow>
        <TitleBlock title="There is no such page" />
        <EmptyState title="This address leads nowhere." action={<ButtonLink to={paths.home}>Go to the job book</ButtonLink>}>
          It may have been typed with a slip, or what it led to has been taken away.
        </EmptyState>
      </Page>
    </main>
  );
}
