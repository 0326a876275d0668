import type { Measure } from '../rule-sets/measure';
import type { ResolvedEdition } from '../rule-sets/resolve';

/** Rules whose kind of measure this engine version does not compute; an edition with any is not evaluated. */
export function kindsNotComputed(
  edition: Pick<ResolvedEdition, 'rules'>,
): { rule: string; kind: Measure['kind'] }[] {
  return edition.rules
    .filter((rule) => NOT_COMPUTED.has(rule.measure.kind))
    .map((rule) => ({ rule: rule.id, kind: rule.measure.kind }));
}

const NOT_COMPUTED = new Set<Measure['kind']>(['creep-compliance']);
