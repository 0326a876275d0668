import type { z } from 'zod';
import type { Endpoint } from '#shared/contracts/endpoint';
import type { ProblemError } from '#shared/contracts/problems';
import { Problem } from '../problem';

interface Parts {
  params: unknown;
  query: unknown;
  body: unknown;
}

/**
 * Parses all three parts by the endpoint's schemas. An address that names nothing possible is not found,
 * as one that names nothing present; every fault of query and body is told at once.
 */
export function parseRequest<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType>(
  endpoint: Pick<Endpoint<P, Q, B>, 'params' | 'query' | 'body'>,
  raw: Parts,
): { params: z.output<P>; query: z.output<Q>; body: z.output<B> } {
  const params = parsePart(endpoint.params, raw.params);
  if (!params.ok) throw new Problem('not-found');
  const query = parsePart(endpoint.query, raw.query);
  const body = parsePart(endpoint.body, raw.body ?? {});
  const errors = [
    ...(query.ok ? [] : query.issues.map((issue) => errorOf(issue, '/query'))),
    ...(body.ok ? [] : body.issues.map((issue) => errorOf(issue, ''))),
  ];
  if (!query.ok || !body.ok) {
    const detail = errors.length === 1 ? errors[0]!.detail : `${errors.length} fields cannot be used.`;
    throw new Problem('invalid-input', { detail, errors });
  }
  return { params: params.value, query: query.value, body: body.value };
}

type Parsed<Schema extends z.ZodType> =
  | { ok: true; value: z.output<Schema> }
  | { ok: false; issues: z.core.$ZodIssue[] };

function parsePart<Schema extends z.ZodType>(schema: Schema | undefined, value: unknown): Parsed<Schema> {
  // Without a schema the part is undefined by type too: the endpoint declares none.
  if (schema === undefined) return { ok: true, value: undefined as z.output<Schema> };
  const parsed = schema.safeParse(value);
  return parsed.success ? { ok: true, value: parsed.data } : { ok: false, issues: parsed.error.issues };
}

function errorOf(issue: z.core.$ZodIssue, prefix: string): ProblemError {
  const path = issue.path.map((part) => String(part).replaceAll('~', '~0').replaceAll('/', '~1'));
  return { pointer: [prefix, ...path].join('/'), detail: issue.message };
}
