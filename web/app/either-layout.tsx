import { useLoaderData } from 'react-router-dom';
import { queryClient } from '../lib/client';
import { Problem } from '../lib/problem';
import { sessionQuery } from '../lib/queries/session-query';
import { OpenLayout } from './open-layout';
import { SignedInLayout } from './signed-in-layout';

/** A page that is open to all, with the whole head for those who are signed in. */
export async function loader(): Promise<{ signedIn: boolean }> {
  try {
    const session = await queryClient.ensureQueryData(sessionQuery());
    return { signedIn: session.active !== null };
  } catch (error) {
    if (error instanceof Problem && error.slug === 'not-signed-in') return { signedIn: false };
    throw error;
  }
}

function EitherLayout() {
  const { signedIn } = useLoaderData<typeof loader>();
  return signedIn ? <SignedInLayout /> : <OpenLayout />;
}

export { EitherLayout as Component };
