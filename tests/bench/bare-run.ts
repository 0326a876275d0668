import { Engine, type TopLevelCondition } from 'json-rules-engine';
import { analyse } from '#rules/engine/analyse';
import { attributeFact } from '#rules/engine/attribute-fact';
import { addOperators, type LeafComparison } from '#rules/engine/decide';
import { evaluate } from '#rules/engine/evaluate';
import type { Finding } from '#rules/engine/finding';
import { quantityValue } from '#rules/engine/quantity-value';
import { worldOf } from '#rules/engine/world';
import type { CheckContext, MixRecord } from '#rules/record';
import type { ResolvedEdition } from '#rules/rule-sets/resolve';
import { type Comparison, comparisonsOf } from '#rules/rule-sets/when';

/**
 * The same decisions by json-rules-engine alone: the `when` of every rule and the limit of every finding, on facts
 * that are look-ups of values worked out beforehand. One engine, reused; no cache, as its fastest use is.
 */
export function bareRun(
  record: MixRecord,
  edition: ResolvedEdition,
  context: CheckContext,
): () => Promise<unknown> {
  const engine = new Engine([], { allowUndefinedFacts: true });
  addOperators(engine);
  const values = new Map<string, unknown>();
  const fact = (name: string, value: unknown) => {
    values.set(name, value);
    engine.addFact(name, () => values.get(name), { cache: false });
  };
  const { findings } = evaluate(record, edition, context);
  const world = worldOf({ record, edition, context, analysis: analyse(record, edition.designPoint) });
  for (const rule of edition.rules) {
    const whens = rule.when ? comparisonsOf(rule.when).map(({ comparison }) => comparison) : [];
    for (const comparison of whens) {
      const known = attributeFact(world, comparison.fact);
      const value = comparison.params
        ? quantityValue(world, comparison.params.quantity, comparison.params.at)
        : { ok: known.kind === 'value', value: known.kind === 'value' ? known.value : undefined };
      fact(nameOf(comparison), value.ok ? value.value : undefined);
    }
    const own = findings.filter((finding) => finding.rule === rule.id);
    const limits = own.flatMap((finding, place) => limitConditions(finding, `${rule.id} ${place}`, fact));
    const when = rule.when ? [renamed(rule.when) as TopLevelCondition] : [];
    const all = [...when, ...limits];
    if (all.length === 0) continue;
    engine.addRule({ name: rule.id, conditions: { all }, event: { type: 'pass' } });
  }
  return () => engine.run();
}

type Condition = TopLevelCondition | { fact: string; operator: string; value: unknown };

/** What is held against a limit: a number against its ends, a word against the list, a document against being there. */
function limitConditions(
  { observed, limit, outcome, kind }: Finding,
  name: string,
  fact: (name: string, value: unknown) => void,
): { fact: string; operator: string; value: unknown }[] {
  if (outcome === 'not applicable') return [];
  if (kind === 'document' || limit === null) {
    fact(name, observed === null ? 'absent' : 'there');
    return [{ fact: name, operator: 'equal', value: 'there' }];
  }
  if (limit.oneOf !== null) {
    fact(name, observed?.text);
    return [{ fact: name, operator: 'in', value: limit.oneOf }];
  }
  fact(name, observed?.rounded ?? undefined);
  return [
    ...(limit.min === null ? [] : [{ fact: name, operator: 'greaterThanInclusive', value: limit.min }]),
    ...(limit.max === null ? [] : [{ fact: name, operator: 'lessThanInclusive', value: limit.max }]),
  ];
}

/** The rule's own condition; a quantity is looked up under a name of its own, as an attribute is. */
function renamed(condition: unknown): Condition {
  const group = condition as { all?: unknown[]; any?: unknown[]; not?: unknown };
  if (group.all) return { all: group.all.map(renamed) } as TopLevelCondition;
  if (group.any) return { any: group.any.map(renamed) } as TopLevelCondition;
  if (group.not) return { not: renamed(group.not) } as TopLevelCondition;
  const comparison = condition as Comparison;
  return { fact: nameOf(comparison), operator: comparison.operator, value: comparison.value };
}

function nameOf({ fact, params }: Pick<LeafComparison, 'fact' | 'params'>): string {
  return params === undefined ? `attribute ${fact}` : `quantity ${JSON.stringify(params)}`;
}
