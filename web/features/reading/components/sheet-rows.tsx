import { memo } from 'react';
import type { Cell, SheetGrid } from '#rules/reading/cell-grid';
import type { CellUse } from '#rules/reading/reading-result';
import type { RowContent } from '../hooks/use-sheet-rows';
import { addressOf, type CellRange, columnLetters } from '../lib/cell-address';
import { isInBlock } from '../lib/cell-block';
import type { DrawnMerge } from '../lib/merges';

/** Column letters of the sheet itself. */
export function ColumnHeads({
  sheet,
  from = 1,
  to,
  isGrid = false,
}: {
  sheet: SheetGrid;
  from?: number;
  to: number;
  isGrid?: boolean;
}) {
  const hidden = new Set(sheet.hiddenColumns);
  return (
    <tr>
      <td className="row-number" />
      {isGrid && from > 1 ? <td colSpan={from - 1} /> : null}
      {numbersBetween(from, to).map((column) => (
        <th
          key={column}
          scope="col"
          aria-colindex={column + 1}
          className={hidden.has(column) ? 'is-hidden' : undefined}
        >
          {columnLetters(column)}
          {hidden.has(column) ? <span className="hidden-text"> hidden</span> : null}
        </th>
      ))}
    </tr>
  );
}

interface RowDrawing {
  row: number;
  fromColumn?: number;
  toColumn: number;
  content: RowContent | undefined;
  /** Of every column of the sheet, in px at the default text size; an excerpt sets its own. */
  widths?: readonly number[];
  merges: ReadonlyMap<number, DrawnMerge | null> | undefined;
  isHidden: boolean;
  /** Letters of doubts by cell. */
  letters: ReadonlyMap<string, string>;
  /** Column of the cursor, where it stands in this row. */
  cursorColumn: number | null;
  /** The chosen block, where it reaches into this row. */
  block: CellRange | null;
  /** Prefix of the cells' ids, so that the grid can name the one at the cursor. */
  idPrefix: string;
  /** True in the grid that a cursor moves in; an excerpt is a plain table. */
  isGrid?: boolean;
}

/** Drawn again only when something of its own has changed: a moving cursor draws two rows, not the sheet. */
export const SheetRow = memo(function SheetRow(drawing: RowDrawing) {
  const { row, fromColumn = 1, toColumn, merges, isHidden, isGrid = false } = drawing;
  return (
    <tr aria-rowindex={row + 1}>
      <th scope="row" className={isHidden ? 'row-number is-hidden' : 'row-number'}>
        {row}
        {isHidden ? <span className="hidden-text"> hidden</span> : null}
      </th>
      {isGrid && fromColumn > 1 ? <td colSpan={fromColumn - 1} /> : null}
      {numbersBetween(fromColumn, toColumn).map((column) =>
        merges?.get(column) === null ? null : <SheetCell key={column} column={column} {...drawing} />,
      )}
    </tr>
  );
});

function SheetCell(drawing: RowDrawing & { column: number }) {
  const { row, column, content, merges, idPrefix, isGrid = false } = drawing;
  const span = merges?.get(column);
  const address = addressOf({ row, column });
  // A merge that begins out of sight is drawn empty: what it says stands where it begins.
  const isOwn = !span || span.shows === address;
  const cell = isOwn ? content?.cells.get(column) : undefined;
  const letter = drawing.letters.get(address);
  const isSelected = drawing.cursorColumn === column;
  const runsOnPx = runsOn({ ...drawing, cell });
  const isChosen = drawing.block !== null && isInBlock(drawing.block, { row, column });
  return (
    <td
      id={`${idPrefix}${address}`}
      className={classOf({ ...drawing, cell, letter, isSelected, isChosen, runsOnPx })}
      {...(span ? { rowSpan: span.rows, colSpan: span.columns } : {})}
      {...(isGrid
        ? {
            role: 'gridcell',
            'aria-selected': isSelected || isChosen,
            'aria-colindex': column + 1,
            'data-cell': span?.shows ?? address,
          }
        : {})}
    >
      {letter ? <span className="tie tie-doubt">{letter}</span> : null}
      <span className="cell-text" style={runsOnPx ? { maxWidth: `${runsOnPx / 14}rem` } : undefined}>
        {cell?.text ?? ''}
      </span>
      {cell?.comment ? <span className="hidden-text">, with a note</span> : null}
    </td>
  );
}

interface CellLook extends RowDrawing {
  column: number;
  cell: Cell | undefined;
  letter: string | undefined;
  isSelected: boolean;
  isChosen: boolean;
  runsOnPx: number | null;
}

function classOf(look: CellLook): string | undefined {
  const { cell, letter, isSelected, isChosen, content, column } = look;
  const classes = [
    cell ? classOfKind[cell.kind] : '',
    letter ? 'use-doubt' : classOfUse(content?.uses.get(column)),
    cell?.bold ? 'is-bold' : '',
    cell?.comment ? 'has-note' : '',
    isSelected ? 'is-selected' : '',
    isChosen ? `in-block ${edgesOf(look)}` : '',
    look.runsOnPx === null ? '' : 'runs-on',
  ].filter((name) => name !== '');
  return classes.length > 0 ? classes.join(' ') : undefined;
}

/** Where each kind stands in its cell, as spreadsheets set it where nobody chose. */
const classOfKind: Record<Cell['kind'], string> = {
  number: 'number',
  date: 'number',
  text: '',
  boolean: 'centred',
  error: 'centred',
  'formula-without-result': '',
};

function edgesOf({ block, row, column, merges }: CellLook): string {
  if (block === null) return '';
  const span = merges?.get(column);
  const last = { row: row + (span?.rows ?? 1) - 1, column: column + (span?.columns ?? 1) - 1 };
  return [
    row === block.from.row ? 'edge-top' : '',
    last.row >= block.to.row ? 'edge-bottom' : '',
    column === block.from.column ? 'edge-left' : '',
    last.column >= block.to.column ? 'edge-right' : '',
  ].join(' ');
}

/** As in any sheet, a text runs on over empty cells to its right, up to the next that holds something. */
function runsOn({
  cell,
  content,
  column,
  toColumn,
  merges,
  widths = [],
}: RowDrawing & { column: number; cell: Cell | undefined }): number | null {
  if (cell?.kind !== 'text' || merges?.has(column)) return null;
  let end = column;
  while (end < toColumn && !content?.cells.has(end + 1) && !merges?.has(end + 1)) end += 1;
  if (end === column) return null;
  return widths.slice(column - 1, end).reduce((sum, width) => sum + width, 0);
}

function classOfUse(use: CellUse | undefined): string {
  if (!use) return '';
  return use.use === 'label' ? 'use-read' : `use-${use.use}`;
}

export function numbersBetween(from: number, to: number): number[] {
  return Array.from({ length: Math.max(to - from + 1, 0) }, (_, index) => from + index);
}
