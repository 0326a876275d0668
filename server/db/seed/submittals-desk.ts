import { and, desc, eq } from 'drizzle-orm';
import type { Disposition } from '#rules/engine/finding';
import type { NoteKind } from '#shared/contracts/notes';
import { waive } from '../../commands/notes/waive';
import { writeNote } from '../../commands/notes/write-note';
import { loadReturn } from '../../commands/returns/load-return';
import { sendReturn } from '../../commands/returns/send-return';
import { takeRevision } from '../../commands/submittals/change-state';
import { startRevision } from '../../commands/submittals/start-revision';
import { submitRevision } from '../../commands/submittals/submit-revision';
import { uploadSubmittal } from '../../commands/submittals/upload-submittal';
import type { Deps } from '../../deps';
import { readWorkbookJob } from '../../jobs/read-workbook';
import type { RequestActor } from '../../middleware/authenticate';
import { revisionAbilities } from '../../policies/revision-abilities';
import { declarationOf } from '../../presenters/declaration-of';
import { revisionFacts } from '../../presenters/present-revision';
import { decodeWorkbook } from '../../workbook/decode';
import type { Database } from '../client';
import { newestCheckOf } from '../queries/checks';
import { findMixRecord } from '../queries/records';
import { findRevision } from '../queries/revisions';
import { rolesFromColumn } from '../roles-column';
import { members, organisations } from '../schema/people';
import { jobs } from '../schema/work';
import { demoOrganisations, demoPerson } from './demo-people';
import { demoLaboratories } from './seed-organisations';
import { demoProjectId, demoSectionId } from './seed-projects';

export interface DemoPlace {
  submittalId: string;
  number: number;
  revisionId: string;
}

interface ByPerson {
  /** Name of a demo person. */
  by: string;
}

interface OnPlace extends ByPerson {
  place: DemoPlace;
}

export type DemoDesk = ReturnType<typeof demoDesk>;

const requestId = 'demo';

/** The product's own acts, each by a demo person at an instant of the past. */
export function demoDesk({ deps, workbook }: { deps: Deps; workbook: (name: string) => Buffer }) {
  const at = (instant: string): Deps => ({
    ...deps,
    now: () => new Date(instant),
    wake: { jobs: () => undefined, mail: () => undefined },
    // In place: the demo's own files need no guard of memory and time.
    pool: { decode: ({ bytes, fileName }) => decodeWorkbook(bytes, fileName), close: async () => undefined },
  });
  const file = (name: string) => ({
    field: 'workbook',
    fileName: name,
    mediaType: '',
    bytes: workbook(name),
  });

  async function read(inner: Deps, actor: RequestActor, place: { submittalId: string; number: number }) {
    const row = await expectRow(inner, actor, place);
    await runReadJob(inner, row.revision.id);
    return { ...place, revisionId: row.revision.id };
  }

  return {
    db: deps.db as Database,

    async upload(
      instant: string,
      {
        by,
        project,
        mixDesignation,
        workbook: name,
      }: ByPerson & { project: string; mixDesignation: string; workbook: string },
    ): Promise<DemoPlace> {
      const inner = at(instant);
      const actor = await actorNamed(inner, by);
      const place = await uploadSubmittal(inner, {
        actor,
        requestId,
        projectId: demoProjectId(project),
        sectionId: demoSectionId(project),
        laboratoryId: demoLaboratories[demoPerson(by).organisation].id,
        mixDesignation,
        workbook: file(name),
      });
      return read(inner, actor, place);
    },

    async revise(
      instant: string,
      { by, place, workbook: name }: OnPlace & { workbook: string },
    ): Promise<DemoPlace> {
      const inner = at(instant);
      const actor = await actorNamed(inner, by);
      const { submittalId } = place;
      const number = await startRevision(inner, {
        actor,
        requestId,
        submittalId,
        laboratoryId: demoLaboratories[demoPerson(by).organisation].id,
        reason: '',
        workbook: file(name),
      });
      return read(inner, actor, { submittalId, number });
    },

    async submit(instant: string, { by, place }: OnPlace): Promise<void> {
      const inner = at(instant);
      const actor = await actorNamed(inner, by);
      const row = await expectRow(inner, actor, place);
      const check = await newestCheckOf(inner.db, actor, place.revisionId);
      const kept = await findMixRecord(inner.db, actor, place.revisionId);
      if (check === null || kept === null) throw new Error('The demo submits what has been checked.');
      await submitRevision(inner, {
        actor,
        requestId,
        row,
        version: row.revision.version,
        seal: check.seal,
        declaration: declarationOf({
          row,
          section: row.revision.section,
          findings: check.result.findings,
          doubts: kept.record.doubts,
        }),
      });
    },

    async take(instant: string, { by, place }: OnPlace): Promise<void> {
      const inner = at(instant);
      const actor = await actorNamed(inner, by);
      await takeRevision(inner, { actor, requestId, row: await expectRow(inner, actor, place) });
    },

    async note(
      instant: string,
      { by, place, ...note }: OnPlace & { finding: string | null; kind: NoteKind; text: string },
    ): Promise<void> {
      const inner = at(instant);
      const actor = await actorNamed(inner, by);
      const { row, abilities } = await seen(inner, actor, place);
      await writeNote(inner, { actor, requestId, row, abilities, answers: null, ...note });
    },

    async waive(
      instant: string,
      { by, place, ...waiver }: OnPlace & { finding: string; reason: string },
    ): Promise<void> {
      const inner = at(instant);
      const actor = await actorNamed(inner, by);
      const { row, abilities } = await seen(inner, actor, place);
      await waive(inner, { actor, requestId, row, abilities, toBeReturned: true, ...waiver });
    },

    async sendReturn(
      instant: string,
      { by, place, disposition, reason }: OnPlace & { disposition: Disposition; reason: string },
    ): Promise<void> {
      const inner = at(instant);
      const actor = await actorNamed(inner, by);
      const { row, loaded, fields } = await loadReturn(inner, actor, place);
      await sendReturn(inner, {
        actor,
        requestId,
        row,
        loaded,
        fields: { ...fields, disposition, reason },
        seenVersion: 0,
      });
    },
  };
}

async function actorNamed({ db }: Deps, name: string): Promise<RequestActor> {
  const { id, email, organisation } = demoPerson(name);
  const [row] = await db
    .select({ member: members, organisation: organisations })
    .from(members)
    .innerJoin(organisations, eq(organisations.id, members.organisationId))
    .where(and(eq(members.personId, id), eq(members.organisationId, demoOrganisations[organisation].id)));
  if (row === undefined) throw new Error(`${name} belongs to no organisation.`);
  return {
    person: { id, name, email },
    personId: id,
    organisation: row.organisation,
    organisationId: row.organisation.id,
    kind: row.organisation.kind,
    membershipId: row.member.id,
    roles: rolesFromColumn(row.member.role),
  };
}

async function expectRow(deps: Deps, actor: RequestActor, place: { submittalId: string; number: number }) {
  const row = await findRevision(deps.db, actor, place);
  if (row === null) throw new Error(`The demo has no revision ${place.number} of ${place.submittalId}.`);
  return row;
}

async function seen(deps: Deps, actor: RequestActor, place: DemoPlace) {
  const row = await expectRow(deps, actor, place);
  return { row, abilities: revisionAbilities(actor, revisionFacts({ row, job: null, hasCheck: true })) };
}

/** The reading is done at once, in the seeding's own transaction, where no runner could see the job yet. */
async function runReadJob(deps: Deps, revisionId: string): Promise<void> {
  const [job] = await deps.db
    .select()
    .from(jobs)
    .where(and(eq(jobs.subjectKind, 'revision'), eq(jobs.subjectId, revisionId)))
    .orderBy(desc(jobs.createdAt))
    .limit(1);
  if (job === undefined) throw new Error('An upload leaves a job.');
  await readWorkbookJob({
    deps,
    job,
    signal: new AbortController().signal,
    report: async () => undefined,
    complete: async (tx, progress = '') => {
      await tx
        .update(jobs)
        .set({ state: 'done', progress, finishedAt: deps.now() })
        .where(eq(jobs.id, job.id));
    },
  });
}
