import type { DocumentMeasure } from '#rules/rule-sets/measure';
import type { Rule } from '#rules/rule-sets/schema';
import type { Judgement } from './judged';
import { type Verdict, type World, without } from './world';

type DocumentRule = Rule & { measure: DocumentMeasure };

export function documentVerdicts(world: World, rule: DocumentRule): Verdict[] {
  return [{ rule: rule.id, subject: 'mix', ...judgeDocument(world, rule.measure) }];
}

function judgeDocument(world: World, { type, enclosed, maximumAgeMonths, on }: DocumentMeasure): Judgement {
  const matching = world.record.documents.filter(
    (document) => document.type === type && (!enclosed || document.enclosed),
  );
  if (matching.length === 0) {
    const isDoubted = world.record.doubts.some(({ about }) => about.document === type);
    return without(isDoubted ? 'undecided' : 'not shown');
  }
  let newest = matching[0]!;
  for (const document of matching) if ((document.date ?? '') > (newest.date ?? '')) newest = document;
  const day = dayOf(world, on);
  if (newest.validTo !== null && day !== null && newest.validTo < day) return without('fail');
  if (maximumAgeMonths === undefined) return without('pass');
  if (newest.date === null || day === null || newest.date > day) return without('undecided');
  return without(laterBy(newest.date, maximumAgeMonths) >= day ? 'pass' : 'fail');
}

function dayOf({ context }: World, on: DocumentMeasure['on']): string | null {
  if (on === undefined || on === 'submitted') return context.submittedOn;
  return on === 'letting' ? context.lettingOn : on;
}

/** The same day so many months later, or the last day of a shorter month. */
export function laterBy(date: string, months: number): string {
  const [year = 0, month = 1, day = 1] = date.split('-').map(Number);
  const count = year * 12 + (month - 1) + months;
  const laterYear = Math.floor(count / 12);
  const laterMonth = count % 12;
  const leap = (laterYear % 4 === 0 && laterYear % 100 !== 0) || laterYear % 400 === 0;
  const lengths = [31, leap ? 29 : 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];
  const laterDay = Math.min(day, lengths[laterMonth]!);
  return `${laterYear}-${String(laterMonth + 1).padStart(2, '0')}-${String(laterDay).padStart(2, '0')}`;
}
