import { expect, it } from 'vitest';
import { z } from 'zod';
import {
  inPlaceVoidsFromLaboratory,
  inPlaceVoidsFromMaximum,
  pointForPointVoids,
} from '#rules/calculations/in-place-voids';
import { mean } from '#rules/numerics/mean';
import records from './in-place-density.json';
import { numberOf, referenceRecord } from './reference-record';

it('takes in-place voids as 100 less percent of maximum gravity (Texas DOT, Pavement Manual, 8.2)', () => {
  const { inputs, expected } = referenceRecord(records, 'DEN-01', {
    inputs: z.object({ percent_Gmm: z.array(z.number()) }),
    expected: z.object({ air_voids: z.array(z.number()) }),
  });
  expect(inputs.percent_Gmm.map((percent) => numberOf(inPlaceVoidsFromMaximum(percent)))).toEqual(
    expected.air_voids,
  );
});

it.each(['DEN-04a', 'DEN-04b', 'DEN-04c'])(
  '%s: exact voids from compaction, beside the rule of thumb that is too high',
  (id) => {
    const { inputs, expected } = referenceRecord(records, id, {
      inputs: z.object({ degree_of_compaction_percent_of_lab_bulk: z.number(), lab_air_voids: z.number() }),
      expected: z.object({
        in_place_voids_exact: z.number(),
        rule_of_thumb: z.number(),
        difference: z.number(),
      }),
    });
    const compaction = { C: inputs.degree_of_compaction_percent_of_lab_bulk, Va: inputs.lab_air_voids };
    const exact = numberOf(inPlaceVoidsFromLaboratory(compaction));
    const thumb = numberOf(pointForPointVoids(compaction));
    expect(exact).toBeCloseTo(expected.in_place_voids_exact, 4);
    expect(thumb).toBe(expected.rule_of_thumb);
    expect(thumb - exact).toBeCloseTo(expected.difference, 4);
  },
);

it('puts five cores over the mean maximum gravity of the lot', () => {
  const { inputs, expected } = referenceRecord(records, 'DEN-05', {
    inputs: z.object({ core_Gmb: z.array(z.number()), Gmm: z.array(z.number()) }),
    expected: z.object({
      mean_Gmm: z.number(),
      percent_Gmm: z.array(z.number()),
      mean: z.number(),
      voids: z.number(),
    }),
  });
  const gmm = numberOf(mean(inputs.Gmm));
  expect(gmm).toBe(expected.mean_Gmm);
  const percents = inputs.core_Gmb.map((gmb) => (100 * gmb) / gmm);
  percents.forEach((percent, core) => {
    expect(Math.abs(percent - expected.percent_Gmm[core]!)).toBeLessThanOrEqual(0.0005);
  });
  const density = numberOf(mean(percents));
  expect(Math.abs(density - expected.mean)).toBeLessThanOrEqual(0.0005);
  expect(Math.abs(numberOf(inPlaceVoidsFromMaximum(density)) - expected.voids)).toBeLessThanOrEqual(0.0005);
});

it('takes 93 ± 1 percent of maximum gravity for 6 to 8 percent voids (Tex-242-F, specimen configuration)', () => {
  const { expected } = referenceRecord(records, 'DEN-07', {
    inputs: z.unknown(),
    expected: z.object({ air_voids: z.array(z.number()) }),
  });
  expect([94, 92].map((percent) => numberOf(inPlaceVoidsFromMaximum(percent)))).toEqual(expected.air_voids);
});
