import type { Analysis } from '../engine/analysis';
import { indexRecord } from '../engine/analysis-index';
import type { CreepAnalysis } from '../engine/creep-analysis';
import type { Finding } from '../engine/finding';
import type { MixRecord } from '../record';
import { checkAggregateGravities } from './check-aggregate-gravities';
import { checkCopiedColumns } from './check-copied-columns';
import { checkCreep } from './check-creep';
import { checkDates } from './check-dates';
import { checkDesignPoint } from './check-design-point';
import { checkGradations } from './check-gradations';
import { checkLastDigits } from './check-last-digits';
import { checkLimitsMet } from './check-limits-met';
import { checkReplicates } from './check-replicates';
import { checkReported } from './check-reported';
import { checkRoundedChain } from './check-rounded-chain';
import { checkScatter } from './check-scatter';
import { checkSpecimens } from './check-specimens';
import type { ConsistencyInput, ConsistencyObservation } from './consistency-observation';

/** What else a check knows: the day of submission, the findings of the rules, the creep tests. */
export interface CheckedBeside {
  submittedOn?: string | null;
  judged?: readonly Finding[];
  creep?: CreepAnalysis;
}

/**
 * What cannot be, does not add up or looks wrong in a record, whatever the specification says. Breaches only: data
 * in order is not reported. Each name and subject comes once, so that it can be a finding's key.
 */
export function checkConsistency(
  record: MixRecord,
  analysis: Analysis,
  { submittedOn = null, judged = [], creep = [] }: CheckedBeside = {},
): ConsistencyObservation[] {
  const input: ConsistencyInput = { record, analysis, index: indexRecord(record, 'contractor'), submittedOn };
  const observations = [
    ...checkAggregateGravities(input),
    ...checkSpecimens(input),
    ...checkGradations(input),
    ...checkReplicates(input),
    ...checkScatter(input),
    ...checkCopiedColumns(input),
    ...checkLastDigits(input),
    ...checkReported(input),
    ...checkRoundedChain(input),
    ...checkDesignPoint(input),
    ...checkDates(input),
    ...checkCreep(creep),
    ...checkLimitsMet(judged),
  ];
  return [
    ...new Map(observations.toReversed().map((each) => [`${each.name}~${each.subject}`, each])).values(),
  ].reverse();
}
