import { type ResolvedEdition, resolveEdition } from '#rules/rule-sets/resolve';
import { isLayer, type Layer, parseRuleSet, type RuleSet } from '#rules/rule-sets/schema';
import { shippedRuleSets } from '#rules/sets/shipped-rule-sets';

export interface ShippedEdition {
  file: string;
  ruleSet: RuleSet | Layer;
  /** A layer stands on the base that it names. */
  edition: ResolvedEdition;
}

export function shippedEditions(): ShippedEdition[] {
  const documents = shippedRuleSets.map(({ file, document }) => ({ file, ruleSet: parsed(file, document) }));
  return documents.map(({ file, ruleSet }) => {
    const base = isLayer(ruleSet)
      ? documents.find(
          (each) =>
            each.ruleSet.id === ruleSet.layerOf.id && each.ruleSet.edition === ruleSet.layerOf.edition,
        )?.ruleSet
      : ruleSet;
    if (!base) throw new Error(`The base of ${ruleSet.id} is not shipped.`);
    const resolution = resolveEdition(base, isLayer(ruleSet) ? [ruleSet] : []);
    if (!resolution.ok) throw new Error(JSON.stringify(resolution.problems));
    return { file, ruleSet, edition: resolution.edition };
  });
}

function parsed(file: string, document: unknown): RuleSet | Layer {
  const result = parseRuleSet(document);
  if (!result.ok) throw new Error(`${file}: ${JSON.stringify(result.problems)}`);
  return result.ruleSet;
}
