import type { Observed, Outcome, ResolvedLimit } from '../engine/finding';
import { decimalsOf, type RoundingMethod } from '../numerics/round';
import type { Conditions } from '../record';
import { measuredUnit } from './check-rule';
import { creepClauses } from './creep-words';
import type { EditionView } from './edition-view';
import { readFormula } from './formula';
import { generalLimitWords, intervalWords, oneOfWords, resolvedLimitWords } from './limit-words';
import type { CreepComplianceMeasure, FormulaMeasure, Measure, Statistic } from './measure';
import type { Rule } from './schema';
import { conditionSentence } from './when-words';
import {
  capitalised,
  censoredWords,
  computedWords,
  conditionWords,
  dateWords,
  numberWords,
  plural,
  quantityPhrase,
  withUnit,
} from './words';

export { cellWords } from './limit-words';
export { conditionClause, conditionSentence } from './when-words';

/** The rule in general terms, naming its table, with how it counts, rounds and when it applies. */
export function ruleSentence(rule: Rule, view: EditionView): string {
  return ruleSentenceParts(rule, view)
    .map(({ text }) => text)
    .join('');
}

/** A stretch of the rule's sentence, and the field of the rule that it comes from; joined they are the sentence. */
export interface SentencePart {
  field: 'measure' | 'limit' | 'rounding' | 'when' | null;
  text: string;
}

export function ruleSentenceParts(rule: Rule, view: EditionView): SentencePart[] {
  const rounding = roundingClause(rule, view);
  const clauses: SentencePart[] = [
    ...countClauses(rule, view).map((text): SentencePart => ({ field: 'measure', text })),
    ...(rounding === '' ? [] : [{ field: 'rounding' as const, text: rounding }]),
  ];
  return [
    { field: 'measure', text: labelOf(rule.measure, generalAt(rule), view) },
    { field: null, text: ' ' },
    { field: 'limit', text: limitClause(rule, view) },
    ...clauses.flatMap((clause): SentencePart[] => [{ field: null, text: '; ' }, clause]),
    { field: null, text: '.' },
    ...(rule.when === undefined
      ? []
      : [
          { field: null, text: ' ' },
          { field: 'when' as const, text: conditionSentence(rule.when, view) },
        ]),
  ];
}

/** Only the limit of a rule in general terms: "at least the value in Minimum VMA". */
export function limitWords(rule: Rule, view: EditionView): string {
  return generalLimitWords(rule.limit, measuredUnit(rule, view) ?? '', view);
}

/** The requirement with its limits resolved for one mix: "Voids in the mineral aggregate are at least 14.0 %." */
export function requirementSentence({ rule, view, at, limit, date }: RequirementInput): string {
  const label = labelOf(rule.measure, at, view);
  const verb = verbOf(rule.measure, view);
  if (rule.measure.kind === 'document') return `${label} ${documentClause(rule.measure, date ?? null)}.`;
  if (limit === null) return `${label} ${limitClause(rule, view)}.`;
  if (rule.limit.present) return `${label} ${verb} shown.`;
  const words = limit.oneOf === null ? resolvedLimitWords(limit) : oneOfWords(limit.oneOf);
  if (rule.measure.kind === 'difference') return `${label} differ by ${withUnit(words, limit.unit)}.`;
  return `${label} ${verb} ${withUnit(words, limit.oneOf ? '' : limit.unit)}.`;
}

/** Value, then limit: "Voids in the mineral aggregate are 13.9 %, at least 14.0." */
export function resultSentence({ rule, view, at, limit, outcome, observed, date }: ResultInput): string {
  const { measure } = rule;
  const label = labelOf(measure, at, view, observed?.count);
  const verb = measure.kind === 'difference' ? 'differ by' : verbOf(measure, view);
  const isShown = measure.kind === 'difference' ? 'are' : verb;
  if (outcome === 'not applicable') return `${label} ${isShown} not judged, as the rule does not apply.`;
  if (measure.kind === 'document') return documentResult(label, measure, outcome, observed, date ?? null);
  const suffix = limit && !rule.limit.present ? `, ${limitAfter(limit, observed === null)}` : '';
  if (outcome === 'not shown') return `${label} ${isShown} not shown${suffix}.`;
  if (observed === null) return `${label} ${isShown} not decided${suffix}.`;
  return `${label} ${verb} ${withUnit(censoredWords(observed.text), observed.unit)}${suffix}.`;
}

/** How the statistic was rounded: "13.94 becomes 13.9: ASTM E29, rounding method, to 0.1." */
export function roundingSentence(input: {
  value: number;
  rounded: number;
  method: RoundingMethod;
  to: number;
  decimals: number;
  stated: boolean;
}): string {
  const { value, rounded, method, to, decimals, stated } = input;
  if (method === 'absolute') {
    const reason = stated
      ? 'ASTM E29, absolute method'
      : 'the rule names no rounding, so the absolute method applies';
    return `${numberWords(value, Math.max(decimals, Math.min(6, decimalsOf(value))))} is not rounded: ${reason}.`;
  }
  const verb = value === rounded ? 'stays' : 'becomes';
  const change = `${computedWords(value, decimals)} ${verb} ${numberWords(rounded, decimals)}`;
  return `${change}: ${METHOD_WORDS[method]} ${numberWords(to)}.`;
}

interface RequirementInput {
  rule: Rule;
  view: EditionView;
  /** The conditions of the subject: its sieve, its stockpile. */
  at: Conditions;
  limit: ResolvedLimit | null;
  /** The date that a document's age is counted to, where it is known. */
  date?: string | null;
}

interface ResultInput extends RequirementInput {
  outcome: Outcome;
  observed: Observed | null;
}

const METHOD_WORDS: Record<Exclude<RoundingMethod, 'absolute'>, string> = {
  rounding: 'ASTM E29, rounding method, to',
  'half-up': 'halves are rounded up, to',
  truncate: 'further digits are dropped, to',
};

const STATISTIC_WORDS: Record<Statistic, string> = {
  mean: '',
  each: 'worst',
  min: 'lowest',
  max: 'highest',
  range: 'range',
  'standard-deviation': 'standard deviation',
  'trimmed-mean': 'trimmed mean',
  count: 'number of results',
  'percent-within-limits': 'percent within limits',
};

/** The noun phrase that opens every sentence about a rule. */
function labelOf(measure: Measure, at: Conditions, view: EditionView, count?: number): string {
  switch (measure.kind) {
    case 'reading':
      return `${phrase(measure.quantity, at, view)}${statisticWords(measure.statistic, count)}`;
    case 'gradation':
      return phrase('percent-passing', at, view);
    case 'difference':
      return `${phrase(measure.quantity, at, view)}, ${measure.between.join(' and ')},`;
    case 'attribute':
      return view.attributeLabel(measure.attribute);
    case 'document':
      return view.document(measure.type)?.label ?? measure.type;
    case 'creep-compliance':
      return phrase('creep-compliance', creepConditions(measure), view);
    case 'formula':
      return formulaWords(measure, at, view);
  }
}

function creepConditions({ temperature, time, stress }: CreepComplianceMeasure): Conditions {
  return stress === undefined ? { temperature, time } : { temperature, time, stress };
}

function phrase(id: string, at: Conditions, view: EditionView): string {
  const quantity = view.quantity(id);
  return quantity ? quantityPhrase(quantity, at, { opening: true }) : capitalised(id);
}

/** "Gse − Gsb", "Gsa − Gsb of stockpile Bin 1" */
function formulaWords(measure: FormulaMeasure, at: Conditions, view: EditionView): string {
  const formula = readFormula(measure.expression, view);
  return `${formula.ok ? formula.formula.text : measure.expression}${conditionWords(at)}`;
}

/** What each symbol stands for: "Gse is effective specific gravity of the aggregate". */
function symbolClauses(measure: FormulaMeasure, view: EditionView): string[] {
  const formula = readFormula(measure.expression, view);
  if (!formula.ok) return [];
  return formula.formula.symbols.map(({ symbol, quantity, sieve }) => {
    const entry = view.quantity(quantity);
    const name = entry ? quantityPhrase(entry, sieve === null ? {} : { sieve }) : quantity;
    return `${symbol} is ${name}`;
  });
}

function statisticWords(statistic: Statistic, count: number | undefined): string {
  if (statistic === 'mean') return '';
  if (statistic === 'count') return ', number of results,';
  if (statistic === 'each' && count === undefined) return ', each specimen,';
  const of = count === undefined ? 'the specimens' : plural(count, 'specimen');
  return `, ${STATISTIC_WORDS[statistic]} of ${of},`;
}

function verbOf(measure: Measure, view: EditionView): string {
  if (measure.kind === 'difference') return 'differ by';
  if (measure.kind !== 'reading') return 'is';
  const counts: Statistic[] = ['range', 'standard-deviation', 'count', 'percent-within-limits'];
  if (counts.includes(measure.statistic)) return 'is';
  return view.quantity(measure.quantity)?.plural ? 'are' : 'is';
}

function generalAt(rule: Rule): Conditions {
  const { measure } = rule;
  return 'at' in measure ? measure.at : {};
}

function limitClause(rule: Rule, view: EditionView): string {
  const { measure } = rule;
  if (measure.kind === 'document') return documentClause(measure, null);
  const verb = verbOf(measure, view);
  return `${verb} ${limitWords(rule, view)}`;
}

function countClauses(rule: Rule, view: EditionView): string[] {
  const { measure } = rule;
  const clauses: string[] = [];
  const unit = measuredUnit(rule, view) ?? '';
  if (measure.kind === 'reading') {
    if (measure.minimumCount !== undefined) {
      const prefix = measure.statistic === 'mean' ? 'mean of ' : 'from ';
      clauses.push(`${prefix}at least ${plural(measure.minimumCount, 'result')}`);
    }
    if (measure.alsoEach) clauses.push(`each result ${intervalWords(measure.alsoEach, unit, view)}`);
    if (measure.within)
      clauses.push(`the limits to be within are ${intervalWords(measure.within, unit, view)}`);
  }
  if (measure.kind === 'formula') clauses.push(...symbolClauses(measure, view));
  if (measure.kind === 'creep-compliance') clauses.push(...creepClauses(measure));
  for (const where of measure.where ?? []) {
    const quantity = view.quantity(where.quantity);
    const name = quantity ? quantityPhrase(quantity, where.at) : where.quantity;
    clauses.push(`only specimens count whose ${name} is ${intervalWords(where, quantity?.unit ?? '', view)}`);
  }
  return clauses;
}

export function roundingClause(rule: Rule, view: EditionView): string {
  if (rule.limit.present || rule.limit.oneOf !== undefined || rule.measure.kind === 'document') return '';
  const { rounding } = rule;
  if (rounding === undefined) return 'not rounded, as no rounding is named';
  if (rounding.method === 'absolute') return 'not rounded (ASTM E29, absolute method)';
  const to =
    rounding.to === 'limit'
      ? "the limit's own decimals"
      : typeof rounding.to === 'object'
        ? `the step in ${view.tableTitle(rounding.to.table)}`
        : numberWords(rounding.to);
  const method = rounding.method === 'rounding' ? ' (ASTM E29, rounding method)' : '';
  const verb = rounding.method === 'truncate' ? 'cut off' : 'rounded';
  return `${verb} to ${to}${rounding.method === 'half-up' ? ', halves up' : method}`;
}

function documentClause(measure: Extract<Measure, { kind: 'document' }>, date: string | null): string {
  const verb = measure.enclosed ? 'is enclosed' : 'is stated';
  if (measure.maximumAgeMonths === undefined) {
    return measure.on === undefined ? verb : `${verb} and dated no later than ${dayWords(measure.on, date)}`;
  }
  const age = plural(measure.maximumAgeMonths, 'month');
  return `${verb} and at most ${age} old on ${dayWords(measure.on ?? 'submitted', date)}`;
}

function documentResult(
  label: string,
  measure: Extract<Measure, { kind: 'document' }>,
  outcome: Outcome,
  observed: Observed | null,
  date: string | null,
): string {
  const age =
    measure.maximumAgeMonths === undefined
      ? ''
      : `, at most ${plural(measure.maximumAgeMonths, 'month')} before ${dayWords(measure.on ?? 'submitted', date)}`;
  if (outcome === 'not shown') return `${label} is not ${measure.enclosed ? 'enclosed' : 'shown'}${age}.`;
  if (observed === null || observed.text === '') {
    return outcome === 'pass'
      ? `${label} is ${measure.enclosed ? 'enclosed' : 'stated'}.`
      : `${label} is stated without a date${age}.`;
  }
  return `${label} is dated ${observed.text}${age}.`;
}

function dayWords(on: string, date: string | null): string {
  const known = date ?? (/^\d/.test(on) ? on : null);
  if (known !== null) return dateWords(known);
  return on === 'letting' ? 'the letting date' : 'the day of submission';
}

/** After a missing value the limit carries the unit; after a value it does not repeat it. */
function limitAfter(limit: ResolvedLimit, withItsUnit: boolean): string {
  const words = resolvedLimitWords(limit);
  return withItsUnit && limit.oneOf === null ? withUnit(words, limit.unit) : words;
}
