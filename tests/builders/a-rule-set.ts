import { type ResolvedEdition, resolveEdition } from '#rules/rule-sets/resolve';
import { type LayerInput, parseRuleSet, type RuleInput, type RuleSetInput } from '#rules/rule-sets/schema';

/** A rule on voids in the mineral aggregate, at least 14.0; override what matters. */
export function aRule(overrides: Partial<RuleInput> = {}): RuleInput {
  return {
    id: 'vma',
    clause: '1.1',
    title: 'Voids in the mineral aggregate',
    severity: 'required',
    measure: { kind: 'reading', quantity: 'voids-in-mineral-aggregate' },
    limit: { min: '14.0' },
    rounding: { method: 'rounding', to: 0.1 },
    ...overrides,
  };
}

/** A base edition with that one rule. */
export function aRuleSet(overrides: Partial<RuleSetInput> = {}): RuleSetInput {
  return {
    format: 'clauseway/rule-set@1',
    id: 'cvra-900',
    title: 'Section 900',
    agency: 'Carrow Valley Roads Authority',
    edition: '2026',
    effective: { from: '2026-01-01', to: null },
    layerOf: null,
    rules: [aRule()],
    ...overrides,
  };
}

/** A supplement over that edition that changes nothing yet. */
export function aLayer(overrides: Partial<LayerInput> = {}): LayerInput {
  return {
    format: 'clauseway/rule-set@1',
    id: 'cvra-900-s1',
    title: 'Supplement 1',
    agency: 'Carrow Valley Roads Authority',
    edition: '1',
    effective: { from: '2026-02-01', to: null },
    layerOf: { id: 'cvra-900', edition: '2026' },
    ...overrides,
  };
}

/** Parsed and resolved; throws with every problem where the documents do not fit. */
export function anEdition(base: Partial<RuleSetInput> = {}, layers: LayerInput[] = []): ResolvedEdition {
  const parsed = [aRuleSet(base), ...layers].map((document) => {
    const result = parseRuleSet(document);
    if (!result.ok) throw new Error(JSON.stringify(result.problems, null, 2));
    return result.ruleSet;
  });
  const [first, ...others] = parsed;
  const resolution = resolveEdition(first!, others);
  if (!resolution.ok) throw new Error(JSON.stringify(resolution.problems, null, 2));
  return resolution.edition;
}
