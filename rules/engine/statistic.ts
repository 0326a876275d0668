import { decimalMean } from '../numerics/decimal-sum';
import { trimmedMean } from '../numerics/mean';
import { percentWithinLimits } from '../numerics/percent-within-limits';
import { range, sampleStandardDeviation } from '../numerics/spread';
import type { Statistic } from '../rule-sets/measure';
import { numberWords } from '../rule-sets/words';
import { COMPACT_WORDS, NUMBER_WORDS, type Obstacle, SINGLE_WORDS, undecided } from './obstacle';
import type { ResolvedInterval } from './resolve-limit';
import type { Sample, SampleItem } from './sample';

/** A number to be judged; censored, the interval of every number that it may be. */
export interface Judgeable {
  value: number;
  /** How the workbook states it where it is not a plain number: `<0.1`, `non-plastic`. */
  text: string | null;
  /** True for a result without a number: `value` only stands in for it. */
  isWord?: boolean;
  /** Null for a plain number. */
  allowed: AllowedInterval | null;
}

/** Every number that a value may be. An end is among them only where that is said. */
export interface AllowedInterval {
  low: number;
  high: number;
  lowIncluded?: boolean;
  highIncluded?: boolean;
}

export interface StatisticRequest {
  sample: Sample;
  statistic: Statistic;
  within: ResolvedInterval | null;
  /** Whether the limit has a lower end: then a result of `none` cannot stand for zero. */
  hasMin: boolean;
}

/** The statistic that a rule is about, over the values that count. */
export function statisticOf(request: StatisticRequest): { ok: true; judgeable: Judgeable } | Obstacle {
  const { sample, statistic } = request;
  if (statistic === 'count') return plain(sample.count);
  const single = sample.items.length === 1 && sample.count === 1;
  if (sample.interpolated && statistic !== 'mean') {
    return undecided(
      'The value is interpolated between trials, so the values of single specimens are not known.',
      COMPACT_WORDS,
    );
  }
  if (sample.meanOnly && statistic !== 'mean' && !single) {
    return undecided('Only the mean is known, not the values of the single specimens.', SINGLE_WORDS);
  }
  const judgeables = sample.items.map((item) => judgeableOf(item, request.hasMin));
  if (judgeables.some((each) => each.allowed !== null || each.text !== null))
    return ofCensored(judgeables, statistic);
  return ofNumbers(
    request,
    judgeables.map((each) => each.value),
  );
}

/** One value of a sample on its own, as `each` and `alsoEach` judge it. */
export function judgeableOf(item: SampleItem, hasMin: boolean): Judgeable {
  const { value, qualifier } = item;
  const text = censored(item) ?? item.evidence.text ?? qualifier ?? null;
  if (qualifier === '<' && value !== null) return { value, text, allowed: { low: -Infinity, high: value } };
  if (qualifier === '>' && value !== null) return { value, text, allowed: { low: value, high: Infinity } };
  if (qualifier === 'none' || qualifier === 'non-plastic' || value === null) {
    // Nothing found in so many passes: what is counted in passes may come at any number beyond them. Of a depth the
    // passes are only the condition under which there was none.
    if (item.at.passes !== undefined && item.evidence.unit === 'passes') {
      return { value: item.at.passes, text, isWord: true, allowed: { low: item.at.passes, high: Infinity } };
    }
    // "None" is no amount at all against a most; against a least it has no number to be held to.
    return hasMin
      ? { value: 0, text, isWord: true, allowed: { low: -Infinity, high: Infinity } }
      : { value: 0, text, isWord: true, allowed: null };
  }
  return { value, text: null, allowed: null };
}

function censored({ value, qualifier }: SampleItem): string | null {
  if (value === null || (qualifier !== '<' && qualifier !== '>')) return null;
  return `${qualifier}${numberWords(value)}`;
}

/** The mean in decimal arithmetic; the value itself where there is only one, untouched. */
function exactMean(values: readonly number[]): { ok: true; value: number } | Obstacle {
  if (values.length === 0 || values.some((value) => !Number.isFinite(value))) {
    return undecided('One of the values is not a number.');
  }
  return { ok: true, value: decimalMean(values) };
}

function ofNumbers(
  { sample, statistic, within }: StatisticRequest,
  values: number[],
): { ok: true; judgeable: Judgeable } | Obstacle {
  const sorted = values.toSorted((a, b) => a - b);
  const first = sorted[0];
  const last = sorted.at(-1);
  if (first === undefined || last === undefined || sorted.some((value) => !Number.isFinite(value))) {
    return undecided('One of the values is not a number.');
  }
  switch (statistic) {
    case 'mean': {
      if (sample.recomputed !== null) return plain(sample.recomputed.value);
      const mean = exactMean(sorted);
      return mean.ok ? plain(mean.value) : mean;
    }
    case 'min':
      return plain(first);
    case 'max':
    case 'each':
      return plain(last);
    case 'range':
      return sorted.length < 2
        ? undecided('A range needs at least two values.', 'Add the value of a second specimen.')
        : numeric(range(sorted));
    case 'standard-deviation':
      return numeric(sampleStandardDeviation(sorted));
    case 'trimmed-mean':
      return numeric(trimmedMean(sorted));
    case 'count':
      return plain(sample.count);
    case 'percent-within-limits':
      return within === null
        ? undecided('The limits to be within are not known.')
        : numeric(percentWithinLimits({ values: sorted, lower: within.min, upper: within.max }));
  }
}

function ofCensored(
  judgeables: Judgeable[],
  statistic: Statistic,
): { ok: true; judgeable: Judgeable } | Obstacle {
  const [only] = judgeables;
  if (judgeables.length === 1 && only && SINGLE.has(statistic)) return { ok: true, judgeable: only };
  if (statistic !== 'mean' && statistic !== 'min' && statistic !== 'max') {
    return undecided(
      `A ${statistic.replaceAll('-', ' ')} cannot be taken over a value that is only known as ${textOf(judgeables)}.`,
      NUMBER_WORDS,
    );
  }
  const combine = COMBINE[statistic];
  const lows = judgeables.map((each) => each.allowed?.low ?? each.value);
  const highs = judgeables.map((each) => each.allowed?.high ?? each.value);
  const low = combine(lows);
  const high = combine(highs);
  const value = combine(judgeables.map((each) => each.value));
  if (low === high) return plain(value);
  // The smallest of 14.0 and >13 may be 14.0 itself, not only what lies below it.
  const isPlain = judgeables.map((each) => each.allowed === null);
  const lowIncluded = statistic === 'mean' ? false : isAttained(lows, low, isPlain, statistic === 'min');
  const highIncluded = statistic === 'mean' ? false : isAttained(highs, high, isPlain, statistic === 'max');
  const allowed = { low, high, lowIncluded, highIncluded };
  return { ok: true, judgeable: { value, text: censoredText(low, high), allowed } };
}

/** Whether an end of the interval is a value: by any plain number there, or only where all that stand there are plain. */
function isAttained(ends: number[], end: number, isPlain: boolean[], byAny: boolean): boolean {
  const there = isPlain.filter((_, i) => ends[i] === end);
  return byAny ? there.includes(true) : !there.includes(false);
}

const SINGLE = new Set<Statistic>(['mean', 'min', 'max', 'each']);

const COMBINE = {
  mean: (values: number[]) => values.reduce((sum, value) => sum + value, 0) / values.length,
  min: (values: number[]) => Math.min(...values),
  max: (values: number[]) => Math.max(...values),
};

/** As a workbook would state it: `>20,000`. */
function censoredText(low: number, high: number): string {
  if (high === Infinity && low !== -Infinity) return `>${numberWords(low)}`;
  if (low === -Infinity && high !== Infinity) return `<${numberWords(high)}`;
  return 'a value without bounds';
}

function textOf(judgeables: Judgeable[]): string {
  return judgeables.find((each) => each.text !== null)?.text ?? '';
}

function plain(value: number): { ok: true; judgeable: Judgeable } {
  return { ok: true, judgeable: { value, text: null, allowed: null } };
}

function numeric(result: { ok: true; value: number } | { ok: false; reason: string }) {
  return result.ok
    ? plain(result.value)
    : undecided(
        `${result.reason.charAt(0).toUpperCase()}${result.reason.slice(1)}.`,
        'Add the results of further specimens.',
      );
}
