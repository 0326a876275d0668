import { Link, NavLink } from 'react-router-dom';
import { Wordmark } from '../../components/ui/wordmark';
import { SearchField } from '../../features/search/components/search-field';
import { paths } from '../../lib/paths';
import { usePrintText } from '../../lib/print-frame';
import { useSession } from '../../lib/queries/session-query';
import { HeadMenus } from './head-menus';
import { navigationOf } from './navigation';
import { useShellKeys } from './use-shell-keys';

export function RunningHead() {
  const session = useSession();
  useShellKeys();
  usePrintText('organisation', session.active?.organisationName ?? 'Clauseway');
  return (
    <header className="running-head">
      <Link className="wordmark" to={paths.home} aria-label="Clauseway">
        <Wordmark />
      </Link>
      <nav aria-label="Main">
        {navigationOf(session).map((item) => (
          <NavLink key={item.to} to={item.to} end={item.to === paths.home}>
            {item.label}
          </NavLink>
        ))}
      </nav>
      <div className="running-head-end">
        <SearchField />
        <HeadMenus session={session} />
      </div>
    </header>
  );
}
