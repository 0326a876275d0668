import { chooseOrganisation } from '#shared/contracts/session';
import { call } from '../../../lib/api';
import { useBeginSession } from '../../../lib/queries/use-begin-session';

export function useChooseOrganisation() {
  const begin = useBeginSession();
  return async (organisationId: string) =>
    begin(await call(chooseOrganisation, { body: { organisationId } }));
}
