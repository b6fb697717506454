import { Link, useNavigate, useSearchParams } from 'react-router-dom';
import { EntryPage } from '../components/entry-page.tsx';
import { SignInForm } from '../features/people/sign-in-form.tsx';
import { useHealth } from '../lib/health.ts';
import { usePageTitle } from '../lib/page-title.ts';
import { paths, safeBack } from '../lib/paths.ts';

export function SignInPage() {
  usePageTitle('Sign in');
  const health = useHealth();
  const navigate = useNavigate();
  const [search] = useSearchParams();
  return (
    <EntryPage title="Sign in">
      <SignInForm demo={health?.demo ?? []} onEntered={() => void navigate(safeBack(search.get('back')), { replace: true })} />
      <p className="text-ink-700">
        No shop here yet?{' '}
        <Link to={paths.register} className="font-semibold text-chalk-600 underline">
          Register one
        </Link>
        . Clients need no password: their link is in the mail from the shop.
      </p>
    </EntryPage>
  );
}
