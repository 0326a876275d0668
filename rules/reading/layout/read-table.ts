import { quantityById } from '../../quantities/registry';
import { sieveFromName } from '../../quantities/sieves';
import type { Conditions } from '../../record';
import type { Cell } from '../cell-grid';
import type { ConditionName } from '../mapping';
import { plainText } from '../plain-text';
import { placeOf } from '../reading-log';
import { type UnreadReason, unreadReasons } from '../unread-reason';
import type { Domain } from '../words/context-words';
import type { Role } from '../words/key-words';
import type { Candidate } from './candidate';
import type { Table, TableRow } from './find-tables';
import type { LabelMeaning } from './label-meaning';
import { isMaterial } from './materials';
import { keyConditions } from './name-conditions';
import { readDocumentRow } from './read-document-row';
import { readAttributeCell, readPairs } from './read-pairs';
import { readWritten } from './read-written';
import type { SheetContext } from './sheet-context';
import { isConditionKey, type TableColumn, tableColumns } from './table-columns';
import { type RowFacts, RowKeys } from './table-rows';
import { hasWeighings, weighingOf } from './weighings';

/** Everything that speaks for a whole table. */
export interface TableContext extends SheetContext {
  table: Table;
  number: number;
  columns: Map<number, TableColumn>;
  /** What names of columns without a word for their kind stand for. */
  nameKey: ConditionName;
  titles: LabelMeaning[];
  /** Said by titles over the table, and further off by the sheet. */
  far: Conditions;
  tableDomains: Domain[];
  /** Conditions that a list of properties states in lines of its own, with the test that each stands under. */
  scoped: { outer: string | null; at: Conditions }[];
  tableSubset: 'dry' | 'conditioned' | null;
}

/** What a title in the midst of a table says for the rows under it. */
interface Group {
  at: Conditions;
  meaning: LabelMeaning | null;
  subset: 'dry' | 'conditioned' | null;
}

export const roleReasons: Record<Role, UnreadReason> = {
  average: unreadReasons.average,
  spread: unreadReasons.spread,
  limit: unreadReasons.limit,
  total: unreadReasons.total,
  difference: unreadReasons.difference,
  remark: unreadReasons.remark,
  serial: unreadReasons.identifier,
};

/** Reads one table: the keys of its rows and columns, then each value under what they say. */
export function readTable(table: Table, sheet: SheetContext): void {
  const context = tableContext(table, sheet);
  for (const cell of table.titles) {
    mark(context, cell, 'A title.');
    readWritten(cell, context);
  }
  for (const { cells } of table.headings) for (const cell of cells) markHeading(context, cell);
  if (table.headings.length === 0 && !isMatrix(context)) {
    readPairs(context);
    return;
  }
  nameColumns(context);
  for (const [at, title] of context.titles.entries())
    readTitleBinder(title, table.titles[at] as Cell, context);
  readHeadBinders(context);
  const trialOf = trialsByBinder(context);
  const keys = new RowKeys(context.columns, context);
  let group: Group = { at: {}, meaning: null, subset: null };
  let outer: { label: LabelMeaning; column: number } | null = null;
  for (const row of table.rows) {
    const alone = titleOf(row, context);
    if (alone) {
      group = groupOf(alone, group);
      readTitleBinder(alone, row.cells[0] as Cell, context);
      mark(context, row.cells[0] as Cell, 'A title within the table.');
      readWritten(row.cells[0] as Cell, context);
      continue;
    }
    const facts = keys.read(row);
    if (trialOf !== null && facts.at.trial === undefined) Object.assign(facts.at, trialOf(row, facts.role));
    const labelled = rowLabels(row, context, outer);
    outer = labelled.outer;
    if (labelled.documents) {
      readDocumentRow(row, context);
      continue;
    }
    readRow(
      row,
      { facts, group, labelsAt: facts.label ? () => [facts.label as LabelMeaning] : labelled.labelsAt },
      context,
    );
  }
}

/** Labels with several figures in a run beside each: columns of trials or specimens, also without heads. */
function isMatrix({ table, kinds }: TableContext): boolean {
  const runs = table.rows.filter(({ cells }) => {
    const values = cells.filter((cell) => kinds.of(cell) === 'value' || kinds.of(cell) === 'none');
    const lastText = cells.findLast((cell) => kinds.of(cell) === 'text');
    return (
      values.length > 1 && (lastText === undefined || values.every(({ column }) => column > lastText.column))
    );
  });
  return table.rows.length > 1 && runs.length * 2 > table.rows.length;
}

function tableContext(table: Table, sheet: SheetContext): TableContext {
  const titles = table.titles.map(({ text }) => sheet.labels.read(text));
  const columns = tableColumns(table, sheet.index, sheet);
  const far: Conditions = { ...sheet.ambient };
  for (const [at, title] of titles.entries()) {
    Object.assign(far, farConditions(title), writtenKey(table.titles[at] as Cell, sheet));
  }
  sheet.nextTable += 1;
  const context: TableContext = {
    ...sheet,
    table,
    number: sheet.nextTable,
    columns,
    nameKey: 'specimen',
    scoped: [],
    titles,
    far,
    tableDomains: [...titles.toReversed().flatMap(({ domains }) => domains), ...sheet.domains],
    tableSubset: titles.findLast(({ subset }) => subset !== null)?.subset ?? sheet.subset,
  };
  if (hasWeighings(table, sheet)) nameWeighings(context);
  context.nameKey = nameKeyOf(context);
  return context;
}

/** "Stockpile: No. 8 Chip" over a table says whose it is. */
function writtenKey(cell: Cell, { labels, decimal }: SheetContext): Conditions {
  const match = /^([^:=]{1,40}?)\s*[:=]\s*(\S.{0,40})$/.exec(plainText(cell.text));
  if (!match?.[1] || !match[2]) return {};
  const meaning = labels.read(match[1]);
  const key =
    meaning.quantities.length === 0 && meaning.unknown.length === 0
      ? meaning.keys.find(isConditionKey)
      : undefined;
  if (key === undefined || key === 'variant' || key === 'sieve') return {};
  const said: Cell = { ...cell, kind: 'text', value: match[2], text: match[2] };
  const understood = keyConditions(key, said, { labels, unit: meaning.unit, decimal });
  return understood.state === 'value' ? understood.value : {};
}

function nameWeighings(context: TableContext): void {
  const { columns, labels } = context;
  for (const column of columns.values()) {
    const head = column.heads.findLast(({ kind }) => kind === 'text');
    const quantity = head ? weighingOf(head.text) : null;
    if (!quantity || column.kind === 'label') continue;
    Object.assign(column, {
      kind: 'value',
      key: null,
      quantities: [quantity],
      weak: false,
      name: null,
      nameCell: null,
      role: null,
      subset: null,
    });
  }
  context.labels = { read: (text) => weighed(labels.read(text)) };
}

function weighed(meaning: LabelMeaning): LabelMeaning {
  const quantity = weighingOf(meaning.text);
  return quantity ? { ...meaning, quantities: [quantity], weak: false, keys: [], subset: null } : meaning;
}

/** A report's title is full of words like "design"; only a short one names what stands under it. */
export function farConditions(title: LabelMeaning): Conditions {
  const { trial, ...rest } = title.at;
  if (trial === undefined) return rest;
  if (trial !== 'design') return title.at;
  const isReport =
    /report|submittal|form\b|worksheet|summary of|bericht|rapport|informe|mix design\b|design mix|mezclas?\b.*diseño|étude|erstprüfung/i.test(
      title.text,
    );
  return isReport || title.unknown.length > 1 ? rest : title.at;
}

function nameKeyOf({ table, columns, titles, labels, kinds, tableDomains }: TableContext): ConditionName {
  const values = [...columns.values()].filter(({ kind }) => kind === 'value');
  const said = [...columns.values()].find((column) => column.corner !== null)?.corner;
  if (said) return said;
  if (headsAreSieves(values.flatMap(({ nameCell }) => nameCell ?? []))) return 'sieve';
  const keyed = [...columns.values()].flatMap(({ key }) => key ?? []);
  if (keyed.includes('sieve')) return 'stockpile';
  if (keyed.includes('stockpile')) return 'specimen';
  const corner = [...columns.values()].find(({ kind }) => kind === 'label');
  const cornerKeys = corner?.heads.flatMap(({ text }) => labels.read(text).keys) ?? [];
  const named = cornerKeys
    .filter(isConditionKey)
    .find((key) => key !== 'sieve' || values.some(({ name }) => name !== null));
  const rowSays = table.rows.flatMap(({ cells }) => {
    const first = cells.find((cell) => kinds.of(cell) === 'text');
    return first ? labels.read(first.text).quantities : [];
  });
  if (named && !(cornerKeys.includes('quantity') && rowSays.length > 0 && named === 'specimen')) return named;
  const ofTitles = titles
    .flatMap(({ keys, quantities }) => (quantities.length === 0 ? keys : []))
    .find(isConditionKey);
  if (ofTitles && ofTitles !== 'sieve') return ofTitles;
  const upper = values.some(
    (column) => column.quantities.length > 0 && column.name !== null && !givesWay(column, 'stockpile'),
  );
  if (upper) return 'specimen';
  const subjects = rowSays.map((id) => quantityById(id)?.subject);
  const aggregate = subjects.filter((subject) => subject === 'aggregate').length;
  if (aggregate > subjects.length / 2) return 'stockpile';
  const mixOnly = [
    'voids-in-mineral-aggregate',
    'voids-filled-with-asphalt',
    'binder-content',
    'effective-binder-content',
    'dust-proportion',
  ];
  if (rowSays.some((id) => mixOnly.includes(id))) return 'trial';
  if (rowSays.length === 0 && tableDomains.includes('gradation')) return 'stockpile';
  return 'specimen';
}

/** Named openings, or bare figures that fall along the series; 1, 2 and 3 number specimens. */
function headsAreSieves(heads: Cell[]): boolean {
  const named = heads.filter(
    ({ kind, text }) =>
      kind === 'text' && /mm|µm|in\b|["#/″]|no\./i.test(text) && sieveFromName(text) !== null,
  );
  if (named.length > 2 && named.length * 2 > heads.length) return true;
  const openings = heads.flatMap(({ kind, value }) => (kind === 'number' ? [sieveFromName(value)] : []));
  return (
    openings.length > 3 &&
    openings.every((opening, at) => opening !== null && (at === 0 || opening < (openings[at - 1] as number)))
  );
}

/** Sets what names over columns mean, and takes rows of keys ("Specimen | 1 | 2 | 3") for the columns' own. */
function nameColumns(context: TableContext): void {
  const { columns, labels, decimal, nameKey, table, kinds } = context;
  nameByCorners(context);
  for (const column of columns.values()) {
    if (column.kind !== 'value' || column.name === null || column.nameCell === null) continue;
    const key = column.nameKey ?? nameKey;
    if (labels.read(column.nameCell.text).quantities.length > 0 && !givesWay(column, key)) continue;
    if (column.at[key] !== undefined) continue;
    const understood = keyConditions(key, column.nameCell, { labels, unit: column.unit, decimal });
    if (understood.state !== 'value') continue;
    column.at = { ...column.at, ...understood.value };
    if (givesWay(column, key)) {
      column.quantities = [];
      column.attribute = null;
    }
    if (column.nameKey !== null && column.heads.length > 1 && key !== 'stockpile') column.unit = null;
  }
  nameByBinder(context);
  for (const row of table.rows) {
    const first = row.cells.find((cell) => kinds.of(cell) === 'text');
    const meaning = first ? labels.read(first.text) : null;
    const key =
      meaning && meaning.quantities.length === 0 && meaning.role === null && !meaning.raw
        ? meaning.keys.find(isConditionKey)
        : undefined;
    const kind = first ? columns.get(first.column)?.kind : undefined;
    const own = first ? columns.get(first.column)?.key : undefined;
    if (!first || !meaning || key === undefined || meaning.unknown.length > 0) continue;
    if (
      kind !== 'label' &&
      !(kind === 'key' && own !== key && own !== undefined && own !== null && figures.has(own))
    )
      continue;
    const values = row.cells.filter(
      (cell) => cell.column > first.column && columns.get(cell.column)?.kind === 'value',
    );
    if (values.length < 1) continue;
    const isList =
      [...columns.values()].filter(({ kind, role }) => kind === 'value' && role === null).length === 1;
    if (isList && values.length === 1 && key !== 'trial' && key !== 'specimen' && key !== 'blend') {
      keepScoped(row, { key, meaning, cell: values[0] as Cell }, context);
      continue;
    }
    for (const cell of values) {
      const column = columns.get(cell.column) as TableColumn;
      const understood = keyConditions(key, cell, {
        labels,
        unit: meaning.unit ?? unitBeside(row, context),
        decimal,
      });
      if (understood.state !== 'value') continue;
      column.at = { ...column.at, ...understood.value };
      context.reading.log.use(placeOf(context.index.sheet, cell), 'read', `Key: ${key}.`);
    }
  }
  nameByBinder(context);
}

/** "Trial | A | A | B | B" over "Sample | 1 | 2 | 1 | 2": each row of heads says itself what it names. */
function nameByCorners({ table, columns, kinds, labels, decimal }: TableContext): void {
  if (table.headings.length < 2) return;
  for (const { row, cells } of table.headings) {
    const [corner] = cells;
    const under = corner ? columns.get(corner.column) : undefined;
    if (!corner || kinds.of(corner) !== 'text' || under?.kind === 'value') continue;
    const meaning = labels.read(corner.text);
    const key =
      meaning.quantities.length === 0 && meaning.unknown.length === 0
        ? meaning.keys.find(isConditionKey)
        : undefined;
    // Where the figures under it are such keys, it speaks of them and not of the heads beside it.
    if (key === undefined || under?.key === key) continue;
    for (const column of columns.values()) {
      if (column.kind !== 'value') continue;
      const head = column.heads.find(
        (cell) => cell.row === row || (cell.row < row && cell === column.nameCell),
      );
      if (!head || head.column === corner.column || head.row !== row) continue;
      if (labels.read(head.text).quantities.length > 0 || labels.read(head.text).role !== null) continue;
      const understood = keyConditions(key, head, { labels, unit: meaning.unit, decimal });
      if (understood.state !== 'value') continue;
      column.at = { ...understood.value, ...column.at };
      if (column.nameCell === head) column.nameKey = key;
    }
  }
}

/** In a table of names, "RAP" and "Natural sand" are stockpiles and no quantities. */
function givesWay({ quantities }: TableColumn, key: ConditionName): boolean {
  return key === 'stockpile' && isMaterial(quantities);
}

function unitBeside(row: TableRow, { columns, kinds, labels }: TableContext): string | null {
  const cell = row.cells.find(
    (each) => columns.get(each.column)?.kind === 'unit' || kinds.of(each) === 'unit',
  );
  return cell ? labels.read(`x (${plainText(cell.text)})`).unit : null;
}

/** Columns told apart by their binder content only: it names the trials. */
function nameByBinder(context: TableContext): void {
  const { columns, table, kinds, labels, index } = context;
  for (const column of columns.values()) {
    if (column.binder && column.at.trial === undefined && column.at.blend === undefined)
      column.at = { ...column.at, trial: column.binder.text };
  }
  const open = () =>
    [...columns.values()].filter(
      ({ kind, at, role, quantities }) =>
        kind === 'value' &&
        at.trial === undefined &&
        role === null &&
        quantities.length === 0 &&
        at.stockpile === undefined &&
        at.laboratory === undefined,
    );
  if (open().length < 2) return;
  for (const row of table.rows) {
    const first = row.cells.find((cell) => kinds.of(cell) === 'text');
    if (!first || !labels.read(first.text).quantities.includes('binder-content')) continue;
    const values = open().flatMap((column) => {
      const cell = index.cellAt(row.row, column.column);
      return cell && kinds.of(cell) === 'value' ? [{ column, cell }] : [];
    });
    if (new Set(values.map(({ cell }) => cell.text)).size < 2) continue;
    for (const { column, cell } of values) column.at = { ...column.at, trial: binderText(cell) };
    return;
  }
}

/**
 * Rows told apart by their binder content only, at steps that trials are made at: it names the trials. Contents
 * that differ by a few hundredths are results of one mix, and name nothing.
 */
function trialsByBinder(context: TableContext): ((row: TableRow, role: Role | null) => Conditions) | null {
  const { columns, table, far, kinds } = context;
  const all = [...columns.values()];
  const binder = all.find(
    ({ kind, quantities, role }) =>
      kind === 'value' && role === null && quantities.includes('binder-content'),
  );
  if (
    !binder ||
    far.trial !== undefined ||
    all.some(({ key, at }) => key === 'trial' || at.trial !== undefined)
  )
    return null;
  if (
    all.some(({ kind, quantities }) => kind === 'label' && quantities.length === 0) &&
    all.every(({ key }) => key === null)
  ) {
    const label = all.find(({ kind }) => kind === 'label');
    if (
      label &&
      table.rows.some(({ cells }) =>
        cells.some(
          (cell) =>
            cell.column === label.column &&
            kinds.of(cell) === 'text' &&
            context.labels.read(cell.text).role === null,
        ),
      )
    )
      return null;
  }
  const texts = new Map<string, number>();
  for (const { cells } of table.rows) {
    const cell = cells.find(({ column }) => column === binder.column);
    const value =
      cell && kinds.of(cell) === 'value'
        ? Number(plainText(cell.text).replace(',', '.').replace(/\s*%$/, ''))
        : Number.NaN;
    if (cell && Number.isFinite(value)) texts.set(binderText(cell), value);
  }
  const steps = [...texts.values()].sort((a, b) => a - b);
  // Specimens that each have their own content are results of one mix unless the steps are those of a design.
  const hasSpecimens = all.some(({ key }) => key === 'specimen') && steps.length >= table.rows.length - 1;
  const least = hasSpecimens ? 0.29 : 0.195;
  const isLadder =
    steps.length > 1 && steps.every((value, at) => at === 0 || value - (steps[at - 1] as number) > least);
  if (!isLadder) return null;
  let last: string | null = null;
  return ({ cells }, role) => {
    const cell = cells.find(({ column }) => column === binder.column);
    if (cell && role === null && kinds.of(cell) === 'value') last = binderText(cell);
    return last === null ? {} : { trial: last };
  };
}

function binderText(cell: Cell): string {
  return plainText(cell.text).replace(',', '.').replace(/\s*%$/, '');
}

/** Keys that are figures: words among them are lines of another kind. */
const figures: ReadonlySet<ConditionName> = new Set([
  'sieve',
  'time',
  'temperature',
  'passes',
  'frequency',
  'stress',
]);

/** In a list of properties a condition belongs to the test that it stands with. */
function keepScoped(
  row: TableRow,
  { key, meaning, cell }: { key: ConditionName; meaning: LabelMeaning; cell: Cell },
  context: TableContext,
): void {
  const { labels, decimal, table, columns, kinds, reading, index } = context;
  const understood = keyConditions(key, cell, {
    labels,
    unit: meaning.unit ?? unitBeside(row, context),
    decimal,
  });
  if (understood.state !== 'value') return;
  reading.log.use(placeOf(index.sheet, cell), 'read', `Key: ${key}.`);
  const outermost = [...columns.values()].find(({ kind }) => kind === 'label')?.column;
  const outer = table.rows
    .filter((each) => each.row <= row.row)
    .flatMap(({ cells }) => cells.filter((each) => each.column === outermost && kinds.of(each) === 'text'))
    .at(-1);
  const label = row.cells.find((each) => kinds.of(each) === 'text');
  context.scoped.push({ outer: outer && outer !== label ? outer.text : null, at: understood.value });
}

/** The families of tests that a list of properties holds: a condition without an owner fits one family only. */
function familiesIn({ table, kinds, labels }: TableContext): Set<string> {
  const families = new Set<string>();
  for (const { cells } of table.rows) {
    for (const cell of cells) {
      if (kinds.of(cell) !== 'text') continue;
      for (const id of labels.read(cell.text).quantities) {
        const family = familyOf(id);
        if (family) families.add(family);
      }
    }
  }
  return families;
}

function familyOf(id: string): string | null {
  if (/rut|stripping|passes-to|wheel/.test(id)) return 'rutting';
  if (/cracking|flexibility|fracture|post-peak|overlay|fatigue/.test(id)) return 'cracking';
  if (/^creep-(?:comp|strain)|deformation$/.test(id)) return 'creep';
  if (/modulus|phase-angle/.test(id)) return 'modulus';
  return /flow-number|viscosity|penetration|ductility|draindown/.test(id) ? id : null;
}

function scopedConditions(labels: LabelMeaning[], context: TableContext): Conditions {
  const found: Conditions = {};
  const outer = labels.length > 1 ? labels[0]?.text : null;
  for (const each of context.scoped) {
    const belongs = each.outer === null ? familiesIn(context).size <= 1 : each.outer === outer;
    if (belongs) Object.assign(found, each.at);
  }
  return found;
}

function titleOf(row: TableRow, { kinds, labels, columns }: TableContext): LabelMeaning | null {
  const [cell] = row.cells;
  if (row.cells.length !== 1 || !cell || kinds.of(cell) !== 'text') return null;
  const column = columns.get(cell.column);
  if (column?.kind === 'document') return null;
  return labels.read(cell.text);
}

function groupOf(meaning: LabelMeaning, before: Group): Group {
  const saysNothing =
    Object.keys(meaning.at).length === 0 && meaning.quantities.length === 0 && meaning.subset === null;
  if (saysNothing && meaning.unknown.length > 2) return before;
  return { at: farConditions(meaning), meaning, subset: meaning.subset };
}

/** "Trial 2 (5.0 %)" states that trial's binder content. */
function readHeadBinders(context: TableContext): void {
  const seen = new Set<Cell>();
  for (const { binder, at, column } of context.columns.values()) {
    if (!binder || seen.has(binder.cell)) continue;
    seen.add(binder.cell);
    const trial = at.trial ?? binder.text;
    context.candidates.push({
      ...bareCandidate(context, binder.cell),
      quantities: ['binder-content'],
      at: { trial, ...(at.laboratory ? { laboratory: at.laboratory } : {}) },
      unit: '%',
      heading: `head of column ${column}`,
      written: binder.text,
    });
  }
}

/** "Trial 1 – 4.5 % asphalt" over a table. */
function readTitleBinder(title: LabelMeaning, cell: Cell, context: TableContext): void {
  const { trial } = title.at;
  if (title.binder === null || trial === undefined || title.unknown.length > 1) return;
  context.candidates.push({
    ...bareCandidate(context, cell),
    quantities: ['binder-content'],
    at: { trial },
    unit: '%',
    heading: title.text,
    written: title.binder,
  });
}

export function bareCandidate(context: TableContext, cell: Cell): Candidate {
  return {
    index: context.index,
    cell,
    quantities: [],
    at: {},
    far: context.far,
    unit: null,
    unknownUnit: null,
    method: null,
    testedOn: null,
    isAverage: false,
    isHeaded: false,
    specimenOfRow: false,
    subset: context.tableSubset,
    onAggregate: false,
    onMix: false,
    domains: context.tableDomains,
    table: context.number,
    heading: '',
    written: null,
    conflict: null,
  };
}

interface LabelledRow {
  /** Labels that speak for a column: the nearest to its left. */
  labelsAt: (column: number) => LabelMeaning[];
  outer: { label: LabelMeaning; column: number } | null;
  documents: boolean;
}

function rowLabels(row: TableRow, context: TableContext, outer: LabelledRow['outer']): LabelledRow {
  const { columns, kinds, labels, index } = context;
  const found: { column: number; meaning: LabelMeaning }[] = [];
  for (const cell of row.cells) {
    if (columns.get(cell.column)?.kind !== 'label' || kinds.of(cell) !== 'text') continue;
    found.push({ column: cell.column, meaning: labels.read(cell.text) });
    context.reading.log.use(placeOf(index.sheet, cell), 'label', 'A label.');
  }
  const [first] = found;
  const labelColumns = [...columns.values()]
    .filter(({ kind }) => kind === 'label')
    .map(({ column }) => column);
  // Over several levels of labels the outer one is written once for the rows under it.
  const outermost = labelColumns[0];
  const hasLevels = labelColumns.length > 1 && labelColumns[1] === (outermost ?? 0) + 1;
  let above = outer;
  if (hasLevels && first && first.column === outermost)
    above = { label: first.meaning, column: first.column };
  return {
    outer: above,
    documents: row.cells.some((cell) => columns.get(cell.column)?.kind === 'document'),
    labelsAt: (column) => {
      const nearest = found.findLast((each) => each.column < column) ?? found.at(-1);
      if (!nearest) return hasLevels && above ? [above.label] : [];
      const beside = found.filter((each) => each.column === nearest.column - 1).map(({ meaning }) => meaning);
      const upper =
        hasLevels && above && beside.length === 0 && nearest.column !== above.column ? [above.label] : [];
      return [...upper, ...beside, nearest.meaning];
    },
  };
}

interface RowReading {
  facts: RowFacts;
  group: Group;
  labelsAt: (column: number) => LabelMeaning[];
}

function readRow(row: TableRow, { facts, group, labelsAt }: RowReading, context: TableContext): void {
  const { columns, kinds, reading, index } = context;
  for (const cell of row.cells) {
    const column = columns.get(cell.column);
    const place = placeOf(index.sheet, cell);
    if (!column || reading.log.isUsed(place)) continue;
    const kind = kinds.of(cell);
    if (kind === 'none' && !(column.kind === 'value' && saysOutcome(cell))) {
      reading.log.passOver(place, unreadReasons.noValue);
      continue;
    }
    if (kind === 'unit') {
      reading.log.use(place, 'label', 'A unit.');
      continue;
    }
    if (column.kind === 'aside' || column.kind === 'label') {
      passOver(
        cell,
        column.role
          ? roleReasons[column.role]
          : kind === 'text'
            ? unreadReasons.remark
            : unreadReasons.identifier,
        context,
      );
      continue;
    }
    if (column.kind !== 'value') continue;
    const labels = labelsAt(cell.column);
    readValue(
      cell,
      { column, facts, group, labels, unit: facts.unit ?? unitAfter(row, cell, context) },
      context,
    );
  }
}

/** "NP" and "none" are results of some tests and no lack of one. */
export function saysOutcome(cell: Cell): boolean {
  return /^(?:np|none|nil|non-?plastic)$/i.test(cell.text.trim());
}

function unitAfter(row: TableRow, cell: Cell, { kinds, labels, columns }: TableContext): string | null {
  const next = row.cells.find(({ column }) => column === cell.column + 1);
  if (!next || kinds.of(next) !== 'unit' || (columns.get(next.column)?.heads.length ?? 0) > 0) return null;
  return labels.read(`x (${plainText(next.text).replace(/[()[\]]/g, '')})`).unit;
}

interface ValueReading {
  column: TableColumn;
  facts: RowFacts;
  group: Group;
  labels: LabelMeaning[];
  unit: string | null;
}

function readValue(
  cell: Cell,
  { column, facts, group, labels, unit }: ValueReading,
  context: TableContext,
): void {
  const isText = context.kinds.of(cell) === 'text' || context.kinds.of(cell) === 'none';
  const label = labels.at(-1) ?? null;
  const role = facts.role ?? roleOf(labels) ?? column.role ?? group.meaning?.role ?? null;
  const attribute = label ? label.attribute : column.attribute;
  const namesNumber = (label?.quantities.length ?? 0) + column.quantities.length > 0;
  if (attribute && role === null && (isText || !namesNumber) && (isText || !label?.furniture)) {
    if (readAttributeCell(cell, { attribute, unit: unit ?? label?.unit ?? column.unit }, context)) return;
  }
  if (role !== null && role !== 'average') {
    passOver(cell, isText ? unreadReasons.remark : roleReasons[role], context);
    return;
  }
  const isOwnLine = facts.label !== null && facts.label.quantities.length > 0;
  const chosen = isOwnLine
    ? (facts.label?.quantities ?? null)
    : quantitiesOf({ column, group, labels }, context);
  if (chosen === null) {
    if (isText) {
      passOver(cell, unreadReasons.remark, context);
      return;
    }
    const isRaw = column.raw || labels.some(({ raw }) => raw);
    const isFurniture = labels.some(({ furniture }) => furniture);
    passOver(
      cell,
      isRaw ? unreadReasons.rawData : isFurniture ? unreadReasons.identifier : unreadReasons.notRecognised,
      context,
    );
    return;
  }
  const stands = Object.keys(facts.at).length > 0 && !column.weak && column.quantities.length > 0;
  const isMisplaced = stands && plainText(cell.text).length <= 12 && !/\s/.test(plainText(cell.text));
  if (isText && !/^\s*[<>≤≥]?\s*\d/.test(cell.text) && !saysOutcome(cell) && !isMisplaced) {
    passOver(cell, unreadReasons.remark, context);
    return;
  }
  if (facts.inDoubt) {
    passOver(cell, unreadReasons.keyInDoubt, context);
    return;
  }
  const at: Conditions = { ...group.at, ...scopedConditions(labels, context), ...column.at };
  for (const each of labels) Object.assign(at, each.at);
  Object.assign(
    at,
    facts.at,
    labels.some((each) => each.at.trial === 'design') && facts.at.trial === undefined
      ? { trial: 'design' }
      : {},
  );
  const nearest = label && label.quantities.length > 0 ? label : null;
  context.candidates.push({
    index: context.index,
    cell,
    quantities: chosen,
    at,
    far: context.far,
    unit:
      unit ??
      nearest?.unit ??
      (isOwnLine ? null : column.unit) ??
      group.meaning?.unit ??
      context.titles.findLast((title) => title.unit !== null)?.unit ??
      null,
    unknownUnit: nearest?.unknownUnit ?? column.unknownUnit,
    method: facts.method ?? label?.method ?? column.method ?? group.meaning?.method ?? null,
    testedOn: facts.testedOn,
    isAverage: role === 'average',
    isHeaded: context.table.headings.length > 0,
    specimenOfRow: facts.at.specimen !== undefined,
    subset:
      facts.subset ??
      labels.findLast(({ subset }) => subset !== null)?.subset ??
      column.subset ??
      group.subset ??
      context.tableSubset,
    onAggregate: column.onAggregate || labels.some((each) => each.onAggregate),
    onMix: column.onMix || labels.some((each) => each.onMix),
    domains: [
      ...labels.flatMap(({ domains }) => domains),
      ...column.domains,
      ...(group.meaning?.domains ?? []),
      ...context.tableDomains,
    ],
    table: context.number,
    heading: [
      ...column.heads.map(({ text }) => plainText(text)),
      ...labels.map(({ text }) => plainText(text)),
    ].join(' · '),
    written: null,
    conflict: null,
  });
}

function roleOf(labels: LabelMeaning[]): Role | null {
  return labels.findLast(({ role }) => role !== null)?.role ?? null;
}

const gradation = ['percent-passing', 'percent-retained', 'cumulative-percent-retained'];

/** The quantity that row, column, group and titles name between them; null where none does or two differ. */
function quantitiesOf(
  { column, group, labels }: Pick<ValueReading, 'column' | 'group' | 'labels'>,
  context: TableContext,
): string[] | null {
  const label = labels.findLast(({ quantities }) => quantities.length > 0) ?? null;
  if (column.raw || labels.at(-1)?.raw) return null;
  if (label && column.quantities.length > 0) {
    const both = label.quantities.filter((id) => column.quantities.includes(id));
    if (both.length > 0) return both;
    if (column.weak && !label.weak) return label.quantities;
    if (label.weak && !column.weak) return column.quantities;
    return null;
  }
  if (label) return label.quantities;
  if (column.quantities.length > 0) return column.quantities;
  const hasSieve = [...context.columns.values()].some(
    ({ key, at }) => key === 'sieve' || at.sieve !== undefined,
  );
  const over = [group.meaning, ...context.titles.toReversed()].find(
    (meaning) => meaning && meaning.quantities.length > 0 && !isMaterial(meaning.quantities),
  );
  if (hasSieve) {
    const told = over?.quantities.filter((id) => gradation.includes(id)) ?? [];
    if (told.length > 0) return told;
    return column.unit === null || column.unit === '%' ? gradation : null;
  }
  const isCross =
    Object.keys(column.at).length > 0 ||
    [...context.columns.values()].some(({ kind }) => kind === 'key') ||
    column.heads.length === 0;
  return over && isCross ? over.quantities : null;
}

function passOver(cell: Cell, reason: UnreadReason, { reading, index }: TableContext): void {
  reading.log.passOver(placeOf(index.sheet, cell), reason);
}

export function mark({ reading, index }: SheetContext, cell: Cell, words: string): void {
  reading.log.use(placeOf(index.sheet, cell), 'label', words);
}

function markHeading(context: TableContext, cell: Cell): void {
  const isValue = context.kinds.of(cell) === 'value';
  if (!isValue) {
    mark(context, cell, 'A heading.');
    return;
  }
  context.reading.log.use(placeOf(context.index.sheet, cell), 'read', 'Key: the head of a column.');
}
