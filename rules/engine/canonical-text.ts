/**
 * Canonical JSON (RFC 8785): no white space, members sorted by UTF-16 code units, numbers and strings as
 * ECMAScript writes them. Members without a value are left out, as JSON has no way to write them.
 *
 * Throws on what JSON cannot hold (NaN, Infinity, a function): a seal over it would prove nothing.
 *
 * @example canonicalText({ b: 1.0, a: 'x' }) // {"a":"x","b":1}
 */
export function canonicalText(value: unknown): string {
  switch (typeof value) {
    case 'string':
      return quoted(value);
    case 'boolean':
      return value ? 'true' : 'false';
    case 'number':
      if (!Number.isFinite(value))
        throw new TypeError('Canonical JSON cannot hold a number that is not finite.');
      // As JSON writes it, minus zero included: "0".
      return `${value}`;
    case 'object':
      if (value === null) return 'null';
      return Array.isArray(value) ? arrayJson(value) : membersJson(value as Record<string, unknown>);
    default:
      throw new TypeError(`Canonical JSON cannot hold a ${typeof value}.`);
  }
}

function arrayJson(values: readonly unknown[]): string {
  let json = '';
  for (let place = 0; place < values.length; place += 1) {
    json += `${place === 0 ? '' : ','}${canonicalText(values[place] ?? null)}`;
  }
  return `[${json}]`;
}

/** RFC 8785, section 3.2.3: sorted by UTF-16 code units, which is how sort() compares strings. */
function membersJson(value: Record<string, unknown>): string {
  let json = '';
  for (const { name, opening } of sortedMembers(Object.keys(value))) {
    const member = value[name];
    if (member !== undefined) json += `${json === '' ? '' : ','}${opening}${canonicalText(member)}`;
  }
  return `{${json}}`;
}

interface Member {
  name: string;
  /** `"name":` */
  opening: string;
}

/** Objects of a few shapes come by the thousand: each shape is sorted once. */
function sortedMembers(names: string[]): Member[] {
  // With their number before them, names with a line break of their own are never taken for several names.
  const shape = `${names.length}\n${names.join('\n')}`;
  const kept = shapes.get(shape);
  if (kept) return kept;
  const members = names.toSorted(byCodeUnit).map((name) => ({ name, opening: `${quoted(name)}:` }));
  // A name of a record may be anything, so the shapes of a long-lived server must not pile up.
  if (shapes.size >= KEPT_SHAPES) shapes.clear();
  if (!names.some((name) => name.includes('\n'))) shapes.set(shape, members);
  return members;
}

function byCodeUnit(left: string, right: string): number {
  return left < right ? -1 : left > right ? 1 : 0;
}

const KEPT_SHAPES = 500;
const shapes = new Map<string, Member[]>();

function quoted(text: string): string {
  return NEEDS_ESCAPE.test(text) ? JSON.stringify(text) : `"${text}"`;
}

/** What JSON cannot hold as it stands: quotes, backslashes, control characters, halves of surrogate pairs. */
// biome-ignore lint/suspicious/noControlCharactersInRegex: control characters are what is looked for.
const NEEDS_ESCAPE = /["\\\u0000-\u001f\ud800-\udfff]/;
