import { Suspense } from 'react';
import { Link, Outlet } from 'react-router-dom';
import { Wordmark } from '../components/ui/wordmark';
import { paths } from '../lib/paths';
import { PageLoading } from './root-layout';

/** Pages without a session: nothing to go to but the product itself. */
export function OpenLayout() {
  return (
    <>
      <header className="running-head">
        <Link className="wordmark" to={paths.home} aria-label="Clauseway">
          <Wordmark />
        </Link>
      </header>
      <Suspense fallback={<PageLoading />}>
        <Outlet />
      </Suspense>
    </>
  );
}
