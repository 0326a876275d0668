import { and, count, eq, inArray, isNull } from 'drizzle-orm';
import { dateOfInstant, formatDate } from '#shared/format/dates';
import type { Database } from '../../db/client';
import { checks } from '../../db/schema/checks';
import { sectionLayers, sections } from '../../db/schema/projects';
import { revisions, submittals } from '../../db/schema/submittals';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { expectWritten } from '../../middleware/if-match';
import { Problem } from '../../problem';
import { judgeFactsAnew } from './facts-of-project';
import { resolveSection, type SectionChoice } from './resolve-section';

interface Keeping {
  actor: RequestActor;
  projectId: string;
  choice: SectionChoice;
  requestId: string;
}

/** A section exists once somebody who may has confirmed it; until then it is only proposed. */
export async function confirmSection(deps: Deps, keeping: Keeping): Promise<void> {
  const { actor, projectId, choice, requestId } = keeping;
  const agencyId = actor.organisationId;
  await deps.db.transaction(async (tx) => {
    const { base, layers, hash } = await resolveSection(tx, deps, { agencyId, choice });
    const same = await tx
      .select({ id: sections.id })
      .from(sections)
      .where(and(eq(sections.projectId, projectId), eq(sections.resolvedHash, hash)));
    if (same.length > 0) {
      throw new Problem('already-exists', {
        detail: 'The project has a section with these editions already.',
      });
    }
    const [counted] = await tx
      .select({ total: count() })
      .from(sections)
      .where(eq(sections.projectId, projectId));
    const id = deps.newId();
    await tx.insert(sections).values({
      id,
      projectId,
      agencyId,
      position: counted?.total ?? 0,
      baseEditionId: base.id,
      resolvedHash: hash,
      confirmedById: actor.personId,
      confirmedAt: deps.now(),
    });
    await keepLayers(tx, { sectionId: id, editionIds: layers.map((layer) => layer.id) });
    await judgeFactsAnew(tx, actor, projectId);
    await writeAudit(tx, deps, {
      actor,
      act: 'section confirmed',
      subject: { kind: 'project', id: projectId },
      detail: { ...choice, resolvedHash: hash },
      requestId,
    });
  });
}

/** Checks made under the old editions stay as they are and are marked stale. */
export async function changeSection(
  deps: Deps,
  keeping: Keeping & { sectionId: string; version: number },
): Promise<void> {
  const { actor, projectId, sectionId, version, choice, requestId } = keeping;
  const agencyId = actor.organisationId;
  await deps.db.transaction(async (tx) => {
    const { base, layers, hash } = await resolveSection(tx, deps, { agencyId, choice });
    const own = and(
      eq(sections.id, sectionId),
      eq(sections.projectId, projectId),
      eq(sections.agencyId, agencyId),
    );
    const result = await tx
      .update(sections)
      .set({
        baseEditionId: base.id,
        resolvedHash: hash,
        confirmedById: actor.personId,
        confirmedAt: deps.now(),
        version: version + 1,
      })
      .where(and(own, eq(sections.version, version)));
    expectWritten(result);
    await tx.delete(sectionLayers).where(eq(sectionLayers.sectionId, sectionId));
    await keepLayers(tx, { sectionId, editionIds: layers.map((layer) => layer.id) });
    await judgeFactsAnew(tx, actor, projectId);
    await markChecksStale(tx, {
      sectionId,
      on: dateOfInstant(deps.now().toISOString(), actor.organisation.timeZone),
    });
    await writeAudit(tx, deps, {
      actor,
      act: 'section changed',
      subject: { kind: 'project', id: projectId },
      detail: { sectionId, ...choice, resolvedHash: hash },
      requestId,
    });
  });
}

async function keepLayers(
  tx: Database,
  { sectionId, editionIds }: { sectionId: string; editionIds: string[] },
): Promise<void> {
  if (editionIds.length === 0) return;
  await tx
    .insert(sectionLayers)
    .values(editionIds.map((editionId, position) => ({ sectionId, position, editionId })));
}

async function markChecksStale(
  tx: Database,
  { sectionId, on }: { sectionId: string; on: string },
): Promise<void> {
  const judged = tx
    .select({ id: revisions.id })
    .from(revisions)
    .innerJoin(submittals, eq(submittals.id, revisions.submittalId))
    .where(eq(submittals.sectionId, sectionId));
  await tx
    .update(checks)
    .set({ stale: `The section of the project was changed on ${formatDate(on)}.` })
    .where(and(inArray(checks.revisionId, judged), isNull(checks.stale)));
}
