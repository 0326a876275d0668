import { queryOptions, useMutation, useQueryClient, useSuspenseQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import {
  changeMapping,
  getMapping,
  importMapping,
  listMappings,
  type MappingView,
  previewImport,
} from '#shared/contracts/mappings';
import { useActKey } from '../../../lib/act-key';
import { call } from '../../../lib/api';

export type MappingImport = z.input<NonNullable<typeof importMapping.body>>;
export type MappingChange = z.input<NonNullable<typeof changeMapping.body>>;

export function mappingsQuery() {
  return queryOptions({
    queryKey: ['mappings'],
    queryFn: ({ signal }) => call(listMappings, { signal }),
  });
}

export function mappingQuery(mappingId: string) {
  return queryOptions({
    queryKey: ['mappings', mappingId],
    queryFn: ({ signal }) => call(getMapping, { params: { mappingId }, signal }),
  });
}

export function useMappings() {
  return useSuspenseQuery(mappingsQuery()).data;
}

export function useMapping(mappingId: string): MappingView {
  return useSuspenseQuery(mappingQuery(mappingId)).data;
}

/** What importing would do; nothing is kept by asking. */
export function importPreviewQuery(given: MappingImport) {
  return queryOptions({
    queryKey: ['mapping import', given],
    queryFn: ({ signal }) => call(previewImport, { body: given, signal }),
    staleTime: 0,
    gcTime: 0,
  });
}

export function useChangeMapping(mapping: Pick<MappingView, 'id' | 'version'>) {
  const renew = useRenew();
  return useMutation({
    mutationFn: (change: MappingChange) =>
      call(changeMapping, { params: { mappingId: mapping.id }, body: change, version: mapping.version }),
    onSuccess: renew,
  });
}

export function useImportMapping() {
  const renew = useRenew();
  const act = useActKey();
  return useMutation({
    mutationFn: async (given: MappingImport) => {
      const kept = await call(importMapping, { body: given, idempotencyKey: act.keyFor(given) });
      act.done();
      return kept;
    },
    onSuccess: renew,
  });
}

function useRenew(): (kept: MappingView) => void {
  const client = useQueryClient();
  return (kept) => {
    client.setQueryData(mappingQuery(kept.id).queryKey, kept);
    void client.invalidateQueries({ queryKey: ['mappings'] });
    // A laboratory counts its mappings.
    void client.invalidateQueries({ queryKey: ['laboratories'] });
  };
}
