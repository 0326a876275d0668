import type { DocumentRecord } from '../record';
import type { DocumentMeasure } from '../rule-sets/measure';
import { dateWords, uncapitalised } from '../rule-sets/words';
import { earliestDate } from './calendar';
import { newestOf, statedDate } from './evaluate-document';
import type { ToPass } from './explanation';
import type { World } from './world';

/** Which document, and of which dates, would do in place of none or of one that is too old. */
export function forDocument(world: World, measure: DocumentMeasure): ToPass[] {
  const { type, enclosed, maximumAgeMonths } = measure;
  const usesDate = maximumAgeMonths !== undefined || measure.on !== undefined;
  const on = statedDate(world, measure);
  if (usesDate && on === null) return [];
  const ofType = world.record.documents.filter((document) => document.type === type);
  const newest = newestOf(enclosed ? ofType.filter((document) => document.enclosed) : ofType);
  const name = uncapitalised(world.view.document(type)?.label ?? type);
  const what = enclosed ? `${name} enclosed` : on === null ? `${name} stated` : name;
  const dated = on === null ? '' : `${enclosed ? ',' : ''} dated ${datesWords(on, maximumAgeMonths)}`;
  const words = `${what}${dated}${on === null || newest === null ? '' : insteadWords(newest, on)}`;
  return [{ quantity: type, name, unit: '', present: null, from: null, to: null, words }];
}

function insteadWords({ date, validTo }: DocumentRecord, on: string): string {
  const valid = validTo === null ? '' : ` and valid on ${dateWords(on)}`;
  if (validTo !== null && validTo < on) return `${valid} instead of to ${dateWords(validTo)}`;
  return date === null ? valid : `${valid} instead of ${dateWords(date)}`;
}

function datesWords(on: string, months: number | undefined): string {
  return months === undefined
    ? `no later than ${dateWords(on)}`
    : `${dateWords(earliestDate(on, months))} to ${dateWords(on)}`;
}
