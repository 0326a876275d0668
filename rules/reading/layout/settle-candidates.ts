import type { Domain } from '../words/context-words';
import { acceptedConditions } from './accepted-conditions';
import type { Assigned, SettleOptions } from './assigned';
import type { Candidate, ToldReading } from './candidate';
import { decideGradations } from './decide-gradations';
import { emit } from './emit-candidate';
import { withoutOtherBasis } from './other-basis';
import { withoutOtherMasses } from './other-masses';
import { freeFromSpecimen, numberReplicates, withoutAverages } from './replicates';
import { type FindQuantity, resolveQuantities } from './resolve-quantity';
import { suspicions } from './suspicions';

/** From candidates of the whole workbook to readings, doubts and cells that are passed over. */
export function settleCandidates(candidates: Candidate[], options: SettleOptions): void {
  const neighbours = domainsOfTables(candidates, options.find);
  const assigned = candidates.map((each): Assigned => {
    const beside = neighbours.get(each.table) ?? [];
    const candidate = beside.length === 0 ? each : { ...each, domains: [...each.domains, ...beside] };
    if (candidate.told) return toldAssigned(candidate, candidate.told, options);
    const choices = resolveQuantities(candidate, options.find);
    const [first] = choices;
    return { ...candidate, choices, conditions: first ? acceptedConditions(candidate, first) : {} };
  });
  decideGradations(assigned, options.find);
  const kept = withoutAverages(
    withoutOtherBasis(withoutOtherMasses(assigned, options.log), options.log),
    options.log,
  );
  numberReplicates(kept);
  freeFromSpecimen(kept);
  const suspected = suspicions(kept, options);
  const formulas = new Set<string>();
  for (const each of kept) emit(each, { ...options, suspected, formulas });
}

/** What was said of it stands over what its row and column say of it. */
function toldAssigned(candidate: Candidate, told: ToldReading, { find }: SettleOptions): Assigned {
  const quantity = find(told.quantity);
  const around = quantity ? acceptedConditions(candidate, quantity) : {};
  const without = new Set<string>(told.without);
  const kept = Object.fromEntries(Object.entries(around).filter(([name]) => !without.has(name)));
  return {
    ...candidate,
    unit: told.unit ?? candidate.unit,
    unknownUnit: told.unit === null ? candidate.unknownUnit : null,
    choices: quantity ? [quantity] : [],
    conditions: { ...kept, ...told.at },
  };
}

/** What the unmistakable headings of a table say about its others. */
function domainsOfTables(candidates: Candidate[], find: FindQuantity): Map<number, Domain[]> {
  const counts = new Map<number, { aggregate: number; mix: number }>();
  for (const { table, quantities } of candidates) {
    const subject = quantities.length === 1 ? find(quantities[0] as string)?.subject : undefined;
    if (subject === undefined || subject === 'binder') continue;
    const count = counts.get(table) ?? { aggregate: 0, mix: 0 };
    if (subject === 'aggregate') count.aggregate += 1;
    else count.mix += 1;
    counts.set(table, count);
  }
  return new Map(
    [...counts].map(([table, { aggregate, mix }]) => [
      table,
      aggregate > 0 && mix === 0 ? ['aggregate'] : mix > 0 && aggregate === 0 ? ['mix'] : [],
    ]),
  );
}
