import { nominalMaximumSize, shareClosurePercent } from '../calculations/gradation';
import { formatDecimals } from '../numerics/round';
import { sieveLabel } from '../quantities/sieves';
import type { Conditions, Reading } from '../record';
import { numberWords } from '../rule-sets/words';
import {
  type ConsistencyInput,
  type ConsistencyObservation,
  computedValues,
  knownReading,
  knownValue,
  placeOf,
  subjectOf,
} from './consistency-observation';

/** Gradations that rise, shares that do not close, a blend that is not what its stockpiles make. */
export function checkGradations(input: ConsistencyInput): ConsistencyObservation[] {
  return [
    ...risingGradations(input),
    ...openShares(input),
    ...differingBlend(input),
    ...differingSize(input),
    ...facesOutOfOrder(input),
  ];
}

const passing = 'percent-passing';

function risingGradations({ index }: ConsistencyInput): ConsistencyObservation[] {
  const gradations = grouped(index.all(passing), ({ trial, blend, stockpile, specimen, variant }) =>
    JSON.stringify([trial, blend, stockpile, specimen, variant]),
  );
  return gradations.flatMap((readings) => {
    const ordered = readings
      .filter(({ at }) => at.sieve !== undefined)
      .toSorted((a, b) => b.at.sieve! - a.at.sieve!);
    const rises = ordered.flatMap((finer, place) => {
      const coarser = ordered[place - 1];
      return coarser && finer.value! > coarser.value! && finer.at.sieve !== coarser.at.sieve
        ? [{ coarser, finer }]
        : [];
    });
    const [worst] = rises.toSorted((a, b) => rise(b) - rise(a));
    if (!worst) return [];
    const { sieve: _sieve, ...at } = worst.finer.at;
    return {
      name: 'gradation-rises',
      subject: subjectOf(passing, at),
      severity: 'required' as const,
      outcome: 'fail' as const,
      observed: worst.finer.value,
      limit: { min: null, max: worst.coarser.value },
      unit: '%',
      sentence: `Percent passing${placeOf(at)} rises from ${worst.coarser.value} at ${sieveLabel(worst.coarser.at.sieve!)} to ${worst.finer.value} at ${sieveLabel(worst.finer.at.sieve!)}.`,
      reason: 'What stays on a sieve cannot pass the next smaller one.',
      evidence: rises.flatMap(({ coarser, finer }) => [
        knownReading(coarser).evidence,
        knownReading(finer).evidence,
      ]),
      quantity: passing,
      at,
    };
  });
}

function rise({ coarser, finer }: { coarser: Reading; finer: Reading }): number {
  return finer.value! - coarser.value!;
}

function openShares({ index }: ConsistencyInput): ConsistencyObservation[] {
  const blends = grouped(
    index.all('stockpile-share').filter(({ at }) => at.stockpile !== undefined),
    ({ trial, blend }) => JSON.stringify([trial, blend]),
  );
  return blends.flatMap((readings) => {
    const total = Number(readings.reduce((sum, { value }) => sum + value!, 0).toPrecision(12));
    const off = Math.abs(total - 100);
    if (off < 1e-9) return [];
    const { stockpile: _stockpile, ...at } = readings[0]!.at;
    return {
      name: 'shares-not-100',
      subject: `stockpile shares${placeOf(at)}`,
      severity: off > shareClosurePercent + 1e-9 ? ('required' as const) : ('advisory' as const),
      outcome: 'fail' as const,
      observed: total,
      limit: { min: 100 - shareClosurePercent, max: 100 + shareClosurePercent },
      unit: '%',
      sentence: `The stockpile shares${placeOf(at)} sum to ${numberWords(total)} %, not 100.`,
      reason:
        'A stockpile is missing or a share is wrong; the blend is not recomputed from shares that do not close.',
      evidence: readings.map((reading) => knownReading(reading).evidence),
      quantity: 'stockpile-share',
      at,
    };
  });
}

/** One finding a blend: the sieve that is farthest off stands for all that differ. */
function differingBlend(input: ConsistencyInput): ConsistencyObservation[] {
  const differing = computedValues(input, passing).filter(
    ({ agrees, at }) => agrees === false && at.stockpile === undefined,
  );
  const blends = grouped(differing, ({ blend, trial }) => JSON.stringify([blend, trial]));
  return blends.map((values) => {
    const [worst] = values.toSorted((a, b) => difference(b) - difference(a));
    const { value, reported, tolerance, at } = worst!;
    const { sieve, ...place } = at;
    return {
      name: 'blend-differs-from-stockpiles',
      subject: subjectOf(passing, place),
      severity: 'advisory' as const,
      outcome: 'fail' as const,
      observed: reported!.value,
      limit: { min: value - tolerance!, max: value + tolerance! },
      unit: '%',
      sentence: `The stated gradation has ${reported!.value} % passing ${sieveLabel(sieve!)}; the stockpiles at their shares make ${formatDecimals(value, 1)} %.`,
      reason: `${values.length === 1 ? 'One sieve differs' : `${values.length} sieves differ`} by more than rounding explains. The stated gradation is the one that is judged.`,
      evidence: values.map((each) => knownValue(each).evidence),
      quantity: passing,
      at: place,
    };
  });
}

function difference(value: { value: number; reported: Reading | null }): number {
  return Math.abs(value.value - (value.reported?.value ?? value.value));
}

function differingSize({ record, index }: ConsistencyInput): ConsistencyObservation[] {
  const attribute = record.attributes.nominalMaximumSize;
  if (typeof attribute?.value !== 'number') return [];
  const readings = index
    .ofTrial(passing, 'design')
    .filter(({ at }) => at.sieve !== undefined && at.stockpile === undefined && at.specimen === undefined);
  const size = nominalMaximumSize(
    readings.map(({ at, value }) => ({ openingMm: at.sieve!, passingPercent: value! })),
  );
  if (!size.ok || size.value === attribute.value) return [];
  return [
    {
      name: 'nominal-size-differs-from-gradation',
      subject: 'nominal maximum size',
      severity: 'advisory',
      outcome: 'fail',
      observed: attribute.value,
      limit: { min: size.value, max: size.value },
      unit: 'mm',
      sentence: `The nominal maximum size is stated as ${attribute.value} mm; the job-mix gradation makes it ${size.value} mm.`,
      reason:
        'One sieve larger than the first that retains more than 10 percent (AASHTO M 323; from memory, verify). Limits are chosen by the stated size.',
      evidence: readings.map((reading) => knownReading(reading).evidence),
      quantity: passing,
      at: { trial: 'design' },
    },
  ];
}

/** A particle with two fractured faces has one. */
function facesOutOfOrder({ index }: ConsistencyInput): ConsistencyObservation[] {
  return index.all('coarse-aggregate-angularity-two-faces').flatMap((two) => {
    const one = index
      .all('coarse-aggregate-angularity-one-face')
      .find(
        ({ at }) =>
          at.stockpile === two.at.stockpile && at.trial === two.at.trial && at.specimen === two.at.specimen,
      );
    if (!one || two.value! <= one.value!) return [];
    return {
      name: 'two-faces-above-one-face',
      subject: subjectOf(two.quantity, two.at),
      severity: 'advisory' as const,
      outcome: 'fail' as const,
      observed: two.value,
      limit: { min: null, max: one.value },
      unit: '%',
      sentence: `Particles with two or more fractured faces${placeOf(two.at)} are ${two.value} %, more than the ${one.value} % with one or more.`,
      reason: 'Every particle with two fractured faces has one; the two may be swapped.',
      evidence: [two, one].map((reading) => knownReading(reading).evidence),
      quantity: two.quantity,
      at: two.at,
    };
  });
}

function grouped<T extends { at: Conditions }>(items: T[], keyOf: (at: Conditions) => string): T[][] {
  const groups = new Map<string, T[]>();
  for (const item of items) {
    const key = keyOf(item.at);
    const group = groups.get(key);
    if (group) group.push(item);
    else groups.set(key, [item]);
  }
  return [...groups.values()];
}
