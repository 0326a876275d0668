import { describe, expect, it } from 'vitest';
import { ENGINE_VERSION } from '#rules/engine/engine-version';
import { evaluate } from '#rules/engine/evaluate';
import { hashOf } from '#rules/engine/seal';
import { resolveEdition } from '#rules/rule-sets/resolve';
import { parseRuleSet } from '#rules/rule-sets/schema';
import edition2026 from '#rules/sets/cvra-412-2026.json';
import pinned from './shipped-seals.json';

/**
 * These hashes are of our own making on purpose: they say nothing about what is right, only that it has moved.
 * A change that moves them raises ENGINE_VERSION and renews shipped-seals.json in the same commit; cases added to
 * the edition leave them alone.
 */
describe('judged findings of shipped cases', () => {
  const parsed = parseRuleSet(edition2026);
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.problems));
  const resolution = resolveEdition(parsed.ruleSet);
  if (!resolution.ok) throw new Error(JSON.stringify(resolution.problems));
  const { edition } = resolution;

  it('do not move unless the engine version does', () => {
    const moved = Object.keys(pinned.cases).map((id) => {
      const each = edition.cases.find((candidate) => candidate.id === id);
      if (!each) return [id, 'no such case'];
      const { findings } = evaluate(each.record, edition, each.context);
      return [
        id,
        hashOf(
          findings.map(({ rule, subject, outcome, observed, margin, borderline }) => ({
            rule,
            subject,
            outcome,
            value: observed?.value ?? null,
            rounded: observed?.rounded ?? null,
            margin,
            borderline,
          })),
        ),
      ];
    });
    expect({ engineVersion: ENGINE_VERSION, cases: Object.fromEntries(moved) }).toEqual(pinned);
  });
});
