import { and, eq } from 'drizzle-orm';
import { type AttributeDefinition, type Scalar, withStandardAttributes } from '#rules/rule-sets/attribute';
import { matchValue } from '#rules/rule-sets/match-value';
import type { ProblemError } from '#shared/contracts/problems';
import { dateOfInstant } from '#shared/format/dates';
import { typedAttributes } from '../../db/schema/submittals';
import type { Deps } from '../../deps';
import { askedAttributes } from '../../presenters/asked-attributes';
import { Problem } from '../../problem';
import { attributeFault } from './attribute-fault';
import { changeDraft, type DraftChange } from './change-draft';

type GivenAttributes = Record<string, Scalar | null>;

/** Keeps attributes that were asked, as typed by whom and on which day; null takes one back. */
export async function keepAttributes(
  deps: Deps,
  act: DraftChange & { given: GivenAttributes },
): Promise<void> {
  const { row, actor, given } = act;
  await changeDraft(deps, act, async (tx, { read, edition }) => {
    const sources = { edition, workbook: read.record.attributes, facts: row.project.facts, typed: {} };
    const asked = new Set(askedAttributes(sources).map(({ name }) => name));
    const known = withStandardAttributes(edition.attributes).filter(({ name }) => asked.has(name));
    const values = understood(known, given);
    const typedOn = dateOfInstant(deps.now().toISOString(), row.agency.timeZone);
    for (const { name, value } of values) {
      await tx
        .delete(typedAttributes)
        .where(and(eq(typedAttributes.revisionId, row.revision.id), eq(typedAttributes.name, name)));
      if (value === null) continue;
      await tx.insert(typedAttributes).values({
        id: deps.newId(),
        revisionId: row.revision.id,
        contractorId: row.revision.contractorId,
        name,
        value,
        personId: actor.personId,
        typedOn,
      });
    }
    return undefined;
  });
}

/** Values in the edition's own words, or every fault at once. */
function understood(
  asked: readonly AttributeDefinition[],
  given: GivenAttributes,
): { name: string; value: Scalar | null }[] {
  const errors: ProblemError[] = [];
  const values = Object.entries(given).map(([name, value]) => {
    const pointer = `/attributes/${name}`;
    const attribute = asked.find((each) => each.name === name);
    if (attribute === undefined) {
      errors.push({ pointer, detail: `${name} is not asked for this revision.` });
      return { name, value: null };
    }
    const meant = value === null ? null : matchValue(attribute, value);
    if (value !== null && meant === null) {
      errors.push(attributeFault(attribute, { value, pointer }));
    }
    return { name, value: meant };
  });
  if (errors.length > 0) throw new Problem('invalid-input', { detail: errors[0]?.detail ?? '', errors });
  return values;
}
