import { useMemo } from 'react';
import { Link } from 'react-router-dom';
import { cautions } from '#shared/cautions';
import type { SubmittalListItem } from '#shared/contracts/submittals';
import { formatDateShort, formatInstantShort } from '#shared/format/dates';
import { Button, LinkButton } from '../../../components/ui/button';
import { type DataColumn, DataTable } from '../../../components/ui/data-table';
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
        <div className="acts pt-3">
          <Button onPress={() => void showMore()} isPending={isLoadingMore}>
            Show more
          </Button>
          <span className="small mute">A column head sorts those that are shown.</span>
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
      <Link to={paths.upload}>Upload the workbook</Link> of a mix design, in your laboratory’s own layout or
      the template of a project’s section.
    </EmptyState>
  ) : (
    <EmptyState title="No contractor has submitted a mix yet.">
      A revision stands here once its contractor submits it.
    </EmptyState>
  );
}

function SubmittalTable({ items }: { items: readonly SubmittalListItem[] }) {
  const { active } = useSession();
  const isAgency = active?.kind === 'agency';
  const columns = useMemo(() => columnsFor({ isAgency }), [isAgency]);
  return (
    <DataTable
      caption="Submittals, newest change first until sorted otherwise"
      className="table-head-over submittal-table"
      columns={columns}
      rows={items}
      rowKey={(item) => item.id}
    />
  );
}

function columnsFor({ isAgency }: { isAgency: boolean }): DataColumn<SubmittalListItem>[] {
  return [
    {
      id: 'mix',
      header: 'Mix',
      rowHeader: true,
      sortBy: (item) => item.mixDesignation,
      cell: (item) => (
        <>
          <Link className="plain" to={addressOfRevision(item.id, item.revision)}>
            {item.mixDesignation} <span>r{item.revision.number}</span>
          </Link>
          <small>{item.description}</small>
        </>
      ),
    },
    {
      id: 'project',
      header: isAgency ? 'Contractor and project' : 'Project',
      className: 'submittal-project',
      sortBy: ({ contractor, project }) => `${isAgency ? contractor.name : ''} ${project.number}`,
      cell: ({ contractor, project }) => (
        <>
          {isAgency ? <span>{contractor.name}</span> : null}
          <Link className="plain mute" to={paths.project(project.id)}>
            {project.number} {project.title}
          </Link>
        </>
      ),
    },
    {
      id: 'stands',
      header: 'Stands at',
      sortBy: ({ revision }) => revision.disposition ?? revision.state,
      cell: (item) => <StandsAt item={item} />,
    },
    {
      id: 'outcomes',
      header: 'Outcomes',
      cell: ({ revision }) => (revision.summary ? <OutcomeTally summary={revision.summary} /> : ''),
    },
    { id: 'next', header: 'Next', sortBy: (item) => item.next, cell: (item) => item.next },
    {
      id: 'changed',
      header: 'Changed',
      number: true,
      className: 'submittal-changed',
      sortBy: (item) => item.updatedAt,
      cell: (item) => formatInstantShort(item.updatedAt, item.agency.timeZone),
    },
  ];
}

function StandsAt({ item: { revision, standingApproval } }: { item: SubmittalListItem }) {
  return (
    <>
      <b>{revision.disposition ?? revision.state}</b>
      {standingApproval && standingApproval.revision !== revision.number ? (
        <small>
          r{standingApproval.revision} stands {standingApproval.disposition},{' '}
          {formatDateShort(standingApproval.on)}
        </small>
      ) : null}
    </>
  );
}
