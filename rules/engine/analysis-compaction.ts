import { bulkSpecificGravity, specimenAbsorption } from '../calculations/bulk-specific-gravity';
import type { Conditions, Reading } from '../record';
import {
  isSpecial,
  type NamedGyrations,
  type RecordIndex,
  specialConditions,
  specialKey,
  withoutGaps,
} from './analysis-index';
import { type AnalysisNode, derivedNode, meanNode, readingNode } from './analysis-node';

/** Specimens of one trial that were compacted and tested alike. */
export interface CompactedSet {
  /** Gyrations at which Gmb was measured; without a statement, the design number. */
  gyrations: NamedGyrations | number;
  /** True for the specimens that the volumetrics rest on. */
  volumetric: boolean;
  at: Conditions;
  gmb: AnalysisNode;
  /** Water that the specimens took up; null where no masses are given. */
  absorption: AnalysisNode | null;
}

/**
 * Gmb of a trial's specimens: from their masses where these are given, else as given.
 *
 * A set with another condition (the wet and dry subsets of a moisture test) stays apart from the volumetric one.
 */
export function compactedSets(index: RecordIndex, trial: string): CompactedSet[] {
  const sets = new Map<string, SpecimenSet>();
  for (const quantity of [gmb, ...Object.keys(massSymbols)]) {
    for (const reading of index.ofTrial(quantity, trial)) addTo(sets, index, reading);
  }
  leaveTestedOut(sets, testedSpecimens(index, trial));
  return [...sets.values()].flatMap((set) => {
    const at = withoutGaps({ trial, ...set.special, gyrations: set.stated });
    const node = gravityOf(set, at);
    const volumetric = set.gyrations === 'design' && Object.keys(set.special).length === 0;
    if (!node) return [];
    return [{ gyrations: set.gyrations, volumetric, at, gmb: node, absorption: absorptionOf(set, at) }];
  });
}

const gmb = 'bulk-specific-gravity-mix';
const massSymbols = { 'mass-in-air': 'A', 'mass-saturated-surface-dry': 'B', 'mass-in-water': 'C' } as const;

interface SpecimenSet {
  gyrations: NamedGyrations | number;
  /** Gyrations as stated; undefined where the readings are silent. */
  stated: NamedGyrations | number | undefined;
  special: Conditions;
  specimens: Map<string, Record<string, Reading[]>>;
}

function addTo(sets: Map<string, SpecimenSet>, index: RecordIndex, reading: Reading): void {
  const stated = index.gyrationsKey(reading.at.gyrations);
  const gyrations = stated ?? 'design';
  const key = `${gyrations}|${isSpecial(reading) ? specialKey(reading) : ''}`;
  const set: SpecimenSet = sets.get(key) ?? {
    gyrations,
    stated: undefined,
    special: specialConditions(reading),
    specimens: new Map(),
  };
  sets.set(key, set);
  set.stated ??= stated;
  const label = reading.at.specimen ?? '';
  const specimen = set.specimens.get(label) ?? {};
  set.specimens.set(label, specimen);
  specimen[reading.quantity] = [...(specimen[reading.quantity] ?? []), reading];
}

/**
 * A specimen that was broken for its strength was compacted to other voids on purpose; where the workbook does
 * not keep its masses apart by a condition, it is still no volumetric specimen, as long as others remain.
 */
function leaveTestedOut(sets: Map<string, SpecimenSet>, tested: Set<string>): void {
  if (tested.size === 0) return;
  for (const { special, specimens } of sets.values()) {
    if (Object.keys(special).length > 0) continue;
    const labels = [...specimens.keys()];
    const isMixed =
      [...tested].every((label) => specimens.has(label)) && labels.some((label) => !tested.has(label));
    if (isMixed) for (const label of tested) specimens.delete(label);
  }
}

function testedSpecimens(index: RecordIndex, trial: string): Set<string> {
  const tests = [
    'failure-load',
    'tensile-strength-dry',
    'tensile-strength-conditioned',
    'degree-of-saturation',
  ];
  const labels = tests.flatMap((quantity) =>
    index.ofTrial(quantity, trial).flatMap(({ at }) => (at.specimen === undefined ? [] : [at.specimen])),
  );
  return new Set(labels);
}

function gravityOf(set: SpecimenSet, at: Conditions): AnalysisNode | null {
  const labelled = [...set.specimens].filter(([label]) => label !== '');
  const used = labelled.length > 0 ? labelled : [...set.specimens];
  const nodes = used.flatMap(([label, readings]) => {
    const specimen = withoutGaps({ ...at, specimen: label === '' ? undefined : label });
    return fromMasses(readings, specimen) ?? asGiven(readings[gmb], specimen) ?? [];
  });
  return meanNode(nodes, at, { keepSpecimens: true, counted: true });
}

function fromMasses(readings: Record<string, Reading[]>, at: Conditions): AnalysisNode | null {
  const inputs = massesOf(readings);
  if (inputs === null) return null;
  return derivedNode({
    quantity: gmb,
    at,
    formula: 'A/(B − C)',
    inputs,
    compute: ([A, B, C]) => bulkSpecificGravity({ A: A!, B: B!, C: C! }),
  });
}

function absorptionOf(set: SpecimenSet, at: Conditions): AnalysisNode | null {
  const nodes = [...set.specimens].flatMap(([label, readings]) => {
    const inputs = massesOf(readings);
    if (inputs === null) return [];
    const node = derivedNode({
      quantity: 'specimen-absorption',
      at: withoutGaps({ ...at, specimen: label === '' ? undefined : label }),
      formula: '100·(B − A)/(B − C)',
      inputs,
      compute: ([A, B, C]) => specimenAbsorption({ A: A!, B: B!, C: C! }),
    });
    return node ?? [];
  });
  return meanNode(nodes, at, { keepSpecimens: true, counted: true });
}

/** A, B and C of one specimen; null unless each is there once. */
function massesOf(readings: Record<string, Reading[]>): AnalysisNode[] | null {
  const inputs = Object.entries(massSymbols).map(([quantity, symbol]) => {
    const masses = readings[quantity] ?? [];
    return masses.length === 1 ? readingNode(masses[0]!, symbol) : null;
  });
  const complete = inputs.filter((input) => input !== null);
  return complete.length === inputs.length ? complete : null;
}

function asGiven(readings: Reading[] | undefined, at: Conditions): AnalysisNode | null {
  const nodes = (readings ?? []).map((reading) => readingNode(reading));
  return meanNode(nodes, at, { keepSpecimens: false, counted: true });
}
