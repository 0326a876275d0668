import { useMutation } from '@tanstack/react-query';
import { proveSeal } from '#shared/contracts/checks';
import { call } from '../../../lib/api';
import type { RevisionParams } from '../../../lib/queries/revision-query';

/** Runs the stored check again on its own record and edition; asked for, never done by itself. */
export function useProveSeal(params: RevisionParams) {
  return useMutation({ mutationFn: () => call(proveSeal, { params }) });
}
