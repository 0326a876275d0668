import type { Conditions, Reading } from '#rules/record';
import { agreement, CONDITIONS, isSameCondition } from './conditions';
import { knownOf } from './known';
import { OF_COMPACTED } from './shared-specimens';
import { oneASpecimen } from './specimens';
import type { World } from './world';

export type Selected = { is: 'readings'; readings: Reading[] } | { is: 'missing' } | { is: 'doubtful' };

type Fit = 'yes' | 'perhaps' | 'no';

export interface SelectOptions {
  /** Conditions whose several values are not several things. */
  pooled?: readonly string[];
  /** Only what is stated for this one specimen; null for what is stated for none. */
  specimen?: string | null;
  /** False where doubts are looked at otherwise. */
  heedsDoubts?: boolean;
}

/** The readings that a rule's conditions select, one a specimen, or why there is none that counts. */
export function select(
  world: World,
  quantity: string,
  wanted: Conditions,
  { pooled = [], specimen, heedsDoubts = true }: SelectOptions = {},
): Selected {
  if (heedsDoubts && isDoubted(world, quantity, wanted)) return { is: 'doubtful' };
  let fitting: Reading[] = [];
  let perhaps = 0;
  for (const reading of world.record.readings) {
    if (reading.quantity !== quantity) continue;
    if (specimen !== undefined && (reading.at.specimen ?? null) !== specimen) continue;
    const fit = fitOf(world, quantity, wanted, reading.at);
    if (fit === 'yes') fitting.push(reading);
    if (fit === 'unresolved') return { is: 'doubtful' };
    if (fit === 'perhaps') perhaps += 1;
  }
  if (fitting.length === 0) return { is: perhaps > 0 ? 'doubtful' : 'missing' };
  // What is stated for this trial goes before what is stated for all.
  const own = fitting.filter(({ at }) => at.trial !== undefined);
  if (knownOf(quantity).of !== 'mix' && own.length > 0) fitting = own;
  // Of what follows from other readings the plain value is the volumetric specimens' own.
  if (quantity === 'air-voids') fitting = plainOf(wanted, fitting);
  if (severalConditions(wanted, fitting, pooled)) return { is: 'doubtful' };
  // All of specimens that were made for a test of their own: of the design's nothing is known.
  const isOfTests = fitting.every(({ at }) => at.variant !== undefined);
  if (isOfTests && wanted.variant === undefined && OF_COMPACTED.includes(quantity)) return { is: 'doubtful' };
  if (pooled.length > 0) return { is: 'readings', readings: fitting };
  const readings = oneASpecimen(fitting);
  return readings === null ? { is: 'doubtful' } : { is: 'readings', readings };
}

/**
 * An open doubt about what could count here, with no sure reading in its place: at all the conditions, the specimen
 * too, that the doubtful cell states.
 */
export function isDoubted(world: World, quantity: string, wanted: Conditions): boolean {
  for (const { about } of world.record.doubts) {
    if (about.quantity !== quantity) continue;
    const doubted = about.at ?? {};
    if (fitOf(world, quantity, wanted, doubted) === 'no') continue;
    const isSure = world.record.readings.some(
      (reading) => reading.quantity === quantity && standsFor(reading.at, doubted),
    );
    if (!isSure) return true;
  }
  return false;
}

function plainOf(wanted: Conditions, fitting: Reading[]): Reading[] {
  const plain = fitting.filter(({ at }) => at.variant === undefined);
  return wanted.variant === undefined && plain.length > 0 ? plain : fitting;
}

function standsFor(sure: Conditions, doubted: Conditions): boolean {
  if ((sure.laboratory ?? 'contractor') !== (doubted.laboratory ?? 'contractor')) return false;
  if ((sure.trial ?? 'design') !== (doubted.trial ?? 'design')) return false;
  for (const name of ['specimen', 'stockpile', ...CONDITIONS] as const) {
    if (doubted[name] !== undefined && doubted[name] !== sure[name]) return false;
  }
  return true;
}

/** One with a condition beside one without it may be two tests as well as one. */
function severalConditions(wanted: Conditions, fitting: Reading[], pooled: readonly string[]): boolean {
  for (const name of CONDITIONS) {
    if (wanted[name] !== undefined || pooled.includes(name)) continue;
    const first = fitting[0]!.at[name];
    for (const { at } of fitting) {
      if (first === undefined ? at[name] !== undefined : !isSameCondition(name, first, at[name])) return true;
    }
  }
  return false;
}

export function fitOf(
  world: World,
  quantity: string,
  wanted: Conditions,
  stated: Conditions,
): Fit | 'unresolved' {
  if ((wanted.laboratory ?? 'contractor') !== (stated.laboratory ?? 'contractor')) return 'no';
  const isOfEveryTrial = knownOf(quantity).of !== 'mix' && stated.trial === undefined;
  if (!isOfEveryTrial && (wanted.trial ?? 'design') !== (stated.trial ?? 'design')) return 'no';
  let fit: Fit = 'yes';
  if (wanted.stockpile === undefined) {
    if (stated.stockpile !== undefined) return 'no';
  } else if (stated.stockpile === undefined) fit = 'perhaps';
  else if (stated.stockpile !== wanted.stockpile && wanted.stockpile !== 'each') return 'no';
  let isUnresolved = false;
  for (const name of CONDITIONS) {
    const value = wanted[name];
    const found = value === undefined ? 'yes' : agreement(world, name, value, stated[name]);
    if (found === 'no') return 'no';
    if (found === 'unresolved') isUnresolved = true;
    if (found === 'perhaps') fit = 'perhaps';
  }
  return isUnresolved ? 'unresolved' : fit;
}
