import type { Candidate } from './select';
import type { World } from './world';

/**
 * Volumetric readings without those of specimens that were made for a moisture test: they are compacted to
 * other voids on purpose. Where nothing else is left they stay, because then they are what was asked for.
 */
export function withoutTestedSpecimens<T extends Candidate>(
  world: World,
  quantity: string,
  candidates: T[],
): T[] {
  if (!VOLUMETRIC.has(quantity)) return candidates;
  const tested = new Set<string>();
  for (const test of TESTS) {
    for (const { at } of world.readings.get(test) ?? []) {
      if (at.specimen !== undefined) tested.add(`${at.trial ?? 'design'}~${at.specimen}`);
    }
  }
  const others = candidates.filter(
    ({ at }) => at.specimen === undefined || !tested.has(`${at.trial ?? 'design'}~${at.specimen}`),
  );
  return others.length > 0 ? others : candidates;
}

const TESTS = [
  'failure-load',
  'tensile-strength-dry',
  'tensile-strength-conditioned',
  'degree-of-saturation',
];

const VOLUMETRIC = new Set([
  'bulk-specific-gravity-mix',
  'bulk-density-mix',
  'air-voids',
  'voids-in-mineral-aggregate',
  'voids-filled-with-asphalt',
  'relative-density',
]);
