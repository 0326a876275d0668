import { Suspense } from 'react';
import { Link, Outlet, useLoaderData } from 'react-router-dom';
import { Wordmark } from '../components/ui/wordmark';
import { queryClient } from '../lib/client';
import { paths } from '../lib/paths';
import { Problem } from '../lib/problem';
import { sessionQuery } from '../lib/queries/session-query';
import { PageLoading } from './root-layout';
import { SignedInLayout } from './signed-in-layout';

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

/** A page that is open to all, with the whole head for those who are signed in. */
export async function eitherLoader(): Promise<{ signedIn: boolean }> {
  try {
    const session = await queryClient.ensureQueryData(sessionQuery());
    return { signedIn: session.active !== null };
  } catch (error) {
    if (error instanceof Problem && error.slug === 'not-signed-in') return { signedIn: false };
    throw error;
  }
}

export function EitherLayout() {
  const { signedIn } = useLoaderData<typeof eitherLoader>();
  return signedIn ? <SignedInLayout /> : <OpenLayout />;
}
