import { type Surroundings, saysWhat, type Table, type TableRow } from './table';

/** A table goes on behind a blank row where what follows has no heading of its own and stands in its columns. */
export function joinContinued(tables: Table[], around: Surroundings): Table[] {
  const joined: Table[] = [];
  for (const table of tables) {
    const previous = joined.findLast(
      (each) => each.firstColumn <= table.lastColumn && each.lastColumn >= table.firstColumn,
    );
    if (previous && continues(previous, table, around)) {
      previous.rows.push(...table.rows);
      previous.lastColumn = Math.max(previous.lastColumn, table.lastColumn);
    } else joined.push(table);
  }
  return joined;
}

function continues(previous: Table, table: Table, { kinds, labels }: Surroundings): boolean {
  if (table.titles.length > 0 || previous.headings.length === 0) return false;
  if (previous.rows.length === 0 && table.headings.length > 0) {
    // A heading, a blank row, then more of the heading.
    const units = table.headings.every(({ cells }) => cells.every((cell) => kinds.of(cell) !== 'text'));
    if (!units) return false;
    previous.headings.push(...table.headings);
    return true;
  }
  if (table.headings.length > 0) return false;
  const first = table.rows[0];
  if (!first || table.firstColumn < previous.firstColumn || table.lastColumn > previous.lastColumn)
    return false;
  if (previous.rows.length === 0) return first.cells.some((cell) => kinds.of(cell) === 'value');
  // A row that says itself what it holds is a list of its own, unless the rows before did so too.
  const own = rowsThatSay(table, { kinds, labels });
  const before = rowsThatSay(previous, { kinds, labels });
  if (own > table.rows.length / 2 && before <= previous.rows.length / 2) return false;
  const width = (rows: TableRow[]) => Math.max(...rows.map(({ cells }) => cells.length));
  // Under a table of several columns, lines of label and one value are a list of their own.
  if (own > 0 && width(table.rows) <= 2 && width(previous.rows) > 2) return false;
  return width(table.rows) >= 2 && width(table.rows) <= width([...previous.headings, ...previous.rows]);
}

function rowsThatSay(table: Table, { kinds, labels }: Surroundings): number {
  return table.rows.slice(0, 60).filter(({ cells }) => {
    const first = cells.find((cell) => kinds.of(cell) === 'text');
    return first !== undefined && saysWhat(labels.read(first.text)) && labels.read(first.text).role === null;
  }).length;
}
