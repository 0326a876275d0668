import { analyse } from '#rules/engine/analyse';
import type { Analysis, RecomputedValue } from '#rules/engine/analysis';
import { quantityById } from '#rules/quantities/registry';
import { type Conditions, type MixRecord, mixRecordSchema, type Reading } from '#rules/record';

export interface ReadingOptions {
  /** As the cell displays it; the number itself where left out. */
  text?: string;
  origin?: Reading['origin'];
  qualifier?: Reading['qualifier'];
  testedOn?: string;
}

/** A reading with a cell of its own, in the quantity's canonical unit. */
export function reading(
  quantity: string,
  value: number | null,
  at: Conditions = {},
  { text, origin = 'measured', qualifier, testedOn }: ReadingOptions = {},
): Reading {
  const entry = quantityById(quantity);
  if (!entry) throw new Error(`There is no quantity ${quantity}.`);
  cells += 1;
  return {
    quantity,
    value,
    unit: entry.unit,
    at,
    origin,
    ...(qualifier === undefined ? {} : { qualifier }),
    ...(testedOn === undefined ? {} : { testedOn }),
    source: { sheet: 'Trials', cell: `A${cells}`, text: text ?? String(value) },
  };
}

export function reported(quantity: string, value: number, at: Conditions = {}, text?: string): Reading {
  return reading(quantity, value, at, { origin: 'reported', ...(text === undefined ? {} : { text }) });
}

export function recordOf(readings: Reading[], attributes: MixRecord['attributes'] = {}): MixRecord {
  return mixRecordSchema.parse({ readings, attributes });
}

export function analysisOf(readings: Reading[], attributes: MixRecord['attributes'] = {}): Analysis {
  return analyse(recordOf(readings, attributes), { targetAirVoids: 4, fit: 'quadratic' });
}

/** The one computed value of a quantity at exactly these conditions. */
export function computed(analysis: Analysis, quantity: string, at: Conditions): RecomputedValue | undefined {
  const key = (conditions: Conditions) => JSON.stringify(Object.entries(conditions).toSorted());
  const found = analysis.recomputed.filter(
    (value) => value.quantity === quantity && key(value.at) === key(at),
  );
  if (found.length > 1) throw new Error(`There are ${found.length} values of ${quantity}.`);
  return found[0];
}

/**
 * One trial, computed by hand: Pb 5.3, Gb 1.030, Gmm 2.492, Gmb 2.392 as the mean of two, Gsb 2.640, P0.075 5.0 give
 * Gse 2.707, Va 4.01, VMA 14.20, VFA 71.7, Pba 0.97, Pbe 4.38, Vbe 10.18, DP 1.14.
 */
export function trialReadings(trial: string): Reading[] {
  return [
    reading('binder-content', 5.3, { trial }, { text: '5.30' }),
    reading('maximum-specific-gravity', 2.492, { trial }),
    reading('bulk-specific-gravity-mix', 2.39, { trial, specimen: '1' }, { text: '2.390' }),
    reading('bulk-specific-gravity-mix', 2.394, { trial, specimen: '2' }),
  ];
}

export function aggregateReadings(): Reading[] {
  return [
    reading('binder-specific-gravity', 1.03, {}, { text: '1.030' }),
    reading('bulk-specific-gravity-aggregate', 2.64, {}, { text: '2.640' }),
    reading('percent-passing', 5, { sieve: 0.075 }, { text: '5.0' }),
  ];
}

let cells = 0;
