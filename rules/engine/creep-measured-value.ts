import { mean } from '../numerics/mean';
import { sampleStandardDeviation } from '../numerics/spread';
import { twoSidedT } from '../numerics/student-t';
import { capitalised, numberWords } from '../rule-sets/words';
import { evidenceOfMean } from './creep-evidence';
import type { CreepPoint } from './creep-points';
import { testedWords } from './creep-selection';
import { boundWords, type CreepRequest, type CreepValue, plainValue, settled } from './creep-value-parts';
import { notShown, type Obstacle, undecided } from './obstacle';
import type { Judgeable } from './statistic';

/** The mean of the specimens at the rule's time, or a bound of it from their scatter. */
export function measuredValue(
  { measure, points }: CreepRequest,
  atTime: CreepPoint[],
): CreepValue | Obstacle {
  const usable = atTime.filter(({ fault }) => fault === null);
  const untimed = points.find(({ at, fault }) => fault !== null && at.time === undefined);
  const faulty = atTime.find(({ fault }) => fault !== null) ?? (usable.length === 0 ? untimed : undefined);
  if (faulty) return undecided(faulty.fault ?? '', 'Correct the reading, or state the compliance.');
  if (usable.length === 0) {
    return notShown(
      `There is no reading of creep compliance at ${numberWords(measure.time)} s, only ${testedWords(points)}.`,
    );
  }
  const specimens = bySpecimen(usable);
  if (!specimens.ok) return specimens;
  const { groups, count } = specimens;
  const evidence = [evidenceOfMean(usable, groups, measure)];
  const note = usable.some(({ evidence: own }) => own.origin === 'reported')
    ? 'The value is judged as reported.'
    : '';
  const censored = usable.filter(({ qualifier }) => qualifier !== null);
  if (censored.length > 0) return censoredMean(usable, { count, evidence, note });
  const average = mean(groups.map(({ value }) => value));
  if (!average.ok) return undecided(`${capitalised(average.reason)}.`);
  if (measure.use === undefined || measure.use === 'estimate') {
    return { ok: true, judgeables: [plainValue(average.value, 'mean')], count, evidence, note };
  }
  const half = halfWidthOfMean(
    groups.map(({ value }) => value),
    measure.confidence,
  );
  if (!half.ok) return half;
  const value = measure.use === 'lower' ? average.value - half.value : average.value + half.value;
  const statistic = boundWords(measure.use, measure.confidence);
  const scatter = `It is the ${statistic} of the mean, from the scatter of the specimens.`;
  return { ok: true, judgeables: [plainValue(settled(value), statistic)], count, evidence, note: scatter };
}

interface SpecimenValue {
  specimen: string | null;
  value: number;
}

/** One value a specimen: the mean of its own points at the time, under whatever stresses they were. */
function bySpecimen(points: CreepPoint[]): { ok: true; groups: SpecimenValue[]; count: number } | Obstacle {
  const labelled = points.filter(({ specimen, count }) => specimen !== null || count > 1);
  // A value without a specimen beside values with one is their stated mean, not one more of them.
  const counted = labelled.length > 0 ? labelled : points;
  const groups = new Map<string, CreepPoint[]>();
  for (const point of counted) {
    const key = point.specimen ?? '';
    const own = groups.get(key) ?? [];
    const twin = own.find(({ at }) => at.stress === point.at.stress && at.time === point.at.time);
    if (twin !== undefined && twin.value !== point.value) {
      const of = key === '' ? '' : ` of specimen ${key}`;
      return undecided(
        `Two readings of creep compliance${of} at ${numberWords(point.at.time ?? 0)} s disagree.`,
        'Label replicates as specimens, or correct one of the two.',
      );
    }
    if (twin === undefined) groups.set(key, [...own, point]);
  }
  const values: SpecimenValue[] = [];
  for (const own of groups.values()) {
    const average = mean(own.map(({ value }) => value ?? Number.NaN));
    if (!average.ok) return undecided(`${capitalised(average.reason)}.`);
    values.push({ specimen: own[0]!.specimen, value: average.value });
  }
  const count = [...groups.values()].reduce(
    (sum, own) => sum + Math.max(...own.map((each) => each.count)),
    0,
  );
  return { ok: true, groups: values.toSorted((a, b) => a.value - b.value), count };
}

/** A censored value among those of a mean leaves an interval of what the mean may be. */
function censoredMean(
  points: CreepPoint[],
  { count, evidence, note }: Pick<CreepValue, 'count' | 'evidence' | 'note'>,
): CreepValue | Obstacle {
  const bounds = points.map(({ value, qualifier }) => ({
    low: qualifier === '<' ? 0 : (value ?? 0),
    high: qualifier === '>' ? Number.POSITIVE_INFINITY : (value ?? 0),
  }));
  const average = (values: number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;
  const low = average(bounds.map((each) => each.low));
  const high = average(bounds.map((each) => each.high));
  const value = average(points.map((each) => each.value ?? 0));
  const text = high === Number.POSITIVE_INFINITY ? `>${numberWords(low)}` : `<${numberWords(high)}`;
  const judgeable: Judgeable = { value, text, allowed: { low, high } };
  return { ok: true, judgeables: [{ judgeable, statistic: 'mean' }], count, evidence, note };
}

function halfWidthOfMean(values: number[], confidence: number): { ok: true; value: number } | Obstacle {
  const deviation = sampleStandardDeviation(values);
  const quantile = twoSidedT(confidence, values.length - 1);
  if (!deviation.ok || !quantile.ok) {
    return undecided('A bound of a measured mean needs at least two specimens.', 'Test a second specimen.');
  }
  return { ok: true, value: (quantile.value * deviation.value) / Math.sqrt(values.length) };
}
