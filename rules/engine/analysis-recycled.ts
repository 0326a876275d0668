import { recycledBinderRatio } from '../calculations/recycled-binder-ratio';
import type { Reading } from '../record';
import { comparable, isSpecial, type RecordIndex } from './analysis-index';
import { type AnalysisNode, derivedNode, meanNode, readingNode } from './analysis-node';

/** Recycled binder ratio. Only what is stated enters, and the formula shows it: no shingles, no shingle term. */
export function recycledOf(index: RecordIndex, trial: string, pb: AnalysisNode | null): AnalysisNode | null {
  if (pb === null) return null;
  const materials = ['rap', 'ras'].map((material) => pairsOf(index, trial, material));
  if (materials.includes('incomplete')) return null;
  const pairs = materials.filter((material) => material !== 'incomplete').flat();
  if (pairs.length === 0) return noneOf(index, trial, pb);
  const terms = pairs.map(({ content, binder }) => `${content.symbol}·${binder.symbol}`);
  return derivedNode({
    quantity: 'recycled-binder-ratio',
    at: { trial },
    formula: `(${terms.join(' + ')})/(100·Pb)`,
    inputs: [...pairs.flatMap(({ content, binder }) => [content, binder]), pb],
    compute: (values) => recycledBinderRatio(materialsOf(values.slice(0, -1)), values.at(-1)!),
  });
}

/** Contents that are all stated as zero bring no binder, whatever the binder content of the material. */
function noneOf(index: RecordIndex, trial: string, pb: AnalysisNode): AnalysisNode | null {
  const contents = ['rap', 'ras'].flatMap((material) => {
    const readings = index.ofTrial(`${material}-content`, trial).filter((reading) => !isSpecial(reading));
    return average(readings) ?? [];
  });
  if (contents.length === 0) return null;
  return derivedNode({
    quantity: 'recycled-binder-ratio',
    at: { trial },
    formula: `(${contents.map(({ symbol }) => symbol).join(' + ')})/Pb`,
    inputs: [...contents, pb],
    compute: (values) =>
      recycledBinderRatio(
        values.slice(0, -1).map((contentPercent) => ({ contentPercent, binderPercent: 0 })),
        values.at(-1)!,
      ),
  });
}

interface RecycledPair {
  content: AnalysisNode;
  binder: AnalysisNode;
}

/** `incomplete` where some of it is in the mix and its binder content is missing. */
function pairsOf(index: RecordIndex, trial: string, material: string): RecycledPair[] | 'incomplete' {
  const contents = index.ofTrial(`${material}-content`, trial).filter((reading) => !isSpecial(reading));
  const binders = comparable(index.ofTrial(`${material}-binder-content`, trial));
  const pairs: RecycledPair[] = [];
  for (const stockpile of new Set(contents.map(({ at }) => at.stockpile))) {
    const content = average(contents.filter(({ at }) => at.stockpile === stockpile));
    const binder = average(bindersOf(binders, stockpile));
    if (content === null || (binder === null && content.value > 0)) return 'incomplete';
    if (binder !== null) pairs.push({ content, binder });
  }
  return pairs;
}

/** The stockpile's own results, else those that name none; a content that names none takes the only stockpile's. */
function bindersOf(binders: Reading[], stockpile: string | undefined): Reading[] {
  const own = binders.filter(({ at }) => at.stockpile === stockpile);
  if (own.length > 0) return own;
  if (stockpile !== undefined) return binders.filter(({ at }) => at.stockpile === undefined);
  return new Set(binders.map(({ at }) => at.stockpile)).size === 1 ? binders : [];
}

function average(readings: Reading[]): AnalysisNode | null {
  return meanNode(
    readings.map((reading) => readingNode(reading)),
    { ...readings[0]?.at, specimen: undefined },
    { keepSpecimens: false, counted: false },
  );
}

function materialsOf(values: number[]): { contentPercent: number; binderPercent: number }[] {
  const materials = [];
  for (let index = 0; index < values.length; index += 2) {
    materials.push({ contentPercent: values[index]!, binderPercent: values[index + 1]! });
  }
  return materials;
}
