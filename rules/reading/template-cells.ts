import type { Quantity } from '../quantities/quantity';
import { quantityById } from '../quantities/registry';
import type { DocumentRecord, MixRecord, Reading } from '../record';
import { withStandardDocuments } from '../rule-sets/document-types';
import type { ReadingEdition } from './edition-contents';
import { shownAttribute } from './template-entries';
import {
  headerRow,
  type TemplateGradation,
  type TemplateLabels,
  type TemplateTable,
  templateLayout,
} from './template-layout';
import { type Place, shownReading, type TemplateCell, tablePlaces } from './template-rows';

export interface FilledTemplate {
  cells: TemplateCell[];
  /** What the edition's template has no named place for: a quantity, `attribute:<name>` or `document:<type>`. */
  homeless: string[];
}

/** Where each value of a record stands in an edition's template: the way back of reading it. */
export function templateCells(edition: ReadingEdition, record: MixRecord): FilledTemplate {
  const { sheets } = templateLayout(edition);
  const find = (id: string) => edition.quantities.find((quantity) => quantity.id === id) ?? quantityById(id);
  const tables = sheets.filter((sheet) => sheet.kind === 'table' && sheet.name !== 'Readings');
  const places: Place[] = sheets.flatMap((sheet) => {
    if (sheet.kind === 'labels') return [labelPlace(sheet)];
    return sheet.kind === 'gradation' ? [gradationPlace(sheet)] : [];
  });
  places.push(tablePlaces(tables.filter((sheet): sheet is TemplateTable => sheet.name !== 'Documents')));
  const filled: FilledTemplate = { cells: [], homeless: [] };
  const keep = (name: string, cells: TemplateCell[] | null) => {
    if (cells === null) filled.homeless.push(name);
    else filled.cells.push(...cells);
  };
  for (const sheet of sheets) {
    if (sheet.kind !== 'labels') continue;
    for (const name of Object.keys(record.attributes))
      keep(`attribute:${name}`, attributeCells(sheet, edition, record, name));
  }
  for (const reading of record.readings) keep(reading.quantity, placed(reading, places, find));
  const documents = sheets.find((sheet): sheet is TemplateTable => sheet.name === 'Documents');
  record.documents.forEach((document, at) => {
    keep(`document:${document.type}`, documents ? documentCells(documents, edition, document, at) : null);
  });
  return filled;
}

function placed(
  reading: Reading,
  places: Place[],
  find: (id: string) => Quantity | undefined,
): TemplateCell[] | null {
  const quantity = find(reading.quantity);
  if (!quantity || quantity.unit !== reading.unit) return null;
  for (const place of places) {
    const cells = place(reading);
    if (cells !== null) return cells;
  }
  return null;
}

function attributeCells(
  sheet: TemplateLabels,
  edition: ReadingEdition,
  { attributes }: MixRecord,
  name: string,
): TemplateCell[] | null {
  const at = sheet.entries.findIndex(({ quantity }) => quantity === `attribute:${name}`);
  const stated = attributes[name];
  if (at < 0 || stated === undefined) return null;
  const row = headerRow + 1 + at;
  const value: TemplateCell = {
    sheet: sheet.name,
    row,
    column: 2,
    value: shownAttribute(edition, name, stated.value),
  };
  const unit = stated.unit ?? null;
  if (unit === null || unit === sheet.entries[at]?.unit) return [value];
  return [value, { sheet: sheet.name, row, column: 3, value: unit }];
}

/** Conditions, method and date that a reading states, beside its value. */
function statedBy({ at, method, testedOn }: Reading): [string, unknown][] {
  return Object.entries({ ...at, method, testedOn }).filter(([, value]) => value !== undefined);
}

function states(reading: Reading, exactly: object): boolean {
  const stated = statedBy(reading);
  const wanted = Object.entries(exactly).filter(([, value]) => value !== undefined);
  return (
    stated.length === wanted.length &&
    wanted.every(([name, value]) => stated.some(([own, said]) => own === name && said === value))
  );
}

function labelPlace(sheet: TemplateLabels): Place {
  const taken = new Set<number>();
  return (reading) => {
    const at = sheet.entries.findIndex(
      (entry, place) => !taken.has(place) && entry.quantity === reading.quantity && states(reading, entry.at),
    );
    if (at < 0) return null;
    taken.add(at);
    return [{ sheet: sheet.name, row: headerRow + 1 + at, column: 2, value: shownReading(reading) }];
  };
}

function gradationPlace(sheet: TemplateGradation): Place {
  const names: string[] = [];
  const headed = new Set<string>();
  return (reading) => {
    const { sieve, stockpile } = reading.at;
    const size = sheet.sievesMm.indexOf(sieve ?? 0);
    if (reading.quantity !== 'percent-passing' || size < 0) return null;
    const row = headerRow + 2 + size;
    const value = shownReading(reading);
    if (stockpile === undefined) {
      const at = sheet.columns.findIndex((column) => states(reading, { ...column.at, sieve }));
      return at < 0 ? null : [{ sheet: sheet.name, row, column: sheet.stockpiles + 2 + at, value }];
    }
    if (!states(reading, { sieve, stockpile })) return null;
    if (!names.includes(stockpile)) names.push(stockpile);
    const column = names.indexOf(stockpile) + 2;
    if (column > sheet.stockpiles + 1) return null;
    const cells: TemplateCell[] = [{ sheet: sheet.name, row, column, value }];
    if (headed.has(stockpile)) return cells;
    headed.add(stockpile);
    return [{ sheet: sheet.name, row: headerRow + 1, column, value: stockpile }, ...cells];
  };
}

function documentCells(
  sheet: TemplateTable,
  edition: ReadingEdition,
  document: DocumentRecord,
  at: number,
): TemplateCell[] | null {
  const known = withStandardDocuments(edition.documents).find(({ type }) => type === document.type);
  if (!known) return null;
  const { issuer, reference, date, validTo } = document;
  const values: Record<string, TemplateCell['value'] | null> = {
    type: known.label ?? known.type,
    issuer,
    reference,
    date: date === null ? null : { date },
    validTo: validTo === null ? null : { date: validTo },
  };
  return sheet.columns.flatMap((column, place) => {
    const value = values[column.names ?? ''] ?? null;
    return value === null ? [] : [{ sheet: sheet.name, row: headerRow + 1 + at, column: place + 1, value }];
  });
}
