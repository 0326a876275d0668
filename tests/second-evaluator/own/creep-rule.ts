import type { Reading } from '#rules/record';
import type { CreepComplianceMeasure } from '#rules/rule-sets/measure';
import type { Rule } from '#rules/rule-sets/schema';
import { isSameCondition } from './conditions';
import { type TestedPoint, throughPoints } from './creep-curve';
import { asNumber, exact, greatest, over } from './exact';
import { type Allowed, isOne, meanOf, one } from './interval';
import { type Judgement, judged, measuresOf, precisionOf } from './judged';
import { knownOf } from './known';
import { limitsOf } from './limits';
import { haveUnits, valuesOf } from './quantity-value';
import { isDoubted, select } from './selection';
import { countingReadings } from './where';
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
  const found = countingPoints(world, measure, pointsOf(world, wanted));
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

/** The points of the specimens that count; those of a specimen that may or may not leave all open. */
function countingPoints(
  world: World,
  { where }: CreepComplianceMeasure,
  points: Point[] | 'not shown' | 'undecided',
): typeof points {
  if (typeof points === 'string' || where === undefined) return points;
  const specimens = [...new Set(points.map(({ specimen }) => specimen))].map((specimen) => ({
    quantity: 'creep-compliance',
    value: null,
    unit: '1/GPa',
    at: specimen === undefined ? {} : { specimen },
    origin: 'measured' as const,
    source: null,
  }));
  const counting = countingReadings(world, specimens, where);
  if (counting === null) return 'undecided';
  const left = counting.map(({ at }) => at.specimen);
  const kept = points.filter(({ specimen }) => left.includes(specimen));
  return kept.length > 0 ? kept : 'not shown';
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

/** Within the tested times, or as far beyond as the rule allows, by a curve that its points hold. */
function fitted(points: Point[], measure: CreepComplianceMeasure): Allowed | 'undecided' {
  const tested: TestedPoint[] = [];
  for (const { time, value } of points) {
    if (value === null || !isOne(value)) return 'undecided';
    tested.push({ time, value: asNumber(value.low) });
  }
  const ends = tested.map(({ time }) => time);
  const decades = decadesBeyond(measure.time, Math.min(...ends), Math.max(...ends));
  if (decades > measure.extrapolationDecades) return 'undecided';
  return throughPoints(tested, measure);
}

/** A time within one percent of the first or the last tested one is that one. */
function decadesBeyond(time: number, first: number, last: number): number {
  if (isSameCondition('time', first, time) || isSameCondition('time', last, time)) return 0;
  return Math.max(0, Math.log10(first / time), Math.log10(time / last));
}
