import { z } from 'zod';

const listSchema = z.array(z.looseObject({ id: z.string(), inputs: z.unknown(), expected: z.unknown() }));

/** One check value of a file beside this one, its inputs and expected values in the shape that the test names. */
export function referenceRecord<Inputs, Expected>(
  records: unknown,
  id: string,
  shape: { inputs: z.ZodType<Inputs>; expected: z.ZodType<Expected> },
): { inputs: Inputs; expected: Expected } {
  const record = listSchema.parse(records).find((each) => each.id === id);
  if (record === undefined) throw new Error(`There is no reference record ${id}.`);
  return { inputs: shape.inputs.parse(record.inputs), expected: shape.expected.parse(record.expected) };
}

/** The number of a result that must exist; the reason why it does not otherwise fails the test. */
export function numberOf(result: { ok: true; value: number } | { ok: false; reason: string }): number {
  if (!result.ok) throw new Error(result.reason);
  return result.value;
}
