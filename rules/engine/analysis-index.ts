import { quantityById } from '../quantities/registry';
import { convert } from '../quantities/units';
import type { Conditions, MixRecord, Reading } from '../record';

export type NamedGyrations = 'initial' | 'design' | 'maximum';
export type Laboratory = 'contractor' | 'agency';

/** The readings of one laboratory that carry a number, ready to be looked up. */
export interface RecordIndex {
  laboratory: Laboratory;
  /** Readings of a quantity that belong to a trial. */
  ofTrial(quantity: string, trial: string): Reading[];
  /** Readings of a quantity that carry no number to calculate with: censored, or in a unit of another kind. */
  withoutNumber(quantity: string): Reading[];
  /** Every reading of a quantity, whatever its trial. */
  all(quantity: string): Reading[];
  /** Trials that the readings name, `design` left out, in order of appearance. */
  trials: string[];
  /** Numbers of gyrations as stated; a name without a single stated number is missing. */
  gyrations: Map<NamedGyrations, number>;
  /** The name of a number of gyrations where it has one; a number without a name stays a number. */
  gyrationsKey(gyrations: Conditions['gyrations']): NamedGyrations | number | undefined;
}

export function indexRecord(record: MixRecord, laboratory: Laboratory): RecordIndex {
  const ofRecord = indexes.get(record) ?? {};
  indexes.set(record, ofRecord);
  ofRecord[laboratory] ??= newIndex(record, laboratory);
  return ofRecord[laboratory];
}

/** A record does not change; analysis and consistency look at the same one. */
const indexes = new WeakMap<MixRecord, Partial<Record<Laboratory, RecordIndex>>>();

function newIndex(record: MixRecord, laboratory: Laboratory): RecordIndex {
  const byQuantity = new Map<string, Reading[]>();
  const byTrial = new Map<string, Reading[]>();
  const trials = new Set<string>();
  const unusable: Reading[] = [];
  for (const stated of record.readings) {
    if ((stated.at.laboratory ?? 'contractor') !== laboratory) continue;
    const reading = hasNumber(stated) ? inCanonicalUnit(stated) : null;
    if (reading === null) {
      unusable.push(stated);
      continue;
    }
    const known = byQuantity.get(reading.quantity);
    if (known) known.push(reading);
    else byQuantity.set(reading.quantity, [reading]);
    if (reading.at.trial !== undefined) trials.add(reading.at.trial);
  }
  trials.delete(designTrial);
  const all = (quantity: string) => byQuantity.get(quantity) ?? [];
  const gyrations = statedGyrations(all);
  const names = new Map([...gyrations].map(([name, number]) => [number, name]));
  return {
    laboratory,
    all,
    withoutNumber: (quantity) => unusable.filter((reading) => reading.quantity === quantity),
    ofTrial: (quantity, trial) => {
      const key = `${quantity}|${trial}`;
      const known = byTrial.get(key);
      if (known) return known;
      const readings = belongingTo(all(quantity), quantity, trial);
      byTrial.set(key, readings);
      return readings;
    },
    trials: [...trials],
    gyrations,
    gyrationsKey: (key) => (typeof key === 'number' ? (names.get(key) ?? key) : key),
  };
}

/** The proposed job mix formula. */
export const designTrial = 'design';

/**
 * The readings among them that a calculation may take together: those without conditions that change the
 * meaning of a test, else those of the only such set. Several sets: none, because nothing says which counts.
 */
export function comparable(readings: Reading[]): Reading[] {
  if (!readings.some(isSpecial)) return readings;
  const plain = readings.filter((reading) => !isSpecial(reading));
  if (plain.length > 0) return plain;
  const sets = new Set(readings.map(specialKey));
  return sets.size === 1 ? readings : [];
}

/** True where a reading states a condition that makes it another test than the plain one. */
export function isSpecial({ at }: Reading): boolean {
  return (
    at.variant !== undefined ||
    at.temperature !== undefined ||
    at.aging !== undefined ||
    at.time !== undefined ||
    at.stress !== undefined ||
    at.passes !== undefined ||
    at.frequency !== undefined
  );
}

export function specialKey({ at }: Reading): string {
  return [at.variant, at.temperature, at.aging, at.time, at.stress, at.passes, at.frequency].join('|');
}

/** Conditions that a computed value inherits from its special readings. */
export function specialConditions({ at }: Reading): Conditions {
  const { variant, temperature, aging, time, stress, passes, frequency } = at;
  return withoutGaps({ variant, temperature, aging, time, stress, passes, frequency });
}

/** Conditions with only what is stated. */
export function withoutGaps(at: Conditions): Conditions {
  const stated = { ...at };
  for (const key in stated) {
    const name = key as keyof Conditions;
    if (stated[name] === undefined) delete stated[name];
  }
  return stated;
}

/** A censored value or a qualifier without a number cannot enter a calculation. */
function hasNumber(reading: Reading): boolean {
  return reading.value !== null && reading.qualifier === undefined && Number.isFinite(reading.value);
}

/** Records are read in canonical units; one written by hand may not be. A unit of another kind is no number here. */
function inCanonicalUnit(reading: Reading): Reading | null {
  const unit = quantityById(reading.quantity)?.unit;
  if (unit === undefined || unit === reading.unit) return reading;
  const converted = convert(reading.value!, reading.unit, unit);
  return converted.ok ? { ...reading, value: converted.value, unit, origin: 'converted' } : null;
}

function belongingTo(readings: Reading[], quantity: string, trial: string): Reading[] {
  const subject = quantityById(quantity)?.subject ?? 'mix';
  if (subject === 'mix' || subject === 'specimen') {
    return readings.filter(({ at }) => (at.trial ?? designTrial) === trial);
  }
  const stockpiles = [...new Set(readings.flatMap(({ at }) => at.stockpile ?? []))];
  // A job-mix gradation of the design does not displace the gradations of its stockpiles.
  return [
    ...ownOrCommon(
      readings.filter(({ at }) => at.stockpile === undefined),
      trial,
    ),
    ...stockpiles.flatMap((stockpile) =>
      ownOrCommon(
        readings.filter(({ at }) => at.stockpile === stockpile),
        trial,
      ),
    ),
  ];
}

function ownOrCommon(readings: Reading[], trial: string): Reading[] {
  const own = readings.filter(({ at }) => at.trial === trial);
  return own.length > 0 ? own : readings.filter(({ at }) => at.trial === undefined);
}

function statedGyrations(all: (quantity: string) => Reading[]): Map<NamedGyrations, number> {
  const names: NamedGyrations[] = ['initial', 'design', 'maximum'];
  return new Map(
    names.flatMap((name) => {
      const readings = all(`gyrations-${name}`);
      const design = readings.filter(({ at }) => (at.trial ?? designTrial) === designTrial);
      const values = new Set((design.length > 0 ? design : readings).map(({ value }) => value!));
      return values.size === 1 ? [[name, [...values][0]!] as const] : [];
    }),
  );
}
