import { evidenceOfReading } from '../engine/sample';
import type { DocumentRecord, MixRecord, Reading } from '../record';
import { dateWords } from '../rule-sets/words';
import { type ConsistencyInput, type ConsistencyObservation, subjectOf } from './consistency-observation';

/** Dates that cannot follow one another. */
export function checkDates({ record, submittedOn }: ConsistencyInput): ConsistencyObservation[] {
  return [
    ...expiredBeforeIssued(record),
    ...testedAfterReport(record),
    ...testedAfterSubmission(record, submittedOn),
  ];
}

/** What is submitted has been tested. One finding a quantity, and none where the report is already contradicted. */
function testedAfterSubmission(record: MixRecord, submittedOn: string | null): ConsistencyObservation[] {
  if (submittedOn === null || testedAfterReport(record).length > 0) return [];
  return testedAfter(record.readings, submittedOn, (label, last) => ({
    sentence: `A test of ${label} is dated ${dateWords(last)}, after the submission on ${dateWords(submittedOn)}.`,
    reason: 'What is submitted has been tested before; the date of the test is wrong.',
  }));
}

function expiredBeforeIssued({ documents }: MixRecord): ConsistencyObservation[] {
  return documents.flatMap((document, place) => {
    const { date, validTo } = document;
    if (date === null || validTo === null || validTo >= date) return [];
    return dateBreach({
      subject: `document ${place + 1}, ${documentWords(document)}`,
      sentence: `The ${documentWords(document)} is valid to ${dateWords(validTo)}, before its date, ${dateWords(date)}.`,
      reason: 'One of the two dates is wrong.',
      evidence: [
        {
          quantity: document.type,
          value: null,
          text: validTo,
          unit: '1',
          origin: 'reported',
          source: document.source,
        },
      ],
      quantity: document.type,
      at: {},
    });
  });
}

/** The report states what was found, so nothing in it can have been tested later. One finding a quantity. */
function testedAfterReport({ documents, readings }: MixRecord): ConsistencyObservation[] {
  const dates = documents
    .filter(({ type, date }) => type === 'mix-design-report' && date !== null)
    .map(({ date }) => date!);
  const latest = dates.toSorted().at(-1);
  if (latest === undefined) return [];
  return testedAfter(readings, latest, (label, last) => ({
    sentence: `A test of ${label} is dated ${dateWords(last)}, after the mix design report of ${dateWords(latest)}.`,
    reason: 'A report cannot state a test that was made later; one of the two dates is wrong.',
  }));
}

function testedAfter(
  readings: readonly Reading[],
  day: string,
  words: (label: string, last: string) => Pick<ConsistencyObservation, 'sentence' | 'reason'>,
): ConsistencyObservation[] {
  const late = readings.filter(({ testedOn }) => testedOn !== undefined && testedOn > day);
  return [...new Set(late.map(({ quantity }) => quantity))].map((quantity) => {
    const own = late.filter((reading) => reading.quantity === quantity);
    const dates = own.map(({ testedOn }) => testedOn!).toSorted();
    return dateBreach({
      subject: `${subjectOf(quantity, {})}, date of test`,
      ...words(subjectOf(quantity, {}), dates.at(-1)!),
      evidence: own.map(evidenceOfReading),
      quantity,
      at: own[0]!.at,
    });
  });
}

function dateBreach(
  breach: Pick<ConsistencyObservation, 'subject' | 'sentence' | 'reason' | 'evidence' | 'quantity' | 'at'>,
): ConsistencyObservation {
  return {
    name: 'dates-out-of-order',
    severity: 'advisory',
    outcome: 'fail',
    observed: null,
    limit: null,
    unit: '1',
    ...breach,
  };
}

function documentWords({ type, reference }: DocumentRecord): string {
  return `${type.replaceAll('-', ' ')}${reference === null ? '' : ` ${reference}`}`;
}
