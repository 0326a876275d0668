import { convert } from '../quantities/units';
import type { Conditions } from '../record';
import type { GradationMeasure, ReadingMeasure, Statistic } from '../rule-sets/measure';
import type { ResolvedRule } from '../rule-sets/resolve';
import { censoredWords, plural } from '../rule-sets/words';
import { distanceWords } from './distance-words';
import { doubtAbout } from './doubts';
import type { Finding, Observed, ResolvedLimit } from './finding';
import { type Judgement, judge, type Rounder, rounderOf } from './judge';
import { judgeEach } from './judge-each';
import { makeFinding } from './make-finding';
import { NUMBER_WORDS, type Obstacle, undecided } from './obstacle';
import { isBorderline, precisionOf } from './precision';
import { againstReported, specimensReportedOtherwise } from './reported';
import { resolveInterval, resolveLimit } from './resolve-limit';
import { type Sample, type SampleItem, takeSample } from './sample';
import { type Judgeable, statisticOf } from './statistic';
import { subjectOf } from './subject';
import type { World } from './world';

export interface ValueRequest {
  world: World;
  rule: ResolvedRule;
  measure: ReadingMeasure | GradationMeasure;
  quantity: string;
  statistic: Statistic;
  /** Conditions of the rule with those of the subject. */
  at: Conditions;
}

/** One finding: the value of a quantity on one subject, held against the rule's limit. */
export function evaluateValue(request: ValueRequest): Finding {
  const { world, rule, measure, quantity, at } = request;
  const base = { subject: subjectOf(world, measure, at), at, quantity };
  const taken = takeSample(world, { quantity, at, where: measure.where });
  const limit = resolveLimit(world, rule, at);
  const shownLimit = limit.ok ? limit.limit : null;
  const doubt = doubtAbout(world, { quantity, at }, taken.ok ? taken.sample : null);
  if (doubt !== null) {
    const evidence = taken.ok ? evidenceOf(taken.sample) : [];
    return makeFinding(world, rule, {
      ...base,
      ...doubt,
      limit: shownLimit,
      evidence,
    });
  }
  const obstacle = taken.ok ? (limit.ok ? null : limit) : taken;
  if (obstacle !== null || !taken.ok || !limit.ok) {
    const found = obstacle ?? undecided('The rule could not be judged.');
    const evidence = taken.ok ? evidenceOf(taken.sample) : [];
    return makeFinding(world, rule, { ...base, ...found, limit: shownLimit, evidence });
  }
  if (rule.limit.present) return presentFinding(request, taken.sample);
  return judgedFinding(request, taken.sample, limit.limit);
}

function presentFinding(
  { world, rule, measure, quantity, at, statistic }: ValueRequest,
  sample: Sample,
): Finding {
  const base = { subject: subjectOf(world, measure, at), at, quantity, evidence: evidenceOf(sample) };
  const first = sample.items[0];
  const text =
    first?.evidence.text ?? (first?.value === null || first === undefined ? '' : String(first.value));
  const unit = first?.value === null ? '' : (world.view.quantity(quantity)?.unit ?? '');
  const observed: Observed = {
    value: first?.value ?? null,
    rounded: null,
    text,
    unit,
    statistic,
    count: sample.count,
  };
  const short = tooFew(measure, sample);
  if (short) return makeFinding(world, rule, { ...base, ...short, observed });
  return makeFinding(world, rule, { ...base, outcome: 'pass', reason: 'It is shown.', observed });
}

function judgedFinding(request: ValueRequest, sample: Sample, limit: ResolvedLimit): Finding {
  const { world, rule, measure, quantity, at, statistic } = request;
  const subject = subjectOf(world, measure, at);
  const evidence = evidenceOf(sample);
  const base = { subject, at, quantity, limit, evidence };
  const rounding = rounderOf(world, rule, limit, at);
  if (!rounding.ok) return makeFinding(world, rule, { ...base, ...rounding });
  const inUnit = sampleInUnit(world, quantity, statistic, sample, limit.unit);
  if (!inUnit.ok) return makeFinding(world, rule, { ...base, ...inUnit });

  const { rounder } = rounding;
  const judging = { world, quantity, measure, statistic, at, limit, rounder };
  const judged = judgeSample({ ...judging, sample: inUnit.sample });
  if (!judged.ok) return makeFinding(world, rule, { ...base, ...judged });
  const { judgement, judgeable } = judged;
  const precision = precisionOf({
    rule,
    quantity: world.view.quantity(quantity),
    statistic,
    count: sample.count,
    unit: limit.unit,
  });
  const observed = observedOf(judgeable, judgement, limit.unit, statistic, sample.count);
  const { roundingSentence } = judgement;

  const { outcome } = judgement;
  const ofMean = againstReported({ world, quantity, statistic, sample, limit, rounder, outcome });
  const reported = ofMean?.contradicts
    ? ofMean
    : (specimensAgainstReported(judging, sample, outcome) ?? ofMean);
  const short = tooFew(measure, sample);
  const open = { ...base, observed, roundingSentence, precision };
  if (short) return makeFinding(world, rule, { ...open, ...short });
  if (reported?.contradicts) {
    return makeFinding(world, rule, {
      ...open,
      outcome: 'undecided',
      reason: reported.reason,
      wouldDecide: reported.wouldDecide,
    });
  }
  const reason = [reasonOf(judgement, judgeable, limit), judged.note, reported?.reason, originNote(sample)]
    .filter(Boolean)
    .join(' ');
  return makeFinding(world, rule, {
    // Member by member: most findings come this way, and spreads stood out among their costs.
    subject,
    at,
    quantity,
    limit,
    evidence,
    observed,
    roundingSentence,
    precision,
    outcome,
    reason,
    wouldDecide: NUMBER_WORDS,
    margin: judgement.margin,
    borderline: isBorderline(judgement.margin, precision),
  });
}

/** The same for single specimens, where the rule looks at them and the workbook states another value of one. */
function specimensAgainstReported(
  judging: Omit<SampleJudging, 'sample'>,
  sample: Sample,
  outcome: Judgement['outcome'],
): ReturnType<typeof againstReported> {
  const { world, quantity, measure, statistic, limit } = judging;
  const looksAtEach = measure.kind === 'reading' && measure.alsoEach !== undefined;
  if (statistic === 'count' || (statistic === 'mean' && !looksAtEach)) return null;
  return specimensReportedOtherwise(world, quantity, sample, (other) => {
    const inUnit = sampleInUnit(world, quantity, statistic, other, limit.unit);
    const judged = inUnit.ok ? judgeSample({ ...judging, sample: inUnit.sample }) : inUnit;
    return (judged.ok ? judged.judgement.outcome : 'undecided') === outcome;
  });
}

interface SampleJudging {
  world: World;
  quantity: string;
  measure: ReadingMeasure | GradationMeasure;
  statistic: Statistic;
  at: Conditions;
  sample: Sample;
  limit: ResolvedLimit;
  rounder: Rounder;
}

type SampleJudgement = { ok: true; judgement: Judgement; judgeable: Judgeable; note: string } | Obstacle;

/** The statistic against the limit, and each single value where the rule asks for it. */
function judgeSample(judging: SampleJudging): SampleJudgement {
  const { world, measure, statistic, at, sample, limit, rounder } = judging;
  const isReading = measure.kind === 'reading';
  if (statistic === 'each') return judgeEach(sample, limit, rounder);
  const own = world.view.quantity(judging.quantity)?.unit ?? limit.unit;
  const units = { written: own, wanted: movesToLimit(statistic) ? limit.unit : own };
  const within = isReading && measure.within ? resolveInterval(world, measure.within, at, units) : null;
  if (within && !within.ok) return within;
  const value = statisticOf({
    sample,
    statistic,
    within: within?.interval ?? null,
    hasMin: limit.min !== null,
  });
  if (!value.ok) return value;
  const judgement = judge(value.judgeable, limit, rounder);
  const result = { ok: true as const, judgement, judgeable: value.judgeable, note: '' };
  if (!isReading || measure.alsoEach === undefined || judgement.outcome === 'fail') return result;

  const interval = resolveInterval(world, measure.alsoEach, at, units);
  if (!interval.ok) return interval;
  const eachLimit = { ...limit, ...interval.interval, target: null, tolerance: null };
  if (eachLimit.min === null && eachLimit.max === null) return result;
  const each = judgeEach(sample, eachLimit, rounder);
  if (!each.ok) return each;
  if (each.judgement.outcome === 'pass') return result;
  const margin = smaller(judgement.margin, each.judgement.margin);
  const note = `${each.note} Each single value has limits of its own.`;
  return { ...result, judgement: { ...judgement, outcome: each.judgement.outcome, margin }, note };
}

/** At least one but fewer than the rule asks for. */
function tooFew(measure: ReadingMeasure | GradationMeasure, sample: Sample): Obstacle | null {
  if (
    measure.kind !== 'reading' ||
    measure.minimumCount === undefined ||
    sample.count >= measure.minimumCount
  ) {
    return null;
  }
  const missing = measure.minimumCount - sample.count;
  return undecided(
    `There ${sample.count === 1 ? 'is' : 'are'} ${plural(sample.count, 'result')}, and the rule asks for at least ${measure.minimumCount}; ${plural(missing, 'more result')} would decide it.`,
    `Add ${plural(missing, 'more result')} of the same kind.`,
  );
}

function evidenceOf(sample: Sample) {
  return sample.items.map((item) => item.evidence);
}

function observedOf(
  judgeable: Judgeable,
  judgement: Judgement,
  unit: string,
  statistic: Statistic,
  count: number,
): Observed {
  const { text } = judgement;
  if (judgeable.isWord) return { value: null, rounded: null, text, unit: '', statistic, count };
  return { value: judgeable.value, rounded: judgement.rounded, text, unit, statistic, count };
}

/** A count and a percentage are not in the unit of what is counted. */
function movesToLimit(statistic: Statistic): boolean {
  return statistic !== 'count' && statistic !== 'percent-within-limits';
}

/** Values in the unit that the limit is written in. */
function sampleInUnit(
  world: World,
  quantity: string,
  statistic: Statistic,
  sample: Sample,
  unit: string,
): { ok: true; sample: Sample } | Obstacle {
  const own = world.view.quantity(quantity)?.unit ?? unit;
  if (own === unit || !movesToLimit(statistic)) return { ok: true, sample };
  const items: SampleItem[] = [];
  for (const item of sample.items) {
    if (item.value === null) {
      items.push(item);
      continue;
    }
    const converted = convert(item.value, own, unit);
    if (!converted.ok)
      return undecided(`The value is in ${own} and the limit in ${unit}: ${converted.reason}.`);
    items.push({ ...item, value: converted.value });
  }
  const { recomputed } = sample;
  const mean = recomputed === null ? null : convert(recomputed.value, own, unit);
  if (recomputed === null || mean === null) return { ok: true, sample: { ...sample, items } };
  return mean.ok
    ? { ok: true, sample: { ...sample, items, recomputed: recomputed.with({ value: mean.value }) } }
    : undecided(`The value is in ${own} and the limit in ${unit}: ${mean.reason}.`);
}

function reasonOf(judgement: Judgement, judgeable: Judgeable, limit: ResolvedLimit): string {
  if (judgement.outcome === 'undecided') {
    return `The value is only known as ${censoredWords(judgeable.text ?? 'a range')}, which allows both a pass and a fail.`;
  }
  if (judgeable.allowed !== null) {
    return `Every value that ${censoredWords(judgeable.text ?? 'it')} allows is ${judgement.outcome === 'pass' ? 'inside' : 'outside'} the limit.`;
  }
  return distanceWords(judgement, limit);
}

function originNote(sample: Sample): string {
  if (sample.interpolated) return 'The value is interpolated between trials at the declared binder content.';
  const isReported =
    sample.recomputed === null && sample.items.some((item) => item.evidence.origin === 'reported');
  return isReported ? 'The value is judged as reported.' : '';
}

function smaller(one: number | null, other: number | null): number | null {
  if (one === null || other === null) return one ?? other;
  return Math.min(one, other);
}
