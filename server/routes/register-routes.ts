import type { Express, NextFunction, Request, RequestHandler, Response } from 'express';
import multer from 'multer';
import { limits } from '#shared/limits';
import type { Deps } from '../deps';
import { actorOf, authenticate } from '../middleware/authenticate';
import { idempotently } from '../middleware/idempotently';
import { versionFrom } from '../middleware/if-match';
import { requestIdOf } from '../middleware/request-context';
import type { UploadedFile } from '../uploaded-file';
import type { RawExchange, Route } from './define-route';
import { sendAnswer } from './send-answer';

/** Each route is declared once; here it meets HTTP. */
export function registerRoutes(app: Express, routes: readonly Route[], deps: Deps): void {
  for (const route of routes) {
    const { method, path } = route.endpoint;
    app[method](path, (request: Request, response: Response, next: NextFunction) => {
      answer(route, { request, response }, deps).catch(next);
    });
  }
}

async function answer(route: Route, http: RawExchange['http'], deps: Deps): Promise<void> {
  const { request, response } = http;
  const run = await admit(route, request, deps);
  await countUse(route, request, deps, run.personId);
  const files = await readFiles(route, http);
  const raw: RawExchange = {
    deps,
    params: request.params,
    query: request.query,
    body: request.body,
    files,
    version: route.endpoint.versioned ? versionFrom(request.get('if-match')) : 0,
    requestId: requestIdOf(response),
    http,
  };
  if (!route.endpoint.idempotent) {
    const result = await run.run(raw);
    sendAnswer(http, route.endpoint, { status: route.endpoint.status ?? 200, result });
    return;
  }
  const stored = await idempotently({ raw, scope: run.idempotencyScope, run: run.run });
  sendAnswer(http, route.endpoint, { status: route.endpoint.status ?? 200, result: stored });
}

interface Admitted {
  personId: string | null;
  /** Keys of one person for one organisation are told apart from all others. */
  idempotencyScope: { personId: string; organisationId: string };
  run(raw: RawExchange): Promise<unknown>;
}

/** Who has not signed in is told apart by nothing but the key. */
const nobody = '00000000-0000-0000-0000-000000000000';
const anybodys = { personId: nobody, organisationId: nobody };

async function admit(route: Route, request: Request, deps: Deps): Promise<Admitted> {
  if (route.access === 'open') {
    return { personId: null, idempotencyScope: anybodys, run: (raw) => route.run(raw) };
  }
  const signedIn = await authenticate(request, deps);
  const personId = signedIn.person.id;
  if (route.access === 'person') {
    const idempotencyScope = { ...anybodys, personId };
    return { personId, idempotencyScope, run: (raw) => route.run(raw, signedIn) };
  }
  const actor = await actorOf(signedIn, deps);
  return {
    personId,
    idempotencyScope: { personId, organisationId: actor.organisationId },
    run: (raw) => route.run(raw, actor),
  };
}

/** What is open is counted by network address, what is written by the person; reading is free. */
async function countUse(route: Route, request: Request, deps: Deps, personId: string | null): Promise<void> {
  if (route.endpoint.method === 'get') return;
  if (personId === null) await deps.rateLimits.use('openByAddress', request.ip ?? '');
  else await deps.rateLimits.use('writes', personId);
}

const uploads = multer({
  storage: multer.memoryStorage(),
  defParamCharset: 'utf8',
  limits: { fileSize: limits.workbookBytes, files: 4, fields: 40, fieldSize: 64 * 1024, parts: 50 },
});

async function readFiles(route: Route, { request, response }: RawExchange['http']): Promise<UploadedFile[]> {
  const fields = route.endpoint.files;
  if (!fields) return [];
  await runMiddleware(uploads.fields(fields.map((name) => ({ name, maxCount: 1 }))), request, response);
  const received = request.files;
  if (!received || Array.isArray(received)) return [];
  return Object.entries(received).flatMap(([field, parts]) =>
    parts.map((part) => ({
      field,
      fileName: part.originalname,
      mediaType: part.mimetype,
      bytes: part.buffer,
    })),
  );
}

function runMiddleware(handler: RequestHandler, request: Request, response: Response): Promise<void> {
  return new Promise((resolve, reject) => {
    handler(request, response, (error?: unknown) => (error ? reject(error) : resolve()));
  });
}
