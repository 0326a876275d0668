import type { LoaderFunctionArgs } from 'react-router-dom';
import { queryClient } from '../../lib/client';
import { revisionQuery } from '../../lib/queries/revision-query';
import { readRevisionParams } from '../../lib/revision-params';
import { roomQuery } from './api/room-query';

export { RoomPage as Component } from './components/room-page';

export async function loader({ params }: LoaderFunctionArgs) {
  const at = readRevisionParams(params);
  await Promise.all([
    queryClient.ensureQueryData(revisionQuery(at)),
    queryClient.ensureQueryData(roomQuery(at)),
  ]);
  return null;
}
