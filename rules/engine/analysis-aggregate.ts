import { combinedAbsorption, combinedGravity } from '../calculations/combined-gravity';
import type { Conditions, MixRecord, Reading } from '../record';
import {
  averaged,
  combinedGradation,
  finenessOf,
  gradationOf,
  pairs,
  surfaceAreaOf,
} from './analysis-gradation';
import { comparable, type RecordIndex, withoutGaps } from './analysis-index';
import { type AnalysisNode, derivedNode, readingNode } from './analysis-node';

/** What the aggregate of one trial is: from its stockpiles where they are given, else as stated. */
export interface AggregateNodes {
  /** Blend that the trial is made of; null where the workbook has one or does not say which. */
  blend: string | null;
  shares: AnalysisNode[];
  gsb: AnalysisNode | null;
  gsa: AnalysisNode | null;
  absorption: AnalysisNode | null;
  /** Stated percent passing by sieve, else computed from the stockpiles. */
  passing(sieveMm: number): AnalysisNode | null;
  /** Percent passing of blend and stockpiles that the workbook states as retained. */
  passingFromRetained: AnalysisNode[];
  /** Percent passing computed from the stockpiles, by sieve. */
  combinedPassing: Map<number, AnalysisNode>;
  surfaceArea: AnalysisNode | null;
  /** Of each stockpile, and of the blend, for which the workbook states one. */
  finenessModuli: AnalysisNode[];
}

/** The aggregate of each trial; trials that state none of their own share one. */
export function aggregates(index: RecordIndex, blend: BlendChoice): (trial: string) => AggregateNodes {
  const owners = new Set(
    aggregateQuantities.flatMap((quantity) => index.all(quantity).map(({ at }) => at.trial ?? '')),
  );
  const shared = new Map<string, AggregateNodes>();
  return (trial) => {
    if (owners.has(trial)) return aggregateOf(index, trial, blend);
    const key = blend.of(trial) ?? '';
    const known = shared.get(key) ?? aggregateOf(index, trial, blend);
    shared.set(key, known);
    return known;
  };
}

const aggregateQuantities = [
  'stockpile-share',
  'bulk-specific-gravity-aggregate',
  'apparent-specific-gravity-aggregate',
  'water-absorption',
  'percent-passing',
  'percent-retained',
  'cumulative-percent-retained',
];

function aggregateOf(index: RecordIndex, trial: string, blend: BlendChoice): AggregateNodes {
  const chosen = blend.of(trial);
  const select = (quantity: string) =>
    chosen === 'unknown' ? [] : index.ofTrial(quantity, trial).filter(({ at }) => inBlend(at, chosen));
  const shares = sharesOf(select('stockpile-share'));
  const at = withoutGaps({ blend: chosen ?? undefined });
  const combine = (quantity: string, formula: string, method: typeof combinedGravity) =>
    combinedOf({ quantity, at, formula, shares, readings: select(quantity), method });
  const gravity = '100/Σ(Pi/Gi)';
  const withoutNumber = (quantity: string) =>
    index
      .withoutNumber(quantity)
      .filter((reading) => (reading.at.trial ?? trial) === trial && inBlend(reading.at, chosen));
  const passing = gradationOf(select, withoutNumber);
  const combined = combinedGradation(passing, shares, at);
  const atSieve = (sieveMm: number) => passing.stated(sieveMm) ?? combined.get(sieveMm) ?? null;
  return {
    blend: chosen,
    shares,
    gsb:
      combine('bulk-specific-gravity-aggregate', gravity, combinedGravity) ??
      statedOf(select('bulk-specific-gravity-aggregate')),
    gsa:
      combine('apparent-specific-gravity-aggregate', gravity, combinedGravity) ??
      statedOf(select('apparent-specific-gravity-aggregate')),
    absorption:
      combine('water-absorption', 'Σ(Pi·ai)/ΣPi', combinedAbsorption) ?? statedOf(select('water-absorption')),
    passing: atSieve,
    passingFromRetained: passing.fromRetained,
    combinedPassing: combined,
    surfaceArea: surfaceAreaOf(atSieve, at),
    finenessModuli: select('fineness-modulus').flatMap((stated) => finenessOf(stated, passing, at) ?? []),
  };
}

/** Which blend each trial is made of: a name, null for the only one, `unknown` where nothing says which. */
export interface BlendChoice {
  of(trial: string): string | null | 'unknown';
}

/**
 * The workbook's blends. With several, a trial is made of the one that its own readings name, and the design of
 * the one that the job mix names.
 */
export function blendChoice(record: MixRecord, index: RecordIndex): BlendChoice {
  const shares = index.all('stockpile-share');
  const names = new Set(shares.flatMap(({ at }) => (at.blend === undefined ? [] : [at.blend])));
  if (names.size <= 1) return { of: () => [...names][0] ?? null };
  const named = new Map<string, Set<string>>();
  for (const { at } of record.readings) {
    if (at.blend === undefined || at.trial === undefined) continue;
    named.set(at.trial, (named.get(at.trial) ?? new Set()).add(at.blend));
  }
  return {
    of: (trial) => {
      const own = named.get(trial);
      return own?.size === 1 ? [...own][0]! : 'unknown';
    },
  };
}

function inBlend(at: Conditions, blend: string | null | 'unknown'): boolean {
  return at.blend === undefined || at.blend === blend;
}

function sharesOf(readings: Reading[]): AnalysisNode[] {
  const withStockpile = readings.filter(({ at }) => at.stockpile !== undefined);
  const seen = new Set(withStockpile.map(({ at }) => at.stockpile));
  // Two shares for one stockpile: nothing says which is meant.
  return seen.size === withStockpile.length ? withStockpile.map((reading) => readingNode(reading, 'Pi')) : [];
}

/** The value stated for the blend as a whole. */
function statedOf(readings: Reading[]): AnalysisNode | null {
  const whole = comparable(readings.filter(({ at }) => at.stockpile === undefined));
  return whole.length === 0 ? null : averaged(whole, { ...whole[0]!.at, specimen: undefined });
}

interface Combination {
  quantity: string;
  at: Conditions;
  formula: string;
  shares: AnalysisNode[];
  readings: Reading[];
  method: typeof combinedGravity;
}

/** Null where a stockpile in use has no value of its own: a mean over the others would be another blend. */
function combinedOf({ quantity, at, formula, shares, readings, method }: Combination): AnalysisNode | null {
  const used = shares.filter(({ value }) => value > 0);
  if (used.length === 0) return null;
  const values = used.map(({ at: { stockpile } }) => {
    const own = comparable(readings.filter((reading) => reading.at.stockpile === stockpile));
    return own.length === 0 ? null : averaged(own, { stockpile });
  });
  const complete = values.filter((value) => value !== null);
  if (complete.length < used.length) return null;
  return derivedNode({
    quantity,
    at,
    formula,
    inputs: [...used, ...complete],
    compute: (numbers) => method(pairs(numbers)),
  });
}
