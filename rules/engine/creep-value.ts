import { decadesBeyond } from '../calculations/creep-compliance';
import { type CreepBand, type CreepFit, creepBandAt, LEAST_R_SQUARED } from '../calculations/creep-fit';
import { mean } from '../numerics/mean';
import { sampleStandardDeviation } from '../numerics/spread';
import { twoSidedT } from '../numerics/student-t';
import type { CreepComplianceMeasure } from '../rule-sets/measure';
import { capitalised, numberWords } from '../rule-sets/words';
import { evidenceOfMean, fittedEvidence } from './creep-evidence';
import { fitOf, MODEL_WORDS } from './creep-fits';
import type { CreepPoint } from './creep-points';
import { isTime, testedAt, testedWords } from './creep-selection';
import type { Evidence, ResolvedLimit } from './finding';
import { notShown, type Obstacle, undecided } from './obstacle';
import type { Judgeable } from './statistic';

/** A compliance to be judged, 1/GPa: a measured mean, or the fitted curve or one of its bounds. */
export interface CreepValue {
  ok: true;
  /** One value, or both bounds where both ends of a limit could be crossed. */
  judgeables: { judgeable: Judgeable; statistic: string }[];
  count: number;
  evidence: Evidence[];
  /** Marks of a fitted or extrapolated value, as a sentence. */
  note: string;
}

/** Known, and still not to be judged: beyond what the rule allows. Its estimate is shown. */
export interface CreepBeyond extends Obstacle {
  estimate: number;
  count: number;
  evidence: Evidence[];
}

export interface CreepRequest {
  measure: CreepComplianceMeasure;
  points: readonly CreepPoint[];
  limit: Pick<ResolvedLimit, 'min' | 'max'>;
}

/** The compliance at a rule's temperature and time: as measured there, else from a fitted curve, as the rule says. */
export function creepValue(request: CreepRequest): CreepValue | CreepBeyond | Obstacle {
  const { measure, points } = request;
  const atTime = testedAt(points, measure.time);
  const bound = measure.use !== undefined && measure.use !== 'estimate';
  if (measure.source === 'measured') return measuredValue(request, atTime);
  // A bound is a bound of the curve: only a rule that wants measured values takes it from their scatter.
  if (measure.source === 'either' && !bound && atTime.length > 0) return measuredValue(request, atTime);
  return fittedValue(request);
}

function measuredValue({ measure, points }: CreepRequest, atTime: CreepPoint[]): CreepValue | Obstacle {
  const faulty = points.find(
    ({ at, fault }) => fault !== null && (at.time === undefined || isTime(at.time, measure.time)),
  );
  const usable = atTime.filter(({ fault }) => fault === null);
  if (faulty && (usable.length === 0 || atTime.includes(faulty))) {
    return undecided(faulty.fault ?? '', 'Correct the reading, or state the compliance.');
  }
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
    return { ok: true, judgeables: [plain(average.value, 'mean')], count, evidence, note };
  }
  const half = halfWidthOfMean(
    groups.map(({ value }) => value),
    measure.confidence,
  );
  if (!half.ok) return half;
  const value = measure.use === 'lower' ? average.value - half.value : average.value + half.value;
  const statistic = boundWords(measure.use, measure.confidence);
  const scatter = `It is the ${statistic} of the mean, from the scatter of the specimens.`;
  return { ok: true, judgeables: [plain(settled(value), statistic)], count, evidence, note: scatter };
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

function fittedValue(request: CreepRequest): CreepValue | CreepBeyond | Obstacle {
  const { measure, points } = request;
  const fitted = fitOfPoints(measure, points);
  if (!fitted.ok) return fitted;
  const { fit, used } = fitted;
  const decades = beyond(measure.time, fit);
  const band = creepBandAt(fit, measure.time, measure.confidence);
  if (!band.ok) return undecided(`${capitalised(band.reason)}.`);
  const count = specimenCount(used);
  const parts = { fit, used, measure, decades };
  if (decades > measure.extrapolationDecades + 1e-9) {
    const evidence = [fittedEvidence({ ...parts, value: band.band.estimate, bound: null })];
    return { ...tooFar(measure, fit, decades, band.band), estimate: band.band.estimate, count, evidence };
  }
  const values = valuesToJudge(request, band.band, decades > 0);
  if (values.some(({ value }) => value === null)) {
    return undecided(
      `The points set no ${boundWords('lower', measure.confidence).replace('lower ', '')} to the curve at ${numberWords(measure.time)} s.`,
      testLonger(measure, fit),
    );
  }
  const estimate = band.band.estimate;
  const evidence = values.map(({ value, bound }) =>
    fittedEvidence({ ...parts, value: value ?? estimate, bound, estimate }),
  );
  const judgeables = values.map(({ value, statistic }) => plain(value ?? estimate, statistic));
  return { ok: true, judgeables, count, evidence, note: noteOf(measure, fit, decades, values) };
}

interface ValueToJudge {
  value: number | null;
  bound: 'lower' | 'upper' | null;
  statistic: string;
}

/** As `use` says; where it says nothing, the estimate within the tested times and the unfavourable bound beyond. */
function valuesToJudge({ measure, limit }: CreepRequest, band: CreepBand, isBeyond: boolean): ValueToJudge[] {
  const of = (bound: 'lower' | 'upper'): ValueToJudge => ({
    value: band[bound],
    bound,
    statistic: boundWords(bound, measure.confidence),
  });
  if (measure.use === 'lower' || measure.use === 'upper') return [of(measure.use)];
  if (measure.use === 'estimate' || !isBeyond) {
    return [{ value: band.estimate, bound: null, statistic: 'fitted' }];
  }
  return [...(limit.min === null ? [] : [of('lower')]), ...(limit.max === null ? [] : [of('upper')])];
}

/** The curve through every usable point of the selected tests, or why there is none. */
function fitOfPoints(
  measure: CreepComplianceMeasure,
  points: readonly CreepPoint[],
): { ok: true; fit: CreepFit; used: CreepPoint[] } | Obstacle {
  const faulty = points.find(({ fault }) => fault !== null);
  if (faulty) return undecided(faulty.fault ?? '', 'Correct the reading, or leave it out.');
  const censored = points.find(({ qualifier }) => qualifier !== null);
  if (censored) {
    return undecided(
      `A creep compliance is only known as ${censored.qualifier}${censored.value}, and no curve is fitted through it.`,
      'State the compliance as a number.',
    );
  }
  const used = fittable(points);
  const result = fitOf(
    measure.model,
    used.map(({ at, value }) => ({ t: at.time ?? 0, D: value ?? 0 })),
  );
  const model = MODEL_WORDS[measure.model];
  if (!result.ok) {
    return undecided(
      `No ${model} is fitted: ${result.reason}.`,
      `Test at ${numberWords(measure.time)} s, or at more loading times.`,
    );
  }
  if (result.fit.rejected !== null) {
    return undecided(
      `The fitted ${model} is rejected: ${result.fit.rejected}.`,
      measure.source === 'fitted'
        ? `Correct or repeat the readings that lie off the curve; R² has to reach ${LEAST_R_SQUARED}.`
        : `Test at ${numberWords(measure.time)} s, or correct the readings that lie off the curve.`,
    );
  }
  return { ok: true, fit: result.fit, used };
}

/** Points that a logarithmic time axis has a place for, without stated means beside their own specimens. */
export function fittable(points: readonly CreepPoint[]): CreepPoint[] {
  const timed = points.filter(({ at, fault }) => fault === null && (at.time ?? 0) > 0);
  const labelled = timed.filter(({ specimen, count }) => specimen !== null || count > 1);
  const ofSpecimens = new Set(labelled.map(({ at }) => at.time));
  const kept = timed.filter(
    ({ specimen, count, at }) => specimen !== null || count > 1 || !ofSpecimens.has(at.time),
  );
  return [...new Map(kept.map((point) => [pointKey(point), point])).values()];
}

function pointKey({ at, specimen, value }: CreepPoint): string {
  return `${specimen}|${at.time}|${at.stress}|${value}`;
}

/** A time within 1 % of the first or last tested one is that one. */
function beyond(time: number, { window }: CreepFit): number {
  if (isTime(window.from, time) || isTime(window.to, time)) return 0;
  const decades = decadesBeyond(time, window);
  return decades.ok ? decades.value : Number.POSITIVE_INFINITY;
}

function tooFar(
  measure: CreepComplianceMeasure,
  fit: CreepFit,
  decades: number,
  { estimate, lower, upper }: CreepBand,
): Obstacle {
  const { from, to } = fit.window;
  const isLong = measure.time > to;
  const end = isLong ? `end at ${numberWords(to)} s` : `begin at ${numberWords(from)} s`;
  const allowed =
    measure.extrapolationDecades === 0
      ? 'allows no extrapolation'
      : `allows ${numberWords(measure.extrapolationDecades)} of a decade`;
  const bounds =
    lower === null || upper === null
      ? ''
      : `, ${percent(measure.confidence)} between ${three(lower)} and ${three(upper)}`;
  return undecided(
    `The tests ${end}; ${numberWords(measure.time)} s lies ${decadeWords(decades)} beyond, and the rule ${allowed}. The fitted curve gives ${three(estimate)} there${bounds}.`,
    testLonger(measure, fit),
  );
}

function testLonger({ time, temperature }: CreepComplianceMeasure, { window }: CreepFit): string {
  if (time > window.to) {
    return `Load a specimen for ${numberWords(time)} s at ${numberWords(temperature)} °C.`;
  }
  if (time < window.from)
    return `Read the deformation at ${numberWords(time)} s at ${numberWords(temperature)} °C.`;
  return `Test at ${numberWords(time)} s at ${numberWords(temperature)} °C.`;
}

function noteOf(
  measure: CreepComplianceMeasure,
  fit: CreepFit,
  decades: number,
  values: ValueToJudge[],
): string {
  const curve = `a ${MODEL_WORDS[measure.model]} through ${fit.pointCount} points, R² ${three(fit.rSquared)}`;
  const bounds = values.flatMap(({ bound, statistic }) => (bound === null ? [] : [statistic]));
  const what = bounds.length === 0 ? 'The value' : `The ${bounds.join(' and the ')}`;
  const verb = bounds.length > 1 ? 'are' : 'is';
  const place =
    decades > 0 ? `extrapolated ${decadeWords(decades)} beyond the tested times from` : 'taken from';
  const steep = fit.steep ? ' Its n is above 1, so it has no relaxation modulus.' : '';
  return `${what} ${verb} ${place} ${curve}.${steep}`;
}

/** "1.0 decade", "0.3 of a decade". */
export function decadeWords(decades: number): string {
  const text = decades.toFixed(decades < 0.095 ? 2 : 1);
  return decades < 0.95 ? `${text} of a decade` : `${text} ${text === '1.0' ? 'decade' : 'decades'}`;
}

function boundWords(bound: 'lower' | 'upper', confidence: number): string {
  return `${bound} ${percent(confidence)} bound`;
}

function percent(confidence: number): string {
  return `${numberWords(settled(confidence * 100))} %`;
}

/** Three significant digits, as compliances are written. */
function three(value: number): string {
  return numberWords(Number(value.toPrecision(3)));
}

function plain(value: number, statistic: string): { judgeable: Judgeable; statistic: string } {
  return { judgeable: { value, text: null, allowed: null }, statistic };
}

function specimenCount(points: readonly CreepPoint[]): number {
  const labelled = new Set(points.flatMap(({ specimen }) => specimen ?? []));
  return Math.max(labelled.size, ...points.map(({ count }) => count));
}

function settled(value: number): number {
  return Number(value.toPrecision(12));
}
