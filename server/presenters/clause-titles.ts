import { quantityById } from '#rules/quantities/registry';
import type { Measure } from '#rules/rule-sets/measure';
import type { Rule } from '#rules/rule-sets/schema';
import { clauseParts } from '#shared/format/clause';

/**
 * A heading for each group of clauses, "412.03" → "Voids and density". An edition names its rules, not its groups, so
 * the heading says what most rules of the group are about.
 */
export function clauseTitles(rules: readonly Pick<Rule, 'clause' | 'measure'>[]): Record<string, string> {
  const groups = new Map<string, Map<string, number>>();
  for (const { clause, measure } of rules) {
    const counts = groups.get(clauseParts(clause).section) ?? new Map<string, number>();
    const title = titleOf(measure);
    counts.set(title, (counts.get(title) ?? 0) + 1);
    groups.set(clauseParts(clause).section, counts);
  }
  return Object.fromEntries([...groups].map(([group, counts]) => [group, mostFrequent(counts)]));
}

function mostFrequent(counts: ReadonlyMap<string, number>): string {
  return [...counts].toSorted(([, one], [, other]) => other - one)[0]?.[0] ?? '';
}

function titleOf(measure: Measure): string {
  switch (measure.kind) {
    case 'document':
      return 'Certificates and reports';
    case 'gradation':
      return 'Gradation';
    case 'attribute':
      return 'Materials';
    case 'creep-compliance':
      return 'Creep compliance';
    case 'formula':
      return 'Relations between quantities';
    case 'reading':
    case 'difference':
      return titleOfQuantity(measure.quantity);
  }
}

function titleOfQuantity(id: string): string {
  const named = quantityTitles.find(([pattern]) => pattern.test(id));
  if (named !== undefined) return named[1];
  const subject = quantityById(id)?.subject;
  if (subject === 'aggregate' || subject === 'binder') return 'Materials';
  return 'Performance';
}

const quantityTitles: [RegExp, string][] = [
  [/^(rap|ras|recycled)-/, 'Recycled materials'],
  [/^(tensile-strength|degree-of-saturation)/, 'Resistance to moisture'],
  [/^(percent-passing|percent-retained|cumulative-percent-retained)$/, 'Gradation'],
  [/temperature$/, 'Mixing and compaction'],
  [
    /^(air-voids|voids-|dust-proportion|effective-binder|absorbed-binder|film-thickness)/,
    'Voids and density',
  ],
  [/^(relative-density|field-density|gyrations-|binder-content|maximum-|bulk-)/, 'Voids and density'],
];
