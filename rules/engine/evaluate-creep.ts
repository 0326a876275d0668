import { convert } from '../quantities/units';
import type { Conditions } from '../record';
import type { CreepComplianceMeasure } from '../rule-sets/measure';
import type { ResolvedRule } from '../rule-sets/resolve';
import { withUnit } from '../rule-sets/words';
import type { CreepPoint } from './creep-points';
import { creepDoubt, selectCreepPoints, testedAt } from './creep-selection';
import { creepValue } from './creep-value';
import type { CreepBeyond, CreepValue } from './creep-value-parts';
import { distanceWords } from './distance-words';
import type { Finding, Observed, ResolvedLimit } from './finding';
import { type Judgement, judge, type Rounder, rounderOf } from './judge';
import { makeFinding } from './make-finding';
import { type Obstacle, undecided } from './obstacle';
import { isBorderline, precisionOf } from './precision';
import { resolveLimit } from './resolve-limit';
import { subjectOf } from './subject';
import type { World } from './world';

/** A `creep-compliance` rule: the compliance at one temperature and loading time against the limit. */
export function evaluateCreep(world: World, rule: ResolvedRule, measure: CreepComplianceMeasure): Finding[] {
  const at: Conditions = {};
  const base = { subject: subjectOf(world, measure, at), at, quantity: QUANTITY };
  const limit = resolveLimit(world, rule, at);
  const shown = limit.ok ? limit.limit : null;
  const selected = selectCreepPoints(world, measure);
  const doubt = creepDoubt(world, measure, selected.ok ? selected.points : [], judgedTime(measure, selected));
  const obstacle = doubt ?? (selected.ok ? (limit.ok ? null : limit) : selected);
  if (obstacle !== null || !selected.ok || !limit.ok) {
    const evidence = selected.ok
      ? testedAt(selected.points, measure.time).map((point) => point.evidence)
      : [];
    const found = obstacle ?? undecided('The rule could not be judged.');
    return [makeFinding(world, rule, { ...base, ...found, limit: shown, evidence })];
  }
  const inLimitUnit = limitInOwnUnit(limit.limit);
  if (!inLimitUnit.ok) return [makeFinding(world, rule, { ...base, ...inLimitUnit, limit: shown })];
  const value = creepValue({ measure, points: selected.points, limit: inLimitUnit.limit });
  const subject = { world, rule, measure, base, limit: limit.limit, points: selected.points };
  if (!value.ok) return [unjudged(subject, value)];
  return [judgedFinding(subject, value)];
}

const QUANTITY = 'creep-compliance';
const OWN_UNIT = '1/GPa';

interface Subject {
  world: World;
  rule: ResolvedRule;
  measure: CreepComplianceMeasure;
  base: { subject: string; at: Conditions; quantity: string };
  limit: ResolvedLimit;
  points: readonly CreepPoint[];
}

/** Only what is judged as measured at the rule's own time is free of doubts about other times. */
function judgedTime(
  measure: CreepComplianceMeasure,
  selected: { ok: true; points: CreepPoint[] } | Obstacle,
): number | null {
  if (measure.source === 'fitted') return null;
  const isTested = selected.ok && testedAt(selected.points, measure.time).length > 0;
  const isBound = measure.source === 'either' && measure.use !== undefined && measure.use !== 'estimate';
  return (measure.source === 'measured' || isTested) && !isBound ? measure.time : null;
}

function unjudged(
  { world, rule, base, limit, points, measure }: Subject,
  value: Obstacle | CreepBeyond,
): Finding {
  const { outcome, reason, wouldDecide } = value;
  const parts = { ...base, outcome, reason, wouldDecide, limit };
  if (!('estimate' in value)) {
    const evidence = testedAt(points, measure.time).map((point) => point.evidence);
    return makeFinding(world, rule, { ...parts, evidence });
  }
  const inUnit = convert(value.estimate, OWN_UNIT, limit.unit);
  const rounding = rounderOf(world, rule, limit, base.at);
  const { evidence } = value;
  if (!inUnit.ok || !rounding.ok) return makeFinding(world, rule, { ...parts, evidence });
  const judgement = judge({ value: inUnit.value, text: null, allowed: null }, limit, rounding.rounder);
  const observed = observedOf(inUnit.value, judgement, limit.unit, 'fitted', value.count);
  const { roundingSentence } = judgement;
  return makeFinding(world, rule, { ...parts, observed, roundingSentence, evidence });
}

function judgedFinding(subject: Subject, value: CreepValue): Finding {
  const { world, rule, base, limit } = subject;
  const { evidence, count } = value;
  const rounding = rounderOf(world, rule, limit, base.at);
  if (!rounding.ok) return makeFinding(world, rule, { ...base, ...rounding, limit, evidence });
  const { rounder } = rounding;
  const judged = worst(value, limit, rounder);
  if (!judged.ok) return makeFinding(world, rule, { ...base, ...judged, limit, evidence });
  const { judgement } = judged;
  const quantity = world.view.quantity(QUANTITY);
  const precision = precisionOf({ rule, quantity, statistic: 'mean', count, unit: limit.unit });
  const observed = observedOf(judged.value, judgement, limit.unit, judged.statistic, count);
  const { roundingSentence } = judgement;
  const parts = { ...base, limit, observed, precision, roundingSentence, evidence: judged.evidence };
  const reported = againstReported(subject, judgement.outcome, rounder);
  if (reported.contradicts) {
    const { reason, wouldDecide } = reported;
    return makeFinding(world, rule, { ...parts, outcome: 'undecided', reason, wouldDecide });
  }
  const words =
    judgement.outcome === 'undecided'
      ? 'The value is only known within a range that allows both a pass and a fail.'
      : distanceWords(judgement, limit);
  return makeFinding(world, rule, {
    ...parts,
    outcome: judgement.outcome,
    reason: [words, value.note, reported.reason].filter(Boolean).join(' '),
    ...(judgement.outcome === 'undecided' ? { wouldDecide: 'State the compliance as a number.' } : {}),
    margin: judgement.margin,
    borderline: isBorderline(judgement.margin, precision),
  });
}

type Worst =
  | {
      ok: true;
      judgement: Judgement;
      value: number;
      statistic: string;
      evidence: CreepValue['evidence'];
    }
  | Obstacle;

/** Of two bounds the one that does worse: a fail before a pass, then the smaller margin. */
function worst(value: CreepValue, limit: ResolvedLimit, rounder: Rounder): Worst {
  let found: Extract<Worst, { ok: true }> | null = null;
  for (const [i, { judgeable, statistic }] of value.judgeables.entries()) {
    const allowed = judgeable.allowed;
    const inUnit = [judgeable.value, allowed?.low ?? 0, allowed?.high ?? 0].map((each) =>
      toUnit(each, limit.unit),
    );
    if (inUnit.some((each) => each === null)) return wrongUnit(limit);
    const [own, low, high] = inUnit.map((each) => each ?? 0) as [number, number, number];
    const judgement = judge(
      { ...judgeable, value: own, allowed: allowed === null ? null : { low, high } },
      limit,
      rounder,
    );
    const evidence = value.evidence.length > i ? [value.evidence[i]!] : value.evidence;
    const next = { ok: true as const, judgement, value: own, statistic, evidence };
    if (found === null || rank(next.judgement) < rank(found.judgement)) found = next;
  }
  return found ?? undecided('There is no value to judge.');
}

function rank({ outcome, margin }: Judgement): number {
  if (outcome === 'undecided') return Number.NEGATIVE_INFINITY;
  return margin ?? 0;
}

/**
 * Where the workbook states another compliance than its own readings give, and judging what it states has another
 * outcome, neither stands.
 */
function againstReported(
  { world, measure, limit, points }: Subject,
  outcome: Judgement['outcome'],
  rounder: Rounder,
): { contradicts: boolean; reason: string; wouldDecide?: string } {
  const differing = points.filter(({ reported }) => reported !== null);
  if (differing.length === 0) return { contradicts: false, reason: '' };
  const stated = points.map((point) =>
    point.reported === null ? point : { ...point, value: point.reported.value },
  );
  const own = limitInOwnUnit(limit);
  const other = own.ok ? creepValue({ measure, points: stated, limit: own.limit }) : own;
  const judged = other.ok ? worst(other, limit, rounder) : other;
  if (judged.ok && judged.judgement.outcome === outcome) return { contradicts: false, reason: '' };
  for (const { reported } of differing) if (reported) world.contradicted.add(reported.recomputed);
  const text = judged.ok ? withUnit(judged.judgement.text, limit.unit) : 'no value';
  return {
    contradicts: true,
    reason: `With the compliances that the workbook states it is ${text}, which differs from what its own readings give and has another outcome.`,
    wouldDecide: 'Correct the strains, the stress or the stated compliances.',
  };
}

/** The limits in 1/GPa, in which curves are computed. */
function limitInOwnUnit(
  limit: ResolvedLimit,
): { ok: true; limit: { min: number | null; max: number | null } } | Obstacle {
  const inOwn = (end: number | null) => (end === null ? null : convert(end, limit.unit, OWN_UNIT));
  const min = inOwn(limit.min);
  const max = inOwn(limit.max);
  if ((min && !min.ok) || (max && !max.ok)) return wrongUnit(limit);
  return { ok: true, limit: { min: min?.ok ? min.value : null, max: max?.ok ? max.value : null } };
}

function wrongUnit(limit: ResolvedLimit): Obstacle {
  return undecided(
    `The value is in ${OWN_UNIT} and the limit in ${limit.unit}, which is no unit of compliance.`,
    'Correct the unit of the limit.',
  );
}

function toUnit(value: number, unit: string): number | null {
  if (!Number.isFinite(value)) return value;
  const converted = convert(value, OWN_UNIT, unit);
  return converted.ok ? converted.value : null;
}

function observedOf(
  value: number,
  judgement: Judgement,
  unit: string,
  statistic: string,
  count: number,
): Observed {
  return { value, rounded: judgement.rounded, text: judgement.text, unit, statistic, count };
}
