import { crackingToleranceIndex, flexibilityIndex } from '../calculations/cracking-indices';
import { tensileStrength, tensileStrengthRatio } from '../calculations/tensile-strength';
import type { NumericResult } from '../numerics/numeric-result';
import type { Conditions, Reading } from '../record';
import { isSpecial, type RecordIndex, specialConditions, specialKey, withoutGaps } from './analysis-index';
import { type AnalysisNode, derivedNode, meanNode, readingNode } from './analysis-node';

export interface MoistureNodes {
  dry: AnalysisNode | null;
  conditioned: AnalysisNode | null;
  ratio: AnalysisNode | null;
}

/** Tensile strengths from loads and dimensions where given, else as given, and their ratio: mean over mean. */
export function moistureOf(index: RecordIndex, trial: string): MoistureNodes {
  const dry = subsetStrength(index, trial, 'tensile-strength-dry');
  const conditioned = subsetStrength(index, trial, 'tensile-strength-conditioned');
  const ratio =
    dry && conditioned
      ? derivedNode({
          quantity: 'tensile-strength-ratio',
          at: { trial },
          formula: '100·S2/S1',
          inputs: [conditioned, dry],
          compute: ([S2, S1]) => tensileStrengthRatio({ S1: S1!, S2: S2! }),
        })
      : null;
  return { dry, conditioned, ratio };
}

/** Cracking indices of a trial, one for each set of test conditions, each the mean over specimens. */
export function crackingOf(index: RecordIndex, trial: string): AnalysisNode[] {
  const sets = new Map<string, Reading[]>();
  for (const reading of index.ofTrial('fracture-energy', trial)) {
    sets.set(specialKey(reading), [...(sets.get(specialKey(reading)) ?? []), reading]);
  }
  return [...sets.values()].flatMap((energies) => {
    const at = withoutGaps({ trial, ...specialConditions(energies[0]!) });
    return indicesOf(index, trial, energies, at);
  });
}

type StrengthQuantity = 'tensile-strength-dry' | 'tensile-strength-conditioned';

const variants: Record<StrengthQuantity, string[]> = {
  'tensile-strength-dry': ['dry', 'unconditioned'],
  'tensile-strength-conditioned': ['wet', 'conditioned'],
};

function subsetStrength(index: RecordIndex, trial: string, quantity: StrengthQuantity): AnalysisNode | null {
  const given = index.ofTrial(quantity, trial);
  const loads = index
    .ofTrial('failure-load', trial)
    .filter((load) => isOfSubset(index, trial, load, quantity));
  const computed = loads.flatMap((load) => strengthOf(index, trial, load, quantity) ?? []);
  const done = new Set(computed.map(({ at }) => at.specimen));
  const others = given
    .filter(({ at }) => at.specimen !== undefined && !done.has(at.specimen))
    .map((reading) => readingNode(reading));
  const specimens = [...computed, ...others];
  const nodes = specimens.length > 0 ? specimens : given.map((reading) => readingNode(reading));
  return meanNode(nodes, { trial }, { keepSpecimens: true, counted: true });
}

/** By its variant; without one, by the specimen's stated strength, if only one subset knows the specimen. */
function isOfSubset(index: RecordIndex, trial: string, load: Reading, quantity: StrengthQuantity): boolean {
  const { variant, specimen } = load.at;
  if (variant !== undefined) return variants[quantity].includes(variant);
  if (specimen === undefined) return false;
  const knownIn = (Object.keys(variants) as StrengthQuantity[]).filter((subset) =>
    index.ofTrial(subset, trial).some(({ at }) => at.specimen === specimen),
  );
  return knownIn.length === 1 && knownIn[0] === quantity;
}

function strengthOf(
  index: RecordIndex,
  trial: string,
  load: Reading,
  quantity: StrengthQuantity,
): AnalysisNode | null {
  const thickness = dimensionOf(index, trial, 'specimen-thickness', load);
  const diameter = dimensionOf(index, trial, 'specimen-diameter', load);
  if (thickness === null || diameter === null) return null;
  return derivedNode({
    quantity,
    at: withoutGaps({ trial, specimen: load.at.specimen }),
    formula: '2·P/(π·t·D)',
    inputs: [readingNode(load, 'P'), readingNode(thickness, 't'), readingNode(diameter, 'D')],
    compute: ([P, t, D]) => tensileStrength({ P: P!, t: t!, D: D! }),
  });
}

/** The specimen's own dimension, else the one stated for all specimens. */
function dimensionOf(index: RecordIndex, trial: string, quantity: string, test: Reading): Reading | null {
  const readings = index.ofTrial(quantity, trial);
  const sameTest = (other: Reading) => !isSpecial(other) || specialKey(other) === specialKey(test);
  const own = readings.filter((other) => other.at.specimen === test.at.specimen && sameTest(other));
  const exact = own.filter((other) => specialKey(other) === specialKey(test));
  const candidates = exact.length > 0 ? exact : own;
  if (candidates.length === 1) return candidates[0]!;
  const common = readings.filter((other) => other.at.specimen === undefined && sameTest(other));
  return candidates.length === 0 && common.length === 1 ? common[0]! : null;
}

/** A displacement at 75 % of the peak tells the cracking tolerance test from the flexibility test. */
function indicesOf(index: RecordIndex, trial: string, energies: Reading[], at: Conditions): AnalysisNode[] {
  const nodes = energies.flatMap((energy) => {
    const find = (quantity: string) => dimensionOf(index, trial, quantity, energy);
    const slope = find('post-peak-slope');
    if (slope === null) return [];
    const specimen = withoutGaps({ ...at, specimen: energy.at.specimen });
    const displacement = find('post-peak-displacement');
    if (displacement === null) return flexibility(energy, slope, specimen) ?? [];
    const thickness = find('specimen-thickness');
    const diameter = find('specimen-diameter');
    if (thickness === null || diameter === null) return [];
    return tolerance([thickness, diameter, energy, displacement, slope], specimen) ?? [];
  });
  return ['cracking-tolerance-index', 'flexibility-index'].flatMap((quantity) => {
    const own = nodes.filter((node) => node.quantity === quantity);
    return meanNode(own, at, { keepSpecimens: true, counted: true }) ?? [];
  });
}

function tolerance(readings: Reading[], at: Conditions): AnalysisNode | null {
  const symbols = ['t', 'D', 'Gf', 'l75', 'm75'];
  return derivedNode({
    quantity: 'cracking-tolerance-index',
    at,
    formula: '(t/62)·(l75/D)·(Gf/|m75|)',
    inputs: readings.map((reading, place) => readingNode(reading, symbols[place]!)),
    compute: ([t, D, Gf, l75, m75]): NumericResult =>
      crackingToleranceIndex({ t: t!, D: D!, Gf: Gf!, l75: l75!, m75: m75! }),
  });
}

function flexibility(energy: Reading, slope: Reading, at: Conditions): AnalysisNode | null {
  return derivedNode({
    quantity: 'flexibility-index',
    at,
    formula: '0.01·Gf/|m|',
    inputs: [readingNode(energy, 'Gf'), readingNode(slope, 'm')],
    compute: ([Gf, m]) => flexibilityIndex({ Gf: Gf!, m: m! }),
  });
}
