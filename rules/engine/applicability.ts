import type { ResolvedRule } from '../rule-sets/resolve';
import { type Comparison, comparisonsOf } from '../rule-sets/when';
import { conditionClause, factLabel } from '../rule-sets/when-words';
import { andList, numberWords, withUnit } from '../rule-sets/words';
import { attributeEvidence, attributeFact, attributeText } from './attribute-fact';
import { decide, type Fact, type LeafComparison } from './decide';
import type { Evidence } from './finding';
import { quantityValue } from './quantity-value';
import type { World } from './world';

export type Applicability =
  | { kind: 'applies' }
  | {
      kind: 'not applicable' | 'undecided';
      reason: string;
      wouldDecide?: string | undefined;
      evidence: Evidence[];
    };

/** Whether a rule applies to this mix. Not knowing is never taken for not applying. */
export function applicabilityOf(world: World, rule: ResolvedRule): Applicability {
  const { when } = rule;
  if (when === undefined) return { kind: 'applies' };
  const facts = new Map<string, Fact>();
  const factOf = (leaf: LeafComparison): Fact => {
    const key = leaf.fact === 'quantity' ? JSON.stringify(leaf.params) : leaf.fact;
    const fact = facts.get(key) ?? resolveFact(world, leaf);
    facts.set(key, fact);
    return fact;
  };
  const truth = decide(when, factOf);
  if (truth === 'true') return { kind: 'applies' };

  const comparisons = comparisonsOf(when).map(({ comparison }) => comparison);
  const evidence = [...new Set(comparisons.map(({ fact }) => fact))].flatMap((name) =>
    attributeEvidence(world, name),
  );
  if (truth === 'unknown') {
    const unknown = new Set(
      comparisons.map(factOf).flatMap((fact) => (fact.kind === 'value' ? [] : [fact.reason])),
    );
    const reason = `Whether this rule applies is not known: ${[...unknown].join('; ')}.`;
    const acts = comparisons
      .map(factOf)
      .flatMap((fact) => ('wouldDecide' in fact ? (fact.wouldDecide ?? []) : []));
    return { kind: 'undecided', reason, wouldDecide: [...new Set(acts)].join(' ') || undefined, evidence };
  }
  const known = new Set(
    comparisons.flatMap((comparison) => factWords(world, comparison, factOf(comparison))),
  );
  const here = known.size === 0 ? '' : `; here ${andList([...known])}`;
  return {
    kind: 'not applicable',
    reason: `The rule applies where ${conditionClause(when, world.view)}${here}.`,
    evidence,
  };
}

function resolveFact(world: World, leaf: LeafComparison): Fact {
  if (leaf.fact !== 'quantity') return attributeFact(world, leaf.fact);
  const { params } = leaf as Comparison;
  if (params === undefined) throw new Error('A comparison of a quantity names none.');
  const value = quantityValue(world, params.quantity, params.at);
  if (value.ok) return { kind: 'value', value: value.value };
  const label = factLabel(leaf as Comparison, world.view);
  if (value.outcome === 'not shown')
    return { kind: 'missing', reason: `${label} is missing`, wouldDecide: `State ${label}.` };
  return { kind: 'doubtful', reason: value.reason.replace(/\.$/, ''), wouldDecide: value.wouldDecide };
}

function factWords(world: World, comparison: Comparison, fact: Fact): string[] {
  if (fact.kind !== 'value') return [];
  const label = factLabel(comparison, world.view);
  if (comparison.fact !== 'quantity')
    return [`${label} is ${attributeText(world, comparison.fact, fact.value)}`];
  const quantity = world.view.quantity(comparison.params?.quantity ?? '');
  const value = withUnit(numberWords(Number(fact.value)), quantity?.unit ?? '');
  return [`${label} ${quantity?.plural ? 'are' : 'is'} ${value}`];
}
