import type { ReadingResult } from '#rules/reading/reading-result';
import type { Conditions } from '#rules/record';
import type { TrueReading, Truth } from './book';

export interface Score {
  expected: number;
  found: number;
  wrong: number;
  doubts: number;
  missing: string[];
  extra: string[];
}

/** What was read against what is true: a reading counts as found with quantity, value, unit and all conditions right. */
export function score(result: Pick<ReadingResult, 'record' | 'doubts'>, truth: Truth): Score {
  const expected = new Map<string, number>();
  for (const reading of withoutMeans(truth)) {
    const key = keyOf(reading.quantity, reading.unit, reading.at, reading.qualifier);
    expected.set(key, reading.value);
  }
  const missing = new Map(expected);
  const extra: string[] = [];
  let found = 0;
  for (const reading of result.record.readings) {
    const key = keyOf(reading.quantity, reading.unit, reading.at, reading.qualifier);
    const value = expected.get(key);
    if (value !== undefined && reading.value !== null && close(value, reading.value)) {
      found += 1;
      missing.delete(key);
    } else
      extra.push(
        `${key} = ${reading.value} (${reading.source?.sheet}!${reading.source?.cell}) not ${value ?? 'there'}`,
      );
  }
  const facts = scoreFacts(result, truth);
  return {
    expected: expected.size + facts.expected,
    found: found + facts.found,
    wrong: extra.length + facts.extra.length,
    doubts: result.doubts.length,
    missing: [...[...missing].map(([key, value]) => `${key} = ${value}`), ...facts.missing],
    extra: [...extra, ...facts.extra],
  };
}

/** Attributes and documents, of those that are true. */
export function scoreFacts(
  { record }: Pick<ReadingResult, 'record'>,
  truth: Pick<Truth, 'documents'> & { attributes: Record<string, string | number | boolean> },
): Pick<Score, 'expected' | 'found' | 'missing' | 'extra'> {
  const missing: string[] = [];
  const extra: string[] = [];
  let attributes = 0;
  for (const [name, value] of Object.entries(truth.attributes)) {
    const read = record.attributes[name]?.value;
    if (read === value) attributes += 1;
    else if (read === undefined) missing.push(`attribute ${name}`);
    else extra.push(`attribute ${name} = ${read} not ${value}`);
  }
  let documents = 0;
  for (const document of truth.documents) {
    const read = record.documents.find(({ type }) => type === document.type);
    if (read && read.date === document.date && read.validTo === document.validTo) documents += 1;
    else if (read)
      extra.push(
        `document ${document.type} ${read.date}–${read.validTo} not ${document.date}–${document.validTo}`,
      );
    else missing.push(`document ${document.type}`);
  }
  return {
    expected: Object.keys(truth.attributes).length + truth.documents.length,
    found: attributes + documents,
    missing,
    extra,
  };
}

/** A summary's mean of specimens that the workbook has is no further reading. */
function withoutMeans({ readings }: Truth): TrueReading[] {
  const measured = new Set(['bulk-specific-gravity-mix', 'maximum-specific-gravity']);
  const trials = new Set(
    readings
      .filter(({ at }) => at.specimen !== undefined)
      .map(({ quantity, at }) => `${quantity} ${at.trial}`),
  );
  return readings.filter(
    ({ quantity, at }) =>
      at.specimen !== undefined || !measured.has(quantity) || !trials.has(`${quantity} ${at.trial}`),
  );
}

/** A result without a laboratory is the contractor's. */
function keyOf(quantity: string, unit: string, at: Conditions, qualifier?: string): string {
  const stated = Object.entries(at).filter(
    ([name, value]) => value !== undefined && !(name === 'laboratory' && value === 'contractor'),
  );
  const sorted = stated
    .toSorted(([a], [b]) => (a < b ? -1 : 1))
    .map(([name, value]) => `${name}=${typeof value === 'number' ? Number(value.toPrecision(8)) : value}`);
  return `${quantity} [${unit}${qualifier ?? ''}] ${sorted.join(' ')}`;
}

function close(a: number, b: number): boolean {
  return Math.abs(a - b) <= 1e-6 * Math.max(1, Math.abs(a));
}
