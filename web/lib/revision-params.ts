import { type Params, useParams } from 'react-router-dom';
import { Problem } from './problem';
import type { RevisionParams } from './queries/revision-query';

const uuid = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i;

/** The submittal and revision of an address; one that names none is a page that is not there. */
export function readRevisionParams({ submittalId, number }: Params<string>): RevisionParams {
  if (submittalId && uuid.test(submittalId) && number && /^\d{1,4}$/.test(number)) {
    return { submittalId, number: Number(number) };
  }
  throw new Problem({
    type: '/problems/not-found',
    title: 'Nothing is here',
    status: 404,
    detail: 'The address names no revision.',
    fix: 'Check the address, or search for it.',
    requestId: null,
  });
}

export function useRevisionParams(): RevisionParams {
  return readRevisionParams(useParams());
}
