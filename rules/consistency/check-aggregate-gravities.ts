import { formatDecimals } from '../numerics/round';
import type { Conditions } from '../record';
import {
  type ConsistencyInput,
  type ConsistencyObservation,
  computedValues,
  isOfOwnTrial,
  type Known,
  knownReading,
  knownValue,
  placeOf,
  subjectOf,
} from './consistency-observation';

/** Gravities are reported to 0.001; a breach up to this is shown as advisory. */
const gravityAllowance = 0.005;

/** Gsb ≤ Gse ≤ Gsa: no aggregate can break this order (AASHTO R 35; from memory, verify). */
export function checkAggregateGravities(input: ConsistencyInput): ConsistencyObservation[] {
  return [
    ...computedValues(input, effective)
      .filter(isOfOwnTrial)
      .flatMap((gse) => againstBlend(input, knownValue(gse))),
    ...bulkAgainstApparent(input),
    ...statedNegativeAbsorption(input),
  ];
}

const bulk = 'bulk-specific-gravity-aggregate';
const apparent = 'apparent-specific-gravity-aggregate';
const effective = 'effective-specific-gravity-aggregate';

function againstBlend(input: ConsistencyInput, gse: Known): ConsistencyObservation[] {
  const gsb = ofBlend(input, bulk, gse.at);
  const gsa = ofBlend(input, apparent, gse.at);
  const found: ConsistencyObservation[] = [];
  if (gsb && gse.value < gsb.value) {
    found.push({
      ...effectiveBreach(gse, gsb, gsb.value - gse.value),
      name: 'effective-below-bulk-gravity',
      limit: { min: gsb.value, max: null },
      sentence: `The effective gravity of the aggregate${placeOf(gse.at)} is ${three(gse.value)}, below its bulk gravity, ${three(gsb.value)}.`,
      reason:
        'Aggregate cannot absorb less than nothing: Gmm, the binder content or the bulk gravity is wrong.',
    });
  }
  if (gsa && gse.value > gsa.value) {
    found.push({
      ...effectiveBreach(gse, gsa, gse.value - gsa.value),
      name: 'effective-above-apparent-gravity',
      limit: { min: null, max: gsa.value },
      sentence: `The effective gravity of the aggregate${placeOf(gse.at)} is ${three(gse.value)}, above its apparent gravity, ${three(gsa.value)}.`,
      reason:
        'Binder cannot enter pores that water does not: Gmm, the binder content or the apparent gravity is wrong.',
    });
  }
  return found;
}

function effectiveBreach(gse: Known, bound: Known, by: number) {
  return {
    subject: subjectOf(effective, gse.at),
    severity: by > gravityAllowance + 1e-9 ? ('required' as const) : ('advisory' as const),
    outcome: 'fail' as const,
    observed: gse.value,
    unit: '1',
    evidence: [gse.evidence, bound.evidence],
    quantity: effective,
    at: gse.at,
  };
}

/** The blend's gravity for a trial: computed from the stockpiles, else as stated. */
function ofBlend(input: ConsistencyInput, quantity: string, at: Conditions): Known | null {
  const computed = computedValues(input, quantity);
  const own =
    computed.find((value) => value.at.trial !== undefined && value.at.trial === at.trial) ??
    (computed.length === 1 && computed[0]!.at.trial === undefined ? computed[0] : undefined);
  if (own) return knownValue(own);
  const stated = input.index
    .ofTrial(quantity, at.trial ?? 'design')
    .filter((reading) => reading.at.stockpile === undefined);
  return stated.length === 1 ? knownReading(stated[0]!) : null;
}

function bulkAgainstApparent({ index }: ConsistencyInput): ConsistencyObservation[] {
  return index.all(bulk).flatMap((gsb) => {
    const gsa = index.all(apparent).find(({ at }) => sameSample(at, gsb.at));
    if (!gsa || gsb.value! <= gsa.value!) return [];
    return {
      name: 'bulk-above-apparent-gravity',
      subject: subjectOf(bulk, gsb.at),
      severity: 'advisory' as const,
      outcome: 'fail' as const,
      observed: gsb.value,
      limit: { min: null, max: gsa.value },
      unit: '1',
      sentence: `The bulk gravity of the aggregate${placeOf(gsb.at)} is ${three(gsb.value!)}, above its apparent gravity, ${three(gsa.value!)}.`,
      reason:
        'The volume with the pores cannot be smaller than the volume without them; the two may be swapped.',
      evidence: [gsb, gsa].map((reading) => knownReading(reading).evidence),
      quantity: bulk,
      at: gsb.at,
    };
  });
}

/** Where Gse is not to be had, a stated negative absorption still tells the same. */
function statedNegativeAbsorption(input: ConsistencyInput): ConsistencyObservation[] {
  const covered = new Set(computedValues(input, 'absorbed-binder').map(({ at }) => at.trial ?? 'design'));
  return input.index
    .all('absorbed-binder')
    .filter(({ value, at }) => value! < 0 && !covered.has(at.trial ?? 'design'))
    .map((reading) => ({
      name: 'negative-absorption',
      subject: subjectOf(reading.quantity, reading.at),
      severity: 'advisory' as const,
      outcome: 'fail' as const,
      observed: reading.value,
      limit: { min: 0, max: null },
      unit: '%',
      sentence: `Absorbed binder${placeOf(reading.at)} is stated as ${formatDecimals(reading.value!, 2)} %, below zero.`,
      reason: 'Aggregate cannot absorb less than nothing: a gravity behind it is wrong.',
      evidence: [knownReading(reading).evidence],
      quantity: reading.quantity,
      at: reading.at,
    }));
}

function sameSample(left: Conditions, right: Conditions): boolean {
  return (
    left.stockpile === right.stockpile &&
    left.trial === right.trial &&
    left.blend === right.blend &&
    left.variant === right.variant &&
    left.specimen === right.specimen
  );
}

function three(value: number): string {
  return formatDecimals(value, 3);
}
