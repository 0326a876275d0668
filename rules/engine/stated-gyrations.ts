import type { World } from './world';

/** The one number stated for the initial, design or maximum gyrations, or null. */
export function statedGyrations(world: World, name: string): number | null {
  const readings = (world.readings.get(`gyrations-${name}`) ?? []).filter(
    ({ at, fault }) => fault === null && (at.laboratory ?? 'contractor') === 'contractor',
  );
  const ofDesign = readings.filter(({ at }) => (at.trial ?? 'design') === 'design');
  const values = new Set((ofDesign.length > 0 ? ofDesign : readings).map(({ value }) => value));
  const [only] = values;
  return values.size === 1 && only !== undefined ? only : null;
}
