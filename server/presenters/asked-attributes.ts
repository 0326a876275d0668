import type { AttributeValue, Doubt } from '#rules/record';
import {
  type AttributeDefinition,
  attributeLabel,
  type Scalar,
  withStandardAttributes,
} from '#rules/rule-sets/attribute';
import { matchValue, sameValue } from '#rules/rule-sets/match-value';
import type { Rule } from '#rules/rule-sets/schema';
import type { LimitTable } from '#rules/rule-sets/table';
import { comparisonsOf } from '#rules/rule-sets/when';
import type { AskedAttribute } from '#shared/contracts/readings';

export interface AttributeSources {
  edition: { rules: Rule[]; tables: LimitTable[]; attributes: AttributeDefinition[] };
  /** As read from the workbook. */
  workbook: Record<string, AttributeValue>;
  /** As the project states them. */
  facts: Record<string, Scalar>;
  /** As typed on the reading page. */
  typed: Record<string, Scalar>;
}

/** Attributes that rules need and that nobody states yet, or in which workbook and project differ. */
export function askedAttributes({ edition, workbook, facts, typed }: AttributeSources): AskedAttribute[] {
  const used = attributesUsed(edition);
  return withStandardAttributes(edition.attributes).flatMap((attribute) => {
    if (!used.has(attribute.name)) return [];
    const stated = workbook[attribute.name];
    const project = facts[attribute.name];
    const conflict = conflictOf(attribute, stated, project);
    if (stated === undefined && project === undefined) {
      return [ask(attribute, 'Neither the workbook nor the project states it.', typed)];
    }
    return conflict === null
      ? []
      : [ask(attribute, conflict, typed, [stated?.value, meantBy(attribute, project)])];
  });
}

/** A conflict without an answer is a doubt: the engine then asks whether the other value would change an outcome. */
export function conflictDoubts({ edition, workbook, facts, typed }: AttributeSources): Doubt[] {
  const used = attributesUsed(edition);
  return withStandardAttributes(edition.attributes).flatMap((attribute) => {
    const { name } = attribute;
    const stated = workbook[name];
    const project = facts[name];
    const reason = conflictOf(attribute, stated, project);
    if (!used.has(name) || reason === null || stated === undefined || project === undefined) return [];
    if (typed[name] !== undefined) return [];
    const other: AttributeValue = { ...stated, value: project, origin: 'reported', source: null };
    return [
      {
        sheet: stated.source?.sheet ?? '',
        cell: stated.source?.cell ?? '',
        text: stated.source?.text ?? String(stated.value),
        reason,
        alternatives: [
          {
            answer: 'workbook',
            label: `${stated.value}, as the workbook says`,
            attribute: { name, value: stated },
          },
          { answer: 'project', label: `${project}, as the project says`, attribute: { name, value: other } },
        ],
        about: { attribute: name },
      },
    ];
  });
}

/** Names of attributes in a condition, a table key or an attribute rule. */
export function attributesUsed({
  rules,
  tables,
}: Pick<AttributeSources['edition'], 'rules' | 'tables'>): Set<string> {
  const used = new Set<string>();
  for (const { when, measure } of rules) {
    if (when !== undefined) {
      for (const { comparison } of comparisonsOf(when)) {
        if (comparison.fact !== 'quantity') used.add(comparison.fact);
      }
    }
    if (measure.kind === 'attribute') used.add(measure.attribute);
  }
  for (const key of tables.flatMap((table) => table.keys)) if (key !== 'sieve') used.add(key);
  return used;
}

function conflictOf(
  attribute: AttributeDefinition,
  stated: AttributeValue | undefined,
  project: Scalar | undefined,
): string | null {
  if (stated === undefined || project === undefined) return null;
  if (sameValue(meantBy(attribute, project), stated.value)) return null;
  const unit = attribute.unit === undefined ? '' : ` ${attribute.unit}`;
  return `The workbook says ${stated.value}${unit}, the project says ${project}${unit}.`;
}

/** A project's fact in the edition's own words, so that it can be chosen and compared. */
function meantBy(attribute: AttributeDefinition, project: Scalar | undefined): Scalar {
  const fact = project ?? '';
  return matchValue(attribute, fact) ?? fact;
}

function ask(
  attribute: AttributeDefinition,
  reason: string,
  typed: Record<string, Scalar>,
  choices: (Scalar | undefined)[] = [],
): AskedAttribute {
  const declared = (attribute.values ?? []).map((entry) => (typeof entry === 'object' ? entry.value : entry));
  const values = choices.length > 0 ? choices : declared;
  return {
    name: attribute.name,
    label: attributeLabel(attribute),
    type: attribute.type,
    unit: attribute.unit ?? null,
    values: values.filter((value) => typeof value === 'string' || typeof value === 'number'),
    reason,
    value: typed[attribute.name] ?? null,
  };
}
