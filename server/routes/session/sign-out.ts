import { fromNodeHeaders } from 'better-auth/node';
import { signOut } from '#shared/contracts/session';
import { personRoute } from '../define-route';

export const signOutRoute = personRoute(signOut, async ({ deps, http }) => {
  const { headers } = await deps.auth.api.signOut({
    headers: fromNodeHeaders(http.request.headers),
    returnHeaders: true,
  });
  for (const cookie of headers.getSetCookie()) http.response.append('Set-Cookie', cookie);
  return undefined;
});
