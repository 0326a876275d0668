import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { mean } from '#rules/numerics/mean';
import { decimalsOf, formatDecimals, type RoundingMethod, roundTo } from '#rules/numerics/round';
import { referenceRecord } from './reference-record';
import records from './rounding.json';

function roundedText(text: string, to: number, method: RoundingMethod): string {
  return formatDecimals(roundTo({ value: Number(text), to, method }), decimalsOf(to));
}

describe('published rounding cases', () => {
  const alberta = referenceRecord(records, 'RND-01', {
    inputs: z.object({ round_to: z.record(z.string(), z.array(z.string())) }),
    expected: z.object({ result: z.record(z.string(), z.array(z.string())) }),
  });
  const cases = Object.entries(alberta.inputs.round_to).flatMap(([to, values]) =>
    values.map((value, place) => [value, to, alberta.expected.result[to]![place]!] as const),
  );
  it.each(cases)(
    'rounds %s to %s as %s, half to even (Alberta ATT-70/96, table 1)',
    (value, to, expected) => {
      expect(roundedText(value, Number(to), 'rounding')).toBe(expected);
    },
  );

  const manual = referenceRecord(records, 'RND-03', {
    inputs: z.object({ 'to_0.1': z.array(z.string()) }),
    expected: z.object({ result: z.array(z.string()) }),
  });
  const manualCases = manual.inputs['to_0.1'].map((value, place) => [value, manual.expected.result[place]!]);
  it.each(manualCases)(
    'rounds %s to 0.1 as %s (field sampling and testing manual, rules A-C)',
    (value, expected) => {
      expect(roundedText(value!, 0.1, 'rounding')).toBe(expected);
    },
  );

  it('passes 4.25 against a limit written 4 and fails it against 4.0, halves going up (Iowa IM 202)', () => {
    const iowa = referenceRecord(records, 'RND-02', {
      inputs: z.object({ slump_in: z.number(), limit_as_written: z.array(z.string()) }),
      expected: z.object({ passes: z.array(z.boolean()) }),
    });
    const passes = iowa.inputs.limit_as_written.map((limit) => {
      const to = 10 ** -decimalsOf(limit);
      return roundTo({ value: iowa.inputs.slump_in, to, method: 'half-up' }) <= Number(limit);
    });
    expect(passes).toEqual(iowa.expected.passes);
  });
});

describe('limits at the edge (decimal arithmetic, ASTM E29 methods)', () => {
  const edge = z.object({
    quantity: z.string(),
    kind: z.enum(['min', 'max']),
    limit: z.string(),
    value: z.string(),
    rounded_half_even: z.string(),
    rounded_half_up: z.string(),
    absolute: z.boolean(),
    rounding_half_even: z.boolean(),
    rounding_half_up: z.boolean(),
  });
  const { results: edges } = referenceRecord(records, 'RND-07', {
    inputs: z.unknown(),
    expected: z.object({ results: z.array(edge) }),
  }).expected;
  it.each(edges)('$quantity $value against $kind $limit', (each) => {
    const to = 10 ** -decimalsOf(each.limit);
    const holds = (method: RoundingMethod) => {
      const judged = roundTo({ value: Number(each.value), to, method });
      return each.kind === 'max' ? judged <= Number(each.limit) : judged >= Number(each.limit);
    };
    expect(roundedText(each.value, to, 'rounding')).toBe(each.rounded_half_even);
    expect(roundedText(each.value, to, 'half-up')).toBe(each.rounded_half_up);
    expect([holds('absolute'), holds('rounding'), holds('half-up')]).toEqual([
      each.absolute,
      each.rounding_half_even,
      each.rounding_half_up,
    ]);
  });
});

describe('numbers that binary arithmetic holds askew', () => {
  const doubles = referenceRecord(records, 'RND-08', {
    inputs: z.object({ text_values: z.array(z.string()), places: z.array(z.number()) }),
    expected: z.object({ decimal_half_even: z.array(z.string()) }),
  });
  const cases = doubles.inputs.text_values.map((text, place) => [
    text,
    doubles.inputs.places[place]!,
    doubles.expected.decimal_half_even[place]!,
  ]);
  it.each(cases)('rounds %s to %i places as %s, by its decimal form', (text, places, expected) => {
    expect(roundedText(String(text), 10 ** -Number(places), 'rounding')).toBe(expected);
  });

  it('rounds 4.3499 once, to 4.3, and not through 4.35 to 4.4', () => {
    expect(roundTo({ value: 4.3499, to: 0.1, method: 'rounding' })).toBe(4.3);
    const twice = roundTo({ value: 4.3499, to: 0.01, method: 'rounding' });
    expect(roundTo({ value: twice, to: 0.1, method: 'rounding' })).toBe(4.4);
  });

  it('judges the stored 5.0499, not the shown 5.0: fails a 5.0 max absolutely, passes it rounded', () => {
    expect(roundTo({ value: 5.0499, to: 0.1, method: 'absolute' }) <= 5).toBe(false);
    expect(roundTo({ value: 5.0499, to: 0.1, method: 'rounding' }) <= 5).toBe(true);
  });
});

describe('the optimum as a mean of four binder contents (UFC 3-250-03, table 2-8)', () => {
  const { inputs, expected } = referenceRecord(records, 'MAR-03', {
    inputs: z.object({ Pb_at: z.record(z.string(), z.number()) }),
    expected: z.object({ optimum_Pb: z.number() }),
  });
  const optimum = mean(Object.values(inputs.Pb_at));
  const rounded = (to: number, method: RoundingMethod) =>
    optimum.ok ? roundTo({ value: optimum.value, to, method }) : null;

  it.each(['rounding', 'half-up', 'truncate'] as const)('is 4.6 to one decimal by %s', (method) => {
    expect(rounded(0.1, method)).toBe(expected.optimum_Pb);
  });

  it('splits at 0.05, where 4.625 lies halfway: to the even 4.60, or up to 4.65', () => {
    expect(optimum).toEqual({ ok: true, value: 4.625 });
    expect([rounded(0.05, 'rounding'), rounded(0.05, 'half-up')]).toEqual([4.6, 4.65]);
  });
});
