import type { AskedAttribute } from '#shared/contracts/readings';

/** What was typed, as the attribute's type asks; null where it is empty or is not of that type. */
export function typedAttribute(
  attribute: Pick<AskedAttribute, 'type'>,
  text: string,
): string | number | boolean | null {
  const trimmed = text.trim();
  if (trimmed === '') return null;
  switch (attribute.type) {
    case 'number':
      return /^-?\d+([.,]\d+)?$/.test(trimmed) ? Number(trimmed.replace(',', '.')) : null;
    case 'boolean':
      return trimmed === 'true' ? true : trimmed === 'false' ? false : null;
    case 'date':
      return /^\d{4}-\d{2}-\d{2}$/.test(trimmed) ? trimmed : null;
    case 'text':
      return trimmed;
  }
}
