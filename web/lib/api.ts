import type { z } from 'zod';
import type { Endpoint } from '#shared/contracts/endpoint';
import { newKey } from './new-key';
import { Problem, problemFromNetwork, problemFromResponse } from './problem';

type Given<Schema extends z.ZodType, Key extends string> = Schema extends z.ZodUndefined
  ? { [K in Key]?: undefined }
  : { [K in Key]: z.input<Schema> };

export type CallInput<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType> = Given<P, 'params'> &
  Given<Q, 'query'> &
  Given<B, 'body'> & {
    /** Multipart files by field name; the body's fields go beside them as text. */
    files?: Record<string, File>;
    /** Sent as `If-Match` where the endpoint is versioned. */
    version?: number;
    /** Kept by the caller where a repeat of the same act has to be recognised; else each call is its own act. */
    idempotencyKey?: string;
    signal?: AbortSignal;
  };

/** The one way to the server: calls a declared endpoint, parses its answer, throws a `Problem` for all else. */
export async function call<
  P extends z.ZodType,
  Q extends z.ZodType,
  B extends z.ZodType,
  R extends z.ZodType,
>(endpoint: Endpoint<P, Q, B, R>, input: CallInput<P, Q, B>): Promise<z.output<R>> {
  const response = await send(endpoint, input);
  if (!response.ok) throw await problemFromResponse(response);
  if (!endpoint.response) return undefined as z.output<R>;
  const answer: unknown = await response.json().catch(() => null);
  const parsed = endpoint.response.safeParse(answer);
  if (parsed.success) return parsed.data;
  throw unexpectedAnswer(endpoint.path, response);
}

/** The address of an endpoint that a link opens: a file to save, a PDF to look at. */
export function hrefOf<P extends z.ZodType, Q extends z.ZodType>(
  endpoint: Pick<Endpoint<P, Q>, 'path'>,
  { params, query }: { params?: unknown; query?: unknown } = {},
): string {
  return fillPath(endpoint.path, params) + searchOf(query);
}

async function send(
  endpoint: Endpoint,
  input: {
    params?: unknown;
    query?: unknown;
    body?: unknown;
    files?: Record<string, File>;
    version?: number;
    idempotencyKey?: string;
    signal?: AbortSignal;
  },
): Promise<Response> {
  const headers = new Headers({ Accept: 'application/json, application/problem+json' });
  if (endpoint.versioned && input.version !== undefined) headers.set('If-Match', `"${input.version}"`);
  if (endpoint.idempotent) headers.set('Idempotency-Key', input.idempotencyKey ?? newKey());
  const body = endpoint.files ? multipart(input.body, input.files) : jsonBody(input.body, headers);
  try {
    return await fetch(hrefOf(endpoint, input), {
      method: endpoint.method.toUpperCase(),
      headers,
      credentials: 'same-origin',
      ...(body === null ? {} : { body }),
      ...(input.signal ? { signal: input.signal } : {}),
    });
  } catch (error) {
    if (input.signal?.aborted) throw error;
    throw problemFromNetwork();
  }
}

function fillPath(path: string, params: unknown): string {
  const values = isRecord(params) ? params : {};
  return path.replace(/:(\w+)/g, (_, name: string) => encodeURIComponent(String(values[name] ?? '')));
}

function searchOf(query: unknown): string {
  if (!isRecord(query)) return '';
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query)) {
    if (value !== undefined && value !== null && value !== '') search.set(name, String(value));
  }
  const text = search.toString();
  return text === '' ? '' : `?${text}`;
}

function jsonBody(body: unknown, headers: Headers): string | null {
  if (body === undefined) return null;
  headers.set('Content-Type', 'application/json');
  return JSON.stringify(body);
}

function multipart(body: unknown, files: Record<string, File> | undefined): FormData {
  const form = new FormData();
  for (const [name, value] of Object.entries(isRecord(body) ? body : {})) {
    if (value !== undefined && value !== null) form.append(name, String(value));
  }
  for (const [name, file] of Object.entries(files ?? {})) form.append(name, file, file.name);
  return form;
}

function unexpectedAnswer(path: string, response: Response): Problem {
  return new Problem({
    type: '/problems/unexpected-answer',
    title: 'The server gave an answer this page does not know',
    status: response.status,
    detail: `The answer of ${path} is not what this version of the page expects.`,
    fix: 'Load the page again to get its present version.',
    requestId: response.headers.get('X-Request-Id'),
  });
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}
