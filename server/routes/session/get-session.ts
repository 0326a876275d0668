import { getSession } from '#shared/contracts/session';
import { personRoute } from '../define-route';
import { viewSession } from './view-session';

export const getSessionRoute = personRoute(getSession, async ({ deps, signedIn }) =>
  viewSession(deps, signedIn),
);
