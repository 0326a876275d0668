import request from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { allRoutes } from '#server/routes/all-routes';
import { aSignedIn, makeOrganisation } from './harness/organisations';
import { origin, startTestApp, type TestApp } from './harness/test-app';

let test: TestApp;

beforeAll(async () => {
  test = await startTestApp();
});

afterAll(() => test.close());

const id = '0197a0a0-0000-7000-8000-000000000001';

/** An address of the route that names nothing. */
function addressOf(path: string): string {
  return path
    .replace(':number', '0')
    .replace(':index', '0')
    .replace(/:check$/, '1')
    .replace(':ruleSetId', 'none')
    .replace(':edition', '2000')
    .replace(':token', 'a-token-that-nobody-made')
    .replace(/:\w+/g, id);
}

const routes = allRoutes({ smtpUrl: null } as never).map(({ endpoint, access }) => ({
  name: `${endpoint.method.toUpperCase()} ${endpoint.path}`,
  endpoint,
  access,
}));
const writes = routes.filter(({ endpoint }) => endpoint.method !== 'get');

describe('every route', () => {
  it('stands once in the list', () => {
    const names = routes.map(({ name }) => name);
    expect(names).toEqual([...new Set(names)]);
  });

  it.each(routes.filter(({ access }) => access !== 'open'))(
    '$name asks for a sign-in',
    async ({ endpoint }) => {
      const answer = await request(test.app)[endpoint.method](addressOf(endpoint.path)).set('Origin', origin);
      expect(answer.status).toBe(401);
      expect(answer.body.type).toBe('/problems/not-signed-in');
      expect(answer.get('Content-Type')).toMatch(/^application\/problem\+json/);
    },
  );

  it.each(routes)('$name is declared open exactly where it needs no sign-in', ({ endpoint, access }) => {
    expect(endpoint.open ?? false).toBe(access === 'open');
  });

  it.each(writes)('$name refuses another origin and a request that names none', async ({ endpoint }) => {
    const send = () => request(test.app)[endpoint.method](addressOf(endpoint.path));
    for (const sending of [
      send(),
      send().set('Origin', 'https://elsewhere.example'),
      send().set('Origin', 'null'),
      send().set('Origin', `${origin}.elsewhere.example`),
    ]) {
      const answer = await sending;
      expect(answer.status).toBe(403);
      expect(answer.body.type).toBe('/problems/foreign-origin');
    }
  });

  it('with the origin check on although NODE_ENV says test', () => {
    expect(process.env.NODE_ENV).toBe('test');
  });

  it.each(routes.filter(({ endpoint }) => endpoint.versioned))(
    '$name asks for the version that the writer saw',
    async ({ endpoint }) => {
      const agency = await makeOrganisation(test, { name: 'Versions', kind: 'agency' });
      const person = await aSignedIn(test, { organisation: agency, roles: ['administrator'] });
      const answer = await person[endpoint.method](addressOf(endpoint.path)).send({});
      expect(answer.status).toBe(428);
    },
  );
});

/** Writes that need neither a version nor a key, and why. */
const unguarded: Record<string, string> = {
  'POST /api/session': 'signing in twice is two sign-ins, and neither undoes the other',
  'DELETE /api/session': 'a session is its browser’s own and ends once',
  'PUT /api/session/organisation': 'a session is its browser’s own; the last choice holds',
  'POST /api/password-resets/:token': 'the link works once',
  'POST /api/invitation-links/:token': 'the link works once',
  'POST /api/set-up/:token': 'the link works once',
  'POST /api/submittals/:submittalId/revisions/:number/reading/preview': 'nothing is kept',
  'POST /api/mappings/import/preview': 'nothing is kept',
};

describe('every write', () => {
  it.each(writes.filter(({ name }) => !(name in unguarded)))(
    '$name carries the version that it changes, or a key where it creates or sends',
    ({ endpoint: { method, versioned, idempotent, files } }) => {
      expect(versioned || (method === 'post' && idempotent)).toBe(true);
      // What is uploaded is stored, so a repeat must be known for one.
      if (files !== undefined) expect(idempotent).toBe(true);
    },
  );

  it('that needs neither is still there', () => {
    const names = writes.map(({ name }) => name);
    expect(Object.keys(unguarded).filter((name) => !names.includes(name))).toEqual([]);
  });
});

describe('the description of the API', () => {
  it('is OpenAPI 3.1 and names every route', async () => {
    const { body } = await request(test.app).get('/api/openapi.json').expect(200);
    expect(body.openapi).toBe('3.1.0');
    const described = Object.entries(body.paths as Record<string, object>).flatMap(([path, operations]) =>
      Object.keys(operations).map((method) => `${method.toUpperCase()} ${path}`),
    );
    const registered = routes.map(({ name }) => name.replace(/:(\w+)/g, '{$1}'));
    expect(described.sort()).toEqual(registered.sort());
  });

  it('names the headers that versioned and idempotent acts need', async () => {
    const { body } = await request(test.app).get('/api/openapi.json');
    const names = (path: string, method: string) =>
      body.paths[path][method].parameters
        .filter((parameter: { in: string }) => parameter.in === 'header')
        .map((parameter: { name: string }) => parameter.name);
    expect(names('/api/projects', 'post')).toEqual(['Idempotency-Key']);
    expect(names('/api/projects/{projectId}', 'patch')).toEqual(['If-Match']);
  });
});

describe('what is not the product', () => {
  it('answers an unknown address under /api as a problem', async () => {
    const answer = await request(test.app).get('/api/nothing').expect(404);
    expect(answer.body).toMatchObject({ type: '/problems/not-found', status: 404 });
    expect(answer.body.requestId).toBe(answer.get('X-Request-Id'));
  });

  it('answers JSON that is cut off as malformed, not as an error of ours', async () => {
    const answer = await request(test.app)
      .post('/api/session')
      .set('Origin', origin)
      .set('Content-Type', 'application/json')
      .send('{"email":');
    expect(answer.status).toBe(400);
    expect(answer.body.type).toBe('/problems/malformed-request');
  });

  it('names every fault of a body at once, each with its place', async () => {
    const answer = await request(test.app).post('/api/session').set('Origin', origin).send({ email: 'x' });
    expect(answer.status).toBe(422);
    expect(answer.body.errors.map(({ pointer }: { pointer: string }) => pointer)).toEqual([
      '/email',
      '/password',
    ]);
  });

  it('takes a request number of a client only where it is harmless', async () => {
    const kept = await request(test.app).get('/api/health').set('X-Request-Id', 'balancer-0001');
    expect(kept.get('X-Request-Id')).toBe('balancer-0001');
    const replaced = await request(test.app).get('/api/health').set('X-Request-Id', 'a b<script>');
    expect(replaced.get('X-Request-Id')).not.toContain('script');
  });

  it('allows scripts and styles from its own address only', async () => {
    const policy = (await request(test.app).get('/api/health')).get('Content-Security-Policy') ?? '';
    expect(policy).toContain("script-src 'self'");
    expect(policy).not.toContain('unsafe');
    expect(policy).toContain("frame-ancestors 'none'");
  });

  it('is ready only while the database answers', async () => {
    await request(test.app).get('/api/health').expect(200);
    await request(test.app).get('/api/ready').expect(200);
  });
});
