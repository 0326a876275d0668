import { Link } from 'react-router-dom';
import type { MappingItem } from '#shared/contracts/mappings';
import { dateOfInstant, formatDate } from '#shared/format/dates';
import { EmptyState } from '../../../components/ui/empty-state';
import { PlainPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { RunningFoot } from '../../../components/ui/running-foot';
import { paths } from '../../../lib/paths';
import { useSession } from '../../../lib/queries/session-query';
import { usePageTitle } from '../../../lib/use-page-title';
import { useMappings } from '../api/mappings';
import { ImportMapping } from './import-mapping';

/** How each laboratory lays out its workbooks, as people taught it on the reading page. */
export function MappingsPage() {
  usePageTitle('Mappings');
  const { active, timeZone } = useSession();
  const { mappings, abilities } = useMappings();
  return (
    <PlainPage>
      <PageHead
        title="Mappings"
        rest={active?.organisationName}
        lede="What was said of a laboratory’s workbook on its reading page is kept here and applied by itself to the next one of the same layout."
      />
      {mappings.length === 0 ? (
        <EmptyState title="No layout has been taught yet.">
          Say on a reading page what a cell is, and the layout is remembered. Or import a mapping below.
        </EmptyState>
      ) : (
        <MappingTable mappings={mappings} timeZone={timeZone} />
      )}
      {abilities.import ? <ImportMapping /> : null}
      <RunningFoot texts={['A reading keeps the version that it was read with.']} />
    </PlainPage>
  );
}

function MappingTable({ mappings, timeZone }: { mappings: readonly MappingItem[]; timeZone: string }) {
  return (
    <table className="table table-head-over table-stacked">
      <caption className="hidden-text">Mappings, retired ones last</caption>
      <thead>
        <tr>
          <th scope="col">Name</th>
          <th scope="col">Laboratory</th>
          <th scope="col" className="number">
            Version
          </th>
          <th scope="col" className="number">
            Rules
          </th>
          <th scope="col" className="number">
            Revisions read
          </th>
          <th scope="col">Changed</th>
          <th scope="col">In use</th>
        </tr>
      </thead>
      <tbody>
        {mappings.map((mapping) => (
          <tr key={mapping.id}>
            <th scope="row">
              <Link to={paths.mapping(mapping.id)}>{mapping.name}</Link>
            </th>
            <td>{mapping.laboratory.name}</td>
            <td className="number">{mapping.number}</td>
            <td className="number">{mapping.rules}</td>
            <td className="number">{mapping.usedBy === 0 ? '·' : mapping.usedBy}</td>
            <td>
              {formatDate(dateOfInstant(mapping.changedAt, timeZone))}, {mapping.changedBy}
            </td>
            <td>
              {mapping.retiredAt === null
                ? 'yes'
                : `retired ${formatDate(dateOfInstant(mapping.retiredAt, timeZone))}`}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
