import { useQueryClient } from '@tanstack/react-query';
import { NavLink, useNavigate } from 'react-router-dom';
import { toast } from 'sonner';
import { type Me, peopleApi } from '../../shared/people/people.api.ts';
import { may } from '../../shared/people/permissions.ts';
import { classNames } from '../components/class-names.ts';
import { Menu, MenuItem, MenuRule, MenuWords } from '../components/menu.tsx';
import { call } from '../lib/call.ts';
import { useHealth } from '../lib/health.ts';
import { paths } from '../lib/paths.ts';
import mark from './mark.svg';

/** The shop's name, the ways through the program, and the reader's own menu. */
export function Header({ me }: { me: Me }) {
  const health = useHealth();
  const ways = [
    { to: paths.jobs, words: 'Jobs' },
    { to: paths.patterns, words: 'Pattern book' },
    ...(may(me.role, 'change patterns') ? [{ to: paths.hardware, words: 'Hardware book' }] : []),
    ...(may(me.role, 'run shop') ? [{ to: paths.team, words: 'Team' }] : []),
    ...(health?.development ? [{ to: paths.mailbox, words: 'Mailbox' }] : []),
  ];
  return (
    <header data-screen-only className="flex flex-wrap items-center gap-x-6 border-b border-ink-700 bg-plaster-100 px-4 sm:px-6">
      <p className="flex min-w-0 flex-1 items-center gap-2 py-2 font-bold text-ink-900 sm:flex-none">
        <img src={mark} alt="" className="size-6" />
        <span className="truncate">{me.shop.name}</span>
      </p>
      <nav aria-label="Main" className="order-last -mx-2 flex w-full overflow-x-auto sm:order-none sm:w-auto">
        {ways.map(({ to, words }) => (
          <NavLink
            key={to}
            to={to}
            className={({ isActive }) =>
              classNames(
                'border-b-4 px-3 pt-2 pb-1.5 font-semibold whitespace-nowrap hover:text-chalk-700',
                isActive ? 'border-chalk-600 text-chalk-700' : 'border-transparent text-ink-700',
              )
            }
          >
            {words}
          </NavLink>
        ))}
      </nav>
      <div className="ml-auto shrink-0">
        <AccountMenu me={me} />
      </div>
    </header>
  );
}

function AccountMenu({ me }: { me: Me }) {
  const client = useQueryClient();
  const navigate = useNavigate();
  const signOut = async () => {
    try {
      await call(peopleApi.signOut);
      await navigate(paths.signIn());
      client.clear();
    } catch {
      toast.error('You are still signed in: the server could not be reached.');
    }
  };
  return (
    <Menu label={<span className="max-w-28 truncate sm:max-w-48">{me.name}</span>} name={`${me.name}: account`}>
      <MenuWords>
        {me.email}
        <br />
        Signed in as {me.role}
      </MenuWords>
      <MenuRule />
      <MenuItem onSelect={() => void signOut()}>Sign out</MenuItem>
    </Menu>
  );
}
