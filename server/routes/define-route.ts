import type { Request, Response } from 'express';
import type { z } from 'zod';
import type { Endpoint } from '#shared/contracts/endpoint';
import type { Deps } from '../deps';
import type { Authenticated, RequestActor } from '../middleware/authenticate';
import type { UploadedFile } from '../uploaded-file';
import { parseRequest } from './parse-request';

export interface FileResponse {
  bytes: Buffer;
  mediaType: string;
  fileName: string;
  /** True where the browser may show it in place of saving it. */
  inline?: boolean;
}

/** An exchange before parsing, once it is known who asks as far as the route needs it. */
export interface RawExchange {
  deps: Deps;
  params: unknown;
  query: unknown;
  body: unknown;
  files: UploadedFile[];
  /** From If-Match; 0 where the endpoint is not versioned. */
  version: number;
  requestId: string;
  /** For the few routes that read or set cookies. */
  http: { request: Request; response: Response };
}

type Exchange<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType> = Omit<
  RawExchange,
  'params' | 'query' | 'body'
> & { params: z.output<P>; query: z.output<Q>; body: z.output<B> };

type Answer<R extends z.ZodType> = R extends z.ZodUndefined ? FileResponse | undefined : z.output<R>;

export type Route =
  | { endpoint: Endpoint; access: 'open'; run(raw: RawExchange): Promise<unknown> }
  | { endpoint: Endpoint; access: 'person'; run(raw: RawExchange, signedIn: Authenticated): Promise<unknown> }
  | { endpoint: Endpoint; access: 'actor'; run(raw: RawExchange, actor: RequestActor): Promise<unknown> };

/** For somebody signed in and acting for an organisation: nearly every route. */
export function route<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType>(
  endpoint: Endpoint<P, Q, B, R>,
  handle: (exchange: Exchange<P, Q, B> & { actor: RequestActor }) => Promise<Answer<R>>,
): Route {
  return {
    endpoint,
    access: 'actor',
    run: async (raw, actor) => handle({ ...raw, ...parseRequest(endpoint, raw), actor }),
  };
}

/** For somebody signed in, whether or not an organisation is chosen. */
export function personRoute<
  P extends z.ZodType,
  Q extends z.ZodType,
  B extends z.ZodType,
  R extends z.ZodType,
>(
  endpoint: Endpoint<P, Q, B, R>,
  handle: (exchange: Exchange<P, Q, B> & { signedIn: Authenticated }) => Promise<Answer<R>>,
): Route {
  return {
    endpoint,
    access: 'person',
    run: async (raw, signedIn) => handle({ ...raw, ...parseRequest(endpoint, raw), signedIn }),
  };
}

/** For anybody. */
export function openRoute<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType>(
  endpoint: Endpoint<P, Q, B, R>,
  handle: (exchange: Exchange<P, Q, B>) => Promise<Answer<R>>,
): Route {
  return {
    endpoint,
    access: 'open',
    run: async (raw) => handle({ ...raw, ...parseRequest(endpoint, raw) }),
  };
}
