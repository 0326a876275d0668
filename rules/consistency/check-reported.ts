import type { RecomputedValue } from '../engine/analysis';
import { evidenceOfRecomputed } from '../engine/sample';
import { formatDecimals } from '../numerics/round';
import { quantityById } from '../quantities/registry';
import type { Reading } from '../record';
import { capitalised, numberWords, unitSuffix } from '../rule-sets/words';
import {
  type ConsistencyInput,
  type ConsistencyObservation,
  placeOf,
  subjectOf,
} from './consistency-observation';

/**
 * Values that the workbook reports and that do not follow from its own readings, with the named cause where one is
 * known. A gradation is compared as a whole elsewhere.
 */
export function checkReported({ analysis }: ConsistencyInput): ConsistencyObservation[] {
  const differing = analysis.recomputed.filter(
    ({ agrees, quantity }) => agrees === false && quantity !== 'percent-passing',
  );
  const wholes = new Set(differing.filter(({ at }) => at.specimen === undefined).map(wholeKey));
  return differing
    .filter((value) => value.at.specimen === undefined || !wholes.has(wholeKey(value)))
    .map(observation);
}

function observation(value: RecomputedValue): ConsistencyObservation {
  const { quantity, at, unit, tolerance, cause } = value;
  const entry = quantityById(quantity);
  const reported = value.reported!;
  const decimals = entry?.decimals ?? 2;
  const are = entry?.plural ? 'are' : 'is';
  const come = entry?.plural ? 'come' : 'comes';
  const label = capitalised(entry?.label ?? quantity);
  return {
    name: 'reported-differs',
    subject: subjectOf(quantity, at),
    severity: 'advisory',
    outcome: 'fail',
    observed: reported.value,
    limit: { min: value.value - tolerance!, max: value.value + tolerance! },
    unit,
    sentence: `${label}${placeOf(at)} ${are} reported as ${reportedText(reported, decimals)}${unitSuffix(unit)} and ${come} to ${numberWords(value.value, decimals + 1)}${unitSuffix(unit)} from the workbook's own readings.`,
    reason: cause
      ? `The workbook ${cause.text}.`
      : `The difference is more than rounding explains (${formatDecimals(tolerance!, decimals + 1)}), and no single known cause gives the reported value.`,
    evidence: [evidenceOfRecomputed(value)],
    quantity,
    at,
  };
}

/** As many decimals as are registered, and more where the workbook's own are needed to see the difference. */
function reportedText(reported: Reading, decimals: number): string {
  return numberWords(reported.value!, decimals + (reported.source === null ? 1 : 0));
}

function wholeKey({ quantity, at }: RecomputedValue): string {
  const { specimen: _specimen, ...whole } = at;
  return JSON.stringify([quantity, Object.entries(whole).toSorted(([a], [b]) => (a < b ? -1 : 1))]);
}
