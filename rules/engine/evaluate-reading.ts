import type { Conditions, Doubt } from '../record';
import type { GradationMeasure, ReadingMeasure } from '../rule-sets/measure';
import type { ResolvedRule } from '../rule-sets/resolve';
import { subjectsOf } from './doubts';
import { evaluateValue } from './evaluate-value';
import type { Finding } from './finding';
import { matchingRows } from './look-up';
import { makeFinding } from './make-finding';
import { naturalOrder } from './natural-order';
import { subjectOf } from './subject';
import type { World } from './world';

/** A `reading` rule: one finding, or one a stockpile or a sieve where the rule or the quantity asks for it. */
export function evaluateReading(world: World, rule: ResolvedRule, measure: ReadingMeasure): Finding[] {
  const { quantity, statistic } = measure;
  return conditionsOfSubjects(world, measure).map((at) =>
    evaluateValue({ world, rule, measure, quantity, statistic, at }),
  );
}

/** A `gradation` rule: one finding a sieve of the table. No gradation at all is one finding. */
export function evaluateGradation(world: World, rule: ResolvedRule, measure: GradationMeasure): Finding[] {
  const at = measure.at;
  const base = { subject: subjectOf(world, measure, at), at, quantity: PASSING };
  const evaluated = (conditions: Conditions) =>
    evaluateValue({ world, rule, measure, quantity: PASSING, statistic: 'mean', at: conditions });
  const hasNone = [...GRADATION].every((quantity) => (world.readings.get(quantity) ?? []).length === 0);
  if (hasNone && !world.record.doubts.some((doubt) => isAboutGradation(doubt))) {
    return [makeFinding(world, rule, { ...base, outcome: 'not shown', reason: 'There is no gradation.' })];
  }
  const rows = matchingRows(world, measure.table, { sieve: undefined });
  if (!rows.ok) return [makeFinding(world, rule, { ...base, ...rows })];
  const sieves = [...new Set(rows.found.map(({ row }) => Number(row.sieve)))].filter((sieve) => sieve > 0);
  if (sieves.length === 0) {
    const reason = `${world.view.tableTitle(measure.table)} has no row for this mix.`;
    return [makeFinding(world, rule, { ...base, outcome: 'undecided', reason })];
  }
  return sieves.map((sieve) => evaluated({ ...at, sieve }));
}

const PASSING = 'percent-passing';

function isAboutGradation(doubt: Doubt): boolean {
  return subjectsOf(doubt).some(({ quantity }) => GRADATION.has(quantity));
}

const GRADATION = new Set([PASSING, 'percent-retained', 'cumulative-percent-retained']);

/** Conditions of all that there is of a quantity: readings, and percent passing that was stated as retained. */
function conditionsOf(world: World, quantity: string): Conditions[] {
  const read = (world.readings.get(quantity) ?? []).map(({ at }) => at);
  const converted = (world.recomputed.get(quantity) ?? []).filter(({ origin }) => origin === 'converted');
  return converted.length === 0 ? read : [...read, ...converted.map(({ at }) => at)];
}

/** The conditions of each subject of a rule: every stockpile, every sieve that readings hold, or just the rule's. */
export function conditionsOfSubjects(
  world: World,
  { quantity, at }: { quantity: string; at: Conditions },
): Conditions[] {
  const splitsBySieve =
    at.sieve === undefined && (world.view.quantity(quantity)?.conditions.includes('sieve') ?? false);
  if (at.stockpile !== 'each' && !splitsBySieve) return [at];
  const ofLaboratory = conditionsOf(world, quantity).filter(
    ({ laboratory = 'contractor' }) => laboratory === (at.laboratory ?? 'contractor'),
  );
  let subjects: Conditions[] = [at];
  if (at.stockpile === 'each') {
    const names = ofLaboratory.flatMap(({ stockpile }) => (stockpile === undefined ? [] : [stockpile]));
    const stockpiles = [...new Set(names)].toSorted(naturalOrder);
    if (stockpiles.length > 0) subjects = stockpiles.map((stockpile) => ({ ...at, stockpile }));
  }
  if (!splitsBySieve) return subjects;
  return subjects.flatMap((subject) => {
    const matching = ofTrial(
      ofLaboratory.filter(({ stockpile }) => stockpile === subject.stockpile),
      at.trial,
    );
    const sieves = [...new Set(matching.flatMap(({ sieve }) => (sieve === undefined ? [] : [sieve])))];
    return sieves.length === 0 ? [subject] : sieves.map((sieve) => ({ ...subject, sieve }));
  });
}

/** Sieves of another trial are no subjects of this one, unless there are none but those. */
function ofTrial(conditions: Conditions[], trial = 'design'): Conditions[] {
  const own = conditions.filter((each) => each.trial === undefined || each.trial === trial);
  return own.length > 0 ? own : conditions;
}
