import { readdirSync } from 'node:fs';
import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { mappingSchema } from '#rules/reading/mapping';
import { ownResolvedEdition } from '#server/commands/projects/own-edition';
import * as cellGrids from '#server/db/queries/cell-grids';
import * as cellUses from '#server/db/queries/cell-uses';
import * as checks from '#server/db/queries/checks';
import * as contractors from '#server/db/queries/contractors';
import * as drafts from '#server/db/queries/drafts';
import * as editions from '#server/db/queries/editions';
import * as home from '#server/db/queries/home';
import * as jobs from '#server/db/queries/jobs';
import * as laboratories from '#server/db/queries/laboratories';
import * as submittalLists from '#server/db/queries/list-submittals';
import * as mappings from '#server/db/queries/mappings';
import * as notes from '#server/db/queries/notes';
import * as people from '#server/db/queries/people';
import * as projects from '#server/db/queries/projects';
import * as queue from '#server/db/queries/queue';
import type { Reader } from '#server/db/queries/reader';
import * as readingActs from '#server/db/queries/reading-acts';
import * as records from '#server/db/queries/records';
import * as returns from '#server/db/queries/returns';
import * as revisions from '#server/db/queries/revisions';
import * as ruleSets from '#server/db/queries/rule-sets';
import * as search from '#server/db/queries/search';
import * as sectionSnapshot from '#server/db/queries/section-snapshot';
import { checks as checkRows, notes as noteRows, waivers } from '#server/db/schema/checks';
import { readingActs as actRows, mappingVersions } from '#server/db/schema/learning';
import { mappings as mappingRows } from '#server/db/schema/mappings';
import { invitations } from '#server/db/schema/people';
import * as rows from '#server/db/schema/submittals';
import { demoId } from '#server/db/seed/demo-id';
import { demoOrganisations, demoPerson } from '#server/db/seed/demo-people';
import { demoProjectId, demoSectionId } from '#server/db/seed/seed-projects';
import { aSubmitted, type DemoWorld, expectStatus, pathOf, startDemoWorld } from './harness/demo-world';
import { makeOrganisation } from './harness/organisations';

let world: DemoWorld;
let named: Named;
/** Organisations that have nothing to do with anything here. */
let strangers: Reader[];

const agency: Reader = { kind: 'agency', organisationId: demoOrganisations.agency.id };
const contractor: Reader = { kind: 'contractor', organisationId: demoOrganisations.brightwater.id };
const project = 'CV-2031';
const now = new Date('2026-03-09T09:00:00.000Z');

beforeAll(async () => {
  world = await startDemoWorld();
  const place = await aReturned();
  named = await namesOf(place);
  strangers = [];
  for (const kind of ['agency', 'contractor'] as const) {
    const { id } = await makeOrganisation(world, { name: `Larkmoor ${kind}`, kind });
    strangers.push({ kind, organisationId: id });
  }
}, 180_000);
afterAll(() => world.close());

/** A revision with a note, a waiver, an answer, an attribute, a document with its file and a return that was sent. */
async function aReturned(): Promise<{ submittalId: string; number: number }> {
  const place = await aSubmitted(world, {
    project,
    workbook: 'TA-190-B2 r0.xlsx',
    takenBy: 'Ines Tordoff',
  });
  const ines = await world.as('Ines Tordoff');
  const { body: check } = await ines.get(`${pathOf(place)}/check`).expect(200);
  const fail = check.findings.find(
    (each: { outcome: string; severity: string }) => each.outcome === 'fail' && each.severity === 'advisory',
  );
  const finding = `${fail.rule}~${fail.subject}`;
  for (const kind of ['internal', 'to be returned']) {
    expectStatus(await ines.post(`${pathOf(place)}/notes`).send({ finding, kind, text: 'Ask.' }), 201);
  }
  const waiver = { finding, reason: 'Known.', toBeReturned: true };
  expectStatus(await ines.post(`${pathOf(place)}/waivers`).send(waiver), 201);
  const mairi = await world.as('Mairi Halloran');
  const sent = await mairi
    .post(`${pathOf(place)}/return/sending`)
    .set('If-Match', '"0"')
    .send({});
  expectStatus(sent, 200);
  return place;
}

async function namesOf({ submittalId, number }: { submittalId: string; number: number }) {
  const { db, newId } = world.deps;
  const row = await revisions.findRevision(db, contractor, { submittalId, number });
  const kept = row && (await returns.findReturn(db, contractor, row.revision.id));
  if (!row || kept?.letterFileId == null) throw new Error('The revision is to be returned with a letter.');
  const revisionId = row.revision.id;
  const by = { revisionId, contractorId: contractor.organisationId, personId: demoPerson('Sorcha Lund').id };
  await db
    .insert(rows.answers)
    .values({ ...by, id: newId(), sheet: 'Trials', cell: 'B2', text: '5.1', answer: '5.1', at: now });
  await db
    .insert(rows.typedAttributes)
    .values({ ...by, id: newId(), name: 'course', value: 'surface', typedOn: '2026-03-09' });
  await db.insert(rows.replacedWorkbooks).values({
    id: newId(),
    revisionId,
    contractorId: contractor.organisationId,
    fileId: row.workbook.id,
    replacedById: by.personId,
    replacedAt: now,
  });
  const invitationId = newId();
  await db.insert(invitations).values({
    id: invitationId,
    organisationId: contractor.organisationId,
    invitedFromId: agency.organisationId,
    inviterId: demoPerson('Edda Marsh').id,
    name: 'Ada',
    email: 'ada@brightwater.example',
    role: 'laboratory',
    status: 'pending',
    tokenHash: '0'.repeat(64),
    expiresAt: new Date('2027-01-01T00:00:00.000Z'),
    createdAt: now,
  });
  const [note] = await db.select().from(noteRows).where(eq(noteRows.revisionId, revisionId));
  const [waiver] = await db.select().from(waivers).where(eq(waivers.revisionId, revisionId));
  const job = await jobs.newestJobOf(db, contractor.organisationId, {
    subjectKind: 'revision',
    subjectId: revisionId,
  });
  const [member] = await people.listMembers(db, contractor.organisationId);
  const [edition] = await editions.listEditions(db, agency.organisationId);
  if (!note || !waiver || !job || !member || !edition) throw new Error('Something was not made.');
  const draftId = await aDraftWithComment();
  const mappingId = await aMapping({ ...by, laboratoryId: row.revision.laboratoryId });
  return {
    mappingId,
    laboratoryId: row.revision.laboratoryId,
    submittalId,
    revisionId,
    row,
    kept,
    note,
    waiver,
    job,
    member,
    edition,
    draftId,
  };
}

/** A mapping that a revision taught and was read with. */
async function aMapping({
  revisionId,
  personId,
  laboratoryId,
}: {
  revisionId: string;
  personId: string;
  laboratoryId: string;
}): Promise<string> {
  const { db, newId } = world.deps;
  const id = newId();
  const organisationId = contractor.organisationId;
  const fingerprint = 'layout-1:00000001';
  const own = { organisationId, fingerprint, number: 1 };
  await db
    .insert(mappingRows)
    .values({ id, ...own, laboratoryId, name: 'Plant sheet', createdById: personId, createdAt: now });
  const document = mappingSchema.parse({ laboratory: 'Plant', fingerprint, version: 1, rules: [] });
  const version = { document, origin: 'Imported', revisionId, learned: [], personId, at: now };
  await db.insert(mappingVersions).values({ id: newId(), mappingId: id, ...own, ...version });
  await db.update(rows.revisions).set({ mappingId: id }).where(eq(rows.revisions.id, revisionId));
  const says = { kind: 'not a reading' } as const;
  const correction = { sheet: 'Trials', range: 'B2', says };
  await db.insert(actRows).values({
    id: newId(),
    revisionId,
    contractorId: organisationId,
    act: { kind: 'correction', correction },
    personId,
    at: now,
  });
  return id;
}

/** The demo's draft, with a change and a comment. */
async function aDraftWithComment(): Promise<string> {
  const tamsin = await world.as('Tamsin Brook');
  const draftId = demoId('draft/cvra-412/2027');
  const change = { part: 'rules/new', before: null, after: { id: 'new' } };
  expectStatus(await tamsin.post(`/api/drafts/${draftId}/changes`).send({ changes: [change] }), 200);
  const comment = { rule: null, text: 'To be written.' };
  expectStatus(await tamsin.post(`/api/drafts/${draftId}/comments`).send(comment), 201);
  return draftId;
}

type Named = Awaited<ReturnType<typeof namesOf>>;

type Owner = 'agency' | 'contractor' | 'both';
/** Asks for what belongs to the tenants, as whoever reads; and who of the two is to find it. */
type Query = [finds: Owner, run: (reader: Reader) => Promise<unknown> | unknown];

const db = () => world.deps.db;
const projectId = demoProjectId(project);
const place = () => ({ submittalId: named.submittalId, number: 0 });
const subject = () => ({ subjectKind: 'revision', subjectId: named.revisionId });

const queries: Record<string, Record<string, Query>> = {
  'cell-grids': {
    loadGrid: ['both', (reader) => cellGrids.loadGrid(db(), reader, named.row.workbook.id)],
    gridOf: ['both', (reader) => cellGrids.gridOf(db(), reader, named.row.workbook.id)],
    loadSheet: [
      'both',
      async (reader) => {
        const grid = await cellGrids.gridOf(db(), contractor, named.row.workbook.id);
        const name = grid?.sheets[0]?.name ?? '';
        return cellGrids.loadSheet(db(), reader, { fileId: named.row.workbook.id, name, from: 1, to: 50 });
      },
    ],
  },
  'cell-uses': {
    usesOfSheet: [
      'both',
      async (reader) => {
        const record = await records.findMixRecord(db(), contractor, named.revisionId);
        const sheet = record?.reading.uses?.[0]?.sheet ?? '';
        return cellUses.usesOfSheet(db(), reader, { revisionId: named.revisionId, sheet });
      },
    ],
  },
  checks: {
    newestCheckOf: ['both', (reader) => checks.newestCheckOf(db(), reader, named.revisionId)],
    newestCheckHead: ['both', (reader) => checks.newestCheckHead(db(), reader, named.revisionId)],
    listCheckHeads: ['both', (reader) => checks.listCheckHeads(db(), reader, named.revisionId)],
    findCheck: [
      'both',
      (reader) => checks.findCheck(db(), reader, { revisionId: named.revisionId, number: 1 }),
    ],
    // The first number is what a revision without checks would get.
    nextCheckNumber: [
      'both',
      async (reader) => (await checks.nextCheckNumber(db(), reader, named.revisionId)) > 1,
    ],
  },
  contractors: {
    listContractorsOf: [
      'agency',
      (reader) => contractors.listContractorsOf(db(), { agencyId: reader.organisationId, now }),
    ],
    findContractorOf: [
      'agency',
      (reader) =>
        contractors.findContractorOf(db(), {
          agencyId: reader.organisationId,
          contractorId: contractor.organisationId,
        }),
    ],
    hasAdministrator: [
      'agency',
      (reader) =>
        contractors.hasAdministrator(db(), {
          agencyId: reader.organisationId,
          contractorId: contractor.organisationId,
        }),
    ],
  },
  drafts: {
    findDraft: ['agency', (reader) => drafts.findDraft(db(), reader.organisationId, named.draftId)],
    lockDraft: ['agency', (reader) => drafts.lockDraft(db(), reader.organisationId, named.draftId)],
    listDraftComments: [
      'agency',
      (reader) => drafts.listDraftComments(db(), reader.organisationId, named.draftId),
    ],
    listDraftChanges: [
      'agency',
      (reader) => drafts.listDraftChanges(db(), reader.organisationId, named.draftId),
    ],
  },
  editions: {
    listEditions: ['agency', (reader) => editions.listEditions(db(), reader.organisationId)],
    editionDocument: [
      'agency',
      (reader) =>
        editions.editionDocument(db(), { agencyId: reader.organisationId, editionId: named.edition.id }),
    ],
  },
  home: {
    notesFromAgencies: ['contractor', (reader) => home.notesFromAgencies(db(), reader.organisationId)],
    clausesOf: ['contractor', (reader) => home.clausesOf(db(), reader.organisationId, [named.revisionId])],
    lastLetter: ['contractor', (reader) => home.lastLetter(db(), reader.organisationId)],
    laboratoriesRead: ['contractor', (reader) => home.laboratoriesRead(db(), reader.organisationId)],
  },
  jobs: {
    newestJobOf: ['contractor', (reader) => jobs.newestJobOf(db(), reader.organisationId, subject())],
    newestJobsOf: [
      'contractor',
      (reader) => jobs.newestJobsOf(db(), reader.organisationId, 'revision', [named.revisionId]),
    ],
    findJob: ['contractor', (reader) => jobs.findJob(db(), reader.organisationId, named.job.id)],
  },
  laboratories: {
    listLaboratoriesOf: [
      'contractor',
      (reader) => laboratories.listLaboratoriesOf(db(), reader.organisationId),
    ],
  },
  'list-submittals': {
    listSubmittals: ['both', (reader) => submittalLists.listSubmittals(db(), reader, { rows: 10 })],
  },
  mappings: {
    listMappings: ['contractor', (reader) => mappings.listMappings(db(), reader.organisationId)],
    findMapping: [
      'contractor',
      (reader) => mappings.findMapping(db(), reader.organisationId, named.mappingId),
    ],
    listMappingVersions: [
      'contractor',
      (reader) => mappings.listMappingVersions(db(), reader.organisationId, named.mappingId),
    ],
    findMappingVersion: [
      'contractor',
      (reader) =>
        mappings.findMappingVersion(db(), reader.organisationId, { mappingId: named.mappingId, number: 1 }),
    ],
    layoutsInUse: [
      'contractor',
      (reader) => mappings.layoutsInUse(db(), reader.organisationId, named.laboratoryId),
    ],
    lastLearnedFrom: [
      'contractor',
      (reader) => mappings.lastLearnedFrom(db(), reader.organisationId, named.revisionId),
    ],
    lockMapping: [
      'contractor',
      (reader) => mappings.lockMapping(db(), reader.organisationId, named.mappingId),
    ],
  },
  notes: {
    listNotes: ['both', (reader) => notes.listNotes(db(), reader, named.submittalId)],
    findOwnNote: ['agency', (reader) => notes.findOwnNote(db(), reader.organisationId, named.note.id)],
    listWaivers: ['both', (reader) => notes.listWaivers(db(), reader, named.revisionId)],
    findWaiver: ['agency', (reader) => notes.findWaiver(db(), reader.organisationId, named.waiver.id)],
  },
  people: {
    listMembers: ['both', (reader) => people.listMembers(db(), reader.organisationId)],
    findMember: [
      'contractor',
      ({ organisationId }) =>
        people.findMember(db(), { membershipId: named.member.membershipId, organisationId }),
    ],
    listOpenInvitations: [
      'both',
      ({ organisationId }) => people.listOpenInvitations(db(), { organisationId, now }),
    ],
  },
  projects: {
    listProjectRows: ['both', (reader) => projects.listProjectRows(db(), reader)],
    findProjectRow: ['both', (reader) => projects.findProjectRow(db(), reader, projectId)],
    contractorsOfProjects: ['both', (reader) => projects.contractorsOfProjects(db(), reader, [projectId])],
    contactsOfProject: ['both', (reader) => projects.contactsOfProject(db(), reader, projectId)],
    sectionsOfProjects: ['both', (reader) => projects.sectionsOfProjects(db(), reader, [projectId])],
    countSubmittals: ['both', (reader) => projects.countSubmittals(db(), reader, [projectId])],
  },
  queue: {
    listQueue: ['agency', (reader) => queue.listQueue(db(), reader.organisationId)],
    internalNotes: [
      'agency',
      (reader) => queue.internalNotes(db(), reader.organisationId, named.submittalId),
    ],
  },
  'reading-acts': {
    listReadingActs: ['both', (reader) => readingActs.listReadingActs(db(), reader, named.revisionId)],
  },
  records: {
    findMixRecord: ['both', (reader) => records.findMixRecord(db(), reader, named.revisionId)],
    listAnswers: ['both', (reader) => records.listAnswers(db(), reader, named.revisionId)],
    listTypedAttributes: ['both', (reader) => records.listTypedAttributes(db(), reader, named.revisionId)],
    listDocuments: ['both', (reader) => records.listDocuments(db(), reader, named.revisionId)],
    listReplacedWorkbooks: [
      'contractor',
      (reader) => records.listReplacedWorkbooks(db(), reader.organisationId, named.revisionId),
    ],
    loadFile: ['both', (reader) => records.loadFile(db(), reader, named.row.workbook.id)],
  },
  returns: {
    findReturn: ['both', (reader) => returns.findReturn(db(), reader, named.revisionId)],
    lockReturn: ['agency', (reader) => returns.lockReturn(db(), reader.organisationId, named.revisionId)],
    revisionBefore: ['both', (reader) => returns.revisionBefore(db(), reader, { ...place(), number: 1 })],
    peopleWithRole: [
      'agency',
      (reader) => returns.peopleWithRole(db(), reader.organisationId, 'signing engineer'),
    ],
    submitterOf: ['both', (reader) => returns.submitterOf(db(), reader, named.revisionId)],
    peopleOfReturn: [
      'both',
      async (reader) => (await returns.peopleOfReturn(db(), reader, named.kept.id)).decidedBy,
    ],
    mailsOfReturn: ['both', (reader) => returns.mailsOfReturn(db(), reader, named.kept.id)],
    storedFile: ['both', (reader) => returns.storedFile(db(), reader, named.kept.letterFileId ?? '')],
    isStartingPoint: [
      'agency',
      (reader) =>
        returns.isStartingPoint(db(), reader.organisationId, {
          ruleSet: named.edition.ruleSetKey,
          edition: named.edition.edition,
        }),
    ],
    stampsOfReturned: [
      'agency',
      (reader) => returns.stampsOfReturned(db(), reader.organisationId, named.revisionId),
    ],
  },
  revisions: {
    findRevision: ['both', (reader) => revisions.findRevision(db(), reader, place())],
    latestVisibleNumber: [
      'both',
      (reader) => revisions.latestVisibleNumber(db(), reader, named.submittalId).then((each) => each === 0),
    ],
    listRevisions: ['both', (reader) => revisions.listRevisions(db(), reader, named.submittalId)],
    lockRevision: ['both', (reader) => revisions.lockRevision(db(), reader, named.revisionId)],
    lockSubmittal: ['both', (reader) => revisions.lockSubmittal(db(), reader, named.submittalId)],
    nameOfDecider: ['both', (reader) => revisions.nameOfDecider(db(), reader, named.revisionId)],
  },
  'rule-sets': {
    visibleRuleSets: [
      'both',
      async (reader) => (await ruleSets.visibleRuleSets(db(), reader)).flatMap(({ editions: seen }) => seen),
    ],
    listAgencyEditions: ['agency', (reader) => ruleSets.listAgencyEditions(db(), reader.organisationId)],
  },
  search: {
    searchSubmittals: ['both', (reader) => search.searchSubmittals(db(), reader, 'T-')],
    searchProjects: ['both', (reader) => search.searchProjects(db(), reader, 'CV-')],
  },
  'section-snapshot': {
    snapshotOfSection: [
      'both',
      (reader) =>
        sectionSnapshot.snapshotOfSection(db(), reader, { projectId, sectionId: demoSectionId(project) }),
    ],
  },
};

/** Queries that serve no tenant, and why; and what in these files is no query. */
const others: Record<string, Record<string, string>> = {
  'caught-mails': {
    listCaughtMails: 'mail caught on loopback is open, and with a mail server configured there is none',
    findCaughtMail: 'the same',
  },
  'cell-grids': { storeGrid: 'writes; a foreign reader finds no file to write for', blocksOf: 'pure' },
  checks: { removePreChecks: 'deletes; tried below' },
  cursor: { readCursor: 'pure', writeCursor: 'pure' },
  'demo-sign-ins': { listDemoPeople: 'the sign-in page shows them to everybody while the demo is there' },
  editions: { editionReference: 'pure' },
  memberships: {
    membershipsOf: 'a person’s own',
    onlyOrganisationOf: 'the same',
    isMember: 'asked of the person and organisation named',
  },
  organisations: { anyOrganisation: 'for the set-up page', findOrganisation: 'the reader itself' },
  people: { findInvitationByToken: 'the link is the key', findPersonByEmail: 'sign-ins belong to no tenant' },
  reader: {
    ofTenant: 'pure',
    submittalsOf: 'pure',
    revisionsOf: 'pure',
    returnsOf: 'pure',
    projectsOf: 'pure',
  },
  returns: {
    letterheadOf: 'asks for the organisation itself',
    fileHashes: 'the row that it is given names the agency',
  },
};

const all = Object.entries(queries).flatMap(([file, each]) =>
  Object.entries(each).map(([name, [finds, run]]) => ({ name: `${file}: ${name}`, finds, run })),
);

function isNothing(found: unknown): boolean {
  if (found instanceof Map) return found.size === 0;
  if (Array.isArray(found)) return found.length === 0;
  return found === null || found === false || found === '';
}

describe('every query', () => {
  it('is tried here, or serves no tenant for a reason that is given', async () => {
    const exported = [];
    for (const file of readdirSync('server/db/queries')) {
      const module: object = await import(`../../server/db/queries/${file.replace(/\.ts$/, '')}.ts`);
      for (const [name, each] of Object.entries(module)) {
        if (typeof each === 'function') exported.push(`${file.replace(/\.ts$/, '')}: ${name}`);
      }
    }
    const listed = [queries, others].flatMap((table) =>
      Object.entries(table).flatMap(([file, each]) => Object.keys(each).map((name) => `${file}: ${name}`)),
    );
    expect(exported.sort()).toEqual(listed.sort());
  });

  it.each(all)('$name finds its tenant’s own', async ({ finds, run }) => {
    const owners = { agency: [agency], contractor: [contractor], both: [agency, contractor] }[finds];
    for (const owner of owners) expect(isNothing(await run(owner)), owner.kind).toBe(false);
  });

  it.each(all)('$name finds nothing for another agency or contractor', async ({ run }) => {
    for (const stranger of strangers) expect(isNothing(await run(stranger)), stranger.kind).toBe(true);
  });

  it('that deletes pre-checks leaves another tenant’s alone', async () => {
    await db().update(checkRows).set({ kind: 'pre-check' });
    for (const stranger of strangers) await checks.removePreChecks(db(), stranger, named.revisionId);
    expect(await checks.newestCheckHead(db(), agency, named.revisionId)).toMatchObject({ number: 1 });
    await db().update(checkRows).set({ kind: 'check of record' });
  });
});

describe('a resolved edition that a workbook names by its hash', () => {
  it('is known to the agency whose published documents make it, and to no other', async () => {
    const { resolvedHash: hash } = named.row.section;
    const own = await ownResolvedEdition(db(), { agencyId: agency.organisationId, hash });
    expect(own).toMatchObject({ id: 'cvra-412', edition: '2026', layers: [{ id: 'cvra-s-07' }] });
    for (const { organisationId } of strangers) {
      expect(await ownResolvedEdition(db(), { agencyId: organisationId, hash })).toBeNull();
    }
  });
});
