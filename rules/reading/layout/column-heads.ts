import type { Cell } from '../cell-grid';
import type { ConditionName } from '../mapping';
import { plainText } from '../plain-text';
import type { SheetIndex } from '../sheet-index';
import { saysCondition } from './head-figures';
import type { LabelMeaning } from './label-meaning';
import { isMaterial } from './materials';
import type { Surroundings, Table } from './table';
import { isConditionKey, type TableColumn } from './table-column';

/** The heading cells over each column, from the top; merged and group headings stand over all that they span. */
export function headingCells(table: Table, index: SheetIndex, { kinds }: Surroundings): Map<number, Cell[]> {
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

export function columnUnder(column: number, all: Cell[], { kinds, labels }: Surroundings): TableColumn {
  const heads = withoutNumberWords(all);
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
    misspelt: null,
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
    const isName =
      at < meanings.length - 1 &&
      ((meaning.unknown.length > 0 && meaning.quantities.length === 0) || isMaterial(meaning.quantities));
    if (isName && meaning.role === null && Object.keys(meaning.at).length === 0)
      result.groupName = texts[at] ?? null;
  }
  nameQuantity(result, meanings, { kinds, labels });
  nameColumn(result, heads, meanings, { kinds, labels });
  return result;
}

/** "Specimen" over "No." is one name in two rows. */
function withoutNumberWords(heads: Cell[]): Cell[] {
  const telling = heads.filter(
    ({ text }) => !/^\s*\(?\s*(?:nr|no|n[°º]|#|id|num|number|nummer)\.?\s*\)?\s*$/i.test(text),
  );
  return telling.length > 0 ? telling : heads;
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
    result.misspelt = chosen.misspelt;
    if (chosen.unit !== null && result.unit === null) result.unit = chosen.unit;
  } else result.raw = meanings.some((meaning) => meaning.raw);
  result.attribute = last?.attribute ?? null;
}

/** "Height (mm) at gyrations" over 8, 100 and 160: what the figures are is said beside the quantity. */
function keyInWords(meanings: LabelMeaning[], at: TableColumn['at']): ConditionName | null {
  for (const { text } of meanings.toReversed()) {
    const found = figuresInWords.find(([words, key]) => words.test(text) && at[key] === undefined);
    if (found) return found[1];
  }
  return null;
}

const figuresInWords: [RegExp, ConditionName][] = [
  [/gyration|girat|giros|umdrehung|drehung/i, 'gyrations'],
  [/siebweite|sieb(?:e|größe|öffnung)?\b|\bsieves?\b|tamis|tamiz|malla/i, 'sieve'],
  [/frequen|frecuen|fréquen/i, 'frequency'],
  [/\bpasses\b|überrollung|passages|pasadas/i, 'passes'],
];

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
    result.nameKey = upperKey ?? keyInWords(meanings, result.at);
    if (!result.nameKey && meanings.some(({ quantities }) => quantities.includes('binder-content'))) {
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
