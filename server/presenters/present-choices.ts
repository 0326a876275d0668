import { measuredQuantities } from '#rules/reading/measured-quantities';
import { submittalFacts } from '#rules/reading/submittal-facts';
import { attributeLabel, withStandardAttributes } from '#rules/rule-sets/attribute';
import { withStandardDocuments } from '#rules/rule-sets/document-types';
import type { ResolvedEdition } from '#rules/rule-sets/resolve';
import { quantitiesFor, unitsOf } from './words-for';

/** What a cell of a workbook can be said to be, those first that the section has rules on. */
export function presentChoices(edition: ResolvedEdition) {
  const judged = new Set(measuredQuantities(edition).map(({ quantity }) => quantity));
  const quantities = [...quantitiesFor(edition).values()].map((quantity) => ({
    id: quantity.id,
    label: quantity.label,
    symbol: quantity.symbol,
    unit: quantity.unit,
    units: unitsOf(quantity),
    aliases: quantity.aliases,
    judged: judged.has(quantity.id),
  }));
  return {
    quantities: [...quantities.filter((each) => each.judged), ...quantities.filter((each) => !each.judged)],
    attributes: [...withStandardAttributes(edition.attributes), ...submittalFacts].map((attribute) => ({
      name: attribute.name,
      label: attributeLabel(attribute),
      unit: attribute.unit ?? null,
      values: (attribute.values ?? []).flatMap((entry) => {
        const value = typeof entry === 'object' ? entry.value : entry;
        return typeof value === 'boolean' ? [] : [value];
      }),
    })),
    documents: withStandardDocuments(edition.documents).map(({ type, label }) => ({
      type,
      label: label ?? type,
    })),
  };
}
