import type { ReactNode } from 'react';
import { Page } from './page.tsx';
import { TitleBlock } from './title-block.tsx';

/** A page that stands by itself, outside the signed-in part: one narrow column under a title block. */
export function EntryPage({ title, children }: { title: string; children: ReactNode }) {
  return (
    <main id="main" tabIndex={-1} className="outline-none sm:pt-8">
      <Page narrow>
        <TitleBlock title={title} above="Combwright" />
        {children}
      </Page>
    </main>
  );
}
