import { mixRecordSchema } from '#rules/record';
import { layerSchema, type RuleInput, ruleSetSchema } from '#rules/rule-sets/schema';
import { type Condition, conditionSchema } from '#rules/rule-sets/when';
import type { GeneratedCase } from './generated/parts';
import { namesIn } from './own/formula';
import { symbolOf } from './own/formula-rule';
import { RETAINED } from './own/retained';
import { truthOf } from './own/truth';
import { worldOf } from './own/world';

/** One fact without which a rule cannot be known to be met. */
export interface Need {
  /** Any of these serves. */
  quantities?: string[];
  attribute?: string | undefined;
  document?: string | undefined;
}

/** What a rule that passes cannot do without: what it measures, and what its limits and its `when` rest on. */
export function needsOf(drawn: GeneratedCase, rule: RuleInput): Need[] {
  const needs: Need[] = [...measured(drawn, rule), ...referred(drawn, rule)];
  if (hasSpecimens(drawn, rule))
    for (const { quantity } of rule.measure.where ?? []) needs.push({ quantities: [quantity] });
  for (const attribute of decisive(drawn, rule)) needs.push({ attribute });
  return needs;
}

/** A formula over values of no specimen has none that a condition could leave out. */
function hasSpecimens({ record }: GeneratedCase, { measure }: RuleInput): boolean {
  if (measure.kind !== 'formula') return true;
  const used = namesIn(measure.expression).map((name) => symbolOf(name).quantity);
  return (record.readings ?? []).some(
    ({ quantity, at }) => used.includes(quantity) && at?.specimen !== undefined,
  );
}

function measured({ record }: GeneratedCase, { measure }: RuleInput): Need[] {
  switch (measure.kind) {
    case 'difference':
      return [{ quantities: [measure.quantity] }];
    case 'reading':
      // Air voids are reported, or follow from the gravities.
      return [
        {
          quantities: [
            measure.quantity,
            ...(measure.quantity === 'air-voids' ? ['maximum-specific-gravity'] : []),
          ],
        },
      ];
    case 'gradation':
      return [{ quantities: ['percent-passing', ...RETAINED] }];
    case 'attribute':
      return [{ attribute: measure.attribute }];
    case 'document':
      return [{ document: measure.type }];
    case 'formula':
      return namesIn(measure.expression).map((name) => ({ quantities: [symbolOf(name).quantity] }));
    case 'creep-compliance':
      // A drawn test is stated as compliance or as strain, never as both.
      return ['creep-compliance', 'creep-strain']
        .filter((id) => record.readings?.some(({ quantity }) => quantity === id))
        .map((quantity) => ({ quantities: [quantity] }));
  }
}

/** Keys of the tables and quantities that the limits of a rule name. */
function referred(drawn: GeneratedCase, { limit, measure }: RuleInput): Need[] {
  if (limit.present) return [];
  const bounds = [limit.min, limit.max, limit.target, limit.tolerance, limit.oneOf];
  const tables = new Set<string>(measure.kind === 'gradation' ? [measure.table] : []);
  const needs: Need[] = [];
  for (const bound of bounds) {
    if (typeof bound !== 'object') continue;
    if ('table' in bound) tables.add(bound.table);
    if ('quantity' in bound) needs.push({ quantities: [bound.quantity] });
  }
  for (const id of tables) {
    const table = drawn.base.tables?.find((each) => each.id === id);
    for (const attribute of table?.keys ?? []) if (attribute !== 'sieve') needs.push({ attribute });
  }
  return needs;
}

/** Attributes without which it is not known whether the rule applies. */
function decisive(drawn: GeneratedCase, { when }: RuleInput): string[] {
  if (when === undefined) return [];
  const condition = conditionSchema.parse(when);
  const record = mixRecordSchema.parse(drawn.record);
  const base = ruleSetSchema.parse(drawn.base);
  const layers = drawn.layers.map((layer) => layerSchema.parse(layer));
  return factsIn(condition).filter((name) => {
    const { [name]: _stated, ...attributes } = record.attributes;
    const { [name]: _fact, ...facts } = drawn.context.facts;
    const world = worldOf({ ...record, attributes }, base, layers, { ...drawn.context, facts });
    return truthOf(world, condition) === 'unknown';
  });
}

function factsIn(condition: Condition): string[] {
  if ('not' in condition) return factsIn(condition.not);
  if ('all' in condition) return condition.all.flatMap(factsIn);
  if ('any' in condition) return condition.any.flatMap(factsIn);
  return condition.fact === 'quantity' ? [] : [condition.fact];
}
