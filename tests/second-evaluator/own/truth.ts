import type { Comparison, Condition } from '#rules/rule-sets/when';
import { attributeFact, type Scalar, sameScalar } from './attribute';
import { compare, exact } from './exact';
import { type Allowed, isOne } from './interval';
import { meanAt } from './quantity-value';
import type { World } from './world';

/** Kleene's three values. */
export type Truth = 'true' | 'false' | 'unknown';

export function truthOf(world: World, condition: Condition | undefined): Truth {
  if (condition === undefined) return 'true';
  if ('not' in condition) return opposite(truthOf(world, condition.not));
  if ('all' in condition) {
    const parts = condition.all.map((part) => truthOf(world, part));
    return parts.includes('false') ? 'false' : parts.includes('unknown') ? 'unknown' : 'true';
  }
  if ('any' in condition) {
    const parts = condition.any.map((part) => truthOf(world, part));
    return parts.includes('true') ? 'true' : parts.includes('unknown') ? 'unknown' : 'false';
  }
  return compared(world, condition);
}

function opposite(truth: Truth): Truth {
  return truth === 'unknown' ? 'unknown' : truth === 'true' ? 'false' : 'true';
}

function compared(world: World, comparison: Comparison): Truth {
  if (comparison.params !== undefined) {
    const value = meanAt(world, comparison.params.quantity, comparison.params.at);
    return value.is === 'value' ? comparedAllowed(value.value, comparison) : 'unknown';
  }
  const fact = attributeFact(world, comparison.fact);
  return fact.is === 'value' ? asTruth(holds(fact.value, comparison)) : 'unknown';
}

/** A mean that is not one number is compared only where that number is known. */
function comparedAllowed(value: Allowed, comparison: Comparison): Truth {
  if (!isOne(value)) return 'unknown';
  const order = (other: Scalar) => compare(value.low, exact(Number(other)));
  return asTruth(decided(comparison, (other) => order(other) === 0, order));
}

function holds(value: Scalar, comparison: Comparison): boolean {
  const order = (other: Scalar) => (value < other ? -1 : value > other ? 1 : 0);
  return decided(comparison, (other) => sameScalar(value, other), order);
}

function decided(
  { operator, value }: Comparison,
  isSame: (other: Scalar) => boolean,
  order: (other: Scalar) => number,
): boolean {
  const list = Array.isArray(value) ? value : [value];
  const first = list[0]!;
  if (operator === 'equal' || operator === 'in') return list.some(isSame);
  if (operator === 'notEqual' || operator === 'notIn') return !list.some(isSame);
  if (operator === 'lessThan') return order(first) < 0;
  if (operator === 'lessThanInclusive') return order(first) <= 0;
  return operator === 'greaterThan' ? order(first) > 0 : order(first) >= 0;
}

function asTruth(value: boolean): Truth {
  return value ? 'true' : 'false';
}
