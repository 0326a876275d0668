import { type AttributeDefinition, attributeLabel, type Scalar } from '#rules/rule-sets/attribute';
import type { ProblemError } from '#shared/contracts/problems';

/** What is said at the field of a value that is none of an attribute's. */
export function attributeFault(
  attribute: AttributeDefinition,
  { value, pointer }: { value: Scalar; pointer: string },
): ProblemError {
  return {
    pointer,
    detail: `${attributeLabel(attribute)} cannot be “${value}”.`,
    fix: choices(attribute),
  };
}

function choices({ type, values = [] }: AttributeDefinition): string {
  if (values.length === 0) return type === 'number' ? 'Enter a number.' : 'Enter another value.';
  const named = values.map((entry) => (typeof entry === 'object' ? (entry.label ?? entry.value) : entry));
  return `Choose one of ${named.join(', ')}.`;
}
