import type { AttributeDefinition, Scalar } from './attribute';

/** Text without case, spaces, hyphens and the words course, layer and mix, for comparing. */
export function normaliseText(text: string): string {
  const kept = normalised.get(text);
  if (kept !== undefined) return kept;
  const result = withoutFiller(text);
  // Attribute values and table keys come again and again; a stream of free text must not pile up.
  if (normalised.size >= KEPT_TEXTS) normalised.clear();
  normalised.set(text, result);
  return result;
}

const KEPT_TEXTS = 2000;
const normalised = new Map<string, string>();

function withoutFiller(text: string): string {
  const lower = text.toLowerCase().replace(/[‐-―−]/g, '-');
  const withoutWords = lower.replace(/\b(course|layer|mix)\b/g, '');
  const bare = withoutWords.replace(/[\s\-_]+/g, '');
  // A value that consists of these words only must still differ from nothing.
  return bare === '' ? lower.replace(/[\s\-_]+/g, '') : bare;
}

/** The attribute's own value that a stated one means, or null where it matches none. */
export function matchValue(attribute: AttributeDefinition, stated: Scalar): Scalar | null {
  const typed = readAs(attribute.type, stated);
  if (attribute.values === undefined || attribute.values.length === 0) return typed;
  for (const entry of attribute.values) {
    const allowed =
      typeof entry === 'object' ? entry : { value: entry, label: undefined, aliases: undefined };
    if (typed !== null && sameValue(allowed.value, typed)) return allowed.value;
    const names = [allowed.label, ...(allowed.aliases ?? [])].filter((name) => name !== undefined);
    if (names.some((name) => normaliseText(name) === normaliseText(String(stated)))) return allowed.value;
  }
  return null;
}

export function sameValue(left: Scalar, right: Scalar): boolean {
  if (left === right) return true;
  if (typeof left === 'string' && typeof right === 'string')
    return normaliseText(left) === normaliseText(right);
  return false;
}

function readAs(type: AttributeDefinition['type'], stated: Scalar): Scalar | null {
  if (type === 'number') {
    if (typeof stated === 'number') return Number.isFinite(stated) ? stated : null;
    const isPlain = typeof stated === 'string' && /^\s*-?\d+(\.\d+)?\s*$/.test(stated);
    return isPlain ? Number(stated) : null;
  }
  if (type === 'boolean') return readBoolean(stated);
  if (type === 'date') {
    return typeof stated === 'string' && /^\d{4}-\d{2}-\d{2}$/.test(stated) ? stated : null;
  }
  const text = String(stated).trim();
  return text === '' ? null : text;
}

function readBoolean(stated: Scalar): boolean | null {
  if (typeof stated === 'boolean') return stated;
  const word = String(stated).trim().toLowerCase();
  if (word === 'yes' || word === 'true') return true;
  if (word === 'no' || word === 'false') return false;
  return null;
}
