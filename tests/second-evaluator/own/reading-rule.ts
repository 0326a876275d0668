import type { Reading } from '#rules/record';
import type { ReadingMeasure } from '#rules/rule-sets/measure';
import type { Rule } from '#rules/rule-sets/schema';
import { isWithinDigits, OF_BLEND, ofStockpiles } from './blend';
import { CONDITIONS } from './conditions';
import { type Exact, exact } from './exact';
import { one } from './interval';
import { type Judgement, judged, type Measures, measuresOf, precisionOf } from './judged';
import { knownOf } from './known';
import { limitsOf, type Place } from './limits';
import { haveUnits, type Value, valuesOf } from './quantity-value';
import { select } from './selection';
import { statisticOf } from './statistic-of';
import { subjectOf } from './subject';
import { designVoids, hasVoidsOfTests } from './trial-voids';
import { countingReadings } from './where';
import { type Verdict, type World, without } from './world';

export type ReadingRule = Rule & { measure: ReadingMeasure };
type At = ReadingMeasure['at'];

/** One finding a stockpile or sieve where the rule asks for each, else one. */
export function readingVerdicts(world: World, rule: ReadingRule): Verdict[] {
  const { at, quantity } = rule.measure;
  let places: At[] = [at];
  if (at.stockpile === 'each') {
    const names = statedOf(world, quantity, at, 'stockpile');
    if (names.length > 0) places = names.map((name) => ({ ...at, stockpile: String(name) }));
  } else if (knownOf(quantity).bySieve && at.sieve === undefined) {
    const sieves = statedOf(world, quantity, at, 'sieve');
    if (sieves.length > 0) places = sieves.map((sieve) => ({ ...at, sieve: Number(sieve) }));
  }
  return places.map((place) => {
    const subject = subjectOf(quantity, place);
    return { rule: rule.id, subject, ...judgeReadings(world, rule, place) };
  });
}

function statedOf(world: World, quantity: string, wanted: At, name: 'stockpile' | 'sieve') {
  const found = new Set<string | number>();
  for (const reading of world.record.readings) {
    const value = reading.at[name];
    if (reading.quantity !== quantity || value === undefined) continue;
    if ((reading.at.laboratory ?? 'contractor') !== (wanted.laboratory ?? 'contractor')) continue;
    found.add(value);
  }
  return [...found];
}

function judgeReadings(world: World, rule: ReadingRule, at: At): Judgement {
  const { measure } = rule;
  const ofOthers = judgeComputed(world, rule, at);
  if (ofOthers !== null) return ofOthers;
  const chosen = select(world, measure.quantity, at);
  if (chosen.is !== 'readings') return without(chosen.is === 'missing' ? 'not shown' : 'undecided');
  if (!haveUnits(measure.quantity, chosen.readings)) return without('undecided');
  const counting = countingReadings(world, chosen.readings, measure.where ?? []);
  if (counting === null) return without('undecided');
  if (counting.length === 0) return without('not shown');
  const isShort = counting.length < (measure.minimumCount ?? 1);
  if (rule.limit.present) return without(isShort ? 'undecided' : 'pass');
  const place = { world, sieve: at.sieve, unit: unitOf(measure) };
  const measures = measuresOf(place, rule);
  if (measures.is !== 'resolved') return without(measures.is);
  if (isShort) return without('undecided');
  return judgeNumbers(place, rule, counting, measures.value);
}

/** Of what follows from other readings: null where it does not, or where the stated value counts. */
function judgeComputed(world: World, rule: ReadingRule, at: At): Judgement | null {
  const { quantity } = rule.measure;
  if (quantity === 'air-voids') {
    const voids = designVoids(world);
    if (voids === null) {
      const isOfTests = select(world, quantity, at).is === 'missing' && hasVoidsOfTests(world);
      return isOfTests ? without('undecided') : null;
    }
    const specimens = voids.specimens.length > 0 ? voids.specimens : [voids.mean];
    return judgeValues(world, rule, specimens, voids);
  }
  if (!OF_BLEND.includes(quantity) || at.stockpile !== undefined) return null;
  const computed = ofStockpiles(world, quantity);
  if (computed === null) return null;
  // What is computed states none of the conditions that a rule names.
  if (CONDITIONS.some((name) => at[name] !== undefined)) {
    return select(world, quantity, at).is === 'missing' ? without('undecided') : null;
  }
  const judgement = judgeValues(world, rule, [computed], { count: 1, isInterpolated: false });
  const stated = world.record.readings.find(
    (reading) => reading.quantity === quantity && reading.at.stockpile === undefined,
  );
  if (stated?.value == null) return judgement;
  if (isWithinDigits(world, quantity, stated.value)) return null;
  // Neither stands where the two part.
  const asStated = judgeValues(world, rule, [exact(stated.value)], { count: 1, isInterpolated: false });
  return asStated.outcome === judgement.outcome ? judgement : without('undecided');
}

function judgeValues(
  world: World,
  rule: ReadingRule,
  numbers: Exact[],
  { count, isInterpolated }: { count: number; isInterpolated: boolean },
): Judgement {
  const { measure } = rule;
  const isShort = count < (measure.minimumCount ?? 1);
  const place = { world, unit: unitOf(measure) };
  const measures = measuresOf(place, rule);
  if (measures.is !== 'resolved') return without(measures.is);
  if (isShort) return without('undecided');
  const values = numbers.map((number): Value => ({ allowed: one(number), isWord: false }));
  if (measure.statistic === 'count')
    return judged(one(exact(count)), measures.value, precisionOf(rule, undefined, 1));
  // Of a value between trials nothing is known of single specimens.
  const knowsSingles = !isInterpolated && numbers.length === count;
  if (!knowsSingles && measure.statistic !== 'mean') return without('undecided');
  const { unit, deviation } = knownOf(measure.quantity);
  if (knowsSingles) return judgeAll(place, rule, values, measures.value, unit);
  const main = judged(values[0]!.allowed, measures.value, precisionOf(rule, deviation, count));
  return measure.alsoEach === undefined || main.outcome === 'fail' ? main : without('undecided');
}

function judgeNumbers(place: Place, rule: ReadingRule, readings: Reading[], measures: Measures): Judgement {
  const { measure } = rule;
  const own = knownOf(measure.quantity).unit;
  const movesToLimit = measure.statistic !== 'count' && measure.statistic !== 'percent-within-limits';
  const unit = movesToLimit ? (measures.limits.unit ?? own) : own;
  const values = valuesOf(measure.quantity, readings, unit, measures.limits.min !== null);
  if (values.is !== 'values') return without('undecided');
  return judgeAll(place, rule, values.values, measures, unit, (hasMin) =>
    valuesOf(measure.quantity, readings, unit, hasMin),
  );
}

/** The statistic, and each single value where the rule asks for it. */
function judgeAll(
  place: Place,
  rule: ReadingRule,
  values: Value[],
  measures: Measures,
  unit: string,
  singlesBy: (hasMin: boolean) => ReturnType<typeof valuesOf> = () => ({ is: 'values', values }),
): Judgement {
  const { measure } = rule;
  const own = knownOf(measure.quantity).unit;
  const main = judgeStatistic(place, rule, values, measures, unit);
  if (measure.alsoEach === undefined || main.outcome === 'fail') return main;
  if (main.outcome !== 'pass' && main.outcome !== 'undecided') return main;
  const also = limitsOf({ ...place, unit: own }, measure.alsoEach);
  if (also.is === 'not applicable') return main;
  if (also.is !== 'resolved') return without(also.is);
  const limits = inUnitOf(place, measure, unit);
  if (limits === null) return without('undecided');
  // What none stands for depends on the ends that single values are held to.
  const singles = singlesBy(limits.min !== null);
  return singles.is === 'values' ? withEach(main, singles.values, { ...measures, limits }) : main;
}

/** The ends of `alsoEach` in the unit that the values stand in. */
function inUnitOf(place: Place, measure: ReadingMeasure, unit: string): Measures['limits'] | null {
  const own = knownOf(measure.quantity).unit;
  const limits = limitsOf({ ...place, unit: own }, measure.alsoEach ?? {});
  if (limits.is !== 'resolved') return null;
  return limits.value.unit === unit || own === unit ? limits.value : null;
}

function unitOf(measure: ReadingMeasure): string | null {
  if (measure.statistic === 'count') return null;
  return measure.statistic === 'percent-within-limits' ? '%' : knownOf(measure.quantity).unit;
}

function judgeStatistic(
  place: Place,
  rule: ReadingRule,
  values: Value[],
  measures: Measures,
  unit: string,
): Judgement {
  const { statistic, quantity, within: stated } = rule.measure;
  const known = knownOf(quantity);
  const isOfResults = ['mean', 'each', 'min', 'max'].includes(statistic) && unit === known.unit;
  const precision = precisionOf(
    rule,
    isOfResults ? known.deviation : undefined,
    statistic === 'mean' ? values.length : 1,
  );
  if (statistic === 'each') {
    return worst(values.map(({ allowed, isWord }) => shown(judged(allowed, measures, precision), isWord)));
  }
  const within = stated === undefined ? null : limitsOf({ ...place, unit: known.unit }, stated);
  if (within !== null && within.is !== 'resolved') return without(within.is);
  const value = statisticOf(values, statistic, within?.value ?? null);
  if (value === null) return without('undecided');
  return shown(
    judged(value, measures, precision),
    statistic !== 'count' && values.some(({ isWord }) => isWord),
  );
}

function shown(judgement: Judgement, isWord: boolean): Judgement {
  return isWord ? { ...judgement, figuresAreLaidDown: false } : judgement;
}

/** A fail of one is a fail of all; else one that is undecided leaves all so. The smallest margin is shown. */
function worst(judgements: Judgement[]): Judgement {
  const outcomes = judgements.map(({ outcome }) => outcome);
  const outcome = outcomes.includes('fail') ? 'fail' : outcomes.includes('undecided') ? 'undecided' : 'pass';
  const areLaidDown = judgements.every(({ figuresAreLaidDown }) => figuresAreLaidDown);
  let found: Judgement | null = null;
  for (const each of judgements) {
    if (each.outcome !== outcome) continue;
    if (found === null || (each.margin ?? 0) < (found.margin ?? 0)) found = each;
  }
  return { ...found!, figuresAreLaidDown: areLaidDown };
}

/** Each single value must also be inside, rounded as the rule rounds. */
function withEach(main: Judgement, values: Value[], measures: Measures): Judgement {
  const singles = worst(values.map(({ allowed }) => judged(allowed, measures, null)));
  if (singles.outcome === 'pass') return main;
  return { ...main, outcome: singles.outcome, figuresAreLaidDown: false };
}
