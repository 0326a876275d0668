import { andList } from '../rule-sets/words';
import { namedInFormula } from './doubts';
import type { SampleRequest } from './sample';
import type { World } from './world';

type IsAvailable = (request: SampleRequest) => boolean;

/**
 * Where a quantity has no reading, but part of what it is computed from is given: what is missing for that, in
 * words; else null.
 */
export function missingForComputing(
  world: World,
  request: SampleRequest,
  isAvailable: IsAvailable,
): string | null {
  const missing = missingOf(world, request, isAvailable, new Set());
  if (missing === null) return null;
  const labels = missing.map((id) => world.view.quantity(id)?.label ?? id);
  if (labels.length === 0) return 'It cannot be computed either: what is given does not belong together.';
  return `It cannot be computed either: ${andList(labels)} ${labels.length === 1 ? 'is' : 'are'} missing.`;
}

/** Down to the raw readings that are missing; null where nothing of what it is computed from is given. */
function missingOf(
  world: World,
  { quantity, at }: SampleRequest,
  isAvailable: IsAvailable,
  above: ReadonlySet<string>,
): string[] | null {
  const inputs = inputsOf(world, quantity).filter((input) => !above.has(input));
  const conditions = {
    ...(at.trial === undefined ? {} : { trial: at.trial }),
    ...(at.laboratory === undefined ? {} : { laboratory: at.laboratory }),
  };
  const requestOf = (input: string): SampleRequest => ({
    quantity: input,
    at: input === 'percent-passing' ? { ...conditions, sieve: DUST_SIEVE_MM } : conditions,
  });
  const absent = inputs.filter((input) => !isAvailable(requestOf(input)));
  const path = new Set([...above, quantity]);
  const behind = absent.map((input) => missingOf(world, requestOf(input), isAvailable, path));
  const isPartGiven = absent.length < inputs.length || behind.some((missing) => missing !== null);
  if (!isPartGiven) return null;
  return [...new Set(absent.flatMap((input, i) => behind[i] ?? [input]))];
}

function inputsOf(world: World, id: string): string[] {
  if (id === 'bulk-specific-gravity-mix') return MASSES;
  const quantity = world.view.quantity(id);
  return quantity?.derivation ? namedInFormula(quantity).filter((input) => input !== id) : [];
}

/** Gmb is a measured quantity that the masses of a specimen give. */
const MASSES = ['mass-in-air', 'mass-saturated-surface-dry', 'mass-in-water'];

/** mm; the one sieve that a derived quantity rests on. */
const DUST_SIEVE_MM = 0.075;
