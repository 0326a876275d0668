import { type Session, signIn } from '#shared/contracts/session';
import { call } from '../../../lib/api';
import { useBeginSession } from '../../../lib/queries/use-begin-session';

export function useSignIn() {
  const begin = useBeginSession();
  return async (given: { email: string; password: string }): Promise<Session> =>
    begin(await call(signIn, { body: given }));
}
