import { Link } from 'react-router-dom';
import type { ReadingView } from '#shared/contracts/readings';
import { countInFigures } from '#shared/format/numbers';
import { Mark } from '../../../components/ui/mark';
import { RichText } from '../../../components/ui/rich-text';
import { paths } from '../../../lib/paths';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { CellLink } from './cell-link';

/** That a mapping of the laboratory was applied by itself, which, and where the workbook is not as it was learned. */
export function MappingNotice({
  params,
  mapping,
  laboratory,
}: {
  params: RevisionParams;
  mapping: NonNullable<ReadingView['mapping']>;
  laboratory: string;
}) {
  const { id, name, number, departures } = mapping;
  return (
    <section className="mapping-notice" aria-label="The mapping that it was read with">
      <p>
        Read with{' '}
        <Link to={paths.mapping(id)}>
          {name}, version {number}
        </Link>
        , the mapping that {laboratory} taught.{' '}
        {departures.length === 0
          ? 'The workbook has the layout that it was learned from.'
          : `The workbook departs from it in ${countInFigures(departures.length, 'place')}.`}
      </p>
      <ul>
        {departures.map(({ rule, kind, sheet, cell, text }) => (
          <li key={`${rule} ${kind} ${sheet} ${cell}`} className="stale-line">
            <Mark name="undecided" />
            <span>
              {cell === null ? null : (
                <>
                  <CellLink params={params} sheet={sheet ?? ''} cell={cell} />{' '}
                </>
              )}
              <RichText>{text}</RichText>
            </span>
          </li>
        ))}
      </ul>
    </section>
  );
}
