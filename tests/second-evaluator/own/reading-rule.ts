import type { Reading } from '#rules/record';
import type { ReadingMeasure } from '#rules/rule-sets/measure';
import type { Rule } from '#rules/rule-sets/schema';
import { type Exact, exact } from './exact';
import type { Allowed } from './interval';
import { type Judgement, judged, precisionOf } from './judged';
import { knownOf } from './known';
import { type Limits, limitsOf, stepFor } from './limits';
import { valuesOf } from './quantity-value';
import { select } from './selection';
import { statisticOf } from './statistic-of';
import { countingReadings } from './where';
import { type Verdict, type World, without } from './world';

type ReadingRule = Rule & { measure: ReadingMeasure };

/** One finding a stockpile or sieve where the rule asks for each, else one. */
export function readingVerdicts(world: World, rule: ReadingRule): Verdict[] {
  const { measure } = rule;
  const subjects: { subject: string; at: ReadingMeasure['at'] }[] = [];
  if (measure.at.stockpile === 'each') {
    for (const stockpile of stated(world, measure, 'stockpile')) {
      subjects.push({
        subject: `stockpile ${stockpile}`,
        at: { ...measure.at, stockpile: String(stockpile) },
      });
    }
  } else if (knownOf(measure.quantity).bySieve && measure.at.sieve === undefined) {
    for (const sieve of stated(world, measure, 'sieve')) {
      subjects.push({ subject: `${sieve} mm`, at: { ...measure.at, sieve: Number(sieve) } });
    }
  }
  if (subjects.length === 0)
    subjects.push({ subject: subjectOf(measure.quantity, measure.at), at: measure.at });
  return subjects.map(({ subject, at }) => ({ rule: rule.id, subject, ...judgeReadings(world, rule, at) }));
}

export function subjectOf(quantity: string, at: ReadingMeasure['at']): string {
  if (at.stockpile !== undefined && at.stockpile !== 'each') return `stockpile ${at.stockpile}`;
  if (at.sieve !== undefined) return `${at.sieve} mm`;
  const isDesign = at.trial === 'design' || (at.trial === undefined && knownOf(quantity).of === 'mix');
  return isDesign ? 'design point' : 'mix';
}

function stated(world: World, measure: ReadingMeasure, name: 'stockpile' | 'sieve'): Set<string | number> {
  const found = new Set<string | number>();
  for (const { quantity, at } of world.record.readings) {
    const value = at[name];
    const isAgency = at.laboratory === 'agency';
    if (
      quantity === measure.quantity &&
      value !== undefined &&
      isAgency === (measure.at.laboratory === 'agency')
    ) {
      found.add(value);
    }
  }
  return found;
}

function judgeReadings(world: World, rule: ReadingRule, at: ReadingMeasure['at']): Judgement {
  const { measure } = rule;
  const chosen = select(world, measure.quantity, at);
  if (chosen.is !== 'readings') return without(chosen.is === 'missing' ? 'not shown' : 'undecided');
  const counting = countingReadings(world, chosen.readings, measure.where ?? []);
  if (counting === null) return without('undecided');
  if (counting.length === 0) return without('not shown');
  if (counting.length < (measure.minimumCount ?? 1)) return without('undecided');
  if (rule.limit.present) return { ...without('pass'), figuresAreLaidDown: false };
  return judgeNumbers(world, rule, at, counting);
}

function judgeNumbers(
  world: World,
  rule: ReadingRule,
  at: ReadingMeasure['at'],
  readings: Reading[],
): Judgement {
  const { measure } = rule;
  const known = knownOf(measure.quantity);
  const place = { world, sieve: at.sieve, unit: unitOf(measure) };
  const limits = limitsOf(place, rule.limit);
  if (limits.is !== 'resolved') return without(limits.is === 'missing' ? 'not shown' : 'undecided');
  const step = stepFor(place, rule.rounding, limits.value);
  if (step === null) return without('undecided');
  const judging = { limits: limits.value, method: rule.rounding?.method ?? ('absolute' as const), step };
  if (measure.statistic === 'count') {
    const count = exact(readings.length);
    return judged({ low: count, high: count }, { ...judging, precision: precisionOf(rule, undefined, 1) });
  }
  const values = valuesOf(measure.quantity, readings);
  if (values.is !== 'values') return without('undecided');
  const inUnit = { ...place, unit: known.unit };
  const main = judgeStatistic(values.values, judging, rule, inUnit);
  if (measure.alsoEach === undefined || main === null) return main ?? without('undecided');
  const also = limitsOf(inUnit, measure.alsoEach);
  if (also.is !== 'resolved') return without(also.is === 'missing' ? 'not shown' : 'undecided');
  return withEach(main, values.values, also.value);
}

function unitOf(measure: ReadingMeasure): string | null {
  if (measure.statistic === 'count') return null;
  return measure.statistic === 'percent-within-limits' ? '%' : knownOf(measure.quantity).unit;
}

type Judging = Omit<Parameters<typeof judged>[1], 'precision'>;

function judgeStatistic(
  values: Allowed[],
  judging: Judging,
  rule: ReadingRule,
  place: Parameters<typeof limitsOf>[0],
): Judgement | null {
  const { measure } = rule;
  const { deviation } = knownOf(measure.quantity);
  if (measure.statistic === 'each') {
    return worst(
      values.map((value) => judged(value, { ...judging, precision: precisionOf(rule, deviation, 1) })),
    );
  }
  const within = measure.within === undefined ? null : limitsOf(place, measure.within);
  if (within !== null && within.is !== 'resolved') return null;
  const statistic = statisticOf(values, measure.statistic, within?.value ?? null);
  if (statistic === null) return null;
  const precision = precisionOf(rule, measure.statistic === 'mean' ? deviation : undefined, values.length);
  return judged(statistic, { ...judging, precision });
}

/** A fail of one is a fail of all; else one that is undecided leaves all so. The smallest margin is shown. */
function worst(judgements: Judgement[]): Judgement {
  const outcomes = judgements.map(({ outcome }) => outcome);
  const outcome = outcomes.includes('fail') ? 'fail' : outcomes.includes('undecided') ? 'undecided' : 'pass';
  let shown = judgements[0]!;
  for (const each of judgements) if ((each.margin ?? Infinity) < (shown.margin ?? Infinity)) shown = each;
  const areAllNumbers = judgements.every(({ figuresAreLaidDown }) => figuresAreLaidDown);
  return { ...shown, outcome, figuresAreLaidDown: areAllNumbers };
}

/** Each single value must also be inside, as it is: only the statistic is rounded. */
function withEach(main: Judgement, values: Allowed[], limits: Limits): Judgement {
  const judging = { limits, method: 'absolute' as const, step: NO_STEP, precision: null };
  const singles = worst(values.map((value) => judged(value, judging)));
  if (singles.outcome === 'pass' || main.outcome === 'fail') return main;
  if (singles.outcome === 'fail') return { ...main, outcome: 'fail', figuresAreLaidDown: false };
  return { ...main, outcome: 'undecided', figuresAreLaidDown: false };
}

const NO_STEP: Exact = exact(1);
