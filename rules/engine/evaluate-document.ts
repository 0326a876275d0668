import type { DocumentRecord } from '../record';
import type { DocumentMeasure } from '../rule-sets/measure';
import type { ResolvedRule } from '../rule-sets/resolve';
import { dateWords, plural } from '../rule-sets/words';
import { addMonths } from './calendar';
import { answerWords } from './doubts';
import type { Evidence, Finding, Observed } from './finding';
import { makeFinding } from './make-finding';
import { notShown, type Obstacle, undecided } from './obstacle';
import { resolveLimit } from './resolve-limit';
import type { World } from './world';

interface Verdict {
  outcome: 'pass' | 'fail';
  reason: string;
}

/** A `document` rule: it is stated (or enclosed), and old enough to be right and young enough to hold. */
export function evaluateDocument(world: World, rule: ResolvedRule, measure: DocumentMeasure): Finding[] {
  const label = world.view.document(measure.type)?.label ?? measure.type;
  const ofType = world.record.documents.filter(({ type }) => type === measure.type);
  const matching = measure.enclosed ? ofType.filter(({ enclosed }) => enclosed) : ofType;
  const newest = newestOf(matching);
  const limit = resolveLimit(world, rule, {});
  const date = statedDate(world, measure);
  const verdict = verdictOn(world, measure, label, { ofType, matching, newest, date });
  return [
    makeFinding(world, rule, {
      subject: 'mix',
      at: {},
      outcome: verdict.outcome,
      reason: verdict.reason,
      wouldDecide: 'wouldDecide' in verdict ? verdict.wouldDecide : undefined,
      observed: newest === null ? null : observedOf(newest, matching.length),
      limit: limit.ok ? limit.limit : null,
      evidence: matching.map(evidenceOf),
      date,
    }),
  ];
}

interface Found {
  ofType: DocumentRecord[];
  matching: DocumentRecord[];
  newest: DocumentRecord | null;
  date: string | null;
}

function verdictOn(world: World, measure: DocumentMeasure, label: string, found: Found): Verdict | Obstacle {
  const { ofType, matching, newest, date } = found;
  if (newest === null) return absent(world, measure, label, ofType);
  const usesDate = measure.maximumAgeMonths !== undefined || measure.on !== undefined;
  if (!usesDate) return { outcome: 'pass', reason: `It is ${measure.enclosed ? 'enclosed' : 'stated'}.` };
  if (date === null) {
    return undecided(
      `Its age is not known: the ${measure.on === 'letting' ? 'letting date' : 'date of submission'} is not given.`,
      `Give the ${measure.on === 'letting' ? 'letting date' : 'date of submission'}.`,
    );
  }
  if (newest.date === null)
    return undecided('It is stated without a date.', `State the date of the ${label.toLowerCase()}.`);
  if (newest.date > date) {
    return undecided(
      `It is dated ${dateWords(newest.date)}, later than ${dateWords(date)}.`,
      `Correct its date, or enclose one dated no later than ${dateWords(date)}.`,
    );
  }
  const verdict = ageVerdict(newest, newest.date, date, measure.maximumAgeMonths);
  const hasUndated = matching.some((document) => document.date === null);
  if (verdict.outcome === 'fail' && hasUndated) {
    return undecided(
      `${verdict.reason} Another one is stated without a date and may be newer.`,
      'State the date of the other one.',
    );
  }
  return verdict;
}

function absent(world: World, measure: DocumentMeasure, label: string, ofType: DocumentRecord[]): Obstacle {
  const doubt = world.record.doubts.find(
    ({ about, alternatives }) =>
      about.document === measure.type || alternatives.some(({ document }) => document?.type === measure.type),
  );
  if (doubt) {
    const sheet = doubt.sheet === '' ? '' : `${doubt.sheet} `;
    return undecided(
      `A cell with the ${label.toLowerCase()} (${sheet}${doubt.cell}) was not read with certainty: ${doubt.reason.replace(/\.$/, '')}.`,
      answerWords(doubt),
    );
  }
  if (ofType.length > 0) return notShown('It is stated, but not enclosed.');
  return notShown(`No ${label.toLowerCase()} is ${measure.enclosed ? 'enclosed' : 'stated'}.`);
}

function ageVerdict(
  document: DocumentRecord,
  dated: string,
  on: string,
  months: number | undefined,
): Verdict {
  if (document.validTo !== null && document.validTo < on) {
    return {
      outcome: 'fail',
      reason: `It was valid to ${dateWords(document.validTo)}, before ${dateWords(on)}.`,
    };
  }
  if (months === undefined)
    return { outcome: 'pass', reason: `It is dated ${dateWords(dated)}, no later than ${dateWords(on)}.` };
  const lastDay = addMonths(dated, months);
  const age = `${dateWords(dated)} and ${plural(months, 'month')} reach to ${dateWords(lastDay)}`;
  return lastDay >= on
    ? { outcome: 'pass', reason: `${age}, that day included.` }
    : { outcome: 'fail', reason: `${age}, before ${dateWords(on)}.` };
}

/** The newest by date, of two of one day the one that holds longer; undated ones only where there is none with a date. */
export function newestOf(documents: DocumentRecord[]): DocumentRecord | null {
  const dated = documents.filter(({ date }) => date !== null);
  const [newest] = dated.toSorted(
    (a, b) => compareText(b.date ?? '', a.date ?? '') || compareText(heldTo(b), heldTo(a)),
  );
  return newest ?? documents[0] ?? null;
}

function heldTo({ validTo }: DocumentRecord): string {
  return validTo ?? 'without end';
}

function compareText(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}

export function statedDate(world: World, measure: DocumentMeasure): string | null {
  if (measure.on === undefined && measure.maximumAgeMonths === undefined) return null;
  const on = measure.on ?? 'submitted';
  if (on === 'submitted') return world.context.submittedOn;
  return on === 'letting' ? world.context.lettingOn : on;
}

function observedOf(document: DocumentRecord, count: number): Observed {
  const text = document.date === null ? '' : dateWords(document.date);
  return { value: null, rounded: null, text, unit: '', statistic: 'newest', count };
}

function evidenceOf(document: DocumentRecord): Evidence {
  const parts = [
    document.issuer,
    document.reference,
    document.date === null ? 'no date' : dateWords(document.date),
  ];
  return {
    quantity: document.type,
    value: null,
    text: parts.filter((part) => part !== null).join(', '),
    unit: '',
    origin: 'reported',
    source: document.source,
  };
}
