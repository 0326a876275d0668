import { Link } from 'react-router-dom';
import type { SubmittalListItem } from '#shared/contracts/submittals';
import { formatDateShort, formatInstantShort } from '#shared/format/dates';
import { EmptyState } from '../../../components/ui/empty-state';
import { Mark } from '../../../components/ui/mark';
import { markOfOutcome } from '../../../components/ui/marks';
import { addressOfRevision } from '../../../lib/next-address';
import { paths } from '../../../lib/paths';
import { nextCounts } from '../lib/next-counts';
import { standingOf } from '../lib/standing-words';

/** Every mix with where it stands and what is next, newest change first. */
export function MixTable({
  submittals,
  cursor,
  onCursor,
}: {
  submittals: readonly SubmittalListItem[];
  cursor: string | null;
  onCursor: (submittalId: string) => void;
}) {
  if (submittals.length === 0) {
    return (
      <EmptyState title="No mix has been uploaded yet.">
        <Link to={paths.upload}>Upload the workbook</Link> of a mix design, in your laboratory’s own layout or
        the template of your project’s section.
      </EmptyState>
    );
  }
  return (
    <table className="table table-head-over mix-table">
      <caption className="hidden-text">Mixes: where each stands and what is next</caption>
      <thead>
        <tr>
          <th scope="col">Mix</th>
          <th scope="col">Project</th>
          <th scope="col">Stands at</th>
          <th scope="col">Next</th>
          <th scope="col" className="number">
            By
          </th>
        </tr>
      </thead>
      <tbody>
        {submittals.map((submittal) => (
          <tr
            key={submittal.id}
            id={mixRowId(submittal.id)}
            className={submittal.id === cursor ? 'cursor' : undefined}
            onFocus={() => onCursor(submittal.id)}
          >
            <th scope="row">
              <Link className="plain" to={addressOfRevision(submittal.id, submittal.revision)}>
                {submittal.mixDesignation} <span>r{submittal.revision.number}</span>
              </Link>
            </th>
            <td className="mix-project condensed mute">
              {submittal.project.number} {submittal.project.title}
            </td>
            <td className="mix-stands">
              <Standing submittal={submittal} />
            </td>
            <td className="mix-next">
              <Next submittal={submittal} />
            </td>
            <td className="mix-by number">
              {submittal.revision.dueOn && isWithAgency(submittal)
                ? formatDateShort(submittal.revision.dueOn)
                : ''}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

export function mixRowId(submittalId: string): string {
  return `mix-${submittalId}`;
}

function Standing({ submittal }: { submittal: SubmittalListItem }) {
  const { timeZone } = submittal.agency;
  const { strong, rest } = standingOf(submittal, (instant) => formatInstantShort(instant, timeZone));
  return (
    <>
      {strong ? <b>{strong}</b> : null}
      {rest}
    </>
  );
}

function Next({ submittal }: { submittal: SubmittalListItem }) {
  const counts = submittal.doubts > 0 ? [] : nextCounts(submittal.revision);
  if (counts.length === 0) return submittal.next;
  return counts.map(({ outcome, words }, index) => (
    <span key={outcome} className="whitespace-nowrap">
      <Mark name={markOfOutcome[outcome]} /> {words}
      {index < counts.length - 1 ? ', ' : ''}
    </span>
  ));
}

function isWithAgency({ revision }: SubmittalListItem): boolean {
  return revision.state === 'submitted' || revision.state === 'in review';
}
