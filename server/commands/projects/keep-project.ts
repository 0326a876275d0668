import { and, eq, inArray, notInArray } from 'drizzle-orm';
import type { Project } from '#shared/contracts/projects';
import type { Database } from '../../db/client';
import { isDuplicateEntry } from '../../db/duplicate-entry';
import { agencyContractors } from '../../db/schema/people';
import { contacts, projectContractors, projects } from '../../db/schema/projects';
import { submittals } from '../../db/schema/submittals';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import { expectWritten } from '../../middleware/if-match';
import type { Actor } from '../../policies/actor';
import { Problem } from '../../problem';
import { factsOfProject } from './facts-of-project';

export interface ProjectFields
  extends Pick<Project, 'number' | 'title' | 'lettingOn' | 'facts' | 'contacts'> {
  contractorIds: string[];
}

interface Keeping {
  actor: Actor;
  fields: ProjectFields;
  requestId: string;
}

export async function addProject(deps: Deps, { actor, fields, requestId }: Keeping): Promise<string> {
  const id = deps.newId();
  const { contractorIds, contacts: people, ...columns } = fields;
  await deps.db.transaction(async (tx) => {
    const facts = await factsOfProject(tx, actor, { facts: fields.facts, projectId: null });
    const row = { ...columns, facts, id, agencyId: actor.organisationId, createdAt: deps.now() };
    await refuseDuplicateNumber(fields.number, () => tx.insert(projects).values(row));
    await keepContractors(tx, { actor, projectId: id, contractorIds });
    await keepContacts(tx, deps, { projectId: id, people });
    await writeAudit(tx, deps, {
      actor,
      act: 'project added',
      subject: { kind: 'project', id },
      detail: { number: fields.number },
      requestId,
    });
  });
  return id;
}

/** A new letting date moves no section: what was confirmed stays until somebody changes it. */
export async function changeProject(
  deps: Deps,
  { actor, projectId, version, fields, requestId }: Keeping & { projectId: string; version: number },
): Promise<void> {
  const { contractorIds, contacts: people, ...columns } = fields;
  await deps.db.transaction(async (tx) => {
    const own = and(eq(projects.id, projectId), eq(projects.agencyId, actor.organisationId));
    const facts = await factsOfProject(tx, actor, { facts: fields.facts, projectId });
    const write = () =>
      tx
        .update(projects)
        .set({ ...columns, facts, version: version + 1 })
        .where(and(own, eq(projects.version, version)));
    expectWritten(await refuseDuplicateNumber(fields.number, write));
    await keepContractors(tx, { actor, projectId, contractorIds });
    await keepContacts(tx, deps, { projectId, people });
    await writeAudit(tx, deps, {
      actor,
      act: 'project changed',
      subject: { kind: 'project', id: projectId },
      detail: { number: fields.number, lettingOn: fields.lettingOn },
      requestId,
    });
  });
}

async function refuseDuplicateNumber<Result>(number: string, write: () => Promise<Result>): Promise<Result> {
  try {
    return await write();
  } catch (error) {
    if (!isDuplicateEntry(error)) throw error;
    const detail = `There is a project ${number} already.`;
    throw new Problem('already-exists', { detail, errors: [{ pointer: '/number', detail }] });
  }
}

interface Contractors {
  actor: Actor;
  projectId: string;
  contractorIds: string[];
}

async function keepContractors(
  tx: Database,
  { actor, projectId, contractorIds }: Contractors,
): Promise<void> {
  const wanted = [...new Set(contractorIds)];
  const known = await tx
    .select({ id: agencyContractors.contractorId })
    .from(agencyContractors)
    .where(eq(agencyContractors.agencyId, actor.organisationId));
  if (wanted.some((id) => !known.some((each) => each.id === id))) {
    const detail = 'A contractor is not among those that work with the agency.';
    throw new Problem('invalid-input', { detail, errors: [{ pointer: '/contractorIds', detail }] });
  }
  const left = and(
    eq(projectContractors.projectId, projectId),
    ...(wanted.length > 0 ? [notInArray(projectContractors.contractorId, wanted)] : []),
  );
  await refuseWithSubmittals(tx, {
    projectId,
    leaving: await tx.select().from(projectContractors).where(left),
  });
  await tx.delete(projectContractors).where(left);
  if (wanted.length === 0) return;
  await tx
    .insert(projectContractors)
    .ignore()
    .values(wanted.map((contractorId) => ({ projectId, contractorId })));
}

/** A contractor with submittals would lose sight of them. */
async function refuseWithSubmittals(
  tx: Database,
  { projectId, leaving }: { projectId: string; leaving: { contractorId: string }[] },
): Promise<void> {
  const ids = leaving.map(({ contractorId }) => contractorId);
  if (ids.length === 0) return;
  const [any] = await tx
    .select({ id: submittals.id })
    .from(submittals)
    .where(and(eq(submittals.projectId, projectId), inArray(submittals.contractorId, ids)))
    .limit(1);
  if (!any) return;
  throw new Problem('wrong-state', {
    detail: 'A contractor that is to leave the project has submittals in it.',
    fix: 'Keep the contractor on the project.',
  });
}

async function keepContacts(
  tx: Database,
  { newId }: Pick<Deps, 'newId'>,
  { projectId, people }: { projectId: string; people: Project['contacts'] },
): Promise<void> {
  await tx.delete(contacts).where(eq(contacts.projectId, projectId));
  if (people.length === 0) return;
  await tx
    .insert(contacts)
    .values(people.map((person, position) => ({ ...person, id: newId(), projectId, position })));
}
