import { useQuery } from '@tanstack/react-query';
import { Navigate, Outlet, useLocation } from 'react-router-dom';
import { ErrorState } from '../components/error-state.tsx';
import { Loading } from '../components/loading.tsx';
import { Page } from '../components/page.tsx';
import { paths } from '../lib/paths.ts';
import { meQuery, sessionEndedQuery } from '../lib/session.ts';
import { Header } from './header.tsx';
import { SignInAgain } from './sign-in-again.tsx';

/** The signed-in part: header, and the page below it. Sends on to sign in where nobody is. */
export function Shell() {
  const location = useLocation();
  const me = useQuery({ ...meQuery, refetchInterval: 4 * 60_000 });
  const ended = useQuery(sessionEndedQuery).data;

  if (me.data === undefined) {
    return (
      <main id="main">
        <Page narrow>{me.isError ? <ErrorState error={me.error} onRetry={() => void me.refetch()} /> : <Loading what="your shop" />}</Page>
      </main>
    );
  }
  if (me.data === null) return <Navigate to={paths.signIn(location.pathname + location.search)} replace />;
  return (
    <div className="flex min-h-dvh flex-col">
      <Header me={me.data} />
      <main id="main" tabIndex={-1} className="flex grow flex-col outline-none">
        <Outlet />
      </main>
      {ended ? <SignInAgain email={me.data.email} /> : null}
    </div>
  );
}
