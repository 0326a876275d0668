import { complianceFromStrain } from '../calculations/creep-compliance';
import type { Conditions, Reading } from '../record';
import { type RecordIndex, specialConditions, specialKey, withoutGaps } from './analysis-index';
import { indirectTensionOf } from './analysis-indirect-tension';
import { type AnalysisNode, derivedNode, meanNode, readingNode } from './analysis-node';

/** Creep readings that are there and still give no compliance, with the reason. */
export interface CreepFailure {
  quantity: string;
  at: Conditions;
  /** A sentence. */
  reason: string;
}

export interface CreepNodes {
  nodes: AnalysisNode[];
  failures: CreepFailure[];
}

/**
 * Creep compliances of a trial from what was measured: from strain and stress for each specimen, and their mean, at
 * each loading time; from indirect-tension deformations one a loading time over all specimens and faces.
 */
export function creepOf(index: RecordIndex, trial: string): CreepNodes {
  const strains = index.ofTrial('creep-strain', trial);
  const deformations = index.ofTrial('horizontal-deformation', trial);
  if (strains.length === 0 && deformations.length === 0) return { nodes: [], failures: [] };
  const tests = new Map<string, Reading[]>();
  for (const reading of strains) {
    const key = specialKey(reading);
    const known = tests.get(key);
    if (known) known.push(reading);
    else tests.set(key, [reading]);
  }
  const ofStrains = [...tests.values()].map((readings) => complianceOf(readings, trial));
  const ofDeformations = indirectTensionOf(index, trial);
  return {
    nodes: [...ofStrains.flatMap(({ node }) => node ?? []), ...ofDeformations.nodes],
    failures: [...ofStrains.flatMap(({ failure }) => failure ?? []), ...ofDeformations.failures],
  };
}

/** The stress as an input of its own: it is a condition of the readings and has no cell that is known. */
export function stressNode(reading: Reading, stress: number): AnalysisNode {
  return {
    ...readingNode(reading, 'σ0'),
    quantity: 'stress',
    unit: 'kPa',
    at: {},
    value: stress,
    reading: null,
  };
}

type Compliance = { node: AnalysisNode; failure: null } | { node: null; failure: CreepFailure };

/** The specimens at one temperature, stress and loading time, and their mean. */
function complianceOf(readings: Reading[], trial: string): Compliance {
  const at = withoutGaps({ trial, ...specialConditions(readings[0]!) });
  const failed = (reason: string): Compliance => ({
    node: null,
    failure: { quantity: 'creep-strain', at, reason },
  });
  if (at.stress === undefined) return failed('A reading of creep strain does not say under which stress.');
  const specimens = oneASpecimen(readings);
  if (!specimens.ok) return failed(specimens.reason);
  const nodes = specimens.readings.map((reading) => specimenCompliance(reading, at, at.stress!));
  const known = nodes.filter((node) => node !== null);
  if (known.length < nodes.length) return failed('A stress of creep strain is not above zero.');
  const node = meanNode(known, at, { keepSpecimens: true, counted: true });
  return node === null ? failed('There is no creep strain.') : { node, failure: null };
}

function specimenCompliance(reading: Reading, at: Conditions, stress: number): AnalysisNode | null {
  return derivedNode({
    quantity: 'creep-compliance',
    at: withoutGaps({ ...at, specimen: reading.at.specimen }),
    formula: 'εt/σ0',
    inputs: [readingNode(reading), stressNode(reading, stress)],
    compute: ([strain, applied]) => complianceFromStrain({ strain: strain!, stress: applied! }),
  });
}

/** Each specimen once; a value without a specimen beside some with one is their stated mean, not one more. */
function oneASpecimen(
  readings: Reading[],
): { ok: true; readings: Reading[] } | { ok: false; reason: string } {
  const labelled = readings.filter(({ at }) => at.specimen !== undefined);
  const bySpecimen = new Map<string, Reading>();
  for (const reading of labelled.length > 0 ? labelled : readings) {
    const key = reading.at.specimen ?? '';
    const earlier = bySpecimen.get(key);
    if (earlier !== undefined && earlier.value !== reading.value) {
      const of = key === '' ? '' : ` of specimen ${key}`;
      return { ok: false, reason: `Two readings of creep strain${of} at the same loading time disagree.` };
    }
    bySpecimen.set(key, reading);
  }
  return { ok: true, readings: [...bySpecimen.values()] };
}
