/** How a field of an attribute, quantity or document is typed in a table. */
export type EntryColumn =
  | { field: string; label: string; kind: 'text' | 'number' | 'list' | 'range' }
  | { field: string; label: string; kind: 'choice'; choices: readonly string[] };

export type ReadField = { ok: true; value: unknown } | { ok: false; detail: string };

/** A field as its text; values with labels of their own are shown by what they are. */
export function textOfField({ kind }: Pick<EntryColumn, 'kind'>, value: unknown): string {
  if (value === undefined || value === null) return '';
  if (kind === 'list' && Array.isArray(value)) return value.map(wordOf).join(', ');
  if (kind === 'range' && typeof value === 'object') {
    const { min, max } = value as { min?: unknown; max?: unknown };
    return `${String(min ?? '')} to ${String(max ?? '')}`;
  }
  return String(value);
}

/** The text as the field's value; an empty one leaves the field out. What `before` says of a listed value is kept. */
export function valueOfText({ kind }: Pick<EntryColumn, 'kind'>, text: string, before: unknown): ReadField {
  const trimmed = text.trim();
  if (trimmed === '') return { ok: true, value: undefined };
  switch (kind) {
    case 'number':
      return numberOf(trimmed);
    case 'range':
      return rangeOf(trimmed);
    case 'list':
      return { ok: true, value: listOf(trimmed, Array.isArray(before) ? before : []) };
    default:
      return { ok: true, value: trimmed };
  }
}

function numberOf(text: string): ReadField {
  const value = Number(text);
  return Number.isFinite(value) ? { ok: true, value } : { ok: false, detail: 'Write a number, such as 2.' };
}

function rangeOf(text: string): ReadField {
  const ends = /^(-?[\d.]+)\s*(?:to|–|,)\s*(-?[\d.]+)$/.exec(text);
  const [min, max] = [Number(ends?.[1]), Number(ends?.[2])];
  if (ends === null || !(min < max)) return { ok: false, detail: 'Write two numbers, such as 0 to 30.' };
  return { ok: true, value: { min, max } };
}

/** A number stays a number, and an entry that had a label keeps it. */
function listOf(text: string, before: readonly unknown[]): unknown[] {
  const known = new Map(before.map((entry) => [wordOf(entry), entry]));
  return text
    .split(',')
    .map((word) => word.trim())
    .filter((word) => word !== '')
    .map((word) => known.get(word) ?? (/^-?\d+(\.\d+)?$/.test(word) ? Number(word) : word));
}

function wordOf(entry: unknown): string {
  return typeof entry === 'object' && entry !== null && 'value' in entry
    ? String(entry.value)
    : String(entry);
}
