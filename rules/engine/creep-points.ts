import type { Conditions, Origin, Source } from '../record';
import type { RecomputedValue } from './analysis';
import type { Evidence } from './finding';
import { naturalOrder } from './natural-order';
import { evidenceOfReading, evidenceOfRecomputed } from './sample';
import type { UsableReading, World } from './world';

/** One compliance of one specimen (or of all of them together) at one loading time, or why there is none. */
export interface CreepPoint {
  at: Conditions;
  specimen: string | null;
  /** 1/GPa; null where the point cannot be used. */
  value: number | null;
  qualifier: '<' | '>' | null;
  /** Specimens behind it: more than one only where the method averages over specimens and faces. */
  count: number;
  /** What the workbook itself states for a computed point, where that differs by more than its digits explain. */
  reported: { value: number; recomputed: RecomputedValue } | null;
  evidence: Evidence;
  /** Why it cannot be used: a sentence. */
  fault: string | null;
}

/**
 * Every creep compliance of a record, from the rawest readings that give it: deformations or strain with stress, else
 * as reported. Readings that give none come as points with a fault, unless a reported value stands in their place.
 */
export function creepPoints(world: World): CreepPoint[] {
  const kept = pointsOfWorld.get(world);
  if (kept) return kept;
  const computed = (world.recomputed.get(COMPLIANCE) ?? []).filter(({ at }) => at.specimen === undefined);
  const differing = (world.recomputed.get(COMPLIANCE) ?? []).filter(({ agrees }) => agrees === false);
  const ofComputed = computed.flatMap((value) => pointsOfValue(value, differing));
  const stated = (world.readings.get(COMPLIANCE) ?? [])
    .filter((reading) => !ofComputed.some(({ at }) => isSameTest(at, reading.at)))
    .map(pointOfReading);
  const usable = [...ofComputed, ...stated];
  const faulty = faultyReadings(world).filter(({ at }) => !usable.some((each) => standsFor(each, at)));
  const points = [...usable, ...faulty].toSorted(inOrder);
  pointsOfWorld.set(world, points);
  return points;
}

/** By loading time, specimen and stress: nothing may depend on the order of a record's readings. */
export function inOrder(a: CreepPoint, b: CreepPoint): number {
  return (
    (a.at.time ?? -1) - (b.at.time ?? -1) ||
    naturalOrder(a.specimen ?? '', b.specimen ?? '') ||
    (a.at.stress ?? 0) - (b.at.stress ?? 0) ||
    (a.value ?? 0) - (b.value ?? 0)
  );
}

/** Cell of a point: its own, else the first of what it is made of. */
export function cellOf(evidence: Evidence): Source | null {
  if (evidence.source !== null) return evidence.source;
  for (const input of evidence.inputs ?? []) {
    const cell = cellOf(input);
    if (cell !== null) return cell;
  }
  return null;
}

/** What a compliance can be measured by. */
export const CREEP_QUANTITIES = [
  'creep-compliance',
  'creep-strain',
  'horizontal-deformation',
  'vertical-deformation',
] as const;

const COMPLIANCE = 'creep-compliance';
const pointsOfWorld = new WeakMap<World, CreepPoint[]>();

function pointsOfValue(value: RecomputedValue, differing: RecomputedValue[]): CreepPoint[] {
  const whole = evidenceOfRecomputed(value);
  if (value.specimens.length === 0)
    return [computedPoint(value.at, value.value, value.count, whole, differing)];
  // A mean has one input a specimen, in their order; a single specimen is itself.
  const isMean = value.inputs.length === value.specimens.length && value.inputs[0]?.quantity === COMPLIANCE;
  return value.specimens.map(({ specimen, value: own }, i) => {
    const at = { ...value.at, specimen };
    const evidence = isMean ? value.inputs[i]! : { ...whole, at };
    const point = computedPoint(at, own, 1, evidence, differing);
    return point.reported === null ? { ...point, reported: statedMean(value, own) } : point;
  });
}

/** A stated mean that the specimens do not have, as what each of them would have to be for it. */
function statedMean(value: RecomputedValue, own: number): CreepPoint['reported'] {
  const stated = value.reported?.value ?? null;
  if (value.agrees !== false || stated === null || stated <= 0 || value.value <= 0) return null;
  return { value: (own * stated) / value.value, recomputed: value };
}

function computedPoint(
  at: Conditions,
  value: number,
  count: number,
  evidence: Evidence,
  differing: RecomputedValue[],
): CreepPoint {
  const against = differing.find((each) => sameConditions(each.at, at));
  const reported = against?.reported?.value ?? null;
  return {
    at,
    specimen: at.specimen ?? null,
    ...usableValue(value),
    qualifier: null,
    count,
    reported: against && reported !== null ? { value: reported, recomputed: against } : null,
    evidence,
  };
}

function pointOfReading({ reading, value, at, fault }: UsableReading): CreepPoint {
  const { qualifier } = reading;
  const censor = qualifier === '<' || qualifier === '>' ? qualifier : null;
  const used =
    value === null ? { value: null, fault: 'A creep compliance has no number.' } : usableValue(value);
  return {
    at,
    specimen: at.specimen ?? null,
    ...(fault === null ? used : { value: null, fault: faultWords('creep compliance', fault) }),
    qualifier: censor,
    count: 1,
    reported: null,
    evidence: evidenceOfReading(reading),
  };
}

function usableValue(value: number): { value: number | null; fault: string | null } {
  return value > 0
    ? { value, fault: null }
    : { value: null, fault: `A creep compliance of ${value} 1/GPa cannot be: it is above zero.` };
}

/** Raw readings that give no compliance: without their stress, in an unknown unit, censored, of too few faces. */
function faultyReadings(world: World): CreepPoint[] {
  const ofAnalysis = world.analysis.creepFailures.map(({ at, reason, quantity }) =>
    faultyPoint(at, reason, {
      quantity,
      value: null,
      unit: '',
      at,
      origin: 'measured' as Origin,
      source: null,
    }),
  );
  const ofReadings = (['creep-strain', 'horizontal-deformation'] as const).flatMap((quantity) => {
    const label = world.view.quantity(quantity)?.label ?? quantity;
    return (world.readings.get(quantity) ?? []).flatMap(({ reading, at, fault, value }) => {
      const isPlain = value !== null && reading.qualifier === undefined;
      const why = fault ?? (isPlain ? null : 'it is not a plain number');
      return why === null ? [] : [faultyPoint(at, faultWords(label, why), evidenceOfReading(reading))];
    });
  });
  return [...ofAnalysis, ...ofReadings];
}

function faultyPoint(at: Conditions, fault: string, evidence: Evidence): CreepPoint {
  return {
    at,
    specimen: at.specimen ?? null,
    value: null,
    qualifier: null,
    count: 0,
    reported: null,
    evidence,
    fault,
  };
}

function faultWords(label: string, fault: string): string {
  return `A reading of ${label} cannot be used: ${fault}.`;
}

/** A computed compliance covers what the workbook states for the same specimen under the same load and time. */
function isSameTest(computed: Conditions, stated: Conditions): boolean {
  return (
    (computed.trial ?? 'design') === (stated.trial ?? 'design') &&
    (computed.laboratory ?? 'contractor') === (stated.laboratory ?? 'contractor') &&
    computed.temperature === stated.temperature &&
    computed.time === stated.time &&
    computed.aging === stated.aging &&
    (stated.stress === undefined || computed.stress === stated.stress) &&
    (stated.specimen === undefined ||
      computed.specimen === undefined ||
      computed.specimen === stated.specimen)
  );
}

/** Whether a usable point answers what a failed reading would have. */
function standsFor({ at, fault }: CreepPoint, failed: Conditions): boolean {
  if (fault !== null) return false;
  if (at.temperature !== failed.temperature) return false;
  if (failed.time === undefined) return true;
  return (
    at.time === failed.time &&
    (failed.stress === undefined || at.stress === undefined || at.stress === failed.stress) &&
    (failed.specimen === undefined || at.specimen === undefined || at.specimen === failed.specimen)
  );
}

function sameConditions(one: Conditions, other: Conditions): boolean {
  return (
    (one.trial ?? 'design') === (other.trial ?? 'design') &&
    (one.laboratory ?? 'contractor') === (other.laboratory ?? 'contractor') &&
    one.specimen === other.specimen &&
    one.temperature === other.temperature &&
    one.time === other.time &&
    one.stress === other.stress &&
    one.aging === other.aging
  );
}
