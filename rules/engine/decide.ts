import { Engine, Rule, type TopLevelCondition } from 'json-rules-engine';
import type { Scalar } from '../rule-sets/attribute';
import { sameValue } from '../rule-sets/match-value';
import type { Comparison, Condition } from '../rule-sets/when';

/** What a condition compares. Only a clean value ever reaches an operator. */
export type Fact =
  | { kind: 'value'; value: Scalar }
  | { kind: 'missing'; reason: string; wouldDecide?: string | undefined }
  | { kind: 'doubtful'; reason: string; wouldDecide?: string | undefined };

export type Truth = 'true' | 'false' | 'unknown';

export interface LeafComparison {
  fact: string;
  operator: string;
  value: unknown;
  params?: unknown;
}

export type FactOf = (comparison: LeafComparison) => Fact;

/**
 * The three-valued truth of a condition (Kleene): its truth with every unknown fact counted true, and with
 * every unknown fact counted false, each the other way round under `not`. Where the two differ it is unknown.
 */
export function decide(condition: Condition | LimitCondition, factOf: FactOf): Truth {
  const parsed = parse(condition);
  let hasUnknown = false;
  const watched: FactOf = (comparison) => {
    const fact = factOf(comparison);
    if (fact.kind !== 'value') hasUnknown = true;
    return fact;
  };
  const atBest = holds(parsed, watched, true);
  // A walk that met no unknown fact goes the same way whatever unknown facts count as.
  if (!hasUnknown) return atBest ? 'true' : 'false';
  const atWorst = holds(parsed, factOf, false);
  return atBest === atWorst ? (atBest ? 'true' : 'false') : 'unknown';
}

/** A limit as a condition on the judged value. */
export interface LimitCondition {
  all: { fact: 'judged'; operator: LimitOperator; value: unknown }[];
}

/** Being among allowed values, as a condition; the rules engine reads each list once. */
export function listCondition(allowed: readonly Scalar[]): LimitCondition {
  const key = JSON.stringify(allowed);
  const kept = lists.get(key);
  if (kept) return kept;
  const condition: LimitCondition = { all: [{ fact: 'judged', operator: 'oneOf', value: allowed }] };
  if (lists.size >= KEPT_LISTS) lists.clear();
  lists.set(key, condition);
  return condition;
}

const KEPT_LISTS = 500;
const lists = new Map<string, LimitCondition>();

export type LimitOperator = 'atLeast' | 'moreThan' | 'atMost' | 'lessThan' | 'oneOf';

/** Whether a clean value satisfies every comparison of a limit. */
export function satisfies(limit: LimitCondition, value: Scalar): boolean {
  return decide(limit, () => ({ kind: 'value', value })) === 'true';
}

declare module 'json-rules-engine' {
  interface Engine {
    /** The library's own registry of operators. */
    operators: { get(name: string): { evaluate(fact: unknown, value: unknown): boolean } | null };
  }
}

/*
 * The library parses the conditions and its operators, ours added to its registry, make every comparison. Only
 * its run() is not used: it returns a promise, and the same check has to run synchronously in server, worker,
 * browser and command line. A test holds that run() and this walk agree wherever all facts are known.
 */
const engine = new Engine([], { allowUndefinedFacts: false });

addOperators(engine);

/** Registers the operators of rule sets and limits; the test of agreement with run() uses it too. */
export function addOperators(target: Engine): void {
  target.addOperator<Scalar, Scalar>('equal', (fact, value) => sameValue(fact, value));
  target.addOperator<Scalar, Scalar>('notEqual', (fact, value) => !sameValue(fact, value));
  target.addOperator<Scalar, Scalar[]>('in', (fact, values) =>
    values.some((value) => sameValue(fact, value)),
  );
  target.addOperator<Scalar, Scalar[]>(
    'notIn',
    (fact, values) => !values.some((value) => sameValue(fact, value)),
  );
  target.addOperator<Scalar, Scalar[]>('oneOf', (fact, values) =>
    values.some((value) => sameValue(fact, value)),
  );
  target.addOperator<Scalar, Scalar>('lessThan', (fact, value) => order(fact, value) < 0);
  target.addOperator<Scalar, Scalar>('lessThanInclusive', (fact, value) => order(fact, value) <= 0);
  target.addOperator<Scalar, Scalar>('greaterThan', (fact, value) => order(fact, value) > 0);
  target.addOperator<Scalar, Scalar>('greaterThanInclusive', (fact, value) => order(fact, value) >= 0);
  target.addOperator<Scalar, Scalar>('atLeast', (fact, value) => order(fact, value) >= 0);
  target.addOperator<Scalar, Scalar>('moreThan', (fact, value) => order(fact, value) > 0);
  target.addOperator<Scalar, Scalar>('atMost', (fact, value) => order(fact, value) <= 0);
}

const parsedConditions = new WeakMap<object, TopLevelCondition>();

function parse(condition: Condition | LimitCondition): TopLevelCondition {
  const kept = parsedConditions.get(condition);
  if (kept) return kept;
  const isGroup = 'all' in condition || 'any' in condition || 'not' in condition;
  // The library wants all, any or not at the root.
  const root = (isGroup ? condition : { all: [condition as Comparison] }) as TopLevelCondition;
  const parsed = new Rule({ conditions: root, event: { type: 'holds' } }).conditions;
  parsedConditions.set(condition, parsed);
  return parsed;
}

function holds(condition: TopLevelCondition | LeafComparison, factOf: FactOf, unknownAs: boolean): boolean {
  if ('all' in condition) return condition.all.every((each) => holds(each, factOf, unknownAs));
  if ('any' in condition) return condition.any.some((each) => holds(each, factOf, unknownAs));
  if ('not' in condition) return !holds(condition.not, factOf, !unknownAs);
  if (!('fact' in condition)) throw new Error('A condition is neither a group nor a comparison.');
  const fact = factOf(condition);
  if (fact.kind !== 'value') return unknownAs;
  const operator = engine.operators.get(condition.operator);
  if (operator === null) throw new Error(`The operator ${condition.operator} is not known.`);
  return operator.evaluate(fact.value, condition.value);
}

/** Numbers by size, ISO dates by calendar; anything else has no order and is a defect of the caller. */
function order(left: Scalar, right: Scalar): number {
  if (typeof left === 'number' && typeof right === 'number') {
    if (!Number.isFinite(left) || !Number.isFinite(right))
      throw new Error('A comparison met no finite number.');
    return left - right;
  }
  if (typeof left === 'string' && typeof right === 'string' && isDate(left) && isDate(right)) {
    return left < right ? -1 : left > right ? 1 : 0;
  }
  throw new Error(`${JSON.stringify(left)} and ${JSON.stringify(right)} cannot be put in order.`);
}

function isDate(text: string): boolean {
  return /^\d{4}-\d{2}-\d{2}$/.test(text);
}
