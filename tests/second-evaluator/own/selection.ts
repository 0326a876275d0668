import type { Conditions, Reading } from '#rules/record';
import { compare, type Exact, exact, magnitude, minus, over, times } from './exact';
import { knownOf } from './known';
import type { World } from './world';

export type Selected = { is: 'readings'; readings: Reading[] } | { is: 'missing' } | { is: 'doubtful' };

type Fit = 'yes' | 'perhaps' | 'no';

const CONDITIONS = [
  'variant',
  'passes',
  'frequency',
  'aging',
  'stress',
  'gyrations',
  'temperature',
  'time',
  'sieve',
] as const;

export interface SelectOptions {
  /** Conditions whose several values are not several things. */
  pooled?: readonly string[];
  /** Only what is stated for this one specimen. */
  specimen?: string;
}

/** The readings that a rule's conditions select, or why there is none that counts. */
export function select(
  world: World,
  quantity: string,
  wanted: Conditions,
  { pooled = [], specimen }: SelectOptions = {},
): Selected {
  const isOfSpecimen = (at: Conditions) => specimen === undefined || at.specimen === specimen;
  const fitting: Reading[] = [];
  let perhaps = 0;
  for (const reading of world.record.readings) {
    if (reading.quantity !== quantity || !isOfSpecimen(reading.at)) continue;
    const fit = fitOf(world, quantity, wanted, reading.at);
    if (fit === 'yes') fitting.push(reading);
    if (fit === 'perhaps') perhaps += 1;
  }
  if (fitting.length === 0) {
    const isDoubted = world.record.doubts.some(
      ({ about }) =>
        about.quantity === quantity &&
        (about.at?.specimen === undefined || isOfSpecimen(about.at)) &&
        fitOf(world, quantity, wanted, about.at ?? {}) !== 'no',
    );
    return isDoubted || perhaps > 0 ? { is: 'doubtful' } : { is: 'missing' };
  }
  for (const name of CONDITIONS) {
    if (wanted[name] !== undefined || pooled.includes(name)) continue;
    const values = new Set(fitting.map(({ at }) => at[name]).filter((value) => value !== undefined));
    if (values.size > 1) return { is: 'doubtful' };
  }
  return { is: 'readings', readings: fitting };
}

export function fitOf(world: World, quantity: string, wanted: Conditions, stated: Conditions): Fit {
  if ((wanted.laboratory ?? 'contractor') !== (stated.laboratory ?? 'contractor')) return 'no';
  const everyTrial = knownOf(quantity).of !== 'mix' && stated.trial === undefined;
  if (!everyTrial && (wanted.trial ?? 'design') !== (stated.trial ?? 'design')) return 'no';
  let fit: Fit = 'yes';
  if (wanted.stockpile === undefined) {
    if (stated.stockpile !== undefined) return 'no';
  } else if (stated.stockpile === undefined) fit = 'perhaps';
  else if (stated.stockpile !== wanted.stockpile) return 'no';
  for (const name of CONDITIONS) {
    const value = wanted[name];
    if (value === undefined) continue;
    const other = stated[name];
    if (other === undefined) {
      fit = 'perhaps';
      continue;
    }
    const agreement = agrees(world, name, value, other, wanted.trial);
    if (agreement === 'no') return 'no';
    if (agreement === 'perhaps') fit = 'perhaps';
  }
  return fit;
}

function agrees(
  world: World,
  name: (typeof CONDITIONS)[number],
  wanted: string | number,
  stated: string | number,
  trial: string | undefined,
): Fit {
  if (name === 'gyrations' && typeof wanted !== typeof stated) {
    const [named, number] = typeof wanted === 'string' ? [wanted, stated] : [stated, wanted];
    const resolved = gyrationsOf(world, String(named), trial);
    return resolved === null ? 'perhaps' : resolved === number ? 'yes' : 'no';
  }
  if (typeof wanted === 'string' || typeof stated === 'string') return wanted === stated ? 'yes' : 'no';
  const apart = magnitude(minus(exact(wanted), exact(stated)));
  const allowed: Exact =
    name === 'temperature'
      ? exact('0.5')
      : name === 'time'
        ? over(times(exact(wanted), exact(1)), exact(100))
        : exact(0);
  return compare(apart, allowed) <= 0 ? 'yes' : 'no';
}

/** How many gyrations a name stands for, as the workbook states it. */
function gyrationsOf(world: World, name: string, trial: string | undefined): number | null {
  const chosen = select(world, `gyrations-${name}`, trial === undefined ? {} : { trial });
  if (chosen.is !== 'readings') return null;
  const [first] = chosen.readings;
  return first?.value ?? null;
}
