import type { Cell, SheetGrid } from '#rules/reading/cell-grid';
import type { CellUse } from '#rules/reading/reading-result';
import { addressOf, columnLetters } from '../lib/cell-address';
import type { MergedCells } from '../lib/merged-cells';

export interface SheetDrawing {
  sheet: SheetGrid;
  cells: ReadonlyMap<string, Cell>;
  uses: ReadonlyMap<string, CellUse>;
  merged: MergedCells;
  /** Letters of doubts by cell. */
  letters: ReadonlyMap<string, string>;
  selected: string;
  /** Prefix of the cells' ids, so that the grid can name the one at the cursor. */
  idPrefix: string;
}

/** Column letters of the sheet itself. */
export function ColumnHeads({ sheet, from = 1, to }: { sheet: SheetGrid; from?: number; to: number }) {
  const hidden = new Set(sheet.hiddenColumns);
  return (
    <tr>
      <td className="row-number" />
      {numbersBetween(from, to).map((column) => (
        <th key={column} scope="col" className={hidden.has(column) ? 'is-hidden' : undefined}>
          {columnLetters(column)}
          {hidden.has(column) ? <span className="hidden-text"> hidden</span> : null}
        </th>
      ))}
    </tr>
  );
}

export function SheetRow({
  row,
  fromColumn = 1,
  toColumn,
  lastRow,
  drawing,
  onCell,
}: {
  row: number;
  fromColumn?: number;
  toColumn: number;
  /** A merge is drawn no further than the rows that are drawn. */
  lastRow: number;
  drawing: SheetDrawing;
  onCell?: (address: string) => void;
}) {
  const isHidden = drawing.sheet.hiddenRows.includes(row);
  return (
    <tr aria-rowindex={row + 1}>
      <th scope="row" className={isHidden ? 'row-number is-hidden' : 'row-number'}>
        {row}
        {isHidden ? <span className="hidden-text"> hidden</span> : null}
      </th>
      {numbersBetween(fromColumn, toColumn).map((column) => {
        const address = addressOf({ row, column });
        if (drawing.merged.covered.has(address)) return null;
        return (
          <SheetCell
            key={column}
            address={address}
            drawing={drawing}
            rowsLeft={lastRow - row + 1}
            columnsLeft={toColumn - column + 1}
            {...(onCell ? { onCell } : {})}
          />
        );
      })}
    </tr>
  );
}

function SheetCell({
  address,
  drawing,
  rowsLeft,
  columnsLeft,
  onCell,
}: {
  address: string;
  drawing: SheetDrawing;
  rowsLeft: number;
  columnsLeft: number;
  onCell?: (address: string) => void;
}) {
  const cell = drawing.cells.get(address);
  const span = drawing.merged.spans.get(address);
  const letter = drawing.letters.get(address);
  const isSelected = drawing.selected === address;
  return (
    <td
      id={`${drawing.idPrefix}${address}`}
      className={classOf({
        cell,
        use: drawing.uses.get(address),
        letter,
        isSelected,
        runsOn: runsOn(address, drawing),
      })}
      {...(span
        ? { rowSpan: Math.min(span.rows, rowsLeft), colSpan: Math.min(span.columns, columnsLeft) }
        : {})}
      {...(onCell ? { role: 'gridcell', 'aria-selected': isSelected, onClick: () => onCell(address) } : {})}
    >
      {letter ? <span className="tie tie-doubt">{letter}</span> : null}
      <span className="cell-text">{cell?.text ?? ''}</span>
    </td>
  );
}

function classOf(options: {
  cell: Cell | undefined;
  use: CellUse | undefined;
  letter: string | undefined;
  isSelected: boolean;
  runsOn: boolean;
}): string | undefined {
  const { cell, use, letter, isSelected, runsOn } = options;
  const classes = [
    cell?.kind === 'number' || cell?.kind === 'date' ? 'number' : '',
    letter ? 'use-doubt' : classOfUse(use),
    cell?.bold ? 'is-bold' : '',
    isSelected ? 'is-selected' : '',
    runsOn ? 'runs-on' : '',
  ].filter((name) => name !== '');
  return classes.length > 0 ? classes.join(' ') : undefined;
}

/** As in any sheet, a text runs on over empty cells to its right. */
function runsOn(address: string, { cells, merged }: SheetDrawing): boolean {
  const cell = cells.get(address);
  if (cell?.kind !== 'text' || merged.spans.has(address)) return false;
  const next = addressOf({ row: cell.row, column: cell.column + 1 });
  return !cells.has(next) && !merged.covered.has(next);
}

function classOfUse(use: CellUse | undefined): string {
  if (!use) return '';
  return use.use === 'label' ? 'use-read' : `use-${use.use}`;
}

export function numbersBetween(from: number, to: number): number[] {
  return Array.from({ length: Math.max(to - from + 1, 0) }, (_, index) => from + index);
}
