import { Engine } from 'json-rules-engine';
import { describe, expect, it } from 'vitest';
import { addOperators, decide, type Fact, type LeafComparison, type Truth } from '#rules/engine/decide';
import type { Condition } from '#rules/rule-sets/when';
import fc from '#tests/builders/seeded-fast-check';

const facts: Record<string, Fact> = {
  yes: { kind: 'value', value: true },
  no: { kind: 'value', value: false },
  unknown: { kind: 'missing', reason: 'it is missing' },
};
const factOf = ({ fact }: LeafComparison): Fact =>
  facts[fact] ?? { kind: 'missing', reason: 'it is missing' };
const holds = (fact: string): Condition => ({ fact, operator: 'equal', value: true });

/** S. C. Kleene's strong three-valued logic, Introduction to Metamathematics (1952), section 64. */
const conjunction: [string, string, Truth][] = [
  ['yes', 'yes', 'true'],
  ['yes', 'no', 'false'],
  ['yes', 'unknown', 'unknown'],
  ['no', 'no', 'false'],
  ['no', 'unknown', 'false'],
  ['unknown', 'unknown', 'unknown'],
];
const disjunction: [string, string, Truth][] = [
  ['yes', 'yes', 'true'],
  ['yes', 'no', 'true'],
  ['yes', 'unknown', 'true'],
  ['no', 'no', 'false'],
  ['no', 'unknown', 'unknown'],
  ['unknown', 'unknown', 'unknown'],
];
const negation: [string, Truth][] = [
  ['yes', 'false'],
  ['no', 'true'],
  ['unknown', 'unknown'],
];

describe('the three-valued truth of a condition', () => {
  it.each(conjunction)('%s and %s is %s, in either order', (left, right, truth) => {
    expect(decide({ all: [holds(left), holds(right)] }, factOf)).toBe(truth);
    expect(decide({ all: [holds(right), holds(left)] }, factOf)).toBe(truth);
  });

  it.each(disjunction)('%s or %s is %s, in either order', (left, right, truth) => {
    expect(decide({ any: [holds(left), holds(right)] }, factOf)).toBe(truth);
    expect(decide({ any: [holds(right), holds(left)] }, factOf)).toBe(truth);
  });

  it.each(negation)('not %s is %s', (fact, truth) => {
    expect(decide({ not: holds(fact) }, factOf)).toBe(truth);
  });

  it('stays unknown through any depth of not', () => {
    expect(decide({ not: { not: { all: [holds('yes'), { not: holds('unknown') }] } } }, factOf)).toBe(
      'unknown',
    );
  });

  it('does not take a comparison for not equal with a missing fact as true', () => {
    expect(decide({ fact: 'unknown', operator: 'notEqual', value: true }, factOf)).toBe('unknown');
  });

  it('counts a doubtful fact as unknown', () => {
    const doubtful = (): Fact => ({ kind: 'doubtful', reason: 'it is in doubt' });
    expect(decide(holds('any'), doubtful)).toBe('unknown');
  });

  it.each([
    ['lessThan', 3, false],
    ['lessThanInclusive', 3, true],
    ['greaterThan', 3, false],
    ['greaterThanInclusive', 3, true],
    ['equal', 3, true],
    ['notEqual', 3, false],
    ['in', [1, 3], true],
    ['notIn', [1, 3], false],
  ] as const)('%s at the very value', (operator, value, expected) => {
    const condition = { fact: 'x', operator, value: value as number | number[] } as Condition;
    expect(decide(condition, () => ({ kind: 'value', value: 3 }))).toBe(expected ? 'true' : 'false');
  });

  it('compares text without case, spaces, hyphens and the words course, layer and mix', () => {
    const condition: Condition = { fact: 'x', operator: 'equal', value: 'dense-graded' };
    expect(decide(condition, () => ({ kind: 'value', value: 'Dense Graded Mix' }))).toBe('true');
    expect(decide(condition, () => ({ kind: 'value', value: 'open-graded' }))).toBe('false');
  });

  it('throws rather than ordering what has no order', () => {
    const condition: Condition = { fact: 'x', operator: 'lessThan', value: 5 };
    expect(() => decide(condition, () => ({ kind: 'value', value: '4' }))).toThrow(/cannot be put in order/);
    expect(() => decide(condition, () => ({ kind: 'value', value: Number.NaN }))).toThrow(/finite/);
  });
});

describe('the walk through a condition and the library’s own run', () => {
  const leaf: fc.Arbitrary<Condition> = fc.record({
    fact: fc.constantFrom('a', 'b', 'c'),
    operator: fc.constantFrom(
      'equal',
      'notEqual',
      'lessThan',
      'lessThanInclusive',
      'greaterThan',
      'greaterThanInclusive',
    ),
    value: fc.integer({ min: 0, max: 3 }),
  });
  const { condition } = fc.letrec<{ condition: Condition }>((tie) => ({
    condition: fc.oneof(
      { maxDepth: 4 },
      leaf,
      fc.record({ all: fc.array(tie('condition'), { minLength: 1, maxLength: 3 }) }),
      fc.record({ any: fc.array(tie('condition'), { minLength: 1, maxLength: 3 }) }),
      fc.record({ not: tie('condition') }),
    ),
  }));
  const values = fc.record({
    a: fc.integer({ min: 0, max: 3 }),
    b: fc.integer({ min: 0, max: 3 }),
    c: fc.integer({ min: 0, max: 3 }),
  });

  it('agree wherever every fact is known', async () => {
    await fc.assert(
      fc.asyncProperty(condition, values, async (each, known) => {
        const engine = new Engine([{ conditions: { all: [each] }, event: { type: 'holds' } }]);
        addOperators(engine);
        const { events } = await engine.run(known);
        const truth = decide(each, ({ fact }) => ({ kind: 'value', value: known[fact as 'a' | 'b' | 'c'] }));
        expect(truth).toBe(events.length > 0 ? 'true' : 'false');
      }),
      { numRuns: 150 },
    );
  });

  it('never turn from true to false when an unknown fact becomes known', () => {
    fc.assert(
      fc.property(condition, values, fc.constantFrom('a', 'b', 'c'), (each, known, hidden) => {
        const full = decide(each, ({ fact }) => ({ kind: 'value', value: known[fact as 'a' | 'b' | 'c'] }));
        const partial = decide(each, ({ fact }) =>
          fact === hidden
            ? { kind: 'missing', reason: '' }
            : { kind: 'value', value: known[fact as 'a' | 'b' | 'c'] },
        );
        expect(['unknown', full]).toContain(partial);
      }),
    );
  });
});
