import { combinedPassing, finenessModulus } from '../calculations/gradation';
import { surfaceArea, surfaceAreaFactors } from '../calculations/surface-area';
import { cannot, known, type NumericResult } from '../numerics/numeric-result';
import type { Conditions, Reading } from '../record';
import { comparable, withoutGaps } from './analysis-index';
import { type AnalysisNode, derivedNode, meanNode, readingNode } from './analysis-node';

/** Percent passing as the workbook gives it, of the blend and of each stockpile. */
export interface Gradation {
  /** Percent passing of the blend as stated, as passing or as retained. */
  stated(sieveMm: number): AnalysisNode | null;
  ofStockpile(stockpile: string, sieveMm: number): AnalysisNode | null;
  sieves: number[];
  /** All sieves of a stockpile, or of the blend as stated. */
  stack(stockpile: string | undefined): AnalysisNode[];
  /** What was stated as retained, as percent passing. */
  fromRetained: AnalysisNode[];
}

export function gradationOf(
  select: (quantity: string) => Reading[],
  withoutNumber: (quantity: string) => Reading[],
): Gradation {
  const stacks = new Map<string | undefined, Map<number, AnalysisNode>>();
  const put = (node: AnalysisNode) => {
    const stack = stacks.get(node.at.stockpile) ?? new Map<number, AnalysisNode>();
    stacks.set(node.at.stockpile, stack);
    if (!stack.has(node.at.sieve!)) stack.set(node.at.sieve!, node);
  };
  for (const node of sievedNodes(comparable(select('percent-passing')))) put(node);
  for (const node of sievedNodes(comparable(select('cumulative-percent-retained')))) put(passingFrom(node));
  const individual = sievedNodes(comparable(select('percent-retained')));
  for (const node of fromIndividual(individual, withoutNumber('percent-retained'))) put(node);
  const at = (stockpile: string | undefined, sieveMm: number) => stacks.get(stockpile)?.get(sieveMm) ?? null;
  const sieves = new Set([...stacks.values()].flatMap((stack) => [...stack.keys()]));
  return {
    stated: (sieveMm) => at(undefined, sieveMm),
    ofStockpile: at,
    stack: (stockpile) => [...(stacks.get(stockpile)?.values() ?? [])],
    fromRetained: [...stacks.values()].flatMap((stack) =>
      [...stack.values()].filter(({ formula }) => formula?.startsWith(FROM_RETAINED)),
    ),
    sieves: [...sieves].sort((a, b) => b - a),
  };
}

/** How percent passing follows from what is retained, alone or with all that stays above. */
const FROM_RETAINED = '100 − ';

/** One node per stockpile and sieve, the mean where several samples were sieved. */
function sievedNodes(readings: Reading[]): AnalysisNode[] {
  const groups = new Map<string, Reading[]>();
  for (const reading of readings) {
    if (reading.at.sieve === undefined) continue;
    const key = `${reading.at.stockpile ?? ''}|${reading.at.sieve}`;
    const group = groups.get(key);
    if (group) group.push(reading);
    else groups.set(key, [reading]);
  }
  return [...groups.values()].flatMap(
    (group) => averaged(group, { ...group[0]!.at, specimen: undefined }) ?? [],
  );
}

function passingFrom(node: AnalysisNode): AnalysisNode {
  return derivedNode({
    quantity: 'percent-passing',
    at: node.at,
    formula: `${FROM_RETAINED}CR`,
    origin: 'converted',
    inputs: [node],
    compute: ([retained]) => known(100 - retained!),
  })!;
}

/**
 * A stack of individual percents retained: what passes a sieve is 100 less all that stays on it and above. With one
 * of these that is no number, too much would seem to pass: such a sieve has no value.
 */
function fromIndividual(nodes: AnalysisNode[], withoutNumber: Reading[]): AnalysisNode[] {
  return nodes.flatMap((node) => {
    const isOpen = withoutNumber.some(
      ({ at }) => at.stockpile === node.at.stockpile && (at.sieve ?? 0) >= node.at.sieve!,
    );
    if (isOpen) return [];
    const above = nodes.filter(
      (other) => other.at.stockpile === node.at.stockpile && other.at.sieve! >= node.at.sieve!,
    );
    const passing = derivedNode({
      quantity: 'percent-passing',
      at: node.at,
      formula: `${FROM_RETAINED}ΣR`,
      origin: 'converted',
      inputs: above,
      compute: (retained) => known(100 - retained.reduce((sum, value) => sum + value, 0)),
    });
    return passing ?? [];
  });
}

/** Percent passing of the blend at each sieve that all its stockpiles have. */
export function combinedGradation(
  gradation: Gradation,
  shares: AnalysisNode[],
  at: Conditions,
): Map<number, AnalysisNode> {
  const combined = new Map<number, AnalysisNode>();
  const used = shares.filter(({ value }) => value > 0);
  if (used.length === 0) return combined;
  for (const sieve of gradation.sieves) {
    const values = used.map((share) => gradation.ofStockpile(share.at.stockpile!, sieve));
    const complete = values.filter((value) => value !== null);
    if (complete.length < used.length) continue;
    const node = derivedNode({
      quantity: 'percent-passing',
      at: { ...at, sieve },
      formula: 'Σ(Pi·P)/100',
      inputs: [...used, ...complete],
      compute: (numbers) => combinedPassing(pairs(numbers)),
    });
    if (node) combined.set(sieve, node);
  }
  return combined;
}

export function finenessOf(stated: Reading, gradation: Gradation, at: Conditions): AnalysisNode | null {
  const inputs = gradation.stack(stated.at.stockpile);
  const openings = inputs.map((input) => input.at.sieve!);
  return derivedNode({
    quantity: 'fineness-modulus',
    at: withoutGaps({ ...at, stockpile: stated.at.stockpile }),
    formula: 'Σ cumulative percent retained/100',
    inputs,
    compute: (values) =>
      finenessModulus(openings.map((openingMm, index) => ({ openingMm, passingPercent: values[index]! }))),
  });
}

export function surfaceAreaOf(
  passing: (sieveMm: number) => AnalysisNode | null,
  at: Conditions,
): AnalysisNode | null {
  const inputs = surfaceAreaFactors.map(([openingMm]) => passing(openingMm));
  const complete = inputs.filter((input) => input !== null);
  if (complete.length < inputs.length) return null;
  return derivedNode({
    quantity: 'surface-area',
    at,
    formula: '0.41 + Σ factor·P/100',
    inputs: complete,
    compute: (values) => surfaceAreaFrom(values),
  });
}

function surfaceAreaFrom(values: number[]): NumericResult {
  if (values.length !== surfaceAreaFactors.length) return cannot('a sieve is missing');
  return surfaceArea(
    surfaceAreaFactors.map(([openingMm], index) => ({ openingMm, passingPercent: values[index]! })),
  );
}

/** First half shares, second half the stockpiles' values, in the same order. */
export function pairs(numbers: number[]): { share: number; value: number }[] {
  const half = numbers.length / 2;
  return numbers.slice(0, half).map((share, index) => ({ share, value: numbers[half + index]! }));
}

/** The mean of samples of one material. */
export function averaged(readings: Reading[], at: Conditions): AnalysisNode | null {
  return meanNode(
    readings.map((reading) => readingNode(reading)),
    withoutGaps(at),
    { keepSpecimens: false, counted: false },
  );
}
