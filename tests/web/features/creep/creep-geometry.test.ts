import { describe, expect, it } from 'vitest';
import { chosenCurve, curveKey } from '../../../../web/features/creep/lib/chosen-curve';
import { type CreepDrawing, creepGeometry } from '../../../../web/features/creep/lib/creep-geometry';
import { curveAt } from '../../../../web/features/creep/lib/curve-at';
import { shiftedPoints } from '../../../../web/features/creep/lib/shifted-points';

const size = { widthPx: 1040, heightPx: 620 };

/** D = 0.1·t^0.5 over four decades, its band a factor of two either way beyond 100 s. */
const samples = Array.from({ length: 41 }, (_, i) => {
  const time = 10 ** (i / 10 - 0.5);
  const estimate = 0.1 * time ** 0.5;
  const wide = time > 100 ? 2 : 1.05;
  return { time, estimate, lower: estimate / wide, upper: estimate * wide };
});

function drawn(overrides: Partial<CreepDrawing> = {}) {
  return creepGeometry({
    points: [1, 10, 100].map((time) => ({ time, value: 0.1 * time ** 0.5, specimen: '1' })),
    fit: { samples, parameters: [], window: { from: 1, to: 100 }, model: 'power' },
    findings: [],
    size,
    ...overrides,
  });
}

describe('the chart of creep compliance', () => {
  it('has both axes logarithmic, with equal decades where the room allows', () => {
    const { x, y } = drawn();
    expect(x(10) - x(1)).toBeCloseTo(x(100) - x(10), 6);
    expect(y(0.1) - y(1)).toBeCloseTo(x(100) - x(10), 6);
  });

  it('never moves a point off its time', () => {
    const { x, tested } = drawn();
    expect([tested.from, tested.to]).toEqual([x(1), x(100)]);
  });

  it('labels decades and keeps the ticks between them', () => {
    const { times } = drawn();
    expect(times.flatMap(({ label }) => label ?? [])).toEqual(['1', '10', '100', '1,000']);
    expect(times.length).toBeGreaterThan(20);
  });

  it('draws the curve solid within the tests and dashed on either side of them', () => {
    const { curve, x } = drawn();
    const ends = (path: string) =>
      path
        .split(/[ML]/)
        .filter(Boolean)
        .map((pair) => Number(pair.split(' ')[0]));
    const inside = ends(curve!.inside);
    expect([inside[0], inside.at(-1)]).toEqual([x(1), x(100)].map((px) => Math.round(px * 10) / 10));
    expect(curve!.outside.match(/M/g)).toHaveLength(2);
  });

  it('cuts the band at the frame and keeps it in one piece', () => {
    const open = samples.map((sample) => ({ ...sample, upper: sample.time > 100 ? null : sample.upper }));
    const { curve, frame } = drawn({
      fit: { samples: open, parameters: [], window: { from: 1, to: 100 }, model: 'power' },
    });
    const heights = curve!.band
      .replace(/[MZ]/g, '')
      .split('L')
      .map((pair) => Number(pair.split(' ')[1]));
    expect(Math.min(...heights)).toBe(frame.top);
    expect(Math.max(...heights)).toBeLessThanOrEqual(frame.bottom);
  });

  it('draws no curve where none was fitted, and the points all the same', () => {
    const { curve, tested } = drawn({ fit: null });
    expect(curve).toBeNull();
    expect(tested.to).toBeGreaterThan(tested.from);
  });

  it('draws an asymptote only within the axis', () => {
    const parameter = { unit: '1/GPa', low: null, high: null, held: false };
    const of = (value: number) =>
      drawn({
        fit: {
          samples,
          window: { from: 1, to: 100 },
          model: 'sigmoid',
          parameters: [{ ...parameter, symbol: 'D∞', value }],
        },
      }).asymptotes.length;
    expect([of(2), of(1e6)]).toEqual([1, 0]);
  });
});

describe('the curve at a time', () => {
  it('is that of a sample, or on the line between two in logarithms', () => {
    expect(curveAt(samples, samples[7]!.time)).toBe(samples[7]);
    expect(curveAt(samples, 5)!.estimate).toBeCloseTo(0.1 * 5 ** 0.5, 9);
  });

  it('is nothing outside the samples', () => {
    expect([curveAt(samples, 1e-3), curveAt(samples, 1e9)]).toEqual([null, null]);
  });
});

describe('the chosen curve', () => {
  const at = (temperature: number | null, stress: number | null, stresses: number[], outcome?: string) => ({
    temperature,
    stress,
    stresses,
    findings: outcome === undefined ? [] : [{ finding: { outcome } } as never],
  });
  const curves = [at(-20, 200, [200]), at(-10, null, [100, 200], 'undecided'), at(-10, 200, [200], 'pass')];

  it('is the one that the address names', () => {
    for (const curve of curves) {
      expect(chosenCurve(curves, new URLSearchParams(curveKey(curve)))).toBe(curve);
    }
  });

  it('is within half a degree of the named temperature', () => {
    expect(chosenCurve(curves, new URLSearchParams('temperature=-20.4'))).toBe(curves[0]);
  });

  it('is else the first on which a rule is not met, else the first', () => {
    expect(chosenCurve(curves, new URLSearchParams())).toBe(curves[1]);
    expect(chosenCurve([curves[0]!, curves[2]!], new URLSearchParams())).toBe(curves[0]);
    expect(chosenCurve([], new URLSearchParams())).toBeNull();
  });
});

it('shifts each point of a master curve to its time at the reference temperature', () => {
  const point = {
    specimen: null,
    stress: null,
    value: 0.1,
    count: 1,
    origin: 'recomputed' as const,
    source: null,
  };
  const shift = { low: null, high: null, overlaps: true };
  const points = shiftedPoints({
    shifts: [
      { ...shift, temperature: -10, logShift: 0 },
      { ...shift, temperature: 0, logShift: -1 },
    ],
    points: [
      { ...point, temperature: -10, time: 50 },
      { ...point, temperature: 0, time: 50 },
    ],
  });
  // aT is 0.1 at 0 °C: 50 s there are 500 s at −10 °C.
  expect(points.map(({ reducedTime }) => Number(reducedTime.toFixed(6)))).toEqual([50, 500]);
});
