import { canonicalText } from '#rules/engine/canonical-text';
import { closestLayout } from '#rules/reading/fingerprint';
import { saidByRule } from '#rules/reading/layout/mapping-says';
import type { Mapping, MappingRule } from '#rules/reading/mapping';
import type { ProblemError } from '#shared/contracts/problems';
import type { Database } from '../../db/client';
import { listLaboratoriesOf } from '../../db/queries/laboratories';
import { findMapping, layoutsInUse, lockMapping } from '../../db/queries/mappings';
import type { Deps } from '../../deps';
import type { Actor } from '../../policies/actor';
import { quantitiesFor } from '../../presenters/words-for';
import { Problem } from '../../problem';
import { unitFaults } from '../readings/check-corrections';
import { addMapping, addMappingVersion } from './add-mapping-version';

export interface Import {
  actor: Actor;
  laboratoryId: string;
  name: string;
  document: Mapping;
}

export interface ImportPlan {
  laboratory: { id: string; name: string };
  replaces: { id: string; name: string; number: number } | null;
  /** Rules of the present version, and those that come, go and stay. */
  added: MappingRule[];
  removed: MappingRule[];
  unchanged: number;
}

/** What an import would do, or every fault of the document at once. */
export async function planImport(
  db: Database,
  { actor, laboratoryId, document }: Omit<Import, 'name'>,
): Promise<ImportPlan> {
  const laboratories = await listLaboratoriesOf(db, actor.organisationId);
  const laboratory = laboratories.find(({ id }) => id === laboratoryId);
  const errors = [
    ...(laboratory === undefined
      ? [{ pointer: '/laboratoryId', detail: 'There is no such laboratory.', fix: 'Choose one of yours.' }]
      : []),
    ...ruleFaults(document),
  ];
  if (laboratory === undefined || errors.length > 0)
    throw new Problem('invalid-input', { detail: errors[0]?.detail ?? '', errors });
  const known = await layoutsInUse(db, actor.organisationId, laboratoryId);
  const found = closestLayout(document.fingerprint, known);
  const present = found && (await findMapping(db, actor.organisationId, found.id));
  const before = present?.document.rules ?? [];
  const was = new Set(before.map((rule) => canonicalText(rule)));
  const is = new Set(document.rules.map((rule) => canonicalText(rule)));
  return {
    laboratory: { id: laboratory.id, name: laboratory.name },
    replaces: found && { id: found.id, name: found.name, number: found.number },
    added: document.rules.filter((rule) => !was.has(canonicalText(rule))),
    removed: before.filter((rule) => !is.has(canonicalText(rule))),
    unchanged: document.rules.filter((rule) => was.has(canonicalText(rule))).length,
  };
}

/** Quantities of a section's own are known to it alone, so only what no rule could mean is a fault here. */
function ruleFaults({ rules }: Mapping): ProblemError[] {
  const quantities = quantitiesFor({ quantities: [] });
  const seen = new Set<string>();
  return rules.flatMap((rule, index) => {
    const pointer = `/document/rules/${index}`;
    const faults: ProblemError[] = [];
    if (seen.has(rule.id)) {
      const detail = `Two rules are called “${rule.id}”.`;
      faults.push({ pointer: `${pointer}/id`, detail, fix: 'Give each an id of its own.' });
    }
    seen.add(rule.id);
    const said = saidByRule(rule);
    if (said === null) {
      const detail = `The rule “${rule.id}” speaks through cells beside the value, which only the template does.`;
      faults.push({
        pointer,
        detail,
        fix: 'Name the quantity, the unit and the conditions in the rule itself.',
      });
    } else if (said.kind === 'reading' && said.unit !== null) {
      const quantity = quantities.get(said.quantity);
      faults.push(...(quantity ? unitFaults(said.unit, quantity, `${pointer}/unit`) : []));
    }
    return faults;
  });
}

/** A further version of the laboratory's mapping of that layout, else a mapping of its own; answers its id. */
export async function importMapping(
  deps: Deps,
  { requestId, ...given }: Import & { requestId: string },
): Promise<string> {
  const { actor, name, document } = given;
  return deps.db.transaction(async (tx) => {
    const { replaces, laboratory } = await planImport(tx, given);
    const present = replaces && (await lockMapping(tx, actor.organisationId, replaces.id));
    const kept: Mapping = {
      ...document,
      laboratory: laboratory.name,
      version: (present?.number ?? 0) + 1,
      rest: 'headings',
    };
    const version = { document: kept, origin: 'Imported', revisionId: null, learned: [] };
    const by = { actor, requestId, organisationId: actor.organisationId, version };
    if (present === null) return addMapping(tx, deps, { ...by, laboratoryId: laboratory.id, name });
    await addMappingVersion(tx, deps, { ...by, mapping: present });
    return present.id;
  });
}
