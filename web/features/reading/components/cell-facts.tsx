import type { ReadingView } from '#shared/contracts/readings';
import { countInFigures } from '#shared/format/numbers';
import { RichText } from '../../../components/ui/rich-text';
import type { SheetRows } from '../hooks/use-sheet-rows';
import { addressOf, type CellRange, parseAddress } from '../lib/cell-address';
import { cellCount, isInBlock } from '../lib/cell-block';
import { choicesOf } from '../lib/doubt-answers';

/** What the workbook holds in the chosen cells, what it was taken for and why, or why it was not used. */
export function CellFacts({
  reading,
  sheet,
  block,
  rows,
}: {
  reading: ReadingView;
  sheet: string;
  block: CellRange;
  rows: SheetRows;
}) {
  const within = ({ sheet: of, cell }: { sheet: string; cell: string }) => {
    const place = parseAddress(cell);
    return of === sheet && place !== null && isInBlock(block, place);
  };
  const doubts = reading.doubts.filter(within);
  const unread = reading.unread.filter(within);
  const { row, column } = block.from;
  const content = rows.rowAt(row);
  const cell = content?.cells.get(column);
  const use = content?.uses.get(column);
  const isOne = cellCount(block) === 1 || !cell || blockOfOne(block, cell.address);
  return (
    <dl className="cell-facts">
      {isOne && cell ? (
        <>
          <dt>Holds</dt>
          <dd>
            {cell.text}
            {cell.comment ? <span className="mute"> · note: {cell.comment}</span> : null}
          </dd>
        </>
      ) : null}
      {use?.taken && use.use !== 'doubt' ? (
        <>
          <dt>{isOne ? 'Taken for' : `${addressOf(block.from)} was`}</dt>
          <dd>
            <RichText>{use.taken}</RichText>
          </dd>
        </>
      ) : null}
      {doubts.map((doubt) => (
        <div key={`${doubt.cell} ${doubt.reason}`} className="contents">
          <dt>In doubt, {doubt.letter}</dt>
          <dd>
            <RichText>{doubt.reason}</RichText>{' '}
            <span className="mute">
              May be{' '}
              {choicesOf(doubt)
                .map(({ label }) => label.toLowerCase())
                .join(' or ')}
              . An answer, or what is said here, settles it.
            </span>
          </dd>
        </div>
      ))}
      {unread.length > 0 ? (
        <>
          <dt>Not used</dt>
          <dd>
            {unread.length > 1 ? `${countInFigures(unread.length, 'cell')}: ` : ''}
            <RichText>{[...new Set(unread.map(({ reason }) => reason))].join(' ')}</RichText>
          </dd>
        </>
      ) : null}
      {!cell && !use && unread.length === 0 && isOne ? (
        <>
          <dt>Holds</dt>
          <dd className="mute">nothing</dd>
        </>
      ) : null}
    </dl>
  );
}

/** A merge is one cell, however far it reaches. */
function blockOfOne(block: CellRange, address: string): boolean {
  return addressOf(block.from) === address && addressOf(block.to) === address;
}
