import type { CreepComplianceMeasure } from '#rules/rule-sets/measure';
import { exact } from './exact';
import { type Allowed, one } from './interval';
import { throughThreePoints } from './power-law';
import { toTwelveDigits } from './rounding';

export interface TestedPoint {
  time: number;
  value: number;
}

/**
 * The compliance by a curve through tested points. On a power law it is known exactly; of any other curve that is
 * worth the name it is known where the points are dense, from a parabola through the nearest of them. Points of one
 * loading time that scatter more than the least R² allows are on no curve at all.
 */
export function throughPoints(
  points: TestedPoint[],
  { model, time }: CreepComplianceMeasure,
): Allowed | 'undecided' {
  const means = meansByTime(points);
  const needed = { power: 3, sigmoid: 4, prony: 3 }[model];
  if (means.length < needed || points.length <= needed) return 'undecided';
  const scatter = shareOfScatter(points, means);
  if (scatter > 0.03) return 'undecided';
  if (scatter > 0.005) throw new Error('Whether a curve explains these points is too close to be told here.');
  if (model === 'power' && scatter < 1e-15) {
    const value = onPowerLaw(means, time);
    if (value !== null) return one(toTwelveDigits(value));
  }
  const near = nearby(means, time);
  return { low: exact(near * (1 - TOLERANCE)), high: exact(near * (1 + TOLERANCE)) };
}

/** A fitted curve and a parabola through its points lie this near to each other, as a share. */
const TOLERANCE = 0.06;

function onPowerLaw(means: TestedPoint[], time: number): number | null {
  const three = means.slice(0, 3);
  const ratios = [three[1]!.time / three[0]!.time, three[2]!.time / three[1]!.time];
  if (Math.abs(ratios[0]! - ratios[1]!) > 1e-12) return null;
  const isOnLaw = means.every(
    (point) => Math.abs(throughThreePoints(three, point.time) - point.value) <= 1e-8 * point.value,
  );
  return isOnLaw ? throughThreePoints(three, time) : null;
}

function meansByTime(points: TestedPoint[]): TestedPoint[] {
  const times = [...new Set(points.map(({ time }) => time))].sort((left, right) => left - right);
  return times.map((time) => {
    const own = points.filter((point) => point.time === time);
    const sum = own.reduce((all, { value }) => all + Math.log(value), 0);
    return { time, value: Math.exp(sum / own.length) };
  });
}

/** Of the variation of ln D the share that lies within loading times, which no curve can explain. */
function shareOfScatter(points: TestedPoint[], means: TestedPoint[]): number {
  const logs = points.map(({ value }) => Math.log(value));
  const centre = logs.reduce((sum, each) => sum + each, 0) / logs.length;
  let all = 0;
  let within = 0;
  for (const { time, value } of points) {
    const mean = means.find((each) => each.time === time)!;
    all += (Math.log(value) - centre) ** 2;
    within += Math.log(value / mean.value) ** 2;
  }
  return all === 0 ? 1 : within / all;
}

/** Lagrange's parabola in logarithms through the three loading times around. */
function nearby(means: TestedPoint[], time: number): number {
  const distance = (point: TestedPoint) => Math.abs(Math.log(point.time / time));
  const three = [...means].sort((left, right) => distance(left) - distance(right)).slice(0, 3);
  let sum = 0;
  for (const point of three) {
    let weight = 1;
    for (const other of three) {
      if (other !== point) weight *= Math.log(time / other.time) / Math.log(point.time / other.time);
    }
    sum += weight * Math.log(point.value);
  }
  return Math.exp(sum);
}
