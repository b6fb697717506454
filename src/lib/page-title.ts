import { useEffect } from 'react';

/** Names the page in the browser's tab and for those who hear it. */
export function usePageTitle(title: string | undefined): void {
  useEffect(() => {
    if (title) document.title = `${title} · Combwright`;
  }, [title]);
}
