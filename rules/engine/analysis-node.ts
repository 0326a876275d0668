import { mean } from '../numerics/mean';
import type { NumericResult } from '../numerics/numeric-result';
import { quantityById } from '../quantities/registry';
import type { Conditions, Origin, Reading } from '../record';
import type { Evidence } from './finding';

/** One value with everything it was made of, down to the readings. */
export interface AnalysisNode {
  quantity: string;
  symbol: string;
  unit: string;
  at: Conditions;
  value: number;
  origin: Origin;
  /** Trade symbols; null for a reading. */
  formula: string | null;
  inputs: AnalysisNode[];
  compute: ((values: number[]) => NumericResult) | null;
  reading: Reading | null;
  /** Specimens behind it; null where it does not rest on specimens (a gravity, a binder content). */
  count: number | null;
  /** One value per specimen, where each specimen has its own. */
  specimens: AnalysisNode[];
  reported: Reading | null;
}

/** A reading as it stands. Only readings with a number may be passed. */
export function readingNode(reading: Reading, symbol?: string): AnalysisNode {
  return {
    quantity: reading.quantity,
    symbol: symbol ?? symbolOf(reading.quantity),
    unit: reading.unit,
    at: reading.at,
    value: reading.value!,
    origin: reading.origin,
    formula: null,
    inputs: [],
    compute: null,
    reading,
    count: null,
    specimens: [],
    reported: null,
  };
}

export interface Derivation {
  quantity: string;
  at: Conditions;
  formula: string;
  inputs: AnalysisNode[];
  compute: (values: number[]) => NumericResult;
  origin?: Origin;
  symbol?: string;
}

/** A value computed from its inputs, or null where they allow none. */
export function derivedNode(derivation: Derivation): AnalysisNode | null {
  const { quantity, at, formula, inputs, compute, origin = 'recomputed', symbol } = derivation;
  const result = compute(inputs.map((input) => input.value));
  if (!result.ok) return null;
  return {
    quantity,
    symbol: symbol ?? symbolOf(quantity),
    unit: quantityById(quantity)?.unit ?? '1',
    at,
    value: result.value,
    origin,
    formula,
    inputs,
    compute,
    reading: null,
    count: fewest(inputs),
    specimens: [],
    reported: null,
  };
}

/**
 * A value computed from the inputs' means, and once for each specimen that the inputs know. An input without
 * specimens of its own (Gmm, Pb, a gravity) serves all of them.
 */
export function derivedPerSpecimen(derivation: Derivation): AnalysisNode | null {
  const whole = derivedNode(derivation);
  if (whole === null) return null;
  const leading = derivation.inputs.find((input) => input.specimens.length > 0);
  if (leading === undefined) return whole;
  whole.specimens = leading.specimens.flatMap(({ at: { specimen } }) => {
    const inputs = derivation.inputs.map((input) => ofSpecimen(input, specimen));
    if (inputs.some((input) => input === null)) return [];
    const node = derivedNode({
      ...derivation,
      at: { ...derivation.at, specimen },
      inputs: inputs.filter((input) => input !== null),
    });
    return node === null ? [] : [node];
  });
  return whole;
}

/** The mean of specimens or of repeated readings; a single one is returned as it is. */
export function meanNode(
  nodes: AnalysisNode[],
  at: Conditions,
  options: { keepSpecimens: boolean; counted: boolean },
): AnalysisNode | null {
  const [first] = nodes;
  if (first === undefined) return null;
  const labelled = nodes.some((node) => node.at.specimen !== undefined);
  const count = options.counted && (labelled || nodes.length > 1) ? nodes.length : null;
  const specimens = options.keepSpecimens && labelled ? nodes : [];
  if (nodes.length === 1) return { ...first, at, count, specimens };
  const node = derivedNode({
    quantity: first.quantity,
    symbol: first.symbol,
    at,
    formula: `mean of ${nodes.length}`,
    inputs: nodes,
    compute: mean,
  });
  return node === null ? null : { ...node, unit: first.unit, count, specimens };
}

/** The value as it would be with another number for one of its inputs, wherever that stands; null where there is none. */
export function valueWith(
  node: AnalysisNode,
  moved: ReadonlySet<AnalysisNode>,
  value: number,
): number | null {
  if (moved.has(node)) return value;
  if (node.compute === null) return node.value;
  const inputs: number[] = [];
  for (const input of node.inputs) {
    const own = valueWith(input, moved, value);
    if (own === null) return null;
    inputs.push(own);
  }
  const result = node.compute(inputs);
  return result.ok ? result.value : null;
}

/** The thread from this value down to the cells, built once. */
export function evidenceOf(node: AnalysisNode): Evidence {
  const known = evidences.get(node);
  if (known) return known;
  const evidence: Evidence = {
    quantity: node.quantity,
    value: node.value,
    unit: node.unit,
    at: node.at,
    origin: node.origin,
    symbol: node.symbol,
    source: node.reading?.source ?? null,
  };
  if (node.reading?.method !== undefined) evidence.method = node.reading.method;
  if (node.formula !== null) {
    evidence.formula = node.formula;
    evidence.inputs = node.inputs.map(evidenceOf);
  }
  const { reported } = node;
  if (reported?.value != null) {
    const text = reported.source?.text ?? String(reported.value);
    evidence.reported = { value: reported.value, text, source: reported.source };
  }
  evidences.set(node, evidence);
  return evidence;
}

const evidences = new WeakMap<AnalysisNode, Evidence>();
function ofSpecimen(input: AnalysisNode, specimen: string | undefined): AnalysisNode | null {
  if (input.specimens.length === 0) return input;
  return input.specimens.find((node) => node.at.specimen === specimen) ?? null;
}

function fewest(inputs: AnalysisNode[]): number | null {
  const counts = inputs.flatMap((input) => (input.count === null ? [] : [input.count]));
  return counts.length === 0 ? null : Math.min(...counts);
}

function symbolOf(quantity: string): string {
  return quantityById(quantity)?.symbol ?? quantity;
}
