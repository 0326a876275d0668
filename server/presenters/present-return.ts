import type { Disposition } from '#rules/engine/finding';
import type { ReturnFields, ReturnView } from '#shared/contracts/returns';
import type { mailsOfReturn, ReturnRow } from '../db/queries/returns';
import { recommendationText } from './recommendation-text';
import { type ReturnSources, returnItems } from './return-items';

interface PresentReturn {
  /** Shown for a draft that nobody has kept. */
  placeholderId: string;
  kept: ReturnRow | null;
  fields: ReturnFields;
  sources: Omit<ReturnSources, 'included'>;
  waived: ReadonlySet<string>;
  recommended: Disposition;
  internalNotes: number;
  preparedBy: { id: string; name: string } | null;
  signingEngineers: { id: string; name: string }[];
  sentBy: string | null;
  mails: Awaited<ReturnType<typeof mailsOfReturn>>;
  fileHashes: { letter: string; workbook: string | null } | null;
  abilities: ReturnView['abilities'];
  /** A contractor is shown neither the agency's draft matters nor its count of internal notes. */
  forContractor: boolean;
}

export function presentReturn(input: PresentReturn): ReturnView {
  const { kept, fields, forContractor } = input;
  const items = returnItems({ ...input.sources, included: new Set(fields.included) });
  return {
    id: kept?.id ?? input.placeholderId,
    state: kept?.state ?? 'draft',
    version: kept?.version ?? 0,
    disposition: fields.disposition,
    recommended: input.recommended,
    recommendation: forContractor ? '' : recommendationText(input.sources.findings, input.waived),
    reason: fields.reason,
    textAbove: fields.textAbove,
    textBelow: fields.textBelow,
    to: fields.to,
    copies: fields.copies,
    items: forContractor ? items.filter(({ included }) => included) : items,
    enclosures: { letter: true, findingsWorkbook: fields.findingsWorkbook },
    internalNotes: forContractor ? 0 : input.internalNotes,
    preparedBy: forContractor ? null : input.preparedBy,
    signingEngineers: forContractor ? [] : input.signingEngineers,
    sent: sentOf(input),
    savedAt: kept?.savedAt?.toISOString() ?? null,
    abilities: input.abilities,
  };
}

function sentOf({ kept, sentBy, mails, fileHashes, forContractor }: PresentReturn): ReturnView['sent'] {
  if (kept?.state !== 'sent' || kept.sentAt === null || fileHashes === null) return null;
  return {
    at: kept.sentAt.toISOString(),
    by: sentBy ?? '',
    mail: forContractor
      ? []
      : mails.map(({ recipients, copies, state, attempts, lastProblem }) => ({
          to: [...recipients, ...copies].map(({ email }) => email).join(', '),
          state,
          attempts,
          lastProblem,
        })),
    letterSha256: fileHashes.letter,
    workbookSha256: fileHashes.workbook,
  };
}
