/**
 * Canonical JSON (RFC 8785): no white space, members sorted by UTF-16 code units, numbers and strings as
 * ECMAScript writes them. Members without a value are left out, as JSON has no way to write them.
 *
 * Throws on what JSON cannot hold (NaN, Infinity, a function): a seal over it would prove nothing.
 *
 * @example canonicalText({ b: 1.0, a: 'x' }) // {"a":"x","b":1}
 */
export function canonicalText(value: unknown): string {
  if (value === null || typeof value === 'boolean' || typeof value === 'string') return JSON.stringify(value);
  if (typeof value === 'number') {
    if (!Number.isFinite(value))
      throw new TypeError('Canonical JSON cannot hold a number that is not finite.');
    return JSON.stringify(value);
  }
  if (Array.isArray(value)) return `[${value.map((each) => canonicalText(each ?? null)).join(',')}]`;
  if (typeof value !== 'object') throw new TypeError(`Canonical JSON cannot hold a ${typeof value}.`);
  return membersJson(value as Record<string, unknown>);
}

/** RFC 8785, section 3.2.3: sorted by UTF-16 code units, which is how sort() compares strings. */
function membersJson(value: Record<string, unknown>): string {
  let json = '';
  for (const name of Object.keys(value).sort()) {
    const member = value[name];
    if (member !== undefined)
      json += `${json === '' ? '' : ','}${JSON.stringify(name)}:${canonicalText(member)}`;
  }
  return `{${json}}`;
}
