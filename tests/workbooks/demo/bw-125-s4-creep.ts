import type { FilledValue } from '#tests/workbooks/fill-template';

/** Eleven loading times, evenly spaced in logarithms to the figures that a logger is set to, s. */
const times = [1, 1.6, 2.5, 4, 6.3, 10, 16, 25, 40, 63, 100];

/** D0, D∞ in 1/GPa, τ in s and n of each specimen at each temperature: invented, as everything here. */
const tests = [
  {
    temperature: -20,
    stress: 800,
    curves: [
      [0.0402, 0.9, 260_000, 0.5],
      [0.0405, 0.9, 250_000, 0.502],
      [0.0408, 0.9, 240_000, 0.504],
    ],
  },
  {
    temperature: -10,
    stress: 400,
    curves: [
      [0.041, 0.9, 17_500, 0.498],
      [0.0425, 0.9, 16_000, 0.5],
      [0.0437, 0.9, 15_000, 0.503],
    ],
  },
  {
    temperature: 0,
    stress: 200,
    curves: [
      [0.042, 0.88, 1500, 0.497],
      [0.0432, 0.9, 1350, 0.502],
      [0.0445, 0.92, 1250, 0.5],
    ],
  },
] as const;

/** Specimen 1 once more at −10 °C, under half the stress. */
const again = { temperature: -10, stress: 200, curves: [[0.0414, 0.9, 17_200, 0.5]] } as const;

/** The creep tests of BW-125-S4 in µε, as the sheet Creep of the template takes them. */
export function brightwaterCreep(): Record<string, FilledValue>[] {
  return [...tests, again].flatMap(({ temperature, stress, curves }) =>
    curves.flatMap(([D0, Dinf, tau, n], at) =>
      times.map((time) => ({
        Temperature: temperature,
        Specimen: String(at + 1),
        Stress: stress,
        'Loading time': time,
        'Creep strain': Math.round(100 * stress * (Dinf + (D0 - Dinf) / (1 + (time / tau) ** n))) / 100,
      })),
    ),
  );
}
