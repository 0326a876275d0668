import type { RecomputedValue } from '../engine/analysis';
import { displayedUnit, showsAs } from '../engine/analysis-digits';
import { decimalsOf, roundTo } from '../numerics/round';
import { quantityById } from '../quantities/registry';
import type { Reading } from '../record';
import { andList, capitalised, numberWords, unitSuffix } from '../rule-sets/words';
import {
  type ConsistencyInput,
  type ConsistencyObservation,
  knownValue,
  placeOf,
  subjectOf,
} from './consistency-observation';

/**
 * Reported values that come of other reported ones as they are printed, so that rounding is carried along. Only
 * where that alone gives the printed digits; within the tolerance nothing else is said about them.
 */
export function checkRoundedChain({ analysis }: ConsistencyInput): ConsistencyObservation[] {
  const whole = analysis.recomputed.filter(
    ({ at, reported }) =>
      at.specimen === undefined && at.laboratory === undefined && reported?.source != null,
  );
  return whole.flatMap((value) => {
    const reported = value.reported!;
    if (value.agrees !== true || showsAs(value.value, reported)) return [];
    const chain = fromPrinted(value, whole);
    return chain !== null && showsAs(chain.value, reported) ? [observation(value, reported, chain)] : [];
  });
}

interface Chain {
  value: number;
  /** Labels of the printed values that went in. */
  from: string[];
}

/** The same formula over what the workbook prints for its inputs; null where it prints none of them. */
function fromPrinted({ node, at }: RecomputedValue, whole: readonly RecomputedValue[]): Chain | null {
  const from: string[] = [];
  const inputs = node.inputs.map((input) => {
    const stated = whole.find(
      ({ quantity, at: other }) => quantity === input.quantity && other.trial === at.trial,
    );
    if (stated?.reported == null) return input.value;
    from.push(quantityById(input.quantity)?.label ?? input.quantity);
    return printed(stated.reported);
  });
  const result = from.length === 0 ? null : (node.compute?.(inputs) ?? null);
  return result?.ok ? { value: result.value, from } : null;
}

function printed(reading: Reading): number {
  const to = displayedUnit(reading);
  return decimalsOf(to) > 9 ? reading.value! : roundTo({ value: reading.value!, to, method: 'half-up' });
}

function observation(value: RecomputedValue, reported: Reading, { from }: Chain): ConsistencyObservation {
  const { quantity, at, unit } = value;
  const entry = quantityById(quantity);
  const decimals = entry?.decimals ?? 2;
  const are = entry?.plural ? 'are' : 'is';
  return {
    name: 'reported-from-rounded-values',
    subject: subjectOf(quantity, at),
    severity: 'advisory',
    outcome: 'fail',
    observed: reported.value,
    limit: null,
    unit,
    sentence: `${capitalised(entry?.label ?? quantity)}${placeOf(at)} ${are} reported as ${numberWords(reported.value!, decimals)}${unitSuffix(unit)}, which follows from ${andList(from)} as printed; unrounded it comes to ${numberWords(value.value, decimals + 1)}.`,
    reason: 'Inputs are to be carried unrounded; the recomputed value is judged.',
    evidence: [knownValue(value).evidence],
    quantity,
    at,
  };
}
