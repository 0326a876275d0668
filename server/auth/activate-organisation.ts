import type { Deps } from '../deps';
import type { RawExchange } from '../routes/define-route';

interface Activation {
  organisationId: string;
  http: RawExchange['http'];
}

/** For a session that began in this very exchange: its cookie is on the answer, not on the request. */
export async function activateOrganisation(deps: Deps, { organisationId, http }: Activation): Promise<void> {
  const set = http.response.getHeader('set-cookie');
  const cookies = (Array.isArray(set) ? set : [String(set ?? '')]).map(
    (cookie) => cookie.split(';')[0] ?? '',
  );
  await deps.auth.api.setActiveOrganization({
    body: { organizationId: organisationId },
    headers: new Headers({ cookie: cookies.join('; ') }),
  });
}
