import type { GradationMeasure } from '#rules/rule-sets/measure';
import type { Rule } from '#rules/rule-sets/schema';
import { meanOf } from './interval';
import { type Judgement, judged, measuresOf, precisionOf } from './judged';
import { haveUnits, valuesOf } from './quantity-value';
import { select } from './selection';
import { covers, keyValue, tableOf } from './table';
import { type Verdict, type World, without } from './world';

const PASSING = 'percent-passing';

export type GradationRule = Rule & { measure: GradationMeasure };

/** One finding a sieve of the table's rows for this mix; one alone where there is no gradation or no row. */
export function gradationVerdicts(world: World, rule: GradationRule): Verdict[] {
  const alone = (outcome: Verdict['outcome']): Verdict[] => [
    { rule: rule.id, subject: wholeGradation(rule.measure), ...without(outcome) },
  ];
  const { readings, doubts } = world.record;
  const hasAny =
    readings.some(({ quantity }) => quantity === PASSING) ||
    doubts.some(({ about }) => about.quantity === PASSING);
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
  if (chosen.is !== 'readings') return without(chosen.is === 'missing' ? 'not shown' : 'undecided');
  if (!haveUnits(PASSING, chosen.readings)) return without('undecided');
  const measures = measuresOf({ world, sieve, unit: '%' }, rule);
  if (measures.is !== 'resolved') return without(measures.is);
  const values = valuesOf(PASSING, chosen.readings, '%', measures.value.limits.min !== null);
  if (values.is !== 'values') return without('undecided');
  const mean = meanOf(values.values.map(({ allowed }) => allowed));
  const judgement = judged(mean, measures.value, precisionOf(rule, undefined, values.values.length));
  const hasWord = values.values.some(({ isWord }) => isWord);
  return hasWord ? { ...judgement, figuresAreLaidDown: false } : judgement;
}
