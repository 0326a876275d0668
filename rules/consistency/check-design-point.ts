import { evidenceOf } from '../engine/analysis-node';
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
  return [...differsFromTrials(input), ...beyondTrials(input)];
}

/** A design between no trials and without specimens of its own: nothing of it can be recomputed. */
function beyondTrials(input: ConsistencyInput): ConsistencyObservation[] {
  const { designPoint, testedContents } = input.analysis;
  const { declaredBinderContent: declared } = designPoint;
  const contents = testedContents.map(({ binderContent }) => binderContent.value);
  const isTested = designPoint.trial !== null || testedContents.some(({ trial }) => trial === 'design');
  if (declared === null || isTested || contents.length < 2) return [];
  const [from, to] = [Math.min(...contents), Math.max(...contents)];
  if (declared >= from && declared <= to) return [];
  return [
    {
      name: 'design-beyond-trials',
      subject: 'binder content of the design, range of trials',
      severity: 'advisory',
      outcome: 'fail',
      observed: declared,
      limit: { min: from, max: to },
      unit: '%',
      sentence: `The stated design binder content is ${formatDecimals(declared, 2)} %; the trials reach from ${formatDecimals(from, 2)} to ${formatDecimals(to, 2)} %.`,
      reason:
        'A value read beyond the trials is a guess; compact a trial at the stated content or on its far side.',
      evidence: [
        ...input.index.ofTrial('binder-content', 'design').map((reading) => knownReading(reading).evidence),
        ...testedContents.map(({ binderContent }) => evidenceOf(binderContent)),
      ],
      quantity: 'binder-content',
      at: { trial: 'design' },
    },
  ];
}

function differsFromTrials(input: ConsistencyInput): ConsistencyObservation[] {
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
