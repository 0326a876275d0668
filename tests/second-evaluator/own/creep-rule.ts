import type { Reading } from '#rules/record';
import type { CreepComplianceMeasure } from '#rules/rule-sets/measure';
import type { Rule } from '#rules/rule-sets/schema';
import { isSameCondition } from './conditions';
import { asNumber, exact, greatest, over } from './exact';
import { type Allowed, isOne, meanOf, one } from './interval';
import { type Judgement, judged, measuresOf, precisionOf } from './judged';
import { knownOf } from './known';
import { limitsOf } from './limits';
import { throughThreePoints } from './power-law';
import { haveUnits, valuesOf } from './quantity-value';
import { toTwelveDigits } from './rounding';
import { isDoubted, select } from './selection';
import { type Verdict, type World, without } from './world';

export type CreepRule = Rule & { measure: CreepComplianceMeasure };

export function creepVerdicts(world: World, rule: CreepRule): Verdict[] {
  return [{ rule: rule.id, subject: 'mix', ...judgeCreep(world, rule) }];
}

/** A compliance stated or strained at one loading time; null where it cannot be told. */
interface Point {
  specimen: string | undefined;
  time: number;
  value: Allowed | null;
}

function judgeCreep(world: World, rule: CreepRule): Judgement {
  const { measure } = rule;
  const { time, source, temperature, stress } = measure;
  const wanted = { temperature, ...(stress === undefined ? {} : { stress }) };
  const found = pointsOf(world, wanted);
  const points = typeof found === 'string' ? [] : found;
  const atTime = points.filter((point) => isSameCondition('time', time, point.time));
  const isMeasured = source === 'measured' || (source === 'either' && atTime.length > 0);
  const doubted = isMeasured ? { ...wanted, time } : wanted;
  if (QUANTITIES.some((quantity) => isDoubted(world, quantity, doubted))) return without('undecided');
  if (typeof found === 'string') return without(found);
  const place = { world, unit: knownOf('creep-compliance').unit };
  const limits = limitsOf(place, rule.limit);
  if (limits.is !== 'resolved') return without(limits.is);
  if (isMeasured && atTime.length === 0) return without('not shown');
  const measures = measuresOf(place, rule);
  if (measures.is !== 'resolved') return without(measures.is);
  const value = isMeasured ? meanOfSpecimens(atTime) : fitted(points, measure);
  return value === 'undecided'
    ? without(value)
    : judged(value, measures.value, precisionOf(rule, undefined, 1));
}

const QUANTITIES = ['creep-compliance', 'creep-strain'];

function pointsOf(
  world: World,
  wanted: { temperature: number; stress?: number },
): Point[] | 'not shown' | 'undecided' {
  const points: Point[] = [];
  let isUnsure = false;
  for (const quantity of QUANTITIES) {
    const options = { pooled: ['time', 'stress'], heedsDoubts: false };
    const chosen = select(world, quantity, wanted, options);
    if (chosen.is === 'doubtful') isUnsure = true;
    if (chosen.is !== 'readings') continue;
    for (const reading of chosen.readings) {
      if (reading.at.time === undefined) isUnsure = true;
      else points.push({ specimen: reading.at.specimen, time: reading.at.time, value: valueBy(reading) });
    }
  }
  if (points.length > 0) return points;
  return isUnsure ? 'undecided' : 'not shown';
}

/** D in 1/GPa: a strain in µε over a stress in kPa is the same number. */
function valueBy(reading: Reading): Allowed | null {
  const { stress } = reading.at;
  if (reading.value === null || !haveUnits(reading.quantity, [reading])) return null;
  if (reading.quantity === 'creep-strain') {
    return stress === undefined ? null : one(over(exact(reading.value), exact(stress)));
  }
  const values = valuesOf(reading.quantity, [reading], knownOf(reading.quantity).unit, true);
  if (values.is !== 'values') return null;
  const { low, high } = values.values[0]!.allowed;
  // Nothing is stiffer than not to give at all.
  return { low: greatest([low, exact(0)]), high };
}

/** The mean over specimens, of each the mean of its own points. */
function meanOfSpecimens(points: Point[]): Allowed | 'undecided' {
  const specimens = new Set(points.map(({ specimen }) => specimen));
  const means: Allowed[] = [];
  for (const specimen of specimens) {
    const own = points.filter((point) => point.specimen === specimen).map(({ value }) => value);
    if (own.includes(null)) return 'undecided';
    means.push(meanOf(own.filter((value) => value !== null)));
  }
  return meanOf(means);
}

/**
 * Between the tested times the curve, where the points lie on one exactly; outside them undecided, because no rule
 * here allows to extrapolate.
 */
function fitted(points: Point[], { time }: CreepComplianceMeasure): Allowed | 'undecided' {
  const first = new Map<number, number>();
  for (const { time: tested, value } of points) {
    if (value === null || !isOne(value)) return 'undecided';
    first.set(tested, asNumber(value.low));
  }
  const times = [...first.keys()].sort((left, right) => left - right);
  if (times.length < 4 || time < times[0]! || time > times.at(-1)!) return 'undecided';
  const three = times.slice(0, 3).map((each) => ({ time: each, value: first.get(each)! }));
  for (const [tested, value] of first) {
    const apart = Math.abs(throughThreePoints(three, tested) - value);
    if (!(apart <= 1e-8 * value)) throw new Error('The points lie on no power law, and none is fitted here.');
  }
  return one(toTwelveDigits(throughThreePoints(three, time)));
}
