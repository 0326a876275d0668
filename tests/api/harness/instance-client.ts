import { demoPassword, demoPerson } from '#server/db/seed/demo-people';

/** Somebody with a browser, against a running instance of the product. */
export async function signInTo(url: string, name: string) {
  const answer = await fetch(`${url}/api/session`, {
    method: 'POST',
    headers: { Origin: url, 'Content-Type': 'application/json' },
    body: JSON.stringify({ email: demoPerson(name).email, password: demoPassword }),
  });
  if (answer.status !== 200) throw new Error(`${name} was not let in: ${answer.status}`);
  const cookie = answer.headers
    .getSetCookie()
    .map((each) => each.split(';')[0])
    .join('; ');
  const headers = { Origin: url, Cookie: cookie };
  return {
    get: (path: string) => fetch(`${url}${path}`, { headers }),
    post: (path: string, body: FormData | object, more: Record<string, string> = {}) =>
      fetch(`${url}${path}`, {
        method: 'POST',
        headers: {
          ...headers,
          ...more,
          ...(body instanceof FormData ? {} : { 'Content-Type': 'application/json' }),
        },
        body: body instanceof FormData ? body : JSON.stringify(body),
      }),
  };
}
