import { checkConsistency } from '../consistency/check-consistency';
import type { CheckContext, MixRecord } from '../record';
import type { ResolvedEdition } from '../rule-sets/resolve';
import { unsettledBy } from './alternatives';
import { analyse } from './analyse';
import { analyseCreep } from './analyse-creep';
import type { Analysis, RecomputedValue } from './analysis';
import { consistencyFindings, consistencyNotChecked } from './consistency-findings';
import type { CreepAnalysis } from './creep-analysis';
import { summarise } from './disposition';
import { evaluateRule } from './evaluate-rule';
import { type CheckResult, type Finding, findingKey, type RecomputedReading } from './finding';
import { byClauseThenSubject } from './order';
import { roomToMove } from './room-to-move';
import { sealOf } from './seal';
import { unsettledByTests } from './specimens-of-tests';
import { type World, worldOf } from './world';

/**
 * Judges a mix record by a resolved edition: findings in the order of clauses, what does not add up after them,
 * and the seal over it all. Pure and synchronous: the same everywhere for the same engine version.
 */
export function evaluate(record: MixRecord, edition: ResolvedEdition, context: CheckContext): CheckResult {
  const analysis = analysisOf(record, edition);
  const world = worldOf({ record, edition, context, analysis });
  const judged = settledFindings(world).toSorted(byClauseThenSubject);
  const creep = analyseCreep(world);
  const findings = [...judged, ...dataFindings(world, judged, creep)];
  assertUniqueKeys(findings);
  return {
    analysis: {
      recomputed: analysis.recomputed.map(recomputedReading),
      designPoint: {
        declaredBinderContent: analysis.designPoint.declaredBinderContent,
        computedBinderContent: analysis.designPoint.computedBinderContent,
        targetAirVoids: analysis.designPoint.targetAirVoids,
        fit: analysis.designPoint.fit,
      },
      roomToMove: roomToMove(world),
      creep,
    },
    summary: summarise(findings),
    findings,
    seal: sealOf({ record, edition, context, findings }),
  };
}

/** Findings of all rules. Those that an unanswered doubt or a shared label leaves open are made again, as open ones. */
function settledFindings(world: World): Finding[] {
  const { record, edition, context, view } = world;
  const { rules } = edition;
  const ofRules = rules.map((rule) => evaluateRule(world, rule));
  const findings = ofRules.flat();
  const evaluateOther = (other: MixRecord, some = rules) => {
    const otherWorld = worldOf({ record: other, edition, context, analysis: analysisOf(other, edition) });
    return some.flatMap((rule) => evaluateRule(otherWorld, rule));
  };
  const unsettled = new Map([
    ...unsettledByTests({ record, rules, view, findings, evaluate: evaluateOther }),
    ...unsettledBy({ record, findings, evaluate: (other) => evaluateOther(other) }),
  ]);
  if (unsettled.size === 0) return findings;
  const open = { ...world, unsettled };
  return rules.flatMap((rule, place) => {
    const own = ofRules[place] ?? [];
    return own.some((finding) => unsettled.has(findingKey(finding))) ? evaluateRule(open, rule) : own;
  });
}

/** The analysis with the edition's own tolerances between reported and recomputed values. */
function analysisOf(record: MixRecord, edition: ResolvedEdition): Analysis {
  const analysis = analysisBy(record, edition.designPoint);
  const { reportedTolerance } = edition;
  if (Object.keys(reportedTolerance).length === 0) return analysis;
  return {
    ...analysis,
    recomputed: analysis.recomputed.map((value) => withTolerance(value, reportedTolerance)),
  };
}

/** The analysis of a record rests on the design point only: editions that agree on it share one. */
function analysisBy(record: MixRecord, { targetAirVoids, fit }: ResolvedEdition['designPoint']): Analysis {
  const ofRecord = analyses.get(record) ?? new Map<string, Analysis>();
  analyses.set(record, ofRecord);
  const key = `${targetAirVoids} ${fit}`;
  const kept = ofRecord.get(key) ?? analyse(record, { targetAirVoids, fit });
  ofRecord.set(key, kept);
  return kept;
}

const analyses = new WeakMap<MixRecord, Map<string, Analysis>>();

function withTolerance(value: RecomputedValue, tolerances: Record<string, number>): RecomputedValue {
  const tolerance = tolerances[value.quantity];
  if (tolerance === undefined || value.reported === null || value.reported.value === null) return value;
  const agrees = Math.abs(value.reported.value - value.value) <= tolerance * (1 + 1e-12);
  return value.with({ agrees }, { tolerance: () => tolerance, cause: () => (agrees ? null : value.cause) });
}

function dataFindings(world: World, judged: readonly Finding[], creep: CreepAnalysis): Finding[] {
  try {
    const beside = { submittedOn: world.context.submittedOn, judged, creep };
    return consistencyFindings(world, checkConsistency(world.record, world.analysis, beside));
  } catch (error) {
    return [consistencyNotChecked(error)];
  }
}

function recomputedReading(value: RecomputedValue): RecomputedReading {
  return {
    quantity: value.quantity,
    value: value.value,
    unit: value.unit,
    at: value.at,
    origin: value.origin,
    source: null,
    formula: value.formula,
    inputs: value.inputs,
    reported: value.reported?.value ?? null,
  };
}

function assertUniqueKeys(findings: readonly Finding[]): void {
  const seen = new Set<string>();
  for (const finding of findings) {
    const key = findingKey(finding);
    if (seen.has(key))
      throw new Error(`Two findings have the key ${key}; a rule and a subject give one finding.`);
    seen.add(key);
  }
}
