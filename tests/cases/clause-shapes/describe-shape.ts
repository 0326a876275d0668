import { describe, expect, it } from 'vitest';
import { evaluate } from '#rules/engine/evaluate';
import type { Finding, Outcome } from '#rules/engine/finding';
import type { CheckContext, MixRecordInput } from '#rules/record';
import type { ResolvedEdition } from '#rules/rule-sets/resolve';
import type { LayerInput, RuleInput, RuleSetInput } from '#rules/rule-sets/schema';
import { aContext, aRecord } from '#tests/builders/a-record';
import { anEdition } from '#tests/builders/a-rule-set';

export interface ShapeCase {
  title: string;
  record: MixRecordInput;
  context?: Partial<CheckContext>;
  /** By rule, or by `rule~subject` where it gives several findings. Every finding is listed. */
  expected: Record<string, Outcome>;
}

/** What every rule has to show in some case, or to say why it cannot. */
type Facet = Outcome | 'at the limit';

export interface Shape {
  rules: RuleInput[];
  edition?: Partial<RuleSetInput>;
  layers?: LayerInput[];
  cases: ShapeCase[];
  /** By rule: what it can never come to, with the reason. */
  impossible?: Record<string, Partial<Record<Facet, string>>>;
}

const FACETS: Facet[] = ['pass', 'fail', 'at the limit', 'not shown', 'undecided', 'not applicable'];

/** A clause as a rule or a few: every case to its outcome, and every outcome in some case. */
export function describeShape(clause: string, shape: Shape): void {
  const edition = anEdition({ ...shape.edition, rules: shape.rules }, shape.layers);
  describe(clause, () => {
    it.each(shape.cases.map((each) => [each.title, each] as const))('%s', (_, each) => {
      const found = findingsOf(edition, each);
      const keys = Object.keys(each.expected);
      const outcomes = found.map((finding) => {
        const key = `${finding.rule}~${finding.subject}`;
        return [keys.includes(key) ? key : finding.rule, finding.outcome] as const;
      });
      expect(outcomes.toSorted()).toEqual(Object.entries(each.expected).toSorted());
    });

    it.each(edition.rules.map(({ id }) => id))('%s shows every outcome that it can have', (id) => {
      const own = shape.cases.flatMap((each) => findingsOf(edition, each).filter(({ rule }) => rule === id));
      const shown = new Set<Facet>(own.map(({ outcome }) => outcome));
      if (own.some(({ margin }) => margin === 0)) shown.add('at the limit');
      const impossible = Object.keys(shape.impossible?.[id] ?? {}) as Facet[];
      expect([...shown, ...impossible].toSorted()).toEqual(FACETS.toSorted());
    });
  });
}

function findingsOf(edition: ResolvedEdition, { record, context }: ShapeCase): Finding[] {
  const { findings } = evaluate(aRecord(record), edition, aContext(context));
  return findings.filter(({ kind }) => kind !== 'consistency');
}

export const ALWAYS = 'The clause has no condition.';
export const NO_NUMBER = 'It compares no number.';
