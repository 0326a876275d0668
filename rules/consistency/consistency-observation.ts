import type { Analysis, RecomputedValue } from '../engine/analysis';
import type { RecordIndex } from '../engine/analysis-index';
import type { Evidence, Severity } from '../engine/finding';
import { evidenceOfReading, evidenceOfRecomputed } from '../engine/sample';
import { quantityById } from '../quantities/registry';
import type { Conditions, MixRecord, Reading } from '../record';
import { conditionWords } from '../rule-sets/words';

/** One thing about the data that cannot be, contradicts itself or looks wrong. */
export interface ConsistencyObservation {
  /** Kebab-case; the finding's rule is `consistency/<name>`. */
  name: string;
  /** Quantity and trial, stockpile or specimen, in words. Unique within its name. */
  subject: string;
  severity: Severity;
  outcome: 'fail' | 'pass';
  observed: number | null;
  limit: { min: number | null; max: number | null } | null;
  unit: string;
  /** What is so, in one sentence. */
  sentence: string;
  /** Why it cannot be, or what to look at. */
  reason: string;
  evidence: Evidence[];
  quantity: string;
  at: Conditions;
}

/** What every check looks at. */
export interface ConsistencyInput {
  record: MixRecord;
  analysis: Analysis;
  /** The contractor's readings that carry a number. */
  index: RecordIndex;
  /** The day of submission, where it is known. */
  submittedOn: string | null;
}

/** A number of the workbook or of the analysis, with its thread. */
export interface Known {
  value: number;
  at: Conditions;
  evidence: Evidence;
}

/** "air voids of trial B, specimen 2", "air voids of the design". */
export function subjectOf(quantity: string, at: Conditions): string {
  return `${quantityById(quantity)?.label ?? quantity}${placeOf(at)}`;
}

/** The conditions alone, as they follow a label: " of trial B, specimen 2". */
export function placeOf({ trial, specimen, ...others }: Conditions): string {
  const design = trial === 'design' ? ' of the design' : '';
  return `${conditionWords({ ...others, trial })}${design}${specimen === undefined ? '' : `, specimen ${specimen}`}`;
}

export function knownReading(reading: Reading): Known {
  return { value: reading.value!, at: reading.at, evidence: evidenceOfReading(reading) };
}

export function knownValue(value: RecomputedValue): Known {
  return { value: value.value, at: value.at, evidence: evidenceOfRecomputed(value) };
}

/** The contractor's computed values of a quantity, one a trial. */
export function computedValues({ analysis }: ConsistencyInput, quantity: string): RecomputedValue[] {
  return analysis.recomputed.filter(
    ({ quantity: own, at }) => own === quantity && at.laboratory === undefined && at.specimen === undefined,
  );
}

/** False for a value of the design that was taken from trials: what is wrong with it is wrong with them. */
export function isOfOwnTrial({ origin, at, inputs }: RecomputedValue): boolean {
  const trials = inputs.map((input) => input.at?.trial).filter((trial) => trial !== undefined);
  return origin !== 'interpolated' && trials.every((trial) => trial === at.trial);
}

/** Computed where the analysis could, else as the workbook states it, for trials without a computed one. */
export function computedOrStated(input: ConsistencyInput, quantity: string): Known[] {
  const computed = computedValues(input, quantity);
  const covered = new Set(computed.map(({ at }) => at.trial ?? 'design'));
  const stated = input.index.all(quantity).filter(({ at }) => !covered.has(at.trial ?? 'design'));
  return [...computed.filter(isOfOwnTrial).map(knownValue), ...stated.map(knownReading)];
}
