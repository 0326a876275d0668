import type { EditionListItem } from '#shared/contracts/rule-sets';
import type { ListedEdition } from '../db/queries/rule-sets';
import { type DatedEdition, editionState } from '../policies/edition-dates';

/** An edition in a list; its state follows from the dates of all editions of its rule set. */
export function presentEdition(
  edition: ListedEdition,
  { all, today }: { all: readonly ListedEdition[]; today: string },
): EditionListItem {
  return {
    ruleSet: edition.ruleSetKey,
    edition: edition.edition,
    title: edition.title,
    state: stateOf(edition, { all, today }),
    from: edition.effectiveFrom,
    to: edition.effectiveTo,
    rules: edition.ruleCount,
    layerOf:
      edition.layerOfKey === null || edition.layerOfEdition === null
        ? null
        : { ruleSet: edition.layerOfKey, edition: edition.layerOfEdition },
    startingPoint: edition.startingPoint,
    draftId: edition.draftState === null ? null : edition.id,
  };
}

function stateOf(
  edition: ListedEdition,
  { all, today }: { all: readonly ListedEdition[]; today: string },
): EditionListItem['state'] {
  if (edition.draftState !== null) return edition.draftState;
  const dated = all.filter((each): each is ListedEdition & DatedEdition => isDated(each));
  return isDated(edition) ? editionState(edition, { all: dated, today }) : 'not yet in force';
}

function isDated(edition: ListedEdition): edition is ListedEdition & { effectiveFrom: string } {
  return edition.draftState === null && edition.effectiveFrom !== null;
}
