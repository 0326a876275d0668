import type { NextFunction, Request, Response } from 'express';
import { Problem } from '../problem';

const safeMethods = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * A browser names the page that a write comes from, and a page cannot lie about it. A write that names
 * none is refused as well: there is no way to tell it from a forged one.
 */
export function originCheck(publicUrl: string) {
  const allowed = allowedOrigins(publicUrl);
  return (request: Request, _response: Response, next: NextFunction): void => {
    const origin = request.get('origin');
    if (safeMethods.has(request.method) || (origin !== undefined && allowed.has(origin))) {
      next();
      return;
    }
    const detail = origin ? `The request came from ${origin.slice(0, 200)}.` : 'The request names no origin.';
    next(new Problem('foreign-origin', { detail }));
  };
}

/** On loopback both spellings of the own machine are the product's address. */
function allowedOrigins(publicUrl: string): Set<string> {
  const url = new URL(publicUrl);
  const origins = new Set([url.origin]);
  if (url.hostname === '127.0.0.1' || url.hostname === 'localhost') {
    for (const hostname of ['127.0.0.1', 'localhost']) {
      origins.add(`${url.protocol}//${hostname}${url.port ? `:${url.port}` : ''}`);
    }
  }
  return origins;
}
