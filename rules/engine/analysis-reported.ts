import { mean } from '../numerics/mean';
import type { Reading } from '../record';
import type { NamedCause, RecomputedValue } from './analysis';
import { causeInputsOf } from './analysis-cause-inputs';
import { causeOf } from './analysis-causes';
import { halfDisplayedUnit } from './analysis-digits';
import { designTrial, isSpecial, type RecordIndex, specialKey, withoutGaps } from './analysis-index';
import type { AnalysisNode } from './analysis-node';
import { propagatedHalfUnits } from './analysis-slopes';
import { recomputedValueOf } from './recomputed-value';

/** Finds what the workbook itself states for a computed value and keeps it with the value. */
export function attachReported(node: AnalysisNode, index: RecordIndex): void {
  const stated = statedFor(node, index);
  const whole = stated.filter(({ at }) => at.specimen === undefined);
  const single = onlyOne(whole);
  if (single) node.reported = single;
  const labelled = stated.filter(({ at }) => at.specimen !== undefined);
  if (labelled.length === 0) return;
  if (node.specimens.length === 0) {
    node.reported ??= onlyOne(labelled) ?? meanOfReported(labelled);
    return;
  }
  for (const specimen of node.specimens) {
    specimen.reported = onlyOne(labelled.filter(({ at }) => at.specimen === specimen.at.specimen)) ?? null;
  }
  const ofSpecimens = node.specimens.map(({ reported }) => reported);
  const complete = ofSpecimens.filter((reading) => reading !== null);
  if (complete.length === node.specimens.length) node.reported ??= meanOfReported(complete);
}

/**
 * A computed value beside what is stated for it, and one more for each specimen that the workbook states itself.
 * Nothing for a plain mean of readings that the workbook does not state a mean of: it says nothing new.
 */
export function recomputedValues(
  node: AnalysisNode,
  trialNodes: AnalysisNode[],
  index: RecordIndex,
): RecomputedValue[] {
  const specimens = node.specimens.filter(
    (specimen) => specimen.reported !== null && specimen.formula !== null,
  );
  const ofSpecimens = specimens.map((specimen) => recomputedValue(specimen, trialNodes, index, []));
  if (
    node.formula === null ||
    (isPlainMean(node) && (node.reported === null || node.reported.source === null))
  ) {
    return ofSpecimens;
  }
  return [recomputedValue(node, trialNodes, index, ofSpecimens), ...ofSpecimens];
}

function recomputedValue(
  node: AnalysisNode,
  trialNodes: AnalysisNode[],
  index: RecordIndex,
  ofSpecimens: RecomputedValue[],
): RecomputedValue {
  const { reported } = node;
  const allowed = reported === null ? null : toleranceOf(node, reported);
  const agrees = reported === null || allowed === null ? null : allowed.includes();
  const laboratory = index.laboratory === 'agency' ? ('agency' as const) : undefined;
  return recomputedValueOf(
    {
      quantity: node.quantity,
      at: withoutGaps({ ...node.at, laboratory }),
      value: node.value,
      unit: node.unit,
      origin: node.origin === 'interpolated' || node.origin === 'converted' ? node.origin : 'recomputed',
      symbol: node.symbol,
      formula: node.formula ?? '',
      count: node.count ?? 1,
      specimens: node.specimens.map(({ at, value }) => ({ specimen: at.specimen ?? '', value })),
      reported,
      agrees,
      node,
    },
    {
      tolerance: () => (allowed === null ? null : allowed.tolerance()),
      cause: () => (agrees === false ? causeFor(node, reported!, trialNodes, ofSpecimens) : null),
    },
  );
}

/** A mean of stated values shows no digits of its own: its cause is the one that all its specimens share. */
function causeFor(
  node: AnalysisNode,
  reported: Reading,
  trialNodes: AnalysisNode[],
  ofSpecimens: RecomputedValue[],
): NamedCause | null {
  if (!averages.has(reported)) return causeOf(node.quantity, reported, causeInputsOf(node, trialNodes));
  const causes = ofSpecimens.filter(({ agrees }) => agrees === false).map(({ cause }) => cause);
  const [first] = causes;
  if (!first || causes.some((cause) => cause?.id !== first.id)) return null;
  return { ...first, value: reported.value! };
}

/** Half units of the mean of several stated values, each rounded for itself. */
const averages = new WeakMap<Reading, number>();

function halfUnitOfReported(reported: Reading): number {
  return averages.get(reported) ?? halfDisplayedUnit(reported);
}

function meanOfReported(readings: Reading[]): Reading | null {
  const average = mean(readings.map(({ value }) => value!));
  if (!average.ok) return null;
  const [first] = readings;
  const reading: Reading = {
    quantity: first!.quantity,
    value: average.value,
    unit: first!.unit,
    at: withoutGaps({ ...first!.at, specimen: undefined }),
    origin: 'reported',
    source: null,
  };
  averages.set(reading, Math.max(...readings.map(halfDisplayedUnit)));
  return reading;
}

interface Tolerance {
  tolerance(): number;
  includes(): boolean;
}

/**
 * The slopes behind a tolerance are the dearest part of an analysis. Most reported values agree within half of
 * their own last digit already, so the rest is worked out only where it decides or where somebody asks.
 */
function toleranceOf(node: AnalysisNode, reported: Reading): Tolerance {
  const own = halfUnitOfReported(reported);
  const difference = Math.abs(node.value - reported.value!);
  let known: number | null = null;
  const tolerance = () => {
    known ??= own + propagatedHalfUnits(node);
    return known;
  };
  return { tolerance, includes: () => isWithin(difference, own) || isWithin(difference, tolerance()) };
}

function isWithin(difference: number, tolerance: number): boolean {
  return difference <= tolerance * (1 + 1e-9) + 1e-12;
}

/** One reading, or several that say the same. Several that differ are a doubt of the reader's, not a statement. */
function onlyOne(readings: Reading[]): Reading | null {
  const [first] = readings;
  return first && readings.every(({ value }) => value === first.value) ? first : null;
}

function statedFor(node: AnalysisNode, index: RecordIndex): Reading[] {
  const readings = index.ofTrial(node.quantity, node.at.trial ?? designTrial);
  return readings.filter((reading) => isAtSameConditions(reading, node, index) && !restsOn(node, reading));
}

function isAtSameConditions(reading: Reading, node: AnalysisNode, index: RecordIndex): boolean {
  const { at } = reading;
  const gyrations = index.gyrationsKey(at.gyrations) ?? 'design';
  const own = { ...reading, at: node.at };
  return (
    at.sieve === node.at.sieve &&
    at.stockpile === node.at.stockpile &&
    (at.blend === undefined || node.at.blend === undefined || at.blend === node.at.blend) &&
    (node.quantity === 'relative-density' && at.gyrations === undefined
      ? false
      : gyrations === (node.at.gyrations ?? 'design')) &&
    (isSpecial(reading) ? specialKey(reading) === specialKey(own) : !isSpecial(own))
  );
}

/** A stated value that is itself an input (a specimen's Gmb, a strength) is not what is compared. */
function restsOn(node: AnalysisNode, reading: Reading): boolean {
  if (node.reading === reading) return true;
  return node.inputs.some((input) => input.quantity === node.quantity && restsOn(input, reading));
}

function isPlainMean(node: AnalysisNode): boolean {
  return node.compute === mean && node.inputs.every((input) => input.formula === null);
}
