import { conditionsKey, placeOf, type ReadingLog } from '../reading-log';
import { unreadReasons } from '../unread-reason';
import type { Assigned } from './assigned';

/** Binder by mass of mix and again by mass of aggregate, in one table, is one result: the first is taken. */
export function withoutOtherBasis(assigned: Assigned[], log: ReadingLog): Assigned[] {
  const keyOf = ({ table, conditions }: Assigned) => `${table}|${conditionsKey(conditions)}`;
  const isBinder = ({ choices }: Assigned) => choices.length === 1 && choices[0]?.id === 'binder-content';
  const ofMix = new Set(assigned.filter((each) => isBinder(each) && !each.onAggregate).map(keyOf));
  return assigned.filter((each) => {
    if (!isBinder(each) || !each.onAggregate || !ofMix.has(keyOf(each))) return true;
    log.passOver(placeOf(each.index.sheet, each.cell), unreadReasons.otherBasis);
    return false;
  });
}
