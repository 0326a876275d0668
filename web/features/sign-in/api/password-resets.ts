import { requestPasswordReset, resetPassword } from '#shared/contracts/session';
import { useActKey } from '../../../lib/act-key';
import { call } from '../../../lib/api';

export function useAskForPasswordReset() {
  const act = useActKey();
  return async (email: string) => {
    await call(requestPasswordReset, { body: { email }, idempotencyKey: act.keyFor(email) });
    act.done();
  };
}

export function setNewPassword(token: string, password: string) {
  return call(resetPassword, { params: { token }, body: { password } });
}
