import type { NextFunction, Request, Response } from 'express';
import { addressHeader } from '../auth/create-auth';

const requestIdPattern = /^[A-Za-z0-9._-]{8,64}$/;

/**
 * Gives each request its number, and writes where it came from into the one header that sign-in believes.
 * What a client sends under that name is overwritten.
 */
export function requestContext(newId: () => string) {
  return (request: Request, response: Response, next: NextFunction): void => {
    const sent = request.get('x-request-id');
    const id = sent !== undefined && requestIdPattern.test(sent) ? sent : newId();
    response.locals.requestId = id;
    request.headers[addressHeader] = request.ip ?? '';
    response.setHeader('X-Request-Id', id);
    next();
  };
}

export function requestIdOf(response: Response): string {
  return String(response.locals.requestId ?? '');
}
