import type { Conditions } from '../../record';
import { type AttributeDefinition, attributeLabel, withStandardAttributes } from '../../rule-sets/attribute';
import type { Cell } from '../cell-grid';
import { plainText } from '../plain-text';
import { placeOf } from '../reading-log';
import { submittalFacts } from '../submittal-facts';
import { understandAttribute } from '../understand-attribute';
import { unreadReasons } from '../unread-reason';
import { bareCandidate } from './heading-candidates';
import { isHeading, type LabelMeaning } from './label-meaning';
import { keyConditions } from './name-conditions';
import { readDocumentPair } from './read-document-row';
import { roleReasons, saysOutcome } from './read-value';
import { readWritten } from './read-written';
import { splitResults } from './split-results';
import type { TableRow } from './table';
import { isConditionKey } from './table-column';
import { mark, type TableContext } from './table-context';
import { isRowLabel } from './table-rows';

/** A list of labels with what they say beside or under them; the label nearest to the left, else above, speaks. */
export function readPairs(context: TableContext): void {
  const { table, kinds, labels } = context;
  let above: Cell | null = table.titles.at(-1) ?? null;
  for (const row of table.rows) {
    const [only] = row.cells;
    if (row.cells.length === 1 && only && kinds.of(only) === 'text') {
      mark(context, only, 'A label.');
      if (readWritten(only, context)) continue;
      above = only;
      const meaning = labels.read(only.text);
      if (Object.keys(meaning.at).length > 0 || meaning.subset) {
        context.far = { ...context.far, ...meaning.at };
        context.tableSubset = meaning.subset ?? context.tableSubset;
      }
      continue;
    }
    readPairRow(row, above, context);
  }
}

interface PendingLabel {
  cell: Cell;
  meanings: LabelMeaning[];
  used: boolean;
}

function readPairRow(row: TableRow, above: Cell | null, context: TableContext): void {
  const { kinds, labels, reading, index } = context;
  let label: PendingLabel | null = null;
  if (above && kinds.of(row.cells[0] as Cell) !== 'text' && above.row === row.row - 1) {
    label = { cell: above, meanings: [labels.read(above.text)], used: false };
  }
  for (const [at, cell] of row.cells.entries()) {
    const kind = kinds.of(cell);
    const place = placeOf(index.sheet, cell);
    if (kind === 'none' && label && saysOutcome(cell)) {
      readPairValue(cell, label, null, context);
      label.used = true;
      continue;
    }
    if (kind === 'none') {
      reading.log.passOver(place, unreadReasons.noValue);
      if (label) label.used = true;
      continue;
    }
    if (kind === 'unit') {
      reading.log.use(place, 'label', 'A unit.');
      continue;
    }
    if (kind === 'text' && label && isStatedInWords(cell, label, context)) {
      readPairValue(cell, label, unitNear(row, at, context), context);
      label.used = true;
      continue;
    }
    if (kind === 'text') {
      label = readPairText(cell, label, { at, row }, context);
      continue;
    }
    readPairValue(cell, label, unitNear(row, at, context), context);
    if (label) label.used = true;
  }
}

/** "98/95", "4.1 ± 0.3", "about 4": a result that is more than a figure, beside the name of a quantity. */
function isStatedInWords(cell: Cell, label: PendingLabel, { labels }: TableContext): boolean {
  if (label.used || (label.meanings.at(-1)?.quantities.length ?? 0) === 0) return false;
  return (
    /^\s*(?:[<>≤≥~≈]|ca\.?|approx\.?|about)?\s*\d/i.test(cell.text) && !isHeading(labels.read(cell.text))
  );
}

/** A text is the answer to an open question, else a label of its own, else the rest of the label before it. */
function readPairText(
  cell: Cell,
  label: PendingLabel | null,
  { at, row }: { at: number; row: TableRow },
  context: TableContext,
): PendingLabel | null {
  const { labels, reading, index } = context;
  const place = placeOf(index.sheet, cell);
  const meaning = labels.read(cell.text);
  const open = label && !label.used ? label.meanings.at(-1) : null;
  if (open && label && open.document !== null) {
    readDocumentPair(label.cell, open.document, row, context);
    label.used = true;
    return label;
  }
  const ownsNext = row.cells[at + 1] !== undefined;
  const isQuestion =
    isRowLabel(meaning) && meaning.unknown.length === 0 && ownsNext && !answersItself(meaning);
  if (open && label) {
    if (open.attribute !== null && !(isQuestion && open.furniture)) {
      label.used = readAttributeCell(cell, { attribute: open.attribute, unit: open.unit }, context);
      if (label.used) return label;
    }
    if (setAmbient(cell, open, { unit: open.unit }, context)) {
      label.used = true;
      return label;
    }
    if (open.furniture && !isQuestion) {
      reading.log.passOver(place, unreadReasons.remark);
      label.used = true;
      return label;
    }
  }
  mark(context, cell, 'A label.');
  if (readWritten(cell, context)) return null;
  if (!isRowLabel(meaning) && label && !label.used) return label;
  if (!isRowLabel(meaning) && label?.used) {
    reading.log.passOver(place, unreadReasons.remark);
    return label;
  }
  const joins =
    label &&
    !label.used &&
    open &&
    open.quantities.length === 0 &&
    !open.furniture &&
    open.attribute === null;
  return { cell, meanings: joins && label ? [...label.meanings, meaning] : [meaning], used: false };
}

function answersItself(meaning: LabelMeaning): boolean {
  return (
    meaning.quantities.length === 0 &&
    meaning.attribute === null &&
    !meaning.furniture &&
    meaning.keys.length === 0
  );
}

function readPairValue(
  cell: Cell,
  label: PendingLabel | null,
  unit: string | null,
  context: TableContext,
): void {
  const { reading, index } = context;
  const place = placeOf(index.sheet, cell);
  const meaning = label?.meanings.at(-1);
  if (!label || !meaning) {
    reading.log.passOver(place, unreadReasons.notRecognised);
    return;
  }
  const role = label.meanings.findLast((each) => each.role !== null)?.role ?? null;
  if (meaning.raw) {
    reading.log.passOver(place, unreadReasons.rawData);
    return;
  }
  if (role !== null && role !== 'average') {
    reading.log.passOver(place, roleReasons[role]);
    return;
  }
  if (meaning.attribute !== null && (meaning.quantities.length === 0 || cell.kind === 'date')) {
    if (readAttributeCell(cell, { attribute: meaning.attribute, unit: unit ?? meaning.unit }, context))
      return;
  }
  if (meaning.document !== null) {
    const row = context.table.rows.find((each) => each.row === cell.row);
    if (row && readDocumentPair(label.cell, meaning.document, row, context)) return;
  }
  const named = label.meanings.findLast(({ quantities }) => quantities.length > 0);
  if (!named) {
    if (setAmbient(cell, meaning, { unit: unit ?? meaning.unit }, context)) return;
    reading.log.passOver(
      place,
      meaning.furniture || cell.kind === 'date' ? unreadReasons.identifier : unreadReasons.notRecognised,
    );
    return;
  }
  const at: Conditions = {};
  for (const each of label.meanings) Object.assign(at, each.at);
  const candidate = {
    ...bareCandidate(context, cell),
    quantities: named.quantities,
    at,
    unit: unit ?? named.unit,
    unknownUnit: named.unknownUnit,
    method: named.method,
    misspelt: named.misspelt,
    isAverage: role === 'average',
    subset: label.meanings.findLast(({ subset }) => subset !== null)?.subset ?? context.tableSubset,
    onAggregate: label.meanings.some((each) => each.onAggregate),
    onMix: label.meanings.some((each) => each.onMix),
    domains: [...label.meanings.flatMap(({ domains }) => domains), ...context.tableDomains],
    heading: label.meanings.map(({ text }) => plainText(text)).join(' · '),
  };
  context.candidates.push(...splitResults(candidate));
}

/** A unit in a cell of its own, between label and value or behind the value. */
function unitNear(row: TableRow, at: number, { kinds, labels }: TableContext): string | null {
  for (const cell of [row.cells[at + 1], row.cells[at - 1]]) {
    if (!cell || kinds.of(cell) !== 'unit') continue;
    return labels.read(`x (${plainText(cell.text).replace(/[()[\]]/g, '')})`).unit;
  }
  return null;
}

/** A line of label and value that is a condition speaks for what follows on its sheet. */
export function setAmbient(
  cell: Cell,
  meaning: LabelMeaning,
  { unit }: { unit: string | null },
  context: TableContext,
): boolean {
  if (meaning.quantities.length > 0 || meaning.unknown.length > 0) return false;
  const key = meaning.keys.find(isConditionKey);
  if (key === undefined || !ambientLabels[key]?.test(meaning.text)) return false;
  const { labels, decimal, reading, index } = context;
  if (plainText(cell.text).length > 24) return false;
  const understood = keyConditions(key, cell, { labels, unit, decimal });
  if (understood.state !== 'value' || Object.keys(understood.value).length === 0) return false;
  Object.assign(context.ambient, understood.value);
  context.far = { ...context.far, ...understood.value };
  reading.log.use(placeOf(index.sheet, cell), 'read', `Key: ${key}, for what follows.`);
  return true;
}

/** Names by which a line speaks for its sheet; "Mix" and "Sample" have too many other meanings. */
const ambientLabels: Partial<Record<string, RegExp>> = {
  temperature: /./,
  stress: /./,
  passes: /./,
  frequency: /./,
  trial: /trial|versuch|essai|ensayo|variante/i,
  blend: /blend/i,
  specimen: /specimen|probek|prüfk|prufk|[ée]prouvette|probeta|replicate/i,
};

export function readAttributeCell(
  cell: Cell,
  { attribute: name, unit }: { attribute: string; unit: string | null },
  context: TableContext,
): boolean {
  const { reading, index, edition } = context;
  const attribute: AttributeDefinition | undefined = [
    ...withStandardAttributes(edition.attributes),
    ...submittalFacts,
  ].find((each) => each.name === name);
  if (!attribute) return false;
  const place = placeOf(index.sheet, cell);
  const understood = understandAttribute(attribute, cell, unit, reading.grid.date1904);
  // A number that is none of the attribute's values may still be the quantity of that name.
  if (understood.state === 'doubt' && cell.kind === 'number' && attribute.type === 'text') return false;
  const build = (value: string | number | boolean) => ({
    value,
    ...(attribute.unit ? { unit: attribute.unit } : {}),
    origin: 'reported' as const,
    source: place,
  });
  const settled = reading.log.settle(place, understood, { attribute: name }, (value) => ({
    attribute: { name, value: build(value) },
  }));
  if (settled.state === 'none') reading.log.passOver(place, unreadReasons.noValue);
  if (settled.state === 'left out') reading.log.passOver(place, unreadReasons.leftOut);
  if (settled.state === 'value') {
    reading.log.use(place, 'read', `${attributeLabel(attribute)}: ${String(settled.value)}.`);
    reading.log.attributes.push({ name, value: build(settled.value), place });
  }
  return true;
}
