import { Link } from 'react-router-dom';
import { cautions } from '#shared/cautions';
import { formatDate } from '#shared/format/dates';
import { LinkButton } from '../../../components/ui/button';
import { EmptyState } from '../../../components/ui/empty-state';
import { MarginPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { RunningFoot } from '../../../components/ui/running-foot';
import { SectionHead } from '../../../components/ui/section-head';
import { paths } from '../../../lib/paths';
import { useProject } from '../../../lib/queries/projects-query';
import { usePageTitle } from '../../../lib/use-page-title';
import { factWords } from '../lib/fact-words';
import { SectionList } from './section-list';
import { SectionProposals } from './section-proposals';
import '../projects.css';

export function ProjectPage({ projectId }: { projectId: string }) {
  const project = useProject(projectId);
  usePageTitle(`${project.number} ${project.title}`);
  const facts = Object.entries(project.facts);
  return (
    <MarginPage
      aside={
        <>
          <h2>Contractors</h2>
          {project.contractors.length === 0 ? (
            <p className="small mute pt-1">None yet.</p>
          ) : (
            <ul className="aside-lines">
              {project.contractors.map(({ id, name }) => (
                <li key={id}>{name}</li>
              ))}
            </ul>
          )}
          <h2>Contacts</h2>
          {project.contacts.length === 0 ? (
            <p className="small mute pt-1">None named. Letters go to the person who submitted.</p>
          ) : (
            <ul className="aside-lines">
              {project.contacts.map((contact) => (
                <li key={contact.email}>
                  <b>{contact.name}</b>
                  {contact.function ? `, ${contact.function}` : ''}
                  <span className="mute">{contact.email}</span>
                </li>
              ))}
            </ul>
          )}
        </>
      }
    >
      <PageHead
        kicker={<Link to={paths.projects}>Projects</Link>}
        title={project.number}
        rest={project.title}
        lede={`${project.agency.name} · ${project.lettingOn ? `letting ${formatDate(project.lettingOn)}` : 'no letting date yet'}`}
      >
        <div className="acts pt-2">
          {project.abilities.upload ? (
            <LinkButton kind="primary" to={`${paths.upload}?project=${project.id}`}>
              Check a workbook
            </LinkButton>
          ) : null}
          {project.abilities.change ? (
            <LinkButton to={paths.changeProject(project.id)}>Change the project</LinkButton>
          ) : null}
          <Link to={`${paths.submittals}?project=${project.id}`}>Its submittals</Link>
        </div>
      </PageHead>
      <SectionHead
        title="Sections"
        about="one edition with its layers each; submittals are judged under them"
      />
      {project.sections.length === 0 ? (
        <EmptyState title="No section is confirmed yet.">
          {project.abilities.confirmSections
            ? 'Confirm a proposed one below, or choose an edition yourself.'
            : 'A rule author or administrator of the agency confirms it; then workbooks can be checked.'}
        </EmptyState>
      ) : (
        <SectionList project={project} />
      )}
      {project.abilities.confirmSections ? <SectionProposals project={project} /> : null}
      <SectionHead title="The project states" about="used where a workbook states nothing" />
      {facts.length === 0 ? (
        <EmptyState title="Nothing is stated for all submittals.">
          What neither workbook nor project states is asked when a workbook is read.
        </EmptyState>
      ) : (
        <ul className="fact-list">
          {facts.map(([name, value]) => (
            <li key={name}>
              <span className="mute">{factWords(name)}</span> <b>{String(value)}</b>
            </li>
          ))}
        </ul>
      )}
      <RunningFoot
        texts={[
          'A section never moves by itself when a newer edition appears.',
          ...(project.startingPoint ? [cautions.startingPoint] : []),
        ]}
      />
    </MarginPage>
  );
}
