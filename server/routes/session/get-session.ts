import { getSession } from '#shared/contracts/session';
import { presentSession } from '../../presenters/present-session';
import { personRoute } from '../define-route';

export const getSessionRoute = personRoute(getSession, async ({ deps, signedIn }) =>
  presentSession(deps, signedIn),
);
