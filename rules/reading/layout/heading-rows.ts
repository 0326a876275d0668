import type { Cell } from '../cell-grid';
import { headFigures } from './head-figures';
import { isHeading } from './label-meaning';
import { type Surroundings, saysWhat, type Table, type TableRow } from './table';

/** Words only, most of them headings, over a row with values or units: here another table begins. */
export function isHeadingRow(
  row: TableRow,
  next: TableRow | undefined,
  { kinds, labels }: Surroundings,
  table: Table,
): boolean {
  if (row.cells.length < 2 || !next) return false;
  if (row.cells.some((cell) => kinds.of(cell) === 'value')) return false;
  const texts = row.cells.filter((cell) => kinds.of(cell) === 'text');
  if (texts.length < 2) return false;
  const meanings = texts.map(({ text }) => labels.read(text));
  const headings = meanings.filter((meaning) => isHeading(meaning) && meaning.unknown.length === 0);
  if (headings.length * 3 < texts.length * 2) return false;
  const hasDocuments = table.headings.some(({ cells }) =>
    cells.some(({ text }) => labels.read(text).keys.includes('document')),
  );
  if (hasDocuments) return meanings.every((meaning) => meaning.document === null);
  if (isPair(row, { kinds, labels })) return false;
  return next.cells.some((cell) => kinds.of(cell) !== 'text') || next.cells.length >= 2;
}

/** "Contractor | Brightwater Paving": a label with its words beside it, not two headings. */
export function isPair(row: TableRow, { kinds, labels }: Surroundings, next?: TableRow): boolean {
  const texts = row.cells.filter((cell) => kinds.of(cell) === 'text');
  const [first, second] = texts;
  if (!first || !second) return false;
  const label = labels.read(first.text);
  const answer = labels.read(second.text);
  const asks =
    label.attribute !== null ||
    label.document !== null ||
    label.furniture ||
    label.at.laboratory !== undefined ||
    /:\s*$/.test(first.text) ||
    label.quantities.length > 0 ||
    label.keys.length > 0;
  if (!asks) return false;
  const isDated =
    texts.length === 2 &&
    row.cells.length === 2 &&
    label.keys.some(
      (key) =>
        key === 'date' || key === 'testedOn' || key === 'validTo' || key === 'issuer' || key === 'reference',
    );
  const isFact =
    isDated ||
    label.attribute !== null ||
    label.document !== null ||
    label.furniture ||
    /:\s*$/.test(first.text);
  // Over a row of words that ask nothing, two questions side by side are headings.
  const below = next?.cells[0];
  const isHeads =
    answer.attribute !== null &&
    answer.unknown.length === 0 &&
    below !== undefined &&
    next?.cells.length === row.cells.length &&
    !saysWhat(labels.read(below.text));
  if (isHeads) return false;
  const answers = !isHeading(answer) || answer.unknown.length > 0;
  if (isFact)
    return (
      answers ||
      (texts.length === 2 &&
        label.keys.length === 0 &&
        answer.keys.length === 0 &&
        answer.quantities.length === 0 &&
        answer.role === null)
    );
  return answers && label.at.laboratory !== undefined;
}

export function belongsToHeading(
  row: TableRow,
  next: TableRow | undefined,
  table: Table,
  around: Surroundings,
): boolean {
  const { kinds, labels } = around;
  if (!next && table.headings.length === 0) return table.rows.length === 0 && isHeadsOnly(row, around);
  const figures =
    table.rows.length === 0 && next !== undefined && next.cells.length > 1 ? headFigures(row, around) : [];
  const values = row.cells.filter((cell) => kinds.of(cell) === 'value' && !figures.includes(cell));
  const texts = row.cells.filter(
    (cell) => kinds.of(cell) === 'text' || (kinds.of(cell) === 'value' && !values.includes(cell)),
  );
  if (values.length === 0) {
    if (isPair(row, around, next)) return false;
    if (texts.length === 0) return row.cells.some((cell) => kinds.of(cell) === 'unit');
    if (isAnsweredByWords(row, around)) return false;
    if (row.cells.length === 1) return true;
    const meanings = texts.map(({ text }) => labels.read(text));
    const [label, ...answers] = meanings;
    const isAnswered =
      label &&
      label.quantities.length > 0 &&
      answers.length > 0 &&
      answers.every((meaning) => !isHeading(meaning) && /\d/.test(meaning.text));
    if (isAnswered) return false;
    if (meanings.some((meaning) => isHeading(meaning))) return true;
    // Names over a wider row of headings, with nothing in the corner.
    const isOver =
      (row.cells[0]?.column ?? 0) > table.firstColumn && (next?.cells.length ?? 0) > row.cells.length;
    if (isOver && table.rows.length === 0 && table.headings.length === 0) return true;
    // Names of stockpiles or specimens over columns of values.
    return next?.cells.some((cell) => kinds.of(cell) === 'value' || kinds.of(cell) === 'unit') ?? false;
  }
  return (
    isNumberedHeading(row, values, table, around) ||
    isKeyedHeading(row, next, table, around) ||
    isFigureHeading(row, next, table, around)
  );
}

/** "Sand equivalent | N/A | %": a property whose result is a word. */
function isAnsweredByWords(row: TableRow, { kinds, labels }: Surroundings): boolean {
  const [first, ...others] = row.cells;
  if (!first || kinds.of(first) !== 'text' || labels.read(first.text).quantities.length === 0) return false;
  return (
    others.some((cell) => kinds.of(cell) === 'none' && !/^[-–—]+$/.test(cell.text.trim())) &&
    others.every((cell) => kinds.of(cell) !== 'text')
  );
}

/** A row of headings that stands alone, with a blank row under it. */
function isHeadsOnly(row: TableRow, { kinds, labels }: Surroundings): boolean {
  const texts = row.cells.filter((cell) => kinds.of(cell) === 'text');
  const heads = texts.filter(
    ({ text }) => isHeading(labels.read(text)) && labels.read(text).unknown.length === 0,
  );
  return texts.length > 2 && texts.length === row.cells.length && heads.length * 3 >= texts.length * 2;
}

/** "Sieve, mm | 25 | 19 | 12.5 …" at the top of a table: keys over the columns. */
function isKeyedHeading(
  row: TableRow,
  next: TableRow | undefined,
  table: Table,
  { kinds, labels }: Surroundings,
): boolean {
  const [first, ...others] = row.cells;
  if (!first || !next || table.rows.length > 0 || kinds.of(first) !== 'text' || others.length < 2)
    return false;
  const meaning = labels.read(first.text);
  const isProperty = meaning.keys.includes('quantity') && table.headings.length > 0;
  const isHead = meaning.keys.some((key) => keysOfHeads.has(key)) || isProperty;
  if (meaning.quantities.length > 0 || meaning.unknown.length > 0 || !isHead) return false;
  const heads = others.filter((cell) => kinds.of(cell) === 'value');
  const below = next.cells.find(({ column }) => column >= first.column);
  return heads.length >= 2 && below !== undefined && next.cells.length > 2;
}

const keysOfHeads = new Set([
  'sieve',
  'specimen',
  'trial',
  'temperature',
  'time',
  'frequency',
  'blend',
  'passes',
  'gyrations',
  'stress',
]);

/** "| 1 | 2 | 3 |" under a heading, with nothing to its left: the heads of columns, not results. */
function isNumberedHeading(
  row: TableRow,
  values: Cell[],
  table: Table,
  { kinds, labels }: Surroundings,
): boolean {
  const above = table.headings.at(-1);
  const first = row.cells[0];
  if (!first || table.headings.length === 0 || !above) return false;
  const leftmost = above.cells[0]?.column ?? first.column;
  if (kinds.of(first) !== 'value' || first.column <= leftmost) {
    const isNamed = kinds.of(first) === 'text' && row.cells.length > values.length;
    return isNamed && first.column > leftmost && values.length > 0 && countsUp(values);
  }
  const spansMore = above.cells.filter(({ column }) => column >= first.column).length < row.cells.length;
  const heads = above.cells
    .filter(({ column }) => column >= first.column - 1)
    .map(({ text }) => labels.read(text));
  const names =
    heads.some((head) => head.keys.length > 0 && head.quantities.length === 0) ||
    heads.some((head) => head.quantities.includes('binder-content'));
  return (
    (spansMore && (countsUp(values) || names)) ||
    (spansMore && heads.every((head) => head.quantities.length === 0))
  );
}

/** "Height at gyrations" over 8, 100 and 160, beside words and units: each figure shares its upper head with others. */
function isFigureHeading(
  row: TableRow,
  next: TableRow | undefined,
  table: Table,
  { kinds, labels }: Surroundings,
): boolean {
  const above = table.headings.at(-1);
  const [first] = row.cells;
  if (!above || !first || table.rows.length > 0 || table.headings.length > 2) return false;
  const corner = first.column === table.firstColumn ? kinds.of(first) : 'none';
  if (corner === 'value' || (corner === 'text' && labels.read(first.text).quantities.length > 0))
    return false;
  const groups = new Map<Cell, Cell[]>();
  for (const cell of row.cells) {
    if (kinds.of(cell) !== 'value') continue;
    const head = above.cells.findLast(({ column }) => column <= cell.column);
    if (!head || kinds.of(head) !== 'text') return false;
    groups.set(head, [...(groups.get(head) ?? []), cell]);
  }
  const isShared = [...groups].every(([head, cells]) => {
    const increases = cells.every(
      ({ value }, at) => at === 0 || Number(value) > Number(cells[at - 1]?.value),
    );
    const falls = cells.every(({ value }, at) => at === 0 || Number(value) < Number(cells[at - 1]?.value));
    return cells.length > 1 && (increases || falls) && saysFigures.test(head.text);
  });
  return groups.size > 0 && isShared && (next === undefined || next.cells.length >= row.cells.length - 1);
}

const saysFigures =
  /gyration|girat|giros|drehung|sieb|sieve|tamis|tamiz|malla|frequen|frecuen|fréquen|pass|überrollung|pasadas|hz|temp|time|zeit|temps|tiempo/i;

/** 1, 2, 3 and again 1, 2, 3. */
function countsUp(values: Cell[]): boolean {
  let expected = 1;
  for (const { value } of values) {
    const number = Number(value);
    if (number === 1) expected = 1;
    if (number !== expected) return false;
    expected += 1;
  }
  return values.length > 1;
}
