import type { Project, ProjectListItem, Section } from '#shared/contracts/projects';
import { dateOfInstant, formatDate } from '#shared/format/dates';
import { type EditionRow, editionReference } from '../db/queries/editions';
import type { contractorsOfProjects, countSubmittals, ProjectRow, SectionRow } from '../db/queries/projects';
import { type Actor, preparesSubmittals } from '../policies/actor';
import { editionState, holdsOn, layersOf, layersOn } from '../policies/edition-dates';
import { confirmsSections, managesProjects } from '../policies/session-abilities';
import { templateHrefOf } from './template-href';

type ContractorRow = Awaited<ReturnType<typeof contractorsOfProjects>>[number];

/** Of all listed projects. */
interface ListParts {
  sections: SectionRow[];
  contractors: ContractorRow[];
  submittals: Awaited<ReturnType<typeof countSubmittals>>;
}

export function presentProjectList(
  rows: ProjectRow[],
  { sections, contractors, submittals }: ListParts,
): ProjectListItem[] {
  return rows.map(({ project, agency }) => ({
    id: project.id,
    number: project.number,
    title: project.title,
    lettingOn: project.lettingOn,
    agency: { id: agency.id, name: agency.name },
    contractors: contractorsOf(contractors, project.id),
    sections: sections
      .filter(({ section }) => section.projectId === project.id)
      .map(({ section, base, layers }) => ({
        title: base.title,
        edition: base.edition,
        layers: layers.map(({ title }) => title),
        confirmed: section.confirmedAt !== null,
      })),
    submittals: submittals.find(({ projectId }) => projectId === project.id)?.total ?? 0,
  }));
}

interface ProjectParts {
  actor: Actor;
  now: Date;
  row: ProjectRow;
  sections: SectionRow[];
  contacts: Project['contacts'];
  contractors: ContractorRow[];
  /** That the actor may choose from; empty for whoever confirms no section. */
  editions: EditionRow[];
}

export function presentProject(parts: ProjectParts): Project {
  const { actor, sections, contacts, contractors, editions } = parts;
  const { project, agency } = parts.row;
  const today = dateOfInstant(parts.now.toISOString(), agency.timeZone);
  return {
    id: project.id,
    number: project.number,
    title: project.title,
    lettingOn: project.lettingOn,
    facts: project.facts,
    contacts,
    agency: { id: agency.id, name: agency.name },
    contractors: contractorsOf(contractors, project.id),
    sections: sections.map(presentSection),
    startingPoint: sections.some(({ base, layers }) => [base, ...layers].some((each) => each.startingPoint)),
    proposals: proposalsFor(project.lettingOn, { editions, sections }),
    choices: editions
      .filter((each) => each.layerOfKey === null && !each.withdrawn)
      .map((base) => ({
        base: editionReference(base),
        layers: layersOf(base, editions).map(editionReference),
        state: choiceState(base, { all: editions, today }),
      })),
    version: project.version,
    abilities: {
      change: managesProjects(actor),
      confirmSections: confirmsSections(actor),
      upload: preparesSubmittals(actor) && sections.some(({ section }) => section.confirmedAt !== null),
    },
  };
}

function presentSection({ section, base, layers, confirmedBy }: SectionRow): Section {
  return {
    id: section.id,
    base: editionReference(base),
    layers: layers.map(editionReference),
    confirmed: section.confirmedAt !== null,
    confirmedBy,
    resolvedHash: section.resolvedHash,
    version: section.version,
    templateHref: templateHrefOf({ projectId: section.projectId, sectionId: section.id }),
  };
}

/**
 * What the letting date calls for, while the project has no section. An agency has rule sets that a project does not
 * need, so nothing more is proposed once one is chosen, and what exists is never moved.
 */
function proposalsFor(
  lettingOn: string | null,
  { editions, sections }: { editions: EditionRow[]; sections: SectionRow[] },
): Project['proposals'] {
  if (lettingOn === null || sections.length > 0) return [];
  return editions
    .filter((each) => each.layerOfKey === null)
    .filter((each) => holdsOn(each, { all: editions, date: lettingOn }))
    .map((base) => ({
      base: editionReference(base),
      layers: layersOn(base, { all: editions, date: lettingOn }).map(editionReference),
      why: `Edition ${base.edition} is in force on the letting date, ${formatDate(lettingOn)}.`,
    }));
}

function choiceState(base: EditionRow, dates: { all: EditionRow[]; today: string }) {
  const state = editionState(base, dates);
  // Withdrawn ones are not offered; the filter before this has left them out.
  return state === 'withdrawn' ? 'superseded' : state;
}

function contractorsOf(rows: { projectId: string; id: string; name: string }[], projectId: string) {
  return rows.filter((row) => row.projectId === projectId).map(({ id, name }) => ({ id, name }));
}
