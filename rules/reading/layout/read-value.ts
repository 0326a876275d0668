import type { Conditions } from '../../record';
import type { Cell } from '../cell-grid';
import { plainText } from '../plain-text';
import { placeOf } from '../reading-log';
import { type UnreadReason, unreadReasons } from '../unread-reason';
import type { Role } from '../words/key-words';
import type { Candidate } from './candidate';
import type { LabelMeaning } from './label-meaning';
import { quantitiesOf } from './quantities-of';
import { readAttributeCell } from './read-pairs';
import { scopedConditions } from './scoped-conditions';
import { splitResults } from './split-results';
import type { TableColumn } from './table-column';
import type { TableContext } from './table-context';
import type { RowFacts } from './table-rows';

export function readValue(cell: Cell, reading: ValueReading, context: TableContext): void {
  const { column, facts, group, labels, unit } = reading;
  const isText = context.kinds.of(cell) === 'text' || context.kinds.of(cell) === 'none';
  const label = labels.at(-1) ?? null;
  const role = facts.role ?? roleOf(labels) ?? column.role ?? group.meaning?.role ?? null;
  const told = toldReading(cell, { role, inDoubt: facts.inDoubt }, context);
  if (told !== null) {
    pushCandidate(cell, { ...reading, chosen: [told], isAverage: role === 'average' }, context);
    return;
  }
  const attribute = label ? label.attribute : column.attribute;
  const namesNumber = (label?.quantities.length ?? 0) + column.quantities.length > 0;
  if (attribute && role === null && (isText || !namesNumber) && (isText || !label?.furniture)) {
    if (readAttributeCell(cell, { attribute, unit: unit ?? label?.unit ?? column.unit }, context)) return;
  }
  if (role !== null && role !== 'average') {
    passOver(cell, isText ? unreadReasons.remark : roleReasons[role], context);
    return;
  }
  const chosen = isOwnLine(facts)
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
  pushCandidate(cell, { ...reading, chosen, isAverage: role === 'average' }, context);
}

function isOwnLine({ label }: RowFacts): boolean {
  return label !== null && label.quantities.length > 0;
}

/**
 * The quantity that was said of a cell beforehand. A mapping means the results of its column: not its limits, and no
 * value of which it is not known whose it is.
 */
function toldReading(
  cell: Cell,
  { role, inDoubt }: { role: Role | null; inDoubt: boolean },
  { told, index }: TableContext,
): string | null {
  const of = told.at(index.sheet.name, cell);
  if (of?.says.kind !== 'reading') return null;
  const isMeant = of.by === 'correction' || role === null || role === 'average';
  const isKnown = !inDoubt || (of.by === 'correction' && Object.keys(of.says.at).length > 0);
  if (isMeant && isKnown) return of.says.quantity;
  told.forget(index.sheet.name, cell);
  return null;
}

function pushCandidate(
  cell: Cell,
  {
    column,
    facts,
    group,
    labels,
    unit,
    chosen,
    isAverage,
  }: ValueReading & { chosen: string[]; isAverage: boolean },
  context: TableContext,
): void {
  const label = labels.at(-1) ?? null;
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
  const candidate: Candidate = {
    index: context.index,
    cell,
    quantities: chosen,
    at,
    far: context.far,
    unit:
      unit ??
      nearest?.unit ??
      (isOwnLine(facts) ? null : column.unit) ??
      group.meaning?.unit ??
      context.titles.findLast((title) => title.unit !== null)?.unit ??
      null,
    unknownUnit: nearest?.unknownUnit ?? column.unknownUnit,
    method: facts.method ?? label?.method ?? column.method ?? group.meaning?.method ?? null,
    testedOn: facts.testedOn,
    isAverage,
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
    domains:
      labels.length === 0 && group.meaning === null
        ? column.allDomains
        : [
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
    misspelt: (label?.quantities.length ? label.misspelt : null) ?? column.misspelt,
  };
  context.candidates.push(...splitResults(candidate));
}

export interface ValueReading {
  column: TableColumn;
  facts: RowFacts;
  group: Group;
  labels: LabelMeaning[];
  unit: string | null;
}

/** What a title in the midst of a table says for the rows under it. */
export interface Group {
  at: Conditions;
  meaning: LabelMeaning | null;
  subset: 'dry' | 'conditioned' | null;
}

function roleOf(labels: LabelMeaning[]): Role | null {
  return labels.findLast(({ role }) => role !== null)?.role ?? null;
}

/** "NP" and "none" are results of some tests and no lack of one. */
export function saysOutcome(cell: Cell): boolean {
  return /^(?:np|none|nil|non-?plastic)$/i.test(cell.text.trim());
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

export function passOver(cell: Cell, reason: UnreadReason, { reading, index }: TableContext): void {
  reading.log.passOver(placeOf(index.sheet, cell), reason);
}
