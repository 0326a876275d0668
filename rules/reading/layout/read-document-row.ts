import type { DocumentRecord } from '../../record';
import type { Cell } from '../cell-grid';
import { understandDate } from '../parse-date';
import { plainText } from '../plain-text';
import { placeOf } from '../reading-log';
import type { TableRow } from './table';
import type { TableContext } from './table-context';

type DateName = 'date' | 'validTo';

/** One row of a list of documents, under headings that say which column is what. */
export function readDocumentRow(row: TableRow, context: TableContext): void {
  const { columns, labels } = context;
  const cellOf = (part: string) => row.cells.find(({ column }) => columns.get(column)?.part === part) ?? null;
  const named = cellOf('document');
  const type = named ? labels.read(named.text).document : null;
  if (!named || type === null) return;
  const dates = { date: cellOf('date'), validTo: cellOf('validTo') };
  keepDocument(named, { type, issuer: cellOf('issuer'), reference: cellOf('reference'), ...dates }, context);
}

/** "Binder certificate | BC-1207 | 4 Mar 2026": what stands beside a document's name. */
export function readDocumentPair(named: Cell, type: string, row: TableRow, context: TableContext): boolean {
  const { kinds, reading } = context;
  const beside = row.cells.filter((cell) => cell.column > named.column && kinds.of(cell) !== 'none');
  const isDate = (cell: Cell) =>
    cell.kind === 'date' ||
    (cell.kind === 'text' && understandDate(cell, reading.grid.date1904).state !== 'doubt') ||
    isAmbiguousDate(cell);
  const dates = beside.filter(isDate);
  const texts = beside.filter((cell) => !dates.includes(cell) && cell.kind !== 'boolean');
  const reference = texts.find(({ text }) => /\d/.test(text)) ?? null;
  const issuer =
    texts.find(
      ({ text }) =>
        !/\d/.test(text) &&
        !/^(?:yes|no|attached|enclosed|ja|nein|oui|non|sí|si|included|on file|x|✓)$/i.test(text.trim()),
    ) ?? null;
  keepDocument(
    named,
    { type, issuer, reference, date: dates[0] ?? null, validTo: dates[1] ?? null },
    context,
  );
  return true;
}

function isAmbiguousDate(cell: Cell): boolean {
  return cell.kind === 'text' && /^\d{1,2}[-/. ]\d{1,2}[-/. ]\d{2,4}$/.test(plainText(cell.text));
}

interface DocumentCells {
  type: string;
  issuer: Cell | null;
  reference: Cell | null;
  date: Cell | null;
  validTo: Cell | null;
}

function keepDocument(named: Cell, cells: DocumentCells, context: TableContext): void {
  const { reading, index } = context;
  const { log } = reading;
  const place = placeOf(index.sheet, named);
  const document: DocumentRecord = {
    type: cells.type,
    issuer: textOf(cells.issuer),
    reference: textOf(cells.reference),
    date: null,
    validTo: null,
    enclosed: false,
    source: place,
  };
  for (const cell of [cells.issuer, cells.reference]) {
    if (cell) log.use(placeOf(index.sheet, cell), 'read', 'Of a document.');
  }
  let inDoubt = false;
  for (const name of ['date', 'validTo'] as DateName[]) {
    const cell = cells[name];
    if (!cell) continue;
    const at = placeOf(index.sheet, cell);
    const settled = log.settle(
      at,
      understandDate(cell, reading.grid.date1904),
      { document: cells.type },
      (value) => ({
        document: { ...document, [name]: value },
      }),
    );
    if (settled.state === 'value') {
      document[name] = settled.value;
      log.use(at, 'read', `${name === 'date' ? 'Dated' : 'Valid to'} ${settled.value}.`);
    } else if (settled.state === 'doubt') inDoubt = true;
  }
  log.use(place, 'read', `Document: ${cells.type}.`);
  // A document whose date is in doubt is neither shown nor missing: the doubt stands in the record for it.
  if (!inDoubt) log.documents.push(document);
}

function textOf(cell: Cell | null): string | null {
  const text = cell ? plainText(cell.text) : '';
  return text === '' ? null : text;
}
