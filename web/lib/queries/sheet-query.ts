import { queryOptions } from '@tanstack/react-query';
import { getSheet } from '#shared/contracts/readings';
import { call } from '../api';
import { type RevisionParams, revisionKey } from './revision-query';

export interface SheetWindow extends RevisionParams {
  sheet: string;
  from?: number;
  to?: number;
}

/** A sheet as uploaded, or only some of its rows. The stored grid of a revision's workbook does not change. */
export function sheetQuery({ sheet, from, to, ...params }: SheetWindow) {
  return queryOptions({
    queryKey: [...revisionKey(params), 'sheet', sheet, from ?? null, to ?? null],
    queryFn: ({ signal }) =>
      call(getSheet, {
        params,
        query: { sheet, ...(from === undefined ? {} : { from }), ...(to === undefined ? {} : { to }) },
        signal,
      }),
    staleTime: 300_000,
  });
}
