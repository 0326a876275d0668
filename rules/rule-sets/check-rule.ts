import { convert, normaliseUnit } from '../quantities/units';
import { boundsOf, isQuantityReference, isTableReference } from './bounds-of';
import { checkLimits } from './check-limits';
import { checkWhen } from './check-when';
import type { EditionView } from './edition-view';
import { readFormula } from './formula';
import type { FormulaMeasure, Statistic } from './measure';
import type { DocumentProblem } from './problem';
import type { Rule } from './schema';

export type ReportFault = (at: string, detail: string, fix: string) => void;

/** References of one rule that lead nowhere, and limits that do not fit what is measured. */
export function checkRule(rule: Rule, pointer: string, view: EditionView): DocumentProblem[] {
  const problems: DocumentProblem[] = [];
  const report: ReportFault = (at, detail, fix) =>
    problems.push({ pointer: `${pointer}${at}`, detail: `Rule ${rule.id}: ${detail}`, fix });

  if (rule.when) checkWhen(rule.when, '/when', view, report);
  checkMeasure(rule, view, report);
  checkTableReferences(rule, view, report);
  checkLimits(rule, view, report);
  return problems;
}

function checkMeasure(rule: Rule, view: EditionView, report: ReportFault): void {
  const { measure } = rule;
  if ('quantity' in measure) checkQuantity(measure.quantity, '/measure/quantity', view, report);
  (measure.where ?? []).forEach((where, i) => {
    checkQuantity(where.quantity, `/measure/where/${i}/quantity`, view, report);
  });
  if (measure.kind === 'attribute' && !view.attribute(measure.attribute)) {
    report(
      '/measure/attribute',
      `the attribute ${measure.attribute} is not known.`,
      'Declare it among the attributes, or correct its name.',
    );
  }
  if (measure.kind === 'document' && !view.document(measure.type)) {
    report(
      '/measure/type',
      `the document type ${measure.type} is not known.`,
      'Declare it among the documents, or correct its name.',
    );
  }
  if (measure.kind === 'formula') checkFormula(measure, view, report);
  if (measure.kind === 'gradation') {
    const table = view.table(measure.table);
    if (!table) unknownTable(measure.table, '/measure/table', report);
    else if (!table.keys.includes('sieve')) {
      report(
        '/measure/table',
        `the table ${measure.table} is not keyed by sieve.`,
        'Add the key sieve to it.',
      );
    }
  }
  if (measure.kind === 'difference' && NOT_OF_TWO.has(measure.statistic)) {
    report(
      '/measure/statistic',
      `a difference between two values cannot be taken over ${measure.statistic}.`,
      'Use mean, min, max, range, standard-deviation, trimmed-mean or count.',
    );
  }
  if (measure.kind === 'reading') {
    const wantsWithin = measure.statistic === 'percent-within-limits';
    if (wantsWithin !== (measure.within !== undefined)) {
      report(
        '/measure/within',
        wantsWithin
          ? 'percent-within-limits has no limits to be within.'
          : 'within is given, but the statistic is not percent-within-limits.',
        'Give within: { min, max } with the statistic percent-within-limits, and only with it.',
      );
    }
  }
}

function checkFormula(measure: FormulaMeasure, view: EditionView, report: ReportFault): void {
  const result = readFormula(measure.expression, view);
  if (!result.ok) {
    report('/measure/expression', `in the formula "${measure.expression}", ${result.detail}`, result.fix);
    return;
  }
  for (const { symbol, quantity, sieve } of result.formula.symbols) {
    const isBySieve = view.quantity(quantity)?.conditions.includes('sieve') ?? false;
    if (!isBySieve || sieve !== null || measure.at.sieve !== undefined) continue;
    report(
      '/measure/expression',
      `in the formula "${measure.expression}", ${symbol} does not say at which sieve.`,
      `Write the opening in mm behind it, such as ${symbol}0.075, or name the sieve in at.`,
    );
  }
  if (measure.unit !== undefined && normaliseUnit(measure.unit) === null) {
    report(
      '/measure/unit',
      `the unit ${measure.unit} is not known.`,
      'Give a unit of the registry, such as %.',
    );
  }
}

/** Statistics that are no one value of each side. */
const NOT_OF_TWO = new Set<Statistic>(['each', 'percent-within-limits']);

function checkQuantity(id: string, at: string, view: EditionView, report: ReportFault): void {
  if (view.quantity(id)) return;
  report(
    at,
    `the quantity ${id} is not known.`,
    'Use an id of the registry, or declare it among the quantities.',
  );
}

function unknownTable(id: string, at: string, report: ReportFault): void {
  report(at, `the table ${id} is not known.`, 'Add the table, or correct its id.');
}

function checkTableReferences(rule: Rule, view: EditionView, report: ReportFault): void {
  const references = boundsOf(rule).map(({ path, bound }) => ({ path, target: bound as unknown }));
  references.push({ path: '/limit/oneOf', target: rule.limit.oneOf });
  references.push({ path: '/rounding/to', target: rule.rounding?.to });
  for (const { path, target } of references) {
    if (isQuantityReference(target)) {
      checkQuantity(target.quantity, `${path}/quantity`, view, report);
      checkReferenceUnit(rule, path, target.quantity, view, report);
    }
    if (!isTableReference(target)) continue;
    const table = view.table(target.table);
    if (!table) {
      unknownTable(target.table, `${path}/table`, report);
      continue;
    }
    const column = table.columns.find((each) => each.name === target.column);
    if (!column) {
      report(
        `${path}/column`,
        `the table ${table.id} has no column ${target.column}.`,
        `Choose one of ${table.columns.map((each) => each.name).join(', ')}.`,
      );
      continue;
    }
    if (table.keys.includes('sieve') && !hasSieve(rule, view)) {
      report(
        `${path}/table`,
        `the table ${table.id} is keyed by sieve, but nothing measured here has one.`,
        'Use a table without the key sieve.',
      );
    }
    checkUnit(rule, path, column, view, report);
  }
}

function checkUnit(
  rule: Rule,
  path: string,
  column: { name: string; unit?: string | undefined },
  view: EditionView,
  report: ReportFault,
): void {
  if (!path.startsWith('/limit') || path.endsWith('oneOf') || column.unit === undefined) return;
  const unit = measuredUnit(rule, view);
  if (unit === null || unit === column.unit) return;
  const converted = convert(1, unit, column.unit);
  if (!converted.ok) {
    report(
      `${path}/column`,
      `the column ${column.name} is in ${column.unit}, but the value is in ${unit}.`,
      `Give the column in ${unit} or a unit of the same kind.`,
    );
  }
}

/** A limit taken from another quantity must be of the same kind as the value. */
function checkReferenceUnit(
  rule: Rule,
  path: string,
  quantity: string,
  view: EditionView,
  report: ReportFault,
): void {
  const other = view.quantity(quantity)?.unit;
  const unit = measuredUnit(rule, view);
  if (!path.startsWith('/limit') || unit === null || other === undefined || convert(1, other, unit).ok)
    return;
  report(
    `${path}/quantity`,
    `the quantity ${quantity} is in ${other}, but the value is in ${unit}.`,
    'Name a quantity of the same kind as the value.',
  );
}

/** Unit of what a rule measures, null where the value has none that a column could contradict. */
export function measuredUnit(rule: Rule, view: EditionView): string | null {
  const { measure } = rule;
  if (measure.kind === 'gradation') return view.quantity('percent-passing')?.unit ?? null;
  if (measure.kind === 'attribute') return view.attribute(measure.attribute)?.unit ?? null;
  if (measure.kind === 'reading') {
    if (measure.statistic === 'count') return null;
    if (measure.statistic === 'percent-within-limits') return '%';
    return view.quantity(measure.quantity)?.unit ?? null;
  }
  if (measure.kind === 'formula') return measure.unit ?? '1';
  if (measure.kind === 'creep-compliance') return view.quantity('creep-compliance')?.unit ?? null;
  return measure.kind === 'difference' ? (view.quantity(measure.quantity)?.unit ?? null) : null;
}

function hasSieve(rule: Rule, view: EditionView): boolean {
  const { measure } = rule;
  if (measure.kind === 'gradation') return true;
  if (measure.kind !== 'reading' && measure.kind !== 'difference') return false;
  if (measure.kind === 'reading' && measure.at.sieve !== undefined) return true;
  return view.quantity(measure.quantity)?.conditions.includes('sieve') ?? false;
}
