import type { ConsistencyObservation } from '../consistency/consistency-observation';
import { roundTo } from '../numerics/round';
import { resolvedLimitWords } from '../rule-sets/limit-words';
import { capitalised, numberWords, withUnit } from '../rule-sets/words';
import type { Finding, ResolvedLimit } from './finding';
import { marginOf } from './judge';
import { naturalOrder } from './natural-order';
import type { World } from './world';

/**
 * What does not add up, as findings without a clause. A reported value that differs from the recomputed one is
 * required only where the difference changes an outcome.
 */
export function consistencyFindings(
  world: World,
  observations: readonly ConsistencyObservation[],
): Finding[] {
  return observations
    .map((observation) => findingOf(world, observation))
    .toSorted((a, b) => naturalOrder(a.rule, b.rule) || naturalOrder(a.subject, b.subject));
}

/** The checks themselves failed: nothing is known about the data, and that is said. */
export function consistencyNotChecked(error: unknown): Finding {
  const detail = error instanceof Error ? error.message : String(error);
  return {
    ...base('not-checked', 'mix'),
    title: 'Consistency of the data',
    severity: 'required',
    outcome: 'undecided',
    observed: null,
    limit: null,
    margin: null,
    requirement: 'The data do not contradict each other.',
    sentence: 'Consistency of the data is not decided.',
    reason: `An internal error occurred while the data were checked: ${detail}`,
    gauge: null,
    evidence: [],
  };
}

function findingOf(world: World, observation: ConsistencyObservation): Finding {
  const { name, subject, outcome, observed, unit, quantity, evidence } = observation;
  const entry = world.view.quantity(quantity);
  const decimals = entry?.decimals ?? 2;
  const limit = limitOf(observation, decimals);
  const changesOutcome = name === REPORTED_DIFFERS && isContradicted(world, observation);
  const ends = limit === null ? null : { ...limit, ...roundedEnds(limit, decimals + 1) };
  const words = ends === null ? '' : resolvedLimitWords(ends);
  const rounded = observed === null ? null : roundedTo(observed, decimals + 1);
  return {
    ...base(name, subject),
    title: capitalised(name.replaceAll('-', ' ')),
    severity: changesOutcome ? 'required' : observation.severity,
    outcome,
    observed:
      rounded === null
        ? null
        : { value: observed, rounded, text: numberWords(rounded), unit, statistic: 'value', count: 1 },
    limit,
    margin: rounded === null || ends === null ? null : marginOf(rounded, ends),
    requirement: words === '' ? observation.reason : `${capitalised(subject)}: ${withUnit(words, unit)}.`,
    sentence: observation.sentence,
    reason: changesOutcome
      ? `${observation.reason} The difference changes the outcome of a rule.`
      : observation.reason,
    gauge: entry && limit ? { span: entry.gaugeSpan, scale: entry.gaugeScale } : null,
    evidence,
  };
}

const REPORTED_DIFFERS = 'reported-differs';

function base(name: string, subject: string) {
  return {
    rule: `consistency/${name}`,
    clause: null,
    subject,
    kind: 'consistency',
    borderline: false,
    ruleSentence: 'Built-in check: data that cannot be, or that contradict each other, are reported.',
    wouldDecide: null,
    roundingSentence: null,
    precision: null,
    advice: null,
    source: null,
  };
}

function limitOf({ limit, unit }: ConsistencyObservation, decimals: number): ResolvedLimit | null {
  if (limit === null) return null;
  return {
    min: limit.min,
    max: limit.max,
    minExclusive: false,
    maxExclusive: false,
    target: null,
    tolerance: null,
    oneOf: null,
    decimals,
    unit,
    from: null,
  };
}

function roundedEnds(limit: ResolvedLimit, decimals: number): { min: number | null; max: number | null } {
  const round = (value: number | null) => (value === null ? null : roundedTo(value, decimals));
  return { min: round(limit.min), max: round(limit.max) };
}

function roundedTo(value: number, decimals: number): number {
  return roundTo({ value, to: Number(`1e-${decimals}`), method: 'rounding' });
}

function isContradicted(world: World, { quantity, at }: ConsistencyObservation): boolean {
  return [...world.contradicted].some(
    (value) =>
      value.quantity === quantity &&
      (value.at === at ||
        JSON.stringify({ ...value.at, specimen: undefined }) ===
          JSON.stringify({ ...at, specimen: undefined })),
  );
}
