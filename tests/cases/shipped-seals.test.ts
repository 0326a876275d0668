import { describe, expect, it } from 'vitest';
import { ENGINE_VERSION } from '#rules/engine/engine-version';
import { evaluate } from '#rules/engine/evaluate';
import { hashOf } from '#rules/engine/seal';
import type { ResolvedEdition } from '#rules/rule-sets/resolve';
import { shippedEditions } from '#tests/builders/shipped-editions';
import pinned from './shipped-seals.json';

/**
 * These hashes are of our own making on purpose: they say nothing about what is right, only that it has moved.
 * A change that moves them raises ENGINE_VERSION and renews shipped-seals.json in the same commit; cases added to
 * an edition leave them alone.
 */
describe('judged findings of shipped cases', () => {
  const shipped = shippedEditions();
  const sets: Record<string, Record<string, string>> = pinned.sets;

  it('are kept of every shipped set', () => {
    expect(Object.keys(sets)).toEqual(shipped.map(({ file }) => file));
  });

  it('were kept by this engine version', () => {
    expect(ENGINE_VERSION).toBe(pinned.engineVersion);
  });

  it.each(shipped)(
    'do not move in $file unless the engine version does',
    ({ file, edition }) => {
      const kept = sets[file] ?? {};
      const now = Object.keys(kept).map((id) => [id, findingsHash(edition, id)]);
      expect(Object.keys(kept)).not.toEqual([]);
      expect(Object.fromEntries(now)).toEqual(kept);
    },
    60_000,
  );
});

function findingsHash(edition: ResolvedEdition, id: string): string {
  const each = edition.cases.find((candidate) => candidate.id === id);
  if (!each) return 'no such case';
  const { findings } = evaluate(each.record, edition, each.context);
  return hashOf(
    findings.map(({ rule, subject, outcome, observed, margin, borderline }) => ({
      rule,
      subject,
      outcome,
      value: observed?.value ?? null,
      rounded: observed?.rounded ?? null,
      margin,
      borderline,
    })),
  );
}
