import { type CheckContext, type MixRecord, type MixRecordInput, mixRecordSchema } from '#rules/record';

/** A record with what is given and nothing else. */
export function aRecord(parts: MixRecordInput = {}): MixRecord {
  return mixRecordSchema.parse(parts);
}

/** Attributes as a workbook states them. */
export function attributes(values: Record<string, number | string | boolean>): MixRecordInput['attributes'] {
  return Object.fromEntries(
    Object.entries(values).map(([name, value]) => [name, { value, origin: 'reported' as const }]),
  );
}

export function aContext(overrides: Partial<CheckContext> = {}): CheckContext {
  return { submittedOn: '2026-03-09', lettingOn: '2026-01-14', facts: {}, ...overrides };
}
