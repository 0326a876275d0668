import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { Problem } from '#server/problem';
import { parseRequest } from '#server/routes/parse-request';

const endpoint = {
  params: z.strictObject({ id: z.uuid() }),
  query: z.strictObject({ page: z.coerce.number().int().optional() }),
  body: z.strictObject({ name: z.string().min(1), 'a/b': z.array(z.object({ c: z.number() })).default([]) }),
};
const id = '0197a0a0-0000-7000-8000-000000000001';

function problemOf(raw: { params: unknown; query: unknown; body: unknown }): Problem {
  try {
    parseRequest(endpoint, raw);
  } catch (error) {
    if (error instanceof Problem) return error;
  }
  throw new Error('nothing was refused');
}

describe('parsing a request', () => {
  it('gives what the schemas make of it', () => {
    const parsed = parseRequest(endpoint, { params: { id }, query: { page: '2' }, body: { name: 'x' } });
    expect(parsed).toEqual({ params: { id }, query: { page: 2 }, body: { name: 'x', 'a/b': [] } });
  });

  it('answers an address that cannot name anything as not found', () => {
    const problem = problemOf({ params: { id: 'drop table' }, query: {}, body: {} });
    expect(problem.slug).toBe('not-found');
  });

  it('tells all faults of query and body at once, each with its place', () => {
    const body = { name: '', 'a/b': [{ c: 'x' }], unknown: 1 };
    const { slug, details } = problemOf({ params: { id }, query: { page: 'x' }, body });
    expect(slug).toBe('invalid-input');
    expect(details.errors?.map(({ pointer }) => pointer)).toEqual(['/query/page', '/name', '/a~1b/0/c', '']);
  });

  it('takes a missing body for an empty one', () => {
    const { details } = problemOf({ params: { id }, query: {}, body: undefined });
    expect(details.errors?.map(({ pointer }) => pointer)).toEqual(['/name']);
  });
});
