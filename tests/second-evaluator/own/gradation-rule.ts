import type { GradationMeasure } from '#rules/rule-sets/measure';
import type { Rule } from '#rules/rule-sets/schema';
import { meanOf } from './interval';
import { type Judgement, judged, precisionOf } from './judged';
import { limitsOf, stepFor } from './limits';
import { valuesOf } from './quantity-value';
import { subjectOf } from './reading-rule';
import { fitOf, select } from './selection';
import { covers, keyValue, tableOf } from './table';
import { type Verdict, type World, without } from './world';

const PASSING = 'percent-passing';

type GradationRule = Rule & { measure: GradationMeasure };

/** One finding a sieve of the table's rows for this mix; one alone where there is no gradation or no row. */
export function gradationVerdicts(world: World, rule: GradationRule): Verdict[] {
  const { at } = rule.measure;
  const alone = (outcome: Verdict['outcome']): Verdict[] => [
    { rule: rule.id, subject: subjectOf(PASSING, { trial: 'design', ...at }), ...without(outcome) },
  ];
  const isOurs = (stated: typeof at) => fitOf(world, PASSING, at, stated) === 'yes';
  if (!world.record.readings.some(({ quantity, at: stated }) => quantity === PASSING && isOurs(stated))) {
    const isDoubted = world.record.doubts.some(
      ({ about }) => about.quantity === PASSING && isOurs(about.at ?? {}),
    );
    return alone(isDoubted ? 'undecided' : 'not shown');
  }
  const sieves = sievesOf(world, rule.measure.table);
  if (sieves.length === 0) return alone('undecided');
  return sieves.map((sieve) => ({
    rule: rule.id,
    subject: `${sieve} mm`,
    ...judgeSieve(world, rule, sieve),
  }));
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
  const values = valuesOf(PASSING, chosen.readings);
  if (values.is !== 'values') return without('undecided');
  const place = { world, sieve, unit: '%' };
  const limits = limitsOf(place, rule.limit);
  if (limits.is !== 'resolved') return without(limits.is === 'missing' ? 'not shown' : 'undecided');
  const step = stepFor(place, rule.rounding, limits.value);
  if (step === null) return without('undecided');
  return judged(meanOf(values.values), {
    limits: limits.value,
    method: rule.rounding?.method ?? 'absolute',
    step,
    precision: precisionOf(rule, undefined, values.values.length),
  });
}
