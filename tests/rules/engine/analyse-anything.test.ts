import { expect, it } from 'vitest';
import { checkConsistency } from '#rules/consistency/check-consistency';
import { analyse } from '#rules/engine/analyse';
import { allQuantities } from '#rules/quantities/registry';
import { type Conditions, mixRecordSchema } from '#rules/record';
import fc from '#tests/builders/seeded-fast-check';
import { reading } from './analysis-record';

const maybe = <T>(arbitrary: fc.Arbitrary<T>) => fc.option(arbitrary, { nil: undefined });

const conditions: fc.Arbitrary<Conditions> = fc.record({
  trial: maybe(fc.constantFrom('A', 'B', 'C', 'D', 'design')),
  specimen: maybe(fc.constantFrom('1', '2', '3')),
  stockpile: maybe(fc.constantFrom('coarse', 'fine')),
  blend: maybe(fc.constantFrom('1', '2')),
  sieve: maybe(fc.constantFrom(9.5, 4.75, 2.36, 1.18, 0.6, 0.3, 0.15, 0.075)),
  gyrations: maybe(fc.constantFrom<Conditions['gyrations']>('initial', 'design', 'maximum', 8, 100)),
  variant: maybe(fc.constantFrom('dry', 'conditioned', 'maximum')),
  laboratory: maybe(fc.constantFrom('contractor' as const, 'agency' as const)),
});

const value = fc.oneof(
  fc.constantFrom(0, -1, 1e-9, 1e9, 2.4, 2.5, 5, 100),
  fc.double({ min: -10, max: 5000, noNaN: true }),
);
const text = fc.constantFrom(undefined, '', 'n/a', '2.40', '4,2', '1e3', '<5');

/** What calculations start from comes up often enough that they do start. */
const raw = [
  'binder-content',
  'binder-specific-gravity',
  'maximum-specific-gravity',
  'bulk-specific-gravity-mix',
  'bulk-specific-gravity-aggregate',
  'mass-in-air',
  'mass-in-water',
  'mass-saturated-surface-dry',
  'specimen-height',
  'gyrations-design',
  'stockpile-share',
  'percent-passing',
  'percent-retained',
  'failure-load',
  'specimen-thickness',
  'specimen-diameter',
  'air-voids',
  'voids-in-mineral-aggregate',
  'rap-content',
  'rap-binder-content',
  'field-density',
  'fineness-modulus',
];
const quantity = fc.oneof(
  { arbitrary: fc.constantFrom(...raw), weight: 4 },
  { arbitrary: fc.constantFrom(...allQuantities().map(({ id }) => id)), weight: 1 },
);

const anyReading = fc
  .record({ quantity, at: conditions, value, text })
  .map(({ quantity: id, at, value: number, text: written }) =>
    reading(id, number, at, written === undefined ? {} : { text: written }),
  );

it('computes finite numbers or nothing from any record, and names each contradiction once', () => {
  fc.assert(
    fc.property(fc.array(anyReading, { minLength: 30, maxLength: 120 }), (readings) => {
      const record = mixRecordSchema.parse({ readings: JSON.parse(JSON.stringify(readings)) });
      const analysis = analyse(record, { targetAirVoids: 4, fit: 'quadratic' });
      for (const computed of analysis.recomputed) {
        expect(Number.isFinite(computed.value)).toBe(true);
        expect(computed.count).toBeGreaterThanOrEqual(1);
        expect(computed.tolerance === null || computed.tolerance >= 0).toBe(true);
        expect(computed.agrees === null).toBe(computed.reported === null);
        expect(computed.cause === null || computed.agrees === false).toBe(true);
      }
      const keys = checkConsistency(record, analysis).map(({ name, subject }) => `${name}~${subject}`);
      expect(new Set(keys).size).toBe(keys.length);
    }),
    { numRuns: 150 },
  );
}, 60_000);

it('gives one value for each quantity at each set of conditions', () => {
  fc.assert(
    fc.property(fc.array(anyReading, { minLength: 30, maxLength: 120 }), (readings) => {
      const record = mixRecordSchema.parse({ readings: JSON.parse(JSON.stringify(readings)) });
      const { recomputed } = analyse(record, { targetAirVoids: 4, fit: 'linear' });
      const keys = recomputed.map(({ quantity, at }) =>
        JSON.stringify([quantity, Object.entries(at).toSorted()]),
      );
      expect(keys.filter((key, place) => keys.indexOf(key) !== place)).toEqual([]);
    }),
    { numRuns: 150 },
  );
});
