import { formatDecimals } from '../numerics/round';
import {
  type ConsistencyInput,
  type ConsistencyObservation,
  computedValues,
  knownReading,
  knownValue,
} from './consistency-observation';

/** How far the stated binder content may lie from the computed one, percentage points. */
const designDifferencePercent = 0.1;

/** The declared design point is judged; where the trials point elsewhere, that is said. */
export function checkDesignPoint(input: ConsistencyInput): ConsistencyObservation[] {
  const {
    declaredBinderContent: declared,
    computedBinderContent: computed,
    targetAirVoids,
  } = input.analysis.designPoint;
  if (declared === null || computed === null) return [];
  if (Math.abs(declared - computed) <= designDifferencePercent + 1e-9) return [];
  const stated = input.index.ofTrial('binder-content', 'design');
  return [
    {
      name: 'design-binder-content-differs',
      subject: 'binder content of the design',
      severity: 'advisory',
      outcome: 'fail',
      observed: declared,
      limit: { min: computed - designDifferencePercent, max: computed + designDifferencePercent },
      unit: '%',
      sentence: `The stated design binder content is ${formatDecimals(declared, 2)} %; the trials reach ${formatDecimals(targetAirVoids, 1)} % air voids at ${formatDecimals(computed, 2)} %.`,
      reason: 'The stated content is the one that is judged.',
      evidence: [
        ...stated.map((reading) => knownReading(reading).evidence),
        ...computedValues(input, 'design-binder-content').map((value) => knownValue(value).evidence),
      ],
      quantity: 'binder-content',
      at: { trial: 'design' },
    },
  ];
}
