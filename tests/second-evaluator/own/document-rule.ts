import type { DocumentRecord } from '#rules/record';
import type { DocumentMeasure } from '#rules/rule-sets/measure';
import type { Rule } from '#rules/rule-sets/schema';
import type { Judgement } from './judged';
import { type Verdict, type World, without } from './world';

export type DocumentRule = Rule & { measure: DocumentMeasure };

export function documentVerdicts(world: World, rule: DocumentRule): Verdict[] {
  return [{ rule: rule.id, subject: 'mix', ...judgeDocument(world, rule.measure) }];
}

function judgeDocument(world: World, measure: DocumentMeasure): Judgement {
  const { type, enclosed, maximumAgeMonths, on } = measure;
  const matching = world.record.documents.filter(
    (document) => document.type === type && (!enclosed || document.enclosed),
  );
  if (matching.length === 0) {
    const isDoubted = world.record.doubts.some(({ about }) => about.document === type);
    return without(isDoubted ? 'undecided' : 'not shown');
  }
  if (maximumAgeMonths === undefined && on === undefined) return without('pass');
  let newest = matching[0]!;
  for (const document of matching) if (isNewer(document, newest)) newest = document;
  const day = dayOf(world, on);
  if (newest.date === null || day === null || newest.date > day) return without('undecided');
  const isOver = newest.validTo !== null && newest.validTo < day;
  const isOld = maximumAgeMonths !== undefined && laterBy(newest.date, maximumAgeMonths) < day;
  if (!isOver && !isOld) return without('pass');
  // One without a date may be newer than the one that is too old.
  return without(matching.some(({ date }) => date === null) ? 'undecided' : 'fail');
}

/** Of two of one day the one that holds longer. */
function isNewer(document: DocumentRecord, other: DocumentRecord): boolean {
  if (document.date !== other.date) return (document.date ?? '') > (other.date ?? '');
  return other.validTo !== null && (document.validTo === null || document.validTo > other.validTo);
}

function dayOf({ context }: World, on: DocumentMeasure['on']): string | null {
  if (on === undefined || on === 'submitted') return context.submittedOn;
  return on === 'letting' ? context.lettingOn : on;
}

/** The same day so many months later, or the last day of a shorter month. */
function laterBy(date: string, months: number): string {
  const [year = 0, month = 1, day = 1] = date.split('-').map(Number);
  const count = year * 12 + (month - 1) + months;
  const laterYear = Math.floor(count / 12);
  const laterMonth = count % 12;
  const isLeap = (laterYear % 4 === 0 && laterYear % 100 !== 0) || laterYear % 400 === 0;
  const lengths = [31, isLeap ? 29 : 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];
  const laterDay = Math.min(day, lengths[laterMonth]!);
  return `${laterYear}-${String(laterMonth + 1).padStart(2, '0')}-${String(laterDay).padStart(2, '0')}`;
}
