import type { Reading } from '#rules/record';
import { aReading } from './a-reading';

export interface CreepTestParts {
  /** °C */
  temperature?: number;
  /** kPa; null where the workbook does not say. */
  stress?: number | null;
  /** s */
  times?: readonly number[];
  /** Compliance in 1/GPa at a loading time in s. */
  compliance?: (time: number) => number;
  /** How much each specimen lies beside the curve: 1 on it. */
  specimens?: readonly number[];
  /** What the workbook holds. */
  as?: 'strain' | 'compliance';
}

/** The seven loading times of AASHTO T 322, s (CRP-F1; from memory, verify). */
export const TEST_TIMES = [1, 2, 5, 10, 20, 50, 100] as const;

/** D∞ + (D0 − D∞)/(1 + (t/τ)^n) with D0 0.045, D∞ 1.2, τ 12,712.85 s and n 0.55: record CRP-15 at −10 °C. */
export function curveAtMinusTen(time: number): number {
  return 1.2 - 1.155 / (1 + (time / 10 ** 4.104242509439325) ** 0.55);
}

/** Creep readings of a test at one temperature, each from a cell of its own. */
export function aCreepTest(parts: CreepTestParts = {}): Reading[] {
  const {
    temperature = -10,
    stress = 200,
    times = TEST_TIMES,
    compliance = curveAtMinusTen,
    specimens = [1],
    as = 'strain',
  } = parts;
  return specimens.flatMap((factor, place) =>
    times.map((time, row) => {
      const value = Number(
        (compliance(time) * factor * (as === 'strain' ? (stress ?? 1) : 1)).toPrecision(6),
      );
      const specimen = String(place + 1);
      return aReading({
        quantity: as === 'strain' ? 'creep-strain' : 'creep-compliance',
        value,
        origin: as === 'strain' ? 'measured' : 'reported',
        at: { specimen, temperature, time, ...(stress === null ? {} : { stress }) },
        source: { sheet: 'Creep', cell: `E${2 + place * times.length + row}`, text: String(value) },
      });
    }),
  );
}
