import { mean } from '../numerics/mean';
import { formatDecimals } from '../numerics/round';
import type { Conditions, Reading } from '../record';
import {
  type ConsistencyInput,
  type ConsistencyObservation,
  computedOrStated,
  computedValues,
  type Known,
  knownReading,
  knownValue,
  placeOf,
  subjectOf,
} from './consistency-observation';

/** What no compacted specimen can be: as dense as the mix without voids, lighter when wet, filled over the brim. */
export function checkSpecimens(input: ConsistencyInput): ConsistencyObservation[] {
  return [
    ...compactedGravities(input),
    ...massOrder(input),
    ...overfilledVoids(input),
    ...heightOrder(input),
  ];
}

const gmb = 'bulk-specific-gravity-mix';

function compactedGravities(input: ConsistencyInput): ConsistencyObservation[] {
  return specimenGravities(input).flatMap(({ at, value, evidence }) => {
    const maxima = input.index.ofTrial('maximum-specific-gravity', at.trial ?? 'design');
    const gmm = mean(maxima.map((reading) => reading.value!));
    if (!gmm.ok || value < gmm.value) return [];
    return {
      name: 'bulk-not-below-maximum-gravity',
      subject: subjectOf(gmb, at),
      severity: 'required' as const,
      outcome: 'fail' as const,
      observed: value,
      limit: { min: null, max: gmm.value },
      unit: '1',
      sentence: `The bulk gravity of the compacted mix${placeOf(at)} is ${three(value)}, not below the maximum gravity, ${three(gmm.value)}.`,
      reason: 'No specimen is as dense as the mix without voids: the two may be swapped, or a mass is wrong.',
      evidence: [evidence, ...maxima.map((reading) => knownReading(reading).evidence)],
      quantity: gmb,
      at,
    };
  });
}

/** One value a specimen: from its masses where the analysis had them, else as stated. */
function specimenGravities(input: ConsistencyInput): Known[] {
  const computed = computedValues(input, gmb).flatMap((value): Known[] => {
    const { evidence } = knownValue(value);
    if (value.specimens.length === 0) return [{ value: value.value, at: value.at, evidence }];
    return value.specimens.map((own) => ({
      value: own.value,
      at: own.specimen === '' ? value.at : { ...value.at, specimen: own.specimen },
      evidence,
    }));
  });
  const covered = new Set(computed.map(({ at }) => specimenKey(at)));
  const stated = input.index
    .all(gmb)
    .map(knownReading)
    .map((known) => ({ ...known, at: { ...known.at, trial: known.at.trial ?? 'design' } }))
    .filter(({ at }) => !covered.has(specimenKey(at)));
  return [...computed, ...stated];
}

function massOrder({ index }: ConsistencyInput): ConsistencyObservation[] {
  return index.all('mass-saturated-surface-dry').flatMap((wet) => {
    const isSame = ({ at }: Reading) => specimenKey(at) === specimenKey(wet.at);
    const dry = index.all('mass-in-air').find(isSame);
    const submerged = index.all('mass-in-water').find(isSame);
    if (dry && wet.value! < dry.value!) return massBreach(wet, dry, 'below its dry mass');
    if (submerged && wet.value! <= submerged.value!)
      return massBreach(wet, submerged, 'not above its mass in water');
    return [];
  });
}

function massBreach(wet: Reading, other: Reading, relation: string): ConsistencyObservation {
  return {
    name: 'masses-out-of-order',
    subject: subjectOf(wet.quantity, wet.at),
    severity: 'advisory',
    outcome: 'fail',
    observed: wet.value,
    limit: { min: other.value, max: null },
    unit: wet.unit,
    sentence: `The surface-dry mass${placeOf(wet.at)} is ${wet.value} ${wet.unit}, ${relation}, ${other.value} ${other.unit}.`,
    reason: 'Gmb cannot be computed from these masses; two of them may be swapped.',
    evidence: [wet, other].map((reading) => knownReading(reading).evidence),
    quantity: wet.quantity,
    at: wet.at,
  };
}

function overfilledVoids(input: ConsistencyInput): ConsistencyObservation[] {
  const quantity = 'voids-filled-with-asphalt';
  return computedOrStated(input, quantity)
    .filter(({ value }) => value > 100)
    .map(({ at, value, evidence }) => ({
      name: 'voids-filled-above-100',
      subject: subjectOf(quantity, at),
      severity: 'required' as const,
      outcome: 'fail' as const,
      observed: value,
      limit: { min: null, max: 100 },
      unit: '%',
      sentence: `Voids filled with asphalt${placeOf(at)} are ${formatDecimals(value, 1)} %, above 100.`,
      reason: 'Binder cannot fill more than all of the voids: a gravity behind it is wrong.',
      evidence: [evidence],
      quantity,
      at,
    }));
}

/** A specimen grows shorter with every gyration. */
function heightOrder({ index }: ConsistencyInput): ConsistencyObservation[] {
  const quantity = 'specimen-height';
  return index.all(quantity).flatMap((later) => {
    const after = gyrationsOf(index.gyrations, later.at);
    if (after === null) return [];
    const lower = index.all(quantity).filter((earlier) => {
      const before = gyrationsOf(index.gyrations, earlier.at);
      const isSame = stackKey(earlier.at) === stackKey(later.at);
      return before !== null && isSame && before < after && earlier.value! < later.value!;
    });
    const [first] = lower;
    if (!first) return [];
    return {
      name: 'heights-rise',
      subject: subjectOf(quantity, later.at),
      severity: 'advisory' as const,
      outcome: 'fail' as const,
      observed: later.value,
      limit: { min: null, max: first.value },
      unit: later.unit,
      sentence: `The specimen height${placeOf(later.at)} is ${later.value} ${later.unit}, more than ${first.value} ${first.unit}${placeOf({ gyrations: first.at.gyrations })}.`,
      reason: 'A specimen grows shorter with every gyration; two heights may be swapped.',
      evidence: [later, first].map((reading) => knownReading(reading).evidence),
      quantity,
      at: later.at,
    };
  });
}

function gyrationsOf(
  stated: ConsistencyInput['index']['gyrations'],
  { gyrations }: Conditions,
): number | null {
  if (gyrations === undefined) return null;
  return typeof gyrations === 'number' ? gyrations : (stated.get(gyrations) ?? nominalOrder[gyrations]);
}

/** Where the numbers are not stated, the names still tell the order. */
const nominalOrder = { initial: -3, design: -2, maximum: -1 };

function specimenKey({ trial, specimen, gyrations, variant, blend }: Conditions): string {
  return JSON.stringify([trial ?? 'design', specimen, gyrations, variant, blend]);
}

function stackKey({ trial, specimen, variant, blend }: Conditions): string {
  return JSON.stringify([trial ?? 'design', specimen, variant, blend]);
}

function three(value: number): string {
  return formatDecimals(value, 3);
}
