import type { GradationMeasure } from '#rules/rule-sets/measure';
import type { Rule } from '#rules/rule-sets/schema';
import { meanOf, one } from './interval';
import { type Judgement, judged, measuresOf, precisionOf } from './judged';
import { haveUnits, valuesOf } from './quantity-value';
import { passingFromRetained, RETAINED } from './retained';
import { select } from './selection';
import { covers, keyValue, tableOf } from './table';
import { countingReadings } from './where';
import { type Verdict, type World, without } from './world';

const PASSING = 'percent-passing';
const GRADATIONS = [PASSING, ...RETAINED];

export type GradationRule = Rule & { measure: GradationMeasure };

/** One finding a sieve of the table's rows for this mix; one alone where there is no gradation or no row. */
export function gradationVerdicts(world: World, rule: GradationRule): Verdict[] {
  const alone = (outcome: Verdict['outcome']): Verdict[] => [
    { rule: rule.id, subject: wholeGradation(rule.measure), ...without(outcome) },
  ];
  const { readings, doubts } = world.record;
  const hasAny =
    readings.some(({ quantity }) => GRADATIONS.includes(quantity)) ||
    doubts.some(({ about }) => GRADATIONS.includes(about.quantity ?? ''));
  if (!hasAny) return alone('not shown');
  const sieves = sievesOf(world, rule.measure.table);
  if (sieves.length === 0) return alone('undecided');
  return sieves.map((sieve) => ({
    rule: rule.id,
    subject: `${sieve} mm`,
    ...judgeSieve(world, rule, sieve),
  }));
}

export function wholeGradation({ at }: GradationMeasure): string {
  return (at.trial ?? 'design') === 'design' ? 'design point' : 'mix';
}

function sievesOf(world: World, tableId: string): number[] {
  const table = tableOf(world, tableId);
  const sieves = new Set<number>();
  for (const row of table.rows) {
    let matches = true;
    for (const key of table.keys) {
      if (key === 'sieve') continue;
      const value = keyValue(world, key, undefined);
      if (value === null || !covers(row[key], value)) matches = false;
    }
    if (matches) sieves.add(Number(row.sieve));
  }
  return [...sieves];
}

function judgeSieve(world: World, rule: GradationRule, sieve: number): Judgement {
  const chosen = select(world, PASSING, { ...rule.measure.at, sieve });
  if (chosen.is === 'missing') return judgeRetained(world, rule, sieve);
  if (chosen.is !== 'readings') return without('undecided');
  if (!haveUnits(PASSING, chosen.readings)) return without('undecided');
  const counting = countingReadings(world, chosen.readings, rule.measure.where ?? []);
  if (counting === null) return without('undecided');
  if (counting.length === 0) return without('not shown');
  const measures = measuresOf({ world, sieve, unit: '%' }, rule);
  if (measures.is !== 'resolved') return without(measures.is);
  const values = valuesOf(PASSING, counting, '%', measures.value.limits.min !== null);
  if (values.is !== 'values') return without('undecided');
  const mean = meanOf(values.values.map(({ allowed }) => allowed));
  const judgement = judged(mean, measures.value, precisionOf(rule, undefined, values.values.length));
  const hasWord = values.values.some(({ isWord }) => isWord);
  return hasWord ? { ...judgement, figuresAreLaidDown: false } : judgement;
}

/** A sieve of which only what it retains is stated. */
function judgeRetained(world: World, rule: GradationRule, sieve: number): Judgement {
  const passing = passingFromRetained(world, rule.measure.at, sieve);
  if (passing.is !== 'value') return without(passing.is === 'missing' ? 'not shown' : 'undecided');
  const wheres = rule.measure.where ?? [];
  const stated = {
    quantity: PASSING,
    value: null,
    unit: '%',
    at: {},
    origin: 'converted',
    source: null,
  } as const;
  const counting = countingReadings(world, [stated], wheres);
  if (counting === null) return without('undecided');
  if (counting.length === 0) return without('not shown');
  const measures = measuresOf({ world, sieve, unit: '%' }, rule);
  if (measures.is !== 'resolved') return without(measures.is);
  return judged(one(passing.value), measures.value, precisionOf(rule, undefined, 1));
}
