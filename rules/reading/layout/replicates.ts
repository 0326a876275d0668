import { conditionsKey, placeOf, type ReadingLog } from '../reading-log';
import { unreadReasons } from '../unread-reason';
import type { Assigned } from './assigned';

/** A mean whose specimens stand in the same table is recomputed from them; one without specimens is a reading. */
export function withoutAverages(assigned: Assigned[], log: ReadingLog): Assigned[] {
  const keyOf = (each: Assigned) => {
    const { specimen: _, ...rest } = each.conditions;
    return `${each.table}|${each.choices[0]?.id}|${conditionsKey(rest)}`;
  };
  const specimens = new Set(assigned.filter(({ isAverage }) => !isAverage).map(keyOf));
  return assigned.filter((each) => {
    if (!each.isAverage) return true;
    const { specimen: _, ...rest } = each.conditions;
    each.conditions = rest;
    if (!specimens.has(keyOf(each))) return true;
    log.passOver(placeOf(each.index.sheet, each.cell), unreadReasons.average);
    return false;
  });
}

/** A result that several columns of specimens share stands in the first of them, or is merged over them all. */
export function freeFromSpecimen(assigned: Assigned[]): void {
  const specimens = new Map<number, Set<string>>();
  const lines = new Map<string, number>();
  const lineOf = ({ table, cell }: Assigned) => `${table}|${cell.row}`;
  for (const each of assigned) {
    if (each.conditions.specimen === undefined) continue;
    lines.set(lineOf(each), (lines.get(lineOf(each)) ?? 0) + 1);
    const known = specimens.get(each.table) ?? new Set();
    known.add(each.conditions.specimen);
    specimens.set(each.table, known);
  }
  freeRepeated(assigned);
  for (const each of assigned) {
    const [quantity] = each.choices;
    if (!quantity || each.conditions.specimen === undefined || each.specimenOfRow) continue;
    if (each.told?.at.specimen !== undefined) continue;
    const isMerged = each.index.spanOf(each.cell).columns > 1;
    const isShared = quantity.kind === 'derived' || quantity.id === 'maximum-specific-gravity';
    const isAlone = lines.get(lineOf(each)) === 1 && (specimens.get(each.table)?.size ?? 0) > 1;
    if (!isMerged && !(isShared && isAlone)) continue;
    const { specimen: _, ...rest } = each.conditions;
    each.conditions = rest;
  }
}

const ofTheMix = new Set(['maximum-specific-gravity', 'maximum-density-mix', 'binder-content']);

/**
 * In rows of specimens a property of the mix stands once a trial, beside the first, or is repeated in every row: it is
 * the trial's and none of its specimens'.
 */
function freeRepeated(assigned: Assigned[]): void {
  const specimens = new Map<string, Set<string>>();
  const groups = new Map<string, Assigned[]>();
  for (const each of assigned) {
    const [quantity] = each.choices;
    const { specimen, gyrations: _, ...rest } = each.conditions;
    if (!quantity || specimen === undefined || !each.specimenOfRow || each.choices.length > 1) continue;
    const trial = `${each.table}|${rest.trial ?? ''}|${rest.blend ?? ''}`;
    if (!ofTheMix.has(quantity.id)) {
      if (
        quantity.subject === 'specimen' ||
        quantity.id.startsWith('bulk-') ||
        quantity.id.startsWith('mass-')
      )
        specimens.set(trial, (specimens.get(trial) ?? new Set()).add(specimen));
      continue;
    }
    const key = `${trial}|${quantity.id}`;
    groups.set(key, [...(groups.get(key) ?? []), each]);
  }
  for (const [key, group] of groups) {
    const tested = specimens.get(key.slice(0, key.lastIndexOf('|')))?.size ?? 0;
    const isSame = new Set(group.map(({ cell }) => cell.value)).size === 1;
    if (tested < 2 || !isSame || (group.length > 1 && group.length < tested)) continue;
    for (const each of group) {
      const { specimen: _, ...rest } = each.conditions;
      each.conditions = rest;
    }
  }
}

/** Replicates that a table lists without numbers are told apart by their order. */
export function numberReplicates(assigned: Assigned[]): void {
  const groups = new Map<string, Assigned[]>();
  for (const each of assigned) {
    const [quantity] = each.choices;
    if (!quantity || each.choices.length > 1 || each.isAverage || each.conditions.specimen !== undefined)
      continue;
    if (
      quantity.kind !== 'measured' &&
      quantity.subject !== 'specimen' &&
      !each.choices.some(({ id }) => id.startsWith('tensile') || id.endsWith('index'))
    )
      continue;
    if (
      quantity.subject === 'aggregate' ||
      quantity.subject === 'binder' ||
      quantity.id === 'binder-content' ||
      !each.isHeaded
    )
      continue;
    const key = `${each.table}|${quantity.id}|${conditionsKey(each.conditions)}`;
    const group = groups.get(key);
    if (group) group.push(each);
    else groups.set(key, [each]);
  }
  for (const group of groups.values()) {
    // Under one heading and beside the same words they are replicates; else they are two statements of one thing.
    const inLine = new Set(group.map(({ heading }) => heading)).size === 1;
    if (group.length < 2 || group.length > 12 || !inLine) continue;
    for (const [at, each] of group.entries())
      each.conditions = { ...each.conditions, specimen: String(at + 1) };
  }
}
