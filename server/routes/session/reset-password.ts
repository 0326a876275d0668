import { APIError } from 'better-auth/api';
import { resetPassword } from '#shared/contracts/session';
import { Problem } from '../../problem';
import { openRoute } from '../define-route';

export const resetPasswordRoute = openRoute(resetPassword, async ({ deps, params, body }) => {
  try {
    await deps.auth.api.resetPassword({ body: { token: params.token, newPassword: body.password } });
  } catch (error) {
    if (error instanceof APIError && error.statusCode < 500) throw new Problem('link-used');
    throw error;
  }
  return undefined;
});
