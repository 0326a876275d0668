import type { EditionReference } from '#shared/contracts/projects';

/** One text for an edition, so that it can be the value of a choice. */
export function editionKey({ ruleSet, edition }: Pick<EditionReference, 'ruleSet' | 'edition'>): string {
  return `${ruleSet}@${edition}`;
}
