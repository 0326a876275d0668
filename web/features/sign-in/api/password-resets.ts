import { requestPasswordReset, resetPassword } from '#shared/contracts/session';
import { call } from '../../../lib/api';

export function askForPasswordReset(email: string) {
  return call(requestPasswordReset, { body: { email } });
}

export function setNewPassword(token: string, password: string) {
  return call(resetPassword, { params: { token }, body: { password } });
}
