import { describe, expect, it } from 'vitest';
import type { MixRecordInput } from '#rules/record';
import type { RuleInput } from '#rules/rule-sets/schema';
import fc from '#tests/builders/seeded-fast-check';
import { engineFindings } from './agreement';
import { drawCase } from './generated/case';
import { drawFrom } from './generated/draw';
import type { GeneratedCase } from './generated/parts';
import { type Need, needsOf } from './needs';
import { choices } from './seeded-cases';

/** The rules as all layers leave them: the last that names a rule has the word. */
function rulesOf({ base, layers }: GeneratedCase): RuleInput[] {
  const rules = new Map(base.rules.map((rule) => [rule.id, rule]));
  for (const { add, replace } of layers) {
    for (const rule of [...(add?.rules ?? []), ...(replace?.rules ?? [])]) rules.set(rule.id, rule);
  }
  return [...rules.values()];
}

type Taking = (record: MixRecordInput, need: Need) => MixRecordInput;

/** As if the workbook said nothing of it. */
const missing: Taking = (record, need) => ({
  ...record,
  attributes: withoutKey(record.attributes ?? {}, need.attribute),
  readings: (record.readings ?? []).filter(({ quantity }) => !need.quantities?.includes(quantity)),
  documents: (record.documents ?? []).filter(({ type }) => type !== need.document),
});

/** As if every cell of it could not be read. */
const doubtful: Taking = (record, need) => {
  const cells = (record.readings ?? [])
    .filter(({ quantity }) => need.quantities?.includes(quantity))
    .map(({ quantity, at }) => ({ quantity, ...(at === undefined ? {} : { at }) }));
  const others = need.attribute === undefined ? { document: need.document } : { attribute: need.attribute };
  const abouts = need.quantities === undefined ? [others] : cells;
  const doubts = abouts.map((about) => ({
    sheet: 'Tests',
    cell: 'E9',
    text: '?',
    reason: 'The cell cannot be read.',
    alternatives: [],
    about,
  }));
  return { ...missing(record, need), doubts: [...(record.doubts ?? []), ...doubts] };
};

function withoutKey<T>(values: Record<string, T>, name: string | undefined): Record<string, T> {
  return Object.fromEntries(Object.entries(values).filter(([key]) => key !== name));
}

/** How many passes a fact was taken from; throws where one is still a pass. */
function takenFromPasses(taking: Taking): number {
  let taken = 0;
  const property = fc.property(choices, (numbers) => {
    const drawn = drawCase(drawFrom(numbers));
    const passing = engineFindings(drawn).filter(({ outcome }) => outcome === 'pass');
    for (const rule of rulesOf(drawn)) {
      const own = passing.filter((finding) => finding.rule === rule.id);
      if (own.length === 0) continue;
      for (const need of needsOf(drawn, rule)) {
        const facts = withoutKey(drawn.context.facts, need.attribute);
        const record = taking(drawn.record, need);
        const findings = engineFindings({ ...drawn, record, context: { ...drawn.context, facts } });
        const stillPassing = findings.filter(({ rule: id, outcome }) => id === rule.id && outcome === 'pass');
        taken += own.length;
        expect(stillPassing, JSON.stringify({ need, rule })).toEqual([]);
      }
    }
  });
  fc.assert(property, { seed: 20261201, numRuns: 500, endOnFailure: true });
  return taken;
}

describe('a rule of which a needed fact is not known', { timeout: 180_000 }, () => {
  it('does not pass where the fact is missing', () => {
    expect(takenFromPasses(missing)).toBeGreaterThan(300);
  });

  it('does not pass where the fact is in doubt', () => {
    expect(takenFromPasses(doubtful)).toBeGreaterThan(300);
  });
});
