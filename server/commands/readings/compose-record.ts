import type { ReadingResult } from '#rules/reading/reading-result';
import type { DocumentRecord, MixRecord, Reading } from '#rules/record';
import { type Scalar, withStandardAttributes } from '#rules/rule-sets/attribute';
import { sameValue } from '#rules/rule-sets/match-value';
import { type AttributeSources, askedAttributes, conflictDoubts } from '../../presenters/asked-attributes';
import { overrulingReading } from '../../presenters/overruling-reading';

export interface TypedAttribute {
  name: string;
  value: Scalar;
  by: string;
  /** Date in the agency's zone. */
  on: string;
}

export interface RecordParts {
  read: Pick<ReadingResult, 'record'>;
  typed: readonly TypedAttribute[];
  typedReadings?: readonly Reading[];
  /** In place of those that were read: with their files, and with those added on the page. */
  documents: DocumentRecord[];
  edition: AttributeSources['edition'];
  /** What the project states. */
  facts: Record<string, Scalar>;
}

/** The canonical record: what was read, with what people said on the reading page laid over it. */
export function composeRecord({ read, documents, edition, facts, ...parts }: RecordParts): MixRecord {
  const { record } = read;
  const typed = stillAsked(parts.typed, { edition, workbook: record.attributes, facts });
  const attributes = { ...record.attributes };
  const definitions = new Map(withStandardAttributes(edition.attributes).map((each) => [each.name, each]));
  for (const { name, value, by, on } of typed) {
    const unit = definitions.get(name)?.unit;
    attributes[name] = {
      value,
      ...(unit === undefined ? {} : { unit }),
      origin: 'typed',
      typed: { by, on },
      source: null,
    };
  }
  const answered = new Set(typed.map(({ name }) => name));
  const conflicts = conflictDoubts({
    edition,
    workbook: record.attributes,
    facts,
    typed: Object.fromEntries(typed.map(({ name, value }) => [name, value])),
  });
  const doubts = record.doubts.filter(({ about }) => !answered.has(about.attribute ?? ''));
  const byHand = (parts.typedReadings ?? []).filter((each) => overrulingReading(each, record) === null);
  return {
    attributes,
    readings: [...record.readings, ...byHand],
    documents,
    doubts: [...doubts, ...conflicts],
  };
}

/**
 * What was typed outlives the workbook it was typed beside. It holds only while the page would still ask for it, and
 * only among what may be answered: a replaced workbook that states another value is not overruled by an old answer.
 */
function stillAsked(
  typed: readonly TypedAttribute[],
  sources: Omit<AttributeSources, 'typed'>,
): TypedAttribute[] {
  const asked = new Map(askedAttributes({ ...sources, typed: {} }).map((each) => [each.name, each]));
  return typed.filter(({ name, value }) => {
    const choices = asked.get(name)?.values;
    return choices !== undefined && (choices.length === 0 || choices.some((each) => sameValue(each, value)));
  });
}
