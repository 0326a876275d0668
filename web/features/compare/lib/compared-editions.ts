import { compareEditions, type EditionComparison } from '#rules/authoring/compare-editions';
import { type ResolvedEdition, resolveEdition } from '#rules/rule-sets/resolve';
import { isLayer, type Layer, type RuleSet } from '#rules/rule-sets/schema';

type Document = RuleSet | Layer;

/** Two documents as they would judge: a layer over the base that it names, a base by itself. */
export function comparedEditions(
  before: { document: Document; base: Document | null },
  after: { document: Document; base: Document | null },
): EditionComparison | null {
  const old = resolved(before);
  const now = resolved(after);
  return old && now ? compareEditions(old, now) : null;
}

function resolved({ document, base }: { document: Document; base: Document | null }): ResolvedEdition | null {
  if (!isLayer(document)) return editionOf(document, []);
  return base === null ? null : editionOf(base, [document]);
}

function editionOf(base: Document, layers: Layer[]): ResolvedEdition | null {
  const resolution = resolveEdition(base, layers);
  return resolution.ok ? resolution.edition : null;
}

/** One stretch of a sentence that stands in one version, or in both. */
export interface Stretch {
  text: string;
  in: 'both' | 'before' | 'after';
}

/** Two wordings word by word: what only the older says, then what only the newer says, at each place. */
export function wordDifference(before: string, after: string): Stretch[] {
  const old = before.split(/(?<=\s)/);
  const now = after.split(/(?<=\s)/);
  const common = commonLengths(old, now);
  const stretches: Stretch[] = [];
  let [i, j] = [0, 0];
  while (i < old.length || j < now.length) {
    if (i < old.length && j < now.length && old[i] === now[j]) {
      push(stretches, 'both', old[i]);
      i += 1;
      j += 1;
    } else if (j >= now.length || (i < old.length && at(common, i + 1, j) >= at(common, i, j + 1))) {
      push(stretches, 'before', old[i]);
      i += 1;
    } else {
      push(stretches, 'after', now[j]);
      j += 1;
    }
  }
  return stretches;
}

/** Length of the longest common run of words from each place on. */
function commonLengths(old: readonly string[], now: readonly string[]): number[][] {
  const lengths = Array.from({ length: old.length + 1 }, () => new Array<number>(now.length + 1).fill(0));
  for (let i = old.length - 1; i >= 0; i -= 1) {
    for (let j = now.length - 1; j >= 0; j -= 1) {
      const row = lengths[i] as number[];
      row[j] =
        old[i] === now[j]
          ? at(lengths, i + 1, j + 1) + 1
          : Math.max(at(lengths, i + 1, j), at(lengths, i, j + 1));
    }
  }
  return lengths;
}

function at(lengths: readonly number[][], i: number, j: number): number {
  return lengths[i]?.[j] ?? 0;
}

function push(stretches: Stretch[], where: Stretch['in'], text = ''): void {
  const last = stretches.at(-1);
  if (last?.in === where) last.text += text;
  else stretches.push({ text, in: where });
}
