import type { MixRecord } from '#rules/record';
import { exampleFor } from '#rules/sets/shipped-examples';
import type { LoadedRuleSet } from './load-rule-set';

/** A resolved edition never changes, and holding an example against one takes a whole check. */
const known = new Map<string, MixRecord | null>();
const keptEditions = 64;

/** The invented mix that shows how an edition's template is filled in, or null where none fits. */
export function exampleOf({ resolved, hash }: Pick<LoadedRuleSet, 'resolved' | 'hash'>): MixRecord | null {
  const kept = known.get(hash);
  if (kept !== undefined) return kept;
  const example = exampleFor(resolved);
  const [oldest] = known.keys();
  if (known.size >= keptEditions && oldest !== undefined) known.delete(oldest);
  known.set(hash, example);
  return example;
}
