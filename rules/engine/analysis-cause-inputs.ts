import { decimalsOf, roundTo } from '../numerics/round';
import type { CauseInputs } from './analysis-cause-table';
import { displayedUnit } from './analysis-digits';
import type { AnalysisNode } from './analysis-node';

/**
 * The numbers behind a value, for the table of named causes: its own inputs, all the way down, by symbol, then
 * what else is known of its trial.
 */
export function causeInputsOf(node: AnalysisNode, trialNodes: AnalysisNode[]): CauseInputs {
  const values = new Map<string, number>();
  // What an interpolated value rests on belongs to other trials: only its own trial's values say anything.
  const isInterpolated = node.origin === 'interpolated';
  if (!isInterpolated) collect(node, values);
  const inTrial = new Map(trialNodes.map((other) => [other.quantity, other]));
  const get = (symbol: string, quantity?: string) =>
    values.get(symbol) ?? (quantity ? inTrial.get(quantity)?.value : undefined) ?? Number.NaN;
  const ofBlend = (quantity: string) =>
    (isInterpolated ? undefined : findNode(node, quantity)) ?? inTrial.get(quantity);
  const gsb = ofBlend('bulk-specific-gravity-aggregate');
  const gsa = ofBlend('apparent-specific-gravity-aggregate');
  const fines = trialNodes.find(({ quantity, at }) => quantity === 'percent-passing' && at.sieve === 0.075);
  const va = inTrial.get('air-voids');
  const vma = inTrial.get('voids-in-mineral-aggregate');
  return {
    own: node.value,
    Pb: get('Pb', 'binder-content'),
    Gb: get('Gb', 'binder-specific-gravity'),
    Gmm: get('Gmm', 'maximum-specific-gravity'),
    Gmb: get('Gmb', 'bulk-specific-gravity-mix'),
    Gsb: gsb?.value ?? Number.NaN,
    Gsa: gsa?.value ?? Number.NaN,
    Gse: get('Gse', 'effective-specific-gravity-aggregate'),
    Pba: get('Pba', 'absorbed-binder'),
    Pbe: get('Pbe', 'effective-binder-content'),
    Va: get('Va', 'air-voids'),
    VMA: get('VMA', 'voids-in-mineral-aggregate'),
    P0075: values.get('P0.075') ?? fines?.value ?? Number.NaN,
    SA: get('SA', 'surface-area'),
    GsbArithmetic: weightedMean(gsb),
    GsaArithmetic: weightedMean(gsa),
    absorptionUnweighted: unweightedMean(node),
    VaShown: shown(get('Va', 'air-voids'), va),
    VMAShown: shown(get('VMA', 'voids-in-mineral-aggregate'), vma),
    VaOfRatios: pairedVoids(node),
    PbeShown: shown(get('Pbe', 'effective-binder-content'), inTrial.get('effective-binder-content')),
    GmmShown: shown(get('Gmm', 'maximum-specific-gravity'), inTrial.get('maximum-specific-gravity'), 0.001),
    GmbShown: shown(get('Gmb', 'bulk-specific-gravity-mix'), inTrial.get('bulk-specific-gravity-mix'), 0.001),
    S1: get('S1'),
    S2: get('S2'),
    ratioOfPairs: pairedRatio(node),
    ...recycled(node),
    A: get('A'),
    B: get('B'),
    C: get('C'),
    ...heightsOf(node),
    P: get('P'),
    t: get('t'),
    D: get('D'),
  };
}

/** Nearest first: a value of the node itself goes before the same symbol deeper down. */
function collect(node: AnalysisNode, values: Map<string, number>): void {
  for (const input of node.inputs) if (!values.has(input.symbol)) values.set(input.symbol, input.value);
  for (const input of node.inputs) if (input.symbol !== node.symbol) collect(input, values);
}

function findNode(node: AnalysisNode, quantity: string): AnalysisNode | undefined {
  if (node.quantity === quantity && node.inputs.length > 0) return node;
  for (const input of node.inputs) {
    if (input.quantity === quantity) return input;
    const found = findNode(input, quantity);
    if (found) return found;
  }
  return undefined;
}

/** Of a combined gravity: first half of its inputs shares, second half values. */
function weightedMean(combined: AnalysisNode | undefined): number {
  const half = (combined?.inputs.length ?? 0) / 2;
  if (!combined || half === 0 || combined.inputs[0]!.quantity !== 'stockpile-share') return Number.NaN;
  let weighted = 0;
  let total = 0;
  for (let place = 0; place < half; place += 1) {
    weighted += combined.inputs[place]!.value * combined.inputs[half + place]!.value;
    total += combined.inputs[place]!.value;
  }
  return weighted / total;
}

function unweightedMean(node: AnalysisNode): number {
  const values = node.quantity === 'water-absorption' ? node.inputs.slice(node.inputs.length / 2) : [];
  return values.reduce((sum, { value }) => sum + value, 0) / values.length;
}

/** With the decimals that the workbook shows its own value with; the usual ones where it shows none. */
function shown(value: number, node: AnalysisNode | undefined, usual = 0.1): number {
  if (!Number.isFinite(value)) return Number.NaN;
  const to = node?.reported?.source ? displayedUnit(node.reported) : usual;
  return decimalsOf(to) > 6 ? value : roundTo({ value, to, method: 'rounding' });
}

function pairedVoids(node: AnalysisNode): number {
  if (node.quantity !== 'air-voids') return Number.NaN;
  const [gmm, gmb] = node.inputs;
  return pairedMean(gmb, gmm, (Gmb, Gmm) => (100 * (Gmm - Gmb)) / Gmm);
}

function pairedRatio(node: AnalysisNode): number {
  if (node.quantity !== 'tensile-strength-ratio') return Number.NaN;
  const [conditioned, dry] = node.inputs;
  return pairedMean(conditioned, dry, (S2, S1) => (100 * S2) / S1);
}

function pairedMean(
  first: AnalysisNode | undefined,
  second: AnalysisNode | undefined,
  compute: (first: number, second: number) => number,
): number {
  const left = first?.inputs ?? [];
  const right = second?.inputs ?? [];
  if (left.length < 2 || left.length !== right.length) return Number.NaN;
  return left.reduce((sum, { value }, place) => sum + compute(value, right[place]!.value), 0) / left.length;
}

/** Of a mean over specimens: the means, and the mean of each specimen's density with its heights turned round. */
function heightsOf(node: AnalysisNode): { hRef: number; hN: number; densityTurnedRound: number } {
  const specimens =
    node.inputs[2] === undefined || node.formula?.startsWith('mean of') ? node.inputs : [node];
  const isOfHeights =
    node.quantity === 'relative-density' && specimens.every(({ inputs }) => inputs.length === 4);
  if (!isOfHeights) return { hRef: Number.NaN, hN: Number.NaN, densityTurnedRound: Number.NaN };
  const average = (of: (values: number[]) => number) =>
    specimens.reduce((sum, { inputs }) => sum + of(inputs.map(({ value }) => value)), 0) / specimens.length;
  return {
    hRef: average(([, , hRef]) => hRef!),
    hN: average(([, , , hN]) => hN!),
    densityTurnedRound: average(([Gmb, Gmm, hRef, hN]) => (100 * Gmb! * hN!) / (Gmm! * hRef!)),
  };
}

function recycled(node: AnalysisNode): { recycledContent: number; recycledBinder: number } {
  if (node.quantity !== 'recycled-binder-ratio') {
    return { recycledContent: Number.NaN, recycledBinder: Number.NaN };
  }
  let recycledContent = 0;
  let recycledBinder = 0;
  for (let place = 0; place + 1 < node.inputs.length; place += 2) {
    recycledContent += node.inputs[place]!.value;
    recycledBinder += (node.inputs[place]!.value * node.inputs[place + 1]!.value) / 100;
  }
  return { recycledContent, recycledBinder };
}
