import { conditionsSchema } from '../../record';
import { type Said, saidSchema } from '../correction';
import { attributePrefix, isReference, labelQuantity, type MappingRule, notAReading } from '../mapping';

const documentDate = /^document-(date|validTo):(.+)$/;

/** What a rule says its cells are, in the words of a correction; null where it speaks through references. */
export function saidByRule(rule: Pick<MappingRule, 'quantity' | 'unit' | 'at' | 'without'>): Said | null {
  const { quantity, unit, at, without = [] } = rule;
  if (isReference(quantity) || isReference(unit)) return null;
  if (quantity === notAReading || quantity === labelQuantity) return { kind: 'not a reading' };
  if (quantity.startsWith(attributePrefix))
    return { kind: 'attribute', name: quantity.slice(attributePrefix.length) };
  const date = documentDate.exec(quantity);
  if (date?.[2]) return { kind: 'document date', type: date[2], part: date[1] as 'date' | 'validTo' };
  const conditions = conditionsSchema.safeParse(at);
  if (!conditions.success) return null;
  const said = saidSchema.safeParse({ kind: 'reading', quantity, unit, at: conditions.data, without });
  return said.success ? said.data : null;
}

/** The same the other way round: the parts of a rule that say what its cells are. */
export function ruleParts(says: Said): Pick<MappingRule, 'quantity' | 'unit' | 'at' | 'without'> {
  switch (says.kind) {
    case 'reading': {
      const without = says.without.length === 0 ? {} : { without: says.without };
      return { quantity: says.quantity, unit: says.unit, at: { ...says.at }, ...without };
    }
    case 'attribute':
      return { quantity: `${attributePrefix}${says.name}`, unit: null, at: {} };
    case 'document date':
      return { quantity: `document-${says.part}:${says.type}`, unit: null, at: {} };
    case 'not a reading':
      return { quantity: notAReading, unit: null, at: {} };
  }
}
