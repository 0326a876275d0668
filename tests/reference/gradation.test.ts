import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import {
  combinedPassing,
  finenessModulus,
  maximumDensityLine,
  nominalMaximumSize,
  type SievePoint,
} from '#rules/calculations/gradation';
import { evaluate } from '#rules/engine/evaluate';
import { sieveFromName } from '#rules/quantities/sieves';
import { aReading } from '#tests/builders/a-reading';
import { aContext, aRecord } from '#tests/builders/a-record';
import { anEdition, aRule } from '#tests/builders/a-rule-set';
import records from './gradation.json';
import { numberOf, referenceRecord } from './reference-record';

const numbers = z.array(z.number());

function gradationOf(passing: Record<string, number>): SievePoint[] {
  return Object.entries(passing).map(([opening, passingPercent]) => ({
    openingMm: Number(opening),
    passingPercent,
  }));
}

describe('0.45-power maximum density line (FHWA chart, 1962)', () => {
  it.each(['GRD-02-12.5', 'GRD-02-19.0', 'GRD-02-25.0'])('%s', (id) => {
    const { inputs, expected } = referenceRecord(records, id, {
      inputs: z.object({ Dmax_mm: z.number(), sieve_mm: numbers }),
      expected: z.object({ MDL_percent_passing: numbers }),
    });
    inputs.sieve_mm.forEach((openingMm, place) => {
      const line = numberOf(maximumDensityLine(openingMm, inputs.Dmax_mm));
      expect(Math.abs(line - expected.MDL_percent_passing[place]!)).toBeLessThanOrEqual(0.0005);
    });
  });
});

describe('nominal maximum size', () => {
  it.each(['GRD-04', 'GRD-06a', 'GRD-06c', 'GRD-06d'])(
    '%s, one sieve above the first to retain more than 10 %%',
    (id) => {
      const { inputs, expected } = referenceRecord(records, id, {
        inputs: z.object({ passing: z.record(z.string(), z.number()) }),
        expected: z.looseObject({ NMAS_mm: z.number() }),
      });
      expect(numberOf(nominalMaximumSize(gradationOf(inputs.passing)))).toBe(expected.NMAS_mm);
    },
  );

  it('is 9.5 mm by the 10 percent rule where an older agency rule (CT 382) says 12.5', () => {
    const { inputs, expected } = referenceRecord(records, 'GRD-05', {
      inputs: z.object({ passing: z.record(z.string(), z.number()) }),
      expected: z.object({ NMAS_by_10_percent_rule_mm: z.number(), NMAS_by_older_CT_382_mm: z.number() }),
    });
    const size = numberOf(nominalMaximumSize(gradationOf(inputs.passing)));
    expect(size).toBe(expected.NMAS_by_10_percent_rule_mm);
    expect(size).not.toBe(expected.NMAS_by_older_CT_382_mm);
  });
});

it('combines four stockpiles sieve by sieve (MS-2 blending equation)', () => {
  const { inputs, expected } = referenceRecord(records, 'GRD-08', {
    inputs: z.object({
      sieve_mm: numbers,
      stockpiles_percent_passing: z.record(z.string(), numbers),
      shares_percent: numbers,
    }),
    expected: z.looseObject({ combined_percent_passing: numbers, NMAS_mm: z.number() }),
  });
  const stockpiles = Object.values(inputs.stockpiles_percent_passing);
  const combined = inputs.sieve_mm.map((openingMm, sieve) => ({
    openingMm,
    passingPercent: numberOf(
      combinedPassing(
        stockpiles.map((passing, pile) => ({ share: inputs.shares_percent[pile]!, value: passing[sieve]! })),
      ),
    ),
  }));
  combined.forEach(({ passingPercent }, sieve) => {
    expect(Math.abs(passingPercent - expected.combined_percent_passing[sieve]!)).toBeLessThanOrEqual(5e-5);
  });
  expect(numberOf(nominalMaximumSize(combined))).toBe(expected.NMAS_mm);
});

describe('fineness modulus', () => {
  const series = [150, 75, 37.5, 19, 9.5, 4.75, 2.36, 1.18, 0.6, 0.3, 0.15];

  /** Percent passing the series from what stays on each sieve, as shares of the whole. */
  function fromRetained(retained: Map<number, number>): SievePoint[] {
    const whole = [...retained.values()].reduce((sum, value) => sum + value, 0);
    let passed = 100;
    return series.map((openingMm) => {
      passed -= (100 * (retained.get(openingMm) ?? 0)) / whole;
      return { openingMm, passingPercent: Number(passed.toPrecision(12)) };
    });
  }

  it('is 7.4 for the coarse aggregate that another page gets wrong as 8.4, a hundred too many', () => {
    const { inputs, expected } = referenceRecord(records, 'GRD-11', {
      inputs: z.looseObject({ kg_retained: z.record(z.string(), z.number()) }),
      expected: z.object({ FM: z.number(), published_wrong_elsewhere: z.number() }),
    });
    // Metric sieves 80, 40, 20, 10 mm stand in the places of 75, 37.5, 19, 9.5 mm.
    const places = new Map([
      ['80', 75],
      ['40', 37.5],
      ['20', 19],
      ['10', 9.5],
      ['4.75', 4.75],
    ]);
    const retained = new Map(
      Object.entries(inputs.kg_retained).map(([sieve, kg]) => [places.get(sieve)!, kg]),
    );
    const modulus = numberOf(finenessModulus(fromRetained(retained)));
    expect(modulus).toBe(expected.FM);
    expect(modulus).not.toBe(expected.published_wrong_elsewhere);
  });

  it('is 3.75 although the page adds up to 2.75: the 0.15 mm sieve counts, with nothing on it', () => {
    const { inputs, expected } = referenceRecord(records, 'GRD-12', {
      inputs: z.object({ percent_retained: z.record(z.string(), z.number()) }),
      expected: z.looseObject({ FM: z.number() }),
    });
    const retained = new Map(
      Object.entries(inputs.percent_retained).map(([sieve, share]) => [Number(sieve), share]),
    );
    expect(numberOf(finenessModulus(fromRetained(retained)))).toBe(expected.FM);
  });

  it('leaves 25, 12.5 and 0.075 mm out of the sum, and needs every sieve of the series', () => {
    const { expected } = referenceRecord(records, 'GRD-13', {
      inputs: z.unknown(),
      expected: z.object({ FM_sieves: z.array(z.string()) }),
    });
    const sieves = expected.FM_sieves.map(Number.parseFloat);
    const half = sieves.map((openingMm) => ({ openingMm, passingPercent: openingMm === 150 ? 100 : 50 }));
    expect(numberOf(finenessModulus(half))).toBe(5);
    expect(numberOf(finenessModulus([...half, { openingMm: 12.5, passingPercent: 50 }]))).toBe(5);
    for (const missing of sieves.slice(1)) {
      expect(finenessModulus(half.filter(({ openingMm }) => openingMm !== missing)).ok).toBe(false);
    }
  });
});

it('judges a sand ratio by its formula: 37.4 percent (Mississippi DOT, Field Manual for HMA, p. 16)', () => {
  const { inputs, expected } = referenceRecord(records, 'GRD-07', {
    inputs: z.object({ passing: z.record(z.string(), z.number()) }),
    expected: z.looseObject({ sand_ratio: z.number() }),
  });
  const readings = Object.entries(inputs.passing).map(([name, value]) =>
    aReading({
      quantity: 'percent-passing',
      value,
      at: { trial: 'design', sieve: sieveFromName(name.includes('/') ? `${name} in` : name)! },
    }),
  );
  const measure = { kind: 'formula' as const, expression: '100*(P0.6 - P0.075)/(P2.36 - P0.075)', unit: '%' };
  const edition = anEdition({
    rules: [aRule({ measure, limit: { max: '50' }, rounding: { method: 'rounding', to: 0.1 } })],
  });
  const [finding] = evaluate(aRecord({ readings }), edition, aContext()).findings;
  expect(finding).toMatchObject({ outcome: 'pass', observed: { rounded: expected.sand_ratio } });
});
