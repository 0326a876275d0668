import { placeOf, type ReadingLog } from '../reading-log';
import { unreadReasons } from '../unread-reason';
import type { Assigned } from './assigned';

/** Weighings for the maximum gravity or for an aggregate's are no weighings of a compacted specimen. */
export function withoutOtherMasses(assigned: Assigned[], log: ReadingLog): Assigned[] {
  const isMass = ({ choices }: Assigned) =>
    choices[0]?.id.startsWith('mass-') === true && choices[0]?.unit === 'g';
  const tables = new Map<number, Set<string>>();
  for (const { table, choices } of assigned) {
    const known = tables.get(table) ?? new Set<string>();
    for (const { id } of choices) known.add(id);
    tables.set(table, known);
  }
  return assigned.filter((each) => {
    if (!isMass(each) || each.told) return true;
    const beside = tables.get(each.table) ?? new Set();
    const isSpecimen = beside.has('bulk-specific-gravity-mix') || beside.has('bulk-density-mix');
    if (isSpecimen && each.at.stockpile === undefined) return true;
    const isRice =
      beside.has('maximum-specific-gravity') &&
      !beside.has('bulk-specific-gravity-mix') &&
      !beside.has('mass-saturated-surface-dry');
    const isAggregate =
      each.at.stockpile !== undefined ||
      ['bulk-specific-gravity-aggregate', 'apparent-specific-gravity-aggregate'].some(
        (id) => beside.has(id) && !beside.has('bulk-specific-gravity-mix'),
      );
    const [nearest] = each.domains.filter((domain) =>
      ['mix', 'moisture', 'marshall', 'maximum-gravity', 'aggregate-gravity', 'gradation'].includes(domain),
    );
    const isOther = nearest === 'aggregate-gravity' || nearest === 'gradation';
    const isGmm = nearest === 'maximum-gravity' && !beside.has('mass-saturated-surface-dry');
    if (!isRice && !isAggregate && !isOther && !isGmm) return true;
    log.passOver(placeOf(each.index.sheet, each.cell), unreadReasons.rawData);
    return false;
  });
}
