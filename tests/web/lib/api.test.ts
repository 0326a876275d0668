// @vitest-environment happy-dom
import { describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { endpoint } from '#shared/contracts/endpoint';
import { call, hrefOf } from '../../../web/lib/api';
import { asProblem, Problem } from '../../../web/lib/problem';
import { aProblemResponse, stubServer } from '../render-page';

const getThing = endpoint({
  method: 'get',
  path: '/api/things/:thingId',
  summary: 'A thing',
  params: z.strictObject({ thingId: z.string() }),
  query: z.strictObject({ q: z.string().optional(), from: z.number().optional() }),
  response: z.strictObject({ name: z.string() }),
});

const changeThing = endpoint({
  method: 'patch',
  path: '/api/things/:thingId',
  summary: 'Change a thing',
  params: z.strictObject({ thingId: z.string() }),
  body: z.strictObject({ name: z.string() }),
  response: z.strictObject({ name: z.string() }),
  versioned: true,
  idempotent: true,
});

const sendThing = endpoint({
  method: 'post',
  path: '/api/things',
  summary: 'Send a thing',
  body: z.strictObject({ name: z.string() }),
  files: ['workbook'],
  status: 204,
});

async function problemOf(promise: Promise<unknown>): Promise<Problem> {
  const error: unknown = await promise.then(
    () => null,
    (thrown: unknown) => thrown,
  );
  if (!(error instanceof Problem)) throw new Error('No problem was thrown.');
  return error;
}

describe('calling an endpoint', () => {
  it('fills the path, leaves out what is not asked, and parses the answer', async () => {
    const sent = stubServer({ 'GET /api/things/a%2Fb': { name: 'sieve' } });
    const thing = await call(getThing, { params: { thingId: 'a/b' }, query: { from: 3 } });
    expect(thing).toEqual({ name: 'sieve' });
    expect(sent[0]?.path).toBe('/api/things/a%2Fb?from=3');
  });

  it('sends the version that was seen and a key for the act', async () => {
    const sent = stubServer({ 'PATCH /api/things/1': { name: 'pan' } });
    const act = { params: { thingId: '1' }, body: { name: 'pan' }, version: 4 };
    await call(changeThing, { ...act, idempotencyKey: 'kept' });
    await call(changeThing, act);
    await call(changeThing, act);
    expect(sent[0]?.headers.get('If-Match')).toBe('"4"');
    expect(sent[0]?.headers.get('Idempotency-Key')).toBe('kept');
    expect(sent[0]?.body).toEqual({ name: 'pan' });
    const made = sent.slice(1).map((request) => request.headers.get('Idempotency-Key'));
    expect(made[0]).toMatch(/^[0-9a-f]{32}$/);
    expect(made[0]).not.toBe(made[1]);
  });

  it('sends files beside their text fields', async () => {
    const sent = stubServer({ 'POST /api/things': new Response(null, { status: 204 }) });
    const workbook = new File(['x'], 'mix.xlsx');
    await call(sendThing, { body: { name: 'mix' }, files: { workbook } });
    const form = sent[0]?.body;
    if (!(form instanceof FormData)) throw new Error('Not a form.');
    expect(form.get('name')).toBe('mix');
    expect(form.get('workbook')).toBeInstanceOf(File);
    expect(sent[0]?.headers.get('Content-Type')).toBeNull();
  });

  it('makes the address of a file with its query', () => {
    expect(hrefOf(getThing, { params: { thingId: 'x' }, query: { q: 'a b' } })).toBe('/api/things/x?q=a+b');
  });
});

describe('what comes back instead', () => {
  it('throws the problem as the server told it, with its fields', async () => {
    const errors = [{ pointer: '/name', detail: 'Enter a name.' }];
    stubServer({ 'GET /api/things/1': aProblemResponse('invalid-input', 422, { errors }) });
    const problem = await problemOf(call(getThing, { params: { thingId: '1' }, query: {} }));
    expect(problem).toMatchObject({ slug: 'invalid-input', status: 422, errors, requestId: 'r-1' });
  });

  it('names an answer that is no problem document by its status and request', async () => {
    stubServer({
      'GET /api/things/1': new Response('<html>', { status: 502, headers: { 'X-Request-Id': 'r-9' } }),
    });
    const problem = await problemOf(call(getThing, { params: { thingId: '1' }, query: {} }));
    expect(problem).toMatchObject({ status: 502, requestId: 'r-9' });
  });

  it('refuses an answer that is not the contract instead of showing half of it', async () => {
    stubServer({ 'GET /api/things/1': { title: 'sieve' } });
    const problem = await problemOf(call(getThing, { params: { thingId: '1' }, query: {} }));
    expect(problem.slug).toBe('unexpected-answer');
  });

  it('says that the server did not answer', async () => {
    vi.stubGlobal('fetch', () => Promise.reject(new TypeError('Failed to fetch')));
    const problem = await problemOf(call(getThing, { params: { thingId: '1' }, query: {} }));
    expect(problem).toMatchObject({ slug: 'no-connection', status: 0 });
  });

  it('turns any other fault into a problem without its stack', () => {
    expect(asProblem(new Error('secret')).message).not.toContain('secret');
  });
});
