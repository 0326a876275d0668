import { lazy, Suspense } from 'react';
import { Outlet, redirect } from 'react-router-dom';
import { queryClient } from '../lib/client';
import { paths } from '../lib/paths';
import { Problem } from '../lib/problem';
import { sessionQuery } from '../lib/queries/session-query';
import { PageLoading } from './root-layout';
import { useKeyListOpen } from './shell/key-list-state';
import { RunningHead } from './shell/running-head';

/** Nobody signed in goes to the sign-in page and comes back; without an organisation one is chosen first. */
export async function loader({ request }: { request: Request }) {
  const { pathname, search } = new URL(request.url);
  try {
    const session = await queryClient.ensureQueryData(sessionQuery());
    if (session.active === null && pathname !== paths.chooseOrganisation)
      return redirect(paths.chooseOrganisation);
    return null;
  } catch (error) {
    if (error instanceof Problem && error.slug === 'not-signed-in') {
      const next = pathname === '/' ? '' : `?next=${encodeURIComponent(pathname + search)}`;
      return redirect(paths.signIn + next);
    }
    throw error;
  }
}

export function SignedInLayout() {
  const keyListOpen = useKeyListOpen();
  return (
    <>
      <a className="skip-link" href="#content">
        To the page
      </a>
      <RunningHead />
      {keyListOpen ? (
        <Suspense fallback={null}>
          <KeyList />
        </Suspense>
      ) : null}
      <Suspense fallback={<PageLoading />}>
        <Outlet />
      </Suspense>
    </>
  );
}

export { SignedInLayout as Component };

const KeyList = lazy(() => import('./shell/key-list').then((module) => ({ default: module.KeyList })));
