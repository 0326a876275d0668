import type { AttributeDefinition, Scalar } from '../../rule-sets/attribute';
import type { EditionView } from '../../rule-sets/edition-view';
import { sameValue } from '../../rule-sets/match-value';
import { type Comparison, type Condition, comparisonsOf } from '../../rule-sets/when';

/** One mix as far as conditions can tell mixes apart: a value for each fact that they compare. */
export type Point = ReadonlyMap<string, Scalar>;

/** More mixes than this are not told apart: what would take longer to see is not said. */
const MOST_POINTS = 20_000;

/**
 * Mixes that stand for all others: for each fact its allowed values, else every compared value and one between and
 * beyond them. Null where there are too many.
 */
export function pointsOf(conditions: readonly Condition[], view: EditionView): Point[] | null {
  const comparisons = conditions.flatMap((each) => comparisonsOf(each).map(({ comparison }) => comparison));
  const names = [...new Set(comparisons.map(factName))];
  let points: Point[] = [new Map()];
  for (const name of names) {
    const own = comparisons.filter((comparison) => factName(comparison) === name);
    const values = valuesToTry(own, view.attribute(name));
    if (points.length * values.length > MOST_POINTS) return null;
    points = points.flatMap((point) => values.map((value) => new Map([...point, [name, value]])));
  }
  return points;
}

export function holds(condition: Condition, point: Point): boolean {
  if ('all' in condition) return condition.all.every((each) => holds(each, point));
  if ('any' in condition) return condition.any.some((each) => holds(each, point));
  if ('not' in condition) return !holds(condition.not, point);
  const value = point.get(factName(condition));
  return value !== undefined && compares(condition, value);
}

function factName({ fact, params }: Comparison): string {
  return params === undefined ? fact : `quantity ${JSON.stringify(params)}`;
}

function compares({ operator, value: given }: Comparison, value: Scalar): boolean {
  const list = [given].flat();
  const isAmong = list.some((each) => sameValue(each, value));
  switch (operator) {
    case 'equal':
    case 'in':
      return isAmong;
    case 'notEqual':
    case 'notIn':
      return !isAmong;
    case 'lessThan':
      return list.every((each) => value < each);
    case 'lessThanInclusive':
      return list.every((each) => value <= each);
    case 'greaterThan':
      return list.every((each) => value > each);
    case 'greaterThanInclusive':
      return list.every((each) => value >= each);
  }
}

function valuesToTry(
  comparisons: readonly Comparison[],
  attribute: AttributeDefinition | undefined,
): Scalar[] {
  const closed = attribute?.values?.map((entry) => (typeof entry === 'object' ? entry.value : entry));
  if (closed !== undefined) return closed;
  if (attribute?.type === 'boolean') return [true, false];
  const compared = comparisons.flatMap(({ value }) => [value].flat());
  const numbers = compared.filter((value) => typeof value === 'number');
  if (numbers.length === compared.length) return aroundNumbers(numbers);
  const texts = [...new Set(compared.map(String))].toSorted();
  // Something before, between and after them: dates have an order as well.
  return ['', ...texts.flatMap((text) => [text, `${text}~`])];
}

function aroundNumbers(numbers: readonly number[]): number[] {
  const sorted = [...new Set(numbers)].toSorted((a, b) => a - b);
  return sorted.flatMap((value, index) => {
    const next = sorted[index + 1];
    const after = next === undefined ? value + 1 : (value + next) / 2;
    return index === 0 ? [value - 1, value, after] : [value, after];
  });
}
