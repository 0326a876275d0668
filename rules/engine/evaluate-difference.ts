import Decimal from 'decimal.js';
import { convert } from '../quantities/units';
import type { Conditions } from '../record';
import type { DifferenceMeasure } from '../rule-sets/measure';
import type { ResolvedRule } from '../rule-sets/resolve';
import type { RecomputedValue } from './analysis';
import { distanceWords } from './distance-words';
import { doubtAbout } from './doubts';
import { conditionsOfSubjects } from './evaluate-reading';
import type { Evidence, Finding, Observed } from './finding';
import { judge, rounderOf } from './judge';
import { makeFinding } from './make-finding';
import { AGREE_WORDS, COMPACT_WORDS, notShown, type Obstacle, undecided } from './obstacle';
import { isBorderline, precisionOf } from './precision';
import { resolveLimit } from './resolve-limit';
import { evidenceOfRecomputed, labelOfRequest, type SampleRequest, takeSample } from './sample';
import { statisticOf } from './statistic';
import { subjectOf } from './subject';
import type { World } from './world';

interface Pair {
  ok: true;
  values: [number, number];
  count: number;
  evidence: Evidence[];
  /** Values of either side of which the workbook reports another one than was recomputed. */
  stated: { side: 0 | 1; value: number; recomputed: RecomputedValue }[];
}

/** A `difference` rule: how far two laboratories, or the workbook and its own raw readings, lie apart. */
export function evaluateDifference(world: World, rule: ResolvedRule, measure: DifferenceMeasure): Finding[] {
  return subjectsOf(world, measure).map((at) => ofSubject(world, rule, measure, at));
}

/** Every sieve that either laboratory has a result of: one that the other lacks is not passed over. */
function subjectsOf(world: World, { quantity, between }: DifferenceMeasure): Conditions[] {
  const own = conditionsOfSubjects(world, { quantity, at: {} });
  if (between[0] !== 'contractor') return own;
  const others = conditionsOfSubjects(world, { quantity, at: { laboratory: 'agency' } });
  const sieves = new Set([...own, ...others].flatMap(({ sieve }) => (sieve === undefined ? [] : [sieve])));
  return sieves.size === 0 ? own : [...sieves].map((sieve) => ({ sieve }));
}

function ofSubject(world: World, rule: ResolvedRule, measure: DifferenceMeasure, at: Conditions): Finding {
  const base = { subject: subjectOf(world, measure, at), at, quantity: measure.quantity };
  const pair =
    measure.between[0] === 'contractor' ? laboratories(world, measure, at) : reported(world, measure, at);
  const limit = resolveLimit(world, rule, at);
  const shown = limit.ok ? limit.limit : null;
  if (!pair.ok) return makeFinding(world, rule, { ...base, ...pair, limit: shown });
  if (!limit.ok) return makeFinding(world, rule, { ...base, ...limit, evidence: pair.evidence });
  const rounding = rounderOf(world, rule, limit.limit, at);
  if (!rounding.ok)
    return makeFinding(world, rule, { ...base, ...rounding, limit: shown, evidence: pair.evidence });

  const own = world.view.quantity(measure.quantity)?.unit ?? limit.limit.unit;
  const one = convert(pair.values[0], own, limit.limit.unit);
  const other = convert(pair.values[1], own, limit.limit.unit);
  if (!one.ok || !other.ok) {
    const reason = `The values are in ${own} and the limit in ${limit.limit.unit}, which do not compare.`;
    return makeFinding(world, rule, {
      ...base,
      outcome: 'undecided',
      reason,
      limit: shown,
      evidence: pair.evidence,
    });
  }
  const judgeApart = (left: number, right: number) => {
    const value = new Decimal(left).minus(right).abs().toNumber();
    return { value, judgement: judge({ value, text: null, allowed: null }, limit.limit, rounding.rounder) };
  };
  const { value, judgement } = judgeApart(one.value, other.value);
  const turned = againstStated(world, pair, (values) => {
    const sides = values.map((each) => convert(each, own, limit.limit.unit));
    const [left, right] = sides.map((side) => (side.ok ? side.value : Number.NaN));
    return judgeApart(left ?? Number.NaN, right ?? Number.NaN).judgement.outcome === judgement.outcome;
  });
  const precision = precisionOf({
    rule,
    quantity: undefined,
    statistic: measure.statistic,
    count: pair.count,
    unit: limit.limit.unit,
  });
  const observed: Observed = {
    value,
    rounded: judgement.rounded,
    text: judgement.text,
    unit: limit.limit.unit,
    statistic: 'difference',
    count: pair.count,
  };
  if (turned.contradicts) {
    const { reason } = turned;
    const parts = { observed, limit: limit.limit, evidence: pair.evidence };
    return makeFinding(world, rule, {
      ...base,
      ...parts,
      outcome: 'undecided',
      reason,
      wouldDecide: AGREE_WORDS,
    });
  }
  return makeFinding(world, rule, {
    ...base,
    outcome: judgement.outcome,
    reason: [distanceWords(judgement, limit.limit), turned.reason].filter(Boolean).join(' '),
    observed,
    limit: limit.limit,
    margin: judgement.margin,
    precision,
    borderline: isBorderline(judgement.margin, precision),
    roundingSentence: judgement.roundingSentence,
    evidence: pair.evidence,
  });
}

/** A side that the workbook reports otherwise: where that turns the outcome, nothing is decided without a cause. */
function againstStated(
  world: World,
  { values, stated }: Pair,
  isSameOutcome: (values: [number, number]) => boolean,
): { contradicts: boolean; reason: string } {
  const other: [number, number] = [...values];
  for (const { side, value } of stated) other[side] = value;
  const isTurned = ({ side, value }: Pair['stated'][number]) =>
    !isSameOutcome(side === 0 ? [value, values[1]] : [values[0], value]);
  const single = stated.filter(isTurned);
  const turning = single.length === 0 && stated.length > 1 && !isSameOutcome(other) ? stated : single;
  if (turning.length === 0) return { contradicts: false, reason: '' };
  for (const { recomputed } of turning) world.contradicted.add(recomputed);
  const causes = turning.map(({ recomputed }) => recomputed.cause?.text ?? null);
  return causes.includes(null)
    ? {
        contradicts: true,
        reason:
          'A value is reported otherwise than its raw readings give, and the two give different outcomes; correct the raw readings or the reported value.',
      }
    : {
        contradicts: false,
        reason: `A reported value ${causes.join(' and ')}, so the recomputed one is used.`,
      };
}

function laboratories(world: World, measure: DifferenceMeasure, at: Conditions): Pair | Obstacle {
  const values: number[] = [];
  const evidence: Evidence[] = [];
  const stated: Pair['stated'] = [];
  let count = Number.POSITIVE_INFINITY;
  for (const laboratory of ['contractor', 'agency'] as const) {
    const request: SampleRequest = {
      quantity: measure.quantity,
      at: { ...at, laboratory },
      where: measure.where,
    };
    const taken = takeSample(world, request);
    const doubt = doubtAbout(world, request, taken.ok ? taken.sample : null);
    if (doubt !== null) return doubt;
    if (!taken.ok) return taken;
    const value = statisticOf({
      sample: taken.sample,
      statistic: measure.statistic,
      within: null,
      hasMin: true,
    });
    if (!value.ok) return value;
    if (value.judgeable.allowed !== null || value.judgeable.text !== null) {
      return undecided(
        `A value by the ${laboratory} is only known as ${value.judgeable.text ?? 'a range'}.`,
        `Give the ${laboratory}'s result as a number.`,
      );
    }
    const { recomputed } = taken.sample;
    const reported = recomputed?.agrees === false ? recomputed.reported : null;
    if (recomputed && reported && reported.value !== null && measure.statistic === 'mean') {
      const unit = world.view.quantity(measure.quantity)?.unit ?? reported.unit;
      const own = convert(reported.value, reported.unit, unit);
      if (own.ok) stated.push({ side: laboratory === 'contractor' ? 0 : 1, value: own.value, recomputed });
    }
    values.push(value.judgeable.value);
    evidence.push(...taken.sample.items.map((item) => item.evidence));
    count = Math.min(count, taken.sample.count);
  }
  const [contractor, agency] = values;
  if (contractor === undefined || agency === undefined) return notShown('One of the two values is missing.');
  return { ok: true, values: [contractor, agency], count, evidence, stated };
}

function reported(world: World, measure: DifferenceMeasure, at: Conditions): Pair | Obstacle {
  const request: SampleRequest = { quantity: measure.quantity, at, where: measure.where, toCompare: true };
  const label = labelOfRequest(world, request);
  const taken = takeSample(world, request);
  const doubt = doubtAbout(world, request, taken.ok ? taken.sample : null);
  if (doubt !== null) return doubt;
  if (!taken.ok) return taken;
  const { recomputed, interpolated, items } = taken.sample;
  const ofReported = recomputed?.reported ? null : doubtAbout(world, request, null);
  if (ofReported !== null) return ofReported;
  if (recomputed === null) {
    return notShown(`The raw readings from which ${label} could be recomputed are not given.`);
  }
  if (interpolated)
    return undecided(`The value of ${label} is interpolated between trials, not recomputed.`, COMPACT_WORDS);
  if (recomputed.reported === null || recomputed.reported.value === null) {
    return notShown(`The workbook reports no value of ${label}.`);
  }
  return {
    ok: true,
    values: [recomputed.reported.value, recomputed.value],
    count: Math.max(1, items.length),
    evidence: [evidenceOfRecomputed(recomputed)],
    stated: [],
  };
}
