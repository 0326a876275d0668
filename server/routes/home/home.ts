import { getHome, type Home } from '#shared/contracts/home';
import { dateOfInstant } from '#shared/format/dates';
import { countInFigures, countOf } from '#shared/format/numbers';
import { sectionWords } from '#shared/format/section-words';
import { clausesOf, laboratoriesRead, lastLetter, notesFromAgencies } from '../../db/queries/home';
import { newestJobsOf } from '../../db/queries/jobs';
import { listSubmittals } from '../../db/queries/list-submittals';
import { listProjectRows, sectionsOfProjects } from '../../db/queries/projects';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { hasRole, preparesSubmittals } from '../../policies/actor';
import { presentSubmittalItem } from '../../presenters/present-submittal-item';
import { templateHrefOf } from '../../presenters/template-href';
import { presentNote } from '../../presenters/visible-notes';
import { Problem } from '../../problem';
import { route } from '../define-route';
import { viewProjectList } from '../projects/view-project';
import { currentRevision } from './current-revision';

const shownSubmittals = 30;

export const getHomeRoute = route(getHome, async ({ deps, actor }) => {
  if (actor.kind !== 'contractor') {
    throw new Problem('not-allowed', {
      detail: 'This is a contractor’s home; an agency begins at its queue.',
    });
  }
  const rows = await listSubmittals(deps.db, actor, { rows: shownSubmittals });
  const jobs = await newestJobsOf(
    deps.db,
    actor.organisationId,
    'revision',
    rows.filter(({ revision }) => revision.state === 'draft').map(({ revision }) => revision.id),
  );
  const submittals = rows.map((row) =>
    presentSubmittalItem(row, { kind: 'contractor', job: jobs.get(row.revision.id) ?? null }),
  );
  const projectRows = await listProjectRows(deps.db, actor);
  return {
    submittals,
    current: await currentRevision(deps, actor, submittals),
    fromAgency: await fromAgency(deps, actor),
    lastLetter: await lastLetterOf(deps, actor),
    projects: await viewProjectList(deps, actor, projectRows),
    laboratories: await laboratoryNotes(deps, actor),
    templates: await templates(deps, actor, projectRows),
    abilities: { upload: preparesSubmittals(actor) },
  };
});

async function fromAgency(deps: Deps, actor: RequestActor): Promise<Home['fromAgency']> {
  const rows = await notesFromAgencies(deps.db, actor.organisationId);
  const clauses = await clausesOf(deps.db, actor.organisationId, [
    ...new Set(rows.map(({ revision }) => revision.id)),
  ]);
  const mayReply = { note: false, reply: hasRole(actor, 'quality manager') };
  return rows.map((row) => ({
    ...presentNote(row, actor, mayReply),
    submittalId: row.note.submittalId,
    mixDesignation: row.mixDesignation,
    clause: clauses.get(`${row.revision.id} ${row.note.finding}`) ?? null,
  }));
}

async function lastLetterOf(deps: Deps, actor: RequestActor): Promise<Home['lastLetter']> {
  const letter = await lastLetter(deps.db, actor.organisationId);
  if (letter?.sentAt == null) return null;
  return {
    submittalId: letter.submittalId,
    revision: letter.revision,
    on: dateOfInstant(letter.sentAt.toISOString(), letter.timeZone),
    workbook: letter.workbookFileId !== null,
  };
}

async function laboratoryNotes(deps: Deps, actor: RequestActor): Promise<Home['laboratories']> {
  const rows = await laboratoriesRead(deps.db, actor.organisationId);
  return rows.map(({ name, workbooks, doubts }) => ({
    name,
    note:
      workbooks === 0
        ? 'No workbook of it has been read yet.'
        : `${countInFigures(workbooks, 'workbook')} of it read, with ${countOf(Number(doubts ?? 0), 'doubt')} left.`,
  }));
}

/** One template an edition with its layers, however many projects are judged under it. */
async function templates(
  deps: Deps,
  actor: RequestActor,
  projects: Awaited<ReturnType<typeof listProjectRows>>,
): Promise<Home['templates']> {
  const sections = await sectionsOfProjects(
    deps.db,
    actor,
    projects.map(({ project }) => project.id),
  );
  const offered = new Map<string, Home['templates'][number]>();
  for (const { section, base, layers } of sections) {
    if (section.confirmedAt === null || offered.has(section.resolvedHash)) continue;
    offered.set(section.resolvedHash, {
      label: `Template for ${sectionWords({ base, layers })}`,
      href: templateHrefOf({ projectId: section.projectId, sectionId: section.id }),
    });
  }
  return [...offered.values()];
}
