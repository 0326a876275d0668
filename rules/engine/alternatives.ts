import type { Doubt, MixRecord, Reading } from '../record';
import { answerWords } from './doubts';
import { type Finding, findingKey } from './finding';
import { type Obstacle, undecided } from './obstacle';

type Alternative = Doubt['alternatives'][number];

/**
 * Findings that an unanswered doubt could turn: what the cell may mean is put into the record, one alternative
 * at a time, and every finding whose outcome would then be another one is not settled.
 */
export function unsettledBy(input: {
  record: MixRecord;
  findings: readonly Finding[];
  evaluate: (record: MixRecord) => readonly Finding[];
}): Map<string, Obstacle> {
  const unsettled = new Map<string, Obstacle>();
  for (const doubt of input.record.doubts) {
    for (const alternative of doubt.alternatives) {
      if (!isMeaning(alternative)) continue;
      const findings = input.evaluate(withAlternative(input.record, doubt, alternative));
      const outcomes = new Map(findings.map((finding) => [findingKey(finding), finding.outcome]));
      for (const finding of input.findings) {
        const key = findingKey(finding);
        const outcome = outcomes.get(key);
        if (outcome === finding.outcome || finding.outcome === 'undecided' || unsettled.has(key)) continue;
        unsettled.set(key, undecided(reasonOf(doubt, alternative, outcome), answerWords(doubt)));
      }
    }
  }
  return unsettled;
}

/** The record as it would be if the cell meant this; a sure reading at the same conditions gives way to it. */
function withAlternative(
  record: MixRecord,
  doubt: Doubt,
  { reading, attribute, document }: Alternative,
): MixRecord {
  return {
    ...record,
    doubts: record.doubts.filter((each) => each !== doubt),
    readings: reading
      ? [...record.readings.filter((each) => !isSameReading(each, reading)), reading]
      : record.readings,
    attributes: attribute ? { ...record.attributes, [attribute.name]: attribute.value } : record.attributes,
    documents: document ? [...record.documents, document] : record.documents,
  };
}

function isMeaning({ reading, attribute, document }: Alternative): boolean {
  return reading !== undefined || attribute !== undefined || document !== undefined;
}

function isSameReading(one: Reading, other: Reading): boolean {
  return one.quantity === other.quantity && conditionsKey(one) === conditionsKey(other);
}

function conditionsKey({ at }: Reading): string {
  const { trial = 'design', laboratory = 'contractor', ...rest } = at;
  const entries = Object.entries({ ...rest, trial, laboratory }).filter(([, value]) => value !== undefined);
  return JSON.stringify(entries.toSorted(([a], [b]) => (a < b ? -1 : 1)));
}

function reasonOf(doubt: Doubt, alternative: Alternative, outcome: Finding['outcome'] | undefined): string {
  const sheet = doubt.sheet === '' ? '' : `${doubt.sheet} `;
  const then = outcome === undefined ? 'this finding would not be made' : `this would be ${outcome}`;
  return `${sheet}${doubt.cell} was not read with certainty (${doubt.reason.replace(/\.$/, '')}); read as "${alternative.label}", ${then}.`;
}
