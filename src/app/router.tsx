import { createBrowserRouter, Navigate, type RouteObject } from 'react-router-dom';
import { Loading } from '../components/loading.tsx';
import { paths, routePatterns } from '../lib/paths.ts';
import { ErrorScreen } from './error-screen.tsx';
import { Frame } from './frame.tsx';
import { NotFound } from './not-found.tsx';
import { Shell } from './shell.tsx';

/** The pages by address. Each is fetched when first opened. */
export const routes: RouteObject[] = [
  {
    element: <Frame />,
    errorElement: <ErrorScreen />,
    hydrateFallbackElement: <Loading what="the page" />,
    children: [
      {
        element: <Shell />,
        children: [
          {
            errorElement: <ErrorScreen inShell />,
            children: [
              { index: true, element: <Navigate to={paths.jobs} replace /> },
              { path: routePatterns.jobs, lazy: async () => ({ Component: (await import('../pages/jobs-page.tsx')).JobsPage }) },
              { path: routePatterns.job, lazy: async () => ({ Component: (await import('../pages/job-page.tsx')).JobPage }) },
              { path: routePatterns.measure, lazy: async () => ({ Component: (await import('../pages/measure-page.tsx')).MeasurePage }) },
              { path: routePatterns.layout, lazy: async () => ({ Component: (await import('../pages/layout-page.tsx')).LayoutPage }) },
              { path: routePatterns.patterns, lazy: async () => ({ Component: (await import('../pages/patterns-page.tsx')).PatternsPage }) },
              { path: routePatterns.hardware, lazy: async () => ({ Component: (await import('../pages/hardware-page.tsx')).HardwarePage }) },
              { path: routePatterns.team, lazy: async () => ({ Component: (await import('../pages/team-page.tsx')).TeamPage }) },
            ],
          },
        ],
      },
      { path: routePatterns.signIn, lazy: async () => ({ Component: (await import('../pages/sign-in-page.tsx')).SignInPage }) },
      { path: routePatterns.register, lazy: async () => ({ Component: (await import('../pages/register-page.tsx')).RegisterPage }) },
      { path: routePatterns.portal, lazy: async () => ({ Component: (await import('../pages/portal-page.tsx')).PortalPage }) },
      { path: routePatterns.mailbox, lazy: async () => ({ Component: (await import('../pages/mailbox-page.tsx')).MailboxPage }) },
      { path: '*', element: <NotFound /> },
    ],
  },
];

export function createRouter() {
  return createBrowserRouter(routes);
}
