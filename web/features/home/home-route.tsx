import { redirect } from 'react-router-dom';
import { queryClient } from '../../lib/client';
import { paths } from '../../lib/paths';
import { sessionQuery } from '../../lib/queries/session-query';
import { homeQuery } from './api/get-home';
import { HomePage } from './components/home-page';

/** Home follows from the organisation: a contractor's mixes, an agency's queue where the reader may see it. */
export async function loader() {
  const { active, abilities } = await queryClient.ensureQueryData(sessionQuery());
  if (active?.kind === 'agency') return redirect(abilities.seeQueue ? paths.queue : paths.submittals);
  await queryClient.ensureQueryData(homeQuery());
  return null;
}

export function Component() {
  return <HomePage />;
}
