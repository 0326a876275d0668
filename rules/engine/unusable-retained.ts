import type { Conditions } from '../record';
import { type Obstacle, undecided } from './obstacle';
import { inScope } from './scope';
import type { UsableReading, World } from './world';

/**
 * Why percent passing cannot be told from what is stated as retained at a sieve or above it, or null: a percent
 * without a number cannot be taken from 100, and leaving it out would let too much pass.
 */
export function unusableRetained(world: World, wanted: Conditions): Obstacle | null {
  const { sieve } = wanted;
  if (sieve === undefined) return null;
  const cumulative = ofMaterial(world, CUMULATIVE, wanted).filter(({ at }) => at.sieve === sieve);
  const individual = ofMaterial(world, INDIVIDUAL, wanted).filter(({ at }) => (at.sieve ?? 0) >= sieve);
  const isOfIndividual = cumulative.length === 0 && individual.some(({ at }) => at.sieve === sieve);
  const used = isOfIndividual ? individual : cumulative;
  const found = used.find(
    ({ fault, value, reading }) => fault !== null || value === null || reading.qualifier,
  );
  if (found === undefined) return null;
  const { source } = found.reading;
  const place = source === null ? '' : ` (${source.sheet === '' ? '' : `${source.sheet} `}${source.cell})`;
  return undecided(
    `A percent retained${place} on ${sieve === found.at.sieve ? 'this sieve' : 'a coarser sieve'} is not a number that can be taken from 100.`,
    'State it as a number in percent.',
  );
}

const CUMULATIVE = 'cumulative-percent-retained';
const INDIVIDUAL = 'percent-retained';

function ofMaterial(world: World, quantity: string, wanted: Conditions): UsableReading[] {
  const candidates = world.readings.get(quantity) ?? [];
  const inside = inScope({ world, quantity, label: quantity, wanted, candidates });
  return inside.ok ? inside.chosen : [];
}
