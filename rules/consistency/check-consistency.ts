import type { Analysis } from '../engine/analysis';
import { indexRecord } from '../engine/analysis-index';
import type { MixRecord } from '../record';
import { checkAggregateGravities } from './check-aggregate-gravities';
import { checkDates } from './check-dates';
import { checkDesignPoint } from './check-design-point';
import { checkGradations } from './check-gradations';
import { checkReplicates } from './check-replicates';
import { checkReported } from './check-reported';
import { checkSpecimens } from './check-specimens';
import type { ConsistencyInput, ConsistencyObservation } from './consistency-observation';

/**
 * What cannot be, does not add up or looks wrong in a record, whatever the specification says. Breaches only: data
 * in order is not reported. Each name and subject comes once, so that it can be a finding's key.
 */
export function checkConsistency(record: MixRecord, analysis: Analysis): ConsistencyObservation[] {
  const input: ConsistencyInput = { record, analysis, index: indexRecord(record, 'contractor') };
  const observations = [
    ...checkAggregateGravities(input),
    ...checkSpecimens(input),
    ...checkGradations(input),
    ...checkReplicates(input),
    ...checkReported(input),
    ...checkDesignPoint(input),
    ...checkDates(input),
  ];
  return [
    ...new Map(observations.toReversed().map((each) => [`${each.name}~${each.subject}`, each])).values(),
  ].reverse();
}
