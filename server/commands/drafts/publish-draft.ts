import { and, eq } from 'drizzle-orm';
import { type DraftDocument, headFields } from '#rules/authoring/document-parts';
import { lintEdition } from '#rules/authoring/lint/lint-edition';
import type { LintRemark } from '#rules/authoring/lint/remark';
import { hashOf } from '#rules/engine/seal';
import type { DocumentProblem } from '#rules/rule-sets/problem';
import { documentName, resolveEdition } from '#rules/rule-sets/resolve';
import { isLayer, type Layer, parseRuleSet, type RuleSet } from '#rules/rule-sets/schema';
import { plural } from '#rules/rule-sets/words';
import { formatDate } from '#shared/format/dates';
import type { Database } from '../../db/client';
import { lockDraft } from '../../db/queries/drafts';
import { type EditionRow, editionReference, listEditions } from '../../db/queries/editions';
import { editionDrafts, editionEvents, editions } from '../../db/schema/rule-sets';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { expectVersion } from '../../middleware/if-match';
import { Problem } from '../../problem';
import { publishedDocument } from '../projects/own-edition';
import { expectState } from './review-draft';

interface Publishing {
  actor: RequestActor;
  requestId: string;
  draftId: string;
  version: number;
  word: string | null;
}

type Dated = { from: string; to: string | null };

/** A reviewed draft becomes an edition that nobody can change. Every reason against it is told at once. */
export async function publishDraft(deps: Deps, publishing: Publishing) {
  const { actor, draftId, version, requestId, word } = publishing;
  const agencyId = actor.organisationId;
  return deps.db.transaction(async (tx) => {
    const draft = await lockDraft(tx, agencyId, draftId);
    if (draft === null) throw new Problem('not-found');
    expectState(draft, 'in review');
    expectVersion(version, draft);
    const published = await listEditions(tx, agencyId);
    const document = { ...draft.document, agency: actor.organisation.name };
    const head = headFields.parse(document);
    const others = published.filter((each) => each.ruleSetId === draft.ruleSetId && !each.withdrawn);
    const dates = expectDates(head.effective, others);
    const parsed = await expectSound(tx, { agencyId, document, published, word });
    const id = deps.newId();
    const row = {
      id,
      agencyId,
      ruleSetId: draft.ruleSetId,
      ruleSetKey: head.id,
      edition: head.edition,
      title: head.title,
      document,
      hash: hashOf(document),
      effectiveFrom: dates.from,
      effectiveTo: dates.to,
      layerOfKey: head.layerOf?.id ?? null,
      layerOfEdition: head.layerOf?.edition ?? null,
      ruleCount: rulesOf(parsed).length,
      startingPoint: draft.startingPoint && rulesOf(parsed).some(({ verifiedBy }) => !verifiedBy),
      publishedAt: deps.now(),
      publishedById: actor.personId,
      secondAuthorId: draft.sentById,
    };
    await tx.insert(editions).values(row);
    await tx.insert(editionEvents).values({
      id: deps.newId(),
      editionId: id,
      agencyId,
      kind: 'published',
      at: deps.now(),
      personId: actor.personId,
      reason: word,
    });
    await tx
      .update(editionDrafts)
      .set({ state: 'published', updatedAt: deps.now(), version: version + 1 })
      .where(and(eq(editionDrafts.id, draftId), eq(editionDrafts.agencyId, agencyId)));
    await writeAudit(tx, deps, {
      actor,
      act: 'edition published',
      subject: { kind: 'edition', id },
      detail: { ruleSet: head.id, edition: head.edition, draftId, word },
      requestId,
    });
    return editionReference(row);
  });
}

export function rulesOf(document: RuleSet | Layer) {
  return isLayer(document) ? [...document.add.rules, ...document.replace.rules] : document.rules;
}

/** Two editions of a rule set never begin on one day, and none begins within another's stated range. */
function expectDates(
  { from, to }: { from: string | null; to: string | null },
  others: readonly EditionRow[],
): Dated {
  if (from === null) {
    throw refusedDates('The edition has no first day.', 'Give the day from which it is in force.');
  }
  const sameDay = others.find((each) => each.effectiveFrom === from);
  if (sameDay) {
    throw refusedDates(
      `Edition ${sameDay.edition} is in force from ${formatDate(from)} too.`,
      'Choose another first day, or withdraw that edition.',
    );
  }
  const around = others.find(
    (each) => each.effectiveTo !== null && each.effectiveFrom < from && from <= each.effectiveTo,
  );
  if (around) {
    throw refusedDates(
      `Edition ${around.edition} is in force until ${formatDate(around.effectiveTo as string)}.`,
      'Choose a first day after it, or withdraw that edition.',
    );
  }
  const within =
    to === null ? undefined : others.find((each) => from < each.effectiveFrom && each.effectiveFrom <= to);
  if (within) {
    throw refusedDates(
      `Edition ${within.edition} begins on ${formatDate(within.effectiveFrom)}, before this one ends.`,
      'Choose an earlier last day, or leave it open.',
    );
  }
  return { from, to };
}

function refusedDates(detail: string, fix: string): Problem {
  return new Problem('invalid-input', { detail, fix, errors: [{ pointer: '/effective', detail, fix }] });
}

interface Sounding {
  agencyId: string;
  document: DraftDocument;
  published: readonly EditionRow[];
  word: string | null;
}

async function expectSound(
  tx: Database,
  { agencyId, document, published, word }: Sounding,
): Promise<RuleSet | Layer> {
  const parsed = parseRuleSet(document);
  if (!parsed.ok) throw unsound(parsed.problems);
  const { ruleSet } = parsed;
  const base = isLayer(ruleSet) ? await baseOf(tx, { agencyId, layer: ruleSet, published }) : ruleSet;
  const resolution = resolveEdition(base, isLayer(ruleSet) ? [ruleSet] : []);
  if (!resolution.ok) throw unsound(resolution.problems);
  const remarks = lintEdition(resolution.edition, { own: documentName(ruleSet) });
  const errors = remarks.filter(({ level }) => level === 'error');
  if (errors.length > 0) {
    throw unsound(errors.map(({ part, detail, fix }) => ({ pointer: `/${part}`, detail, fix })));
  }
  if (remarks.length > 0 && !word) throw unexplained(remarks);
  return ruleSet;
}

async function baseOf(
  tx: Database,
  { agencyId, layer, published }: { agencyId: string; layer: Layer; published: readonly EditionRow[] },
): Promise<RuleSet | Layer> {
  const { id, edition } = layer.layerOf;
  const row = published.find((each) => each.ruleSetKey === id && each.edition === edition && !each.withdrawn);
  const base = row === undefined ? null : await publishedDocument(tx, agencyId, row);
  if (base !== null) return base;
  const detail = `Its base, edition ${edition} of ${id}, is not published.`;
  throw unsound([{ pointer: '/layerOf', detail, fix: 'Publish the base first.' }]);
}

/** A warning does not bar publishing, but whoever publishes with it says why. */
function unexplained(warnings: readonly LintRemark[]): Problem {
  const count = plural(warnings.length, 'warning');
  const detail = `The draft has ${count}.`;
  const fix = 'Clear them, or write a word on why it is published with them.';
  return new Problem('invalid-input', {
    detail,
    fix,
    errors: [
      { pointer: '/word', detail, fix },
      ...warnings.map((each) => ({ pointer: `/${each.part}`, detail: each.detail, fix: each.fix })),
    ],
  });
}

function unsound(problems: DocumentProblem[]): Problem {
  return new Problem('rule-set-refused', {
    detail: problems[0]?.detail ?? 'The draft cannot be published.',
    errors: problems,
  });
}
