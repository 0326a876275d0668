import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { quantityById } from '#rules/quantities/registry';
import { sieveFromName } from '#rules/quantities/sieves';
import { convert } from '#rules/quantities/units';
import { understandNumber } from '#rules/reading/understand-number';
import { cellOf } from '#tests/workbooks/grid-of';
import { numberOf, referenceRecord } from './reference-record';
import records from './units.json';

describe('conversions from the exact definitions (NIST SP 811, 2008, appendix B.8)', () => {
  const { expected } = referenceRecord(records, 'UNI-01', {
    inputs: z.unknown(),
    expected: z.record(z.string(), z.number()),
  });
  const cases: [string, string, string][] = [
    ['psi_Pa', 'psi', 'Pa'],
    ['ksi_MPa', 'ksi', 'MPa'],
    ['lbf_N', 'lbf', 'N'],
    ['lb_per_ft3_kg_m3', 'lb/ft³', 'kg/m³'],
    ['kg_m3_lb_per_ft3', 'kg/m³', 'lb/ft³'],
    ['per_psi_in_per_GPa', '1/psi', '1/GPa'],
    ['per_GPa_in_per_psi', '1/GPa', '1/psi'],
    ['per_MPa_in_per_GPa', '1/MPa', '1/GPa'],
    ['per_kPa_in_per_GPa', '1/kPa', '1/GPa'],
    ['ft2_per_lb_in_m2_per_kg', 'ft²/lb', 'm²/kg'],
    ['in_mm', 'in', 'mm'],
    ['microinch_um', 'microinch', 'µm'],
  ];
  it.each(cases)('%s', (name, from, to) => {
    // The record prints 10 to 13 digits.
    expect(numberOf(convert(1, from, to)) / expected[name]!).toBeCloseTo(1, 9);
  });

  it('moves temperatures by their offset, to the exact degree', () => {
    const { inputs, expected: scales } = referenceRecord(records, 'UNI-03', {
      inputs: z.object({ C: z.array(z.number()) }),
      expected: z.object({ F: z.array(z.number()), K: z.array(z.number()) }),
    });
    inputs.C.forEach((celsius, place) => {
      expect(numberOf(convert(celsius, '°C', '°F'))).toBe(scales.F[place]);
      expect(numberOf(convert(scales.F[place]!, '°F', '°C'))).toBe(celsius);
      expect(numberOf(convert(celsius, '°C', 'K'))).toBe(scales.K[place]);
    });
  });

  it('turns Marshall stabilities in lbf into newtons, and hundredths of an inch of flow into mm', () => {
    const { inputs, expected: marshall } = referenceRecord(records, 'UNI-10', {
      inputs: z.object({ stability: z.array(z.number()), unit: z.string() }),
      expected: z.looseObject({ N: z.array(z.number()) }),
    });
    inputs.stability.forEach((stability, place) => {
      expect(
        Math.abs(numberOf(convert(stability, inputs.unit, 'N')) - marshall.N[place]!),
      ).toBeLessThanOrEqual(0.1);
    });
    // 8 to 14 units of 0.01 in are 2.03 to 3.56 mm (same record, exact factor 0.254).
    expect(numberOf(convert(8, '0.01 in', 'mm'))).toBe(2.032);
    expect(numberOf(convert(14, '0.01 in', 'mm'))).toBe(3.556);
  });
});

it('turns psi into pascals (definition and examples of a conversion page)', () => {
  const { inputs, expected } = referenceRecord(records, 'UNI-02', {
    inputs: z.object({ psi: z.array(z.number()) }),
    expected: z.object({ Pa: z.array(z.number()), factor: z.number() }),
  });
  inputs.psi.forEach((psi, place) => {
    expect(Math.abs(numberOf(convert(psi, 'psi', 'Pa')) - expected.Pa[place]!)).toBeLessThanOrEqual(0.0001);
  });
  expect(numberOf(convert(1, 'psi', 'Pa')) / expected.factor).toBeCloseTo(1, 12);
});

it('never turns a kinematic viscosity into a dynamic one: the density would have to be known', () => {
  const { inputs } = referenceRecord(records, 'UNI-12', {
    inputs: z.object({ viscosity: z.array(z.number()) }),
    expected: z.unknown(),
  });
  for (const centistokes of inputs.viscosity) {
    expect(convert(centistokes, 'mm²/s', 'Pa·s').ok).toBe(false);
  }
});

it('lets the format of a cell decide what a percentage is, and doubts a bare fraction', () => {
  const { inputs, expected } = referenceRecord(records, 'UNI-11', {
    inputs: z.object({
      cell: z.array(z.object({ text: z.string(), stored: z.number(), format: z.string() })),
    }),
    expected: z.object({ percent: z.array(z.union([z.number(), z.string()])) }),
  });
  const binder = quantityById('binder-content')!;
  const read = inputs.cell.map(({ text, stored, format }) => {
    const cell = cellOf('C7', { kind: 'number', value: String(stored), text, format });
    return understandNumber(cell, { quantity: binder, unit: null, unknownUnit: null, decimal: '.' });
  });
  expect(read.map((each) => (each.state === 'value' ? each.value.value : each.state))).toEqual(
    expected.percent.map((each) => (typeof each === 'number' ? each : 'doubt')),
  );
});

describe('sieve names', () => {
  const { inputs, expected } = referenceRecord(records, 'UNI-04', {
    inputs: z.object({ alternative_designation: z.array(z.string()) }),
    expected: z.object({ opening_mm: z.array(z.string()) }),
  });
  it.each(
    inputs.alternative_designation.map((name, place) => [name, Number(expected.opening_mm[place])] as const),
  )('%s is %d mm (ASTM E11-01, table 1)', (name, openingMm) => {
    expect(sieveFromName(name)).toBe(openingMm);
  });

  it('reads openings of superseded series as the sieve of today', () => {
    const { expected: former } = referenceRecord(records, 'UNI-06', {
      inputs: z.unknown(),
      expected: z.object({ old_mm: z.array(z.number().nullable()), E11_mm: z.array(z.number()) }),
    });
    former.old_mm.forEach((openingMm, place) => {
      if (openingMm !== null) expect(sieveFromName(`${openingMm} mm`)).toBe(former.E11_mm[place]);
    });
  });
});
