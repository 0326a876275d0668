import type { Quantity } from '#rules/quantities/quantity';
import { allQuantities } from '#rules/quantities/registry';
import type { WordsFor } from '#rules/reading/mapping-sentence';
import { type AttributeDefinition, withStandardAttributes } from '#rules/rule-sets/attribute';
import { type DocumentType, withStandardDocuments } from '#rules/rule-sets/document-types';

interface OwnWords {
  quantities: Quantity[];
  attributes: AttributeDefinition[];
  documents: DocumentType[];
}

/** The quantities that a cell may be said to be: the edition's own over those of the registry. */
export function quantitiesFor({ quantities }: Pick<OwnWords, 'quantities'>): Map<string, Quantity> {
  return new Map([...allQuantities(), ...quantities].map((each) => [each.id, each]));
}

/** Names of what cells are, as a section knows them. */
export function wordsFor(edition: OwnWords): WordsFor {
  const quantities = quantitiesFor(edition);
  const attributes = withStandardAttributes(edition.attributes);
  const documents = withStandardDocuments(edition.documents);
  return {
    quantity: (id) => quantities.get(id),
    attribute: (name) => attributes.find((each) => each.name === name),
    document: (type) => documents.find((each) => each.type === type)?.label,
  };
}

/** The same for a mapping by itself, which belongs to no section. */
export const wordsOfRegistry: WordsFor = wordsFor({ quantities: [], attributes: [], documents: [] });

/** The units that a quantity may be stated in, the canonical one first. */
export function unitsOf({ unit, acceptedUnits }: Quantity): string[] {
  return [...new Set([unit, ...acceptedUnits, ...(unit === '%' ? ['1'] : [])])];
}
