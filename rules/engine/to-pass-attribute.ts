import { decimalsOf } from '../numerics/round';
import type { AttributeMeasure } from '../rule-sets/measure';
import type { ResolvedRule } from '../rule-sets/resolve';
import { orList, uncapitalised } from '../rule-sets/words';
import { attributeFact, attributeText } from './attribute-fact';
import type { ToPass } from './explanation';
import type { Finding } from './finding';
import { judgingOf, sideIn } from './to-pass-judging';
import { said, search } from './to-pass-search';
import type { World } from './world';

/** Which values the rule allows; of a closed attribute only values that it has. */
export function forAttribute(
  world: World,
  rule: ResolvedRule,
  { attribute }: AttributeMeasure,
  finding: Finding,
): ToPass[] {
  const fact = attributeFact(world, attribute);
  if (fact.kind !== 'value') return [];
  const name = uncapitalised(world.view.attributeLabel(attribute));
  const allowed = finding.limit?.oneOf ?? null;
  if (allowed !== null)
    return [
      ofList(attribute, name, orList(allowed.map(String)), attributeText(world, attribute, fact.value)),
    ];
  if (typeof fact.value !== 'number') return [];
  const entry = world.view.attribute(attribute);
  const judging = judgingOf(world, rule, {}, entry?.unit);
  if (!judging) return [];
  const closed = (entry?.values ?? [])
    .map((each) => (typeof each === 'object' ? each.value : each))
    .filter((each) => typeof each === 'number');
  if (closed.length > 0) {
    const inside = closed.filter((value) => sideIn(judging, value) === 'inside');
    if (inside.length === 0) return [];
    const words = orList(inside.map((value) => attributeText(world, attribute, value)));
    return [ofList(attribute, name, words, attributeText(world, attribute, fact.value))];
  }
  const { value: present } = fact;
  const unit = judging.own;
  const step = Number(`1e-${Math.max(decimalsOf(present), judging.limit.decimals)}`);
  const way = search({
    present,
    step,
    plausible: { min: -MOST, max: MOST },
    valueAt: (value) => value,
    sideOf: (value) => sideIn(judging, value),
  });
  return way === null ? [] : [said({ quantity: attribute, unit, present, step, count: 1, name, ...way })];
}

/** An attribute has no plausible range. */
const MOST = 1e9;

function ofList(quantity: string, name: string, values: string, present: string): ToPass {
  const words = `${name} of ${values} instead of ${present}`;
  return { quantity, name, unit: '', present: null, from: null, to: null, words };
}
