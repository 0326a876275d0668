import { Link } from 'react-router-dom';
import type { ProjectListItem } from '#shared/contracts/projects';
import { formatDate } from '#shared/format/dates';
import { editionWords, withLayers } from '#shared/format/section-words';
import { LinkButton } from '../../../components/ui/button';
import { EmptyState } from '../../../components/ui/empty-state';
import { PlainPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { RunningFoot } from '../../../components/ui/running-foot';
import { paths } from '../../../lib/paths';
import { useProjects } from '../../../lib/queries/projects-query';
import { useSession } from '../../../lib/queries/session-query';
import { usePageTitle } from '../../../lib/use-page-title';
import '../projects.css';

export function ProjectsPage() {
  usePageTitle('Projects');
  const { projects, abilities } = useProjects();
  const { active } = useSession();
  return (
    <PlainPage>
      <PageHead title="Projects" rest={active?.organisationName}>
        {abilities.add ? (
          <div className="acts pt-2">
            <LinkButton to={paths.newProject}>Add a project</LinkButton>
          </div>
        ) : null}
      </PageHead>
      {projects.length === 0 ? (
        <EmptyState title="There is no project yet.">
          {abilities.add ? (
            <>
              A project names its contract, its contractors and its sections.{' '}
              <Link to={paths.newProject}>Add the first</Link>
            </>
          ) : (
            'An administrator of the agency adds projects and the contractors on them.'
          )}
        </EmptyState>
      ) : (
        <table className="table table-head-over table-stacked project-table">
          <caption className="hidden-text">Projects with their sections</caption>
          <thead>
            <tr>
              <th scope="col">Project</th>
              <th scope="col">{active?.kind === 'agency' ? 'Contractors' : 'Agency'}</th>
              <th scope="col">Letting</th>
              <th scope="col">Sections</th>
              <th scope="col" className="number">
                Submittals
              </th>
            </tr>
          </thead>
          <tbody>
            {projects.map((project) => (
              <ProjectRow key={project.id} project={project} isAgency={active?.kind === 'agency'} />
            ))}
          </tbody>
        </table>
      )}
      <RunningFoot texts={['A section never moves by itself when a newer edition appears.']} />
    </PlainPage>
  );
}

function ProjectRow({ project, isAgency }: { project: ProjectListItem; isAgency: boolean }) {
  return (
    <tr>
      <th scope="row">
        <Link className="plain" to={paths.project(project.id)}>
          {project.number} <span>{project.title}</span>
        </Link>
      </th>
      <td>
        {isAgency
          ? project.contractors.map(({ name }) => name).join(', ') || <span className="mute">none yet</span>
          : project.agency.name}
      </td>
      <td className="whitespace-nowrap">
        {project.lettingOn ? formatDate(project.lettingOn) : <span className="mute">not set</span>}
      </td>
      <td>
        {project.sections.length === 0 ? (
          <span className="mute">none confirmed</span>
        ) : (
          project.sections.map((section) => (
            <p key={`${section.title} ${section.edition}`}>
              {editionWords(section)}
              {withLayers(section.layers)}
              {section.confirmed ? null : <span className="mute"> · to be confirmed</span>}
            </p>
          ))
        )}
      </td>
      <td className="number">{project.submittals}</td>
    </tr>
  );
}
