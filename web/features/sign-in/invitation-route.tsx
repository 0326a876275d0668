import { type LoaderFunctionArgs, useParams } from 'react-router-dom';
import { queryClient } from '../../lib/client';
import { invitationLinkQuery } from './api/invitation-link';
import { InvitationPage } from './components/invitation-page';

export async function loader({ params }: LoaderFunctionArgs) {
  await queryClient.ensureQueryData(invitationLinkQuery(params.token ?? ''));
  return null;
}

export function Component() {
  const { token = '' } = useParams();
  return <InvitationPage token={token} />;
}
