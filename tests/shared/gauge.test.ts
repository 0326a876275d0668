import { describe, expect, it } from 'vitest';
import { resolvedLimitSchema } from '#rules/engine/finding';
import { gaugeGeometry } from '#shared/gauge';
import { aFinding as aPlainFinding } from '#tests/builders/a-finding';

const limitOf = (limit: object) => resolvedLimitSchema.parse({ min: null, max: null, unit: '%', ...limit });

const aFinding = (overrides: Parameters<typeof aPlainFinding>[0] = {}) =>
  aPlainFinding({ outcome: 'fail', gauge: { span: 1.5, scale: 'linear' }, ...overrides });
const twoSided = limitOf({ min: 0.6, max: 1.2, decimals: 1 });
const observed = (rounded: number) => ({
  value: rounded,
  rounded,
  text: String(rounded),
  unit: '',
  statistic: 'mean',
  count: 1,
});

describe('the limit gauge', () => {
  it('puts two limits at 25 and 75 % of the width', () => {
    const gauge = gaugeGeometry(aFinding({ limit: twoSided, observed: observed(0.9) }));
    expect(gauge?.ticks.map(({ x }) => Math.round(x))).toEqual([52, 156]);
    expect(gauge?.ticks.map(({ text }) => text)).toEqual(['0.6', '1.2']);
    expect(gauge?.dot?.x).toBeCloseTo(104, 6);
  });

  it('gives half the width to the span of a quantity with one limit, and runs the lane to the edge', () => {
    const gauge = gaugeGeometry(
      aFinding({ observed: observed(15.5), gauge: { span: 1.5, scale: 'linear' } }),
    );
    expect(gauge?.ticks.map(({ x }) => x)).toEqual([52]);
    expect(gauge?.dot?.x).toBeCloseTo(156, 6);
    expect(gauge?.lane).toEqual({ x: 52, width: 156 });
  });

  it('draws the whisker to the tick exactly where the margin is the precision', () => {
    const gauge = gaugeGeometry(
      aFinding({ observed: observed(14.4), precision: { value: 0.4, origin: 'agency' } }),
    );
    expect(gauge?.whisker?.from).toBeCloseTo(52, 6);
  });

  it('pins a value off the scale six px inside the edge', () => {
    const gauge = gaugeGeometry(aFinding({ limit: twoSided, observed: observed(9) }));
    expect(gauge?.dot).toEqual({ x: 202, shape: 'square', offScale: 'right' });
  });

  it('draws lane and tick without a dot where nothing is shown', () => {
    const gauge = gaugeGeometry(aFinding({ outcome: 'not shown', observed: null }));
    expect(gauge?.dot).toBeNull();
    expect(gauge?.ticks).toHaveLength(1);
  });

  it('draws nothing where the rule does not apply', () => {
    expect(gaugeGeometry(aFinding({ outcome: 'not applicable' }))).toBeNull();
  });

  it('names up to four allowed words and counts more', () => {
    const words = (oneOf: string[]) =>
      gaugeGeometry(
        aFinding({
          outcome: 'pass',
          limit: limitOf({ oneOf }),
          observed: { value: null, rounded: null, text: 'A', unit: '', statistic: 'value', count: 1 },
        }),
      )?.words.map(({ text }) => text);
    expect(words(['A', 'B', 'C'])).toEqual(['A', 'B', 'C']);
    expect(words(['A', 'B', 'C', 'D', 'E', 'F'])).toEqual(['A one of 6']);
  });

  it('draws the decades of a logarithmic scale', () => {
    const gauge = gaugeGeometry(
      aFinding({
        limit: limitOf({ min: 0.1, decimals: 3, unit: '1/GPa' }),
        observed: observed(0.12),
        gauge: { span: 0.4, scale: 'log' },
      }),
    );
    expect(gauge?.decades.find(({ long }) => long)?.x).toBeCloseTo(52, 6);
    expect(gauge?.decades.length).toBe(6);
  });
});
