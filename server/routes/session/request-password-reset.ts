import { fromNodeHeaders } from 'better-auth/node';
import { requestPasswordReset } from '#shared/contracts/session';
import { openRoute } from '../define-route';

/** Answers alike whether the address is known or not. */
export const requestPasswordResetRoute = openRoute(requestPasswordReset, async ({ deps, body, http }) => {
  await deps.rateLimits.use('resetByEmail', body.email.toLowerCase());
  await deps.auth.api.requestPasswordReset({
    body: { email: body.email },
    headers: fromNodeHeaders(http.request.headers),
  });
  return undefined;
});
