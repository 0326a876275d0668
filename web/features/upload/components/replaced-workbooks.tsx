import { getReplacedWorkbook, type Revision } from '#shared/contracts/submittals';
import { dateOfInstant, formatDate } from '#shared/format/dates';
import { SectionHead } from '../../../components/ui/section-head';
import { hrefOf } from '../../../lib/api';
import { type RevisionParams, useRevision } from '../../../lib/queries/revision-query';

interface ReplacedWorkbooksProps {
  params: RevisionParams;
  replaced: Revision['replacedWorkbooks'];
}

/** What was uploaded before: it stays with the contractor, as it was. */
export function ReplacedWorkbooks({ params, replaced }: ReplacedWorkbooksProps) {
  const { timeZone } = useRevision(params).agency;
  if (replaced.length === 0) return null;
  return (
    <section className="pt-4">
      <SectionHead title="Replaced workbooks" about="as they were uploaded; the agency does not see them" />
      <ul>
        {replaced.map(({ id, fileName, replacedBy, replacedAt }) => (
          <li key={id}>
            <a href={hrefOf(getReplacedWorkbook, { params: { ...params, replacedId: id } })} download>
              {fileName}
            </a>{' '}
            <span className="mute">
              replaced {formatDate(dateOfInstant(replacedAt, timeZone))} by {replacedBy}
            </span>
          </li>
        ))}
      </ul>
    </section>
  );
}
