import { fittedValue } from './creep-fitted-value';
import { measuredValue } from './creep-measured-value';
import { testedAt } from './creep-selection';
import type { CreepBeyond, CreepRequest, CreepValue } from './creep-value-parts';
import type { Obstacle } from './obstacle';

/** The compliance at a rule's temperature and time: as measured there, else from a fitted curve, as the rule says. */
export function creepValue(request: CreepRequest): CreepValue | CreepBeyond | Obstacle {
  const { measure, points } = request;
  const atTime = testedAt(points, measure.time);
  const bound = measure.use !== undefined && measure.use !== 'estimate';
  if (measure.source === 'measured') return measuredValue(request, atTime);
  // A bound is a bound of the curve: only a rule that wants measured values takes it from their scatter.
  if (measure.source === 'either' && !bound && atTime.length > 0) return measuredValue(request, atTime);
  return fittedValue(request);
}
