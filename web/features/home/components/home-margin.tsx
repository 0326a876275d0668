import { Link } from 'react-router-dom';
import type { Home } from '#shared/contracts/home';
import type { ProjectListItem } from '#shared/contracts/projects';
import { getReturnWorkbook } from '#shared/contracts/returns';
import { formatDate, formatInstantShort } from '#shared/format/dates';
import { countInFigures } from '#shared/format/numbers';
import { editionWords, withLayers } from '#shared/format/section-words';
import { Note } from '../../../components/ui/note';
import { hrefOf } from '../../../lib/api';
import { paths } from '../../../lib/paths';
import { useSession } from '../../../lib/queries/session-query';

/** Right of the double rule: what the agency wrote, projects, laboratory. */
export function HomeMargin({ home }: { home: Home }) {
  return (
    <>
      <FromAgency home={home} />
      <h2>Projects</h2>
      {home.projects.length === 0 ? (
        <p className="small mute pt-1">None yet. The agency adds contractors to its projects.</p>
      ) : (
        <ul className="margin-list">
          {home.projects.map((project) => (
            <li key={project.id}>
              <Link className="plain" to={paths.project(project.id)}>
                <b>{project.number}</b> {project.title}
              </Link>
              <span className="mute">{projectWords(project)}</span>
            </li>
          ))}
        </ul>
      )}
      <h2>Laboratory</h2>
      {home.laboratories.map((laboratory) => (
        <p key={laboratory.name} className="small mute pt-1">
          {laboratory.name}. {laboratory.note}
        </p>
      ))}
      {home.templates.map((template) => (
        <p key={template.href} className="small pt-1">
          <a href={template.href} download>
            {template.label}
          </a>
        </p>
      ))}
    </>
  );
}

function FromAgency({ home }: { home: Home }) {
  const { timeZone: ownZone } = useSession();
  const { lastLetter } = home;
  const zones = new Map(home.submittals.map(({ id, agency }) => [id, agency.timeZone]));
  return (
    <section>
      <h2>From the agency</h2>
      {home.fromAgency.length === 0 ? (
        <p className="small mute pt-1">Nothing is waiting for an answer.</p>
      ) : (
        home.fromAgency.map((note) => (
          <Note
            key={note.id}
            text={note.text}
            by={note.by}
            on={formatInstantShort(note.at, zones.get(note.submittalId) ?? ownZone)}
            state={note.clause ? `on ${note.mixDesignation} ${note.clause}` : `on ${note.mixDesignation}`}
          >
            <Link to={paths.return(note.submittalId, note.revision)}>Answer</Link>
          </Note>
        ))
      )}
      {lastLetter ? (
        <p className="small pt-2">
          <Link to={paths.return(lastLetter.submittalId, lastLetter.revision)}>
            Letter of {formatDate(lastLetter.on)}
          </Link>
          {lastLetter.workbook ? (
            <>
              {', '}
              <a
                href={hrefOf(getReturnWorkbook, {
                  params: { submittalId: lastLetter.submittalId, number: lastLetter.revision },
                })}
                download
              >
                findings workbook
              </a>
            </>
          ) : null}
        </p>
      ) : null}
    </section>
  );
}

function projectWords(project: ProjectListItem): string {
  const sections = project.sections.map((section) => editionWords(section) + withLayers(section.layers));
  const submittals = countInFigures(project.submittals, 'submittal');
  return [...(sections.length > 0 ? sections : ['no section confirmed']), submittals].join(' · ');
}
