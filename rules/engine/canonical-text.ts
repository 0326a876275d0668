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
  for (const { name, opening, following } of sortedMembers(Object.keys(value))) {
    const member = value[name];
    if (member !== undefined) json += (json === '' ? opening : following) + canonicalText(member);
  }
  return `{${json}}`;
}

interface Member {
  name: string;
  /** `"name":` */
  opening: string;
  /** `,"name":` */
  following: string;
}

interface Shape {
  names: readonly string[];
  members: readonly Member[];
}

/** Objects of a few shapes come by the thousand: each shape is sorted once. */
function sortedMembers(names: readonly string[]): readonly Member[] {
  const first = names[0] ?? '';
  const alike = shapes.get(first) ?? [];
  for (const shape of alike) if (isSame(shape.names, names)) return shape.members;
  const members = names.toSorted(byCodeUnit).map((name) => {
    const opening = `${quoted(name)}:`;
    return { name, opening, following: `,${opening}` };
  });
  // A name of a record may be anything, so the shapes of a long-lived server must not pile up.
  if (keptShapes >= KEPT_SHAPES) {
    shapes.clear();
    keptShapes = 0;
  }
  shapes.set(first, [...(shapes.get(first) ?? []), { names, members }]);
  keptShapes += 1;
  return members;
}

function isSame(left: readonly string[], right: readonly string[]): boolean {
  if (left.length !== right.length) return false;
  for (let place = 0; place < left.length; place += 1) if (left[place] !== right[place]) return false;
  return true;
}

function byCodeUnit(left: string, right: string): number {
  return left < right ? -1 : left > right ? 1 : 0;
}

const KEPT_SHAPES = 500;
let keptShapes = 0;
/** By the first name. */
const shapes = new Map<string, Shape[]>();

function quoted(text: string): string {
  return NEEDS_ESCAPE.test(text) ? JSON.stringify(text) : `"${text}"`;
}

/** What JSON cannot hold as it stands: quotes, backslashes, control characters, halves of surrogate pairs. */
// biome-ignore lint/suspicious/noControlCharactersInRegex: control characters are what is looked for.
const NEEDS_ESCAPE = /["\\\u0000-\u001f\ud800-\udfff]/;
