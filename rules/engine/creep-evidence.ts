import type { CreepFit, FittedParameter } from '../calculations/creep-fit';
import { ln } from '../numerics/transcendental';
import type { Conditions } from '../record';
import type { CreepComplianceMeasure } from '../rule-sets/measure';
import { MODEL_FORMULAS } from './creep-fits';
import type { CreepPoint } from './creep-points';
import type { Evidence } from './finding';

/** A measured mean with its points, one for each specimen and load. */
export function evidenceOfMean(
  points: readonly CreepPoint[],
  values: readonly { value: number }[],
  measure: CreepComplianceMeasure,
): Evidence {
  const [only] = points;
  if (points.length === 1 && only) return only.evidence;
  const sum = values.reduce((total, { value }) => total + value, 0);
  return {
    quantity: 'creep-compliance',
    value: settled(sum / values.length),
    unit: '1/GPa',
    at: conditionsOf(measure),
    origin: 'recomputed',
    symbol: 'D(t)',
    formula: `mean of ${values.length}`,
    inputs: points.map(({ evidence }) => evidence),
    source: null,
  };
}

/**
 * A value of a fitted curve: its parameters, then the points it was fitted through, the nearest tested time last. A
 * bound rests on the estimate, which rests on the parameters.
 */
export function fittedEvidence(input: {
  value: number;
  bound: 'lower' | 'upper' | null;
  estimate?: number;
  fit: CreepFit;
  used: readonly CreepPoint[];
  measure: CreepComplianceMeasure;
  decades: number;
}): Evidence {
  const { value, bound, fit, measure, decades } = input;
  const at = conditionsOf(measure);
  const origin = decades > 0 ? ('extrapolated' as const) : ('fitted' as const);
  const parameters = fit.parameters.map(parameterEvidence);
  const points = byNearness(input.used, measure.time).map(({ evidence }) => evidence);
  const base = { quantity: 'creep-compliance', unit: '1/GPa', at, origin, source: null };
  if (bound === null) {
    const inputs = [...parameters, ...points];
    return { ...base, value, symbol: 'D(t)', formula: MODEL_FORMULAS[fit.model], inputs };
  }
  const estimate: Evidence = {
    ...base,
    value: input.estimate ?? value,
    symbol: 'D(t)',
    formula: MODEL_FORMULAS[fit.model],
    inputs: parameters,
  };
  const sign = bound === 'lower' ? '−' : '+';
  const percent = settled(measure.confidence * 100);
  return {
    ...base,
    value,
    symbol: `D(t), ${bound}`,
    formula: `exp(ln D(t) ${sign} t·s), two-sided ${percent} %, ${fit.degreesOfFreedom} degrees of freedom`,
    inputs: [estimate, ...points],
  };
}

/** What a fitted symbol is called, by symbol. */
const PARAMETER_NAMES: Record<string, string> = {
  D0: 'glassy-compliance',
  'D∞': 'long-term-compliance',
  τ: 'retardation-time',
  n: 'creep-exponent',
  m: 'creep-exponent',
};

function parameterEvidence({ symbol, unit, value }: FittedParameter): Evidence {
  return {
    quantity: PARAMETER_NAMES[symbol] ?? 'creep-coefficient',
    value,
    unit,
    origin: 'fitted',
    symbol,
    source: null,
  };
}

/** From the tested time farthest from the one asked for to the nearest. */
function byNearness(points: readonly CreepPoint[], time: number): CreepPoint[] {
  const away = ({ at }: CreepPoint) => Math.abs(ln((at.time ?? time) / time));
  return points.toSorted((a, b) => away(b) - away(a));
}

function conditionsOf({ temperature, time, stress }: CreepComplianceMeasure): Conditions {
  return stress === undefined ? { temperature, time } : { temperature, time, stress };
}

function settled(value: number): number {
  return Number(value.toPrecision(12));
}
