import { keepAttributes } from '#shared/contracts/readings';
import { call } from '../../../lib/api';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { useReadingChange } from './use-reading-change';

export type AttributeValues = Record<string, string | number | boolean | null>;

export function useKeepAttributes(params: RevisionParams) {
  return useReadingChange<AttributeValues>(params, (attributes, { version }) =>
    call(keepAttributes, { params, body: { attributes }, version }),
  );
}
