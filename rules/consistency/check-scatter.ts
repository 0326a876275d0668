import type { Evidence } from '../engine/finding';
import { squared } from '../numerics/transcendental';
import type { Quantity } from '../quantities/quantity';
import { allQuantities } from '../quantities/registry';
import { numberWords, unitSuffix } from '../rule-sets/words';
import {
  type ConsistencyInput,
  type ConsistencyObservation,
  computedValues,
  knownReading,
  knownValue,
} from './consistency-observation';
import { replicateGroups } from './replicate-groups';

/**
 * Below this part of the published single-operator standard deviation the scatter of honest specimens hardly ever
 * lies: laboratories do two to eight times better than the published figure, not twenty (common practice, no source).
 */
const leastPart = 1 / 20;

/** Differences within groups that it takes to speak of scatter at all. */
const leastFreedom = 4;

/** Replicates that agree better than the method can. Those that agree in every digit are reported by themselves. */
export function checkScatter(input: ConsistencyInput): ConsistencyObservation[] {
  return allQuantities().flatMap((quantity) => {
    const published = quantity.methodPrecision?.singleOperatorStandardDeviation;
    if (published === undefined) return [];
    const groups = groupsOf(input, quantity.id);
    const freedom = groups.reduce((sum, { values }) => sum + values.length - 1, 0);
    const squares = groups.reduce((sum, { values }) => sum + squaresAbout(values), 0);
    const pooled = Math.sqrt(squares / Math.max(1, freedom));
    if (freedom < leastFreedom || squares < 1e-18 || pooled >= published * leastPart) return [];
    return [observation(quantity, published, pooled, groups)];
  });
}

interface Group {
  values: number[];
  evidence: Evidence[];
}

/** Single values by trial: computed of masses where they are, else as read. */
function groupsOf(input: ConsistencyInput, quantity: string): Group[] {
  const computed = computedValues(input, quantity)
    .filter(({ specimens }) => specimens.length > 1)
    .map((value) => ({
      values: value.specimens.map((specimen) => specimen.value),
      evidence: [knownValue(value).evidence],
    }));
  if (computed.length > 0) return computed;
  return replicateGroups(input.index.all(quantity))
    .filter((readings) => readings.length > 1)
    .map((readings) => ({
      values: readings.map(({ value }) => value!),
      evidence: readings.map((reading) => knownReading(reading).evidence),
    }));
}

function squaresAbout(values: readonly number[]): number {
  const average = values.reduce((sum, value) => sum + value, 0) / values.length;
  return values.reduce((sum, value) => sum + squared(value - average), 0);
}

function observation(
  { id, label, unit, decimals }: Quantity,
  published: number,
  pooled: number,
  groups: readonly Group[],
): ConsistencyObservation {
  const digits = decimals + 2;
  return {
    name: 'too-little-scatter',
    subject: `${label}, scatter of specimens`,
    severity: 'advisory',
    outcome: 'fail',
    observed: pooled,
    limit: { min: published * leastPart, max: null },
    unit,
    sentence: `Specimens alike have a standard deviation of ${numberWords(pooled, digits)}${unitSuffix(unit)} in ${label}; the method's own is ${numberWords(published)}${unitSuffix(unit)}.`,
    reason: 'So little scatter is hardly ever met; values may have been calculated backwards or copied.',
    evidence: groups.flatMap(({ evidence }) => evidence),
    quantity: id,
    at: {},
  };
}
