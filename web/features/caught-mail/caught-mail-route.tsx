import { useParams } from 'react-router-dom';
import { queryClient } from '../../lib/client';
import { caughtMailsQuery } from './api/caught-mail';
import { CaughtMailPage } from './components/caught-mail-page';

export async function loader() {
  await queryClient.ensureQueryData(caughtMailsQuery());
  return null;
}

export function Component() {
  const { mailId = null } = useParams();
  return <CaughtMailPage mailId={mailId} />;
}
