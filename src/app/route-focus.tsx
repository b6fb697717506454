import { useEffect, useRef } from 'react';
import { useLocation } from 'react-router-dom';

const headingWaitMs = 5000;

/** On a change of page, moves focus to the new page's heading, so that those who hear the page know where they are. */
export function RouteFocus() {
  const { pathname } = useLocation();
  const last = useRef(pathname);

  useEffect(() => {
    if (last.current === pathname) return;
    last.current = pathname;
    const main = document.getElementById('main');
    main?.focus({ preventScroll: true });
    if (focusHeading(main)) return;
    // The page is still being fetched: wait for its heading, unless the reader has moved on meanwhile.
    const watcher = new MutationObserver(() => {
      const now = document.getElementById('main');
      const free = document.activeElement === document.body || document.activeElement === now;
      if (!free || focusHeading(now)) stop();
    });
    const timer = setTimeout(() => stop(), headingWaitMs);
    const stop = () => {
      watcher.disconnect();
      clearTimeout(timer);
    };
    watcher.observe(document.body, { childList: true, subtree: true });
    return stop;
  }, [pathname]);

  return null;
}

function focusHeading(main: HTMLElement | null): boolean {
  const heading = main?.querySelector<HTMLElement>('[data-page-heading]');
  heading?.focus({ preventScroll: true });
  return heading !== null && heading !== undefined;
}
