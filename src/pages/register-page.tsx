import { Link, useNavigate } from 'react-router-dom';
import { EntryPage } from '../components/entry-page.tsx';
import { RegisterForm } from '../features/people/register-form.tsx';
import { usePageTitle } from '../lib/page-title.ts';
import { paths } from '../lib/paths.ts';

export function RegisterPage() {
  usePageTitle('Register a shop');
  const navigate = useNavigate();
  return (
    <EntryPage title="Register a shop">
      <RegisterForm onEntered={() => void navigate(paths.jobs, { replace: true })} />
      <p className="text-ink-700">
        Registered already?{' '}
        <Link to={paths.signIn()} className="font-semibold text-chalk-600 underline">
          Sign in
        </Link>
        .
      </p>
    </EntryPage>
  );
}
