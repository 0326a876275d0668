import { quantityById } from '../../quantities/registry';
import { sieveFromName } from '../../quantities/sieves';
import type { Conditions } from '../../record';
import type { Cell } from '../cell-grid';
import type { ConditionName } from '../mapping';
import { plainText } from '../plain-text';
import type { SheetIndex } from '../sheet-index';
import type { Domain } from '../words/context-words';
import type { DocumentPart, KeyName, Role } from '../words/key-words';
import { type Surroundings, saysCondition, type Table } from './find-tables';
import type { LabelMeaning } from './label-meaning';
import { isMaterial } from './materials';

export type ColumnKind = 'key' | 'label' | 'value' | 'unit' | 'method' | 'testedOn' | 'document' | 'aside';

/** What stands over a column, and so what its cells are. */
export interface TableColumn {
  column: number;
  heads: Cell[];
  kind: ColumnKind;
  key: ConditionName | null;
  part: DocumentPart | null;
  quantities: string[];
  weak: boolean;
  at: Conditions;
  role: Role | null;
  unit: string | null;
  unknownUnit: string | null;
  method: string | null;
  raw: boolean;
  attribute: string | null;
  subset: 'dry' | 'conditioned' | null;
  onAggregate: boolean;
  onMix: boolean;
  domains: Domain[];
  /** With those of its table, for values that no label of their own says more of. */
  allDomains: Domain[];
  /** A heading that names whose the column is, without saying of what kind that is. */
  name: string | null;
  nameCell: Cell | null;
  nameKey: ConditionName | null;
  /** An upper heading that only names: "Stockpile A" over "% retained" and "% passing". */
  groupName: Cell | null;
  /** What its heading says of the heads beside it, where that is not what stands under it. */
  corner: ConditionName | null;
  /** Binder content by which a trial is named, and the cell that says so. */
  binder: { text: string; cell: Cell } | null;
}

const conditionKeys = new Set<KeyName>([
  'trial',
  'blend',
  'variant',
  'specimen',
  'stockpile',
  'sieve',
  'gyrations',
  'temperature',
  'time',
  'stress',
  'passes',
  'frequency',
  'aging',
  'laboratory',
]);
const documentParts = new Set<KeyName>(['document', 'issuer', 'reference', 'date', 'validTo']);

export function isConditionKey(key: KeyName): key is ConditionName {
  return conditionKeys.has(key);
}

export function tableColumns(
  table: Table,
  index: SheetIndex,
  around: Surroundings,
): Map<number, TableColumn> {
  const columns = new Map<number, TableColumn>();
  const numbers = new Set<number>();
  for (const { cells } of [...table.headings, ...table.rows])
    for (const { column } of cells) numbers.add(column);
  const heads = headingCells(table, index, around);
  const below = cellsByColumn(table);
  const hasDocuments = table.headings.some(({ cells }) =>
    cells.some(({ text }) => around.labels.read(text).keys.includes('document')),
  );
  for (const column of [...numbers].sort((a, b) => a - b)) {
    const described = columnUnder(column, heads.get(column) ?? [], around);
    const before = [...columns.values()];
    decideKind(described, below.get(column) ?? [], {
      around,
      hasDocuments,
      isFirst: before.length === 0,
      isBehindValues: before.some(({ kind }) => kind === 'value'),
    });
    columns.set(column, described);
  }
  keepTellingKeys(columns, below);
  nameRows(columns, below, around);
  nameShares(columns, below);
  return columns;
}

/**
 * Of two columns of the same kind of key, "Lot" beside "Sublot" or "Source" beside "Aggregate", the one that tells
 * more rows apart is the key; the other tells more of the same rows.
 */
function keepTellingKeys(columns: Map<number, TableColumn>, below: Map<number, Cell[]>): void {
  const kept = new Map<ConditionName, TableColumn>();
  const distinct = ({ column }: TableColumn) =>
    new Set((below.get(column) ?? []).map(({ text }) => text)).size;
  for (const column of columns.values()) {
    if (column.kind !== 'key' || column.key === null || column.key === 'sieve') continue;
    const before = kept.get(column.key);
    if (before && distinct(column) <= distinct(before)) column.kind = 'aside';
    else {
      if (before) before.kind = 'aside';
      kept.set(column.key, column);
    }
  }
}

/** A bare "Percent" beside stockpiles is their share where it sums to 100, and nothing where it does not. */
function nameShares(columns: Map<number, TableColumn>, below: Map<number, Cell[]>): void {
  const all = [...columns.values()];
  if (!all.some(({ key }) => key === 'stockpile') || all.some(({ key }) => key === 'sieve')) return;
  for (const column of all) {
    const isBare =
      column.kind === 'value' &&
      column.quantities.length === 0 &&
      column.unit === '%' &&
      column.name === null;
    if (!isBare || column.heads.length === 0) continue;
    const values = (below.get(column.column) ?? [])
      .filter(({ kind }) => kind === 'number')
      .map(({ value }) => Number(value));
    const sum = values.reduce((total, value) => total + value, 0);
    const last = values.at(-1) ?? 0;
    const isTotal = Math.abs(last - 100) < 0.05 && Math.abs(sum - 200) < 0.6;
    if (values.length > 1 && (Math.abs(sum - 100) < 0.6 || isTotal)) column.quantities = ['stockpile-share'];
  }
}

/** A column of words that name no quantity names the rows: specimens, trials or stockpiles, as the columns' heads say. */
function nameRows(
  columns: Map<number, TableColumn>,
  below: Map<number, Cell[]>,
  { kinds, labels }: Surroundings,
): void {
  const all = [...columns.values()];
  const label = all.find(({ kind }) => kind === 'label');
  if (!label || all.some(({ key }) => key === 'specimen')) return;
  const texts = (below.get(label.column) ?? []).slice(0, 80).filter((cell) => kinds.of(cell) === 'text');
  const names = texts.filter(({ text }) => {
    const meaning = labels.read(text);
    return (
      meaning.quantities.length === 0 &&
      meaning.attribute === null &&
      !meaning.furniture &&
      !meaning.raw &&
      meaning.keys.length === 0
    );
  });
  const quantities = all.flatMap((column) => column.quantities);
  if (names.length === 0 || names.length * 2 <= texts.length || quantities.length === 0) return;
  const heads = label.heads
    .filter((cell) => kinds.of(cell) === 'text')
    .flatMap(({ text }) => labels.read(text).keys);
  const stated = heads.find(isConditionKey);
  label.kind = 'key';
  label.key =
    stated ??
    rowKeyOf(
      quantities,
      all.some(({ key }) => key === 'trial'),
    );
}

function rowKeyOf(quantities: string[], hasTrial: boolean): ConditionName {
  const subjects = quantities.map((id) => quantityById(id)?.subject);
  if (subjects.filter((subject) => subject === 'aggregate').length * 2 > subjects.length) return 'stockpile';
  const ofTrials = [
    'binder-content',
    'voids-in-mineral-aggregate',
    'voids-filled-with-asphalt',
    'effective-binder-content',
  ];
  return !hasTrial && quantities.some((id) => ofTrials.includes(id)) ? 'trial' : 'specimen';
}

export function cellsByColumn(table: Table): Map<number, Cell[]> {
  const below = new Map<number, Cell[]>();
  for (const { cells } of table.rows) {
    if (cells.length === 1 && table.lastColumn > table.firstColumn + 1) continue;
    for (const cell of cells) {
      const known = below.get(cell.column);
      if (known) known.push(cell);
      else below.set(cell.column, [cell]);
    }
  }
  return below;
}

/** The heading cells over each column, from the top; merged and group headings stand over all that they span. */
function headingCells(table: Table, index: SheetIndex, { kinds }: Surroundings): Map<number, Cell[]> {
  const heads = new Map<number, Cell[]>();
  for (const [at, { row, cells }] of table.headings.entries()) {
    const lower = table.headings.slice(at + 1);
    const isMerged = cells.some((cell) => index.spanOf(cell).columns > 1);
    for (let column = table.firstColumn; column <= table.lastColumn; column += 1) {
      let cell = index.cellAt(row, column);
      if (!cell && !isMerged && lower.length > 0) cell = groupHead(column, cells, lower, kinds);
      if (!cell) continue;
      const known = heads.get(column) ?? [];
      if (!known.includes(cell)) heads.set(column, [...known, cell]);
    }
  }
  return heads;
}

/** Over a blank, the nearest heading to the left that has a lower heading of its own too. */
function groupHead(
  column: number,
  cells: Cell[],
  lower: Table['headings'],
  kinds: Surroundings['kinds'],
): Cell | null {
  const head = cells.findLast((cell) => cell.column < column);
  if (!head || kinds.of(head) === 'unit') return null;
  const stands = (at: number) =>
    lower.some((row) => row.cells.some((cell) => cell.column === at && kinds.of(cell) !== 'unit'));
  return stands(column) && stands(head.column) ? head : null;
}

function columnUnder(column: number, heads: Cell[], { kinds, labels }: Surroundings): TableColumn {
  const isWords = (cell: Cell) => kinds.of(cell) === 'text' || saysCondition(cell, { kinds, labels });
  const texts = heads.filter(isWords);
  const meanings = texts.map(({ text }) => labels.read(text));
  const result: TableColumn = {
    column,
    heads,
    kind: 'value',
    key: null,
    part: null,
    quantities: [],
    weak: false,
    at: {},
    role: null,
    unit: null,
    unknownUnit: null,
    method: null,
    raw: false,
    attribute: null,
    subset: null,
    onAggregate: false,
    onMix: false,
    domains: [],
    allDomains: [],
    name: null,
    nameCell: null,
    nameKey: null,
    groupName: null,
    corner: null,
    binder: null,
  };
  for (const [at, meaning] of meanings.entries()) {
    result.at = { ...result.at, ...meaning.at };
    result.domains.push(...meaning.domains);
    if (meaning.unit !== null) result.unit = meaning.unit;
    result.unknownUnit = meaning.unknownUnit ?? result.unknownUnit;
    result.method = meaning.method ?? result.method;
    result.subset = meaning.subset ?? result.subset;
    result.onAggregate ||= meaning.onAggregate;
    result.onMix ||= meaning.onMix;
    if (meaning.role !== null) result.role = meaning.role;
    if (meaning.binder !== null) result.binder = { text: meaning.binder, cell: texts[at] as Cell };
  }
  for (const cell of heads)
    if (kinds.of(cell) === 'unit')
      result.unit = unitText(cell, labels.read(`x (${cell.text.replace(/[()[\]]/g, '')})`)) ?? result.unit;
  for (const [at, meaning] of meanings.entries()) {
    const isName = at < meanings.length - 1 && meaning.unknown.length > 0 && meaning.quantities.length === 0;
    if (isName && meaning.role === null && Object.keys(meaning.at).length === 0)
      result.groupName = texts[at] ?? null;
  }
  nameQuantity(result, meanings, { kinds, labels });
  nameColumn(result, heads, meanings, { kinds, labels });
  return result;
}

function unitText(cell: Cell, meaning: LabelMeaning): string | null {
  return meaning.unit ?? (plainText(cell.text) === '-' ? '1' : null);
}

/** Group and lower heading together name it ("Air | voids", "Specific gravity | bulk"), else the lowest that does. */
function nameQuantity(result: TableColumn, meanings: LabelMeaning[], { labels }: Surroundings): void {
  const lowest = meanings.findLast((meaning) => meaning.quantities.length > 0);
  let chosen = lowest ?? null;
  if (meanings.length > 1 && (!lowest || lowest.weak || lowest.quantities.length > 1)) {
    const texts = meanings.map(({ text }) => text);
    for (const joined of [texts.join(' '), texts.toReversed().join(' ')]) {
      const together = labels.read(joined);
      if (together.quantities.length === 0 || together.unknown.length > 0) continue;
      if (!chosen || (chosen.weak && !together.weak) || together.quantities.length < chosen.quantities.length)
        chosen = together;
    }
  }
  const last = meanings.at(-1);
  if (last && last.quantities.length === 0 && (last.raw || last.role === 'serial')) {
    result.raw = last.raw;
    return;
  }
  if (chosen) {
    result.quantities = chosen.quantities;
    result.weak = chosen.weak;
    if (chosen.unit !== null && result.unit === null) result.unit = chosen.unit;
  } else result.raw = meanings.some((meaning) => meaning.raw);
  result.attribute = last?.attribute ?? null;
}

function nameColumn(
  result: TableColumn,
  heads: Cell[],
  meanings: LabelMeaning[],
  { kinds, labels }: Surroundings,
): void {
  const lowest = heads.findLast((cell) => kinds.of(cell) !== 'unit' && kinds.of(cell) !== 'none');
  if (!lowest || saysCondition(lowest, { kinds, labels })) return;
  const upperKey = meanings
    .slice(0, kinds.of(lowest) === 'text' ? -1 : undefined)
    .flatMap(({ keys, quantities }) => (quantities.length === 0 ? keys : []))
    .filter(isConditionKey)
    .find((key) => key !== 'variant' && result.at[key] === undefined);
  if (kinds.of(lowest) !== 'text') {
    result.name = plainText(lowest.text);
    result.nameCell = lowest;
    result.nameKey = upperKey ?? null;
    if (!upperKey && meanings.some(({ quantities }) => quantities.includes('binder-content'))) {
      result.binder = {
        text: lowest.kind === 'number' ? lowest.text : plainText(lowest.text).replace(/\s*%$/, ''),
        cell: lowest,
      };
      result.quantities = result.quantities.filter((id) => id !== 'binder-content');
    }
    return;
  }
  const meaning = labels.read(lowest.text);
  const saysNothing =
    meaning.quantities.length === 0 &&
    meaning.keys.length === 0 &&
    meaning.role === null &&
    !meaning.raw &&
    Object.keys(meaning.at).length === 0 &&
    meaning.binder === null;
  const isDoubtful =
    meaning.weak ||
    isMaterial(meaning.quantities) ||
    meaning.unknown.length > 0 ||
    (meaning.keys.length > 0 && meaning.keys.every(isConditionKey) && meaning.role === null && !meaning.raw);
  if (!saysNothing && !isDoubtful) return;
  result.name = plainText(lowest.text);
  result.nameCell = lowest;
  result.nameKey = upperKey ?? null;
}

interface Contents {
  around: Surroundings;
  hasDocuments: boolean;
  isFirst: boolean;
  /** Whose values are stands before them. */
  isBehindValues: boolean;
}

function decideKind(
  result: TableColumn,
  cells: Cell[],
  { around, hasDocuments, isFirst, isBehindValues }: Contents,
): void {
  const { kinds, labels } = around;
  const meanings = result.heads
    .filter((cell) => kinds.of(cell) === 'text')
    .map(({ text }) => labels.read(text));
  const last = meanings.at(-1);
  const isNumbered = result.nameCell !== null && kinds.of(result.nameCell) !== 'text';
  const keys = result.nameKey !== null || isNumbered || !last || last.unknown.length > 0 ? [] : last.keys;
  const sample = cells.slice(0, 80);
  const texts = sample.filter((cell) => kinds.of(cell) === 'text');
  const say = texts.filter(({ text }) => {
    const meaning = labels.read(text);
    if (meaning.unknown.length > 0 && keys.some(isConditionKey)) return false;
    return meaning.quantities.length > 0 || meaning.attribute !== null || meaning.furniture || meaning.raw;
  });
  // Over a run of counts beside heights or densities it is where those were taken.
  const isCount =
    result.quantities.length === 1 && result.quantities[0] === 'gyrations-design' && sample.length > 1;
  if (
    isCount &&
    isFirst &&
    /^(?:no\.? of |number of )?(?:gyr|giros|girat|dreh|umdreh|n$)/i.test(last?.text ?? '')
  ) {
    result.kind = 'key';
    result.key = 'gyrations';
    return;
  }
  if (hasDocuments) {
    const part = keys.find((key) => documentParts.has(key));
    if (part) {
      result.kind = 'document';
      result.part = part as DocumentPart;
      return;
    }
  }
  if (result.quantities.length > 0 && !(result.weak && keys.length > 0) && texts.length <= sample.length / 2)
    return;
  if (
    result.quantities.length > 0 &&
    !result.weak &&
    keys.length === 0 &&
    say.length * 2 < Math.max(1, texts.length)
  )
    return;
  if (result.role !== null && result.role !== 'average' && result.quantities.length === 0) {
    result.kind = 'aside';
    return;
  }
  if (
    result.attribute !== null &&
    result.quantities.length === 0 &&
    sample.length <= 2 &&
    !keys.some((key) => key !== 'laboratory')
  )
    return;
  if (result.attribute !== null && texts.length === 1 && sample.length === 1) return;
  const units = sample.filter((cell) => kinds.of(cell) === 'unit').length;
  if (keys.includes('unit') || (units > 0 && units >= sample.length * 0.6)) result.kind = 'unit';
  else if (keys.includes('value')) result.kind = 'value';
  else if (keys.includes('method') && texts.length > 0) result.kind = 'method';
  else if (keys.includes('testedOn') || (keys.includes('date') && !keys.includes('document')))
    result.kind = 'testedOn';
  else if (
    say.length > 0 &&
    say.length * 2 >= texts.length &&
    texts.length * 2 >= sample.length &&
    !isNaming(keys)
  )
    result.kind = 'label';
  else if (keys.some(isConditionKey) && !(isBehindValues && isNameOnly(keys, sample)))
    setKey(result, keys.filter(isConditionKey), sample);
  else if (keys.includes('quantity')) result.kind = 'label';
  else if (looksLikeSieves(sample, isFirst || result.heads.every((cell) => kinds.of(cell) === 'unit')))
    setKey(result, ['sieve'], sample);
  else if (texts.length > 0 && texts.length * 2 >= sample.length)
    result.kind = isFirst || result.heads.length === 0 ? 'label' : 'aside';
  else if (isFirst && result.heads.length > 0 && result.quantities.length === 0 && sample.length > 0)
    result.kind = 'label';
}

/** Under these headings a word like "RAP" or "Lime" is a name and no quantity. */
function isNaming(keys: KeyName[]): boolean {
  return (
    keys.some((key) => key === 'stockpile' || key === 'sieve' || key === 'time') && !keys.includes('quantity')
  );
}

/** "Mélange" or "Mix" over figures behind the first results heads results of the mix, and numbers no trials. */
function isNameOnly(keys: KeyName[], sample: Cell[]): boolean {
  const named = keys
    .filter(isConditionKey)
    .every((key) => key === 'trial' || key === 'blend' || key === 'specimen' || key === 'stockpile');
  const fractional = sample.filter(
    ({ kind, value }) => kind === 'number' && !Number.isInteger(Number(value)),
  );
  return named && (fractional.length * 3 > sample.length || sample.every(({ kind }) => kind === 'number'));
}

function setKey(result: TableColumn, keys: ConditionName[], sample: Cell[]): void {
  const [first] = keys;
  if (!first) return;
  const sieves = sample.filter((cell) => isSieve(cell)).length;
  const key = keys.includes('sieve') && sieves * 2 >= sample.length ? 'sieve' : first;
  if (key === 'sieve' && sample.length > 0 && sieves * 2 < sample.length) {
    // The corner speaks of the heads beside it; the rows are the gradations that stand under them.
    result.kind = 'key';
    result.key = 'stockpile';
    result.corner = 'sieve';
    return;
  }
  const words = sample.filter(
    ({ kind, text }) => kind === 'text' && !/^[<>~]?\s*-?\d/.test(text.trim()),
  ).length;
  if (figureKeys.has(key) && sample.length > 1 && words * 2 > sample.length) {
    result.kind = 'key';
    result.key = 'specimen';
    result.corner = key;
    return;
  }
  result.kind = 'key';
  result.key = key;
}

/** Keys that are figures: words under such a heading are names, and the heading speaks of the heads beside it. */
const figureKeys: ReadonlySet<ConditionName> = new Set(['time', 'temperature', 'passes', 'frequency']);

export function isSieve(cell: Cell): boolean {
  return (
    cell.kind === 'date' ||
    sieveFromName(cell.text) !== null ||
    (cell.kind === 'number' && sieveFromName(cell.value) !== null) ||
    /^(?:pan|fond|fondo|schale|boden)$/i.test(cell.text.trim())
  );
}

/** Named sieves say so themselves; bare numbers only where a long run of them is the series, in order. */
function looksLikeSieves(sample: Cell[], mayBe: boolean): boolean {
  if (!mayBe || sample.length < 4) return false;
  const named = sample.filter((cell) => cell.kind === 'text' && sieveFromName(cell.text) !== null);
  if (named.length >= sample.length * 0.7) return true;
  const openings = sample.map((cell) => sieveFromName(cell.kind === 'number' ? cell.value : cell.text));
  if (openings.some((opening) => opening === null) || sample.length < 5) return false;
  const falls = openings.every(
    (opening, at) => at === 0 || (opening as number) < (openings[at - 1] as number),
  );
  const rises = openings.every(
    (opening, at) => at === 0 || (opening as number) > (openings[at - 1] as number),
  );
  return falls || rises;
}
