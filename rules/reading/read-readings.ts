import type { Quantity } from '../quantities/quantity';
import { convert, normaliseUnit } from '../quantities/units';
import type { Conditions, Reading } from '../record';
import type { Cell } from './cell-grid';
import { isReference } from './mapping';
import { keyCells, keysOf, type RuleAtAnchor } from './read-rule';
import { type Place, placeOf, type ReadingContext } from './reading-log';
import { rowRole } from './row-role';
import { doubtOf } from './settled';
import { readingInWords } from './take-words';
import { type NumberValue, understandNumber } from './understand-number';
import { unreadReasons } from './unread-reason';

export type FindQuantity = (name: string) => Quantity | undefined;

/** Reads every value cell of one anchored rule whose values are quantities. */
export function readValues(
  bound: RuleAtAnchor,
  cells: Cell[],
  findQuantity: FindQuantity,
  context: ReadingContext,
): void {
  const fractions = fractionColumns(cells);
  for (const cell of cells) {
    const quantity = quantityOf(bound, cell, findQuantity, context);
    if (quantity) readValue(bound, cell, { quantity, inFractions: fractions.has(cell.column) }, context);
  }
}

/**
 * Columns whose values all lie between 0 and 1: a gradation written that way is in fractions of one, since what
 * passes the coarsest sieve is the whole.
 */
function fractionColumns(cells: Cell[]): Set<number> {
  const columns = new Map<number, number[]>();
  for (const cell of cells) {
    if (cell.kind === 'number')
      columns.set(cell.column, [...(columns.get(cell.column) ?? []), Number(cell.value)]);
  }
  const inFractions = [...columns].filter(
    ([, values]) => values.length >= 3 && Math.max(...values) === 1 && Math.min(...values) >= 0,
  );
  return new Set(inFractions.map(([column]) => column));
}

function readValue(
  bound: RuleAtAnchor,
  cell: Cell,
  { quantity, inFractions }: { quantity: Quantity; inFractions: boolean },
  context: ReadingContext,
): void {
  const { index } = bound;
  const { log } = context;
  const place = placeOf(index.sheet, cell);
  const role = rowRole(keyCells(bound, cell).map(({ text }) => text));
  if (role === 'spread' || (role === 'average' && quantity.kind === 'measured')) {
    log.passOver(place, role === 'spread' ? unreadReasons.spread : unreadReasons.average);
    for (const key of keyCells(bound, cell))
      log.use(placeOf(index.sheet, key), 'label', 'A row of averages or spreads.');
    return;
  }
  const understood = understandNumber(cell, {
    ...expectation(bound, cell, quantity),
    inFractions: inFractions && quantity.id === 'percent-passing',
  });
  if (understood.state === 'blank') return;
  if (understood.state === 'none') {
    log.passOver(place, unreadReasons.noValue);
    return;
  }
  const keys = keysOf(bound, cell, context);
  if (keys.state !== 'known') {
    log.passOver(place, keys.state === 'left out' ? unreadReasons.leftOut : unreadReasons.keyInDoubt);
    return;
  }
  const at = conditionsFor(keys.at, quantity, role === 'average');
  const build = (value: NumberValue) => readingOf(quantity, value, at, keys, place);
  const settled = log.settle(place, understood, { quantity: quantity.id, at }, (value) => ({
    reading: build(value),
  }));
  if (settled.state === 'left out') log.passOver(place, unreadReasons.leftOut);
  if (settled.state !== 'value') return;
  const reading = build(settled.value);
  const hidden = index.isHidden(cell) ? ' · hidden in the workbook' : '';
  const elsewhere =
    cell.formula !== null && /\[\d+\]|\[[^\]]+\.xls/i.test(cell.formula) ? ' · from another workbook' : '';
  const remark = cell.comment === null ? '' : ` · remark: ${cell.comment}`;
  log.readings.push({
    reading,
    place,
    taken: `${readingInWords(reading, quantity)}${hidden}${elsewhere}${remark}`,
  });
}

/** A binder content is set for a trial, so it is no specimen's own; an average has no specimen. */
function conditionsFor(at: Conditions, quantity: Quantity, isAverage: boolean): Conditions {
  const belongsToTrial =
    quantity.id === 'binder-content' && at.trial !== undefined && at.laboratory !== 'agency';
  if (!isAverage && !belongsToTrial) return at;
  const { specimen: _, ...rest } = at;
  return rest;
}

function readingOf(
  quantity: Quantity,
  value: NumberValue,
  at: Conditions,
  keys: { method: string | null; testedOn: string | null },
  place: Place,
): Reading {
  const stated = quantity.kind === 'derived' ? 'reported' : 'measured';
  return {
    quantity: quantity.id,
    value: value.value,
    ...(value.qualifier ? { qualifier: value.qualifier } : {}),
    unit: quantity.unit,
    at,
    ...(keys.method ? { method: keys.method } : {}),
    origin: value.converted ? 'converted' : stated,
    ...(keys.testedOn ? { testedOn: keys.testedOn } : {}),
    source: place,
  };
}

function expectation(bound: RuleAtAnchor, cell: Cell, quantity: Quantity) {
  const { rule, anchor, locators } = bound;
  const decimal = rule.decimal ?? '.';
  if (isReference(rule.unit)) {
    const stated = locators.get('unit')?.cellFor(cell)?.text.trim() ?? '';
    const unit = stated === '' ? null : normaliseUnit(stated);
    return { quantity, decimal, unit, unknownUnit: stated !== '' && unit === null ? stated : null };
  }
  // The sheet's own header wins over the mapping: a laboratory may change a column's unit.
  const headerUnit = anchor.unit;
  const fits = headerUnit !== null && convert(1, headerUnit, quantity.unit).ok;
  return { quantity, decimal, unit: fits ? headerUnit : rule.unit, unknownUnit: anchor.unknownUnit };
}

function quantityOf(
  bound: RuleAtAnchor,
  cell: Cell,
  findQuantity: FindQuantity,
  context: ReadingContext,
): Quantity | null {
  const { rule, index, locators } = bound;
  if (!isReference(rule.quantity)) return findQuantity(rule.quantity) ?? null;
  const nameCell = locators.get('quantity')?.cellFor(cell) ?? null;
  const place = placeOf(index.sheet, nameCell ?? cell);
  const found = nameCell ? findQuantity(nameCell.text) : undefined;
  if (found) {
    context.log.use(place, 'read', `Quantity: ${found.label}.`);
    return found;
  }
  const reason = nameCell
    ? `says "${nameCell.text}", which names no known quantity`
    : 'has no quantity named beside it';
  const settled = context.log.settle<string>(place, doubtOf(reason), {}, () => ({}));
  if (nameCell) {
    const why = settled.state === 'left out' ? unreadReasons.leftOut : unreadReasons.keyInDoubt;
    context.log.passOver(placeOf(index.sheet, cell), why);
  } else if (settled.state === 'left out') context.log.passOver(place, unreadReasons.leftOut);
  return null;
}
