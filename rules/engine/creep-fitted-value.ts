import { type CreepBand, creepBandAt } from '../calculations/creep-band';
import { decadesBeyond } from '../calculations/creep-compliance';
import { type CreepFit, LEAST_R_SQUARED } from '../calculations/creep-fit';
import type { CreepComplianceMeasure } from '../rule-sets/measure';
import { capitalised, numberWords } from '../rule-sets/words';
import { fittedEvidence } from './creep-evidence';
import { fitOf, MODEL_WORDS } from './creep-fits';
import type { CreepPoint } from './creep-points';
import { isTime } from './creep-selection';
import {
  boundWords,
  type CreepBeyond,
  type CreepRequest,
  type CreepValue,
  percentWords,
  plainValue,
} from './creep-value-parts';
import { type Obstacle, undecided } from './obstacle';

/** The fitted curve at the rule's time or its bounds, where the fit may be used and the rule reaches so far. */
export function fittedValue(request: CreepRequest): CreepValue | CreepBeyond | Obstacle {
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
  const judgeables = values.map(({ value, statistic }) => plainValue(value ?? estimate, statistic));
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
      : `, ${percentWords(measure.confidence)} between ${three(lower)} and ${three(upper)}`;
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

/** Three significant digits, as compliances are written. */
function three(value: number): string {
  return numberWords(Number(value.toPrecision(3)));
}

function specimenCount(points: readonly CreepPoint[]): number {
  const labelled = new Set(points.flatMap(({ specimen }) => specimen ?? []));
  return Math.max(labelled.size, ...points.map(({ count }) => count));
}
