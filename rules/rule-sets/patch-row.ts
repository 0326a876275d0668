import type { DocumentProblem } from './problem';
import type { Provenance, ResolvedTable } from './resolve';
import type { RowPatch } from './schema';
import { isKeyRange, type LimitTable, type TableCell } from './table';

type Row = LimitTable['rows'][number];

interface RowPatching {
  tables: ResolvedTable[];
  patch: RowPatch;
  at: string;
  document: string;
  problems: DocumentProblem[];
  cellWords: (cell: TableCell | undefined, unit: string | undefined) => string;
}

/** New cells in the one row that the patch's key names; a key that leads to no row or to several is refused. */
export function patchRow({ tables, patch, at, document, problems, cellWords }: RowPatching): ResolvedTable[] {
  const refuse = (place: string, detail: string, fix: string) => {
    problems.push({ pointer: `${at}${place}`, detail: `${document} patches ${detail}`, fix });
    return tables;
  };
  const table = tables.find((each) => each.id === patch.table);
  if (!table) {
    return refuse(
      '/table',
      `the table ${patch.table}, which the edition does not have.`,
      'Correct the table id.',
    );
  }
  const columns = table.columns.map((column) => column.name);
  const stray = Object.keys(patch.set).find((name) => !columns.includes(name));
  if (stray !== undefined) {
    return refuse(
      `/set/${stray}`,
      `the column ${stray}, which the table ${table.id} does not have.`,
      `Choose one of ${columns.join(', ')}.`,
    );
  }
  const strayKey = Object.keys(patch.key).find((name) => !table.keys.includes(name));
  if (strayKey !== undefined) {
    return refuse(
      `/key/${strayKey}`,
      `by ${strayKey}, which is no key of the table ${table.id}.`,
      `Use ${table.keys.join(', ')}.`,
    );
  }
  const matching = table.rows.flatMap((row, i) => (matchesKey(row, patch.key) ? [i] : []));
  const [index] = matching;
  if (index === undefined || matching.length > 1) {
    return refuse(
      '/key',
      `${matching.length === 0 ? 'a row that' : `${matching.length} rows at once where one row of`} the table ${table.id} ${matching.length === 0 ? 'does not have' : 'is meant'}.`,
      `Name the row by ${table.keys.join(', ')}, written as in the table.`,
    );
  }
  return tables.map((each) =>
    each === table ? withPatch(table, index, patch.set, document, cellWords) : each,
  );
}

function withPatch(
  table: ResolvedTable,
  index: number,
  set: Row,
  document: string,
  cellWords: RowPatching['cellWords'],
): ResolvedTable {
  const row = table.rows[index] ?? {};
  const earlier = table.rowsSupplied[index] ?? table.supplied;
  const text = rowWords(table, row, (name) => name in set, cellWords);
  const supplied = { document, displaced: [...earlier.displaced, { document: earlier.document, text }] };
  return {
    ...table,
    rows: table.rows.map((each, i) => (i === index ? { ...each, ...set } : each)),
    rowsSupplied: table.rowsSupplied.map((each, i) => (i === index ? supplied : each)),
  };
}

/**
 * What supplied each row of a table that a layer gives anew: the layer, in place of the row with the same keys,
 * or of nothing.
 */
export function rowsDisplaced(
  table: LimitTable,
  earlier: ResolvedTable | undefined,
  document: string,
  cellWords: RowPatching['cellWords'],
): Provenance[] {
  return table.rows.map((row) => {
    const place =
      earlier?.rows.findIndex((old) => table.keys.every((key) => isSameCell(old[key], row[key]))) ?? -1;
    const old = place < 0 ? undefined : earlier?.rows[place];
    if (!earlier || !old) return { document, displaced: [] };
    const before = earlier.rowsSupplied[place] ?? earlier.supplied;
    const text = rowWords(earlier, old, () => true, cellWords);
    return { document, displaced: [...before.displaced, { document: before.document, text }] };
  });
}

function isSameCell(left: TableCell | undefined, right: TableCell | undefined): boolean {
  return right !== undefined && sameKey(left, right);
}

function rowWords(
  table: LimitTable,
  row: Row,
  isNamed: (column: string) => boolean,
  cellWords: RowPatching['cellWords'],
): string {
  return table.columns
    .filter(({ name }) => isNamed(name))
    .map(({ name, unit }) => `${name} ${cellWords(row[name], unit)}`)
    .join(', ');
}

function matchesKey(row: Row, key: Row): boolean {
  return Object.entries(key).every(([name, cell]) => sameKey(row[name], cell));
}

function sameKey(left: TableCell | undefined, right: TableCell): boolean {
  if (isKeyRange(left) && isKeyRange(right)) return left.from === right.from && left.below === right.below;
  return !isKeyRange(left) && !isKeyRange(right) && String(left) === String(right);
}
