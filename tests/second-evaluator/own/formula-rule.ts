import type { FormulaMeasure } from '#rules/rule-sets/measure';
import type { Rule } from '#rules/rule-sets/schema';
import type { Exact } from './exact';
import { computed, NoValue, namesIn } from './formula';
import { isOne, one } from './interval';
import { type Judgement, judged, measuresOf, precisionOf } from './judged';
import { knownOf } from './known';
import { meanAt } from './quantity-value';
import { countingReadings } from './where';
import { type Verdict, type World, without } from './world';

export type FormulaRule = Rule & { measure: FormulaMeasure };

/** Trade symbols of the quantities that formulas are drawn over. */
const SYMBOLS: Record<string, string> = {
  Gmm: 'maximum-specific-gravity',
  Gmb: 'bulk-specific-gravity-mix',
  MS: 'marshall-stability',
  MF: 'marshall-flow',
  DD: 'draindown',
  RS: 'retained-stability',
  SE: 'sand-equivalent',
  LA: 'abrasion-loss',
  P: 'percent-passing',
};

export function formulaVerdicts(world: World, rule: FormulaRule): Verdict[] {
  return [{ rule: rule.id, subject: formulaSubject(rule.measure), ...judgeFormula(world, rule) }];
}

/** Of the design point, unless it is all of aggregate or binder, which belong to every trial. */
export function formulaSubject({ expression, at }: FormulaMeasure): string {
  if (at.trial !== undefined) return at.trial === 'design' ? 'design point' : 'mix';
  const isOfMix = namesIn(expression).some((name) => knownOf(symbolOf(name).quantity).of === 'mix');
  return isOfMix ? 'design point' : 'mix';
}

/** The quantity of a trade symbol, with the sieve that it names. */
export function symbolOf(name: string): { quantity: string; sieve: number | undefined } {
  const [, symbol = name, opening] = /^(P)([\d.]+)$/.exec(name) ?? [];
  return { quantity: SYMBOLS[symbol]!, sieve: opening === undefined ? undefined : Number(opening) };
}

function judgeFormula(world: World, rule: FormulaRule): Judgement {
  const { expression, at, unit, where } = rule.measure;
  const values = new Map<string, Exact>();
  const failures = new Set<string>();
  for (const name of namesIn(expression)) {
    const { quantity, sieve } = symbolOf(name);
    const found = meanAt(world, quantity, sieve === undefined ? at : { ...at, sieve }, (readings) =>
      // A value of no specimen has none that could be left out.
      readings.some((reading) => reading.at.specimen !== undefined)
        ? countingReadings(world, readings, where ?? [])
        : readings,
    );
    if (found.is === 'missing') failures.add('not shown');
    else if (found.is === 'doubtful' || !isOne(found.value)) failures.add('undecided');
    else values.set(name, found.value.low);
  }
  if (failures.has('not shown')) return without('not shown');
  if (failures.has('undecided')) return without('undecided');
  try {
    const value = one(computed(expression, (name) => values.get(name)!));
    const measures = measuresOf({ world, unit: unit ?? '1' }, rule);
    if (measures.is !== 'resolved') return without(measures.is);
    return judged(value, measures.value, precisionOf(rule, undefined, 1));
  } catch (error) {
    if (error instanceof NoValue) return without('undecided');
    throw error;
  }
}
