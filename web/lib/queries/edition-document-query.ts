import { queryOptions, useQuery } from '@tanstack/react-query';
import { type Layer, parseRuleSet, type RuleSet } from '#rules/rule-sets/schema';
import { getRuleSetDocument } from '#shared/contracts/rule-sets';
import { call } from '../api';

export interface EditionName {
  ruleSet: string;
  edition: string;
}

export interface EditionDocument {
  /** As it was written, without the defaults that reading it fills in. */
  written: Record<string, unknown>;
  /** Null where this version of the page no longer understands it. */
  parsed: RuleSet | Layer | null;
}

/** A published edition never changes. */
export function editionDocumentQuery({ ruleSet, edition }: EditionName) {
  return queryOptions({
    queryKey: ['rule-sets', ruleSet, edition, 'document'],
    queryFn: async ({ signal }): Promise<EditionDocument> => {
      const params = { ruleSetId: ruleSet, edition };
      const { document } = await call(getRuleSetDocument, { params, signal });
      const parsed = parseRuleSet(document);
      return { written: document, parsed: parsed.ok ? parsed.ruleSet : null };
    },
    staleTime: Number.POSITIVE_INFINITY,
  });
}

/** Null while it is loaded and where none is named. */
export function useEditionDocument(name: EditionName | null): EditionDocument | null {
  const { data } = useQuery({
    ...editionDocumentQuery(name ?? { ruleSet: '', edition: '' }),
    enabled: name !== null,
  });
  return data ?? null;
}
