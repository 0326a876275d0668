import Decimal from 'decimal.js';
import { convert } from '../quantities/units';
import type { Conditions } from '../record';
import type { DifferenceMeasure } from '../rule-sets/measure';
import type { ResolvedRule } from '../rule-sets/resolve';
import { distanceWords } from './distance-words';
import { doubtAbout } from './doubts';
import { conditionsOfSubjects } from './evaluate-reading';
import type { Evidence, Finding, Observed } from './finding';
import { judge, rounderOf } from './judge';
import { makeFinding } from './make-finding';
import { COMPACT_WORDS, notShown, type Obstacle, undecided } from './obstacle';
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
}

/** A `difference` rule: how far two laboratories, or the workbook and its own raw readings, lie apart. */
export function evaluateDifference(world: World, rule: ResolvedRule, measure: DifferenceMeasure): Finding[] {
  return conditionsOfSubjects(world, { quantity: measure.quantity, at: {} }).map((at) =>
    ofSubject(world, rule, measure, at),
  );
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
  const value = new Decimal(one.value).minus(other.value).abs().toNumber();
  const judgement = judge({ value, text: null, allowed: null }, limit.limit, rounding.rounder);
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
  return makeFinding(world, rule, {
    ...base,
    outcome: judgement.outcome,
    reason: distanceWords(judgement, limit.limit),
    observed,
    limit: limit.limit,
    margin: judgement.margin,
    precision,
    borderline: isBorderline(judgement.margin, precision),
    roundingSentence: judgement.roundingSentence,
    evidence: pair.evidence,
  });
}

function laboratories(world: World, measure: DifferenceMeasure, at: Conditions): Pair | Obstacle {
  const values: number[] = [];
  const evidence: Evidence[] = [];
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
    values.push(value.judgeable.value);
    evidence.push(...taken.sample.items.map((item) => item.evidence));
    count = Math.min(count, taken.sample.count);
  }
  const [contractor, agency] = values;
  if (contractor === undefined || agency === undefined) return notShown('One of the two values is missing.');
  return { ok: true, values: [contractor, agency], count, evidence };
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
  };
}
