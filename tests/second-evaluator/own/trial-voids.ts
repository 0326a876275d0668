import type { Conditions, Reading } from '#rules/record';
import { compare, type Exact, exact, greatest, least, magnitude, minus, over, times } from './exact';
import { parabolaAt } from './parabola';
import { mean } from './statistics';
import type { World } from './world';

/** Air voids from gravities: of each specimen, where specimens are told apart, and their mean. */
export interface Voids {
  mean: Exact;
  /** Empty where only the mean is known. */
  specimens: Exact[];
  count: number;
  isInterpolated: boolean;
}

/**
 * Air voids of the design: of its own gravities, else of the trial within 0.05 of its binder content, else between the
 * trials. Null where there are none to be computed.
 */
export function designVoids(world: World): Voids | null {
  const own = voidsOf(world, 'design');
  if (own !== null) return own;
  const declared = meanOf(world, 'binder-content', 'design');
  if (declared === null) return null;
  const trials = namesOfTrials(world).flatMap((trial) => {
    const content = meanOf(world, 'binder-content', trial);
    return content === null ? [] : [{ content, voids: voidsOf(world, trial) }];
  });
  const distances = trials.map(({ content }) => magnitude(minus(content, declared)));
  if (distances.length === 0) return null;
  const nearest = least(distances);
  if (compare(nearest, exact('0.05')) <= 0) {
    return trials[distances.findIndex((each) => compare(each, nearest) === 0)]!.voids;
  }
  const points = trials.flatMap(({ content, voids }) => (voids === null ? [] : [{ content, voids }]));
  return between(world, points, declared);
}

/** Whether gravities of the design give air voids only of specimens that were made for a test. */
export function hasVoidsOfTests(world: World): boolean {
  const isOfTest = ({ quantity, at }: Reading) =>
    quantity === 'bulk-specific-gravity-mix' &&
    (at.trial ?? 'design') === 'design' &&
    at.laboratory !== 'agency' &&
    at.variant !== undefined;
  return meanOf(world, 'maximum-specific-gravity', 'design') !== null && world.record.readings.some(isOfTest);
}

interface Point {
  content: Exact;
  voids: Voids;
}

/** Never beyond the trials; a parabola from four contents on, where the edition does not ask for lines. */
function between(world: World, points: Point[], declared: Exact): Voids | null {
  const contents = points.map(({ content }) => content);
  if (points.length < 2) return null;
  if (compare(declared, least(contents)) < 0 || compare(declared, greatest(contents)) > 0) return null;
  const places = points.map(({ content, voids }) => ({ x: content, y: voids.mean }));
  const value =
    world.edition.fit === 'quadratic' && points.length >= 4
      ? parabolaAt(places, declared)
      : onLine(places, declared);
  const count = Math.min(...points.map(({ voids }) => voids.count));
  return { mean: value, specimens: [], count, isInterpolated: true };
}

function onLine(places: { x: Exact; y: Exact }[], at: Exact): Exact {
  const inOrder = [...places].sort((left, right) => compare(left.x, right.x));
  const next = inOrder.findIndex(({ x }) => compare(x, at) >= 0);
  const [right, left] = [inOrder[next]!, inOrder[next - 1]];
  if (left === undefined) return right.y;
  const share = over(minus(at, left.x), minus(right.x, left.x));
  return minus(left.y, times(share, minus(left.y, right.y)));
}

/** 100·(Gmm − Gmb)/Gmm (AASHTO T 269; from memory, verify). */
function voidsOf(world: World, trial: string): Voids | null {
  const gmm = meanOf(world, 'maximum-specific-gravity', trial);
  const all = readingsOf(world, 'bulk-specific-gravity-mix', trial);
  // One without a specimen beside some with one is their stated mean.
  const labelled = all.filter(({ at }) => at.specimen !== undefined);
  const gravities = labelled.length > 0 ? labelled : all;
  if (gmm === null || gravities.length === 0) return null;
  const voids = gravities.map(({ value }) => times(exact(100), over(minus(gmm, exact(value!)), gmm)));
  const specimens = gravities.every(({ at }) => at.specimen !== undefined) ? voids : [];
  return { mean: mean(voids), specimens, count: voids.length, isInterpolated: false };
}

function meanOf(world: World, quantity: string, trial: string): Exact | null {
  const readings = readingsOf(world, quantity, trial);
  return readings.length === 0 ? null : mean(readings.map(({ value }) => exact(value!)));
}

function readingsOf({ record }: World, quantity: string, trial: string): Reading[] {
  const own = (at: Conditions) =>
    (at.trial ?? 'design') === trial && at.laboratory !== 'agency' && at.variant === undefined;
  return record.readings.filter((reading) => reading.quantity === quantity && own(reading.at));
}

function namesOfTrials({ record }: World): string[] {
  const names = new Set(record.readings.flatMap(({ at }) => at.trial ?? []));
  names.delete('design');
  return [...names];
}
