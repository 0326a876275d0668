import type { Explanation } from '#rules/engine/explanation';
import type { CheckResult, Disposition } from '#rules/engine/finding';
import { roomWords } from '#rules/engine/room-words';
import { toPassWords } from '#rules/engine/to-pass';
import type { Letterhead } from '#shared/contracts/organisation';
import type { Recipient, ReturnItem } from '#shared/contracts/returns';
import { dateOfInstant } from '#shared/format/dates';
import { creepWords } from './creep-words';
import { type DocumentInput, documentInputSchema } from './document-input';

/** What documents of a revision have in common, whether a return or a check before submission. */
export interface RevisionFacts {
  agency: { name: string; letterhead: Letterhead; timeZone: string };
  contractor: string;
  project: { number: string; title: string };
  mixDesignation: string;
  mixDescription: string;
  revision: number;
  receivedOn: string | null;
  /** "Section 412 Dense-graded asphalt mixtures, edition 2026, with Supplement S-07" */
  section: string;
  startingPoint: boolean;
  check: { kind: 'pre-check' | 'check of record'; madeAt: Date; result: CheckResult };
  explanations: Record<string, Explanation>;
}

export interface ReturnFacts {
  disposition: Disposition;
  reason: string;
  textAbove: string;
  textBelow: string;
  to: Recipient[];
  copies: Recipient[];
  enclosesWorkbook: boolean;
  items: readonly ReturnItem[];
  /** Notes to be returned on the whole submittal. */
  generalNotes: string[];
  signedBy: { name: string; function: string } | null;
}

/** The input of a return's letter and workbook: what is included, and nothing that stays internal. */
export function returnInput(revision: RevisionFacts, facts: ReturnFacts, now: Date): DocumentInput {
  const items = facts.items.filter(({ included }) => included);
  return documentInputSchema.parse({
    ...commonInput(revision, now),
    kind: 'return',
    disposition: facts.disposition,
    reason: facts.reason,
    textAbove: facts.textAbove,
    textBelow: facts.textBelow,
    to: facts.to,
    copies: facts.copies,
    signedBy: facts.signedBy,
    waivedCount: facts.items.filter(({ waived }) => waived !== null).length,
    items: items.map(documentItem(revision.explanations)),
    generalNotes: facts.generalNotes,
    enclosesWorkbook: facts.enclosesWorkbook,
  });
}

/** The input of the findings as either side saves them at any time: no decision, no one's notes. */
export function findingsInput(
  revision: RevisionFacts,
  items: readonly ReturnItem[],
  now: Date,
): DocumentInput {
  return documentInputSchema.parse({
    ...commonInput(revision, now),
    kind: revision.check.kind,
    disposition: null,
    reason: '',
    textAbove: '',
    textBelow: '',
    to: [],
    copies: [],
    signedBy: null,
    waivedCount: items.filter(({ waived }) => waived !== null).length,
    items: items.map(documentItem(revision.explanations)),
    generalNotes: [],
    enclosesWorkbook: false,
  });
}

function commonInput(revision: RevisionFacts, now: Date) {
  const { agency, check } = revision;
  const room = check.result.analysis.roomToMove;
  return {
    agency: { name: agency.name, letterhead: agency.letterhead },
    contractor: revision.contractor,
    project: revision.project,
    mixDesignation: revision.mixDesignation,
    mixDescription: revision.mixDescription,
    revision: revision.revision,
    date: dateOfInstant(now.toISOString(), agency.timeZone),
    submittedOn: revision.receivedOn,
    section: revision.section,
    summary: check.result.summary,
    findings: check.result.findings,
    seal: check.result.seal,
    checkedOn: dateOfInstant(check.madeAt.toISOString(), agency.timeZone),
    startingPoint: revision.startingPoint,
    explanations: revision.explanations,
    room: room && roomWords(room),
    creep: creepWords(check.result.analysis.creep),
  };
}

function documentItem(explanations: Record<string, Explanation>) {
  return ({
    key,
    group,
    finding,
    waived,
    notes,
    previousText,
  }: ReturnItem): DocumentInput['items'][number] => ({
    group,
    finding,
    waivedBecause: waived,
    notes,
    previousText,
    toPass: toPassWords(explanations[key]?.toPass ?? []),
  });
}
