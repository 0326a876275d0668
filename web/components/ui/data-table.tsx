import {
  type ColumnDef,
  createSortedRowModel,
  rowSortingFeature,
  type SortingState,
  sortFn_basic,
  sortFn_text,
  tableFeatures,
  useTable,
} from '@tanstack/react-table';
import { Fragment, type ReactNode, useMemo } from 'react';

const features = tableFeatures({
  rowSortingFeature,
  sortedRowModel: createSortedRowModel(),
  sortFns: { basic: sortFn_basic, text: sortFn_text },
});

export interface DataColumn<Row> {
  id: string;
  header: string;
  cell: (row: Row) => ReactNode;
  /** What the column is sorted by; a column without it is not sortable. Absent values stand last. */
  sortBy?: (row: Row) => string | number | undefined;
  /** Figures: right-aligned. */
  number?: boolean;
  /** The cell that names its row. */
  rowHeader?: boolean;
  /** The head is for screen readers alone, as over acts. */
  hideHeader?: boolean;
  className?: string;
}

/** A ruled table whose column heads sort it. `caption` names it for screen readers. */
export function DataTable<Row extends object>({
  caption,
  columns,
  rows,
  rowKey,
  rowAfter,
  className = '',
  initialSort = [],
}: {
  caption: string;
  columns: readonly DataColumn<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  /** What opens under a row over its whole width; nothing where it is null. */
  rowAfter?: (row: Row) => ReactNode;
  className?: string;
  initialSort?: SortingState;
}) {
  const definitions = useMemo(() => columns.map((column) => definitionOf<Row>(column)), [columns]);
  const data = useMemo(() => [...rows], [rows]);
  const table = useTable({
    features,
    columns: definitions,
    data,
    getRowId: rowKey,
    initialState: { sorting: initialSort },
    enableMultiSort: false,
  });
  const byId = new Map(columns.map((column) => [column.id, column]));
  return (
    <div className="sideways">
      <table className={`table table-sorted ${className}`.trim()}>
        <caption className="hidden-text">{caption}</caption>
        <thead>
          <tr>
            {table.getHeaderGroups()[0]?.headers.map(({ column }) => (
              <th
                key={column.id}
                scope="col"
                className={classesOf(byId.get(column.id))}
                aria-sort={column.getCanSort() ? ariaSort(column.getIsSorted()) : undefined}
              >
                {column.getCanSort() ? (
                  <button type="button" className="table-sort" onClick={column.getToggleSortingHandler()}>
                    {byId.get(column.id)?.header}
                    <SortSign direction={column.getIsSorted()} />
                  </button>
                ) : (
                  <span className={byId.get(column.id)?.hideHeader ? 'hidden-text' : undefined}>
                    {byId.get(column.id)?.header}
                  </span>
                )}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {table.getRowModel().rows.map((row) => (
            <Fragment key={row.id}>
              <tr>
                {columns.map((column) => {
                  const Cell = column.rowHeader ? 'th' : 'td';
                  return (
                    <Cell
                      key={column.id}
                      className={classesOf(column)}
                      {...(column.rowHeader ? { scope: 'row' } : {})}
                    >
                      {column.cell(row.original)}
                    </Cell>
                  );
                })}
              </tr>
              <RowAfter columnCount={columns.length}>{rowAfter?.(row.original)}</RowAfter>
            </Fragment>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function RowAfter({ columnCount, children }: { columnCount: number; children: ReactNode }) {
  if (children === null || children === undefined) return null;
  return (
    <tr>
      <td colSpan={columnCount}>{children}</td>
    </tr>
  );
}

function definitionOf<Row extends object>(column: DataColumn<Row>): ColumnDef<typeof features, Row> {
  const { sortBy } = column;
  return {
    id: column.id,
    header: column.header,
    accessorFn: (row) => sortBy?.(row),
    enableSorting: sortBy !== undefined,
    sortFn: column.number ? 'basic' : 'text',
    sortUndefined: 'last',
    sortDescFirst: false,
  };
}

function classesOf<Row>(column: DataColumn<Row> | undefined): string | undefined {
  const classes = [column?.number ? 'number' : '', column?.className ?? ''].filter((each) => each !== '');
  return classes.length > 0 ? classes.join(' ') : undefined;
}

function ariaSort(direction: false | 'asc' | 'desc'): 'ascending' | 'descending' | 'none' {
  if (direction === false) return 'none';
  return direction === 'asc' ? 'ascending' : 'descending';
}

function SortSign({ direction }: { direction: false | 'asc' | 'desc' }) {
  if (direction === false) return null;
  return (
    <svg className="select-arrow ml-1 inline-block" viewBox="0 0 8 5" aria-hidden="true">
      <path d={direction === 'asc' ? 'M0 5H8L4 0Z' : 'M0 0H8L4 5Z'} fill="currentColor" />
    </svg>
  );
}
