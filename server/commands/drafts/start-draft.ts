import { and, eq } from 'drizzle-orm';
import { type DraftDocument, headFields } from '#rules/authoring/document-parts';
import { parseRuleSet, RULE_SET_FORMAT } from '#rules/rule-sets/schema';
import type { Database } from '../../db/client';
import { isDuplicateEntry } from '../../db/duplicate-entry';
import { editionDocument, listEditions } from '../../db/queries/editions';
import { editionDrafts, ruleSets } from '../../db/schema/rule-sets';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { Problem } from '../../problem';
import { shippedSets } from '../rule-sets/publish-starting-points';

type Start =
  | { kind: 'edition'; ruleSet: string; edition: string }
  | { kind: 'starting point'; file: string }
  | { kind: 'file'; document: DraftDocument }
  | {
      kind: 'nothing';
      ruleSet: string;
      title: string;
      layerOf: { id: string; edition: string } | null;
    };

interface Begun {
  document: DraftDocument;
  basedOnId: string | null;
  startingPoint: boolean;
}

/** A draft of the agency's own; whatever it starts from stays as it is. */
export async function startDraft(
  deps: Deps,
  {
    actor,
    requestId,
    edition,
    from,
  }: { actor: RequestActor; requestId: string; edition: string; from: Start },
): Promise<string> {
  const id = deps.newId();
  await deps.db.transaction(async (tx) => {
    const begun = await beginning(tx, actor.organisationId, from);
    const document = ownDocument(begun.document, { edition, agency: actor.organisation.name });
    await refusePublished(tx, actor.organisationId, { key: document.id, edition });
    const ruleSetId = await ruleSetOf(tx, deps, { agencyId: actor.organisationId, ...document });
    const now = deps.now();
    await insertDraft(tx, {
      id,
      agencyId: actor.organisationId,
      ruleSetId,
      edition,
      state: 'draft',
      document: document.document,
      basedOnId: begun.basedOnId,
      startingPoint: begun.startingPoint,
      createdById: actor.personId,
      createdAt: now,
      updatedAt: now,
    });
    await writeAudit(tx, deps, {
      actor,
      act: 'draft begun',
      subject: { kind: 'draft', id },
      detail: { ruleSet: document.id, edition, from: from.kind },
      requestId,
    });
  });
  return id;
}

async function beginning(tx: Database, agencyId: string, from: Start): Promise<Begun> {
  switch (from.kind) {
    case 'edition':
      return fromEdition(tx, agencyId, from);
    case 'starting point': {
      const shipped = shippedSets().find(({ file }) => file === from.file);
      if (shipped === undefined) throw refused('/from/file', 'There is no such starting point.');
      return { document: shipped.document, basedOnId: null, startingPoint: true };
    }
    case 'file': {
      const parsed = parseRuleSet(from.document);
      if (parsed.ok) return { document: from.document, basedOnId: null, startingPoint: false };
      const errors = parsed.problems.map((each) => ({ ...each, pointer: `/from/document${each.pointer}` }));
      throw new Problem('rule-set-refused', {
        detail: errors[0]?.detail ?? 'The file cannot be used.',
        errors,
      });
    }
    case 'nothing':
      return { document: emptyDocument(from), basedOnId: null, startingPoint: false };
  }
}

async function fromEdition(
  tx: Database,
  agencyId: string,
  { ruleSet, edition }: { ruleSet: string; edition: string },
): Promise<Begun> {
  const published = await listEditions(tx, agencyId);
  const found = published.find((each) => each.ruleSetKey === ruleSet && each.edition === edition);
  const document = found && (await editionDocument(tx, { agencyId, editionId: found.id }));
  if (!found || !document) throw refused('/from', `There is no published edition ${edition} of ${ruleSet}.`);
  return { document, basedOnId: found.id, startingPoint: found.startingPoint };
}

function emptyDocument({ ruleSet, title, layerOf }: Extract<Start, { kind: 'nothing' }>): DraftDocument {
  const head = { format: RULE_SET_FORMAT, id: ruleSet, title, layerOf };
  return layerOf === null ? { ...head, rules: [] } : head;
}

/** The same document under the draft's own name; the new edition has no dates until its author gives them. */
function ownDocument(given: DraftDocument, { edition, agency }: { edition: string; agency: string }) {
  const document = {
    ...given,
    format: RULE_SET_FORMAT,
    agency,
    edition,
    effective: { from: null, to: null },
  };
  const head = headFields.parse(document);
  return { document, id: head.id, title: head.title };
}

async function refusePublished(
  tx: Database,
  agencyId: string,
  { key, edition }: Record<'key' | 'edition', string>,
) {
  const published = await listEditions(tx, agencyId);
  if (!published.some((each) => each.ruleSetKey === key && each.edition === edition)) return;
  throw nameTaken(`There is a published edition ${edition} of ${key} already.`);
}

async function ruleSetOf(
  tx: Database,
  deps: Deps,
  { agencyId, id: key, title }: { agencyId: string; id: string; title: string },
): Promise<string> {
  const own = and(eq(ruleSets.agencyId, agencyId), eq(ruleSets.key, key));
  const [kept] = await tx.select({ id: ruleSets.id }).from(ruleSets).where(own);
  if (kept !== undefined) return kept.id;
  const id = deps.newId();
  await tx.insert(ruleSets).values({ id, agencyId, key, title, createdAt: deps.now() });
  return id;
}

async function insertDraft(tx: Database, row: typeof editionDrafts.$inferInsert): Promise<void> {
  try {
    await tx.insert(editionDrafts).values(row);
  } catch (error) {
    if (!isDuplicateEntry(error)) throw error;
    throw nameTaken(`There is a draft ${row.edition} of this rule set already.`);
  }
}

export function nameTaken(detail: string): Problem {
  return new Problem('already-exists', {
    detail,
    fix: 'Open that one, or give this draft another name.',
    errors: [{ pointer: '/edition', detail }],
  });
}

function refused(pointer: string, detail: string): Problem {
  return new Problem('invalid-input', { detail, errors: [{ pointer, detail }] });
}
