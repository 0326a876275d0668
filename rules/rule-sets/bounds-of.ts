import type { Bound, QuantityReference, TableReference, WrittenNumber } from './limit';
import type { Measure } from './measure';
import type { Rule } from './schema';

export interface PlacedBound {
  path: string;
  bound: Bound;
}

export function isWrittenNumber(bound: Bound): bound is WrittenNumber {
  return typeof bound === 'number' || typeof bound === 'string';
}

export function isTableReference(value: unknown): value is TableReference {
  return typeof value === 'object' && value !== null && 'table' in value;
}

export function isQuantityReference(value: unknown): value is QuantityReference {
  return typeof value === 'object' && value !== null && 'quantity' in value;
}

/** The number of a bound that is written in the rule itself, else null. */
export function literalOf(bound: Bound | undefined): WrittenNumber | null {
  if (bound === undefined) return null;
  if (isWrittenNumber(bound)) return bound;
  return 'value' in bound ? bound.value : null;
}

/** Every bound of a rule, of its limit and of its measure, with its place. */
export function boundsOf(rule: Rule): PlacedBound[] {
  const { min, max, target, tolerance } = rule.limit;
  return [
    ...ends('/limit', { min, max, target, tolerance }),
    ...intervalsOf(rule.measure).flatMap(({ path, interval }) => ends(path, interval)),
  ];
}

/** `where`, `alsoEach` and `within` of a measure. */
export function intervalsOf(
  measure: Measure,
): { path: string; interval: { min?: Bound | undefined; max?: Bound | undefined } }[] {
  const intervals = (measure.where ?? []).map((where, i) => ({
    path: `/measure/where/${i}`,
    interval: { min: where.min, max: where.max },
  }));
  if (measure.kind !== 'reading') return intervals;
  const { alsoEach, within } = measure;
  return [
    ...intervals,
    ...(alsoEach ? [{ path: '/measure/alsoEach', interval: alsoEach }] : []),
    ...(within ? [{ path: '/measure/within', interval: within }] : []),
  ];
}

function ends(path: string, bounds: Record<string, Bound | undefined>): PlacedBound[] {
  return Object.entries(bounds).flatMap(([name, bound]) =>
    bound === undefined ? [] : [{ path: `${path}/${name}`, bound }],
  );
}
