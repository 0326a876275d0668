import { existsSync } from 'node:fs';
import path from 'node:path';
import compression from 'compression';
import express, { type Express } from 'express';
import { pinoHttp } from 'pino-http';
import type { Deps } from './deps';
import { originCheck } from './middleware/origin-check';
import { notFound, problemHandler } from './middleware/problem-handler';
import { requestContext } from './middleware/request-context';
import { securityHeaders } from './middleware/security-headers';
import { allRoutes } from './routes/all-routes';
import { registerHealth } from './routes/health/register-health';
import { openApiDocument } from './routes/openapi';
import { registerRoutes } from './routes/register-routes';

interface AppOptions {
  deps: Deps;
  /** The built web app; without it only the API answers. */
  webDirectory?: string | undefined;
}

export function createApp({ deps, webDirectory }: AppOptions): Express {
  const { settings } = deps;
  const app = express();
  app.disable('x-powered-by');
  // A validator made from the body would let a stale copy pass for a fresh one after a change of rights.
  app.set('etag', false);
  app.set('trust proxy', settings.trustedProxies);
  app.set('query parser', 'simple');
  app.use(securityHeaders({ https: settings.publicUrl.startsWith('https:') }));
  app.use(requestContext(deps.newId));
  app.use(requestLog(deps));
  app.use(compression());
  registerHealth(app, deps);
  app.use('/api', originCheck(settings.publicUrl));
  app.use('/api', express.json({ limit: '1mb' }));
  const routes = allRoutes(settings);
  const description = openApiDocument(routes.map((route) => route.endpoint));
  app.get('/api/openapi.json', (_request, response) => void response.json(description));
  registerRoutes(app, routes, deps);
  app.use('/api', notFound);
  if (webDirectory && existsSync(webDirectory)) serveWeb(app, webDirectory);
  app.use(notFound);
  app.use(problemHandler(deps.log));
  return app;
}

/** Every address that is not the API's and not a file belongs to the web app, which knows its own not-found. */
function serveWeb(app: Express, directory: string): void {
  app.use(
    '/assets',
    express.static(path.join(directory, 'assets'), { immutable: true, maxAge: '1y', index: false }),
    notFound,
  );
  app.use(express.static(directory, { index: false }));
  app.get(/^(?!\/api(\/|$))/, (_request, response) => {
    response.setHeader('Cache-Control', 'no-cache');
    response.sendFile(path.join(directory, 'index.html'));
  });
}

function requestLog(deps: Deps) {
  return pinoHttp({
    logger: deps.log,
    quietReqLogger: true,
    // Addresses only: headers carry cookies, and queries what people search for.
    serializers: {
      req: (request: { method: string; url: string }) => ({
        method: request.method,
        path: redactPath(request.url),
      }),
      res: (response: { statusCode: number }) => ({ status: response.statusCode }),
    },
    customLogLevel: (_request, response, error) => {
      if (error || response.statusCode >= 500) return 'error';
      return response.statusCode >= 400 ? 'info' : 'debug';
    },
    customProps: (_request, response) => ({ requestId: response.getHeader('x-request-id') }),
  });
}

/** Tokens of links are secrets, also in a log. */
function redactPath(url: string): string {
  const [pathname = ''] = url.split('?');
  return pathname.replace(/(invitation-links|password-resets|set-up)\/[^/]+/, '$1/…');
}
