import type { ResolvedLimit } from '../engine/finding';
import { isTableReference, isWrittenNumber, literalOf } from './bounds-of';
import type { EditionView } from './edition-view';
import type { Bound, Limit } from './limit';
import type { TableCell } from './table';
import { andList, numberWords, orList, quantityPhrase, uncapitalised, unitSuffix, withUnit } from './words';

interface Interval {
  min?: Bound | undefined;
  max?: Bound | undefined;
  exclusive?: boolean | undefined;
}

/** The limit in general terms, naming its table: "at least the value in Minimum VMA by design traffic". */
export function generalLimitWords(limit: Limit, unit: string, view: EditionView): string {
  if (limit.present) return 'shown';
  if (limit.oneOf !== undefined) {
    return isTableReference(limit.oneOf)
      ? `as listed in ${tableWords(limit.oneOf.table, view)}`
      : oneOfWords(limit.oneOf.map(allowedWords));
  }
  if (limit.target !== undefined && limit.tolerance !== undefined) {
    const target = boundWords(limit.target, view);
    if (Number(literalOf(limit.tolerance) ?? Number.NaN) === 0) {
      return `exactly ${literalOf(limit.target) === null ? target : withUnit(target, unit)}`;
    }
    return `within ${withUnit(boundWords(limit.tolerance, view), unit)} of ${target}`;
  }
  return intervalWords(limit, unit, view);
}

/** "PG 64-22", and of several "one of PG 64-22 or PG 70-22". */
export function oneOfWords(allowed: readonly string[]): string {
  return allowed.length > 1 ? `one of ${orList(allowed)}` : orList(allowed);
}

/** "at least 14.0 %", "3.5 to 4.5 %", "within the limits in Control points by sieve". */
export function intervalWords(interval: Interval, unit: string, view: EditionView): string {
  const { min, max, exclusive } = interval;
  if (min !== undefined && max !== undefined) {
    if (isTableReference(min) && isTableReference(max) && min.table === max.table) {
      return `within the limits in ${tableWords(min.table, view)}`;
    }
    if (
      literalOf(min) !== null &&
      literalOf(max) !== null &&
      !isExclusive(min, interval) &&
      !isExclusive(max, interval)
    ) {
      return withUnit(`${boundWords(min, view)} to ${boundWords(max, view)}`, unit);
    }
    return `${intervalWords({ min, exclusive }, unit, view)} and ${intervalWords({ max, exclusive }, unit, view)}`;
  }
  const bound = min ?? max;
  if (bound === undefined) return 'without a limit';
  const comparison =
    min === undefined ? atMost(isExclusive(bound, interval)) : atLeast(isExclusive(bound, interval));
  return `${comparison} ${boundWords(bound, view)}${literalOf(bound) === null ? '' : unitSuffix(unit)}`;
}

/** The resolved limit after a value: "at least 14.0", "65 to 75", "4.0 ± 0.5". */
export function resolvedLimitWords(limit: ResolvedLimit): string {
  const { min, max, target, tolerance, oneOf, decimals } = limit;
  const number = (value: number) => numberWords(value, Math.max(decimals, shortDecimals(value)));
  if (oneOf !== null) return `allowed ${orList(oneOf)}`;
  if (target !== null && tolerance === 0) return `exactly ${number(target)}`;
  if (target !== null && tolerance !== null) return `${number(target)} ± ${number(tolerance)}`;
  if (min !== null && max !== null) {
    if (min === max && !limit.minExclusive && !limit.maxExclusive) return `exactly ${number(min)}`;
    if (!limit.minExclusive && !limit.maxExclusive) return `${number(min)} to ${number(max)}`;
    return `${atLeast(limit.minExclusive)} ${number(min)} and ${atMost(limit.maxExclusive)} ${number(max)}`;
  }
  if (min !== null) return `${atLeast(limit.minExclusive)} ${number(min)}`;
  if (max !== null) return `${atMost(limit.maxExclusive)} ${number(max)}`;
  return '';
}

/** An allowed value as it is read: "PG 64-22", "9.5", "yes". */
export function allowedWords(value: number | string | boolean): string {
  if (typeof value === 'number') return numberWords(value);
  return typeof value === 'boolean' ? (value ? 'yes' : 'no') : value;
}

/** "Minimum VMA by nominal maximum aggregate size" */
export function tableWords(id: string, view: EditionView): string {
  const keys = (view.table(id)?.keys ?? []).map((key) =>
    key === 'sieve' ? 'sieve' : uncapitalised(view.attributeLabel(key)),
  );
  return keys.length === 0 ? view.tableTitle(id) : `${view.tableTitle(id)} by ${andList(keys)}`;
}

/** A cell of a table as a reader sees it: "14.0 %", "3 to below 30", "no limit". */
export function cellWords(cell: TableCell | undefined, unit: string | undefined): string {
  if (cell === undefined || cell === null) return 'no limit';
  if (Array.isArray(cell)) return orList(cell);
  if (typeof cell === 'boolean') return cell ? 'yes' : 'no';
  if (typeof cell === 'object') return rangeWords(cell, unit);
  const isNumber = typeof cell === 'number' || /^-?\d+(\.\d+)?$/.test(cell);
  return isNumber ? withUnit(numberWords(cell), unit ?? '') : cell;
}

function rangeWords(range: { from?: number | undefined; below?: number | undefined }, unit = ''): string {
  const { from, below } = range;
  if (from === undefined && below === undefined) return 'any';
  if (from === undefined) return withUnit(`below ${numberWords(below ?? 0)}`, unit);
  if (below === undefined) return withUnit(`${numberWords(from)} and more`, unit);
  return withUnit(`${numberWords(from)} to below ${numberWords(below)}`, unit);
}

function boundWords(bound: Bound, view: EditionView): string {
  if (isWrittenNumber(bound)) return numberWords(bound);
  if ('value' in bound) return numberWords(bound.value);
  if ('table' in bound) return `the value in ${tableWords(bound.table, view)}`;
  const quantity = view.quantity(bound.quantity);
  const phrase = quantity ? quantityPhrase(quantity, bound.at) : bound.quantity;
  const plus = Number(bound.plus);
  if (plus === 0) return `the ${phrase}`;
  const amount = numberWords(String(bound.plus).replace('-', ''));
  return `the ${phrase} ${plus < 0 ? 'less' : 'plus'} ${withUnit(amount, quantity?.unit ?? '')}`;
}

function isExclusive(bound: Bound, interval: Interval): boolean {
  const own = typeof bound === 'object' ? bound.exclusive : undefined;
  return own ?? interval.exclusive ?? false;
}

function atLeast(exclusive: boolean): string {
  return exclusive ? 'more than' : 'at least';
}

function atMost(exclusive: boolean): string {
  return exclusive ? 'less than' : 'at most';
}

/** Decimals that a resolved number needs beyond those of its limit, so that 0.25 is never shown as 0.2. */
function shortDecimals(value: number): number {
  return Math.min(6, (String(value).split('.')[1] ?? '').length);
}
