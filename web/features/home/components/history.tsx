import type { RevisionListItem } from '#shared/contracts/submittals';
import { dateOfInstant, formatDate } from '#shared/format/dates';
import { OutcomeTally } from '../../../components/ui/outcome-tally';
import { SectionHead } from '../../../components/ui/section-head';

/** One row a revision, the first one first. */
export function History({
  mixDesignation,
  timeZone,
  revisions,
}: {
  mixDesignation: string;
  /** The agency's. */
  timeZone: string;
  revisions: readonly RevisionListItem[];
}) {
  const day = (instant: string | null) => (instant ? formatDate(dateOfInstant(instant, timeZone)) : null);
  return (
    <section>
      <SectionHead
        title={`${mixDesignation} so far`}
        about="every revision is kept with its workbook, its reading and its check"
      />
      <div className="sideways">
        <table className="table">
          <thead>
            <tr>
              <th scope="col">Revision</th>
              <th scope="col">Submitted</th>
              <th scope="col">Answered</th>
              <th scope="col" className="number">
                Working days
              </th>
              <th scope="col">Outcomes</th>
              <th scope="col">What changed</th>
            </tr>
          </thead>
          <tbody>
            {revisions.map((revision) => (
              <tr key={revision.number}>
                <th scope="row">r{revision.number}</th>
                <td>{day(revision.submittedAt) ?? <span className="mute">not yet</span>}</td>
                <td>{day(revision.returnedAt) ?? ''}</td>
                <td className="number">{revision.workingDaysTaken ?? ''}</td>
                <td>{revision.summary ? <OutcomeTally summary={revision.summary} /> : ''}</td>
                <td className="mute">
                  {revision.changes ?? (revision.number === 0 ? 'first revision' : '')}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </section>
  );
}
