import { cannot, known, type NumericResult, unusable } from '../numerics/numeric-result';

/** A change of stress at a time: `stress` is added to what was there before, kPa; s. */
export interface StressStep {
  time: number;
  stress: number;
}

/**
 * Strain under a stepped load history, µε. ε(t) = Σ Δσi·D(t − ti) over the steps up to t.
 *
 * Symbols: Δσi change of stress at ti, kPa; D creep compliance, 1/GPa, which is µε/kPa. A step that falls on t
 * itself counts with D(0), the instant response. Taking a load off is a negative step: creep and recovery.
 * Source: Boltzmann's superposition principle. Domain: a linear material at one temperature; finite times and
 * steps in any order; a compliance that is known at every t − ti.
 *
 * @example strainUnderSteps([{ time: 0, stress: 400 }, { time: 60, stress: -400 }], 100, D) // 400·(D(100) − D(40))
 */
export function strainUnderSteps(
  steps: readonly StressStep[],
  t: number,
  compliance: (time: number) => NumericResult,
): NumericResult {
  const fault = unusable({ t });
  if (fault) return cannot(fault);
  let strain = 0;
  for (const { time, stress } of steps) {
    const faulty = unusable({ 'the time of a step': time, 'the stress of a step': stress });
    if (faulty) return cannot(faulty);
    if (time > t) continue;
    const D = compliance(t - time);
    if (!D.ok) return D;
    strain += stress * D.value;
  }
  return known(strain);
}
