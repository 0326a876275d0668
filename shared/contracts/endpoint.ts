import type { z } from 'zod';

/** One HTTP exchange, declared once: the server registers it, the client calls it, OpenAPI is made from it. */
export interface Endpoint<
  Params extends z.ZodType = z.ZodType,
  Query extends z.ZodType = z.ZodType,
  Body extends z.ZodType = z.ZodType,
  Response extends z.ZodType = z.ZodType,
> {
  method: 'get' | 'post' | 'put' | 'patch' | 'delete';
  /** Express form: `/api/projects/:projectId`. */
  path: string;
  summary: string;
  params?: Params;
  query?: Query;
  /** JSON, or the text fields beside the files where `files` is given. */
  body?: Body;
  /** Names of the multipart file fields. */
  files?: readonly string[];
  response?: Response;
  /** A response that is not JSON. */
  sends?:
    | 'application/pdf'
    | 'application/json'
    | 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet'
    | 'application/json'
    | 'text/plain'
    | '*/*';
  status?: 200 | 201 | 202 | 204;
  /** True where no sign-in is needed. */
  open?: boolean;
  /** True where the act creates or sends: an `Idempotency-Key` header is required. */
  idempotent?: boolean;
  /** True where an `If-Match` header with the object's version is required. */
  versioned?: boolean;
}

export function endpoint<
  Params extends z.ZodType = z.ZodUndefined,
  Query extends z.ZodType = z.ZodUndefined,
  Body extends z.ZodType = z.ZodUndefined,
  Response extends z.ZodType = z.ZodUndefined,
>(definition: Endpoint<Params, Query, Body, Response>): Endpoint<Params, Query, Body, Response> {
  return definition;
}
