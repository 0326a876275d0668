import type { Finding } from '../engine/finding';
import type { ConsistencyObservation } from './consistency-observation';

/** So many measured results exactly on a limit, and so great a part of all of them, are no chance. */
const leastOnLimit = 4;
const suspiciousPart = 1 / 3;

/** Measured results that lie on their limits to the last digit, too often to be found there. */
export function checkLimitsMet(judged: readonly Finding[]): ConsistencyObservation[] {
  const measured = judged.filter(isMeasured);
  const onLimit = measured.filter(isOnLimit);
  if (onLimit.length < leastOnLimit || onLimit.length < measured.length * suspiciousPart) return [];
  const clauses = [...new Set(onLimit.map(({ clause }) => clause))];
  return [
    {
      name: 'values-on-the-limit',
      subject: 'measured results on their limits',
      severity: 'advisory',
      outcome: 'fail',
      observed: null,
      limit: null,
      unit: '1',
      sentence: `${onLimit.length} of ${measured.length} measured results are exactly on their limit: ${clauses.join(', ')}.`,
      reason: 'Results fall on a limit now and then, hardly ever so often; look at the laboratory records.',
      evidence: onLimit.flatMap(({ evidence }) => evidence.slice(0, 1)),
      quantity: onLimit[0]?.evidence[0]?.quantity ?? '',
      at: {},
    },
  ];
}

/** Decided on numbers that were read, against a limit that leaves room: what must be exactly so much always is. */
function isMeasured({ kind, outcome, limit, evidence, observed }: Finding): boolean {
  if (kind !== 'reading' && kind !== 'gradation') return false;
  if (outcome !== 'pass' && outcome !== 'fail') return false;
  if (limit === null || limit.min === limit.max || observed?.value == null) return false;
  if (observed.unit === '%' && (observed.value === 0 || observed.value === 100)) return false;
  if (observed.statistic === 'count') return false;
  return evidence.length > 0 && evidence.every(({ formula }) => formula === undefined);
}

function isOnLimit({ observed, limit }: Finding): boolean {
  return observed?.value === limit?.min || observed?.value === limit?.max;
}
