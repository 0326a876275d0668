import { relativeDensity } from '../calculations/relative-density';
import { known } from '../numerics/numeric-result';
import type { Conditions } from '../record';
import type { CompactedSet } from './analysis-compaction';
import { isSpecial, type NamedGyrations, type RecordIndex, withoutGaps } from './analysis-index';
import { type AnalysisNode, derivedNode, derivedPerSpecimen, meanNode, readingNode } from './analysis-node';

/**
 * One value for each number of gyrations: from specimens compacted to that number, else by heights, of the
 * volumetric specimens before others.
 */
export function densitiesOf(
  index: RecordIndex,
  trial: string,
  sets: CompactedSet[],
  gmm: AnalysisNode,
): AnalysisNode[] {
  const plain = sets
    .filter((set) => Object.keys(set.at).every((key) => key === 'trial' || key === 'gyrations'))
    .toSorted((a, b) => Number(b.volumetric) - Number(a.volumetric));
  const found = plain.map((set) => ({ set, nodes: relativeDensities(index, trial, set, gmm) }));
  const isOwn = (set: CompactedSet, node: AnalysisNode) => node.at.gyrations === set.gyrations;
  const ordered = [
    ...found.flatMap(({ set, nodes }) => nodes.filter((node) => isOwn(set, node))),
    ...found.flatMap(({ set, nodes }) => nodes.filter((node) => !isOwn(set, node))),
  ];
  const first = new Map<string, AnalysisNode>();
  for (const node of ordered) {
    const key = String(node.at.gyrations);
    if (!first.has(key)) first.set(key, node);
  }
  return [...first.values()];
}

/**
 * Relative density at each number of gyrations that the set's heights reach, and at its own.
 *
 * Gmb belongs to the gyrations at which it was measured; heights carry it to the others.
 */
function relativeDensities(
  index: RecordIndex,
  trial: string,
  set: CompactedSet,
  gmm: AnalysisNode,
): AnalysisNode[] {
  const heights = heightsOf(index, trial);
  const reached = new Set([...heights.values()].flatMap((byGyrations) => [...byGyrations.keys()]));
  const isGyratory = reached.size > 0 || set.at.gyrations !== undefined || index.gyrations.size > 0;
  if (isGyratory) reached.add(set.gyrations);
  return [...reached].flatMap((gyrations) => {
    const at = withoutGaps({ ...set.at, gyrations });
    if (gyrations === set.gyrations) return ownDensity(set, gmm, at) ?? [];
    return densityByHeights(set, gmm, heights, gyrations, at) ?? [];
  });
}

type Heights = Map<string, Map<NamedGyrations | number, AnalysisNode>>;

/** Heights by specimen, `""` for a stack of heights that names none. */
function heightsOf(index: RecordIndex, trial: string): Heights {
  const heights: Heights = new Map();
  for (const reading of index.ofTrial('specimen-height', trial)) {
    const gyrations = index.gyrationsKey(reading.at.gyrations);
    if (gyrations === undefined || isSpecial(reading)) continue;
    const label = reading.at.specimen ?? '';
    const byGyrations = heights.get(label) ?? new Map<NamedGyrations | number, AnalysisNode>();
    heights.set(label, byGyrations);
    if (!byGyrations.has(gyrations)) byGyrations.set(gyrations, readingNode(reading, `h,${gyrations}`));
  }
  return heights;
}

function ownDensity(set: CompactedSet, gmm: AnalysisNode, at: Conditions): AnalysisNode | null {
  return derivedPerSpecimen({
    quantity: 'relative-density',
    at,
    formula: '100·Gmb/Gmm',
    inputs: [set.gmb, gmm],
    compute: ([Gmb, Gmm]) =>
      Gmm! > 0 ? known((100 * Gmb!) / Gmm!) : { ok: false, reason: 'Gmm must be above zero' },
  });
}

function densityByHeights(
  set: CompactedSet,
  gmm: AnalysisNode,
  heights: Heights,
  gyrations: NamedGyrations | number,
  at: Conditions,
): AnalysisNode | null {
  const specimens = set.gmb.specimens.length > 0 ? set.gmb.specimens : [set.gmb];
  const nodes = specimens.flatMap((specimen) => {
    const stack = heights.get(specimen.at.specimen ?? '') ?? heights.get('');
    const reference = stack?.get(set.gyrations);
    const height = stack?.get(gyrations);
    if (!reference || !height) return [];
    const node = derivedNode({
      quantity: 'relative-density',
      at: withoutGaps({ ...at, specimen: specimen.at.specimen }),
      formula: `100·Gmb·${reference.symbol}/(Gmm·${height.symbol})`,
      inputs: [specimen, gmm, reference, height],
      compute: ([Gmb, Gmm, hRef, hN]) => relativeDensity({ Gmb: Gmb!, Gmm: Gmm!, hRef: hRef!, hN: hN! }),
    });
    return node ?? [];
  });
  return meanNode(nodes, at, { keepSpecimens: true, counted: true });
}
