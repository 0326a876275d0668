import type { Quantity } from '../quantities/quantity';
import {
  type AttributeDefinition,
  attributeLabel,
  type Scalar,
  withStandardAttributes,
} from '../rule-sets/attribute';
import type { ReadingEdition } from './edition-contents';
import type { MeasuredQuantity } from './measured-quantities';
import { submittalFacts } from './submittal-facts';
import { sentenceCase } from './template-columns';
import type { TemplateEntry } from './template-layout';

export function attributeEntries(edition: ReadingEdition): TemplateEntry[] {
  const entry = (attribute: AttributeDefinition): TemplateEntry => ({
    label: attributeLabel(attribute),
    unit: attribute.unit ?? null,
    quantity: `attribute:${attribute.name}`,
    at: {},
    list: attribute.type === 'boolean' ? ['yes', 'no'] : (attribute.values ?? []).map(shownValue),
  });
  return attributesOf(edition).map(entry);
}

function attributesOf(edition: ReadingEdition): AttributeDefinition[] {
  return [...submittalFacts, ...withStandardAttributes(edition.attributes)];
}

/** An attribute's value as the template's list has it. */
export function shownAttribute(edition: ReadingEdition, name: string, value: Scalar): string | number {
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  const listed = attributesOf(edition).find((attribute) => attribute.name === name)?.values ?? [];
  const own = listed.find((each) => (typeof each === 'object' ? each.value : each) === value);
  return own === undefined || typeof value === 'number' ? value : shownValue(own);
}

function shownValue(value: NonNullable<AttributeDefinition['values']>[number]): string {
  if (typeof value !== 'object') return String(value);
  return typeof value.value === 'string' ? (value.label ?? value.value) : String(value.value);
}

/** Scalars of the mix; a derived one is what the contractor reports for the design. */
export function quantityEntries(
  measured: MeasuredQuantity[],
  find: (id: string) => Quantity | undefined,
): TemplateEntry[] {
  const usual = [
    'binder-content',
    'binder-specific-gravity',
    'gyrations-initial',
    'gyrations-design',
    'gyrations-maximum',
    'mixing-temperature',
    'compaction-temperature',
    'rap-content',
    'ras-content',
  ];
  const ids = [...new Set([...usual, ...measured.map(({ quantity }) => quantity)])];
  return ids.flatMap((id) => {
    const quantity = find(id);
    if (!quantity) return [];
    const label = entryLabels[id] ?? sentenceCase(quantity.label);
    const at = quantity.subject === 'mix' ? { trial: 'design' } : {};
    const unit = quantity.unit === '1' ? null : quantity.unit;
    return [
      {
        label: quantity.kind === 'derived' ? `${label} as reported` : label,
        unit,
        quantity: id,
        at,
        list: [],
      },
    ];
  });
}

const entryLabels: Record<string, string> = {
  'binder-content': 'Job mix binder content by mass of mix',
  'rap-content': 'Reclaimed asphalt pavement content by mass of mix',
  'ras-content': 'Reclaimed asphalt shingle content by mass of mix',
};
