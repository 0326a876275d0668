import { convert } from '../quantities/units';
import { matchValue } from '../rule-sets/match-value';
import type { AttributeMeasure } from '../rule-sets/measure';
import type { ResolvedRule } from '../rule-sets/resolve';
import { orList } from '../rule-sets/words';
import { attributeEvidence, attributeFact, attributeText } from './attribute-fact';
import { listCondition, satisfies } from './decide';
import { distanceWords } from './distance-words';
import type { Finding, Observed, ResolvedLimit } from './finding';
import { judge, rounderOf } from './judge';
import { makeFinding } from './make-finding';
import { isBorderline, precisionOf } from './precision';
import { resolveLimit } from './resolve-limit';
import type { World } from './world';

/** An `attribute` rule: one of the allowed values, or a number inside a limit. */
export function evaluateAttribute(world: World, rule: ResolvedRule, measure: AttributeMeasure): Finding[] {
  const base = { subject: 'mix', at: {}, evidence: attributeEvidence(world, measure.attribute) };
  const fact = attributeFact(world, measure.attribute);
  const limit = resolveLimit(world, rule, {});
  const shown = limit.ok ? limit.limit : null;
  if (fact.kind !== 'value') {
    const outcome = fact.kind === 'missing' ? 'not shown' : 'undecided';
    return [
      makeFinding(world, rule, {
        ...base,
        outcome,
        reason: `${capitalise(fact.reason)}.`,
        wouldDecide: fact.wouldDecide,
        limit: shown,
      }),
    ];
  }
  if (!limit.ok) return [makeFinding(world, rule, { ...base, ...limit })];
  const text = attributeText(world, measure.attribute, fact.value);
  const observed: Observed = { value: null, rounded: null, text, unit: '', statistic: 'value', count: 1 };
  if (rule.limit.present) {
    return [
      makeFinding(world, rule, { ...base, outcome: 'pass', reason: 'It is stated.', observed, limit: shown }),
    ];
  }
  if (limit.limit.oneOf !== null) return [ofList(world, rule, measure, { ...base, observed }, limit.limit)];
  if (typeof fact.value !== 'number') {
    const reason = `${text} is not a number, and the rule sets a numeric limit.`;
    return [
      makeFinding(world, rule, {
        ...base,
        outcome: 'undecided',
        reason,
        wouldDecide: 'State it as a number.',
        observed,
        limit: shown,
      }),
    ];
  }
  return [ofNumber(world, rule, base, fact.value, measure, limit.limit)];
}

interface Base {
  subject: string;
  at: Record<string, never>;
  evidence: Finding['evidence'];
}

function ofList(
  world: World,
  rule: ResolvedRule,
  measure: AttributeMeasure,
  base: Base & { observed: Observed },
  limit: ResolvedLimit,
): Finding {
  const attribute = world.view.attribute(measure.attribute);
  const fact = attributeFact(world, measure.attribute);
  const written = limit.oneOf ?? [];
  // An allowed value may be written by its label or an alias: it means the attribute's own value.
  const allowed = written.map((each) => (attribute ? (matchValue(attribute, each) ?? each) : each));
  const isAllowed = fact.kind === 'value' && satisfies(listCondition(allowed), fact.value);
  const words = attribute ? allowed.map((each) => attributeText(world, measure.attribute, each)) : written;
  const reason = isAllowed
    ? `${capitalise(base.observed.text)} is among the allowed values.`
    : `${capitalise(base.observed.text)} is not among the allowed values: ${orList(words)}.`;
  return makeFinding(world, rule, {
    ...base,
    outcome: isAllowed ? 'pass' : 'fail',
    reason,
    limit: { ...limit, oneOf: words },
  });
}

function ofNumber(
  world: World,
  rule: ResolvedRule,
  base: Base,
  value: number,
  measure: AttributeMeasure,
  limit: ResolvedLimit,
): Finding {
  const own = world.view.attribute(measure.attribute)?.unit ?? limit.unit;
  const inUnit = own === limit.unit ? { ok: true as const, value } : convert(value, own, limit.unit);
  if (!inUnit.ok) {
    const reason = `The value is in ${own} and the limit in ${limit.unit}: ${inUnit.reason}.`;
    return makeFinding(world, rule, { ...base, outcome: 'undecided', reason, limit });
  }
  const rounding = rounderOf(world, rule, limit, {});
  if (!rounding.ok) return makeFinding(world, rule, { ...base, ...rounding, limit });
  const judgement = judge({ value: inUnit.value, text: null, allowed: null }, limit, rounding.rounder);
  const precision = precisionOf({ rule, quantity: undefined, statistic: 'mean', count: 1, unit: limit.unit });
  const observed: Observed = {
    value: inUnit.value,
    rounded: judgement.rounded,
    text: judgement.text,
    unit: limit.unit,
    statistic: 'value',
    count: 1,
  };
  return makeFinding(world, rule, {
    ...base,
    outcome: judgement.outcome,
    reason: distanceWords(judgement, limit),
    observed,
    limit,
    margin: judgement.margin,
    precision,
    borderline: isBorderline(judgement.margin, precision),
    roundingSentence: judgement.roundingSentence,
  });
}

function capitalise(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
