import { decimalsOf } from '../../numerics/round';
import { tenTo } from '../../numerics/transcendental';
import { isTableReference, literalOf } from '../../rule-sets/bounds-of';
import { type EditionView, viewOf } from '../../rule-sets/edition-view';
import type { Bound, Limit } from '../../rule-sets/limit';
import type { ResolvedEdition, ResolvedRule } from '../../rule-sets/resolve';
import type { Condition } from '../../rule-sets/when';
import { numberWords, withUnit } from '../../rule-sets/words';
import { holds, pointsOf } from './condition-points';
import type { LintRemark } from './remark';

/** Limits that nothing can meet, that contradict each other, or that are rounded away. */
export function lintLimits(edition: ResolvedEdition): LintRemark[] {
  const view = viewOf(edition);
  return [
    ...edition.rules.flatMap((rule) => [...impossible(rule, view), ...roundedFiner(rule, view)]),
    ...contradictions(edition, view),
  ];
}

/** Statistics that are values of the quantity themselves, not a spread, a count or a share. */
const VALUES = new Set(['mean', 'each', 'min', 'max', 'trimmed-mean']);

interface Ends {
  min: number;
  max: number;
}

function impossible(rule: ResolvedRule, view: EditionView): LintRemark[] {
  const remark = (detail: string, fix: string): LintRemark[] => [
    { level: 'error', check: 'always fails', part: `rules/${rule.id}`, detail, fix },
  ];
  const { limit } = rule;
  const { measure } = rule;
  const quantity = measure.kind === 'reading' ? view.quantity(measure.quantity) : undefined;
  return intervalsOf(limit, view).flatMap(({ min, max }) => {
    if (min === max && isExclusive(limit)) {
      return remark(
        `${rule.title} always fails: nothing is above and below ${numberWords(min)} at once.`,
        'Include one of the ends, or set them apart.',
      );
    }
    if (quantity === undefined || measure.kind !== 'reading' || !VALUES.has(measure.statistic)) return [];
    const { plausible, unit } = quantity;
    if (min <= plausible.max && max >= plausible.min) return [];
    const end = min > plausible.max ? `at least ${numberWords(min)}` : `at most ${numberWords(max)}`;
    return remark(
      `${rule.title} always fails: ${quantity.label} of ${withUnit(end, unit)} lies outside ${numberWords(plausible.min)} to ${withUnit(numberWords(plausible.max), unit)}, where every reading is doubted.`,
      'Correct the limit or its unit.',
    );
  });
}

function isExclusive({ exclusive, min, max }: Limit): boolean {
  const own = (bound: Bound | undefined) => typeof bound === 'object' && bound.exclusive === true;
  return exclusive === true || own(min) || own(max);
}

/** The intervals that a limit can come to: its own numbers, or each row of its table. */
function intervalsOf({ min, max, target, tolerance }: Limit, view: EditionView): Ends[] {
  if (target !== undefined) {
    const middle = literalOf(target);
    const reach = literalOf(tolerance);
    if (middle === null || reach === null) return [];
    return [{ min: Number(middle) - Number(reach), max: Number(middle) + Number(reach) }];
  }
  const low = valuesOf(min, view, -Infinity);
  const high = valuesOf(max, view, Infinity);
  if (low === null || high === null) return [];
  if (low.length > 1 && high.length > 1) {
    const sameTable = isTableReference(min) && isTableReference(max) && min.table === max.table;
    return sameTable ? low.map((value, row) => ({ min: value, max: high[row] ?? Infinity })) : [];
  }
  return low.flatMap((from) => high.map((to) => ({ min: from, max: to })));
}

/** Null where it depends on another quantity of the mix. */
function valuesOf(bound: Bound | undefined, view: EditionView, open: number): number[] | null {
  if (bound === undefined) return [open];
  const literal = literalOf(bound);
  if (literal !== null) return [Number(literal)];
  if (!isTableReference(bound)) return null;
  const cells = view.table(bound.table)?.rows.map((row) => row[bound.column]) ?? [];
  return cells.map((cell) => (typeof cell === 'number' || typeof cell === 'string' ? Number(cell) : open));
}

/** A value judged to more decimals than its limit is written in fails by digits that the limit does not have. */
function roundedFiner(rule: ResolvedRule, view: EditionView): LintRemark[] {
  const { rounding, limit } = rule;
  if (rounding === undefined || rounding.method === 'absolute') return [];
  if (rounding.to === 'limit' || typeof rounding.to === 'object') return [];
  const step = Number(rounding.to);
  const written = [limit.min, limit.max, limit.target].flatMap((bound) => writtenIn(bound, view));
  if (written.length === 0) return [];
  const decimals = Math.max(...written.map(decimalsOf));
  if (step >= tenTo(-decimals) * (1 - 1e-9)) return [];
  return [
    {
      level: 'warning',
      check: 'rounding',
      part: `rules/${rule.id}`,
      detail: `${rule.title} is rounded to ${numberWords(rounding.to)}, finer than its limit ${written.map(String).join(', ')} is written.`,
      fix: 'Round to the decimals of the limit, or write the limit with its decimals.',
    },
  ];
}

function writtenIn(bound: Bound | undefined, view: EditionView): (string | number)[] {
  const literal = literalOf(bound);
  if (literal !== null) return [literal];
  if (!isTableReference(bound)) return [];
  return (view.table(bound.table)?.rows ?? []).flatMap((row) => {
    const cell = row[bound.column];
    return typeof cell === 'number' || typeof cell === 'string' ? [cell] : [];
  });
}

/** Two required rules on the same value, of which one mix could only meet one. */
function contradictions(edition: ResolvedEdition, view: EditionView): LintRemark[] {
  const required = edition.rules
    .filter(({ severity }) => severity === 'required')
    .map((rule) => ({ rule, measured: JSON.stringify(rule.measure) }));
  return required.flatMap(({ rule, measured }, index) =>
    required
      .slice(0, index)
      .filter((other) => other.measured === measured && apart(rule, other.rule, view))
      .filter(({ rule: other }) => canMeet(rule.when, other.when, view))
      .map(
        ({ rule: other }): LintRemark => ({
          level: 'error',
          check: 'contradiction',
          part: `rules/${rule.id}`,
          detail: `${rule.title} and ${other.title} (${other.clause}) judge the same value, and nothing meets both limits.`,
          fix: 'Let one of them apply where the other does not, or correct a limit.',
        }),
      ),
  );
}

/** Only where every interval of the one lies apart from every one of the other: rows are not matched here. */
function apart(left: ResolvedRule, right: ResolvedRule, view: EditionView): boolean {
  const these = intervalsOf(left.limit, view);
  const those = intervalsOf(right.limit, view);
  if (these.length === 0 || those.length === 0) return false;
  return these.every((a) => those.every((b) => a.min > b.max || b.min > a.max));
}

function canMeet(left: Condition | undefined, right: Condition | undefined, view: EditionView): boolean {
  const conditions = [left, right].flatMap((each) => (each === undefined ? [] : [each]));
  if (conditions.length === 0) return true;
  const points = pointsOf(conditions, view);
  return points?.some((point) => conditions.every((each) => holds(each, point))) ?? false;
}
