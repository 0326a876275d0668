import { z } from 'zod';
import { conditionsSchema } from '../record';

export const operatorSchema = z.enum([
  'equal',
  'notEqual',
  'in',
  'notIn',
  'lessThan',
  'lessThanInclusive',
  'greaterThan',
  'greaterThanInclusive',
]);

const scalarSchema = z.union([z.number(), z.string(), z.boolean()]);

/** A comparison of one attribute, or of a quantity named in `params`. */
export const comparisonSchema = z
  .strictObject({
    fact: z.string(),
    params: z.strictObject({ quantity: z.string(), at: conditionsSchema.default({}) }).optional(),
    operator: operatorSchema,
    value: z.union([scalarSchema, z.array(scalarSchema).min(1)]),
  })
  .superRefine((comparison, context) => {
    const fault = comparisonFault(comparison);
    if (fault) context.addIssue({ code: 'custom', message: fault.detail, params: { fix: fault.fix } });
  });

export type Comparison = z.infer<typeof comparisonSchema>;
export type Condition = Comparison | { all: Condition[] } | { any: Condition[] } | { not: Condition };

export const conditionSchema: z.ZodType<Condition> = z.lazy(() =>
  z.union([
    z.strictObject({ all: z.array(conditionSchema).min(1) }),
    z.strictObject({ any: z.array(conditionSchema).min(1) }),
    z.strictObject({ not: conditionSchema }),
    comparisonSchema,
  ]),
);

/** Every comparison in a condition, with its path below it. */
export function comparisonsOf(
  condition: Condition,
  path: (string | number)[] = [],
): { comparison: Comparison; path: (string | number)[] }[] {
  if ('all' in condition) return condition.all.flatMap((each, i) => comparisonsOf(each, [...path, 'all', i]));
  if ('any' in condition) return condition.any.flatMap((each, i) => comparisonsOf(each, [...path, 'any', i]));
  if ('not' in condition) return comparisonsOf(condition.not, [...path, 'not']);
  return [{ comparison: condition, path }];
}

function comparisonFault(comparison: {
  fact: string;
  params?: unknown;
  operator: string;
  value: unknown;
}): { detail: string; fix: string } | null {
  const isList = Array.isArray(comparison.value);
  const wantsList = comparison.operator === 'in' || comparison.operator === 'notIn';
  if (wantsList && !isList) {
    return {
      detail: `compares with ${comparison.operator} but its value is not a list`,
      fix: 'Give the value as a list.',
    };
  }
  if (!wantsList && isList) {
    return {
      detail: `compares with ${comparison.operator} but its value is a list`,
      fix: 'Use in or notIn for a list, or give one value.',
    };
  }
  if ((comparison.fact === 'quantity') !== (comparison.params !== undefined)) {
    return comparison.params === undefined
      ? { detail: 'compares a quantity without naming it', fix: 'Name it in params: { "quantity": … }.' }
      : { detail: 'has params but its fact is not quantity', fix: 'Leave params out for an attribute.' };
  }
  return null;
}
