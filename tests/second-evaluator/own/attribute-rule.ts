import type { AttributeMeasure } from '#rules/rule-sets/measure';
import type { Rule } from '#rules/rule-sets/schema';
import { attributeFact, definitionOf, matching, type Scalar, sameScalar } from './attribute';
import { exact } from './exact';
import { one } from './interval';
import { type Judgement, judged, measuresOf, precisionOf } from './judged';
import { rowFor, tableOf } from './table';
import { type Verdict, type World, without } from './world';

export type AttributeRule = Rule & { measure: AttributeMeasure };

export function attributeVerdicts(world: World, rule: AttributeRule): Verdict[] {
  return [{ rule: rule.id, subject: 'mix', ...judgeAttribute(world, rule) }];
}

function judgeAttribute(world: World, rule: AttributeRule): Judgement {
  const fact = attributeFact(world, rule.measure.attribute);
  if (fact.is !== 'value') return without(fact.is === 'missing' ? 'not shown' : 'undecided');
  if (rule.limit.present) return without('pass');
  if (rule.limit.oneOf !== undefined) return judgeAllowed(world, rule, fact.value);
  const measures = measuresOf({ world, unit: null }, rule);
  if (measures.is !== 'resolved') return without(measures.is);
  if (typeof fact.value !== 'number') return without('undecided');
  return judged(one(exact(fact.value)), measures.value, precisionOf(rule, undefined, 1));
}

/** Allowed values may be written by label, alias or as text: they mean the attribute's own. */
function judgeAllowed(world: World, { limit, measure }: AttributeRule, value: Scalar): Judgement {
  const { oneOf } = limit;
  let allowed: Scalar[] = [];
  if (Array.isArray(oneOf)) allowed = oneOf;
  else if (oneOf !== undefined) {
    const found = rowFor(world, tableOf(world, oneOf.table), undefined);
    if (found.is === 'no row') return without('undecided');
    const cell = found.row[oneOf.column];
    if (cell === null || cell === undefined) return without('not applicable');
    if (Array.isArray(cell)) allowed = cell;
    else if (typeof cell !== 'object') allowed = [cell];
  }
  const isAllowed = allowed.some((each) => {
    const meant = matching(definitionOf(world, measure.attribute), each);
    return meant !== null && sameScalar(meant, value);
  });
  return without(isAllowed ? 'pass' : 'fail');
}
