import { Outlet, ScrollRestoration } from 'react-router-dom';
import { OfflineStrip } from './offline-strip.tsx';
import { RouteFocus } from './route-focus.tsx';

/** Stands round every page, signed in or not. */
export function Frame() {
  return (
    <>
      <a
        href="#main"
        className="absolute top-2 left-2 z-50 -translate-y-20 border border-chalk-600 bg-white px-4 py-2 font-semibold text-chalk-600 focus:translate-y-0"
      >
        Skip to the page
      </a>
      <RouteFocus />
      <OfflineStrip />
      <Outlet />
      <ScrollRestoration />
    </>
  );
}
