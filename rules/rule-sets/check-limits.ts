import { intervalsOf, isTableReference, literalOf } from './bounds-of';
import type { ReportFault } from './check-rule';
import type { EditionView } from './edition-view';
import type { Bound } from './limit';
import type { Measure } from './measure';
import type { Rule } from './schema';

/** Limits that do not fit the kind of measure, and a min above a max, here or in any row of a table. */
export function checkLimits(rule: Rule, view: EditionView, report: ReportFault): void {
  checkFamily(rule, report);
  checkOrder(rule.limit.min, rule.limit.max, '/limit', view, report);
  for (const { path, interval } of intervalsOf(rule.measure)) {
    checkOrder(interval.min, interval.max, path, view, report);
  }
  const tolerance = literalOf(rule.limit.tolerance);
  if (tolerance !== null && Number(tolerance) < 0) {
    report(
      '/limit/tolerance',
      'the tolerance is negative.',
      'Give the distance on either side of the target.',
    );
  }
  if (rule.precision && Number(rule.precision.value) < 0) {
    report(
      '/precision/value',
      'the precision is negative.',
      'Give the distance on either side of the result.',
    );
  }
}

const FAMILIES: Record<Measure['kind'], string[]> = {
  reading: ['number', 'present'],
  gradation: ['number'],
  'creep-compliance': ['number'],
  formula: ['number'],
  difference: ['number'],
  attribute: ['number', 'oneOf', 'present'],
  document: ['present'],
};

const FAMILY_FIXES: Record<string, string> = {
  number: 'min, max, or target with tolerance',
  oneOf: 'oneOf',
  present: 'present',
};

function checkFamily(rule: Rule, report: ReportFault): void {
  const allowed = FAMILIES[rule.measure.kind];
  const family =
    rule.limit.present !== undefined ? 'present' : rule.limit.oneOf !== undefined ? 'oneOf' : 'number';
  if (allowed.includes(family)) return;
  report(
    '/limit',
    `a measure of the kind ${rule.measure.kind} cannot be held against ${FAMILY_FIXES[family]}.`,
    `Give ${allowed.map((each) => FAMILY_FIXES[each]).join(', or ')}.`,
  );
}

function checkOrder(
  min: Bound | undefined,
  max: Bound | undefined,
  at: string,
  view: EditionView,
  report: ReportFault,
): void {
  if (min === undefined || max === undefined) return;
  const low = valuesOf(min, view);
  const high = valuesOf(max, view);
  const sameTable = isTableReference(min) && isTableReference(max) && min.table === max.table;
  for (const left of low) {
    for (const right of high) {
      const comparable = left.row === null || right.row === null || (sameTable && left.row === right.row);
      if (!comparable || left.value <= right.value) continue;
      const row = left.row ?? right.row;
      report(
        at,
        `the min ${left.value} is above the max ${right.value}${row === null ? '' : ` in row ${row + 1} of its table`}.`,
        'Swap the two, or correct one of them.',
      );
    }
  }
}

function valuesOf(bound: Bound, view: EditionView): { value: number; row: number | null }[] {
  const literal = literalOf(bound);
  if (literal !== null) return [{ value: Number(literal), row: null }];
  if (!isTableReference(bound)) return [];
  const rows = view.table(bound.table)?.rows ?? [];
  return rows.flatMap((row, i) => {
    const cell = row[bound.column];
    const value = typeof cell === 'number' || typeof cell === 'string' ? Number(cell) : Number.NaN;
    return Number.isFinite(value) ? [{ value, row: i }] : [];
  });
}
