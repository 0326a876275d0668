import { APIError } from 'better-auth/api';
import { fromNodeHeaders } from 'better-auth/node';
import type { Deps } from '../deps';
import type { SignedInPerson } from '../middleware/authenticate';
import { Problem } from '../problem';
import type { RawExchange } from '../routes/define-route';

interface Credentials {
  email: string;
  password: string;
}

/**
 * Checks the password and sets the session cookie. Tries are counted by mail address and network address
 * before the password is looked at, so that a burst cannot slip past the count.
 */
export async function signInWithPassword(
  deps: Deps,
  { request, response }: RawExchange['http'],
  { email, password }: Credentials,
): Promise<SignedInPerson> {
  const address = request.ip ?? '';
  const key = `${email.toLowerCase()} ${address}`;
  await deps.rateLimits.check('signInByAddress', address);
  await deps.rateLimits.use('signIn', key);
  const signedIn = await tryPassword(deps, request.headers, { email, password });
  if (signedIn === null) {
    await deps.rateLimits.use('signInByAddress', address);
    throw new Problem('wrong-sign-in');
  }
  await deps.rateLimits.forget('signIn', key);
  for (const cookie of signedIn.cookies) response.append('Set-Cookie', cookie);
  return signedIn.person;
}

async function tryPassword(
  deps: Deps,
  headers: RawExchange['http']['request']['headers'],
  body: Credentials,
): Promise<{ person: SignedInPerson; cookies: string[] } | null> {
  try {
    const result = await deps.auth.api.signInEmail({
      body,
      headers: fromNodeHeaders(headers),
      returnHeaders: true,
    });
    const { user } = result.response;
    return {
      person: { id: user.id, name: user.name, email: user.email },
      cookies: result.headers.getSetCookie(),
    };
  } catch (error) {
    if (error instanceof APIError && error.statusCode < 500) return null;
    throw error;
  }
}
