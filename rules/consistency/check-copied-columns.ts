import { quantityById } from '../quantities/registry';
import type { Reading } from '../record';
import {
  type ConsistencyInput,
  type ConsistencyObservation,
  knownReading,
  placeOf,
} from './consistency-observation';
import { conditionsKey, hasManyDigits } from './replicate-groups';

/** Measured specimen by specimen with digits that do not come again. */
const specimenQuantities = [
  'mass-in-air',
  'mass-in-water',
  'mass-saturated-surface-dry',
  'bulk-specific-gravity-mix',
  'failure-load',
  'tensile-strength-dry',
  'tensile-strength-conditioned',
  'marshall-stability',
  'fracture-energy',
];

/** Values that two columns share before it is more than chance. */
const leastSpecimens = 3;
const leastSieves = 4;

/** A column of values that stands a second time under another trial, stockpile or laboratory. */
export function checkCopiedColumns({ record }: ConsistencyInput): ConsistencyObservation[] {
  const numbered = record.readings.filter(
    ({ value, qualifier }) => value !== null && qualifier === undefined,
  );
  const ofSpecimens = specimenQuantities.flatMap((quantity) =>
    copies(
      numbered.filter((each) => each.quantity === quantity && each.at.specimen !== undefined),
      {
        without: 'specimen',
        least: leastSpecimens,
        isTelling: hasManyDigits,
      },
    ),
  );
  const ofStockpiles = copies(
    numbered.filter(({ quantity, at }) => quantity === 'percent-passing' && at.stockpile !== undefined),
    { without: 'sieve', least: leastSieves, isTelling: ({ value }) => value! > 0 && value! < 100 },
  );
  return [...ofSpecimens, ...ofStockpiles];
}

interface Kind {
  /** What runs down a column; everything else is its head. */
  without: 'specimen' | 'sieve';
  least: number;
  isTelling: (reading: Reading) => boolean;
}

function copies(readings: readonly Reading[], kind: Kind): ConsistencyObservation[] {
  const columns = new Map<string, Reading[]>();
  for (const reading of readings) {
    const key = conditionsKey(reading.at, kind.without);
    const column = columns.get(key);
    if (column) column.push(reading);
    else columns.set(key, [reading]);
  }
  const all = [...columns.values()];
  return all.flatMap((column, place) =>
    all
      .slice(place + 1)
      .flatMap((other) => (isCopy(column, other, kind) ? [observation(column, other)] : [])),
  );
}

/** Equal from first to last, with enough values that tell, which are not all the same one. */
function isCopy(column: readonly Reading[], other: readonly Reading[], kind: Kind): boolean {
  if (column.length !== other.length) return false;
  const pairs = column.map((reading, place) => [reading, counterpart(reading, place, other, kind)] as const);
  if (pairs.some(([reading, twin]) => twin?.value !== reading.value)) return false;
  const telling = column.filter(kind.isTelling);
  return telling.length >= kind.least && new Set(telling.map(({ value }) => value)).size > 1;
}

/** The value at the same sieve; specimens of another trial may carry other labels and follow one another. */
function counterpart(reading: Reading, place: number, other: readonly Reading[], { without }: Kind) {
  return without === 'sieve' ? other.find(({ at }) => at.sieve === reading.at.sieve) : other[place];
}

function observation(column: readonly Reading[], other: readonly Reading[]): ConsistencyObservation {
  const first = column[0]!;
  const label = quantityById(first.quantity)?.label ?? first.quantity;
  const [one, two] = [column, other].map(([head]) => headWords(head!));
  const { specimen: _specimen, sieve: _sieve, ...at } = first.at;
  return {
    name: 'copied-column',
    subject: `${label}${one} and${two}`,
    severity: 'advisory',
    outcome: 'fail',
    observed: null,
    limit: null,
    unit: first.unit,
    sentence: `The ${column.length} values of ${label}${one} are those${two}.`,
    reason:
      'Two samples do not give the same values from first to last; one column may be a copy of the other.',
    evidence: [...column, ...other].map((reading) => knownReading(reading).evidence),
    quantity: first.quantity,
    at,
  };
}

function headWords({ at: { specimen: _specimen, sieve: _sieve, ...head } }: Reading): string {
  const trial = head.trial ?? (head.stockpile === undefined ? 'design' : undefined);
  return placeOf({ ...head, trial });
}
