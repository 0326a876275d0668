import type { CheckContext, MixRecord, Reading } from '../record';
import type { ResolvedEdition } from '../rule-sets/resolve';
import { canonicalText } from './canonical-text';
import { digest } from './digest';
import { ENGINE_VERSION } from './engine-version';
import type { Evidence, Finding, Seal } from './finding';

export interface SealedThings {
  record: MixRecord;
  edition: ResolvedEdition;
  context: CheckContext;
  findings: readonly Finding[];
  engineVersion?: string;
}

/** The seal of a check: a hash of five hashes, each of canonical JSON. */
export function sealOf({
  record,
  edition,
  context,
  findings,
  engineVersion = ENGINE_VERSION,
}: SealedThings): Seal {
  const hashes = {
    record: recordHash(record),
    resolvedEdition: resolvedEditionHash(edition),
    context: hashOf(context),
    engineVersion: hashOf(engineVersion),
    findings: hashOf(findings.map(judged)),
  };
  return { seal: hashOf(hashes), ...hashes, engine: engineVersion };
}

/** Who typed a value and when is kept beside the record, not in its hash. */
export function recordHash(record: MixRecord): string {
  const kept = recordHashes.get(record);
  if (kept !== undefined) return kept;
  const hash = hashOf(withoutTyped(record));
  recordHashes.set(record, hash);
  return hash;
}

/** A record does not change, and may be judged by several editions. */
const recordHashes = new WeakMap<MixRecord, string>();

/** Cases prove an edition; they are not part of what a record is judged by. */
export function resolvedEditionHash(edition: ResolvedEdition): string {
  const kept = editionHashes.get(edition);
  if (kept !== undefined) return kept;
  const { cases: _cases, ...judgedBy } = edition;
  const hash = hashOf(judgedBy);
  editionHashes.set(edition, hash);
  return hash;
}

export function hashOf(value: unknown): string {
  return digest(canonicalText(value));
}

/** A resolved edition does not change, and many records are judged by it. */
const editionHashes = new WeakMap<ResolvedEdition, string>();

function withoutTyped(record: MixRecord): unknown {
  return {
    ...record,
    attributes: Object.fromEntries(
      Object.entries(record.attributes).map(([name, { typed: _typed, ...attribute }]) => [name, attribute]),
    ),
    readings: record.readings.map((reading) => (reading.typed === undefined ? reading : untyped(reading))),
  };
}

function untyped({ typed: _typed, ...reading }: Reading): Omit<Reading, 'typed'> {
  return reading;
}

/** What was decided, without any sentence. */
function judged(finding: Finding) {
  const { rule, subject, severity, outcome, borderline, observed, limit, margin, evidence } = finding;
  return {
    rule,
    subject,
    severity,
    outcome,
    borderline,
    observed: observed && {
      value: observed.value,
      rounded: observed.rounded,
      unit: observed.unit,
      statistic: observed.statistic,
      count: observed.count,
    },
    limit: limit && {
      min: limit.min,
      max: limit.max,
      minExclusive: limit.minExclusive,
      maxExclusive: limit.maxExclusive,
      target: limit.target,
      tolerance: limit.tolerance,
      oneOf: limit.oneOf,
      unit: limit.unit,
    },
    margin,
    evidence: evidence.map((each) => ({ ...valuesOf(each), inputs: each.inputs?.map(valuesOf) })),
  };
}

/** Inputs of inputs follow from the record and the engine, which have hashes of their own. */
function valuesOf({ quantity, value, text, unit, origin }: Evidence) {
  return { quantity, value, text, unit, origin };
}
