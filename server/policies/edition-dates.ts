import type { EditionListItem } from '#shared/contracts/rule-sets';

/** What of a published edition decides when it holds. Dates are calendar dates of the agency. */
export interface DatedEdition {
  ruleSetKey: string;
  edition: string;
  effectiveFrom: string;
  /** Null: until the day before the next published edition begins. */
  effectiveTo: string | null;
  layerOfKey: string | null;
  layerOfEdition: string | null;
  withdrawn: boolean;
}

type PublishedState = Exclude<EditionListItem['state'], 'draft' | 'in review'>;

/** In force and superseded follow from dates and are never stored. */
export function editionState(
  edition: DatedEdition,
  { all, today }: { all: readonly DatedEdition[]; today: string },
): PublishedState {
  if (edition.withdrawn) return 'withdrawn';
  if (today < edition.effectiveFrom) return 'not yet in force';
  return holdsOn(edition, { all, date: today }) ? 'in force' : 'superseded';
}

/** `from` ≤ date ≤ `to`, both days included. */
export function holdsOn(
  edition: DatedEdition,
  { all, date }: { all: readonly DatedEdition[]; date: string },
): boolean {
  if (edition.withdrawn || date < edition.effectiveFrom) return false;
  if (edition.effectiveTo !== null) return date <= edition.effectiveTo;
  const next = nextEdition(edition, all);
  return next === null || date < next.effectiveFrom;
}

/** Layers that hold on a date over a base, in the order of their first days. */
export function layersOn<Edition extends DatedEdition>(
  base: DatedEdition,
  { all, date }: { all: readonly Edition[]; date: string },
): Edition[] {
  return layersOf(base, all).filter((layer) => holdsOn(layer, { all, date }));
}

export function layersOf<Edition extends DatedEdition>(
  base: DatedEdition,
  all: readonly Edition[],
): Edition[] {
  return all
    .filter(
      (each) =>
        !each.withdrawn && each.layerOfKey === base.ruleSetKey && each.layerOfEdition === base.edition,
    )
    .sort(
      (a, b) =>
        compare(a.effectiveFrom, b.effectiveFrom) ||
        compare(a.ruleSetKey, b.ruleSetKey) ||
        compare(a.edition, b.edition),
    );
}

function nextEdition(edition: DatedEdition, all: readonly DatedEdition[]): DatedEdition | null {
  const later = all.filter(
    (each) =>
      each.ruleSetKey === edition.ruleSetKey && !each.withdrawn && each.effectiveFrom > edition.effectiveFrom,
  );
  return later.sort((a, b) => compare(a.effectiveFrom, b.effectiveFrom))[0] ?? null;
}

function compare(a: string, b: string): number {
  if (a === b) return 0;
  return a < b ? -1 : 1;
}
