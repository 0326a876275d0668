import type { NextFunction, Request, Response } from 'express';
import multer from 'multer';
import type { Logger } from 'pino';
import { limits } from '#shared/limits';
import { Problem } from '../problem';
import { requestIdOf } from './request-context';

/** Every failure leaves as a problem; what was not expected is logged whole and answered bare. */
export function problemHandler(log: Logger) {
  return (error: unknown, _request: Request, response: Response, next: NextFunction): void => {
    if (response.headersSent) {
      next(error);
      return;
    }
    const problem = asProblem(error);
    const requestId = requestIdOf(response);
    if (problem.slug === 'internal') log.error({ err: error, requestId }, 'request failed');
    if (problem.details.retryAfterSeconds !== undefined) {
      response.setHeader('Retry-After', String(problem.details.retryAfterSeconds));
    }
    response
      .status(problem.status)
      .type('application/problem+json')
      .send(JSON.stringify(problem.body(requestId)));
  };
}

export function notFound(_request: Request, _response: Response, next: NextFunction): void {
  next(new Problem('not-found'));
}

function asProblem(error: unknown): Problem {
  if (error instanceof Problem) return error;
  if (error instanceof multer.MulterError) return asUploadProblem(error);
  const status = error instanceof Error && 'status' in error ? error.status : undefined;
  if (status === 413) return new Problem('too-large', { detail: 'The request is too large.' });
  if (typeof status === 'number' && status >= 400 && status < 500) return new Problem('malformed-request');
  if (error instanceof Error && /multipart|boundary|unexpected end of form/i.test(error.message)) {
    return new Problem('malformed-request');
  }
  return new Problem('internal');
}

function asUploadProblem(error: multer.MulterError): Problem {
  if (error.code === 'LIMIT_FILE_SIZE') {
    const megabytes = limits.workbookBytes / 1024 / 1024;
    return new Problem('too-large', { detail: `The file is larger than ${megabytes} MB.` });
  }
  return new Problem('malformed-request', { detail: `The form cannot be used: ${error.message}.` });
}
