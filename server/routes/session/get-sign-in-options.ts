import { getSignInOptions } from '#shared/contracts/session';
import { listDemoPeople } from '../../db/queries/demo-sign-ins';
import { anyOrganisation } from '../../db/queries/organisations';
import { openRoute } from '../define-route';

export const getSignInOptionsRoute = openRoute(getSignInOptions, async ({ deps }) => ({
  demoPeople: await listDemoPeople(deps.db),
  setUpNeeded: !(await anyOrganisation(deps.db)),
}));
