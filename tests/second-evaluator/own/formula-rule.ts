import type { FormulaMeasure } from '#rules/rule-sets/measure';
import type { Rule } from '#rules/rule-sets/schema';
import type { Exact } from './exact';
import { computed, NoValue, namesIn } from './formula';
import { isOne, one } from './interval';
import { type Judgement, judged, precisionOf } from './judged';
import { limitsOf, stepFor } from './limits';
import { meanAt } from './quantity-value';
import { type Verdict, type World, without } from './world';

type FormulaRule = Rule & { measure: FormulaMeasure };

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
  return [{ rule: rule.id, subject: 'design point', ...judgeFormula(world, rule) }];
}

function judgeFormula(world: World, rule: FormulaRule): Judgement {
  const { expression, at, unit } = rule.measure;
  const values = new Map<string, Exact>();
  let isMissing = false;
  let isDoubtful = false;
  for (const name of namesIn(expression)) {
    const [, symbol = name, opening] = /^(P)([\d.]+)$/.exec(name) ?? [];
    const sieve = opening === undefined ? {} : { sieve: Number(opening) };
    const found = meanAt(world, SYMBOLS[symbol]!, { ...at, ...sieve });
    if (found.is === 'missing') isMissing = true;
    else if (found.is === 'doubtful' || !isOne(found.value)) isDoubtful = true;
    else values.set(name, found.value.low);
  }
  if (isMissing) return without('not shown');
  if (isDoubtful) return without('undecided');
  const place = { world, unit: unit ?? '1' };
  const limits = limitsOf(place, rule.limit);
  if (limits.is !== 'resolved') return without(limits.is === 'missing' ? 'not shown' : 'undecided');
  const step = stepFor(place, rule.rounding, limits.value);
  if (step === null) return without('undecided');
  try {
    const value = one(computed(expression, (name) => values.get(name)!));
    const precision = precisionOf(rule, undefined, 1);
    return judged(value, {
      limits: limits.value,
      method: rule.rounding?.method ?? 'absolute',
      step,
      precision,
    });
  } catch (error) {
    if (error instanceof NoValue) return without('undecided');
    throw error;
  }
}
