import { Link } from 'react-router-dom';
import { cautions } from '#shared/cautions';
import type { SubmittalListItem } from '#shared/contracts/submittals';
import { formatDateShort, formatInstantShort } from '#shared/format/dates';
import { Button, LinkButton } from '../../../components/ui/button';
import { EmptyState } from '../../../components/ui/empty-state';
import { PlainPage } from '../../../components/ui/margin-page';
import { OutcomeTally } from '../../../components/ui/outcome-tally';
import { PageHead } from '../../../components/ui/page-head';
import { RunningFoot } from '../../../components/ui/running-foot';
import { addressOfRevision } from '../../../lib/next-address';
import { paths } from '../../../lib/paths';
import { useSession } from '../../../lib/queries/session-query';
import { usePageTitle } from '../../../lib/use-page-title';
import { type SubmittalFilters, useSubmittals } from '../api/list-submittals';
import { SubmittalFilter } from './submittal-filter';
import '../submittals.css';

export function SubmittalsPage({ filters }: { filters: SubmittalFilters }) {
  usePageTitle('Submittals');
  const { abilities } = useSession();
  const { items, hasMore, isLoadingMore, showMore } = useSubmittals(filters);
  return (
    <PlainPage>
      <PageHead title="Submittals" rest="newest change first">
        <div className="acts pt-2">
          {abilities.upload ? <LinkButton to={paths.upload}>Check a workbook</LinkButton> : null}
        </div>
      </PageHead>
      <SubmittalFilter filters={filters} />
      {items.length === 0 ? <NoSubmittals filters={filters} /> : <SubmittalTable items={items} />}
      {hasMore ? (
        <div className="pt-3">
          <Button onPress={() => void showMore()} isPending={isLoadingMore}>
            Show more
          </Button>
        </div>
      ) : null}
      <RunningFoot texts={[cautions.findings]} />
    </PlainPage>
  );
}

function NoSubmittals({ filters }: { filters: SubmittalFilters }) {
  const { abilities } = useSession();
  if (filters.q || filters.state || filters.project) {
    return (
      <EmptyState title="No submittal fits the filter.">
        <Link to={paths.submittals}>Show all submittals</Link>
      </EmptyState>
    );
  }
  return abilities.upload ? (
    <EmptyState title="No mix has been uploaded yet.">
      Fill in the template of a project’s section, then <Link to={paths.upload}>upload the workbook</Link>.
    </EmptyState>
  ) : (
    <EmptyState title="No contractor has submitted a mix yet.">
      A revision stands here once its contractor submits it.
    </EmptyState>
  );
}

function SubmittalTable({ items }: { items: readonly SubmittalListItem[] }) {
  const { active, timeZone } = useSession();
  const isAgency = active?.kind === 'agency';
  return (
    <table className="table table-head-over submittal-table">
      <caption className="hidden-text">Submittals, newest change first</caption>
      <thead>
        <tr>
          <th scope="col">Mix</th>
          <th scope="col">{isAgency ? 'Contractor and project' : 'Project'}</th>
          <th scope="col">Stands at</th>
          <th scope="col">Outcomes</th>
          <th scope="col">Next</th>
          <th scope="col" className="number">
            Changed
          </th>
        </tr>
      </thead>
      <tbody>
        {items.map((item) => (
          <tr key={item.id}>
            <th scope="row">
              <Link className="plain" to={addressOfRevision(item.id, item.revision)}>
                {item.mixDesignation} <span>r{item.revision.number}</span>
              </Link>
              <small>{item.description}</small>
            </th>
            <td className="submittal-project">
              {isAgency ? <span>{item.contractor.name}</span> : null}
              <Link className="plain mute" to={paths.project(item.project.id)}>
                {item.project.number} {item.project.title}
              </Link>
            </td>
            <td>
              <b>{item.revision.disposition ?? item.revision.state}</b>
              {item.standingApproval && item.standingApproval.revision !== item.revision.number ? (
                <small>
                  r{item.standingApproval.revision} stands {item.standingApproval.disposition},{' '}
                  {formatDateShort(item.standingApproval.on)}
                </small>
              ) : null}
            </td>
            <td>{item.revision.summary ? <OutcomeTally summary={item.revision.summary} /> : ''}</td>
            <td>{item.next}</td>
            <td className="number submittal-changed">{formatInstantShort(item.updatedAt, timeZone)}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
